// Hot products as they do work: in chemical equilibrium, or frozen below a temperature; their particles in thermal
// equilibrium with the gas, or keeping the heat they have. From two held properties to the state there.
// Knows no engine; whoever asks says which entropy, energy or enthalpy is left. Invariant: the enthalpy of a state is that of
// everything, particles set apart included, and its volume the gas's alone, so energies balance in every corner alike.
// The corners bracket what particles do: real ones lag behind the gas in temperature, and real gas in composition.

import { frozenState } from '../burn/frozen-state.ts';
import type { MatterState } from '../burn/burn.ts';
import type { Equilibrium, Held, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { mixtureFrozenFrom } from './frozen-mixture.ts';
import type { MixtureState } from './frozen-mixture.ts';
import type { ReactingCharge } from './reacting-charge.ts';

/**
 * How products expand. `equilibrium`: the composition follows · `frozen`: it stays as it is below `frozenBelowK`, or from
 * the start where that is infinite. Particles `with-gas`: one temperature with the gas · `no-heat-back`: what is condensed at
 * the start keeps its heat, and nothing condenses from the gas.
 */
export interface Corner {
  readonly chemistry: 'equilibrium' | 'frozen';
  readonly particles: 'with-gas' | 'no-heat-back';
}

/** The four corners of a charge with particles. Without any, the first of each chemistry says all. */
export const corners: readonly Corner[] = [
  { chemistry: 'equilibrium', particles: 'with-gas' },
  { chemistry: 'equilibrium', particles: 'no-heat-back' },
  { chemistry: 'frozen', particles: 'with-gas' },
  { chemistry: 'frozen', particles: 'no-heat-back' },
];

export interface ExpandingState {
  readonly kind: 'expanding';
  /** Of the gas; particles set apart are hotter. */
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly volumeM3: number;
  /** Of everything. */
  readonly enthalpyJ: number;
  readonly energyJ: number;
  /** Of what shares the gas's temperature: constant in an adiabatic reversible expansion. */
  readonly entropyJPerK: number;
  readonly gasMol: number;
  readonly isFrozen: boolean;
  /** Set apart from the gas, at the temperature they had at the start. */
  readonly apart: ParticlesApart | null;
  /**
   * The composition as tables and deposits read it, here or frozen at another temperature and pressure. Particles set apart
   * are among its amounts, and its enthalpy is that of everything at one temperature.
   */
  readonly matter: (at?: { readonly temperatureK: number; readonly pressurePa: number }) => MatterState;
  /** To start a neighbouring state from. */
  readonly near: Equilibrium | MixtureState;
}

export interface ParticlesApart {
  readonly enthalpyJ: number;
  readonly temperatureK: number;
  readonly massKg: number;
}

export interface Expansion {
  readonly corner: Corner;
  readonly start: ExpandingState;
  /** Energies and enthalpies in `held` are those of everything; an entropy is that of `entropyJPerK`. */
  to(held: Held, near?: ExpandingState): ExpandingState | NoEquilibrium;
}

/**
 * The expansion of burnt products in a corner. A frozen composition is that at `frozenBelowK` on the isentrope through the
 * start; null: that of the start.
 */
export function expansionFrom(
  charge: ReactingCharge,
  start: Equilibrium,
  corner: Corner,
  frozenBelowK: number | null,
): Expansion {
  const isAlone = corner.particles === 'no-heat-back';
  const apart = isAlone && start.condensedMassShare > 0 ? setApart(start) : null;
  const gas = isAlone ? charge.gasAlone(start) : null;
  const equilibrium = (held: Held, near?: Equilibrium): Equilibrium | NoEquilibrium =>
    gas === null ? charge.burnt(held, near) : gas.solve(held, near);
  const describe = (state: Equilibrium | MixtureState, frozenFrom: Equilibrium | null): ExpandingState =>
    expandingState(state, frozenFrom, apart, start);
  const freezesAtOnce = corner.chemistry === 'frozen' && (frozenBelowK === null || start.temperatureK <= frozenBelowK);

  /** What moves at the start: everything, or the gas, whose own equilibrium is that which it had among all. */
  const moving = once((): Equilibrium | NoEquilibrium =>
    gas === null
      ? start
      : gas.solve({
          held: 'temperature-pressure',
          temperatureK: start.temperatureK,
          pressurePa: start.pressurePa,
        }),
  );
  const freezing = once((): Equilibrium | NoEquilibrium => {
    const first = moving();
    if (first.kind === 'none' || freezesAtOnce || frozenBelowK === null) return first;
    return onIsentropeAt(first, frozenBelowK, equilibrium);
  });
  const frozenMixtureOf = once(() => {
    const from = freezing();
    return from.kind === 'none' ? from : { from, mixture: mixtureFrozenFrom(from) };
  });
  const frozenTo = (held: Held, nearK?: number): ExpandingState | NoEquilibrium => {
    const frozen = frozenMixtureOf();
    if ('kind' in frozen) return frozen;
    const state = frozen.mixture.solve(held, nearK ?? frozen.from.temperatureK);
    return state.kind === 'none' ? state : describe(state, frozen.from);
  };

  const first = moving();
  return {
    corner,
    // The gas of a certified state is certain to have one of its own; the start stands in where it has not.
    start: describe(first.kind === 'none' ? start : first, freezesAtOnce && first.kind !== 'none' ? first : null),
    to(held, near) {
      const own = withoutParticles(held, apart);
      const nearMixtureK = near?.isFrozen === true ? near.temperatureK : undefined;
      if (freezesAtOnce) return frozenTo(own, nearMixtureK);
      if (near?.isFrozen === true) {
        const state = frozenTo(own, nearMixtureK);
        if (state.kind === 'none' || frozenBelowK === null || state.temperatureK <= frozenBelowK) return state;
      }
      const state = equilibrium(own, near?.near.kind === 'equilibrium' ? near.near : undefined);
      const isPast =
        corner.chemistry === 'frozen' &&
        frozenBelowK !== null &&
        (state.kind === 'none' || state.temperatureK < frozenBelowK);
      if (isPast) return frozenTo(own);
      return state.kind === 'none' ? state : describe(state, null);
    },
  };
}

/** Whole energies and enthalpies less those of the particles set apart. */
function withoutParticles(held: Held, apart: ParticlesApart | null): Held {
  if (apart === null) return held;
  switch (held.held) {
    case 'enthalpy-pressure':
      return { ...held, enthalpyJ: held.enthalpyJ - apart.enthalpyJ };
    case 'energy-volume':
      return { ...held, energyJ: held.energyJ - apart.enthalpyJ };
    default:
      return held;
  }
}

/** The condensed phases of a state by themselves: their enthalpy is what the gas's leaves. */
function setApart(state: Equilibrium): ParticlesApart {
  const { candidates, amountsMol, temperatureK, massKg, condensedMassShare } = state;
  const condensed = mixtureFrozenFrom({
    ...state,
    amountsMol: amountsMol.map((mol, phase) => (phase < candidates.gasCount ? 0 : mol)),
  });
  // Where a phase change holds the temperature both forms are there, so each counts by its own enthalpy.
  const gases = mixtureFrozenFrom({
    ...state,
    amountsMol: amountsMol.map((mol, phase) => (phase < candidates.gasCount ? mol : 0)),
  }).solve({ held: 'temperature-pressure', temperatureK, pressurePa: state.pressurePa });
  const gasEnthalpyJ = gases.kind === 'mixture' ? gases.enthalpyJ : 0;
  return {
    enthalpyJ: state.enthalpyJ - gasEnthalpyJ,
    temperatureK,
    massKg: condensed.massKg > 0 ? condensed.massKg : massKg * condensedMassShare,
  };
}

function expandingState(
  state: Equilibrium | MixtureState,
  frozenFrom: Equilibrium | null,
  apart: ParticlesApart | null,
  start: Equilibrium,
): ExpandingState {
  const gasMol = state.kind === 'equilibrium' ? state.gasMol : state.mixture.gasMol;
  const enthalpyJ = state.enthalpyJ + (apart?.enthalpyJ ?? 0);
  const { temperatureK, pressurePa, volumeM3 } = state;
  return {
    kind: 'expanding',
    temperatureK,
    pressurePa,
    volumeM3,
    enthalpyJ,
    energyJ: enthalpyJ - gasMol * molarGasConstantJPerMolK * temperatureK,
    entropyJPerK: state.entropyJPerK,
    gasMol,
    isFrozen: frozenFrom !== null,
    apart,
    matter: (at) => {
      const from = frozenFrom ?? (state.kind === 'equilibrium' ? state : start);
      const isWhole = from.candidates === start.candidates;
      if (state.kind === 'equilibrium' && isWhole && at === undefined) return state;
      const whole = isWhole ? from : withParticles(from, start);
      return frozenState(whole, at?.temperatureK ?? temperatureK, { pressurePa: at?.pressurePa ?? pressurePa });
    },
    near: state,
  };
}

/** The gas's composition with the particles of the start (none where it had none), over all candidates. */
function withParticles(gas: Equilibrium, start: Equilibrium): Equilibrium {
  const amountsMol = start.amountsMol.slice();
  amountsMol.set(gas.amountsMol.subarray(0, gas.candidates.gasCount));
  return {
    ...gas,
    candidates: start.candidates,
    amountsMol,
    massKg: start.massKg,
    condensedMassShare: start.condensedMassShare,
  };
}

/** The state on the isentrope through `from` whose temperature is `temperatureK`, found in the logarithm of pressure. */
function onIsentropeAt(
  from: Equilibrium,
  temperatureK: number,
  solve: (held: Held, near?: Equilibrium) => Equilibrium | NoEquilibrium,
): Equilibrium | NoEquilibrium {
  const at = (logPressure: number, near: Equilibrium): Equilibrium | NoEquilibrium =>
    solve({ held: 'entropy-pressure', entropyJPerK: from.entropyJPerK, pressurePa: Math.exp(logPressure) }, near);
  let hot = { log: Math.log(from.pressurePa), excess: Math.log(from.temperatureK / temperatureK), state: from };
  // d ln p / d ln T = γ/(γ - 1) on an isentrope; a little further, so that the answer lies between.
  const slope = from.gamma === null ? 6 : from.gamma / (from.gamma - 1);
  let cold = hot;
  for (let factor = 1.1; cold.excess >= 0; factor *= 1.4) {
    if (factor > 30) return { kind: 'none', reason: 'outside-tables', side: 'below', limitK: temperatureK };
    const log = Math.log(from.pressurePa) - slope * factor * Math.max(Math.log(from.temperatureK / temperatureK), 1e-3);
    const state = at(log, cold.state);
    if (state.kind === 'none') return state;
    cold = { log, excess: Math.log(state.temperatureK / temperatureK), state };
    if (cold.excess >= 0) hot = cold;
  }
  // False position with halving (Illinois); a plateau of a phase change is met from its hot side.
  let hotWeight = hot.excess;
  let coldWeight = cold.excess;
  let last: 'hot' | 'cold' | undefined;
  for (let step = 0; step < 100; step += 1) {
    const log = (hot.log * coldWeight - cold.log * hotWeight) / (coldWeight - hotWeight);
    const state = at(log, cold.state);
    if (state.kind === 'none') return state;
    const excess = Math.log(state.temperatureK / temperatureK);
    if (Math.abs(excess) < 1e-10 || Math.abs(hot.log - cold.log) < 1e-12) return state;
    if (excess > 0) {
      hot = { log, excess, state };
      hotWeight = excess;
      if (last === 'hot') coldWeight /= 2;
      last = 'hot';
    } else {
      cold = { log, excess, state };
      coldWeight = excess;
      if (last === 'cold') hotWeight /= 2;
      last = 'cold';
    }
  }
  return cold.state;
}

function once<T>(compute: () => T): () => T {
  let kept: { readonly value: T } | undefined;
  return () => (kept ??= { value: compute() }).value;
}
