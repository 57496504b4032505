// Water and steam against the release's own verification values, against the iapws library, and against themselves.
import { describe, expect, test } from 'vitest';
import if97 from '../../../../reference/steam-if97.json' with { type: 'json' };
import library from '../../../../reference/steam-states-iapws.json' with { type: 'json' };
import {
  boundaryPressurePa,
  boundaryTemperatureK,
  liquidWater,
  steam,
} from '../../../../../server/core/engine/steam/gibbs-regions.ts';
import {
  saturatedWater,
  waterAt,
  waterAtEnthalpy,
  waterAtEntropy,
  wetState,
} from '../../../../../server/core/engine/steam/water.ts';
import type { NoWater, WaterState } from '../../../../../server/core/engine/steam/water.ts';
import {
  waterSaturationPressurePa,
  waterSaturationTemperatureK,
} from '../../../../../server/core/substance/water-saturation.ts';

const relative = (found: number, given: number): number => Math.abs(found / given - 1);

function stateOf(found: WaterState | NoWater): WaterState {
  if (found.kind === 'none') throw new Error(`no state: ${found.reason}`);
  return found;
}

describe("the release's verification values, to the nine digits printed", () => {
  const properties = ['volumeM3PerKg', 'enthalpyJPerKg', 'entropyJPerKgK', 'heatCapacityJPerKgK'] as const;

  test.each(if97.rows.filter(({ of }) => of === 'liquid' || of === 'steam'))(
    '$of at $temperatureK K, $pressurePa Pa',
    (row) => {
      const found = (row.of === 'liquid' ? liquidWater : steam)(row.temperatureK, row.pressurePa);
      for (const property of properties)
        expect(relative(found[property], row[property] ?? Number.NaN)).toBeLessThan(1e-8);
    },
  );

  test.each(if97.rows.filter(({ of }) => of === 'saturation'))('saturation at $temperatureK K', (row) => {
    expect(relative(waterSaturationPressurePa(row.temperatureK) ?? Number.NaN, row.pressurePa)).toBeLessThan(1e-8);
    expect(relative(waterSaturationTemperatureK(row.pressurePa) ?? Number.NaN, row.temperatureK)).toBeLessThan(1e-8);
  });

  test.each(if97.rows.filter(({ of }) => of === 'boundary'))('boundary of region 3 at $temperatureK K', (row) => {
    expect(relative(boundaryPressurePa(row.temperatureK), row.pressurePa)).toBeLessThan(1e-8);
    expect(relative(boundaryTemperatureK(row.pressurePa), row.temperatureK)).toBeLessThan(1e-8);
  });
});

describe('the iapws library', () => {
  test.each(library.rows)('by $by at $temperatureK K, $pressurePa Pa', (row) => {
    const { by, temperatureK, pressurePa, enthalpyJPerKg, entropyJPerKgK, volumeM3PerKg, dryness } = row;
    // The library goes the release's backward equations, which are off by up to 25 mK (region 1 and 2, tables of maximum
    // differences), and reports the enthalpy and entropy of that temperature; by temperature both are one equation.
    const isBackward = by === 'pressure-entropy' || by === 'pressure-enthalpy';
    const found = stateOf(findAs(row));
    if (isBackward) {
      expect(Math.abs(found.temperatureK - temperatureK)).toBeLessThan(0.025);
      expect(relative(found.volumeM3PerKg, volumeM3PerKg)).toBeLessThan(1e-3);
    } else {
      expect(relative(found.temperatureK, temperatureK)).toBeLessThan(1e-9);
      expect(relative(found.volumeM3PerKg, volumeM3PerKg)).toBeLessThan(1e-8);
      expect(relative(found.enthalpyJPerKg, enthalpyJPerKg)).toBeLessThan(1e-8);
      expect(relative(found.entropyJPerKgK, entropyJPerKgK)).toBeLessThan(1e-8);
    }
    expect(found.dryness).toBeCloseTo(dryness, 4);
    expect(found.pressurePa).toBeCloseTo(pressurePa, 3);
  });

  function findAs(row: (typeof library.rows)[number]): WaterState | NoWater {
    if (row.by === 'temperature-pressure') return waterAt(row.temperatureK, row.pressurePa);
    if (row.by === 'pressure-enthalpy') return waterAtEnthalpy(row.pressurePa, row.enthalpyJPerKg);
    if (row.by === 'pressure-entropy') return waterAtEntropy(row.pressurePa, row.entropyJPerKgK);
    const saturated = saturatedWater(row.pressurePa);
    return saturated.kind === 'none' ? saturated : wetState(saturated, row.dryness);
  }
});

