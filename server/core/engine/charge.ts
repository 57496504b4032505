// What an engine of any kind compresses: fresh gas, residual gas and vaporised fuel as one mixture that does not react, and
// how its state moves when it is compressed or heated.
//
// How an engine is put together from this room:
//   1. `gasOf` makes the fresh gas from mol of each gas by id (`O2(g)`), `joined` adds mixtures up; a state is
//      `mixture.solve(held)` with any two held properties, as the minimiser takes them (frozen-mixture.ts);
//   2. `compressed` moves a state to a volume or a pressure: isentropic, polytropic by exponent (what that gives to the walls
//      is `heatOutJ`), or with the efficiency of a compressor;
//   3. `reactingCharge` (reacting-charge.ts) takes the elements of everything that burns, and its `burnt(held)` is the
//      equilibrium state after combustion at a volume or a pressure;
//   4. `expansionFrom` (expansion.ts) carries that on: in equilibrium or frozen below a temperature, its particles with the
//      gas or keeping their heat; `corners` are the four of a metal-bearing charge.
// Amounts are per kg of fuel throughout, enthalpies on the scale where elements at 298.15 K have none, so that a state after
// combustion has the enthalpy of what went into it.
// Knows no fuel's name and no cycle. Invariant: work, heat and change of energy of every step close by construction.

import type { NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { phaseOfId } from '../substance/phases.ts';
import type { FrozenMixture, MixturePart, MixtureSpecies, MixtureState } from './frozen-mixture.ts';
import { frozenMixture } from './frozen-mixture.ts';

/** The gases of a list (mol by id with its phase), or the ids the tables do not have. */
export function gasOf(
  molOfId: ReadonlyMap<string, number>,
): FrozenMixture | { readonly kind: 'unknown-gases'; readonly ids: readonly string[] } {
  const parts: MixturePart[] = [];
  const unknown: string[] = [];
  for (const [id, mol] of molOfId) {
    const species = phaseOfId(id);
    if (species?.formula.phase === 'g') parts.push({ species, mol });
    else unknown.push(id);
  }
  return unknown.length > 0 ? { kind: 'unknown-gases', ids: unknown } : frozenMixture(parts);
}

/** Several mixtures as one. */
export function joined(...mixtures: readonly FrozenMixture[]): FrozenMixture {
  return frozenMixture(mixtures.flatMap(({ parts }) => parts));
}

/** The mixture times a factor; nothing of it with 0. */
export function scaled(mixture: FrozenMixture, factor: number): FrozenMixture {
  return frozenMixture(mixture.parts.map(({ species, mol }): MixturePart => ({ species, mol: mol * factor })));
}

/** A gas of the tables, for parts that are put together by hand. */
export function gasSpecies(id: string): MixtureSpecies | undefined {
  return phaseOfId(id);
}

/** Where a compression or an expansion ends. */
export type Target = { readonly volumeM3: number } | { readonly pressurePa: number };

/**
 * How a gas is compressed. `exponent` is the n of p Vⁿ = const, and heat passes the walls. The efficiencies are those of an
 * adiabatic machine in steady flow (to a pressure only): `isentropic` of the whole rise, `polytropic` of each small part of it,
 * with variable specific heats: R ln(p₂/p₁) over the rise of the standard entropy.
 */
export type CompressionLaw =
  | { readonly law: 'isentropic' }
  | { readonly law: 'exponent'; readonly exponent: number }
  | { readonly law: 'isentropic-efficiency'; readonly efficiency: number }
  | { readonly law: 'polytropic-efficiency'; readonly efficiency: number };

export interface Compressed {
  readonly kind: 'compressed';
  readonly state: MixtureState;
  /** Done on the gas by the piston (∫ p dV), with what a change of its energy and the heat out leave. */
  readonly pistonWorkJ: number;
  /** Rise of enthalpy and heat out: the work of a machine in steady flow. */
  readonly shaftWorkJ: number;
  /** Given to the walls; 0 but with an exponent. */
  readonly heatOutJ: number;
}

/** A gas moved to a volume or a pressure; also upwards in volume. */
export function compressed(from: MixtureState, to: Target, law: CompressionLaw): Compressed | NoEquilibrium {
  const { mixture } = from;
  switch (law.law) {
    case 'isentropic':
      return adiabatic(from, isentropic(from, to));
    case 'exponent':
      return byExponent(from, to, law.exponent);
    case 'isentropic-efficiency': {
      const ideal = isentropic(from, to);
      if (ideal.kind === 'none') return ideal;
      const enthalpyJ = from.enthalpyJ + (ideal.enthalpyJ - from.enthalpyJ) / law.efficiency;
      const held = { held: 'enthalpy-pressure', enthalpyJ, pressurePa: ideal.pressurePa } as const;
      return adiabatic(from, mixture.solve(held, ideal.temperatureK));
    }
    case 'polytropic-efficiency': {
      const pressurePa = 'pressurePa' in to ? to.pressurePa : Number.NaN;
      const entropyRiseJPerK =
        (1 / law.efficiency - 1) * mixture.gasMol * molarGasConstantJPerMolK * Math.log(pressurePa / from.pressurePa);
      const held = {
        held: 'entropy-pressure',
        entropyJPerK: from.entropyJPerK + entropyRiseJPerK,
        pressurePa,
      } as const;
      return adiabatic(from, mixture.solve(held, from.temperatureK));
    }
  }
}

function isentropic(
  { mixture, entropyJPerK, temperatureK, volumeM3 }: MixtureState,
  to: Target,
): MixtureState | NoEquilibrium {
  if ('pressurePa' in to) {
    return mixture.solve({ held: 'entropy-pressure', entropyJPerK, pressurePa: to.pressurePa }, temperatureK);
  }
  // Near enough to start from: a gas of two atoms.
  const nearK = temperatureK * (volumeM3 / to.volumeM3) ** 0.37;
  return mixture.solve({ held: 'entropy-volume', entropyJPerK, volumeM3: to.volumeM3 }, nearK);
}

function adiabatic(from: MixtureState, state: MixtureState | NoEquilibrium): Compressed | NoEquilibrium {
  if (state.kind === 'none') return state;
  return {
    kind: 'compressed',
    state,
    pistonWorkJ: state.energyJ - from.energyJ,
    shaftWorkJ: state.enthalpyJ - from.enthalpyJ,
    heatOutJ: 0,
  };
}

function byExponent(from: MixtureState, to: Target, exponent: number): Compressed | NoEquilibrium {
  const volumeM3 = 'volumeM3' in to ? to.volumeM3 : from.volumeM3 * (from.pressurePa / to.pressurePa) ** (1 / exponent);
  const logRatio = Math.log(from.volumeM3 / volumeM3);
  const temperatureK = from.temperatureK * Math.exp((exponent - 1) * logRatio);
  const state = from.mixture.solve({ held: 'temperature-volume', temperatureK, volumeM3 });
  if (state.kind === 'none') return state;
  // ∫ p dV of p Vⁿ = const; near n = 1 the difference quotient loses its digits.
  const power = (exponent - 1) * logRatio;
  const mean = Math.abs(power) < 1e-8 ? 1 + power / 2 : Math.expm1(power) / power;
  const pistonWorkJ = from.pressurePa * from.volumeM3 * logRatio * mean;
  const heatOutJ = pistonWorkJ - (state.energyJ - from.energyJ);
  return {
    kind: 'compressed',
    state,
    pistonWorkJ,
    shaftWorkJ: state.enthalpyJ - from.enthalpyJ + heatOutJ,
    heatOutJ,
  };
}
