// The water's way from the condenser to the boiler, and the steam it takes: a pump behind the condenser and behind each mixing
// heater, each heater fed with steam bled from the turbine at its own pressure.
// Knows no heat source. Invariant: each heater's mass and energy balance closes, and so flows add up to the live steam.
// Source: regenerative feed heating with open heaters as in any thermodynamics text; heaters feed-heaters.ts.

import type { ExpansionLine } from './expansion-line.ts';
import { pumped } from './feed-heaters.ts';
import type { NoSteamCycle, SteamCycleInput, SteamStatePoint } from './steam-question.ts';
import { saturatedWater } from './water.ts';
import type { WaterState } from './water.ts';

export interface FeedTrain {
  readonly kind: 'feed';
  /** Condensate, and the states behind each pump and heater on the way to the boiler. */
  readonly points: readonly SteamStatePoint[];
  /** Steam taken from the turbine, the lowest pressure first. */
  readonly bled: readonly SteamStatePoint[];
  readonly condensate: WaterState;
  /** As it enters the boiler. */
  readonly water: WaterState;
  /** J per kg of live steam. */
  readonly pumpWorkJ: number;
}

/**
 * The feed train with these heaters, from the condenser on. Flows are found from the boiler backwards: what a heater gives off is
 * known, and its balance says how much steam it takes.
 */
export function feedTrain(
  input: SteamCycleInput,
  line: ExpansionLine,
  heaters: readonly WaterState[],
): FeedTrain | NoSteamCycle {
  const condenser = saturatedWater(input.condenserPressurePa);
  if (condenser.kind === 'none') return { kind: 'none', reason: 'outside', at: 'condensate', why: condenser.reason };
  const condensate = condenser.liquid;
  const backwards: SteamStatePoint[] = [];
  const bled: SteamStatePoint[] = [];
  let flow = 1;
  let pumpWorkJ = 0;
  let water: WaterState | undefined;
  let towardsPa = input.boilerPressurePa;
  for (let number = heaters.length; number >= 0; number -= 1) {
    const from = heaters[number - 1] ?? condensate;
    const behind = pumped(from, towardsPa, input.pumpEfficiency);
    if (behind.kind === 'none') return behind;
    // What leaves this pump either enters the boiler or is warmed in the heater above it.
    const above = heaters[number];
    const steam = line.bled[number];
    if (above !== undefined && steam !== undefined) {
      const share = (above.enthalpyJPerKg - behind.enthalpyJPerKg) / (steam.enthalpyJPerKg - behind.enthalpyJPerKg);
      bled.unshift({ point: 'bled-steam', number: number + 1, state: steam, flow: flow * share });
      flow *= 1 - share;
    }
    water ??= behind;
    pumpWorkJ += flow * (behind.enthalpyJPerKg - from.enthalpyJPerKg);
    backwards.push({ point: 'behind-pump', number: heaters.length === 0 ? 0 : number + 1, state: behind, flow });
    backwards.push({ point: number === 0 ? 'condensate' : 'behind-heater', number, state: from, flow });
    towardsPa = from.pressurePa;
  }
  return { kind: 'feed', points: backwards.reverse(), bled, condensate, water: water ?? condensate, pumpWorkJ };
}
