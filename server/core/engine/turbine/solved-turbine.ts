// All corners of a gas turbine, and which of them counts: as for an engine with pistons (../solved-engine.ts).
// Knows no figures. Invariant: the corner that counts is the one with the lowest brake work; all corners are there to be read.

import { corners } from '../expansion.ts';
import type { Corner } from '../expansion.ts';
import { hasParticles } from '../solved-engine.ts';
import { gasTurbine, gasTurbineCycle } from './gas-turbine-cycle.ts';
import type { GasTurbineCycle, GasTurbineInput, TurbineFault } from './gas-turbine.ts';
import { elementsOf } from './turbine-passage.ts';
import type { GasTurbine } from './turbine-passage.ts';

export interface SolvedTurbine {
  readonly kind: 'solved-turbine';
  readonly turbine: GasTurbine;
  readonly cautious: GasTurbineCycle;
  /** In the order of `corners`; one where nothing condenses. */
  readonly cycles: readonly GasTurbineCycle[];
}

/** The turbine, or the first fault of any corner. */
export function solveTurbine(input: GasTurbineInput): SolvedTurbine | TurbineFault {
  const turbine = gasTurbine(input);
  if (turbine.kind === 'fault') return turbine;
  const asked: readonly Corner[] = hasParticles(elementsOf(input, 1, 1).keys())
    ? corners
    : [{ chemistry: input.frozenBelowK === null ? 'equilibrium' : 'frozen', particles: 'with-gas' }];
  const cycles: GasTurbineCycle[] = [];
  for (const corner of asked) {
    const solved = gasTurbineCycle(turbine, corner, cycles[0]);
    if (solved.kind === 'fault') return solved;
    cycles.push(solved);
  }
  const [first, ...others] = cycles;
  if (first === undefined) throw new Error('a turbine has a corner');
  const cautious = others.reduce((lowest, one) => (one.brakeWorkJ < lowest.brakeWorkJ ? one : lowest), first);
  return { kind: 'solved-turbine', turbine, cautious, cycles };
}
