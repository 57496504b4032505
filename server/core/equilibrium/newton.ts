// One Newton step towards the state of lowest energy, for a set of phases taken to be present.
// The unknowns are the potentials of the basis phases, the amount of gas (pressure held), the amounts of the condensed
// phases present and, where it is not held, the logarithm of temperature: at most a score, however many gases there are.
// Knows no choice of phases. Invariant: gases always obey x_j = exp(potential of its atoms - g_j/RT - ln p); what is solved
// for are the balances. Method: element potentials (White, Johnson and Dantzig 1958; Smith and Missen, Chemical Reaction
// Equilibrium Analysis, 1982) in an optimised basis, with the sum of fractions taken logarithmically, so that a step from far
// away does not creep; temperature in the same symmetric system.

import { fillEnthalpies, fillGibbs } from '../substance/property-set.ts';
import { solveDense } from './dense.ts';
import { at, at32 } from './entry.ts';
import type { Work } from './work.ts';

/** What is held, scaled to the work's amounts. */
export interface Aim {
  /** Volume held instead of pressure. */
  readonly isVolume: boolean;
  /** ln of the pressure in bar (pressure held). */
  readonly logPressure: number;
  /** Scaled mol of gas per bar times K: V (1 bar) / R (volume held). */
  readonly gasKPerBar: number;
  /** Temperature held, or energy (enthalpy with pressure held), or entropy. */
  readonly seeks: 'temperature' | 'energy' | 'entropy';
  /** H/R or U/R in K, or S/R, of the scaled amount. */
  readonly aimed: number;
}

/** Below this share of the least basis amount a gas changes no balance in double precision. */
const negligible = 1e-19;

/** Properties and fractions at the present temperature and potentials. */
export function takeTemperature(work: Work, aim: Aim, temperatureK: number): void {
  work.temperatureK = temperatureK;
  fillGibbs(work.set.properties, temperatureK, work.gibbs);
  if (aim.seeks !== 'temperature') {
    fillEnthalpies(work.set.properties, temperatureK, work.enthalpy, work.heatCapacity);
  }
  takePressure(work, aim.isVolume ? 0 : aim.logPressure);
}

export function takePressure(work: Work, logPressure: number): void {
  const { set, cost, gibbs } = work;
  cost.set(gibbs);
  for (let phase = 0; phase < set.gasCount; phase += 1) cost[phase] = at(gibbs, phase) + logPressure;
}

/** Fractions of all gases from the present potentials (partial pressures in bar when the volume is held). */
export function takeFractions(work: Work, aim: Aim): void {
  const { gases, gasCount, nu, width, rank, potential, cost, logFraction, fraction } = work;
  let sum = 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = at32(gases, index);
    const column = gas * width;
    let logarithm = -at(cost, gas);
    for (let k = 0; k < rank; k += 1) logarithm += at(nu, column + k) * at(potential, k);
    const value = logarithm > 300 ? Math.exp(300) : Math.exp(logarithm);
    logFraction[gas] = logarithm;
    fraction[gas] = value;
    sum += value;
  }
  work.fractionSum = sum;
  if (aim.isVolume) work.gasAmount = (sum * aim.gasKPerBar) / work.temperatureK;
}

/** Affinity of a condensed phase: the potentials of its atoms less its own g/RT; above zero it should form. */
export function affinityOf(work: Work, phase: number): number {
  const { nu, width, rank, potential, cost } = work;
  let sum = -at(cost, phase);
  for (let k = 0; k < rank; k += 1) sum += at(nu, phase * width + k) * at(potential, k);
  return sum;
}

/**
 * Assembles the system of the next step: potentials first, then gas, condensed phases, temperature. Returns its size. The
 * right side holds what is missing, and everything comes out as a change: near the solution a rare phase's amount then keeps its
 * own precision, not that of the plentiful ones.
 */
