// Runs vitest and reads how many tests passed and failed. Knows no test. Invariant: a run that ends badly without
// naming a failed test (a file that does not load, a crash) counts as one failure, so it can never pass unseen.
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '..');

/** Runs vitest once with its usual output, and its report as JSON in the file. Returns the exit code. */
export function runVitest(report, args) {
  const program = path.join(root, 'node_modules/vitest/vitest.mjs');
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
  const result = spawnSync(process.execPath, [program, 'run', ...reporters, ...args], { cwd: root, stdio: 'inherit' });
  return result.status ?? 1;
}

/** The counts of a finished run. A skipped test counts as failed: the project has none. */
export function readVitestCounts(report, exitCode) {
  if (!existsSync(report)) return { passed: 0, failed: 1 };
  const { numTotalTests, numPassedTests } = JSON.parse(readFileSync(report, 'utf8'));
  const failed = numTotalTests - numPassedTests;
  return { passed: numPassedTests, failed: failed === 0 && exitCode !== 0 ? 1 : failed };
}
