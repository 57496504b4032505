// Asks the built command line, dist/cli.cjs, and reads its JSON answer. Knows the contract's form and no value.
// Invariant: the answer is the program's own, run as a user runs it; a run that prints no JSON rejects with its words.
// Source of the form: the reference of `evaluate --format json`, schema 1.
import { spawnSync } from 'node:child_process';
import path from 'node:path';

/** The part of the contract that the tests ask for. */
export interface EvaluateAnswer {
  readonly schema: 1;
  readonly files: readonly {
    readonly path: string;
    readonly definitions: readonly {
      readonly kind: string;
      readonly name: string;
      readonly figures: readonly { readonly id: string; readonly value: number; readonly unit: string }[];
    }[];
    readonly values: readonly { readonly name: string; readonly value: number; readonly unit: string }[];
    readonly findings: readonly AnsweredFinding[];
    readonly expectations: readonly { readonly line: number; readonly holds: boolean | null }[];
  }[];
}

/** A finding as the command line prints it: lines and columns 1-based, the end exclusive. */
export interface AnsweredFinding {
  readonly code: string;
  readonly severity: string;
  readonly message: string;
  readonly line: number;
  readonly column: number;
  readonly endLine: number;
  readonly endColumn: number;
}

/** What `stokehold evaluate FILE --format json` prints, run in the file's own folder. */
export function evaluateOnCommandLine(file: string): EvaluateAnswer {
  const program = path.join(process.env['STOKEHOLD_PROJECT'] ?? process.cwd(), 'dist/cli.cjs');
  const args = [program, 'evaluate', path.basename(file), '--format', 'json'];
  const { stdout, stderr, error } = spawnSync('node', args, { cwd: path.dirname(file), encoding: 'utf8' });
  if (error) throw error;
  if (!stdout.startsWith('{')) throw new Error(`The command line printed no JSON:\n${stdout}${stderr}`);
  return JSON.parse(stdout) as EvaluateAnswer; // the contract test checks the form
}

/** The figure of a definition in the answer; throws naming what is there when it is not. */
export function figureIn(answer: EvaluateAnswer, definition: string, id: string): number {
  const definitions = answer.files.flatMap((file) => file.definitions);
  const figures = definitions.find(({ name }) => name === definition)?.figures;
  const figure = figures?.find((candidate) => candidate.id === id);
  if (!figure) {
    const found = figures?.map((candidate) => candidate.id) ?? definitions.map(({ name }) => name);
    throw new Error(`No ${id} of ${definition}; there are: ${found.join(', ')}`);
  }
  return figure.value;
}
