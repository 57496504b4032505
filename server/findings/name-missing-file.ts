/**
 * A file named by `use` or by a profile is not there, cannot be read, lies outside the folder that may be read, or is not given by a
 * relative path. Paths are relative to the file they stand in, with `/`; `..` is allowed as far as the folder reaches.
 */
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameMissingFile: Rule<FactOf<'name/missing-file'>> = {
  severity: 'error',
  message: ({ path, why, detail }) => {
    const file = quoted(path);
    switch (why) {
      case 'missing':
        return `No file ${file} is found from the folder of this file. Correct the path, or create the file.`;
      case 'unreadable':
        return sentences(`The file ${file} is there but cannot be read.`, detail);
      case 'outside':
        return sentences(
          `The file ${file} lies outside the folder whose files may be used.`,
          detail,
          'Move it inside, or work from a folder higher up.',
        );
      case 'not-relative':
        if (path === '')
          return 'There is no path between these quotes. Write one as seen from the folder of this file.';
        if (/^(?![A-Za-z]:|\\)[^/]*\\/.test(path)) {
          return `A path has \`/\` between its folders here. Write ${quoted(path.replace(/\\+/g, '/'))}.`;
        }
        return `${file} is not a relative path. Write it as seen from the folder of this file, with \`/\` and without a drive or scheme.`;
    }
  },
};
