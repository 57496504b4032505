// Says, in one line on standard error, that the program itself failed, so that nobody looks for the fault in a scenario.
// The stack is shown only when asked for with STOKEHOLD_DEBUG. Invariant: saying so never throws.

import type { Io } from './io.ts';

/** `where` continues the sentence: `while working out trial.stoke`. */
export function sayProgramFault(error: unknown, io: Pick<Io, 'problem' | 'environment'>, where = ''): void {
  const message = error instanceof Error ? error.message : String(error);
  const first = message.split('\n')[0] ?? '';
  io.problem(
    `stokehold: a fault of the program${where === '' ? '' : ` ${where}`}, not of your scenario: ${first}. Please report it.\n`,
  );
  if (io.environment['STOKEHOLD_DEBUG'] && error instanceof Error) io.problem(`${error.stack ?? ''}\n`);
}
