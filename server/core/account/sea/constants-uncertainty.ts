// How far the constants of sea water may be off, and constants moved by as much: what is left of the uncertainty of a result
// when every measurement is perfect. It propagates nothing. Invariant: deviations are of natural logarithms, so that none is
// the constant itself.
// Source: Orr, Epitalon, Dickson and Gattuso 2018 (Marine Chemistry 207, 84), table 1: standard uncertainties of pK, all-in, and
// 2 % of the total boron; the numbers as public transcriptions repeat them.

import { uncertainConstants, type UncertainConstant } from './buffering.ts';
import type { SeaConstants } from './constants-at-depth.ts';

/** Standard uncertainty of the natural logarithm of each. */
export const constantUncertainty: Readonly<Record<UncertainConstant, number>> = {
  carbonDioxide: 0.002 * Math.LN10,
  carbonic1: 0.0075 * Math.LN10,
  carbonic2: 0.015 * Math.LN10,
  boric: 0.01 * Math.LN10,
  water: 0.01 * Math.LN10,
  boron: 0.02,
  calcite: 0.02 * Math.LN10,
  aragonite: 0.02 * Math.LN10,
};

/** The constants with their logarithms moved. */
export function moved(constants: SeaConstants, by: (constant: UncertainConstant) => number): SeaConstants {
  if (uncertainConstants.every((constant) => by(constant) === 0)) return constants;
  const times = (constant: Exclude<UncertainConstant, 'boron'>): number => constants[constant] * Math.exp(by(constant));
  return {
    ...constants,
    carbonDioxide: times('carbonDioxide'),
    carbonic1: times('carbonic1'),
    carbonic2: times('carbonic2'),
    boric: times('boric'),
    water: times('water'),
    calcite: times('calcite'),
    aragonite: times('aragonite'),
    ions: { ...constants.ions, boron: constants.ions.boron * Math.exp(by('boron')) },
  };
}
