// Slates of complete combustion: what each element becomes, in which order alkali is bound, and that atoms close.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { completeCombustion } from '../../../../server/core/balance/combustion.ts';
import type { SlateRule } from '../../../../server/core/balance/combustion.ts';

type Amounts = Readonly<Record<string, number>>;

function products(amounts: Amounts, rule: SlateRule = 'as-ruled'): Record<string, number> {
  const slate = completeCombustion(new Map(Object.entries(amounts)), rule);
  if (slate.kind === 'fault') throw new Error(slate.elements.join());
  return Object.fromEntries(
    slate.products.map((product) => [product.species, Number(product.molPerKg.toPrecision(9))]),
  );
}

function demand(amounts: Amounts, rule: SlateRule = 'as-ruled'): number {
  const slate = completeCombustion(new Map(Object.entries(amounts)), rule);
  return slate.kind === 'fault' ? Number.NaN : slate.oxygenDemandMolPerKg;
}

describe('without alkali', () => {
  test.each<[string, Amounts, Amounts, number]>([
    ['methane', { C: 1, H: 4 }, { 'CO2(g)': 1, 'H2O(g)': 2 }, 2],
    ['ammonia', { N: 2, H: 6 }, { 'H2O(g)': 3, 'N2(g)': 1 }, 1.5],
    [
      'sulphur and nitrogen in an oil',
      { C: 5, H: 8, S: 1, N: 2, O: 2 },
      { 'CO2(g)': 5, 'SO2(g)': 1, 'H2O(g)': 4, 'N2(g)': 1 },
      7,
    ],
    ['phosphorus', { P: 4 }, { 'P4O10(cr)': 1 }, 5],
    [
      'metals',
      { Mg: 1, Al: 2, Fe: 2, Ti: 1, Si: 1, B: 2, Ca: 1, Zn: 1, V: 2 },
      {
        ...{ 'MgO(cr)': 1, 'CaO(cr)': 1, 'ZnO(cr)': 1, 'Al2O3(cr)': 1, 'B2O3(cr)': 1 },
        ...{ 'SiO2(cr)': 1, 'Fe2O3(cr)': 1, 'TiO2(cr)': 1, 'V2O5(cr)': 1 },
      },
      10.5,
    ],
    ['halogens take hydrogen', { C: 1, H: 3, Cl: 1 }, { 'HCl(g)': 1, 'CO2(g)': 1, 'H2O(g)': 1 }, 1.5],
    ['fluorine first where hydrogen is short', { H: 1, F: 1, Cl: 2 }, { 'HF(g)': 1, 'Cl2(g)': 1 }, 0],
    ['argon stays argon', { Ar: 1 }, { 'Ar(g)': 1 }, 0],
    ['hydrogen peroxide frees oxygen', { H: 2, O: 2 }, { 'H2O(g)': 1, 'O2(g)': 0.5 }, -0.5],
  ])('%s', (_, fuel, expected, oxygen) => {
    expect(products(fuel)).toEqual(expected);
    expect(demand(fuel)).toBeCloseTo(oxygen, 9);
  });
});

describe('alkali is bound in the order of the rule', () => {
  test.each<[string, Amounts, Amounts]>([
    ['chloride before fluoride', { Na: 1, Cl: 1, F: 1, H: 1 }, { 'NaCl(cr)': 1, 'HF(g)': 1 }],
    ['fluoride before sulphate', { Na: 3, F: 1, S: 1, C: 1 }, { 'NaF(cr)': 1, 'Na2SO4(cr)': 1, 'CO2(g)': 1 }],
    ['sulphate before carbonate', { Na: 2, S: 1, C: 1 }, { 'Na2SO4(cr)': 1, 'CO2(g)': 1 }],
    ['what sulphur is left burns', { Na: 2, S: 3 }, { 'Na2SO4(cr)': 1, 'SO2(g)': 2 }],
    ['carbonate before hydroxide', { Na: 4, C: 1, H: 4 }, { 'Na2CO3(cr)': 1, 'NaOH(cr)': 2, 'H2O(g)': 1 }],
    ['hydroxide before oxide', { Na: 4, H: 2 }, { 'NaOH(cr)': 2, 'Na2O(cr)': 1 }],
    ['carbon left over leaves as gas', { Na: 2, C: 3 }, { 'Na2CO3(cr)': 1, 'CO2(g)': 2 }],
    ['methane with two sodium', { C: 1, H: 4, Na: 2 }, { 'Na2CO3(cr)': 1, 'H2O(g)': 2 }],
  ])('%s', (_, fuel, expected) => {
    expect(products(fuel)).toEqual(expected);
  });

  test('every step of the chain at once', () => {
    const fuel = { Na: 14, Cl: 1, F: 1, S: 1, C: 2, B: 1, Al: 1, Si: 1, H: 1 };
    expect(products(fuel)).toEqual({
      ...{ 'NaCl(cr)': 1, 'NaF(cr)': 1, 'Na2SO4(cr)': 1, 'Na2CO3(cr)': 2, 'NaBO2(cr)': 1, 'NaAlO2(cr)': 1 },
      ...{ 'Na2SiO3(cr)': 1, 'NaOH(cr)': 1, 'Na2O(cr)': 0.5 },
    });
  });
});

