// Proves an answer that lies at the end of a crystal's data. There the energy held lies between two equilibria, with the crystal
// and without it, and no single state of lowest energy has it: the answer must be both, in the shares that give what is held,
// and each of them is proven by itself. Knows no way of finding either. Invariant: for any other answer this is faultsOf.

import type { Equilibrium, Held } from '../../server/core/equilibrium/equilibrium.ts';
import type { EquilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import { faultsOf } from './equilibrium-proof.ts';

/** What is wrong with an answer, in words; empty for a proven one. */
export function faultsOfAnswer(
  solver: EquilibriumSolver,
  elementMol: Float64Array,
  held: Held,
  answer: Equilibrium,
): string[] {
  const { pinned, temperatureK, candidates } = answer;
  if (pinned?.by !== 'end-of-phase') return faultsOf(elementMol, held, answer);
  const ends = pinned.leaving.map((index) => candidates.endK[index] ?? NaN);
  if (!ends.some((endK) => Math.abs(temperatureK / endK - 1) < 1e-9)) return [`no phase ends at ${temperatureK} K`];
  const [low, high] = [temperatureK * (1 - 1e-9), temperatureK * (1 + 1e-9)].map((temperature) => {
    const atEnd: Held =
      'pressurePa' in held
        ? { held: 'temperature-pressure', temperatureK: temperature, pressurePa: held.pressurePa }
        : { held: 'temperature-volume', temperatureK: temperature, volumeM3: held.volumeM3 };
    const state = solver.solve(elementMol, atEnd);
    return state.kind === 'none' ? [JSON.stringify(state)] : [state, ...faultsOf(elementMol, atEnd, state)];
  });
  const faults = [low, high].flatMap((parts) => parts?.filter((part) => typeof part === 'string') ?? []);
  const [before, after] = [low?.[0], high?.[0]];
  if (typeof before !== 'object' || typeof after !== 'object') return [...faults, 'no two sides'];
  const asked = 'enthalpyJ' in held ? held.enthalpyJ : 'energyJ' in held ? held.energyJ : entropyOf(held);
  const amountOf = (state: Equilibrium): number =>
    'enthalpyJ' in held
      ? state.enthalpyJ
      : 'energyJ' in held
        ? state.enthalpyJ - state.pressurePa * state.volumeM3
        : state.entropyJPerK;
  const [lowValue, highValue] = [amountOf(before), amountOf(after)];
  const share = (asked - lowValue) / (highValue - lowValue);
  if (!(share > -1e-6 && share < 1 + 1e-6)) faults.push(`asked is not between its sides: ${share}`);
  // The two sides stand 1e-9 off the end, and answers have ten digits or so.
  const isOff = (stated: number, lowSide: number, highSide: number): boolean =>
    Math.abs(stated - lowSide - share * (highSide - lowSide)) > 1e-6 * Math.max(Math.abs(lowSide), Math.abs(highSide));
  answer.amountsMol.forEach((mol, index) => {
    const [lowMol, highMol] = [before.amountsMol[index] ?? NaN, after.amountsMol[index] ?? NaN];
    if (isOff(mol, lowMol, highMol)) faults.push(`${candidates.phases[index]?.id}: ${mol} of ${lowMol} and ${highMol}`);
    if (index >= candidates.gasCount && !Number.isNaN(answer.logFractions[index] ?? 0)) {
      faults.push(`${candidates.phases[index]?.id} has a fraction of the gas`);
    }
  });
  for (const total of ['enthalpyJ', 'entropyJPerK', 'volumeM3', 'gasMol', 'condensedMassShare'] as const) {
    if (isOff(answer[total], before[total], after[total])) faults.push(`${total} ${answer[total]}`);
  }
  return faults;
}

function entropyOf(held: Held): number {
  return 'entropyJPerK' in held ? held.entropyJPerK : NaN;
}
