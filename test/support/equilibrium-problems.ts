// Random questions to the minimiser, each made by a number alone, so that a failure can be named and asked again: one to eight
// elements, amounts over twelve powers of ten and exact proportions of compounds, all six pairs of held properties, any pressure
// from 10 Pa to 1000 bar. Knows no answer. Invariant: the same number gives the same question as long as data and this file stay.
// Energies, entropies and volumes that are held come from a state at a temperature, or are far from any.

import { candidateSet, charge } from '../../server/core/equilibrium/candidates.ts';
import type { CandidateSet } from '../../server/core/equilibrium/candidates.ts';
import type { Equilibrium, Held } from '../../server/core/equilibrium/equilibrium.ts';
import { equilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import type { EquilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import { allPhases } from '../../server/core/substance/phases.ts';

/** Everything that is needed to ask again; plain data. */
export interface EquilibriumProblem {
  readonly elements: readonly string[];
  readonly ions: boolean;
  /** Phases kept out, by id. */
  readonly without: readonly string[];
  /** mol, in the order of `elements`. */
  readonly elementMol: readonly number[];
  readonly held: Held;
  /** A state of the same elements to start from. */
  readonly near?: { readonly temperatureK: number; readonly pressurePa: number };
}

/** Questions that share their candidates, because preparing these costs more than asking. */
export const problemsOfOneSet = 10;

/** Uniform numbers in [0, 1) from a whole number: 32 bits by one multiplication and shifts a step. */
export function randomSource(seed: number): () => number {
  let state = Math.imul(seed ^ 0x9e3779b9, 0x85ebca6b) | 0;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

type Random = () => number;

const elementsInData = [...new Set(allPhases().flatMap((phase) => [...phase.formula.composition.keys()]))].sort();
const noble = ['Ar', 'He'];

const between = (random: Random, from: number, to: number): number => from + (to - from) * random();
const logBetween = (random: Random, from: number, to: number): number =>
  Math.exp(between(random, Math.log(from), Math.log(to)));
const oneOf = <T>(random: Random, values: readonly T[]): T => {
  const value = values[Math.floor(random() * values.length)];
  if (value === undefined) throw new Error('nothing to choose from');
  return value;
};

let kept: { readonly set: number; readonly solver: EquilibriumSolver } | undefined;

/** The question of that number, and the solver to ask. */
export function equilibriumProblem(seed: number): { problem: EquilibriumProblem; solver: EquilibriumSolver } {
  const set = Math.floor(seed / problemsOfOneSet);
  if (kept?.set !== set) kept = { set, solver: equilibriumSolver(randomCandidates(randomSource(set * 2 + 1))) };
  const { solver } = kept;
  const random = randomSource(seed * 2);
  const { candidates } = solver;
  const elements = candidates.elements.filter((element) => element !== charge);
  const admitted = new Set(candidates.phases.map(({ id }) => id));
  const problem: Omit<EquilibriumProblem, 'held'> = {
    elements,
    ions: elements.length < candidates.elements.length,
    without: possiblePhases(elements, elements.length < candidates.elements.length).filter((id) => !admitted.has(id)),
    elementMol: randomAmounts(random, elements, candidates),
  };
  const temperatureK = random() < 0.5 ? between(random, 300, 5000) : logBetween(random, 300, 5000);
  const pressurePa = random() < 0.3 ? 101_325 : logBetween(random, 10, 1e8);
  const held = randomHeld(random, { solver, problem, temperatureK, pressurePa });
  if (random() >= 0.2) return { problem: { ...problem, held }, solver };
  const near = {
    temperatureK: random() < 0.5 ? temperatureK * between(random, 0.95, 1.05) : between(random, 300, 5000),
    pressurePa: random() < 0.5 ? pressurePa : logBetween(random, 10, 1e8),
  };
  return { problem: { ...problem, held, near }, solver };
}

/** The solver that a written question needs. */
export function solverOfProblem({ elements, ions, without }: EquilibriumProblem): EquilibriumSolver {
  const left = new Set(without);
  return equilibriumSolver(candidateSet(elements, { ions, admits: (phase) => !left.has(phase.id) }));
}

/** The amounts as the solver wants them, the charge's being 0. */
export function amountsOf(problem: EquilibriumProblem): Float64Array {
  return Float64Array.from(problem.ions ? [...problem.elementMol, 0] : problem.elementMol);
}

/** The answer to a question; a state to start from is found first, and left out where there is none. */
export function answerTo(
  problem: EquilibriumProblem,
  solver: EquilibriumSolver,
): ReturnType<EquilibriumSolver['solve']> {
  let near: Equilibrium | undefined;
  if (problem.near !== undefined) {
    const start = solver.solve(amountsOf(problem), { held: 'temperature-pressure', ...problem.near });
    if (start.kind === 'equilibrium') near = start;
  }
  return solver.solve(amountsOf(problem), problem.held, near);
}

function possiblePhases(elements: readonly string[], ions: boolean): string[] {
  return candidateSet(elements, { ions }).phases.map(({ id }) => id);
}

function randomCandidates(random: Random): CandidateSet {
  const kind = random();
  if (kind < 0.03) return candidateSet(random() < 0.5 ? noble : [oneOf(random, noble)]);
  const count = kind < 0.12 ? 1 : 1 + Math.floor(random() * 8);
  const elements = new Set<string>();
  // Fuels first: random eighths of the table hardly ever hold carbon, hydrogen and oxygen together.
  if (count >= 3 && random() < 0.5) for (const symbol of ['C', 'H', 'O']) elements.add(symbol);
  while (elements.size < count) elements.add(oneOf(random, elementsInData));
  const ions = random() < 0.15;
  const share = random();
  const kept = new Map<string, boolean>();
  const admits = (keep: (isGas: boolean) => boolean): CandidateSet =>
    candidateSet([...elements], {
      ions,
      admits: (phase) => {
        const known = kept.get(phase.id) ?? keep(phase.formula.phase === 'g');
        kept.set(phase.id, known);
        return known;
      },
    });
  if (share < 0.08) return admits((isGas) => !isGas);
  if (share < 0.12) return admits((isGas) => isGas);
  if (share < 0.22) return admits(() => random() < 0.6);
  return admits(() => true);
}

/** mol: any proportions over twelve powers of ten, or exactly those of some of the phases, with traces or without. */
function randomAmounts(random: Random, elements: readonly string[], { phases }: CandidateSet): number[] {
  const scale = random() < 0.5 ? 1 : logBetween(random, 1e-6, 1e6);
  const amounts = elements.map(() => 0);
  if (random() < 0.5 || phases.length === 0) {
    const lowest = random() < 0.5 ? 1e-12 : 1e-2;
    for (let e = 0; e < amounts.length; e += 1) amounts[e] = scale * logBetween(random, lowest, 1);
    return amounts;
  }
  const isWhole = random() < 0.7;
  for (let term = 1 + Math.floor(random() * 3); term > 0; term -= 1) {
    const coefficient = isWhole ? 1 + Math.floor(random() * 4) : logBetween(random, 1e-3, 1);
    for (const [symbol, atoms] of oneOf(random, phases).formula.composition) {
      const e = elements.indexOf(symbol);
      amounts[e] = (amounts[e] ?? 0) + coefficient * atoms;
    }
  }
  const trace = random() < 0.3 ? logBetween(random, 1e-12, 1e-3) : 0;
  const total = amounts.reduce((sum, mol) => sum + mol, 0);
  return amounts.map((mol) => scale * (mol === 0 ? trace * total : mol));
}

interface Question {
  readonly solver: EquilibriumSolver;
  readonly problem: Omit<EquilibriumProblem, 'held'>;
  readonly temperatureK: number;
  readonly pressurePa: number;
}

const heldPairs = [
  'temperature-pressure',
  'temperature-pressure',
  'enthalpy-pressure',
  'entropy-pressure',
  'temperature-volume',
  'energy-volume',
  'entropy-volume',
] as const;

/** What is held: taken from the state at the temperature and pressure, moved from it, or any number at all. */
function randomHeld(random: Random, { solver, problem, temperatureK, pressurePa }: Question): Held {
  const held = oneOf(random, heldPairs);
  const [choice, move] = [random(), random() < 0.5 ? 0 : between(random, -0.3, 0.3)];
  const [farAmount, farVolume] = [between(random, -60, 120), logBetween(random, 1e-6, 1e6)];
  if (held === 'temperature-pressure') return { held, temperatureK, pressurePa };
  const isFar = choice < 0.25;
  const amounts = amountsOf({ ...problem, held: { held: 'temperature-pressure', temperatureK, pressurePa } });
  const atomsMol = amounts.reduce((sum, mol) => sum + mol, 0);
  const perAtoms = 8.314462618 * atomsMol;
  const state = solver.solve(amounts, { held: 'temperature-pressure', temperatureK, pressurePa });
  const isAnswer = state.kind === 'equilibrium';
  const anyVolumeM3 = atomsMol * 0.1 * farVolume;
  const volumeM3 = isAnswer && state.volumeM3 > 0 && (!isFar || choice < 0.12) ? state.volumeM3 : anyVolumeM3;
  const enthalpyJ = isAnswer && !isFar ? state.enthalpyJ + move * perAtoms * temperatureK : farAmount * perAtoms * 298;
  const entropyJPerK = isAnswer && !isFar ? state.entropyJPerK + move * perAtoms : Math.abs(farAmount) * 0.5 * perAtoms;
  switch (held) {
    case 'enthalpy-pressure':
      return { held, enthalpyJ, pressurePa };
    case 'entropy-pressure':
      return { held, entropyJPerK, pressurePa };
    case 'temperature-volume':
      return { held, temperatureK, volumeM3 };
    case 'energy-volume':
      return { held, energyJ: enthalpyJ - (isAnswer ? pressurePa * state.volumeM3 : 0), volumeM3 };
    case 'entropy-volume':
      return { held, entropyJPerK, volumeM3 };
  }
}
