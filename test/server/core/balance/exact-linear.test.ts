// Exact linear algebra: decimals mean themselves, null spaces are exact, and the simplex finds the least or says there is none.

import Fraction from 'fraction.js';
import { describe, expect, test } from 'vitest';
import { exactNumber, minimise, nullSpace, reduceRows } from '../../../../server/core/balance/exact-linear.ts';

const matrix = (rows: readonly (readonly number[])[]) => rows.map((row) => row.map((value) => new Fraction(value)));
const numbers = (values: readonly Fraction[]) => values.map((value) => value.valueOf());

test('a decimal is the fraction its digits say', () => {
  expect(exactNumber(0.947).equals(new Fraction(947, 1000))).toBe(true);
  expect(exactNumber(0.1 + 0.2).equals(new Fraction(3, 10))).toBe(true);
  expect(exactNumber(Number.NaN).equals(0)).toBe(true);
  expect(exactNumber(Infinity).equals(0)).toBe(true);
});

test('row reduction finds rank and pivots past dependent rows', () => {
  const { rows, pivots } = reduceRows(
    matrix([
      [0, 2, 4],
      [1, 1, 1],
      [1, 3, 5],
    ]),
  );
  expect(pivots).toEqual([0, 1]);
  expect(rows.map(numbers)).toEqual([
    [1, 0, -1],
    [0, 1, 2],
  ]);
});

test('the null space of a matrix of full rank is empty, of nothing everything', () => {
  expect(
    nullSpace(
      matrix([
        [1, 0],
        [0, 1],
      ]),
      2,
    ),
  ).toEqual([]);
  expect(nullSpace([], 2).map(numbers)).toEqual([
    [1, 0],
    [0, 1],
  ]);
});

describe('least cost over x ≥ 0', () => {
  const ones = (count: number) => Array.from({ length: count }, () => new Fraction(1));
  const right = (...values: number[]) => values.map((value) => new Fraction(value));

  test('is found', () => {
    // x + 2y = 4: all in y costs 2.
    const outcome = minimise(matrix([[1, 2]]), right(4), ones(2));
    expect(outcome.kind === 'least' && numbers(outcome.x)).toEqual([0, 2]);
  });

  test('with a negative right side and a dependent row', () => {
    const outcome = minimise(
      matrix([
        [-1, 0],
        [-2, 0],
      ]),
      right(-3, -6),
      ones(2),
    );
    expect(outcome.kind === 'least' && numbers(outcome.x)).toEqual([3, 0]);
  });

  test('does not exist: infeasible, or without end', () => {
    expect(minimise(matrix([[1, 1]]), right(-1), ones(2)).kind).toBe('infeasible');
    expect(minimise(matrix([[1, -1]]), right(0), right(-1, 0)).kind).toBe('unbounded');
  });
});
