// A spilled kilogram in water against hydrogen by stoichiometry, the heats of metals with water, and bounds.

import { describe, expect, test } from 'vitest';
import { hydrogenOver, waterContactOf } from '../../../../server/core/hazard/water-contact.ts';
import { atomicWeightKgPerMol } from '../../../../server/core/substance/elements.ts';
import metals from '../../../reference/alkali-metals-in-water.json' with { type: 'json' };
import { storeOf } from './stores.ts';

const litresPerMol = (8.31446261815324 * 298.15) / 1e5 / 1e-3;

describe('hydrogen by stoichiometry', () => {
  // Atoms and mol of hydrogen a formula gives, counted by hand from the equation.
  test.each([
    ['lithium', { Li: 1 }, 0.5],
    ['sodium', { Na: 1 }, 0.5],
    ['potassium', { K: 1 }, 0.5],
    ['calcium', { Ca: 1 }, 1],
    ['lithium_hydride', { Li: 1, H: 1 }, 1],
    ['sodium_hydride', { Na: 1, H: 1 }, 1],
    ['calcium_hydride', { Ca: 1, H: 2 }, 2],
    ['magnesium_hydride', { Mg: 1, H: 2 }, 2],
    ['sodium_borohydride', { Na: 1, B: 1, H: 4 }, 4],
    ['lithium_aluminium_hydride', { Li: 1, Al: 1, H: 4 }, 4],
    ['aluminium_hydride', { Al: 1, H: 3 }, 3],
  ] as const)('%s', (name, atoms: Readonly<Record<string, number>>, hydrogenMol) => {
    const kgPerMol = Object.entries(atoms).reduce(
      (sum, [symbol, count]) => sum + count * (atomicWeightKgPerMol(symbol) ?? Number.NaN),
      0,
    );
    const litresPerKg = (hydrogenMol / kgPerMol) * litresPerMol;
    const found = waterContactOf(storeOf({ percent: { [name]: 100 } }));
    expect((found?.hydrogenM3PerKg ?? Number.NaN) * 1000).toBeCloseTo(litresPerKg, 1);
  });

  test('a kilogram of sodium gives 539 L, of a 30 % dispersion 162 L', () => {
    const litres = (percent: Record<string, number>): number =>
      1000 * (waterContactOf(storeOf({ percent }))?.hydrogenM3PerKg ?? Number.NaN);
    expect(litres({ sodium: 100 })).toBeCloseTo(539.1, 1);
    expect(litres({ sodium: 30, gas_oil: 70 })).toBeCloseTo(161.7, 1);
  });
});

describe('heat', () => {
  test.each([
    ['lithium', 'Li'],
    ['sodium', 'Na'],
    ['potassium', 'K'],
    ['rubidium', 'Rb'],
    ['caesium', 'Cs'],
  ])('%s in plenty of water', (name, symbol) => {
    const row = metals.rows.find(({ equation }) => equation.startsWith(`${symbol} + H2O(l)`));
    const found = waterContactOf(storeOf({ percent: { [name]: 100 } }));
    const kJPerMol = ((found?.heatJPerKg ?? Number.NaN) * (atomicWeightKgPerMol(symbol) ?? Number.NaN)) / 1000;
    // Tables of two origins differ by some tenths of a kilojoule; the row says by how much its own digits do.
    expect(Math.abs(kJPerMol + (row?.kJPerMol ?? Number.NaN))).toBeLessThan((row?.digits ?? 0) + 0.6);
  });
});

test('what does not react with water has no contact to tell', () => {
  expect(waterContactOf(storeOf({ percent: { gas_oil: 100 } }))).toBeNull();
  expect(waterContactOf(storeOf({ percent: { sodium_chloride: 50, sodium_carbonate: 50 } }))).toBeNull();
  expect(waterContactOf(storeOf({ percent: { sulphuric_acid: 100 } }))).toBeNull();
});

test('carbide gives acetylene, nitride ammonia, quicklime heat alone', () => {
  const gases = (name: string) => waterContactOf(storeOf({ percent: { [name]: 100 } }))?.gasMolPerKg;
  expect(Object.keys(gases('calcium_carbide') ?? {})).toEqual(['C2H2']);
  expect(Object.keys(gases('magnesium_nitride') ?? {})).toEqual(['NH3']);
  expect(gases('calcium_oxide')).toEqual({});
});

test('hydrogen in the ullage: little gas is its share and its pressure alike, much fills it', () => {
  // 0.001 mol/kg at 900 kg/m3 into a tenth of the volume above nine tenths: 8.1 mol/m3 where 40.3 mol/m3 are.
  const little = hydrogenOver(0.001, 900, 0.9, 298.15, 1e5);
  expect(little.closedRisePa).toBeCloseTo(8.1 * 8.31446261815324 * 298.15, 6);
  expect(little.ventedShare).toBeCloseTo(1 - Math.exp(-little.closedRisePa / 1e5), 12);
  expect(hydrogenOver(10, 900, 0.9, 298.15, 1e5).ventedShare).toBeCloseTo(1, 6);
});
