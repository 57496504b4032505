// The states between the corners of a cycle: compression and expansion as series of points for a plot of pressure over volume,
// and where the limit on pressure is reached while the fuel still burns.
// Knows the cycle as it was solved and changes nothing of it. Invariant: the series begin and end in the cycle's own states;
// each point starts from the one before it, within one question.

import type { Equilibrium, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { compressed } from './charge.ts';
import type { ExpandingState } from './expansion.ts';
import type { MixtureState } from './frozen-mixture.ts';
import type { EngineCharge, SolvedCycle } from './work-cycle.ts';

export interface CyclePath {
  /** From 1 to 2, and from 3 to 4, at volumes in equal ratios. */
  readonly compression: readonly MixtureState[];
  readonly expansion: readonly ExpandingState[];
  /** True where a state could not be had; the series then ends before it. */
  readonly incomplete: boolean;
}

/** The states of a cycle at so many points of its expansion, and of its compression. */
export function cyclePath(
  { input }: EngineCharge,
  { cycle, expansion }: SolvedCycle,
  expansionPoints = 100,
  compressionPoints = 40,
): CyclePath {
  const volumes = (fromM3: number, toM3: number, count: number): readonly number[] =>
    Array.from({ length: count }, (_, k) => fromM3 * (toM3 / fromM3) ** (k / (count - 1)));
  let incomplete = false;
  const compression: MixtureState[] = [cycle.filled];
  for (const volumeM3 of volumes(cycle.filled.volumeM3, cycle.compressed.volumeM3, compressionPoints).slice(1)) {
    const step = compressed(compression.at(-1) ?? cycle.filled, { volumeM3 }, input.compression);
    if (step.kind === 'none') {
      incomplete = true;
      break;
    }
    compression.push(step.state);
  }
  const expanding: ExpandingState[] = [expansion.start];
  const { entropyJPerK } = expansion.start;
  for (const volumeM3 of volumes(cycle.burnt.volumeM3, cycle.expanded.volumeM3, expansionPoints).slice(1)) {
    const state = expansion.to({ held: 'entropy-volume', entropyJPerK, volumeM3 }, expanding.at(-1));
    if (state.kind === 'none') {
      incomplete = true;
      break;
    }
    expanding.push(state);
  }
  return { compression, expansion: expanding, incomplete };
}

/** State 3a: the share of the injected fuel that has burnt at the smallest volume when the limit is reached. */
export interface LimitReached {
  readonly kind: 'limit-reached';
  readonly burntShare: number;
  readonly state: Equilibrium;
}

/**
 * Found in the share of the fuel, over which pressure rises. Null where the limit is not reached while burning, and where the
 * fuel is in the fresh gas: what has not burnt then still fills part of the volume, and the state is not one state.
 */
export function limitReached(engine: EngineCharge, solved: SolvedCycle): LimitReached | NoEquilibrium | null {
  const { input, injectedEnthalpyJ, lowerHeatingValueJ } = engine;
  const { cycle, contentTimes, passengersJ } = solved;
  const { heatRelease, fuels, completeness } = input;
  if (cycle.limit !== 'reached' || heatRelease.at !== 'limited') return null;
  if (fuels.some(({ vapour }) => vapour !== null)) return null;
  const { energyJ, pressurePa, volumeM3 } = cycle.compressed;
  const heatJ = lowerHeatingValueJ * input.wallLossShare * input.wallLossInCombustion;
  const at = (share: number, near?: Equilibrium): Equilibrium | NoEquilibrium => {
    const amounts = new Map(input.freshGas.elementMol);
    const add = (symbol: string, mol: number): void => void amounts.set(symbol, (amounts.get(symbol) ?? 0) + mol);
    for (const [symbol, mol] of engine.burningMol) add(symbol, (contentTimes - 1) * mol);
    for (const { elementMol } of fuels) {
      for (const [symbol, mol] of elementMol) add(symbol, share * completeness * mol);
    }
    const withShareJ = energyJ + passengersJ + share * (completeness * injectedEnthalpyJ - heatJ);
    return engine.reacting.withAmounts(amounts).burnt({ held: 'energy-volume', energyJ: withShareJ, volumeM3 }, near);
  };
  const all = at(1, cycle.burnt);
  if (all.kind === 'none') return all;
  const { maximumPressurePa } = heatRelease;
  let low = { share: 0, excess: pressurePa / maximumPressurePa - 1 };
  let high = { share: 1, excess: all.pressurePa / maximumPressurePa - 1 };
  let state: Equilibrium = all;
  for (let step = 0; step < 60; step += 1) {
    // False position: pressure over the share is nearly straight.
    const share = low.share - (low.excess * (high.share - low.share)) / (high.excess - low.excess);
    const next = at(share, state);
    if (next.kind === 'none') return next;
    state = next;
    const excess = state.pressurePa / maximumPressurePa - 1;
    if (Math.abs(excess) < 1e-10) return { kind: 'limit-reached', burntShare: share, state };
    if (excess > 0) high = { share, excess };
    else low = { share, excess };
  }
  return { kind: 'none', reason: 'not-converged', detail: JSON.stringify({ low, high, maximumPressurePa }) };
}
