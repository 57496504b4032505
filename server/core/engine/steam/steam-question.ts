// What the water's side of a steam plant is asked and answers: from condensate through feed pumps, mixing feed heaters, boiler,
// turbine and reheat back to the condenser, for one kilogram of live steam. Types alone; knows no fuel, no furnace and no
// shaft losses. No pressure is lost in pipes, boiler or reheater.
// Source: Rankine cycle with reheat and regeneration as in any thermodynamics text.

import type { NoWater, WaterState } from './water.ts';

export interface SteamCycleInput {
  readonly boilerPressurePa: number;
  /** Null: dry saturated steam. */
  readonly steamTemperatureK: number | null;
  readonly condenserPressurePa: number;
  readonly reheat: { readonly pressurePa: number; readonly temperatureK: number } | null;
  /** Of the water as it enters the boiler; null: as it leaves the feed pump, without a heater. */
  readonly feedwaterTemperatureK: number | null;
  /** Mixing heaters that bring the feed water there; counts only where its temperature is given. */
  readonly heaterCount: number;
  /** Isentropic, above 0 up to 1. */
  readonly turbineEfficiency: number;
  /**
   * What that efficiency is of: a whole section (before and after reheat), so that bleeding changes flows and never the line;
   * or each group of stages between two bleeds, so that each group gives back some of its loss to the next.
   */
  readonly efficiencyOf: 'section' | 'group';
  readonly pumpEfficiency: number;
}

export type SteamPoint =
  | 'condensate'
  | 'behind-pump'
  | 'behind-heater'
  | 'live-steam'
  | 'bled-steam'
  | 'before-reheat'
  | 'reheated'
  | 'turbine-end';

export interface SteamStatePoint {
  readonly point: SteamPoint;
  /** Which pump or heater, from the condenser on; 0 where there can be one only. */
  readonly number: number;
  readonly state: WaterState;
  /** kg per kg of live steam. */
  readonly flow: number;
}

/** For 1 kg of live steam, in J. */
export interface SteamCycle {
  readonly kind: 'steam-cycle';
  /** In the order the water takes. */
  readonly points: readonly SteamStatePoint[];
  /** In boiler and superheater, and in the reheater. */
  readonly boilerHeatJ: number;
  readonly reheatJ: number;
  readonly turbineWorkJ: number;
  readonly pumpWorkJ: number;
  readonly condenserHeatJ: number;
  /** Net work over heat taken in. */
  readonly efficiency: number;
  /** The water that enters the boiler. */
  readonly feedwaterTemperatureK: number;
  /** Mass share of liquid where the steam leaves the turbine, and the largest at the end of any section. */
  readonly endWetness: number;
  readonly largestWetness: number;
}

/**
 * Why there is no cycle. `pressures`: not falling from boiler over reheat to condenser · `efficiency`: not above 0 up to 1 ·
 * `heaters`: not a whole number from 1 to 12 · `not-steam`: live steam of that temperature would be water at the boiler's
 * pressure, where it boils at `boilsK` · `reheat`: colder than the steam that comes to be reheated (`fromK`) · `feedwater`: not
 * between the condensate behind its pump (`fromK`) and boiling at the boiler's pressure (`toK`, where it boils at all) ·
 * `outside`: the formulation does not reach a state that would be needed.
 */
export type NoSteamCycle =
  | { readonly kind: 'none'; readonly reason: 'pressures' | 'heaters' }
  | { readonly kind: 'none'; readonly reason: 'efficiency'; readonly of: 'turbine' | 'pump' }
  | { readonly kind: 'none'; readonly reason: 'not-steam'; readonly boilsK: number }
  | { readonly kind: 'none'; readonly reason: 'reheat'; readonly fromK: number }
  | { readonly kind: 'none'; readonly reason: 'feedwater'; readonly fromK: number; readonly toK: number }
  | { readonly kind: 'none'; readonly reason: 'outside'; readonly at: SteamPoint; readonly why: NoWater['reason'] };
