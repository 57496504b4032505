// Puts a question to the minimiser and judges what comes back: an answer by its proof, a refusal by whether it is true.

import type { EquilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import { faultsOfAnswer } from './equilibrium-blends.ts';
import { amountsOf, answerTo } from './equilibrium-problems.ts';
import type { EquilibriumProblem } from './equilibrium-problems.ts';
import { doubtOf } from './equilibrium-refusals.ts';

/** What is wrong with the answer to a question, and whether there was one at all. */
export function tried(
  problem: EquilibriumProblem,
  solver: EquilibriumSolver,
): { faults: string[]; isAnswered: boolean } {
  const amounts = amountsOf(problem);
  const answer = answerTo(problem, solver);
  if (answer.kind === 'equilibrium') {
    return { faults: faultsOfAnswer(solver, amounts, problem.held, answer), isAnswered: true };
  }
  const doubt = doubtOf(solver, amounts, problem.held, answer);
  return { faults: doubt === undefined ? [] : [doubt], isAnswered: false };
}
