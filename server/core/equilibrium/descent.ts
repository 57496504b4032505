// From a start to the state of lowest energy: Newton steps, while phases appear by their affinity and leave when nothing is
// left of them.
// Knows no start of its own and gives no certificate: it says only whether it came to rest. Invariant: at rest no phase present
// has less than nothing and no absent one has an affinity above the limit.

import { at, at32 } from './entry.ts';
import { affinityOf, takeFractions, takeStep } from './newton.ts';
import type { Aim, Step } from './newton.ts';
import { balanceTraces } from './traces.ts';
import { forcedDown, takeBasis } from './vertex.ts';
import { mayBePresent } from './work.ts';
import type { Work } from './work.ts';

export type Rest = 'rest' | 'lost';

export interface Bounds {
  readonly lowestK: number;
  readonly highestK: number;
}

/** An absent phase forms above this affinity (over RT, per formula unit). */
export const affinityLimit = 1e-10;
/** A gas that comes back starts with this scaled amount at least. */
const newcomer = 1e-9;
/** Stand for the gas, and for no phase, where an index of a phase is meant. */
const gas = -1;
const none = -2;
const mostSteps = 100;

export interface Descent {
  steps: number;
  /** A state of this question was found only a little off the proportions given. */
  isOffProportion: boolean;
  readonly step: Step;
}

/** Goes down from the state in `work` until it rests, for at most a hundred steps. */
export function descend(work: Work, aim: Aim, bounds: Bounds, descent: Descent): Rest {
  work.isGasHeld = false;
  const rest = goDown(work, aim, bounds, descent);
  work.isGasHeld = false;
  return rest;
}

function goDown(work: Work, aim: Aim, bounds: Bounds, descent: Descent): Rest {
  const { step } = descent;
  let arrivals = 0;
  let negative = 0;
  let atBound = 0;
  let creeping = 0;
  let stalled = 0;
  let lastChange = Infinity;
  const mostArrivals = 12 + 3 * work.width;
  for (let count = 0; count < mostSteps; count += 1) {
    if (count === 10 || count === 25 || count === 50) takePresentBasis(work, aim);
    takeStep(work, aim, step, bounds.lowestK, bounds.highestK);
    descent.steps += 1;
    if (step.change === Infinity) return 'lost';
    // A step of one e-fold after another: some trace is far too plentiful.
    creeping = step.taken === 1 && Math.abs(step.change - 1) < 0.02 ? creeping + 1 : 0;
    if (creeping >= 3 && work.gasAmount > 0) {
      balanceTraces(work, aim);
      creeping = 0;
    }
    const isAtBound = work.temperatureK === bounds.lowestK || work.temperatureK === bounds.highestK;
    if (aim.seeks !== 'temperature') atBound = isAtBound ? atBound + 1 : 0;
    if (atBound > 3) return 'lost';
    if (step.taken < 1) {
      // A gas that wants to vanish, and would be gone with the whole step.
      if (!aim.isVolume && work.gasAmount > 0 && work.gasAmount < 1e-22) work.gasAmount = 0;
      // A phase that has less than nothing for several steps is what holds them up.
      negative = hasNegative(work) ? negative + 1 : 0;
      if (negative >= 3) {
        dismiss(work);
        negative = 0;
      }
      continue;
    }
    // A vapour that only traces keep from filling everything: its amount is lost in rounding, and the traces follow it.
    stalled = step.change < 1e-4 && step.change > 0.2 * lastChange ? stalled + 1 : 0;
    lastChange = step.change;
    if (stalled >= 3 && step.change > 1e-13 && aim.seeks === 'temperature') work.isGasHeld = true;
    const limit = work.isGasHeld ? 1e-12 : 1e-7;
    const rests = step.change < limit && step.gasChange < limit;
    if (step.change > 0.3) continue;
    if (dismiss(work)) continue;
    if (!rests && step.change > 1e-2) continue;
    if (arrivals < mostArrivals && welcome(work, aim)) {
      arrivals += 1;
      continue;
    }
    if (rests) return arrivals < mostArrivals ? 'rest' : 'lost';
  }
  return 'lost';
}

