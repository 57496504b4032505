// The tests that run inside the editor's extension host, on the installed .vsix, by the editor's own programming
// interface. The same file serves a desktop editor and the stand-in. Knows no selector of the workbench's page.
// Source of the entry point's form: VS Code's "Testing Extensions" (a module that exports `run`).
import './activation.ts';
import './answers.ts';
import './typing.ts';
import { runRegistered } from './harness.ts';

/** Called by the editor once its window is up. Rejects when a test failed. */
export async function run(): Promise<void> {
  const resultsFile = process.env['STOKEHOLD_RESULTS'];
  if (resultsFile === undefined) throw new Error('STOKEHOLD_RESULTS names no file for the counts');
  await runRegistered(resultsFile);
}
