// The sure way down, at a held temperature and pressure: an interior path through the dual problem, from a start that always
// exists to the optimum that always exists when the elements can be held at all. It costs a few times what the quick way
// costs and is taken when that loses itself, or when fewer phases are present than there are balances and no gas is, where
// potentials are not unique and the path ends in their middle.
// Knows no temperature but the one held. Invariant: every iterate has all phases strictly below equilibrium (sum of fractions
// below 1, affinities below 0), so its potentials bound the Gibbs energy from below; the multipliers are the phase amounts.
// Method: max b·π subject to ln Σ exp(a_j·π - c_j) <= 0 and a_c·π <= g_c is convex; primal-dual barrier steps (Boyd and
// Vandenberghe, Convex Optimization, 2004, chapter 11).

import { solveDense } from './dense.ts';
import { at, at32 } from './entry.ts';
import { affinityOf, takeFractions } from './newton.ts';
import type { Aim } from './newton.ts';
import { addPresent } from './descent.ts';
import type { Work } from './work.ts';

const mostSteps = 200;
/** Gaps (amount times distance from equilibrium, the mean over the phases) at which the state is shown; then the path ends. */
const stations = [1e-9, 1e-11, 1e-13, 1e-16, 1e-20, 1e-24, 1e-30, 1e-37, 1e-45] as const;
const lastGap = 1e-45;
/** How far the gas's distance from equilibrium may be off its value; the next step takes it back. */
const rounding = 1e-13;

/**
 * Follows the path for the present `cost`, basis and amounts. At each station the state is left in `work` and `accept` is
 * asked; true ends the path. Where the optimum is unique the last stations are the best; where it is not, rounding grows with
 * the distance and an earlier one is.
 */
