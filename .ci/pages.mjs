// Writes the reference pages of examples/reference/ that are made from the program's own tables: `npm run pages`.
// A page is a row of the table below: its file, the modules it is made from, and how. What a page says is the business of
// server/report/; a test of the same name fails when a page is stale. The page of the fit is written by fit.mjs.

import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { build } from 'esbuild';

const root = path.resolve(import.meta.dirname, '..');

const pages = [
  {
    file: 'catalogue.md',
    modules: [
      'server/report/catalogue-page.ts',
      'server/core/substance/records.ts',
      'server/core/substance/hazard-records.ts',
    ],
    write: ({ cataloguePage, substanceRecords, hazardRecords, sourceRecords, hazardSourceRecords }) =>
      cataloguePage(
        { records: substanceRecords, hazards: hazardRecords, sources: [...sourceRecords, ...hazardSourceRecords] },
        'npm run pages',
      ),
  },
  {
    file: 'language.md',
    modules: ['server/report/language-page.ts'],
    write: ({ languagePage }) => languagePage('npm run pages'),
  },
  {
    file: 'codes.md',
    modules: ['server/report/codes-page.ts', 'test/support/code-entries.ts'],
    write: ({ codesPage, codeEntries }) => codesPage(codeEntries(root), 'npm run pages'),
  },
  {
    file: 'hazards.md',
    modules: ['server/report/hazards-page.ts'],
    write: ({ hazardsPage }) => hazardsPage('npm run pages'),
  },
];

for (const { file, modules, write } of pages) {
  const text = write(await load(modules));
  writeFileSync(path.join(root, 'examples/reference', file), text);
  console.log(`${file}: ${text.split('\n').length} lines`);
}

/** All that some of our own TypeScript modules export, together. */
async function load(modules) {
  const { outputFiles } = await build({
    stdin: {
      contents: modules.map((module) => `export * from './${module}';`).join('\n'),
      resolveDir: root,
    },
    bundle: true,
    write: false,
    format: 'esm',
    platform: 'node',
    logLevel: 'error',
  });
  return import(`data:text/javascript;base64,${Buffer.from(outputFiles[0].text).toString('base64')}`);
}
