// How the states of a burn move when one of its inputs does: temperature and amounts per unit of a fuel's energy, of an element
// in it, of λ, of the pressure, from the converged states and without solving anew.
// Knows no uncertainties: whoever does multiplies by them. Invariant: a movement is that of the phases that are there; where
// the state lies just at a phase's coming it holds on one side only. Frozen states have none of their own: they move as the
// composition they come from.
// Method: the chain rule, charge-directions.ts into equilibrium/sensitivity.ts.

import type { Equilibrium, Held } from '../equilibrium/equilibrium.ts';
import { sensitivitiesOf } from '../equilibrium/sensitivity.ts';
import type { Movement, Sensitivities } from '../equilibrium/sensitivity.ts';
import type { Burn, Charge, MatterState, NoState } from './burn.ts';
import { heldAdiabatic, heldByFlame, heldCooling } from './burn-held.ts';
import { chargeDirection, still } from './charge-directions.ts';
import type { BurnParameter, ChargeDirection } from './charge-directions.ts';

/** Per unit of the parameter, in K and in mol per kg of fuel. */
export interface StateMovement extends Movement {
  readonly oxidantKgPerKg: number;
}

/** Null where there is no such state, no direction, or nothing fixes a single movement. Each state is worked out once. */
export interface BurnSensitivities {
  readonly flame: (parameter: BurnParameter) => StateMovement | null;
  readonly zone: (parameter: BurnParameter) => StateMovement | null;
  /** The equilibrium that freezes, with its temperature held. */
  readonly frozenAt: (parameter: BurnParameter) => StateMovement | null;
  /** The `index`-th of the cooled states, with its temperature held; null also where that is frozen. */
  readonly cooled: (index: number, parameter: BurnParameter) => StateMovement | null;
  /** Any equilibrium of the cooling gas, with its temperature held. */
  readonly cooling: (state: Equilibrium, parameter: CoolingParameter) => StateMovement | null;
}

/** What moves a cooled state besides the charge: its own temperature in K, and in Pa the pressure given for cooling. */
export type CoolingParameter = BurnParameter | { readonly of: 'own-temperature' } | { readonly of: 'cooling-pressure' };

/** Of a burn whose states are solved as they are asked for. */
export function burnSensitivities(burn: Burn): BurnSensitivities {
  const { input, charge, zoneCharge } = burn;
  const known = new Map<Equilibrium, Sensitivities | undefined>();
  const move = (
    state: Equilibrium,
    matter: Charge,
    held: Held,
    direction: ChargeDirection | null,
  ): StateMovement | null => {
    if (direction === null) return null;
    if (!known.has(state)) {
      const elementMol = new Float64Array(state.candidates.elements.length);
      elementMol.set(matter.elementMol);
      known.set(state, sensitivitiesOf(state, elementMol, held));
    }
    const sensitivities = known.get(state);
    return sensitivities === undefined ? null : along(sensitivities, direction, held, matter);
  };
  const atTemperature = (state: Equilibrium | NoState | null, parameter: CoolingParameter): StateMovement | null => {
    if (state?.kind !== 'equilibrium') return null;
    const direction =
      parameter.of === 'own-temperature' || parameter.of === 'cooling-pressure'
        ? still(charge)
        : chargeDirection(input, charge, parameter);
    // A cooled state has its own temperature, and its own pressure where one was given for cooling.
    const own = {
      temperatureK: parameter.of === 'own-temperature' ? 1 : 0,
      ...(input.coolingPressurePa === undefined ? {} : { pressurePa: parameter.of === 'cooling-pressure' ? 1 : 0 }),
    };
    const held = heldCooling(input, charge, state.temperatureK);
    return move(state, charge, held, direction && { ...direction, ...own });
  };
  const flame = (parameter: BurnParameter): StateMovement | null => {
    const state = burn.flame();
    if (state.kind === 'none') return null;
    return move(state, charge, heldByFlame(input, charge), chargeDirection(input, charge, parameter));
  };
  return {
    flame,
    zone(parameter) {
      const state = burn.zone();
      if (state?.kind !== 'equilibrium' || zoneCharge === null) return null;
      const direction = chargeDirection(input, zoneCharge, parameter, 'zone');
      return move(state, zoneCharge, heldAdiabatic(input, zoneCharge, 0), direction);
    },
    frozenAt(parameter) {
      const state = burn.frozenAt();
      // A flame that freezes at once holds what a flame holds.
      return state !== null && state === burn.flame() ? flame(parameter) : atTemperature(state, parameter);
    },
    cooled(index, parameter) {
      const state = burn.cooled[index]?.state() ?? null;
      return state?.kind === 'frozen' ? null : atTemperature(state, parameter);
    },
    cooling: atTemperature,
  };
}

/** The sum of the movements by elements, by what is held and by pressure or volume. */
function along(sensitivities: Sensitivities, direction: ChargeDirection, held: Held, charge: Charge): StateMovement {
  const amountsMol = new Float64Array(sensitivities.byHeld.amountsMol.length);
  let temperatureK = 0;
  const add = (movement: Movement | undefined, by: number): void => {
    if (movement === undefined || by === 0) return;
    temperatureK += by * movement.temperatureK;
    for (let phase = 0; phase < amountsMol.length; phase += 1) {
      amountsMol[phase] = (amountsMol[phase] ?? 0) + by * (movement.amountsMol[phase] ?? 0);
    }
  };
  direction.elementMol.forEach((mol, row) => {
    add(sensitivities.byElement[row], mol);
  });
  add(sensitivities.byHeld, heldSlope(held, direction));
  add(sensitivities.byLogPressureOrVolume, logSlope(held, direction, charge));
  return { temperatureK, amountsMol, oxidantKgPerKg: direction.oxidantKgPerKg };
}

function heldSlope({ held }: Held, direction: ChargeDirection): number {
  switch (held) {
    case 'enthalpy-pressure':
      return direction.enthalpyJ;
    case 'energy-volume':
      return direction.enthalpyJ - direction.pressureVolumeJ;
    case 'temperature-pressure':
    case 'temperature-volume':
      return direction.temperatureK;
    default:
      return 0;
  }
}

/** The volume is the gases' pressure times volume over the charge's pressure. */
function logSlope(held: Held, direction: ChargeDirection, charge: Charge): number {
  if ('pressurePa' in held) return direction.pressurePa / held.pressurePa;
  const chargePressurePa = charge.pressureVolumeJ / charge.volumeM3;
  return direction.pressureVolumeJ / charge.pressureVolumeJ - direction.pressurePa / chargePressurePa;
}

/** Per unit: the share of the wet gas that a gas makes up. */
export function wetShareMovement(state: MatterState, movement: Movement, phase: number): number {
  let gasMol = 0;
  for (let gas = 0; gas < state.candidates.gasCount; gas += 1) gasMol += movement.amountsMol[gas] ?? 0;
  const share = (state.amountsMol[phase] ?? 0) / state.gasMol;
  return ((movement.amountsMol[phase] ?? 0) - share * gasMol) / state.gasMol;
}

/** Per unit: the mass of condensed phases over all mass. */
export function condensedShareMovement(state: MatterState, movement: Movement): number {
  let condensedKg = 0;
  let massKg = 0;
  movement.amountsMol.forEach((mol, phase) => {
    const kg = mol * (state.candidates.molarMassKgPerMol[phase] ?? 0);
    massKg += kg;
    if (phase >= state.candidates.gasCount) condensedKg += kg;
  });
  return (condensedKg - state.condensedMassShare * massKg) / state.massKg;
}
