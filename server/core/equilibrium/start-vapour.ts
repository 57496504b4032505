// Where the search for a temperature starts when the vertex has condensed phases only and more heat than they hold below the
// temperature at which they turn into gas: there, part of them as vapour, as the heat asked for has it.
// Knows no answer. Invariant: what the gas takes the condensed phases give, and none of them gives more than it has.
// Method: the vapour that leaves the condensed phases' proportions as they are (what makes and what takes the balances they
// leave empty being equal), the temperature at which its pressure is the one held, and the lever rule.

import { fillEnthalpies } from '../substance/property-set.ts';
import { removePresent } from './descent.ts';
import { at, at32 } from './entry.ts';
import { takeFractions, takeTemperature } from './newton.ts';
import type { Aim } from './newton.ts';
import { balanceTraces } from './traces.ts';
import type { Work } from './work.ts';

const mostGuesses = 8;
/** Of ln of the sum of fractions. */
const nearEnough = 0.05;
/** A trace of gas, so that balances among gases have an amount to be written with. */
const traceOfGas = 1e-9;
/** The least and the most of what can vaporise that the search starts with. */
const leastShare = 0.02;
const mostShare = 0.98;

/**
 * Moves a start without gas, as the vertex's mixing left it, to its vapour. `vertexK` is the temperature at which the vertex
 * would have the heat; where it does not boil below that the start stays what it is.
 */
export function startBesideVapour(work: Work, aim: Aim, vertexK: number, highestK: number): void {
  const startK = work.temperatureK;
  const before = work.potential.slice();
  const { presentCount } = work;
  const [present, presentAmount] = [work.present.slice(0, presentCount), work.presentAmount.slice(0, presentCount)];
  // A balance that the vertex leaves empty is the gas's to decide.
  for (let index = presentCount - 1; index >= 0; index -= 1) {
    if (at(work.presentAmount, index) <= 0) removePresent(work, index);
  }
  const boilingK = boilingTemperature(work, aim, Math.min(vertexK, highestK));
  if (boilingK === undefined) {
    work.potential.set(before);
    work.present.set(present);
    work.presentAmount.set(presentAmount);
    work.presentCount = presentCount;
    work.gasAmount = 0;
    takeTemperature(work, aim, startK);
    takeFractions(work, aim);
    return;
  }
  const { rank, width, nu, gases, gasCount, fraction, fractionSum, enthalpy, heatCapacity, spare } = work;
  fillEnthalpies(work.set.properties, boilingK, enthalpy, heatCapacity);
  spare.fill(0, 0, rank);
  let vapourHeat = 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = at32(gases, index);
    const share = at(fraction, gas) / fractionSum;
    vapourHeat += share * at(enthalpy, gas);
    for (let k = 0; k < rank; k += 1) spare[k] = at(spare, k) + share * at(nu, gas * width + k);
  }
  // The most gas that the phases present can make, and the heat before and after.
  let most = Infinity;
  let cold = 0;
  let taken = 0;
  for (let index = 0; index < work.presentCount; index += 1) {
    const phase = at32(work.present, index);
    const perGas = at(spare, rowOf(work, phase));
    const amount = at(work.presentAmount, index);
    cold += amount * at(enthalpy, phase);
    taken += perGas * at(enthalpy, phase);
    if (perGas > 0) most = Math.min(most, amount / perGas);
  }
  const needed = aim.seeks === 'energy' ? (aim.aimed / boilingK - cold) / (vapourHeat - taken) : most / 2;
  const gasAmount = Math.min(mostShare * most, Math.max(leastShare * most, needed));
  if (!Number.isFinite(gasAmount)) return;
  work.gasAmount = gasAmount;
  for (let index = 0; index < work.presentCount; index += 1) {
    const perGas = at(spare, rowOf(work, at32(work.present, index)));
    work.presentAmount[index] = at(work.presentAmount, index) - gasAmount * perGas;
  }
}

/** Where the vapour of the condensed phases has the pressure held; undefined when that is not below `mostK`. */
function boilingTemperature(work: Work, aim: Aim, mostK: number): number | undefined {
  let temperatureK = Math.min(work.temperatureK, mostK);
  let [lastK, last] = [NaN, NaN];
  for (let count = 0; count < mostGuesses; count += 1) {
    takeVapour(work, aim, temperatureK);
    const excess = Math.log(work.fractionSum);
    if (Math.abs(excess) < nearEnough) return temperatureK;
    // ln of a vapour pressure is nearly straight over 1/T.
    const slope = (excess - last) / (1 / temperatureK - 1 / lastK);
    const next = slope < 0 ? 1 / (1 / temperatureK - excess / slope) : temperatureK * (excess > 0 ? 0.95 : 1.05);
    [lastK, last] = [temperatureK, excess];
    if (excess < 0 && temperatureK >= mostK) return undefined;
    temperatureK = Math.min(mostK, Math.max(0.7 * temperatureK, next > 0 ? Math.min(next, 1.4 * temperatureK) : mostK));
  }
  return undefined;
}

/** The gas over the condensed phases of the start at a temperature, each of them at its own potential. */
function takeVapour(work: Work, aim: Aim, temperatureK: number): void {
  takeTemperature(work, aim, temperatureK);
  for (let index = 0; index < work.presentCount; index += 1) {
    const phase = at32(work.present, index);
    work.potential[rowOf(work, phase)] = at(work.cost, phase);
  }
  work.gasAmount = traceOfGas;
  takeFractions(work, aim);
  balanceTraces(work, aim);
}

/** The balance that is written in a phase of the basis. */
function rowOf({ basis, rank }: Work, phase: number): number {
  for (let k = 0; k < rank; k += 1) if (at32(basis, k) === phase) return k;
  throw new Error('a phase of the vertex is not in its basis');
}
