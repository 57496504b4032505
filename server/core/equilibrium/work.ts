// The arrays one solver works in, allocated once for its candidates, and the problem they presently hold: which phases and
// which elements take part, and the basis in which the balances are written.
// Knows no method. Invariant: `nu` of a phase over `basis` gives its atoms exactly: atoms(phase) = sum of nu times the atoms
// of the basis phases. Written in the most abundant independent phases, a balance of traces is free of rounding by the rest.

import type { CandidateSet } from './candidates.ts';
import { denseWork } from './dense.ts';
import type { DenseWork } from './dense.ts';
import { at } from './entry.ts';

export interface Work {
  readonly set: CandidateSet;
  /** Number of element rows, and of columns of `nu` set aside a phase. */
  readonly width: number;
  /** Phases that take part: gases, then condensed. The first `gasCount` and `condensedCount` entries count. */
  readonly gases: Int32Array;
  gasCount: number;
  readonly condensed: Int32Array;
  condensedCount: number;
  /** mol of each element row, scaled so that the atoms add up to 1. */
  readonly given: Float64Array;
  /** Atoms in mol of what was given: scaled amounts times this are mol. */
  scaleMol: number;
  /** Independent balances, and so basis phases; less than `width` where elements are absent or locked together. */
  rank: number;
  /** Phase index of each basis phase (below zero: the artificial one of an element row, while a vertex is sought). */
  readonly basis: Int32Array;
  readonly nu: Float64Array;
  /** The elements in the basis, in rows of `width`: what one mole of an element row is of each basis phase. */
  readonly inverse: Float64Array;
  /** 1 for a basis phase whose balance is empty and to which every phase could only add: none of them can be there. */
  readonly isForced: Uint8Array;
  /** Amount of each basis phase if it and the others of the basis were all there is. */
  readonly amounts: Float64Array;
  /** g/RT at the present temperature; with the logarithm of pressure added for gases in `cost`. */
  readonly gibbs: Float64Array;
  readonly cost: Float64Array;
  readonly enthalpy: Float64Array;
  readonly heatCapacity: Float64Array;
  /** Of gases: ln of the fraction (or of the partial pressure in bar when the volume is held), and the fraction itself. */
  readonly logFraction: Float64Array;
  readonly fraction: Float64Array;
  /** Potential over RT of each basis phase. */
  readonly potential: Float64Array;
  /** Condensed phases taken to be present, and their scaled amounts. */
  readonly present: Int32Array;
  readonly presentAmount: Float64Array;
  presentCount: number;
  /** The phases present can make one of them up among themselves, which fixes the temperature. */
  isTied: boolean;
  /** Balances with less in them than this keep their potential; 0 to solve every balance that has anything in it. */
  idleBelow: number;
  /** The amount of gas stays what it is: where traces alone tell it, rounding in their sum with what is plentiful would. */
  isGasHeld: boolean;
  temperatureK: number;
  /** Scaled amount of gas; 0 when there is none. With the volume held it follows from the partial pressures. */
  gasAmount: number;
  /** Sum of `fraction` over the gases: 1 at a solution with gas and pressure held. */
  fractionSum: number;
  /** Room for systems of `stride` rows. */
  readonly stride: number;
  readonly matrix: Float64Array;
  readonly right: Float64Array;
  readonly spare: Float64Array;
  readonly dense: DenseWork;
}

export function workOf(set: CandidateSet): Work {
  const size = set.phases.length;
  const width = set.elements.length;
  const stride = 2 * width + 4;
  return {
    set,
    width,
    gases: new Int32Array(size),
    gasCount: 0,
    condensed: new Int32Array(size),
    condensedCount: 0,
    given: new Float64Array(width),
    scaleMol: 1,
    rank: 0,
    basis: new Int32Array(width),
    nu: new Float64Array(size * width),
    inverse: new Float64Array(width * width),
    isForced: new Uint8Array(width),
    amounts: new Float64Array(width),
    gibbs: new Float64Array(size),
    cost: new Float64Array(size),
    enthalpy: new Float64Array(size),
    heatCapacity: new Float64Array(size),
    logFraction: new Float64Array(size),
    fraction: new Float64Array(size),
    potential: new Float64Array(width),
    present: new Int32Array(width + 2),
    presentAmount: new Float64Array(width + 2),
    presentCount: 0,
    isTied: false,
    idleBelow: 0,
    isGasHeld: false,
    temperatureK: 0,
    gasAmount: 0,
    fractionSum: 0,
    stride,
    matrix: new Float64Array(stride * stride),
    right: new Float64Array(stride),
    spare: new Float64Array(stride),
    dense: denseWork(stride),
  };
}

/**
 * Takes the amounts of a problem in and leaves out every phase with an element that is absent. Returns false when there is
 * nothing of anything. Amounts are not negative and finite.
 */
export function takeAmounts(work: Work, elementMol: Float64Array): boolean {
  const { width, given } = work;
  let sum = 0;
  for (let row = 0; row < width; row += 1) sum += at(elementMol, row);
  if (!(sum > 0)) return false;
  work.scaleMol = sum;
  for (let row = 0; row < width; row += 1) given[row] = at(elementMol, row) / sum;
  return true;
}

/** Whether a phase is inside its ends at a temperature. */
export function mayBePresent(set: CandidateSet, phase: number, temperatureK: number): boolean {
  return temperatureK <= at(set.endK, phase) && temperatureK >= at(set.startK, phase);
}

/**
 * Below this temperature ions are left out also where they are asked for: the most easily ionised vapour, of potassium, has some
 * 1e-9 of itself ionised there.
 */
export const ionsFromK = 1000;

/**
 * Lists the phases that may take part: no absent element, condensed ones inside their ends at the temperature (all where it is
 * unknown), ions from the temperature at which any could matter.
 */
export function admitPhases(
  work: Work,
  temperatureK: number | undefined,
  hasIons = (temperatureK ?? 0) >= ionsFromK,
): void {
  const { set, width, given } = work;
  work.gasCount = 0;
  work.condensedCount = 0;
  const chargeRow = set.hasCharge ? width - 1 : -1;
  for (let phase = 0; phase < set.phases.length; phase += 1) {
    let isIn = true;
    for (let row = 0; row < width && isIn; row += 1) {
      if (row !== chargeRow && at(given, row) === 0 && at(set.atoms, phase * width + row) !== 0) isIn = false;
    }
    if (!isIn || (!hasIons && chargeRow >= 0 && at(set.atoms, phase * width + chargeRow) !== 0)) continue;
    if (phase < set.gasCount) work.gases[work.gasCount++] = phase;
    else if (temperatureK === undefined || mayBePresent(set, phase, temperatureK))
      work.condensed[work.condensedCount++] = phase;
  }
}