export function assemble(work: Work, aim: Aim): number {
  const { rank, width, stride, matrix, right, nu, gases, gasCount, fraction, enthalpy, heatCapacity } = work;
  const hasGasRow = !aim.isVolume && work.gasAmount > 0;
  const gasRow = rank;
  const firstPresent = rank + (hasGasRow ? 1 : 0);
  const heatRow = firstPresent + work.presentCount;
  const seeksHeat = aim.seeks !== 'temperature';
  const size = heatRow + (seeksHeat ? 1 : 0);
  matrix.fill(0, 0, size * stride);
  const { gasAmount, fractionSum } = work;
  // mol of a gas per unit of its fraction.
  const perFraction = gasAmount > 0 ? gasAmount / fractionSum : 0;
  const lost = aim.isVolume ? 1 : 0;
  const heatStart = heatRow * stride;
  let heatSum = 0;
  let capacity = 0;
  let squares = 0;
  if (perFraction > 0) {
    const least = negligible * leastBasisAmount(work);
    for (let index = 0; index < gasCount; index += 1) {
      const gas = at32(gases, index);
      const amount = at(fraction, gas) * perFraction;
      if (amount < least) continue;
      const column = gas * width;
      for (let k = 0; k < rank; k += 1) {
        const own = at(nu, column + k);
        if (own === 0) continue;
        const part = amount * own;
        const start = k * stride;
        for (let l = 0; l <= k; l += 1) matrix[start + l] = at(matrix, start + l) + part * at(nu, column + l);
        // Row sums, kept in the last column of the room while gases are gone through.
        matrix[start + stride - 1] = at(matrix, start + stride - 1) + part;
        if (seeksHeat) matrix[heatStart + k] = at(matrix, heatStart + k) + part * (at(enthalpy, gas) - lost);
      }
      if (seeksHeat) {
        const energy = at(enthalpy, gas) - lost;
        heatSum += amount * energy;
        squares += amount * energy * energy;
        capacity += amount * (at(heatCapacity, gas) - lost);
      }
    }
  }
  for (let k = 0; k < rank; k += 1) {
    const start = k * stride;
    const sum = at(matrix, start + stride - 1);
    matrix[start + stride - 1] = 0;
    for (let l = 0; l < k; l += 1) matrix[l * stride + k] = at(matrix, start + l);
    if (seeksHeat) matrix[start + heatRow] = at(matrix, heatStart + k);
    if (hasGasRow) {
      const mean = sum / gasAmount;
      matrix[start + gasRow] = mean;
      matrix[gasRow * stride + k] = mean;
    }
    right[k] = at(work.amounts, k) - sum;
  }
  if (hasGasRow) {
    right[gasRow] = -Math.log(fractionSum);
    if (seeksHeat) {
      matrix[gasRow * stride + heatRow] = heatSum / gasAmount;
      matrix[heatStart + gasRow] = heatSum / gasAmount;
    }
  }
  let presentHeat = 0;
  for (let index = 0; index < work.presentCount; index += 1) {
    const phase = at32(work.present, index);
    const row = firstPresent + index;
    for (let k = 0; k < rank; k += 1) {
      const own = at(nu, phase * width + k);
      if (own === 0) continue;
      matrix[k * stride + row] = own;
      matrix[row * stride + k] = own;
      right[k] = at(right, k) - own * at(work.presentAmount, index);
    }
    right[row] = -affinityOf(work, phase);
    if (seeksHeat) {
      const energy = at(enthalpy, phase);
      matrix[row * stride + heatRow] = energy;
      matrix[heatStart + row] = energy;
      const amount = at(work.presentAmount, index);
      presentHeat += amount * energy;
      capacity += Math.max(0, amount) * at(heatCapacity, phase);
    }
  }
  for (let k = 0; k < rank; k += 1) {
    const start = k * stride;
    // Nothing to speak of has any of this basis phase, or nothing can: its potential has no say and stays.
    const isIdle =
      work.isForced[k] === 1 ||
      (Math.abs(at(work.amounts, k)) <= work.idleBelow && at(matrix, start + k) <= work.idleBelow);
    if (isIdle && !hasPresent(work, start, firstPresent)) holdRow(work, k, size);
  }
  if (hasGasRow && work.isGasHeld) holdRow(work, gasRow, size);
  if (seeksHeat) {
    matrix[heatStart + heatRow] = squares + capacity;
    right[heatRow] =
      aim.seeks === 'energy' ? aim.aimed / work.temperatureK - heatSum - presentHeat : entropyMissing(work, aim);
  }
  return size;
}

/** Makes one unknown of the system stay what it is. */
function holdRow({ matrix, right, stride }: Work, row: number, size: number): void {
  for (let other = 0; other < size; other += 1) {
    matrix[row * stride + other] = 0;
    matrix[other * stride + row] = 0;
  }
  matrix[row * stride + row] = 1;
  right[row] = 0;
}

/** Whether a balance has a condensed phase that is present in it. */
function hasPresent({ matrix, presentCount }: Work, start: number, firstPresent: number): boolean {
  for (let index = 0; index < presentCount; index += 1) {
    if (at(matrix, start + firstPresent + index) !== 0) return true;
  }
  return false;
}

/** S/R that is missing, with the first-order part that the balances still miss: dS = (dU + p dV - sum of potentials dn)/T. */
function entropyMissing(work: Work, aim: Aim): number {
  const { rank, width, nu, gases, gasCount, fraction, logFraction, enthalpy, gibbs, gasAmount, fractionSum } = work;
  const perFraction = gasAmount > 0 ? gasAmount / fractionSum : 0;
  const shift = aim.isVolume ? 0 : Math.log(fractionSum) - aim.logPressure;
  let entropy = 0;
  let potentials = 0;
  for (let k = 0; k < rank; k += 1) potentials += at(work.potential, k) * at(work.amounts, k);
  for (let index = 0; index < gasCount; index += 1) {
    const gas = at32(gases, index);
    const amount = at(fraction, gas) * perFraction;
    if (amount === 0) continue;
    entropy += amount * (at(enthalpy, gas) - at(gibbs, gas) - at(logFraction, gas) + shift);
    let held = 0;
    for (let k = 0; k < rank; k += 1) held += at(nu, gas * width + k) * at(work.potential, k);
    potentials -= amount * held;
  }
  for (let index = 0; index < work.presentCount; index += 1) {
    const phase = at32(work.present, index);
    const amount = at(work.presentAmount, index);
    entropy += amount * (at(enthalpy, phase) - at(gibbs, phase));
    potentials -= amount * (affinityOf(work, phase) + at(work.cost, phase));
  }
  return aim.aimed - entropy + potentials;
}

