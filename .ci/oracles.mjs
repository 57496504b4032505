// Asks outside programs for reference values and writes their answers as rows under test/reference/: `npm run oracles`,
// or `npm run oracles -- units-gnu` for one of them. The tests read the rows and never call the programs.
// Each oracle is one file in .ci/oracles/, whose name is the name of the file it writes. It exports
//   packages   Debian packages it needs, installed here when this runs as root
//   program    [command, ...arguments] that runs only if the program is there (its version, for instance)
//   answer     async ({ run, load }) => { source, command, rows }: the document to write
// A program that is missing and cannot be installed is said and skipped; its rows stay as they are.

import { spawnSync } from 'node:child_process';
import { readdirSync, writeFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'esbuild';
import { format } from 'prettier';

const root = join(dirname(fileURLToPath(import.meta.url)), '..');
const wanted = process.argv.slice(2);
const names = readdirSync(join(root, '.ci', 'oracles'))
  .filter((file) => file.endsWith('.mjs'))
  .map((file) => file.slice(0, -'.mjs'.length))
  .sort();
const isRoot = process.getuid?.() === 0;
let aptUpdated = false;
let failures = 0;

for (const name of wanted.filter((each) => !names.includes(each))) {
  console.error(`There is no oracle called ${name}. There are: ${names.join(', ')}.`);
  failures += 1;
}
for (const name of names) {
  if (wanted.length > 0 && !wanted.includes(name)) continue;
  const oracle = await import(pathToFileURL(join(root, '.ci', 'oracles', `${name}.mjs`)).href);
  if (!isThere(oracle.program) && !install(oracle.packages)) {
    console.log(`${name}: not asked; install ${oracle.packages.join(' ')} first (as root this script does it).`);
    failures += 1;
    continue;
  }
  const document = await oracle.answer({ run, load });
  const file = join(root, 'test', 'reference', `${name}.json`);
  writeFileSync(file, await format(JSON.stringify(document), { parser: 'json', printWidth: 160 }));
  console.log(`${name}: ${document.rows.length} rows from ${document.source}`);
}
process.exitCode = failures > 0 ? 1 : 0;

function isThere([command, ...args]) {
  const { status } = spawnSync(command, args, { stdio: 'ignore' });
  return status === 0;
}

function install(packages) {
  if (!isRoot) return false;
  const apt = (...args) =>
    spawnSync('apt-get', args, { stdio: 'ignore', env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } }).status;
  if (!aptUpdated) apt('update');
  aptUpdated = true;
  return apt('install', '-y', '--no-install-recommends', ...packages) === 0;
}

/** Runs a program and gives what it prints; a failure is an error that names the command. */
function run(command, args, input) {
  const result = spawnSync(command, args, { input, encoding: 'utf8', env: { ...process.env, LC_ALL: 'C.UTF-8' } });
  if (result.error) throw result.error;
  if (result.status !== 0) throw new Error(`${command} ${args.join(' ')}: ${result.stdout}${result.stderr}`);
  return result.stdout.trim();
}

/** Loads one of our own TypeScript modules, so that an oracle can go through our tables. */
async function load(path) {
  const { outputFiles } = await build({
    entryPoints: [join(root, path)],
    bundle: true,
    write: false,
    format: 'esm',
    platform: 'node',
    logLevel: 'error',
  });
  return import(`data:text/javascript;base64,${Buffer.from(outputFiles[0].text).toString('base64')}`);
}
