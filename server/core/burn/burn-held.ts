// Which two properties each state of a burn holds, and at which values.
// Knows no states. Invariant: one place says so, for the states themselves and for how they move.

import type { Held } from '../equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import type { BurnHeatReleased, BurnInput, Charge, MatterState } from './burn.ts';

/** J taken out of the whole charge. */
export function lossOf({ heat, lowerHeatingValueJPerKg }: BurnInput): number {
  return heat.heat === 'adiabatic' ? heat.lossShare * (lowerHeatingValueJPerKg ?? 0) : 0;
}

/** What the whole charge holds as it burns. */
export function heldByFlame(input: BurnInput, charge: Charge): Held {
  return input.heat.heat === 'temperature'
    ? heldAt(input, charge, input.heat.temperatureK)
    : heldAdiabatic(input, charge, lossOf(input));
}

/** The whole energy stays in but for the loss. Volume: energy is enthalpy less the pressure-volume of the charge's gases. */
export function heldAdiabatic({ held }: BurnInput, charge: Charge, lossJ: number): Held {
  const enthalpyJ = (charge.enthalpyJ ?? Number.NaN) - lossJ;
  return held.held === 'pressure'
    ? { held: 'enthalpy-pressure', enthalpyJ, pressurePa: held.pressurePa }
    : { held: 'energy-volume', energyJ: enthalpyJ - charge.pressureVolumeJ, volumeM3: charge.volumeM3 };
}

function heldAt({ held }: BurnInput, charge: Charge, temperatureK: number): Held {
  return held.held === 'pressure'
    ? { held: 'temperature-pressure', temperatureK, pressurePa: held.pressurePa }
    : { held: 'temperature-volume', temperatureK, volumeM3: charge.volumeM3 };
}

export function heldCooling(
  input: BurnInput,
  charge: Charge,
  temperatureK: number,
): Extract<Held, { readonly temperatureK: number }> {
  const pressurePa = input.coolingPressurePa ?? (input.held.held === 'pressure' ? input.held.pressurePa : undefined);
  return pressurePa === undefined
    ? { held: 'temperature-volume', temperatureK, volumeM3: charge.volumeM3 }
    : { held: 'temperature-pressure', temperatureK, pressurePa };
}

/** Whether the gas cools in the volume it burnt in: what is taken out of it is then energy, not enthalpy. */
export function coolsInVolume({ held, coolingPressurePa }: BurnInput): boolean {
  return held.held === 'volume' && coolingPressurePa === undefined;
}

/**
 * J given off between the charge and one of its states: by enthalpies at a held pressure, by energies in a held volume.
 * Null where the energy of the charge is unknown. Gas that burns in a volume and cools at a pressure is weighed by
 * enthalpies, as if it had come in at that pressure.
 */
export function heatGivenOff(input: BurnInput, charge: Charge, state: MatterState): number | null {
  if (charge.enthalpyJ === null) return null;
  const byEnthalpyJ = charge.enthalpyJ - state.enthalpyJ;
  if (!coolsInVolume(input)) return byEnthalpyJ;
  const pressureVolumeJ = state.gasMol > 0 ? state.pressurePa * state.volumeM3 : 0;
  return byEnthalpyJ - (charge.pressureVolumeJ - pressureVolumeJ);
}

/**
 * What is released down to a slate at 25 °C; null where the energy of the charge is unknown. The preheat is weighed as the
 * release is, by energies in a held volume. Heating values are by enthalpies always: over them the share in a held volume is
 * off by R T for each mole of gas that comes or goes, some tenths of a per cent.
 */
export function heatReleased(
  input: BurnInput,
  charge: Charge,
  slate: MatterState,
): Omit<BurnHeatReleased, 'slate'> | null {
  const releasedJ = heatGivenOff(input, charge, slate);
  if (releasedJ === null || charge.enthalpyJ === null) return null;
  const coldPressureVolumeJ = charge.gasMol * molarGasConstantJPerMolK * referenceTemperatureK;
  const workJ = coolsInVolume(input) ? charge.pressureVolumeJ - coldPressureVolumeJ : 0;
  const preheatJ = charge.referenceEnthalpyJ === null ? null : charge.enthalpyJ - charge.referenceEnthalpyJ - workJ;
  const heatingValueJ = input.lowerHeatingValueJPerKg;
  const shareOfHeatingValue =
    preheatJ === null || heatingValueJ === null || heatingValueJ === 0 ? null : (releasedJ - preheatJ) / heatingValueJ;
  return { releasedJ, preheatJ, shareOfHeatingValue };
}
