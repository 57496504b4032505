// Balances that the plentiful phases leave empty decide themselves between traces, over many powers of ten, where a Newton step
// creeps by a factor of e at a time.
// Knows no condensed phases. Invariant: potentials of plentiful basis phases are not touched.
// Method: one balance at a time, what its gases make set equal to what they take, logarithmically.

import { at, at32 } from './entry.ts';
import { takeFractions } from './newton.ts';
import type { Aim } from './newton.ts';
import type { Work } from './work.ts';

const mostSweeps = 12;
/** Basis phases with more than this share of the gas are plentiful: Newton's steps serve them. */
const mostOfTrace = 0.05;
/** A change of a potential below this is left to Newton's step. */
const leastChange = 0.7;

/**
 * A balance whose basis phase the vertex leaves (nearly) empty decides itself between traces, over many powers of ten: what its
 * gases make of it is set equal to what they take, logarithmically, one balance at a time.
 */
export function balanceTraces(work: Work, aim: Aim): void {
  const { rank, amounts, isForced, gases, gasCount, nu, width, fraction, potential } = work;
  const limit = mostOfTrace * work.gasAmount;
  let hasTraces = false;
  for (let k = 0; k < rank; k += 1) hasTraces ||= at(amounts, k) < limit;
  if (!hasTraces) return;
  const perFraction = aim.isVolume ? aim.gasKPerBar / work.temperatureK : work.gasAmount;
  for (let sweep = 0; sweep < mostSweeps; sweep += 1) {
    let largest = 0;
    for (let k = 0; k < rank; k += 1) {
      if (at(amounts, k) >= limit || isForced[k] === 1 || hasCondensed(work, k)) continue;
      let made = Math.max(0, -at(amounts, k));
      let taken = Math.max(0, at(amounts, k));
      let madeSlope = 0;
      let takenSlope = 0;
      for (let index = 0; index < gasCount; index += 1) {
        const gas = at32(gases, index);
        const own = at(nu, gas * width + k);
        if (own === 0) continue;
        const amount = at(fraction, gas) * perFraction;
        if (own > 0) {
          made += own * amount;
          madeSlope += own * own * amount;
        } else {
          taken -= own * amount;
          takenSlope += own * own * amount;
        }
      }
      if (!(made > 0) || !(taken > 0)) continue;
      const slope = madeSlope / made + takenSlope / taken;
      if (!(slope > 0)) continue;
      const change = Math.min(60, Math.max(-60, Math.log(taken / made) / slope));
      if (Math.abs(change) < leastChange) continue;
      potential[k] = at(potential, k) + change;
      largest = Math.max(largest, Math.abs(change));
      takeFractions(work, aim);
    }
    if (largest === 0) return;
  }
}

/** Whether a condensed phase that is present stands in a balance: gases alone do not decide it then. */
function hasCondensed({ present, presentCount, nu, width }: Work, k: number): boolean {
  for (let index = 0; index < presentCount; index += 1) if (at(nu, at32(present, index) * width + k) !== 0) return true;
  return false;
}