/**
 * Writes the balances in the most abundant independent phases of the present state, which stays what it is. The vertex's phases
 * serve nearly always; where they turn out rare, rounding in what is plentiful would drown them.
 */
export function takePresentBasis(work: Work, aim: Aim): void {
  const { set, gases, gasCount, condensed, condensedCount, fraction, logFraction, cost, potential } = work;
  const potentials = new Float64Array(set.phases.length);
  const amounts = new Float64Array(set.phases.length);
  const perFraction = work.gasAmount / work.fractionSum;
  for (let index = 0; index < gasCount; index += 1) {
    const phase = at32(gases, index);
    potentials[phase] = at(cost, phase) + at(logFraction, phase);
    amounts[phase] = at(fraction, phase) * perFraction;
  }
  for (let index = 0; index < condensedCount; index += 1) {
    const phase = at32(condensed, index);
    potentials[phase] = at(cost, phase) + affinityOf(work, phase);
  }
  for (let index = 0; index < work.presentCount; index += 1) {
    amounts[at32(work.present, index)] = Math.max(0, at(work.presentAmount, index));
  }
  takeBasis(work, amounts);
  for (let k = 0; k < work.rank; k += 1) {
    const phase = at32(work.basis, k);
    potential[k] = work.isForced[k] === 1 ? at(cost, phase) - forcedDown : at(potentials, phase);
  }
  takeFractions(work, aim);
}

function hasNegative(work: Work): boolean {
  for (let index = 0; index < work.presentCount; index += 1) if (at(work.presentAmount, index) < 0) return true;
  return false;
}

/** Takes the phase out that has most clearly less than nothing. */
function dismiss(work: Work): boolean {
  let worst = -1;
  let least = 0;
  for (let index = 0; index < work.presentCount; index += 1) {
    const amount = at(work.presentAmount, index) * at(work.set.atomCount, at32(work.present, index));
    if (amount < least) {
      least = amount;
      worst = index;
    }
  }
  if (worst < 0) return false;
  removePresent(work, worst);
  return true;
}

/** Lets in the absent phase with the largest affinity an atom, the gas being one of them. */
function welcome(work: Work, aim: Aim): boolean {
  let best = none;
  let largest = 0;
  for (let index = 0; index < work.condensedCount; index += 1) {
    const phase = at32(work.condensed, index);
    if (!mayBePresent(work.set, phase, work.temperatureK)) continue;
    const affinity = affinityOf(work, phase);
    if (affinity <= affinityLimit) continue;
    const perAtom = affinity / at(work.set.atomCount, phase);
    if (perAtom > largest && !isPresent(work, phase)) {
      best = phase;
      largest = perAtom;
    }
  }
  const gasIsMissing = !aim.isVolume && work.gasAmount === 0 && work.fractionSum > 1;
  if (gasIsMissing && Math.log(work.fractionSum) > largest) best = gas;
  if (best === none) return dismissBeyondEnd(work);
  bringIn(work, aim, best);
  return true;
}

/** A phase that is present past its ends leaves. */
function dismissBeyondEnd(work: Work): boolean {
  for (let index = 0; index < work.presentCount; index += 1) {
    if (mayBePresent(work.set, at32(work.present, index), work.temperatureK)) continue;
    removePresent(work, index);
    return true;
  }
  return false;
}

export function isPresent(work: Work, phase: number): boolean {
  for (let index = 0; index < work.presentCount; index += 1) if (at32(work.present, index) === phase) return true;
  return false;
}

export function removePresent(work: Work, index: number): void {
  work.isTied = false;
  work.presentCount -= 1;
  for (let k = index; k < work.presentCount; k += 1) {
    work.present[k] = at32(work.present, k + 1);
    work.presentAmount[k] = at(work.presentAmount, k + 1);
  }
}

export function addPresent(work: Work, phase: number, amount: number): void {
  work.present[work.presentCount] = phase;
  work.presentAmount[work.presentCount] = amount;
  work.presentCount += 1;
}

/**
 * Adds a phase. Where those present can make it up among themselves, it grows at their cost until one is used up, which
 * leaves; with temperature unknown one such set may stand, since its temperature then follows.
 */
