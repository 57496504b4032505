// The steam cycle: expansion line and feed train put together, for one kilogram of live steam (steam-question.ts).
// Knows no fuel. Invariant: heat taken in and pump work are turbine work and heat to the condenser, to rounding.
// Source: first law over turbine, pumps and heaters; properties water.ts.

import { expansionLine } from './expansion-line.ts';
import { feedHeaters } from './feed-heaters.ts';
import { feedTrain } from './feed-train.ts';
import type { NoSteamCycle, SteamCycle, SteamCycleInput, SteamStatePoint } from './steam-question.ts';
import { saturatedWater, waterAt } from './water.ts';
import type { WaterState } from './water.ts';

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
