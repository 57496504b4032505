// Atoms on the two sides of an equation.

import { describe, expect, test } from 'vitest';
import { equationElements } from '../../../../server/core/balance/elements.ts';
import type { Coefficient } from '../../../../server/core/balance/elements.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';

function side(...terms: readonly (readonly [Coefficient, string])[]) {
  return terms.map(([coefficient, text]) => {
    const formula = parseFormula(text);
    if (formula.kind === 'fault') throw new Error(text);
    return { coefficient, formula };
  });
}

describe('an equation', () => {
  test('that balances, with a fraction as written', () => {
    const outcome = equationElements(side([2, 'Na'], [[1, 2], 'O2'], [1, 'CO2']), side([1, 'Na2CO3']));
    expect(outcome.balanced).toBe(true);
    expect(outcome.sums).toEqual([
      { element: 'Na', left: 2, right: 2, difference: 0 },
      { element: 'O', left: 3, right: 3, difference: 0 },
      { element: 'C', left: 1, right: 1, difference: 0 },
    ]);
  });

  test('thirds are exact, though their doubles are not', () => {
    const left = side([[1, 3], 'Fe2O3'], [[2, 3], 'Al']);
    const right = side([[2, 3], 'Fe'], [[1, 3], 'Al2O3']);
    expect(equationElements(left, right).balanced).toBe(true);
    expect(equationElements(side([0.333, 'Fe2O3'], [[2, 3], 'Al']), right).balanced).toBe(false);
  });

  test('says what is missing where: positive when the left side lacks it', () => {
    const { sums, balanced } = equationElements(side([1, 'CH4'], [1, 'O2']), side([1, 'CO2'], [2, 'H2O']));
    expect(balanced).toBe(false);
    expect(sums.find((sum) => sum.element === 'O')).toEqual({ element: 'O', left: 2, right: 4, difference: 2 });
    expect(sums.find((sum) => sum.element === 'H')?.difference).toBe(0);
  });

  test('counts charge like an element, where there is any', () => {
    const { sums, balanced } = equationElements(side([1, 'Na']), side([1, 'Na+']));
    expect(balanced).toBe(false);
    expect(sums).toEqual([
      { element: 'Na', left: 1, right: 1, difference: 0 },
      { element: 'charge', left: 0, right: 1, difference: 1 },
    ]);
    expect(equationElements(side([1, 'Na']), side([1, 'Na+'], [1, 'e-'])).balanced).toBe(true);
  });

  test('a zero denominator counts as nothing and does not throw', () => {
    expect(equationElements(side([[1, 0], 'H2']), side([0, 'H2'])).balanced).toBe(true);
  });
});
