// The mixing feed heaters of a steam plant whose feed water has a temperature: each gives off boiling water of its pressure,
// they share the rise of temperature from the condensate equally, and the last is as hot as it takes for its water, pumped
// to the boiler, to enter as asked. Knows no steam that is bled. Invariant: pressures rise from heater to heater and stay
// below the boiler's.
// Source: equal rises of temperature, the usual choice for open heaters; properties water.ts.

import { findZero } from '../../equilibrium/bracket.ts';
import { waterSaturationPressurePa } from '../../substance/water-saturation.ts';
import type { NoSteamCycle, SteamCycleInput } from './steam-question.ts';
import { saturatedWater, waterAtEnthalpy, waterAtEntropy, waterRange } from './water.ts';
import type { WaterState } from './water.ts';

export interface FeedHeaters {
  readonly kind: 'heaters';
  /** Water as it leaves each, from the condenser on; none where the feed water's temperature is not given. */
  readonly states: readonly WaterState[];
}

/** The heaters of an input, or why there are none. */
export function feedHeaters(input: SteamCycleInput): FeedHeaters | NoSteamCycle {
  const { boilerPressurePa, condenserPressurePa, feedwaterTemperatureK, heaterCount, pumpEfficiency } = input;
  if (feedwaterTemperatureK === null) return { kind: 'heaters', states: [] };
  const condenser = saturatedWater(condenserPressurePa);
  if (condenser.kind === 'none') return { kind: 'none', reason: 'outside', at: 'condensate', why: condenser.reason };
  const condensate = condenser.liquid;
  const direct = pumped(condensate, boilerPressurePa, pumpEfficiency);
  if (direct.kind === 'none') return direct;
  const boiling = saturatedWater(boilerPressurePa);
  const toK = boiling.kind === 'none' ? waterRange.regionThreeK : boiling.temperatureK;
  const refused: NoSteamCycle = { kind: 'none', reason: 'feedwater', fromK: direct.temperatureK, toK };
  if (!(feedwaterTemperatureK > direct.temperatureK && feedwaterTemperatureK < toK)) return refused;

  const last = lastHeater(input, condensate, feedwaterTemperatureK);
  if (last === undefined) return refused;
  const riseK = (last.temperatureK - condensate.temperatureK) / heaterCount;
  const states: WaterState[] = [];
  for (let number = 1; number < heaterCount; number += 1) {
    const heater = boilingAt(condensate.temperatureK + number * riseK);
    if (heater === undefined) return refused;
    states.push(heater);
  }
  return { kind: 'heaters', states: [...states, last] };
}

/** Water brought to a pressure by a pump of an isentropic efficiency. */
export function pumped(from: WaterState, pressurePa: number, efficiency: number): WaterState | NoSteamCycle {
  const ideal = waterAtEntropy(pressurePa, from.entropyJPerKgK);
  if (ideal.kind === 'none') return { kind: 'none', reason: 'outside', at: 'behind-pump', why: ideal.reason };
  const enthalpyJPerKg = from.enthalpyJPerKg + (ideal.enthalpyJPerKg - from.enthalpyJPerKg) / efficiency;
  const real = waterAtEnthalpy(pressurePa, enthalpyJPerKg);
  return real.kind === 'none' ? { kind: 'none', reason: 'outside', at: 'behind-pump', why: real.reason } : real;
}

/** The heater whose water, pumped to the boiler, is as hot as asked; the pump warms it a little. */
function lastHeater(input: SteamCycleInput, condensate: WaterState, feedwaterK: number): WaterState | undefined {
  interface Tried {
    readonly heater: WaterState;
    readonly pumpedK: number;
  }
  const end = findZero<Tried>(
    {
      stateAt: (temperatureK) => {
        const heater = boilingAt(temperatureK);
        if (heater === undefined) return undefined;
        const water = pumped(heater, input.boilerPressurePa, input.pumpEfficiency);
        return water.kind === 'water' ? { heater, pumpedK: water.temperatureK } : undefined;
      },
      valueOf: ({ pumpedK }) => pumpedK - feedwaterK,
      // The pump's warming hardly depends on the temperature.
      slopeOf: () => 1,
      nearEnough: 1e-9,
    },
    [condensate.temperatureK, feedwaterK],
    feedwaterK,
  );
  if (end.kind === 'root') return end.state.heater;
  return end.kind === 'jump' ? end.low.heater : undefined;
}

function boilingAt(temperatureK: number): WaterState | undefined {
  const pressurePa = waterSaturationPressurePa(temperatureK);
  const saturated = pressurePa === undefined ? undefined : saturatedWater(pressurePa);
  return saturated?.kind === 'saturated' ? saturated.liquid : undefined;
}
