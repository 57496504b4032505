// Tables of what a state consists of: shares wet and dry, and the gas apart from what floats in it.

import { describe, expect, test } from 'vitest';
import { gasOfState } from '../../../../server/core/burn/gas-of-state.ts';
import { amountOf, peakGases, productRows } from '../../../../server/core/burn/products.ts';
import { handMadeState } from './hand-made-state.ts';

const state = handMadeState(['H', 'C', 'N', 'O', 'Na'], {
  'CO2(g)': 1,
  'H2O(g)': 2,
  'N2(g)': 7,
  'NO(g)': 0.01,
  'CO(g)': 0.02,
  'Na2CO3(l)': 0.5,
});

describe('rows', () => {
  const rows = productRows(state);

  test('the most by mass first, and every gram once', () => {
    expect(rows.map(({ id }) => id).slice(0, 4)).toEqual(['N2(g)', 'Na2CO3(l)', 'CO2(g)', 'H2O(g)']);
    expect(rows.reduce((sum, row) => sum + row.massShare, 0)).toBeCloseTo(1, 12);
  });

  test('wet shares add up to 1, dry ones without water', () => {
    expect(rows.reduce((sum, row) => sum + (row.wetMoleShare ?? 0), 0)).toBeCloseTo(1, 12);
    expect(rows.reduce((sum, row) => sum + (row.dryMoleShare ?? 0), 0)).toBeCloseTo(1, 12);
    expect(rows.find(({ id }) => id === 'CO2(g)')?.dryMoleShare).toBeCloseTo(1 / 8.03, 12);
    expect(rows.find(({ id }) => id === 'H2O(g)')).toMatchObject({ dryMoleShare: null });
    expect(rows.find(({ id }) => id === 'Na2CO3(l)')).toMatchObject({ wetMoleShare: null, isGas: false });
  });

  test('traces can be left out', () => {
    expect(productRows(state, 0.01).map(({ id }) => id)).toEqual(['N2(g)', 'Na2CO3(l)', 'CO2(g)', 'H2O(g)']);
  });

  test('a phase that is no candidate has no amount', () => {
    expect(amountOf(state, 'SO2(g)')).toBe(0);
  });
});

test('nitric oxide and carbon monoxide, wet and dry', () => {
  const [no, no2, co] = peakGases(state);
  expect(no).toMatchObject({ id: 'NO(g)', molPerKgFuel: 0.01 });
  expect(no?.wetMoleShare).toBeCloseTo(0.01 / 10.03, 12);
  expect(no?.dryMoleShare).toBeCloseTo(0.01 / 8.03, 12);
  expect(no2).toMatchObject({ id: 'NO2(g)', molPerKgFuel: 0 });
  expect(co?.dryMoleShare).toBeCloseTo(0.02 / 8.03, 12);
});

describe('the gas alone', () => {
  test('weighs and warms without its salt', () => {
    const gas = gasOfState(state);
    const alone = handMadeState(['H', 'C', 'N', 'O', 'Na'], {
      'CO2(g)': 1,
      'H2O(g)': 2,
      'N2(g)': 7,
      'NO(g)': 0.01,
      'CO(g)': 0.02,
    });
    expect(gas?.massKg).toBeCloseTo(alone.massKg, 12);
    expect(gas?.heatCapacityJPerKgK).toBeCloseTo(alone.frozenHeatCapacityJPerK / alone.massKg, 8);
    expect(gas?.gamma).toBeCloseTo(alone.frozenGamma ?? Number.NaN, 12);
    expect(gas?.dryMolarMassKgPerMol).toBeCloseTo((alone.massKg - 2 * 0.018015) / 8.03, 7);
  });

  test('nothing but crystals has none', () => {
    const salt = handMadeState(['C', 'O', 'Na'], { 'Na2CO3(cr)': 1 }, 300);
    expect(gasOfState(salt)).toBeNull();
    expect(peakGases(salt)).toEqual([]);
  });
});
