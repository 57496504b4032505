// The dense solver against cases with known answers: closed formulas, exact fits, constraints and rank defects.

import { describe, expect, test } from 'vitest';
import { solveLeastSquares } from '../../../../../server/core/substance/fit/least-squares.ts';

const none = { coefficients: new Float64Array(0), targets: new Float64Array(0) };

function rows(...equations: readonly (readonly number[])[]): { coefficients: Float64Array; targets: Float64Array } {
  return {
    coefficients: Float64Array.from(equations.flatMap((equation) => equation.slice(0, -1))),
    targets: Float64Array.from(equations, (equation) => equation.at(-1) ?? 0),
  };
}

describe('without constraints', () => {
  test('a straight line through scattered points has the slope and intercept of the closed formula', () => {
    const points = [
      [0, 1],
      [1, 3],
      [2, 2],
      [3, 5],
    ] as const;
    const [intercept, slope] = solveLeastSquares(rows(...points.map(([x, y]) => [1, x, y])), none, 2);
    // slope = sum (x - 1.5)(y - 2.75) / sum (x - 1.5)^2 = 5.5 / 5
    expect(slope).toBeCloseTo(1.1, 12);
    expect(intercept).toBeCloseTo(2.75 - 1.1 * 1.5, 12);
  });

  test('columns of very different size are solved alike', () => {
    const solution = solveLeastSquares(rows([1e9, 1, 3e9], [1e9, 2, 3e9 + 2], [2e9, -1, 6e9 - 2]), none, 2);
    expect(solution[0]).toBeCloseTo(3, 8);
    expect(solution[1]).toBeCloseTo(2 / 3, 0);
  });

  test('the residual is at right angles to every column', () => {
    const equations = [
      [1, 2, 3, 4],
      [2, -1, 0, 1],
      [0, 1, 5, -2],
      [3, 3, 1, 0],
      [-1, 4, 2, 2],
    ];
    const solution = solveLeastSquares(rows(...equations), none, 3);
    for (const column of [0, 1, 2]) {
      let product = 0;
      for (const equation of equations) {
        const value = equation.slice(0, 3).reduce((sum, factor, index) => sum + factor * (solution[index] ?? 0), 0);
        product += (equation[column] ?? 0) * (value - (equation[3] ?? 0));
      }
      expect(product).toBeCloseTo(0, 10);
    }
  });

  test('an unknown that no row sees does not spoil the others', () => {
    const solution = solveLeastSquares(rows([1, 0, 2], [2, 0, 4]), none, 2);
    expect([...solution]).toEqual([expect.closeTo(2, 12), 0]);
  });
});

describe('with constraints', () => {
  test('the point of a line that is nearest to a point', () => {
    // Nearest to (0, 0) on x + y = 2 is (1, 1); the rows alone would say (0, 0).
    const solution = solveLeastSquares(rows([1, 0, 0], [0, 1, 0]), rows([1, 1, 2]), 2);
    expect([...solution]).toEqual([expect.closeTo(1, 12), expect.closeTo(1, 12)]);
  });

  test('constraints alone decide when there are as many as unknowns', () => {
    const solution = solveLeastSquares(rows([1, 1, 100]), rows([1, 1, 3], [1, -1, 1]), 2);
    expect([...solution]).toEqual([expect.closeTo(2, 12), expect.closeTo(1, 12)]);
  });

  test('one that follows from earlier ones is left out', () => {
    const solution = solveLeastSquares(rows([1, 0, 5]), rows([1, 1, 2], [2, 2, 4]), 2);
    expect([...solution]).toEqual([expect.closeTo(5, 12), expect.closeTo(-3, 12)]);
  });
});
