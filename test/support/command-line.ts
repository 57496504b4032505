// Asks the built command line, dist/cli.cjs, and reads its answer. Knows the contract's form and no value.
// Invariant: the answer is the program's own, run as a user runs it, in the file's own folder; a run that prints no
// answer throws with the program's words. Source of the form: the contract of `evaluate --format json`, schema 1.
import { spawnSync } from 'node:child_process';
import path from 'node:path';
import type { JsonDocument } from '../../server/report/json.ts';

/** What `stokehold evaluate FILE --format json` prints. */
export function evaluateOnCommandLine(file: string): JsonDocument {
  const { stdout, stderr } = runCommandLine(file, ['evaluate', path.basename(file), '--format', 'json']);
  if (!stdout.startsWith('{')) throw new Error(`The command line printed no JSON:\n${stdout}${stderr}`);
  return JSON.parse(stdout) as JsonDocument; // the contract's own tests check the form
}

/** Formats the file in place, as `stokehold format FILE` does. */
export function formatOnCommandLine(file: string): void {
  const { status, stdout, stderr } = runCommandLine(file, ['format', path.basename(file)]);
  if (status !== 0) throw new Error(`The command line did not format:\n${stdout}${stderr}`);
}

/** A figure's value in its contract unit; throws naming what is there when it is not. */
export function figureIn(answer: JsonDocument, definition: string, id: string): number {
  const definitions = answer.files.flatMap((file) => file.definitions ?? []);
  const figures = definitions.find(({ name }) => name === definition)?.figures;
  const figure = figures?.find((candidate) => candidate.id === id);
  if (!figure) {
    const found = figures?.map((candidate) => candidate.id) ?? definitions.map(({ name }) => name);
    throw new Error(`No ${id} of ${definition}; there are: ${found.join(', ')}`);
  }
  return figure.value;
}

/** The codes and messages of the findings, sorted, as `code: message`. */
export function findingsIn(answer: JsonDocument): string[] {
  return answer.files.flatMap(({ findings }) => findings.map(({ code, message }) => `${code}: ${message}`)).sort();
}

function runCommandLine(
  file: string,
  args: readonly string[],
): { status: number | null; stdout: string; stderr: string } {
  const program = path.join(process.env['STOKEHOLD_PROJECT'] ?? process.cwd(), 'dist/cli.cjs');
  const result = spawnSync('node', [program, ...args], { cwd: path.dirname(file), encoding: 'utf8' });
  if (result.error) throw result.error;
  return result;
}
