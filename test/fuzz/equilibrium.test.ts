// Random questions to the minimiser: each answer is proven from outside, each refusal is checked to be true. Twenty thousand in
// the suite; two hundred thousand others in `npm run fuzz`. A question is named by its number, so a failure can be asked again;
// those that once failed stand in equilibrium-regressions.json in full.

import { expect, test } from 'vitest';
import { equilibriumProblem } from '../support/equilibrium-problems.ts';
import { tried } from '../support/equilibrium-trial.ts';

const PROBLEMS = Number(process.env['FUZZ_PROBLEMS'] ?? 20_000);
const FIRST = Number(process.env['FUZZ_FIRST'] ?? 1_000_000);

const reasonableTimeMs = 60_000 + 10 * PROBLEMS;

test(`${PROBLEMS} random questions from number ${FIRST} on`, { timeout: reasonableTimeMs }, () => {
  const failures: string[] = [];
  const answered = new Map<string, number>();
  for (let seed = FIRST; seed < FIRST + PROBLEMS && failures.length < 10; seed += 1) {
    const { problem, solver } = equilibriumProblem(seed);
    const { faults, isAnswered } = tried(problem, solver);
    if (isAnswered) answered.set(problem.held.held, (answered.get(problem.held.held) ?? 0) + 1);
    if (faults.length === 0) continue;
    const elementMol = Float64Array.from(problem.ions ? [...problem.elementMol, 0] : problem.elementMol);
    const answer = solver.solve(elementMol, problem.held);
    // A change inside one phase's table has two heats at one temperature, and the proof knows one of them only.
    if (answer.kind === 'none' || answer.pinned?.by !== 'transition') {
      failures.push(`${seed} ${JSON.stringify(problem)}: ${faults.join('; ')}`);
    }
  }
  expect(failures).toEqual([]);
  // A run in which hardly anything has an answer would show nothing.
  const least = Object.fromEntries([...answered].map(([held, count]) => [held, count > PROBLEMS / 20]));
  expect(least).toEqual({
    'temperature-pressure': true,
    'enthalpy-pressure': true,
    'entropy-pressure': true,
    'temperature-volume': true,
    'energy-volume': true,
    'entropy-volume': true,
  });
});
