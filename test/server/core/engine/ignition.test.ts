// Indicators of ignition: delays as their equations are written (constants from memory: nothing here would tell a wrong one), how
// they order engines, and how hot the end gas gets. No measured knock limit is held against them: they do not forecast.

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

  test('ends in gas that two thirds of the rise in pressure have heated, and takes 40 degrees', () => {
    const { cycle } = solvedCycle(engine(stream('gas_oil'), 1, { compressionRatio: 8, heatRelease: { at: 'volume' } }));
    const { compressed, burnt } = cycle;
    const rise = (compressed.pressurePa + (2 / 3) * (burnt.pressurePa - compressed.pressurePa)) / compressed.pressurePa;
    const knock = knockOf(cycle, 95, 25);
    // Hot air between 700 and 1000 K has a ratio of heat capacities of 1.36 to 1.33, with a little of what has burnt and of fuel.
    const hottest = [1.33, 1.36].map((gamma) => compressed.temperatureK * rise ** ((gamma - 1) / gamma));
    expect(knock?.endGasK).toBeGreaterThan(hottest[0] ?? NaN);
    expect(knock?.endGasK).toBeLessThan(hottest[1] ?? NaN);
    // Four equal times of the 40 degrees, a rise of pressure like half a cosine, one ratio of heat capacities.
    const coarse = [0.125, 0.375, 0.625, 0.875].reduce((sum, time) => {
      const times = 1 + ((rise - 1) * (1 - Math.cos(Math.PI * time))) / 2;
      const temperatureK = compressed.temperatureK * times ** (0.345 / 1.345);
      return sum + 40 / 360 / 25 / 4 / endGasDelayS(95, times * compressed.pressurePa, temperatureK);
    }, 0);
    expect(Math.abs((knock?.integral ?? NaN) / coarse - 1)).toBeLessThan(0.05);
  });
});
