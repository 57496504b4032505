// Balancing: the unique answer, the choice among several, and the reason when there is none.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { equationElements } from '../../../../server/core/balance/elements.ts';
import { balanceEquation } from '../../../../server/core/balance/equation.ts';
import type { Balance } from '../../../../server/core/balance/equation.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';

function formulas(side: string) {
  return side
    .split(' + ')
    .filter((text) => text !== '')
    .map((text) => {
      const formula = parseFormula(text);
      if (formula.kind === 'fault') throw new Error(text);
      return formula;
    });
}

function balance(equation: string): Balance {
  const [left = '', right = ''] = equation.split(' -> ');
  return balanceEquation(formulas(left), formulas(right));
}

describe('one balance only', () => {
  test.each([
    ['H2 + O2 -> H2O', [2, 1], [2]],
    ['Na + O2 + CO2 -> Na2CO3', [4, 1, 2], [2]],
    ['C8H18 + O2 -> CO2 + H2O', [2, 25], [16, 18]],
    ['KMnO4 + HCl -> KCl + MnCl2 + H2O + Cl2', [2, 16], [2, 2, 8, 5]],
    ['MnO4- + Fe++ + H+ -> Mn++ + Fe+++ + H2O', [1, 5, 8], [1, 5, 4]],
    ['Fe0.947O + O2 -> Fe2O3', [4000, 841], [1894]],
    ['MgCl2.6H2O -> MgO + HCl + H2O', [1], [1, 2, 5]],
    ['Na + e- -> Na-', [1, 1], [1]],
    ['Na+ + Cl- -> NaCl', [1, 1], [1]],
    ['O3 -> O2', [2], [3]],
    ['H2O(l) -> H2O(g)', [1], [1]],
    [
      'Cr7N66H96C42O24 + MnO4- + H+ -> Cr2O7^2- + Mn++ + CO2 + NO3- + H2O',
      [10, 1176, 2798],
      [35, 1176, 420, 660, 1879],
    ],
  ])('%s', (equation, left, right) => {
    expect(balance(equation)).toEqual({ kind: 'unique', coefficients: { left, right } });
  });
});

describe('several balances: how many directions, and the smallest offered', () => {
  test.each([
    ['C + O2 -> CO + CO2', 2, [3, 2], [2, 1]],
    ['CO + CO2 + H2 -> CH4 + H2O', 2, [1, 1, 7], [2, 3]],
    ['H2O2 + KMnO4 + H2SO4 -> MnSO4 + K2SO4 + H2O + O2', 2, [1, 2, 3], [2, 1, 4, 3]],
  ])('%s', (equation, dimension, left, right) => {
    expect(balance(equation)).toEqual({ kind: 'several', dimension, coefficients: { left, right }, smallest: true });
  });

  test('a long one is answered quickly, proven or not', () => {
    const started = performance.now();
    const outcome = balance('C + H2O + O2 + N2 + CH4 + C2H6 -> CO + CO2 + H2 + NH3 + HCN + NO + CH3OH');
    expect(outcome.kind).toBe('several');
    if (outcome.kind === 'several') expect(outcome.dimension).toBe(9);
    expect(performance.now() - started).toBeLessThan(5000);
  });
});

describe('no balance, and why', () => {
  test.each([
    ['H2 + O2 + N2 -> H2O', { reason: 'one-sided', elements: [{ element: 'N', side: 'left' }] }],
    ['Na + Cl2 -> NaCl + KCl', { reason: 'one-sided', elements: [{ element: 'K', side: 'right' }] }],
    ['Na -> Na+', { reason: 'one-sided', elements: [{ element: 'charge', side: 'right' }] }],
    ['CH4 -> C2H6', { reason: 'conflict', elements: ['C', 'H'] }],
    ['-> H2O', { reason: 'empty-side', side: 'left' }],
    ['H2O -> ', { reason: 'empty-side', side: 'right' }],
  ])('%s', (equation, why) => {
    expect(balance(equation.replace(/^->/, ' ->'))).toEqual({ kind: 'none', why });
  });

  test('a species on the wrong side is named', () => {
    const outcome = balance('H2O2 + O2 -> H2O');
    expect(outcome).toMatchObject({
      kind: 'none',
      why: { reason: 'wrong-side', species: [{ side: 'left', index: 1 }] },
    });
  });

  test('a species that can take no part is named', () => {
    // Chlorine's valence can change, sodium has nowhere to go but NaCl: O2 alone on its side with water cannot.
    const outcome = balance('Na + Cl2 + H2O -> NaCl + H2O2');
    expect(outcome).toMatchObject({ kind: 'none', why: { reason: 'takes-no-part' } });
  });

  test('where several species stand, the ones that can never take part are found exactly', () => {
    const outcome = balance('CO + O2 + H2O -> CO2 + H2 + O3 + H2O2');
    // O3 and H2O2 raise nothing that cannot be balanced here, so this one balances; without CO nothing could make hydrogen.
    expect(outcome.kind).toBe('several');
    const without = balance('O2 + H2O + O3 -> H2 + H2O');
    expect(without).toMatchObject({ kind: 'none' });
  });
});

test('whatever balance is returned conserves everything, in whole numbers without a common divisor', () => {
  const species = fc.constantFrom(
    'H2',
    'O2',
    'H2O',
    'CO2',
    'CO',
    'CH4',
    'Na',
    'NaOH',
    'Na2CO3',
    'Na2O',
    'C',
    'N2',
    'NH3',
    'NO',
    'Na+',
    'e-',
  );
  const side = fc.uniqueArray(species, { minLength: 1, maxLength: 4 });
  const commonDivisor = (a: number, b: number): number => (b === 0 ? a : commonDivisor(b, a % b));
  fc.assert(
    fc.property(side, side, (leftTexts, rightTexts) => {
      const left = formulas(leftTexts.join(' + '));
      const right = formulas(rightTexts.join(' + '));
      const outcome = balanceEquation(left, right);
      if (outcome.kind === 'none') return;
      const all = [...outcome.coefficients.left, ...outcome.coefficients.right];
      expect(all.every((value) => Number.isInteger(value) && value > 0)).toBe(true);
      expect(all.reduce(commonDivisor, 0)).toBe(1);
      const terms = (list: typeof left, values: readonly number[]) =>
        list.map((formula, index) => ({ formula, coefficient: values[index] ?? 0 }));
      expect(
        equationElements(terms(left, outcome.coefficients.left), terms(right, outcome.coefficients.right)).balanced,
      ).toBe(true);
    }),
    { numRuns: 300 },
  );
});
