// One shipped example a finding code, named for it: each gives that finding and no other, so that every example also
// guards against false alarms. What is dangerous is often so in several ways: an example of a hazard may give others, and
// those of other codes are not looked at for hazards. The messages of all of them are kept in one file, to be read when it changes.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { allCodes, findingsOf } from '../../../server/findings/registry.ts';
import type { Finding } from '../../../server/findings/finding.ts';
import { Lines } from '../../../server/report/positions.ts';
import { evaluate } from '../../../server/scenario/evaluate.ts';

const FOLDER = 'examples/errors';
const EXAMPLES = readdirSync(FOLDER).filter((name) => name.endsWith('.stoke'));

/** What no small file can show: a text beyond the limit, and a fault of our own. */
const WITHOUT_EXAMPLE = ['program/failed', 'syntax/too-large'];

function findingsIn(example: string): readonly Finding[] {
  const scenario = evaluate(path.posix.join(FOLDER, example), (file) =>
    existsSync(file) ? { text: readFileSync(file, 'utf8') } : { fault: 'missing' },
  );
  const own = codeOf(example);
  return findingsOf(scenario).filter(({ code }) => code === own || !accompanies(code, own));
}

function codeOf(example: string): string {
  return example.replace('.stoke', '').replace('-', '/');
}

/** A melt or vapour that is dangerous is in another phase, too, and pure alkali metal lacks the water to burn to hydroxide. */
function accompanies(code: string, own: string): boolean {
  if (code.startsWith('hazard/')) return true;
  return own.startsWith('hazard/') && (code === 'range/phase' || code === 'balance/water-missing');
}

test('every code has its example', () => {
  const shown = EXAMPLES.map((name) => name.replace('.stoke', '').replace('-', '/'));
  expect([...shown, ...WITHOUT_EXAMPLE].sort()).toEqual(allCodes());
});

test.each(EXAMPLES)('%s gives its finding and no other', (example) => {
  const codes = new Set(findingsIn(example).map(({ code }) => code));
  // What is suspended is suspended by sixteen lines that cannot be read.
  if (example === 'kind-suspended.stoke') codes.delete('syntax/missing');
  expect([...codes]).toEqual([codeOf(example)]);
});

test('what they say', async () => {
  const told = EXAMPLES.map((example) => {
    const text = readFileSync(path.join(FOLDER, example), 'utf8');
    const lines = new Lines(text);
    return findingsIn(example).map(({ severity, code, message, place, fixes }) => {
      const { line, column } = lines.position(place.start);
      const mends = fixes.map(({ title, preferred }) => `  mend${preferred ? ' (preferred)' : ''}: ${title}`);
      return [
        `${code} ${severity} ${line}:${column} at \`${text.slice(place.start, place.end)}\``,
        `  ${message}`,
        ...mends,
      ].join('\n');
    });
  });
  await expect(`${told.flat().join('\n\n')}\n`).toMatchFileSnapshot('snapshots/examples.txt');
});
