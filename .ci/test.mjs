// Everything the project checks, from a fresh machine on: set-up, lint, types, package, unit, reference and protocol
// tests, and the tests in a real editor with the package installed. Ends with `N passed, N failed` on a line of its
// own, and with exit code 1 when anything failed. Invariant: a stage that breaks counts as a failure and does not keep
// the later stages from running; nothing is skipped.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { packageChecks } from './package-check.mjs';
import { countReferenceRows } from './reference-rows.mjs';
import { setUpEditor, setUpPackages } from './set-up.mjs';
import { readVitestCounts, runVitest } from './vitest.mjs';

const root = path.resolve(import.meta.dirname, '..');
process.chdir(root);
const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-test-'));
process.once('exit', () => rmSync(scratch, { recursive: true, force: true }));

const total = { passed: 0, failed: 0 };
const timings = [];
const failures = [];

const treeBefore = readTree();
stage('packages', setUpPackages);
if (total.failed === 0) {
  stage('lint', () => {
    tool('eslint', 'eslint', 'eslint/bin/eslint.js', ['.']);
    tool('layout of the text', 'prettier', 'prettier/bin/prettier.cjs', ['--check', '--log-level=warn', '.']);
    tool('unused and undeclared', 'knip', 'knip/bin/knip.js', ['--no-progress', '--no-config-hints']);
  });
  stage('types', () => {
    tool('types', 'tsc', 'typescript-native/bin/tsc', ['-p', '.']);
    tool('types without Node', 'tsc', 'typescript-native/bin/tsc', ['-p', 'server']);
  });
  stage('build and package', () => check('package', () => run('npm', ['run', '--silent', 'package'])));
  stage('unit, reference and protocol tests', () => {
    const report = path.join(scratch, 'unit.json');
    add('tests', readVitestCounts(report, runVitest(report, [])));
  });
  stage('package check', () => {
    for (const [name, body] of Object.entries(packageChecks)) check(name, body);
  });
  stage('editor tests', () => {
    setUpEditor();
    const countsFile = path.join(scratch, 'editor.json');
    const result = spawnSync(process.execPath, ['.ci/editor-tests.mjs', '--counts', countsFile], { stdio: 'inherit' });
    if (!existsSync(countsFile)) throw new Error(`the editor tests ended with ${result.status ?? result.signal}`);
    add('editor tests', JSON.parse(readFileSync(countsFile, 'utf8')));
  });
  // Where people work the tree changes meanwhile; on a machine that only tests, a change is the tests' own.
  if (process.env.CI) {
    stage('tidiness', () =>
      check('the tests leave the tree as it was', () => {
        if (readTree() !== treeBefore) throw new Error(`now changed:\n${readTree()}`);
      }),
    );
  }
}

let rows;
stage('reference rows', () => {
  const counted = countReferenceRows('test/reference');
  rows = counted.counts;
  check('every reference row says where it comes from', () => {
    if (counted.problems.length > 0) throw new Error(counted.problems.join('\n'));
  });
});

console.log(`\n${timings.map(({ name, seconds }) => `${seconds.toFixed(1).padStart(7)} s  ${name}`).join('\n')}`);
if (failures.length > 0) console.log(`\nfailed:\n${failures.map((failure) => `  ${failure}`).join('\n')}`);
if (rows) {
  const { seen, 'from memory': fromMemory, 'common practice': commonPractice } = rows;
  console.log(`\nreference rows: ${seen} seen, ${fromMemory} from memory, ${commonPractice} common practice`);
}
console.log(`${total.passed} passed, ${total.failed} failed`);
process.exit(total.failed === 0 ? 0 : 1);

function stage(name, body) {
  console.log(`\n== ${name}`);
  const started = Date.now();
  try {
    body();
  } catch (error) {
    console.log(error instanceof Error ? error.message : error);
    add(name, { passed: 0, failed: 1 });
  }
  timings.push({ name, seconds: (Date.now() - started) / 1000 });
}

function check(name, body) {
  try {
    body();
    console.log(`ok    ${name}`);
    add(name, { passed: 1, failed: 0 });
  } catch (error) {
    console.log(`FAIL  ${name}\n${error instanceof Error ? error.message : error}`);
    add(name, { passed: 0, failed: 1 });
  }
}

function tool(name, title, program, args) {
  check(`${name} (${title} ${args.join(' ')})`, () => {
    run(process.execPath, [path.join('node_modules', program), ...args]);
  });
}

function run(command, args) {
  const result = spawnSync(command, args, { stdio: ['ignore', 'inherit', 'inherit'] });
  if (result.error) throw result.error;
  if (result.status !== 0) throw new Error(`${command} ended with ${result.status ?? result.signal}`);
}

function add(name, { passed, failed }) {
  total.passed += passed;
  total.failed += failed;
  if (failed > 0) failures.push(`${name}: ${failed}`);
}

function readTree() {
  return spawnSync('git', ['status', '--porcelain'], { encoding: 'utf8' }).stdout;
}
