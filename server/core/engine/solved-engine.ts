// All corners of an engine's cycle, and which of them counts: for a charge whose products condense the four of its particles
// and of its chemistry, for others the one there is.
// Knows no figures. Invariant: the corner that counts is the one with the lowest brake work, so that nobody reckons with heat
// that particles may keep; all corners are there to be read.

import { corners } from './expansion.ts';
import type { Corner } from './expansion.ts';
import { canCondense } from './loss-tree.ts';
import type { CycleFault, ReciprocatingInput } from './reciprocating.ts';
import { engineCharge, workCycle } from './work-cycle.ts';
import type { EngineCharge, SolvedCycle } from './work-cycle.ts';

export interface SolvedEngine {
  readonly kind: 'engine';
  readonly charge: EngineCharge;
  /** The corner with the lowest brake work. */
  readonly cautious: SolvedCycle;
  /** All of them, in the order of `corners`; one where nothing condenses. */
  readonly cycles: readonly SolvedCycle[];
}

/** Whether products of these elements condense in an engine, so that all four corners are worked out. */
export function hasParticles(symbols: Iterable<string>): boolean {
  return canCondense(symbols);
}

/** The engine, or the first fault of any corner. */
export function solveEngine(input: ReciprocatingInput): SolvedEngine | CycleFault {
  const charge = engineCharge(input);
  if ('kind' in charge) return charge;
  const asked: readonly Corner[] = hasParticles(charge.burningMol.keys())
    ? corners
    : [{ chemistry: input.frozenBelowK === null ? 'equilibrium' : 'frozen', particles: 'with-gas' }];
  const cycles: SolvedCycle[] = [];
  for (const corner of asked) {
    const solved = workCycle(charge, corner, cycles[0]);
    if (solved.kind === 'fault') return solved;
    cycles.push(solved);
  }
  const [first, ...others] = cycles;
  if (first === undefined) throw new Error('an engine has a corner');
  const cautious = others.reduce(
    (lowest, one) => (one.cycle.balance.brakeWorkJ < lowest.cycle.balance.brakeWorkJ ? one : lowest),
    first,
  );
  return { kind: 'engine', charge, cautious, cycles };
}
