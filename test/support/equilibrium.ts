// Equilibria for tests: solvers kept by their elements, amounts of elements out of formulas, and one figure of an answer by the
// name of its phase. Knows no reference value. Invariant: a question without an answer throws with the reason.

import { candidateSet, charge } from '../../server/core/equilibrium/candidates.ts';
import type { CandidateOptions, CandidateSet } from '../../server/core/equilibrium/candidates.ts';
import type { Equilibrium, Held } from '../../server/core/equilibrium/equilibrium.ts';
import { equilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import type { EquilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import { parseFormula } from '../../server/core/substance/formula.ts';
import { phaseOfId, propertiesOfPhase } from '../../server/core/substance/phases.ts';
import type { ThermoPhase } from '../../server/core/substance/phases.ts';

export const atmospherePa = 101_325;
/** Nitrogen to a mole of oxygen in the air of textbooks: 21 to 79. */
export const nitrogenInAir = 79 / 21;

const solvers = new Map<string, EquilibriumSolver>();

/** The solver over all phases of the elements, written `C H O N`. */
export function solverOf(elements: string): EquilibriumSolver {
  let solver = solvers.get(elements);
  if (solver === undefined) solvers.set(elements, (solver = equilibriumSolver(candidateSet(elements.split(' ')))));
  return solver;
}

/** A solver over some phases only, by their ids. */
export function solverOver(
  elements: string,
  ids: readonly string[],
  options: CandidateOptions = {},
): EquilibriumSolver {
  const admitted = new Set(ids);
  for (const id of ids) phaseCalled(id);
  return equilibriumSolver(
    candidateSet(elements.split(' '), { ...options, admits: (phase: ThermoPhase) => admitted.has(phase.id) }),
  );
}

/** mol of each element, in the order of the candidates, from mol of formulas. */
export function elementMolOf(
  { elements }: Pick<CandidateSet, 'elements'>,
  mixture: Readonly<Record<string, number>>,
): Float64Array {
  const amounts = new Float64Array(elements.length);
  for (const [text, mol] of Object.entries(mixture)) {
    const formula = parseFormula(text);
    if (formula.kind === 'fault') throw new Error(`${text} cannot be read`);
    for (const [symbol, count] of formula.composition) {
      const index = elements.indexOf(symbol);
      if (index < 0 || symbol === charge) throw new Error(`${symbol} is not among ${elements.join(' ')}`);
      amounts[index] = (amounts[index] ?? 0) + mol * count;
    }
  }
  return amounts;
}

/** The answer, or an error that says why there is none. */
export function equilibriumOf(
  solver: EquilibriumSolver,
  mixture: Readonly<Record<string, number>>,
  held: Held,
): Equilibrium {
  const answer = solver.solve(elementMolOf(solver.candidates, mixture), held);
  if (answer.kind === 'none') throw new Error(`no equilibrium: ${JSON.stringify(answer)}`);
  return answer;
}

/** At a temperature in K and a pressure in Pa. */
export function equilibriumAt(
  solver: EquilibriumSolver,
  mixture: Readonly<Record<string, number>>,
  temperatureK: number,
  pressurePa: number,
): Equilibrium {
  return equilibriumOf(solver, mixture, { held: 'temperature-pressure', temperatureK, pressurePa });
}

/** J of a mixture of phases of our own tables, by id, at a temperature. */
export function enthalpyJOf(mixture: Readonly<Record<string, number>>, temperatureK = 298.15): number {
  let sum = 0;
  for (const [id, mol] of Object.entries(mixture)) {
    const properties = propertiesOfPhase(phaseCalled(id), temperatureK);
    if (properties === undefined) throw new Error(`${id} has no properties at ${temperatureK} K`);
    sum += mol * properties.enthalpyJPerMol;
  }
  return sum;
}

export function phaseCalled(id: string): ThermoPhase {
  const phase = phaseOfId(id);
  if (phase === undefined) throw new Error(`no phase ${id}`);
  return phase;
}

/** mol of a phase. */
export function molOf({ candidates, amountsMol }: Equilibrium, id: string): number {
  return amountsMol[indexOf(candidates, id)] ?? NaN;
}

/** Mole fraction of a gas among the gas. */
export function fractionOf({ candidates, logFractions }: Equilibrium, id: string): number {
  return Math.exp(logFractions[indexOf(candidates, id)] ?? NaN);
}

/** Ids of the phases present, of which there is more than 1e-9 of all atoms. */
export function presentIn({ candidates, amountsMol }: Equilibrium): string[] {
  const least = 1e-9 * amountsMol.reduce((sum, mol) => sum + mol, 0);
  return candidates.phases.filter((_, index) => (amountsMol[index] ?? 0) > least).map(({ id }) => id);
}

export function indexOf({ phases }: CandidateSet, id: string): number {
  const index = phases.findIndex((phase) => phase.id === id);
  if (index < 0) throw new Error(`${id} is not among the candidates`);
  return index;
}
