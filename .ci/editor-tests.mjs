// Runs the editor tests on the packaged .vsix: installs it into a folder of its own, then runs the tests inside the
// extension host by @vscode/test-electron, then those that look at the window. A desktop VS Code named by
// STOKEHOLD_VSCODE takes the first; without one the editor host stands in, with the same test file. The second always
// use the editor host. With --picture it takes client/media/editor.png instead and runs no test.
// Prints nothing but the tests' own output; the counts go to the file named by --counts. Needs `npm run package` first.
import { spawnSync } from 'node:child_process';
import { chmodSync, existsSync, mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { resolveCliPathFromVSCodeExecutablePath, runTests } from '@vscode/test-electron';
import { build } from 'esbuild';
import { readVitestCounts, runVitest } from './vitest.mjs';

const root = path.resolve(import.meta.dirname, '..');
const { values } = parseArgs({ options: { counts: { type: 'string' }, picture: { type: 'boolean' } } });
const { version } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8'));
const vsix = path.join(root, `dist/stokehold-${version}.vsix`);
if (!existsSync(vsix)) throw new Error(`${vsix} is missing: npm run package makes it`);

const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-editor-tests-'));
process.once('exit', () => rmSync(scratch, { recursive: true, force: true, maxRetries: 10 }));
// Inside the project, so that the bundles find playwright-core.
const bundles = path.join(root, 'node_modules/.cache/editor-tests');
process.env.STOKEHOLD_PROJECT = root;

await bundle('test/editor/host/launch-editor.ts', 'launch-editor.mjs', 'esm');
const standIn = path.join(bundles, 'launch-editor.mjs');
chmodSync(standIn, 0o755);

const extensions = installInto('extensions', standIn);
process.env.STOKEHOLD_EXTENSIONS = extensions;
const counts = { passed: 0, failed: 0 };
if (values.picture) {
  await takePicture();
} else {
  await inHostTests();
  windowTests();
}
if (values.counts) writeFileSync(values.counts, JSON.stringify(counts));
process.exit(counts.failed === 0 ? 0 : 1);

async function inHostTests() {
  await bundle('test/editor/in-host/index.ts', 'in-host.cjs', 'cjs');
  const editor = process.env.STOKEHOLD_VSCODE ?? standIn;
  const resultsFile = path.join(scratch, 'in-host.json');
  const folder = path.join(scratch, 'scenarios');
  // What runTests loads from source is an empty extension: ours is the one installed from the package.
  const bystander = path.join(scratch, 'bystander');
  for (const made of [folder, bystander]) mkdirSync(made);
  const manifest = { name: 'bystander', publisher: 'stokehold-tests', version: '1.0.0', engines: { vscode: '*' } };
  writeFileSync(path.join(bystander, 'package.json'), JSON.stringify(manifest));
  console.log(`in the extension host of ${editor === standIn ? 'the editor host' : editor}`);
  try {
    await runTests({
      vscodeExecutablePath: editor,
      extensionDevelopmentPath: bystander,
      extensionTestsPath: path.join(bundles, 'in-host.cjs'),
      extensionTestsEnv: { STOKEHOLD_RESULTS: resultsFile, STOKEHOLD_PROJECT: root },
      launchArgs: [
        folder,
        `--extensions-dir=${editor === standIn ? extensions : installInto('desktop-extensions', editor)}`,
        `--user-data-dir=${path.join(scratch, 'user-data')}`,
      ],
    });
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    if (!existsSync(resultsFile)) counts.failed += 1; // the run broke before a test could
  }
  if (existsSync(resultsFile)) add(JSON.parse(readFileSync(resultsFile, 'utf8')));
  else if (counts.failed === 0) counts.failed += 1;
}

function windowTests() {
  const report = path.join(scratch, 'window.json');
  add(readVitestCounts(report, runVitest(report, ['--config', 'test/editor/vitest.config.mts'])));
}

async function takePicture() {
  await bundle('test/editor/picture.ts', 'picture.mjs', 'esm');
  const result = spawnSync(process.execPath, [path.join(bundles, 'picture.mjs')], { cwd: root, stdio: 'inherit' });
  if (result.status !== 0) counts.failed += 1;
}

function add({ passed, failed }) {
  counts.passed += passed;
  counts.failed += failed;
}

/** Installs the .vsix into a new folder through the editor's own command line. */
function installInto(name, editor) {
  const folder = path.join(scratch, name);
  mkdirSync(folder);
  const userData = `--user-data-dir=${path.join(scratch, `${name}-user-data`)}`;
  const args = ['--install-extension', vsix, `--extensions-dir=${folder}`, userData];
  // A desktop editor installs through the command line program beside it.
  const program = editor === standIn ? standIn : resolveCliPathFromVSCodeExecutablePath(editor);
  const result = spawnSync(program, args, { encoding: 'utf8' });
  if (result.status !== 0) throw new Error(`The editor did not install ${vsix}:\n${result.stdout}${result.stderr}`);
  console.log(result.stdout.trim().split('\n').at(-1));
  return folder;
}

async function bundle(source, name, format) {
  await build({
    absWorkingDir: root,
    entryPoints: [source],
    outfile: path.join(bundles, name),
    bundle: true,
    platform: 'node',
    target: 'node20',
    format,
    packages: 'external',
    sourcemap: 'inline',
    ...(format === 'esm' ? { banner: { js: '#!/usr/bin/env node' } } : {}),
    logLevel: 'warning',
  });
}
