// The walk over temperature: how far it goes, and what it takes for a change of sign. Values are made up; the data's own
// are tested with the kind.

import { describe, expect, test } from 'vitest';
import {
  reactionCrossings,
  reactionPoints,
  type ReactionAt,
} from '../../../../server/core/balance/reaction-over-temperature.ts';

/** A reaction of that Gibbs energy, known up to a temperature. */
function of(gibbsAt: (temperatureK: number) => number, toK = 6000): ReactionAt {
  return (temperatureK) =>
    temperatureK > toK
      ? undefined
      : {
          kind: 'reaction',
          enthalpyJ: 0,
          enthalpyJPerKgOfLeft: undefined,
          gibbsEnergyJ: gibbsAt(temperatureK),
          log10K: undefined,
          withoutEntropy: [],
        };
}

describe('round temperatures', () => {
  test('start at 25 °C and end where the data do', () => {
    const temperatures = (toK: number): number[] =>
      reactionPoints(of(() => 0, toK)).map(({ temperatureK }) => temperatureK);
    expect(temperatures(620)).toEqual([298.15, 400, 500, 600]);
    expect(temperatures(200)).toEqual([]);
    expect(temperatures(6000).slice(-3)).toEqual([5000, 5500, 6000]);
    expect(temperatures(6000)).toContain(2000);
    expect(new Set(temperatures(6000)).size).toBe(26);
  });
});

describe('changes of sign', () => {
  test('a straight line crosses where it does', () => {
    const crossings = reactionCrossings(of((temperatureK) => 178_000 - 153 * temperatureK));
    expect(crossings).toHaveLength(1);
    expect(crossings?.[0]?.temperatureK).toBeCloseTo(178_000 / 153, 4);
    expect(crossings?.[0]?.favours).toBe('right');
  });

  test('a curve may cross twice', () => {
    const crossings = reactionCrossings(of((temperatureK) => (temperatureK - 700) * (temperatureK - 1510.5)));
    expect(crossings?.map(({ temperatureK }) => Math.round(temperatureK * 10) / 10)).toEqual([700, 1510.5]);
    expect(crossings?.map(({ favours }) => favours)).toEqual(['right', 'left']);
  });

  test('a jump over zero is none', () => {
    expect(reactionCrossings(of((temperatureK) => (temperatureK < 812 ? 500 : -500)))).toEqual([]);
  });

  test('nothing is looked for beyond the data, or where nothing is known', () => {
    expect(reactionCrossings(of((temperatureK) => 1000 - temperatureK, 900))).toEqual([]);
    expect(reactionCrossings(of(() => Number.NaN))).toBeUndefined();
    expect(reactionCrossings(of(() => 1, 200))).toBeUndefined();
  });
});
