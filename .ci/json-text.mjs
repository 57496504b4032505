// A plug-in of the bundler: takes the files of data folders in as texts that are parsed when the program starts. As literals
// of the program they would be compiled with it, which takes longer. Knows no data. Invariant: the data are the same.
// Source: "The cost of JavaScript in 2019" (v8.dev), on `JSON.parse`; measured on our own bundles.
import { readFileSync } from 'node:fs';

export const jsonAsText = {
  name: 'json-as-text',
  setup(build) {
    build.onLoad({ filter: /[\\/]data[\\/].*\.json$/ }, ({ path }) => {
      const text = JSON.stringify(JSON.parse(readFileSync(path, 'utf8')));
      return { contents: `export default JSON.parse(${JSON.stringify(text)});`, loader: 'js' };
    });
  },
};