function bringIn(work: Work, aim: Aim, phase: number): void {
  const { presentCount } = work;
  const hasGas = !aim.isVolume && work.gasAmount > 0;
  // As many phases as balances: with the gas they make up anything.
  const countsGas = hasGas && presentCount + 1 >= work.rank;
  const shares = madeUpBy(work, phase, countsGas);
  if (shares === undefined || (aim.seeks !== 'temperature' && !work.isTied)) {
    if (shares !== undefined) work.isTied = true;
    enter(work, phase, 0);
    return;
  }
  let leaves = -1;
  let least = Infinity;
  for (let index = 0; index < presentCount + (countsGas ? 1 : 0); index += 1) {
    const share = at(shares, index);
    if (share <= 1e-9) continue;
    const amount = index < presentCount ? at(work.presentAmount, index) : work.gasAmount;
    const ratio = Math.max(0, amount) / share;
    if (ratio < least) {
      least = ratio;
      leaves = index;
    }
  }
  if (leaves < 0) {
    enter(work, phase, 0);
    return;
  }
  for (let index = 0; index < presentCount; index += 1) {
    work.presentAmount[index] = at(work.presentAmount, index) - least * at(shares, index);
  }
  if (countsGas) work.gasAmount -= least * at(shares, presentCount);
  if (leaves < presentCount) removePresent(work, leaves);
  else work.gasAmount = 0;
  enter(work, phase, least);
}

function enter(work: Work, phase: number, amount: number): void {
  if (phase === gas) work.gasAmount = Math.max(newcomer, amount);
  else addPresent(work, phase, amount);
}

/**
 * Amounts of the phases present (and of the gas, last, where it counts) that together have the atoms of one of `phase`;
 * undefined when there are none.
 */
export function madeUpBy(work: Work, phase: number, countsGas: boolean): Float64Array | undefined {
  const { rank, width, nu, presentCount, present, matrix, stride, spare } = work;
  const columns = presentCount + (countsGas ? 1 : 0);
  if (columns === 0) return undefined;
  for (let k = 0; k < rank; k += 1) {
    const start = k * stride;
    for (let index = 0; index < presentCount; index += 1) {
      matrix[start + index] = at(nu, at32(present, index) * width + k);
    }
    if (countsGas) matrix[start + presentCount] = meanOfGas(work, k);
    matrix[start + columns] = phase === gas ? meanOfGas(work, k) : at(nu, phase * width + k);
  }
  const pivotRows: number[] = [];
  const used = new Uint8Array(rank);
  for (let column = 0; column < columns; column += 1) {
    let best = -1;
    let size = 1e-9;
    for (let k = 0; k < rank; k += 1) {
      const entry = Math.abs(at(matrix, k * stride + column));
      if (used[k] === 0 && entry > size) {
        best = k;
        size = entry;
      }
    }
    pivotRows.push(best);
    if (best < 0) continue;
    used[best] = 1;
    for (let k = 0; k < rank; k += 1) {
      if (k === best) continue;
      const factor = at(matrix, k * stride + column) / at(matrix, best * stride + column);
      if (factor === 0) continue;
      for (let c = column; c <= columns; c += 1) {
        matrix[k * stride + c] = at(matrix, k * stride + c) - factor * at(matrix, best * stride + c);
      }
    }
  }
  for (let k = 0; k < rank; k += 1) {
    if (used[k] === 0 && Math.abs(at(matrix, k * stride + columns)) > 1e-9) return undefined;
  }
  for (let column = 0; column < columns; column += 1) {
    const row = pivotRows[column] ?? -1;
    spare[column] = row < 0 ? 0 : at(matrix, row * stride + columns) / at(matrix, row * stride + column);
  }
  return spare;
}

/** Amount of a basis phase in one mole of the gas. */
function meanOfGas({ gases, gasCount, fraction, fractionSum, nu, width }: Work, k: number): number {
  let sum = 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = at32(gases, index);
    sum += at(fraction, gas) * at(nu, gas * width + k);
  }
  return sum / fractionSum;
}
