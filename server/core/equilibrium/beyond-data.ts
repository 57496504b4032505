// Which phases of a state lean on their data being carried on past the temperatures they were measured for.
// Knows no state's kind: for equilibria and for frozen compositions alike. Invariant: what is a trace of the mass decides
// nothing, and is not among them.

import type { CandidateSet } from './candidates.ts';
import { at } from './entry.ts';

/** A phase with less of the mass than this decides nothing by its extrapolated data. */
const leastShare = 1e-6;
/** In K: at an end of its data a phase is inside them, whichever way that was rounded. */
const rounding = 1e-6;

/** By index, of amounts in mol in the order of the candidates' phases. */
export function phasesBeyondData(
  { phases, molarMassKgPerMol }: CandidateSet,
  amountsMol: Float64Array,
  temperatureK: number,
  massKg: number,
): number[] {
  const beyond: number[] = [];
  phases.forEach(({ validK: [fromK, toK] }, phase) => {
    if (at(amountsMol, phase) * at(molarMassKgPerMol, phase) <= leastShare * massKg) return;
    if (temperatureK < fromK - rounding || temperatureK > toK + rounding) beyond.push(phase);
  });
  return beyond;
}