describe('states found from enthalpy and entropy', () => {
  const temperaturesK = [274, 300, 350, 420, 500, 600, 622, 640, 700, 800, 950, 1070];
  const pressuresPa = [1200, 1e4, 1e5, 1e6, 5e6, 12e6, 16.5e6, 25e6, 60e6, 99e6];

  test('are the states they came from, over the whole range', () => {
    let checked = 0;
    for (const pressurePa of pressuresPa) {
      for (const temperatureK of temperaturesK) {
        const from = waterAt(temperatureK, pressurePa);
        if (from.kind === 'none') {
          expect(from.reason).toBe('near-critical');
          continue;
        }
        checked += 1;
        const byEnthalpy = stateOf(waterAtEnthalpy(pressurePa, from.enthalpyJPerKg));
        const byEntropy = stateOf(waterAtEntropy(pressurePa, from.entropyJPerKgK));
        expect(byEnthalpy.phase).toBe(from.phase);
        expect(byEnthalpy.temperatureK).toBeCloseTo(temperatureK, 7);
        expect(byEntropy.temperatureK).toBeCloseTo(temperatureK, 6);
        expect(Math.abs(byEnthalpy.enthalpyJPerKg - from.enthalpyJPerKg)).toBeLessThan(2e-6);
      }
    }
    expect(checked).toBeGreaterThan(100);
  });

  test('wet steam has the dryness that its enthalpy says', () => {
    const saturated = saturatedWater(5000);
    if (saturated.kind === 'none') throw new Error(saturated.reason);
    const wet = wetState(saturated, 0.87);
    expect(stateOf(waterAtEnthalpy(5000, wet.enthalpyJPerKg)).dryness).toBeCloseTo(0.87, 12);
    expect(stateOf(waterAtEntropy(5000, wet.entropyJPerKgK)).dryness).toBeCloseTo(0.87, 12);
    expect(stateOf(waterAtEntropy(5000, wet.entropyJPerKgK)).phase).toBe('wet');
  });

  test('evaporation is the Clausius–Clapeyron slope of the saturation line', () => {
    for (const temperatureK of [300, 373.15, 450, 550, 610]) {
      const [below = NaN, at = NaN, above = NaN] = [-0.01, 0, 0.01].map((d) =>
        waterSaturationPressurePa(temperatureK + d),
      );
      const saturated = saturatedWater(at);
      if (saturated.kind === 'none') throw new Error(saturated.reason);
      const { liquid, vapour } = saturated;
      const heatJPerKg = vapour.enthalpyJPerKg - liquid.enthalpyJPerKg;
      const slope = heatJPerKg / (temperatureK * (vapour.volumeM3PerKg - liquid.volumeM3PerKg));
      // The saturation equation and the two Gibbs energies are fitted apart; the release allows some 1e-4 between them.
      expect(relative((above - below) / 0.02, slope)).toBeLessThan(2e-3);
    }
  });
});

describe('outside', () => {
  test.each([
    [() => waterAt(640, 22e6), 'near-critical'],
    [() => waterAt(300, 101e6), 'pressure'],
    [() => waterAt(300, 0), 'pressure'],
    [() => waterAt(270, 1e5), 'temperature'],
    [() => waterAt(1100, 1e5), 'temperature'],
    [() => waterAt(Number.NaN, 1e5), 'not-finite'],
    [() => saturatedWater(18e6), 'near-critical'],
    [() => saturatedWater(30e6), 'near-critical'],
    [() => saturatedWater(500), 'pressure'],
    [() => waterAtEnthalpy(25e6, 2.2e6), 'near-critical'],
    [() => waterAtEnthalpy(1e5, 6e6), 'temperature'],
    [() => waterAtEntropy(1e5, -100), 'temperature'],
    [() => waterAtEntropy(1e5, Number.POSITIVE_INFINITY), 'not-finite'],
  ])('case %#', (find, reason) => {
    expect(find()).toEqual({ kind: 'none', reason });
  });
});
