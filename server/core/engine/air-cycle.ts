// The air-standard cycle: one gas that never changes, heat added where the fuel would burn and taken out at the largest
// volume. With heat capacities that vary, or constant ones, by the gas it is given; beside a cycle on the real charge it shows
// what dissociation, residual gas and particles cost.
// Knows no fuel. Invariant: work is heat in less heat out; with constant heat capacities the closed forms of Otto, Diesel and
// dual cycle come out to rounding.

import type { Held, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { compressed } from './charge.ts';
import { gasByHeatCapacity } from './gas-by-heat-capacity.ts';
import { frozenMixture } from './frozen-mixture.ts';
import type { FrozenMixture, MixtureState } from './frozen-mixture.ts';
import type { HeatRelease } from './reciprocating.ts';

/** Where a stage of heating ends: at a temperature, at a ratio (of pressures or of volumes: the cut-off), or by its heat in J. */
export type StageEnd =
  | { readonly to: 'temperature'; readonly temperatureK: number }
  | { readonly to: 'ratio'; readonly ratio: number }
  | { readonly to: 'heat'; readonly heatJ: number };

export interface AirCycleInput {
  readonly gas: FrozenMixture;
  readonly compressionRatio: number;
  readonly temperatureK: number;
  readonly pressurePa: number;
  /** Heat at constant volume, then at constant pressure; null: none of it. */
  readonly atVolume: StageEnd | null;
  readonly atPressure: StageEnd | null;
}

export interface AirCycle {
  readonly kind: 'air-cycle';
  /** 1, 2, after each stage of heating, and the end of expansion. */
  readonly filled: MixtureState;
  readonly compressed: MixtureState;
  readonly heatedAtVolume: MixtureState;
  readonly heated: MixtureState;
  readonly expanded: MixtureState;
  readonly heatInJ: number;
  readonly heatOutJ: number;
  readonly workJ: number;
  readonly efficiency: number;
  readonly meanEffectivePressurePa: number;
  /** Volume after over before heating at constant pressure. */
  readonly cutOffRatio: number;
}

/** The cycle; none where a state lies beyond all data, or where expansion would have to end before it begins. */
export function airCycle(input: AirCycleInput): AirCycle | NoEquilibrium {
  const { gas, compressionRatio, temperatureK, pressurePa } = input;
  const filled = gas.solve({ held: 'temperature-pressure', temperatureK, pressurePa }, temperatureK);
  if (filled.kind === 'none') return filled;
  const squeezed = compressed(filled, { volumeM3: filled.volumeM3 / compressionRatio }, { law: 'isentropic' });
  if (squeezed.kind === 'none') return squeezed;
  const heatedAtVolume = atVolume(squeezed.state, input.atVolume);
  if (heatedAtVolume.kind === 'none') return heatedAtVolume;
  const heated = atPressure(heatedAtVolume, input.atPressure);
  if (heated.kind === 'none') return heated;
  const opened = compressed(heated, { volumeM3: filled.volumeM3 }, { law: 'isentropic' });
  if (opened.kind === 'none') return opened;
  const heatInJ = heatedAtVolume.energyJ - squeezed.state.energyJ + (heated.enthalpyJ - heatedAtVolume.enthalpyJ);
  const heatOutJ = opened.state.energyJ - filled.energyJ;
  const workJ = heatInJ - heatOutJ;
  return {
    kind: 'air-cycle',
    filled,
    compressed: squeezed.state,
    heatedAtVolume,
    heated,
    expanded: opened.state,
    heatInJ,
    heatOutJ,
    workJ,
    efficiency: workJ / heatInJ,
    meanEffectivePressurePa: workJ / (filled.volumeM3 - squeezed.state.volumeM3),
    cutOffRatio: heated.volumeM3 / heatedAtVolume.volumeM3,
  };
}

function atVolume(from: MixtureState, end: StageEnd | null): MixtureState | NoEquilibrium {
  const { volumeM3, mixture } = from;
  if (end === null) return from;
  return mixture.solve(
    end.to === 'heat'
      ? { held: 'energy-volume', energyJ: from.energyJ + end.heatJ, volumeM3 }
      : { held: 'temperature-volume', temperatureK: temperatureAt(from, end), volumeM3 },
    from.temperatureK,
  );
}

function atPressure(from: MixtureState, end: StageEnd | null): MixtureState | NoEquilibrium {
  const { pressurePa, mixture } = from;
  if (end === null) return from;
  const held: Held =
    end.to === 'heat'
      ? { held: 'enthalpy-pressure', enthalpyJ: from.enthalpyJ + end.heatJ, pressurePa }
      : { held: 'temperature-pressure', temperatureK: temperatureAt(from, end), pressurePa };
  return mixture.solve(held, from.temperatureK);
}

function temperatureAt(from: MixtureState, end: Exclude<StageEnd, { readonly to: 'heat' }>): number {
  return end.to === 'temperature' ? end.temperatureK : from.temperatureK * end.ratio;
}

/**
 * The two stages of so much heat in J, released as a fuel's is: at the smallest volume, at the pressure of compression, or at
 * that volume until the pressure reaches its limit. `compressedState` is state 2 of the same gas.
 */
export function stagesOf(
  heatRelease: HeatRelease,
  heatJ: number,
  compressedState: MixtureState,
): Pick<AirCycleInput, 'atVolume' | 'atPressure'> | NoEquilibrium {
  const heat: StageEnd = { to: 'heat', heatJ };
  if (heatRelease.at === 'volume') return { atVolume: heat, atPressure: null };
  const { pressurePa, temperatureK, energyJ } = compressedState;
  if (heatRelease.at === 'pressure' || heatRelease.maximumPressurePa <= pressurePa) {
    return { atVolume: null, atPressure: heat };
  }
  const ratio = heatRelease.maximumPressurePa / pressurePa;
  const limit = compressedState.mixture.solve(
    { held: 'temperature-volume', temperatureK: temperatureK * ratio, volumeM3: compressedState.volumeM3 },
    temperatureK * ratio,
  );
  // Beyond all data the limit is out of reach of any heat that is not.
  if (limit.kind === 'none') return limit.reason === 'outside-tables' ? { atVolume: heat, atPressure: null } : limit;
  const atVolumeJ = limit.energyJ - energyJ;
  return atVolumeJ >= heatJ
    ? { atVolume: heat, atPressure: null }
    : { atVolume: { to: 'heat', heatJ: atVolumeJ }, atPressure: { to: 'heat', heatJ: heatJ - atVolumeJ } };
}

/** mol of a gas whose heat capacities are constant in the ratio gamma. */
export function constantPropertyGas(mol: number, gamma: number): FrozenMixture {
  return frozenMixture([
    {
      species: gasByHeatCapacity({
        id: `gas of constant properties, ${String(gamma)}`,
        composition: new Map(),
        molarMassKgPerMol: airKgPerMol,
        enthalpyJPerMol: 0,
        heatCapacityJPerMolK: (gamma / (gamma - 1)) * molarGasConstantJPerMolK,
        heatCapacityRiseJPerMolK2: 0,
        validK: [0, Infinity],
      }),
      mol,
    },
  ]);
}

/** Of dry air; with constant properties no result per kilogram of fuel depends on it. */
const airKgPerMol = 0.028965;