/** What a step did. */
export interface Step {
  /** Largest change of a potential or of ln T before damping; Infinity when the system was singular. */
  change: number;
  /** The share of the step that was taken. */
  taken: number;
  /** Largest relative change of the amount of gas. */
  gasChange: number;
}

/**
 * A system of traces beside solids is graded: its smallest pivots are small because what they stand for is rare, and carry as many
 * digits as the others. Below this there is no telling.
 */
const leastQuality = 1e-24;
const largestChange = 2;
const largestTemperatureChange = 0.35;
const mostGas = 2;
const logOfTrace = -18.42;
const logOfLargestNewcomer = -9.21;

/**
 * Takes one damped step. Damping: no gas above a trace changes by more than e², no trace is thrown above 1e-4, temperature by
 * no more than a third, the gas by no more than e². Temperature stays in `lowestK`…`highestK`.
 */
export function takeStep(work: Work, aim: Aim, step: Step, lowestK: number, highestK: number): void {
  const { rank, width, nu, right, gases, gasCount, logFraction, potential, enthalpy } = work;
  const size = assemble(work, aim);
  const quality = solveDense(work.matrix, work.stride, size, right, work.dense);
  step.change = Infinity;
  if (!(quality > leastQuality)) return;
  const hasGasRow = !aim.isVolume && work.gasAmount > 0;
  const heatRow = size - 1;
  const seeksHeat = aim.seeks !== 'temperature';
  const warmer = seeksHeat ? at(right, heatRow) : 0;
  let change = Math.abs(warmer);
  for (let k = 0; k < rank; k += 1) change = Math.max(change, Math.abs(at(right, k)));
  if (!Number.isFinite(change)) return;
  let taken = 1;
  if (Math.abs(warmer) > largestTemperatureChange) taken = largestTemperatureChange / Math.abs(warmer);
  if (work.gasAmount > 0 && change > 1e-3) {
    const shift = aim.isVolume ? 0 : Math.log(work.fractionSum);
    const lost = aim.isVolume ? 1 : 0;
    for (let index = 0; index < gasCount; index += 1) {
      const gas = at32(gases, index);
      let difference = seeksHeat ? (at(enthalpy, gas) - lost) * warmer : 0;
      const column = gas * width;
      for (let k = 0; k < rank; k += 1) difference += at(nu, column + k) * at(right, k);
      const logarithm = at(logFraction, gas) - shift;
      if (logarithm > logOfTrace) {
        if (Math.abs(difference) * taken > largestChange) taken = largestChange / Math.abs(difference);
      } else if (difference > 0 && logarithm + difference * taken > logOfLargestNewcomer) {
        taken = Math.max(0, (logOfLargestNewcomer - logarithm) / difference);
      }
    }
  }
  step.gasChange = 0;
  let gasNext = work.gasAmount;
  if (hasGasRow) {
    gasNext = work.gasAmount * (1 - Math.log(work.fractionSum)) + at(right, rank);
    const ratio = gasNext / work.gasAmount;
    step.gasChange = Math.abs(ratio - 1);
    if (ratio > 7.4) taken = Math.min(taken, 6.4 / (ratio - 1));
    // The gas may vanish in the end, but not at one stroke.
    else if (ratio < 0.1) taken = Math.min(taken, 0.9 / (1 - ratio));
  }
  step.change = change;
  step.taken = taken;
  for (let k = 0; k < rank; k += 1) potential[k] = at(potential, k) + taken * at(right, k);
  // A mole of gas holds an atom at least, so the scaled amount stays near 1 or below (electrons aside).
  if (hasGasRow) work.gasAmount = Math.min(mostGas, work.gasAmount + taken * (gasNext - work.gasAmount));
  const firstPresent = rank + (hasGasRow ? 1 : 0);
  for (let index = 0; index < work.presentCount; index += 1) {
    work.presentAmount[index] = at(work.presentAmount, index) + taken * at(right, firstPresent + index);
  }
  if (seeksHeat && warmer !== 0) {
    const next = Math.min(highestK, Math.max(lowestK, work.temperatureK * Math.exp(taken * warmer)));
    takeTemperature(work, aim, next);
  }
  takeFractions(work, aim);
}

/** The least amount among the basis phases: of gases in the present state, of condensed ones what their balance holds. */
function leastBasisAmount(work: Work): number {
  const { rank, basis, set, fraction, gasAmount, fractionSum, amounts, isForced } = work;
  let least = Infinity;
  for (let k = 0; k < rank; k += 1) {
    if (isForced[k] === 1) continue;
    const phase = at32(basis, k);
    const isGas = phase < set.gasCount;
    const amount = isGas ? (at(fraction, phase) * gasAmount) / fractionSum : Math.abs(at(amounts, k));
    if (amount < least && (isGas || amount > 0)) least = amount;
  }
  return least === Infinity ? 0 : least;
}
