// The fire's side of a steam plant: a kilogram of fuel burnt at a pressure, its heat taken up by water and steam until the gas
// leaves at the stack's temperature, and where the rest of the heating value goes. Knows no water.
// What does not burn leaves as it came in, so it takes its own preheat along. Losses through walls count as lost before the
// steam has its heat. Invariant: heat to the steam and all losses less the preheat brought in are the lower heating value, by
// construction to rounding.
// Source: boiler efficiency by indirect method, losses over heating value, as in EN 12952-15; here with the products' own
// enthalpies (burn/) in place of mean heat capacities.

import type { Burn, BurnFault, BurnInput, BurnState, Charge, FrozenState, NoState } from '../../burn/burn.ts';
import { chargeOf } from '../../burn/charge.ts';
import { frozenState } from '../../burn/frozen-state.ts';
import { prepareBurn } from '../../burn/prepare-burn.ts';
import type { Equilibrium } from '../../equilibrium/equilibrium.ts';
import { referenceTemperatureK } from '../../substance/substance.ts';
import { latentHeat } from '../loss-tree.ts';

export interface FiredBoilerInput {
  /** Fuel, oxidant and its amount (for the whole fuel), pressure, and what may form; the rest follows. */
  readonly burn: Omit<
    BurnInput,
    'held' | 'heat' | 'lowerHeatingValueJPerKg' | 'zone' | 'cooledToK' | 'coolingPressurePa'
  >;
  readonly pressurePa: number;
  /** Of the fuel, J/kg. */
  readonly lowerHeatingValueJPerKg: number;
  readonly stackTemperatureK: number;
  /** Share of the fuel that burns, above 0 up to 1. */
  readonly completeness: number;
  /** Share of the fuel's lower heating value lost through walls, 0 up to below 1. */
  readonly wallLossShare: number;
}

/** Per kg of fuel, J. */
export interface FiredBoiler {
  readonly kind: 'boiler';
  /** Of the burnt share: amounts in its states are per kg of fuel that burns. */
  readonly burn: Burn;
  readonly burntShare: number;
  readonly oxidantKgPerKg: number;
  readonly lambda: number | null;
  readonly flame: Equilibrium;
  readonly stack: BurnState;
  readonly steamHeatJ: number;
  readonly wallLossJ: number;
  readonly unburntJ: number;
  /** Sensible heat of what leaves, above 25 °C; and latent heat of vapours of metals and salts in it (loss-tree.ts). */
  readonly exhaustSensibleJ: number;
  readonly exhaustLatentJ: number;
  /**
   * What the products at 25 °C hold besides above those of complete combustion that the heating value is taken on; negative
   * where more is released than that (carbonate instead of hydroxide, water condensed).
   */
  readonly exhaustChemicalJ: number;
  /** Sensible heat that fuel and oxidant bring in above 25 °C; negative where they are colder. */
  readonly broughtInJ: number;
  /** Heat that the gas gives to the steam above a temperature of its own, walls served first. */
  readonly heatAboveJ: (gasTemperatureK: number) => number | NoState;
}

/**
 * `no-heat`: what the gas gives off down to the stack's temperature does not even cover the walls · `not-share`: completeness
 * or wall loss outside its range.
 */
export type NoBoiler = BurnFault | NoState | { readonly kind: 'none'; readonly reason: 'no-heat' | 'not-share' };

/** The boiler of an input, or why there is none. */
export function firedBoiler(input: FiredBoilerInput): FiredBoiler | NoBoiler {
  const { completeness, wallLossShare, lowerHeatingValueJPerKg, stackTemperatureK, pressurePa } = input;
  const isInRange = completeness > 0 && completeness <= 1 && wallLossShare >= 0 && wallLossShare < 1;
  if (!isInRange) return { kind: 'none', reason: 'not-share' };
  const held = { held: 'pressure', pressurePa } as const;
  const whole = chargeOf(input.burn.fuel, input.burn.oxidant, input.burn.amount, held);
  if (whole.kind === 'fault') return whole;
  // The share that burns has all the oxidant to itself.
  const burn = prepareBurn({
    ...input.burn,
    amount: { by: 'mass', kgPerKg: whole.oxidantKgPerKg / completeness },
    held,
    heat: { heat: 'adiabatic', lossShare: 0 },
    lowerHeatingValueJPerKg,
    cooledToK: [],
  });
  if (burn.kind === 'fault') return burn;
  const flame = burn.flame();
  if (flame.kind === 'none') return flame;
  const stack = burn.at(stackTemperatureK);
  if (stack.kind === 'none') return stack;

  const energies = energiesOf(burn.charge, whole);
  if (energies === null) {
    const stream = input.burn.fuel.enthalpyJPerKg === null ? 'fuel' : 'oxidant';
    return { kind: 'fault', reason: 'no-energy', stream };
  }
  const { chargeJ, referenceJ, preheatJ } = energies;
  const fuelPreheatJ = (input.burn.fuel.enthalpyJPerKg ?? 0) - (input.burn.fuel.referenceEnthalpyJPerKg ?? 0);
  const cold = coldStack(stack, pressurePa);
  const latentJ = latentHeat(cold);
  const wallLossJ = wallLossShare * lowerHeatingValueJPerKg;
  const steamHeatJ = completeness * (chargeJ - stack.enthalpyJ) - wallLossJ;
  if (!(steamHeatJ > 0)) return { kind: 'none', reason: 'no-heat' };
  return {
    kind: 'boiler',
    burn,
    burntShare: completeness,
    oxidantKgPerKg: whole.oxidantKgPerKg,
    lambda: whole.lambda,
    flame,
    stack,
    steamHeatJ,
    wallLossJ,
    unburntJ: (1 - completeness) * lowerHeatingValueJPerKg,
    exhaustSensibleJ: completeness * (stack.enthalpyJ - cold.enthalpyJ) + (1 - completeness) * fuelPreheatJ,
    exhaustLatentJ: completeness * latentJ,
    exhaustChemicalJ: completeness * (cold.enthalpyJ - referenceJ + lowerHeatingValueJPerKg - latentJ),
    broughtInJ: preheatJ,
    heatAboveJ: (gasTemperatureK) => {
      const state = burn.at(gasTemperatureK);
      return state.kind === 'none' ? state : completeness * (chargeJ - state.enthalpyJ) - wallLossJ;
    },
  };
}

/** Null where the energy of a stream is not known. */
function energiesOf(
  burnt: Charge,
  whole: Charge,
): { readonly chargeJ: number; readonly referenceJ: number; readonly preheatJ: number } | null {
  const { enthalpyJ, referenceEnthalpyJ } = burnt;
  const isKnown = enthalpyJ !== null && referenceEnthalpyJ !== null;
  if (!isKnown || whole.enthalpyJ === null || whole.referenceEnthalpyJ === null) return null;
  return { chargeJ: enthalpyJ, referenceJ: referenceEnthalpyJ, preheatJ: whole.enthalpyJ - whole.referenceEnthalpyJ };
}

/** What left the stack, brought to 25 °C as it is. */
function coldStack(stack: BurnState, pressurePa: number): FrozenState {
  const from = stack.kind === 'frozen' ? stack.from : stack;
  return frozenState(from, referenceTemperatureK, { pressurePa });
}
