// The way of the steam through the turbine: from live steam down to the condenser's pressure, once over a reheater where there
// is one, with the states at which it is bled. With one efficiency for a whole section every state within it lies on the line
// h = h_in - η (h_in - h(s_in, p)); with one for each group of stages it begins anew at each bleed.
// Knows no flows. Invariant: entropy never falls along a section.
// Source: isentropic efficiency of a turbine as in any thermodynamics text; properties water.ts.

import type { NoSteamCycle, SteamCycleInput, SteamPoint } from './steam-question.ts';
import { waterAt, waterAtEnthalpy, waterAtEntropy } from './water.ts';
import type { WaterState } from './water.ts';

export interface ExpansionLine {
  readonly kind: 'line';
  /** Where the steam leaves for the reheater; the live steam where there is none. */
  readonly beforeReheat: WaterState;
  readonly reheated: WaterState | null;
  readonly end: WaterState;
  /** In the order of the pressures asked for. */
  readonly bled: readonly WaterState[];
  /** Whether steam of a pressure is taken before the reheater. */
  readonly isBeforeReheat: (pressurePa: number) => boolean;
}

/** The line of live steam with bleeds at rising pressures between condenser and boiler, or why there is none. */
export function expansionLine(
  input: SteamCycleInput,
  live: WaterState,
  bleedPressuresPa: readonly number[],
): ExpansionLine | NoSteamCycle {
  const { reheat } = input;
  const isBeforeReheat = (pressurePa: number): boolean => reheat === null || pressurePa >= reheat.pressurePa;
  const falling = [...bleedPressuresPa].reverse();
  const firstBleeds = falling.filter(isBeforeReheat);
  const endPa = reheat?.pressurePa ?? input.condenserPressurePa;
  const first = section(input, live, firstBleeds, endPa, reheat ? 'before-reheat' : 'turbine-end');
  if (first.kind === 'none') return first;
  if (reheat === null) {
    const bled = [...first.bled].reverse();
    return { kind: 'line', beforeReheat: live, reheated: null, end: first.end, bled, isBeforeReheat };
  }
  const reheated = waterAt(reheat.temperatureK, reheat.pressurePa);
  if (reheated.kind === 'none') return { kind: 'none', reason: 'outside', at: 'reheated', why: reheated.reason };
  if (!(reheated.enthalpyJPerKg >= first.end.enthalpyJPerKg)) {
    return { kind: 'none', reason: 'reheat', fromK: first.end.temperatureK };
  }
  const lastBleeds = falling.filter((pressurePa) => !isBeforeReheat(pressurePa));
  const last = section(input, reheated, lastBleeds, input.condenserPressurePa, 'turbine-end');
  if (last.kind === 'none') return last;
  const bled = [...first.bled, ...last.bled].reverse();
  return { kind: 'line', beforeReheat: first.end, reheated, end: last.end, bled, isBeforeReheat };
}

interface Section {
  readonly kind: 'section';
  readonly bled: readonly WaterState[];
  readonly end: WaterState;
}

/** A section down to its end over bleeds at falling pressures. */
function section(
  { turbineEfficiency, efficiencyOf }: SteamCycleInput,
  entering: WaterState,
  bleedPressuresPa: readonly number[],
  endPa: number,
  endPoint: SteamPoint,
): Section | NoSteamCycle {
  const bled: WaterState[] = [];
  const from = (): WaterState => (efficiencyOf === 'group' ? (bled.at(-1) ?? entering) : entering);
  for (const pressurePa of bleedPressuresPa) {
    const state = expanded(from(), pressurePa, turbineEfficiency, 'bled-steam');
    if (state.kind === 'none') return state;
    bled.push(state);
  }
  const end = expanded(from(), endPa, turbineEfficiency, endPoint);
  return end.kind === 'none' ? end : { kind: 'section', bled, end };
}

function expanded(from: WaterState, pressurePa: number, efficiency: number, at: SteamPoint): WaterState | NoSteamCycle {
  const ideal = waterAtEntropy(pressurePa, from.entropyJPerKgK);
  if (ideal.kind === 'none') return { kind: 'none', reason: 'outside', at, why: ideal.reason };
  const enthalpyJPerKg = from.enthalpyJPerKg - efficiency * (from.enthalpyJPerKg - ideal.enthalpyJPerKg);
  const real = waterAtEnthalpy(pressurePa, enthalpyJPerKg);
  return real.kind === 'none' ? { kind: 'none', reason: 'outside', at, why: real.reason } : real;
}
