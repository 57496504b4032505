// A steam plant as a whole: the fired boiler's heat worked through the steam cycle to the shaft, per kilogram of fuel.
// Knows no rating and no load. Invariant: the terms of the energy balance add up to the fuel's lower heating value, to 1e-9.
// Source: first law over boiler (fired-boiler.ts) and cycle (steam-cycle.ts).

import type { BurnFault, NoState } from '../../burn/burn.ts';
import { firedBoiler } from './fired-boiler.ts';
import type { FiredBoiler, FiredBoilerInput, NoBoiler } from './fired-boiler.ts';
import { steamCycle } from './steam-cycle.ts';
import type { NoSteamCycle, SteamCycle, SteamCycleInput } from './steam-question.ts';
import { saturatedWater } from './water.ts';

export interface SteamPlantInput {
  readonly boiler: FiredBoilerInput;
  readonly cycle: SteamCycleInput;
  /** Work at the shaft's coupling over net work of turbine and pumps, above 0 up to 1. */
  readonly mechanicalEfficiency: number;
}

export interface SteamPlant {
  readonly kind: 'steam-plant';
  readonly boiler: FiredBoiler;
  readonly cycle: SteamCycle;
  readonly steamKgPerKg: number;
  /** J per kg of fuel: turbine less pumps, and at the coupling. */
  readonly netWorkJ: number;
  readonly brakeWorkJ: number;
  /** Adding up to the lower heating value. What is brought in above 25 °C counts negative. */
  readonly losses: readonly SteamPlantLoss[];
  /** Heat in the steam over the lower heating value. */
  readonly boilerEfficiency: number;
  readonly cycleEfficiency: number;
  readonly brakeEfficiency: number;
  /**
   * Where the gas is no hotter than the water it should boil: the gas gives off `givenJ` above the boiling temperature, and
   * evaporating and superheating take `neededJ`; or it leaves colder than the feed water comes in. Null where heat can flow.
   */
  readonly pinch:
    | { readonly at: 'evaporator'; readonly boilsK: number; readonly givenJ: number; readonly neededJ: number }
    | { readonly at: 'stack'; readonly stackK: number; readonly feedwaterK: number }
    | null;
}

/** As the losses of a cycle with pistons (loss-tree.ts), and what the condenser carries off. */
export interface SteamPlantLoss {
  readonly id:
    | 'brake-work'
    | 'friction'
    | 'condenser-heat'
    | 'wall-heat'
    | 'exhaust-sensible'
    | 'exhaust-latent'
    | 'exhaust-chemical'
    | 'unburnt-fuel'
    | 'brought-in';
  readonly joulePerKg: number;
  readonly share: number;
}

export type NoSteamPlant =
  | { readonly kind: 'no-plant'; readonly of: 'boiler'; readonly why: NoBoiler | BurnFault | NoState }
  | { readonly kind: 'no-plant'; readonly of: 'cycle'; readonly why: NoSteamCycle }
  | { readonly kind: 'no-plant'; readonly of: 'shaft'; readonly why: null };

/** The plant of an input, or why there is none. */
export function steamPlant(input: SteamPlantInput): SteamPlant | NoSteamPlant {
  const { mechanicalEfficiency } = input;
  if (!(mechanicalEfficiency > 0 && mechanicalEfficiency <= 1)) return { kind: 'no-plant', of: 'shaft', why: null };
  const cycle = steamCycle(input.cycle);
  if (cycle.kind === 'none') return { kind: 'no-plant', of: 'cycle', why: cycle };
  const boiler = firedBoiler(input.boiler);
  if (boiler.kind !== 'boiler') return { kind: 'no-plant', of: 'boiler', why: boiler };

  const { lowerHeatingValueJPerKg } = input.boiler;
  const steamKgPerKg = boiler.steamHeatJ / (cycle.boilerHeatJ + cycle.reheatJ);
  const netWorkJ = steamKgPerKg * (cycle.turbineWorkJ - cycle.pumpWorkJ);
  const brakeWorkJ = mechanicalEfficiency * netWorkJ;
  const rows: readonly (readonly [SteamPlantLoss['id'], number])[] = [
    ['brake-work', brakeWorkJ],
    ['friction', netWorkJ - brakeWorkJ],
    ['condenser-heat', steamKgPerKg * cycle.condenserHeatJ],
    ['wall-heat', boiler.wallLossJ],
    ['exhaust-sensible', boiler.exhaustSensibleJ],
    ['exhaust-latent', boiler.exhaustLatentJ],
    ['exhaust-chemical', boiler.exhaustChemicalJ],
    ['unburnt-fuel', boiler.unburntJ],
    ['brought-in', -boiler.broughtInJ],
  ];
  return {
    kind: 'steam-plant',
    boiler,
    cycle,
    steamKgPerKg,
    netWorkJ,
    brakeWorkJ,
    losses: rows.map(([id, joulePerKg]) => ({ id, joulePerKg, share: joulePerKg / lowerHeatingValueJPerKg })),
    boilerEfficiency: boiler.steamHeatJ / lowerHeatingValueJPerKg,
    cycleEfficiency: cycle.efficiency,
    brakeEfficiency: brakeWorkJ / lowerHeatingValueJPerKg,
    pinch: pinchOf(input, boiler, cycle, steamKgPerKg),
  };
}

/** Economiser in the coldest gas, all else before it; above the critical point nothing boils and only the stack is looked at. */
function pinchOf(
  { boiler: { stackTemperatureK }, cycle: { boilerPressurePa } }: SteamPlantInput,
  boiler: FiredBoiler,
  cycle: SteamCycle,
  steamKgPerKg: number,
): SteamPlant['pinch'] {
  const { feedwaterTemperatureK } = cycle;
  if (stackTemperatureK < feedwaterTemperatureK) {
    return { at: 'stack', stackK: stackTemperatureK, feedwaterK: feedwaterTemperatureK };
  }
  const boiling = saturatedWater(boilerPressurePa);
  const live = cycle.points.find(({ point }) => point === 'live-steam');
  if (boiling.kind === 'none' || live === undefined || boiling.temperatureK <= stackTemperatureK) return null;
  const givenJ = boiler.heatAboveJ(boiling.temperatureK);
  if (typeof givenJ !== 'number') return null;
  const evaporatingJ = live.state.enthalpyJPerKg - boiling.liquid.enthalpyJPerKg + cycle.reheatJ;
  const neededJ = steamKgPerKg * evaporatingJ;
  return givenJ < neededJ ? { at: 'evaporator', boilsK: boiling.temperatureK, givenJ, neededJ } : null;
}
