// Bundles the programs into dist/: the editor's side, the language server, its worker and the command line, each one
// CommonJS file that needs no node_modules. Writes beside them which packages went in (dist/meta.json), for the third-party notices.
// Knows no tests and no packaging. Invariant: the same sources give the same bytes; `vscode` alone stays outside.
import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { build } from 'esbuild';
import { jsonAsText } from './json-text.mjs';

const root = path.resolve(import.meta.dirname, '..');
const minify = process.argv.includes('--minify');

const programs = [
  { source: 'client/extension.ts', bundle: 'extension.cjs' },
  { source: 'server/main.ts', bundle: 'server.cjs' },
  { source: 'server/jobs/worker.ts', bundle: 'worker.cjs' },
  // A bundle that throws prints its own line: the command line's stays readable, also in the package.
  { source: 'server/cli.ts', bundle: 'cli.cjs', readable: true, banner: '#!/usr/bin/env node' },
].filter(({ source }) => existsSync(path.join(root, source)));

const dist = path.join(root, 'dist');
mkdirSync(dist, { recursive: true });
for (const stale of ['extension.cjs', 'server.cjs', 'worker.cjs', 'cli.cjs', 'meta.json']) {
  rmSync(path.join(dist, stale), { force: true });
}

const inputs = {};
for (const { source, bundle, readable, banner } of programs) {
  const result = await build({
    absWorkingDir: root,
    entryPoints: [source],
    outfile: path.join(dist, bundle),
    bundle: true,
    platform: 'node',
    format: 'cjs',
    target: 'node20',
    external: ['vscode'],
    plugins: [jsonAsText],
    minify: minify && !readable,
    legalComments: 'none',
    ...(banner ? { banner: { js: banner } } : {}),
    metafile: true,
    logLevel: 'warning',
  });
  Object.assign(inputs, result.metafile.inputs);
}
writeFileSync(path.join(dist, 'meta.json'), JSON.stringify({ inputs: Object.keys(inputs).sort() }, undefined, 1));
console.log(`built ${programs.map(({ bundle }) => `dist/${bundle}`).join(', ')}${minify ? ' (minified)' : ''}`);
