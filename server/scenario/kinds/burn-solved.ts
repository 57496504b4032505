// The states of a burn as its figures read them, and what the scenario asks besides: the exhaust temperature, and sizes that
// have to burn out. Solves nothing before it is read. Invariant: a state that could not be had is null.

import type { Burn, BurnHeatReleased } from '../../core/burn/burn.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { burnOutsOf, type BurnOutEntries, type PortionBurnOut } from './burn-out-times.ts';
import type { Material } from '../material.ts';
import type { OxidantStream } from '../oxidant-stream.ts';

export interface SolvedBurn {
  readonly burn: Burn;
  readonly flame: Equilibrium;
  readonly zone: () => Equilibrium | null;
  readonly slate: () => BurnHeatReleased | null;
  readonly heatAboveJ: () => number | null;
  readonly burnOuts: () => readonly PortionBurnOut[];
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
  let heatAboveJ: number | null | undefined;
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
    heatAboveJ: () => {
      if (heatAboveJ !== undefined) return heatAboveJ;
      const heat = burn.heatAbove(exhaustK);
      return (heatAboveJ = typeof heat === 'number' ? heat : null);
    },
    burnOuts: () => (burnOuts ??= burnOutsOf(fuel, sizes, burn, flame, oxidant)),
  };
}
