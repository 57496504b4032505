// Which phases a burn lets form: those that are allowed, or all, without those that are barred. Plain lists of formulas, so
// that a question can be handed to another thread.
// Knows no burn. Invariant: a formula without a phase stands for all phases of its composition.

import { compositionKey } from '../substance/formula.ts';
import type { Formula } from '../substance/formula.ts';
import type { ThermoPhase } from '../substance/phases.ts';

export interface AdmittedProducts {
  /** Absent: every phase of the tables. */
  readonly allowed?: readonly Formula[];
  readonly barred?: readonly Formula[];
}

/** Whether a phase may form; undefined where all may. */
export function admittanceOf({
  allowed,
  barred = [],
}: AdmittedProducts): ((phase: ThermoPhase) => boolean) | undefined {
  if (allowed === undefined && barred.length === 0) return undefined;
  return (phase) =>
    (allowed === undefined || allowed.some((formula) => stands(formula, phase))) &&
    !barred.some((formula) => stands(formula, phase));
}

function stands(formula: Formula, phase: ThermoPhase): boolean {
  return (
    compositionKey(formula) === compositionKey(phase.formula) &&
    (formula.phase === undefined || formula.phase === phase.formula.phase)
  );
}
