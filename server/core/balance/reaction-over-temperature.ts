// A written equation over temperature: its energies and log10 K at round temperatures, and where its Gibbs energy changes
// sign, so that at standard pressure it turns from one direction to the other.
// Knows no species and no data: whoever asks says what the equation has at a temperature, and where that is not known.
// Invariant: every crossing has ΔG = 0 within a joule; a jump of the values over zero is none.
// Method: steps of 50 K, then halving; between two steps at most one crossing is seen.

import { referenceTemperatureK } from '../substance/substance.ts';
import type { ReactionValues } from './reaction.ts';

/** The equation's values at a temperature in K; undefined where the data of a species end. */
export type ReactionAt = (temperatureK: number) => ReactionValues | undefined;

export interface ReactionPoint {
  readonly temperatureK: number;
  readonly values: ReactionValues;
}

export interface Crossing {
  readonly temperatureK: number;
  /** Whether ΔG falls through zero, so that the right side is favoured above. */
  readonly favours: 'right' | 'left';
}

/** 25 °C, every hundred kelvin up to 2000 K, every five hundred beyond. */
const roundTemperaturesK: readonly number[] = [
  referenceTemperatureK,
  ...Array.from({ length: 17 }, (_, k) => 400 + 100 * k),
  ...Array.from({ length: 8 }, (_, k) => 2500 + 500 * k),
];

const stepK = 50;

/** The values at round temperatures from 25 °C on, up to where the data of a species end. */
export function reactionPoints(reactionAt: ReactionAt): readonly ReactionPoint[] {
  const points: ReactionPoint[] = [];
  for (const temperatureK of roundTemperaturesK) {
    const values = reactionAt(temperatureK);
    if (values === undefined) break;
    points.push({ temperatureK, values });
  }
  return points;
}

/** Where ΔG changes sign from 25 °C on, the lowest first. Undefined when it is not known at 25 °C already. */
export function reactionCrossings(reactionAt: ReactionAt): readonly Crossing[] | undefined {
  const gibbsAt = (temperatureK: number): number => reactionAt(temperatureK)?.gibbsEnergyJ ?? Number.NaN;
  let below = { temperatureK: referenceTemperatureK, gibbsJ: gibbsAt(referenceTemperatureK) };
  if (Number.isNaN(below.gibbsJ)) return undefined;
  const crossings: Crossing[] = [];
  for (let k = 6; k * stepK <= 6000; k += 1) {
    const temperatureK = k * stepK;
    const gibbsJ = gibbsAt(temperatureK);
    if (Number.isNaN(gibbsJ)) break;
    if (below.gibbsJ > 0 !== gibbsJ > 0) {
      const rootK = halved(gibbsAt, below.temperatureK, temperatureK);
      if (Math.abs(gibbsAt(rootK)) < 1) crossings.push({ temperatureK: rootK, favours: gibbsJ > 0 ? 'left' : 'right' });
    }
    below = { temperatureK, gibbsJ };
  }
  return crossings;
}

/** Halves an interval whose ends differ in sign down to less than a millijoule of any reaction's Gibbs energy. */
function halved(gibbsAt: (temperatureK: number) => number, fromK: number, toK: number): number {
  let [lowK, highK] = [fromK, toK];
  const isPositive = gibbsAt(lowK) > 0;
  while (highK - lowK > 1e-6) {
    const middleK = (lowK + highK) / 2;
    if (gibbsAt(middleK) > 0 === isPositive) lowK = middleK;
    else highK = middleK;
  }
  return (lowK + highK) / 2;
}
