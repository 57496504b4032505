// Consumption against load: the curve goes through what was measured, never swings between, and says where it guesses.
import { describe, expect, test } from 'vitest';
import {
  consumptionAtRating,
  consumptionOfCycle,
  measuredConsumption,
  scaledConsumption,
} from '../../../../server/core/engine/consumption.ts';
import { monotoneCubic } from '../../../../server/core/engine/monotone-cubic.ts';

const POINTS = [
  { load: 0.25, heatRate: 2.74 },
  { load: 0.5, heatRate: 2.48 },
  { load: 0.75, heatRate: 2.396 },
  { load: 1, heatRate: 2.431 },
];

describe('a monotone cubic', () => {
  test.each([
    ['falling, then rising', [5, 3, 2, 2.5]],
    ['a step', [0, 0, 1, 1]],
    ['rising ever faster', [0, 1, 4, 9]],
    ['flat', [2, 2, 2, 2]],
  ])('%s stays between its neighbours', (_, ys) => {
    const points = ys.map((y, x) => ({ x, y }));
    const curve = monotoneCubic(points);
    for (let x = 0; x < ys.length - 1; x += 1 / 64) {
      const [left = 0, right = 0] = ys.slice(Math.floor(x), Math.floor(x) + 2);
      const y = curve(x) ?? NaN;
      expect(y).toBeGreaterThanOrEqual(Math.min(left, right) - 1e-12);
      expect(y).toBeLessThanOrEqual(Math.max(left, right) + 1e-12);
    }
    expect(points.map(({ x }) => curve(x))).toEqual(ys);
  });

  test('is a straight line through points on one', () => {
    const curve = monotoneCubic([0, 0.3, 1.1, 2].map((x) => ({ x, y: 3 - 2 * x })));
    for (const x of [0.1, 0.7, 1.9]) expect(curve(x)).toBeCloseTo(3 - 2 * x, 12);
  });

  test('is nothing outside its points', () => {
    const curve = monotoneCubic([
      { x: 1, y: 1 },
      { x: 2, y: 2 },
    ]);
    expect([curve(0.999), curve(2.001), curve(NaN), monotoneCubic([])(1)]).toEqual([null, null, null, null]);
  });
});

describe('a measured consumption', () => {
  const engine = measuredConsumption(POINTS, 900e3, 0.05, null);

  test('goes through its points, the tolerance upwards', () => {
    for (const { load, heatRate } of POINTS) {
      const at = engine.heatRateAt(load);
      expect(at.range).toBe('within');
      expect(at.heatRate.low).toBeCloseTo(heatRate, 12);
      expect(at.heatRate.high).toBeCloseTo(1.05 * heatRate, 12);
      expect(at.heatRate.value).toBe(at.heatRate.high);
    }
  });

  test('outside its points it says so, and fuel goes on in a straight line', () => {
    const below = engine.heatRateAt(0.125);
    const above = engine.heatRateAt(1.1);
    expect([below.range, above.range]).toEqual(['below', 'above']);
    // Fuel at 25 and 50 %: 0.685 and 1.24 of the rated power; half way down to 12.5 %: 0.4075.
    expect(below.heatRate.low).toBeCloseTo(0.4075 / 0.125, 12);
    expect(above.heatRate.low).toBeCloseTo((2.431 + (0.1 * (2.431 - 0.75 * 2.396)) / 0.25) / 1.1, 12);
  });

  test('with idle consumption it is known down to nothing, where it meets that', () => {
    const idling = measuredConsumption(POINTS, 900e3, 0, 200e3);
    const nearZero = idling.heatRateAt(1e-9);
    expect(nearZero.range).toBe('within');
    expect(nearZero.heatRate.value * 1e-9 * 900e3).toBeCloseTo(200e3, 0);
    expect(idling.heatRateAt(0.25).heatRate.value).toBeCloseTo(2.74, 12);
    expect(idling.idleFuelW?.value).toBe(200e3);
  });

  test('one point is known at its load alone', () => {
    const one = measuredConsumption([{ load: 0.85, heatRate: 2 }], 1e6, 0, null);
    expect(one.heatRateAt(0.85).range).toBe('within');
    expect(one.heatRateAt(0.85 * (1 + 1e-12)).range).toBe('within');
    expect(one.heatRateAt(0.5)).toEqual({ heatRate: { value: 2, low: 2, high: 2 }, range: 'below' });
  });

  test('on another fuel everything is in proportion', () => {
    const other = scaledConsumption(measuredConsumption(POINTS, 900e3, 0.05, 200e3), 1.1);
    expect(other.heatRateAt(0.5).heatRate.low).toBeCloseTo(1.1 * 2.48, 12);
    expect(other.idleFuelW?.low).toBeCloseTo(220e3, 6);
  });
});

describe('the consumption of a cycle', () => {
  const band = { value: 0.44, low: 0.44, high: 0.46 };
  const engine = consumptionOfCycle(band, 0.92, 6.4e6);

  test('at the rating it is that of indicated and mechanical efficiency', () => {
    expect(engine.heatRateAt(1).heatRate.value).toBeCloseTo(1 / (0.44 * 0.92), 12);
    expect(engine.heatRateAt(1).heatRate.low).toBeCloseTo(1 / (0.46 * 0.92), 12);
  });

  test('fuel goes in a straight line with the load, down to friction alone', () => {
    const fuel = (load: number): number => engine.heatRateAt(load).heatRate.value * load;
    expect(fuel(0.3) - fuel(0.2)).toBeCloseTo(fuel(0.9) - fuel(0.8), 12);
    expect(fuel(1e-9) * 6.4e6).toBeCloseTo(engine.idleFuelW?.value ?? NaN, 0);
    expect(engine.heatRateAt(1.2).range).toBe('above');
  });

  test('without friction it idles on nothing', () => {
    expect(consumptionOfCycle(band, 1, 1e6).idleFuelW).toEqual({ value: 0, low: 0, high: 0 });
  });
});

describe('the consumption of a plant known at its rating', () => {
  const rate = { value: 3.2, low: 3, high: 3.2 };

  test('says that it is known there alone', () => {
    const plant = consumptionAtRating(rate, 4e6, null);
    expect(plant.heatRateAt(1)).toEqual({ heatRate: rate, range: 'within' });
    expect([plant.heatRateAt(0.5).range, plant.heatRateAt(1.1).range]).toEqual(['below', 'above']);
    expect([plant.fromLoad, plant.idleFuelW]).toEqual([1, null]);
  });

  test('with idle consumption goes in a straight line from there', () => {
    const plant = consumptionAtRating(rate, 4e6, 0.2 * 3.2 * 4e6);
    const { heatRate, range } = plant.heatRateAt(0.5);
    expect(range).toBe('within');
    // Half way between 0.64 and 3.2 (3.0) of the rated power.
    expect(heatRate.value * 0.5).toBeCloseTo(1.92, 12);
    expect(heatRate.low * 0.5).toBeCloseTo(1.82, 12);
    expect(plant.idleFuelW?.value).toBeCloseTo(2.56e6, 6);
  });
});
