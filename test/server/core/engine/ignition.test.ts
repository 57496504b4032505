// Indicators of ignition: delays as their equations give them by hand, and how they order engines.

import { describe, expect, test } from 'vitest';
import { endGasDelayS, knockOf, lowerLimitAt, sprayDelayS } from '../../../../server/core/engine/ignition.ts';
import { stream } from '../burn/streams.ts';
import { engine, solvedCycle } from './engines.ts';

describe('delays', () => {
  test('are those of their equations', () => {
    // 0.44 ms at 1 atm times e^(4650/T); a hundred atmospheres take 10^(-2.38) of that.
    expect(sprayDelayS(101_325, 4650)).toBeCloseTo(0.44e-3 * Math.E, 12);
    expect(sprayDelayS(101_325e2, 4650) / sprayDelayS(101_325, 4650)).toBeCloseTo(10 ** -2.38, 12);
    expect(endGasDelayS(100, 101_325, 3800)).toBeCloseTo(17.68e-3 * Math.E, 12);
    expect(endGasDelayS(50, 101_325, 3800) / endGasDelayS(100, 101_325, 3800)).toBeCloseTo(2 ** -3.402, 12);
    expect(lowerLimitAt(0.05, 398.15)).toBeCloseTo(0.05 * (1 - 0.0721), 12);
    expect(lowerLimitAt(0.05, 5000)).toBe(0);
  });
});

describe('knock', () => {
  const at = (compressionRatio: number, octaneNumber: number, speedPerS: number): number => {
    const { cycle } = solvedCycle(engine(stream('gas_oil'), 1, { compressionRatio, heatRelease: { at: 'volume' } }));
    return knockOf(cycle, octaneNumber, speedPerS)?.integral ?? NaN;
  };

  test('comes with compression, low octane numbers and low speeds', () => {
    expect(at(8, 95, 25)).toBeLessThan(at(11, 95, 25));
    expect(at(8, 95, 25)).toBeLessThan(at(8, 80, 25));
    expect(at(8, 95, 50)).toBeCloseTo(at(8, 95, 25) / 2, 12);
  });
});
