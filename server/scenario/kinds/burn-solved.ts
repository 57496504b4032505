// The states of a burn as its figures read them, and what the scenario asks besides: the exhaust temperature, and sizes that
// have to burn out. Solves nothing before it is read. Invariant: a state that could not be had is null.

import type { Burn, BurnHeatReleased, BurnState, Charge, MatterState } from '../../core/burn/burn.ts';
import type { BurnSensitivities } from '../../core/burn/burn-sensitivities.ts';
import { heatGivenOff } from '../../core/burn/burn-held.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { burnOutsOf, type BurnOutEntries, type PortionBurnOut } from './burn-out-times.ts';
import type { Material } from '../material.ts';
import type { OxidantStream } from '../oxidant-stream.ts';

/** What figures read: of the states as they were solved, or moved by a step. */
export interface BurnReadings {
  readonly charge: Charge;
  readonly flame: () => MatterState | null;
  /** What only a solved state has. */
  readonly response: () => Pick<Equilibrium, 'heatCapacityJPerK' | 'gamma' | 'speedOfSoundMPerS'> | null;
  readonly zone: () => MatterState | null;
  readonly heat: () => Omit<BurnHeatReleased, 'slate'> | null;
  readonly heatAboveJ: () => number | null;
  readonly burnOuts: () => readonly PortionBurnOut[] | null;
}

export interface SolvedBurn {
  readonly burn: Burn;
  readonly flame: Equilibrium;
  readonly zone: () => Equilibrium | null;
  readonly slate: () => BurnHeatReleased | null;
  /** At the exhaust temperature. */
  readonly exhaust: () => BurnState | null;
  readonly heatAboveJ: () => number | null;
  readonly burnOuts: () => readonly PortionBurnOut[];
  /** Once somebody has asked. */
  sensitivities: BurnSensitivities | undefined;
}

/** What is asked of the states besides what they are. */
export interface AskedOfBurn {
  readonly exhaustK: number;
  readonly fuel: Material;
  readonly oxidant: OxidantStream;
  readonly sizes: BurnOutEntries;
}

/** The states of a burn whose flame is known. */
export function solvedBurn(
  burn: Burn,
  flame: Equilibrium,
  { exhaustK, fuel, oxidant, sizes }: AskedOfBurn,
): SolvedBurn {
  let burnOuts: readonly PortionBurnOut[] | undefined;
  let atExhaust: BurnState | null | undefined;
  const exhaust = (): BurnState | null => {
    if (atExhaust !== undefined) return atExhaust;
    const state = burn.at(exhaustK);
    return (atExhaust = state.kind === 'none' ? null : state);
  };
  return {
    burn,
    flame,
    zone: () => {
      const zone = burn.zone();
      return zone?.kind === 'equilibrium' ? zone : null;
    },
    slate: () => {
      const heat = burn.heat();
      return heat && 'releasedJ' in heat ? heat : null;
    },
    exhaust,
    heatAboveJ: () => {
      // Without the charge's energy nothing asks for the state.
      const state = burn.charge.enthalpyJ === null ? null : exhaust();
      return state && heatGivenOff(burn.input, burn.charge, state);
    },
    burnOuts: () => (burnOuts ??= burnOutsOf(fuel, sizes, burn, flame, oxidant)),
    sensitivities: undefined,
  };
}

/** A solved burn as its figures read it. */
export function readingsOf(solved: SolvedBurn): BurnReadings {
  const { burn, flame, zone, slate, heatAboveJ, burnOuts } = solved;
  return { charge: burn.charge, flame: () => flame, response: () => flame, zone, heat: slate, heatAboveJ, burnOuts };
}
