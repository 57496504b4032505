// The air-standard cycle: with constant heat capacities the closed forms, with those of air the worked examples of textbooks.

import { readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { airCycle, constantPropertyGas, stagesOf } from '../../../../server/core/engine/air-cycle.ts';
import type { AirCycle, AirCycleInput, StageEnd } from '../../../../server/core/engine/air-cycle.ts';
import { gas } from './engines.ts';

interface References {
  readonly cycles: readonly {
    readonly name: string;
    readonly compressionRatio: number;
    readonly temperatureK: number;
    readonly pressurePa: number;
    readonly atVolume: StageEnd | null;
    readonly atPressure: StageEnd | null;
  }[];
  readonly rows: readonly { readonly cycle: string; readonly quantity: string; readonly value: number }[];
}

const references = JSON.parse(readFileSync('test/reference/air-standard-cycles.json', 'utf8')) as References;

/** 1 kg of dry air with its argon, as the books' tables have it: without it a kilogram holds 0.4 % more moles. */
const dryAir = (() => {
  const shares = { 'N2(g)': 0.78084, 'O2(g)': 0.20946, 'Ar(g)': 0.00934, 'CO2(g)': 0.00036 };
  const { massKg } = gas(shares);
  return gas(Object.fromEntries(Object.entries(shares).map(([id, share]) => [id, share / massKg])));
})();

function sure(input: AirCycleInput): AirCycle {
  const cycle = airCycle(input);
  if (cycle.kind === 'none') throw new Error(JSON.stringify(cycle));
  return cycle;
}

const quantities: Readonly<Record<string, { read: (cycle: AirCycle) => number; within: (value: number) => number }>> = {
  'compressed temperature': { read: (cycle) => cycle.compressed.temperatureK, within: (value) => 0.005 * value },
  'heated temperature': { read: (cycle) => cycle.heated.temperatureK, within: (value) => 0.005 * value },
  'expanded temperature': { read: (cycle) => cycle.expanded.temperatureK, within: (value) => 0.005 * value },
  'compressed pressure': { read: (cycle) => cycle.compressed.pressurePa, within: (value) => 0.01 * value },
  'compression work': {
    read: (cycle) => cycle.compressed.energyJ - cycle.filled.energyJ,
    within: (value) => 0.01 * value,
  },
  'heat in': { read: (cycle) => cycle.heatInJ, within: (value) => 0.01 * value },
  'enthalpy over energy at 1': {
    read: (cycle) => cycle.compressed.enthalpyJ - cycle.filled.energyJ,
    within: (value) => 0.01 * value,
  },
  'mean effective pressure': { read: (cycle) => cycle.meanEffectivePressurePa, within: (value) => 0.01 * value },
  efficiency: { read: (cycle) => cycle.efficiency, within: () => 0.003 },
};

describe('with the heat capacities of air', () => {
  for (const { name, ...given } of references.cycles) {
    test.each(references.rows.filter(({ cycle }) => cycle === name))(`${name}: $quantity`, ({ quantity, value }) => {
      const of = quantities[quantity];
      if (of === undefined) throw new Error(quantity);
      const found = of.read(sure({ gas: dryAir, ...given }));
      expect(Math.abs(found - value), `${String(found)} for ${String(value)}`).toBeLessThanOrEqual(of.within(value));
    });
  }
});

describe('with constant heat capacities', () => {
  const inputs = fc.record({
    gamma: fc.double({ min: 1.2, max: 1.6, noNaN: true }),
    compressionRatio: fc.double({ min: 2, max: 25, noNaN: true }),
    pressureRatio: fc.double({ min: 1.01, max: 2.5, noNaN: true }),
    cutOff: fc.double({ min: 1.01, max: 1.9, noNaN: true }),
  });

  test('the closed form of the dual cycle, and so of Otto and Diesel, comes out', () => {
    fc.assert(
      fc.property(inputs, ({ gamma, compressionRatio, pressureRatio, cutOff }) => {
        const of = (alpha: number, beta: number): void => {
          const cycle = airCycle({
            gas: constantPropertyGas(3, gamma),
            compressionRatio,
            temperatureK: 250,
            pressurePa: 1e5,
            atVolume: { to: 'ratio', ratio: alpha },
            atPressure: { to: 'ratio', ratio: beta },
          });
          // Hotter than the tables reach is told, as for any gas.
          if (cycle.kind === 'none') {
            expect(250 * compressionRatio ** (gamma - 1) * alpha * beta).toBeGreaterThan(6000 * (1 - 1e-9));
            return;
          }
          const lost = (alpha * beta ** gamma - 1) / (alpha - 1 + gamma * alpha * (beta - 1));
          expect(Math.abs(cycle.efficiency - (1 - lost * compressionRatio ** (1 - gamma)))).toBeLessThan(1e-9);
          expect(Math.abs(cycle.expanded.temperatureK / (250 * alpha * beta ** gamma) - 1)).toBeLessThan(1e-9);
        };
        of(pressureRatio, cutOff);
        of(pressureRatio, 1);
        of(1, cutOff);
      }),
      { numRuns: 300 },
    );
  });

  test('heat is shared between the stages so that the pressure keeps its limit', () => {
    const given = { gas: constantPropertyGas(1, 1.4), compressionRatio: 14, temperatureK: 320, pressurePa: 2e5 };
    const { compressed } = sure({ ...given, atVolume: null, atPressure: null });
    for (const maximumPressurePa of [4e6, 1e7, 1.3e7, 1e9]) {
      const stages = stagesOf({ at: 'limited', maximumPressurePa }, 30_000, compressed);
      if ('kind' in stages) throw new Error(JSON.stringify(stages));
      const cycle = sure({ ...given, ...stages });
      expect(cycle.heatInJ).toBeCloseTo(30_000, 6);
      const peakPa = Math.min(
        Math.max(maximumPressurePa, compressed.pressurePa),
        sure({ ...given, atVolume: { to: 'heat', heatJ: 30_000 }, atPressure: null }).heated.pressurePa,
      );
      expect(cycle.heated.pressurePa / peakPa).toBeCloseTo(1, 9);
    }
  });
});
