// Questions to the minimiser that some version of it once failed, found at random and kept in full: proven answers or true
// refusals now. A new one is the question that the test of random ones prints, with a word of what was wrong.

import { expect, test } from 'vitest';
import { solverOfProblem } from '../support/equilibrium-problems.ts';
import type { EquilibriumProblem } from '../support/equilibrium-problems.ts';
import { tried } from '../support/equilibrium-trial.ts';
import regressions from './equilibrium-regressions.json' with { type: 'json' };

interface Regression extends EquilibriumProblem {
  readonly was: string;
}

test.each(regressions.problems as readonly unknown[] as readonly Regression[])('$was', (problem) => {
  expect(tried(problem, solverOfProblem(problem)).faults).toEqual([]);
});