describe('mixed oxides, where data exist', () => {
  test.each<[string, Amounts, Amounts]>([
    ['sodium borohydride', { Na: 1, B: 1, H: 4 }, { 'NaBO2(cr)': 1, 'H2O(g)': 2 }],
    ['carbon goes before boron', { Na: 2, B: 1, C: 1 }, { 'Na2CO3(cr)': 1, 'B2O3(cr)': 0.5 }],
    ['potassium has no aluminate here', { K: 1, Al: 1, H: 1 }, { 'KOH(cr)': 1, 'Al2O3(cr)': 0.5 }],
    ['rubidium has a borate and no silicate', { Rb: 3, B: 1, Si: 1 }, { 'RbBO2(cr)': 1, 'Rb2O(cr)': 1, 'SiO2(cr)': 1 }],
  ])('%s', (_, fuel, expected) => {
    expect(products(fuel)).toEqual(expected);
  });
});

describe('several alkali metals', () => {
  test('share a scarce partner in proportion to what is free of each', () => {
    expect(products({ Na: 3, K: 1, Cl: 2 })).toEqual({
      ...{ 'NaCl(cr)': 1.5, 'KCl(cr)': 0.5, 'Na2O(cr)': 0.75, 'K2O(cr)': 0.25 },
    });
  });

  test('do not compete when there is enough', () => {
    expect(products({ Li: 2, Na: 2, C: 2 })).toEqual({ 'Li2CO3(cr)': 1, 'Na2CO3(cr)': 1 });
  });

  test('a metal without the salt leaves it to the others', () => {
    expect(products({ Na: 1, K: 1, Al: 1, H: 2 })).toEqual({ 'NaAlO2(cr)': 1, 'KOH(cr)': 1, 'H2O(g)': 0.5 });
  });
});

describe('the other slates', () => {
  const fuel = { Na: 4, C: 1, H: 2, S: 1, B: 1 };

  test('hydroxide leaves carbonate and mixed oxides out', () => {
    expect(products(fuel, 'hydroxide')).toEqual({ 'Na2SO4(cr)': 1, 'NaOH(cr)': 2, 'B2O3(cr)': 0.5, 'CO2(g)': 1 });
  });

  test('oxide leaves hydroxide out too', () => {
    expect(products(fuel, 'oxide')).toEqual({
      ...{ 'Na2SO4(cr)': 1, 'Na2O(cr)': 1, 'B2O3(cr)': 0.5, 'CO2(g)': 1, 'H2O(g)': 1 },
    });
  });

  test('take the same oxygen, carbonate or not', () => {
    const rules: readonly SlateRule[] = ['as-ruled', 'hydroxide', 'oxide'];
    expect(new Set(rules.map((rule) => demand(fuel, rule).toFixed(9))).size).toBe(1);
  });
});

test('elements without a ruled product are named', () => {
  const slate = completeCombustion(new Map(Object.entries({ C: 1, Br: 1, Cu: 2, Hg: 0 })));
  expect(slate).toEqual({ kind: 'fault', reason: 'no-ruled-product', elements: ['Br', 'Cu'] });
});

test('nothing burns to nothing', () => {
  expect(completeCombustion(new Map())).toMatchObject({ kind: 'slate', products: [], oxygenDemandMolPerKg: 0 });
});

test('atoms close on every slate, whatever the fuel', () => {
  const symbols = [
    'C',
    'H',
    'O',
    'N',
    'S',
    'P',
    'Cl',
    'F',
    'Li',
    'Na',
    'K',
    'Cs',
    'Mg',
    'Al',
    'B',
    'Si',
    'Fe',
    'V',
    'Ar',
  ];
  const amount = fc.oneof(fc.constant(0), fc.double({ min: 0.001, max: 100, noNaN: true }));
  const fuels = fc.tuple(...symbols.map(() => amount)).map((list) => new Map(symbols.map((s, i) => [s, list[i] ?? 0])));
  fc.assert(
    fc.property(fuels, fc.constantFrom<SlateRule>('as-ruled', 'hydroxide', 'oxide'), (fuel, rule) => {
      const slate = completeCombustion(fuel, rule);
      if (slate.kind === 'fault') throw new Error('fault');
      const made = new Map<string, number>();
      for (const { formula, molPerKg } of slate.products) {
        expect(molPerKg).toBeGreaterThan(0);
        for (const [symbol, count] of formula.composition) made.set(symbol, (made.get(symbol) ?? 0) + count * molPerKg);
      }
      for (const symbol of symbols) {
        const brought = (fuel.get(symbol) ?? 0) + (symbol === 'O' ? 2 * Math.max(0, slate.oxygenDemandMolPerKg) : 0);
        expect(Math.abs((made.get(symbol) ?? 0) - brought)).toBeLessThan(1e-6);
      }
    }),
    { numRuns: 300 },
  );
});
