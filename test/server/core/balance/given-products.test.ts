// Products somebody names: amounts that exist and are unique, and each reason why they do not.

import { describe, expect, test } from 'vitest';
import { combustionToProducts } from '../../../../server/core/balance/given-products.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';

function burn(fuel: Readonly<Record<string, number>>, ...texts: readonly string[]) {
  const formulas = texts.map((text) => {
    const formula = parseFormula(text);
    if (formula.kind === 'fault') throw new Error(text);
    return formula;
  });
  return combustionToProducts(new Map(Object.entries(fuel)), formulas);
}

const methaneWithSodium = { C: 1, H: 4, Na: 2 };

describe('amounts that exist', () => {
  test('hydroxide in place of carbonate, each in its phase at 25 °C, water as vapour', () => {
    const slate = burn(methaneWithSodium, 'NaOH', 'CO2', 'H2O');
    expect(slate).toMatchObject({ kind: 'slate', rule: 'given', oxygenDemandMolPerKg: 2.5 });
    if (slate.kind !== 'slate') return;
    expect(slate.products.map(({ species, molPerKg }) => [species, molPerKg])).toEqual([
      ['NaOH(cr)', 2],
      ['CO2(g)', 1],
      ['H2O(g)', 1],
    ]);
  });

  test('a phase that is named stays', () => {
    const slate = burn(methaneWithSodium, 'Na2CO3(l)', 'H2O(l)');
    expect(slate.kind === 'slate' && slate.products.map((product) => product.species)).toEqual(['Na2CO3(l)', 'H2O(g)']);
  });

  test('a product that is not needed is left out, and O2 needs no naming', () => {
    const slate = burn({ C: 1 }, 'CO2', 'H2O', 'O2');
    expect(slate.kind === 'slate' && slate.products.map((product) => product.species)).toEqual(['CO2(g)']);
  });

  test('more elements than products close within rounding', () => {
    // A third of a mole each way is no exact double.
    expect(burn({ Na: 1 / 3, Cl: 1 / 3 }, 'NaCl').kind).toBe('slate');
  });
});

describe('amounts that do not', () => {
  test.each([
    [
      'an element without a product',
      burn(methaneWithSodium, 'NaOH', 'H2O'),
      { reason: 'element-without-product', elements: ['C'] },
    ],
    ['too many products', burn(methaneWithSodium, 'Na2CO3', 'NaOH', 'CO2', 'H2O'), { reason: 'not-unique', open: 1 }],
    ['one of them negative', burn({ C: 1, Na: 4 }, 'Na2CO3', 'CO2'), { reason: 'negative', species: ['CO2(g)'] }],
    ['proportions that cannot be', burn({ Na: 1, Cl: 2 }, 'NaCl'), { reason: 'impossible' }],
    ['no products at all', burn({ C: 1 }), { reason: 'element-without-product', elements: ['C'] }],
  ])('%s', (_, outcome, fault) => {
    expect(outcome).toEqual({ kind: 'fault', ...fault });
  });
});
