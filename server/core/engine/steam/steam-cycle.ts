// What the water's side of a steam plant is asked and answers: from condensate through feed pumps, mixing feed heaters, boiler,
// turbine and reheat back to the condenser, for one kilogram of live steam. Knows no fuel, no furnace and no shaft losses.
// No pressure is lost in pipes, boiler or reheater.
// Invariant: heat taken in and pump work are turbine work and heat to the condenser, to rounding.
// Source: Rankine cycle with reheat and regeneration as in any thermodynamics text; properties water.ts.

import { expansionLine } from './expansion-line.ts';
import { feedHeaters } from './feed-heaters.ts';
import { feedTrain } from './feed-train.ts';
import { saturatedWater, waterAt } from './water.ts';
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

/** The cycle of an input, or why there is none. */
export function steamCycle(input: SteamCycleInput): SteamCycle | NoSteamCycle {
  const fault = faultOf(input);
  if (fault !== undefined) return fault;
  const live = liveSteam(input);
  if (live.kind === 'none') return live;
  const heaters = feedHeaters(input);
  if (heaters.kind === 'none') return heaters;
  const line = expansionLine(
    input,
    live,
    heaters.states.map(({ pressurePa }) => pressurePa),
  );
  if (line.kind === 'none') return line;
  const feed = feedTrain(input, line, heaters.states);
  if (feed.kind === 'none') return feed;

  const { beforeReheat, reheated, end } = line;
  const flowOf = (points: readonly SteamStatePoint[]): number => points.reduce((sum, { flow }) => sum + flow, 0);
  const reheatFlow = 1 - flowOf(feed.bled.filter(({ state }) => line.isBeforeReheat(state.pressurePa)));
  const endFlow = 1 - flowOf(feed.bled);
  const bledEnthalpyJ = feed.bled.reduce((sum, { state, flow }) => sum + flow * state.enthalpyJPerKg, 0);
  const boilerHeatJ = live.enthalpyJPerKg - feed.water.enthalpyJPerKg;
  const reheatJ = reheated === null ? 0 : reheatFlow * (reheated.enthalpyJPerKg - beforeReheat.enthalpyJPerKg);
  const turbineWorkJ = live.enthalpyJPerKg + reheatJ - bledEnthalpyJ - endFlow * end.enthalpyJPerKg;
  const reheatPoints: SteamStatePoint[] =
    reheated === null
      ? []
      : [
          { point: 'before-reheat', number: 0, state: beforeReheat, flow: reheatFlow },
          { point: 'reheated', number: 0, state: reheated, flow: reheatFlow },
        ];
  return {
    kind: 'steam-cycle',
    points: [
      ...feed.points,
      { point: 'live-steam', number: 0, state: live, flow: 1 },
      ...feed.bled.filter(({ state }) => line.isBeforeReheat(state.pressurePa)).reverse(),
      ...reheatPoints,
      ...feed.bled.filter(({ state }) => !line.isBeforeReheat(state.pressurePa)).reverse(),
      { point: 'turbine-end', number: 0, state: end, flow: endFlow },
    ],
    boilerHeatJ,
    reheatJ,
    turbineWorkJ,
    pumpWorkJ: feed.pumpWorkJ,
    condenserHeatJ: endFlow * (end.enthalpyJPerKg - feed.condensate.enthalpyJPerKg),
    efficiency: (turbineWorkJ - feed.pumpWorkJ) / (boilerHeatJ + reheatJ),
    feedwaterTemperatureK: feed.water.temperatureK,
    endWetness: wetnessOf(end),
    largestWetness: Math.max(wetnessOf(end), reheated === null ? 0 : wetnessOf(beforeReheat)),
  };
}

function faultOf(input: SteamCycleInput): NoSteamCycle | undefined {
  const { boilerPressurePa, condenserPressurePa, reheat, heaterCount } = input;
  const isFalling = reheat
    ? boilerPressurePa > reheat.pressurePa && reheat.pressurePa > condenserPressurePa
    : boilerPressurePa > condenserPressurePa;
  if (!isFalling) return { kind: 'none', reason: 'pressures' };
  const isShare = (value: number): boolean => value > 0 && value <= 1;
  if (!isShare(input.turbineEfficiency)) return { kind: 'none', reason: 'efficiency', of: 'turbine' };
  if (!isShare(input.pumpEfficiency)) return { kind: 'none', reason: 'efficiency', of: 'pump' };
  const isCount = Number.isInteger(heaterCount) && heaterCount >= 1 && heaterCount <= mostHeaters;
  return isCount ? undefined : { kind: 'none', reason: 'heaters' };
}

const mostHeaters = 12;

function liveSteam({ boilerPressurePa, steamTemperatureK }: SteamCycleInput): WaterState | NoSteamCycle {
  const at = 'live-steam';
  const state = steamTemperatureK === null ? undefined : waterAt(steamTemperatureK, boilerPressurePa);
  if (state?.kind === 'none') return { kind: 'none', reason: 'outside', at, why: state.reason };
  if (state?.phase === 'vapour') return state;
  const boiling = saturatedWater(boilerPressurePa);
  if (boiling.kind === 'none') return { kind: 'none', reason: 'outside', at, why: boiling.reason };
  // The boiling temperature itself is how saturated steam is often written.
  const isBoiling = state === undefined || boiling.temperatureK - state.temperatureK < 1e-3;
  return isBoiling ? boiling.vapour : { kind: 'none', reason: 'not-steam', boilsK: boiling.temperatureK };
}

function wetnessOf(state: WaterState): number {
  return 1 - state.dryness;
}