export function followCentre<Answer>(work: Work, aim: Aim, accept: () => Answer | undefined): Answer | undefined {
  const { rank, width, nu, stride, matrix, right, potential, condensed, condensedCount, gases, gasCount } = work;
  const direction = downhill(work);
  if (!enterInterior(work, aim, direction)) return undefined;
  const hasGas = gasCount > 0;
  const amount = new Float64Array(condensedCount);
  const slack = new Float64Array(condensedCount);
  const trial = new Float64Array(rank);
  const mean = new Float64Array(rank);
  let gasSlack = hasGas ? -Math.log(work.fractionSum) : 1;
  for (let index = 0; index < condensedCount; index += 1) {
    slack[index] = -affinityOf(work, at32(condensed, index));
  }
  // The gas's curved limit plus its slack: zero when its slack is its true distance.
  let gasMissing = 0;
  const count = condensedCount + (hasGas ? 1 : 0);
  let barrier = 1;
  let gasAmount = hasGas ? barrier / gasSlack : 0;
  for (let index = 0; index < condensedCount; index += 1) amount[index] = barrier / at(slack, index);
  const { temperatureK } = work;
  // A phase is present where its amount outweighs its distance from equilibrium.
  const takeOut = (): void => {
    work.presentCount = 0;
    work.isTied = false;
    work.gasAmount = hasGas && gasAmount > gasSlack ? gasAmount : 0;
    for (let index = 0; index < condensedCount; index += 1) {
      if (at(amount, index) > at(slack, index) && work.presentCount < work.width + 1) {
        addPresent(work, at32(condensed, index), at(amount, index));
      }
    }
  };
  let station = 0;
  for (let step = 0; step < mostSteps; step += 1) {
    // Matrix and right side of the potentials' system.
    matrix.fill(0, 0, rank * stride);
    for (let k = 0; k < rank; k += 1) {
      right[k] = at(work.amounts, k);
      mean[k] = 0;
    }
    if (hasGas) {
      const perFraction = 1 / work.fractionSum;
      for (let index = 0; index < gasCount; index += 1) {
        const gas = at32(gases, index);
        const share = at(work.fraction, gas) * perFraction;
        if (share === 0) continue;
        for (let k = 0; k < rank; k += 1) {
          const own = at(nu, gas * width + k) * share;
          if (own === 0) continue;
          mean[k] = at(mean, k) + own;
          for (let l = 0; l <= k; l += 1) {
            matrix[k * stride + l] = at(matrix, k * stride + l) + gasAmount * own * at(nu, gas * width + l);
          }
        }
      }
      const weight = gasAmount / gasSlack - gasAmount;
      const pull = (barrier + gasAmount * gasMissing) / gasSlack;
      for (let k = 0; k < rank; k += 1) {
        right[k] = at(right, k) - pull * at(mean, k);
        for (let l = 0; l <= k; l += 1) {
          matrix[k * stride + l] = at(matrix, k * stride + l) + weight * at(mean, k) * at(mean, l);
        }
      }
    }
    for (let index = 0; index < condensedCount; index += 1) {
      const column = at32(condensed, index) * width;
      const weight = at(amount, index) / at(slack, index);
      const pull = barrier / at(slack, index);
      for (let k = 0; k < rank; k += 1) {
        const own = at(nu, column + k);
        if (own === 0) continue;
        right[k] = at(right, k) - pull * own;
        for (let l = 0; l <= k; l += 1) {
          matrix[k * stride + l] = at(matrix, k * stride + l) + weight * own * at(nu, column + l);
        }
      }
    }
    for (let k = 0; k < rank; k += 1) {
      // A breath of regularity: where potentials are not unique the matrix is singular in the limit.
      matrix[k * stride + k] = at(matrix, k * stride + k) * (1 + 1e-14) + 1e-280;
      for (let l = 0; l < k; l += 1) matrix[l * stride + k] = at(matrix, k * stride + l);
    }
    if (solveDense(matrix, stride, rank, right, work.dense) === 0) return undefined;
    // New multipliers for the whole step, then the largest part of it that stays inside.
    let share = 1;
    let gasNext = 0;
    let gasSlackChange = 0;
    if (hasGas) {
      let along = 0;
      for (let k = 0; k < rank; k += 1) along += at(mean, k) * at(right, k);
      gasNext = (barrier + gasAmount * (gasMissing + along)) / gasSlack;
      gasSlackChange = -gasMissing - along;
      if (gasNext < 0.01 * gasAmount) share = Math.min(share, (0.99 * gasAmount) / (gasAmount - gasNext));
      if (gasSlackChange < -0.99 * gasSlack) share = Math.min(share, (0.99 * gasSlack) / -gasSlackChange);
    }
    for (let index = 0; index < condensedCount; index += 1) {
      const column = at32(condensed, index) * width;
      let along = 0;
      for (let k = 0; k < rank; k += 1) along += at(nu, column + k) * at(right, k);
      const before = at(amount, index);
      const next = (barrier + before * along) / at(slack, index);
      if (next < 0.01 * before) share = Math.min(share, (0.99 * before) / (before - next));
      if (along > 0.99 * at(slack, index)) share = Math.min(share, (0.99 * at(slack, index)) / along);
    }
    for (let k = 0; k < rank; k += 1) trial[k] = at(potential, k);
    let missingNext = 0;
    for (let tries = 0; ; tries += 1) {
      for (let k = 0; k < rank; k += 1) potential[k] = at(trial, k) + share * at(right, k);
      takeFractions(work, aim);
      if (!hasGas) break;
      const slackNext = gasSlack + share * gasSlackChange;
      missingNext = Math.log(work.fractionSum) + slackNext;
      if (missingNext <= Math.abs(gasMissing) + 0.5 * slackNext + rounding) break;
      if (tries > 60) return undefined;
      share *= 0.6;
    }
    for (let index = 0; index < condensedCount; index += 1) {
      const phase = at32(condensed, index);
      let along = 0;
      for (let k = 0; k < rank; k += 1) along += at(nu, phase * width + k) * at(right, k);
      const before = at(amount, index);
      const next = (barrier + before * along) / at(slack, index);
      amount[index] = before + share * (next - before);
      const left = at(slack, index) - share * along;
      slack[index] = left;
    }
    if (hasGas) {
      gasAmount += share * (gasNext - gasAmount);
      gasSlack += share * gasSlackChange;
      gasMissing = missingNext;
    }
    let gap = hasGas ? gasAmount * gasSlack : 0;
    for (let index = 0; index < condensedCount; index += 1) gap += at(amount, index) * at(slack, index);
    gap /= count;
    while (station < stations.length && gap <= (stations[station] ?? 0)) {
      station += 1;
      trial.set(potential.subarray(0, rank));
      takeOut();
      const answer = accept();
      if (answer !== undefined) return answer;
      potential.set(trial);
      work.temperatureK = temperatureK;
      takeFractions(work, aim);
    }
    if (station >= stations.length) return undefined;
    barrier = Math.max(lastGap, (share > 0.9 ? 0.1 : share > 0.5 ? 0.3 : 0.8) * gap);
  }
  return undefined;
}

/** A direction in which every phase loses: one unit less for each atom, half a unit for a charge. */
function downhill(work: Work): Float64Array {
  const { rank, basis, set } = work;
  const direction = new Float64Array(rank);
  for (let k = 0; k < rank; k += 1) {
    const formula = set.phases[at32(basis, k)]?.formula;
    let sum = 0;
    for (const atoms of formula?.composition.values() ?? []) sum -= atoms;
    direction[k] = sum + (set.hasCharge ? 0.5 * (formula?.charge ?? 0) : 0);
  }
  return direction;
}

/** Goes downhill from the vertex's potentials until every phase is clearly below equilibrium. */
function enterInterior(work: Work, aim: Aim, direction: Float64Array): boolean {
  const { rank, basis, cost, potential, condensed, condensedCount } = work;
  for (let depth = 2; depth < 1e6; depth *= 2) {
    for (let k = 0; k < rank; k += 1) potential[k] = at(cost, at32(basis, k)) + depth * at(direction, k);
    takeFractions(work, aim);
    let isInside = work.gasCount === 0 || work.fractionSum < 0.5;
    for (let index = 0; index < condensedCount && isInside; index += 1) {
      isInside = affinityOf(work, at32(condensed, index)) < -0.5;
    }
    if (isInside) return true;
  }
  return false;
}
