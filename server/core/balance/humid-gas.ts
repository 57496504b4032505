// A gas with water vapour in it: vapour share from relative humidity at a state or from a humidity ratio, and what the
// wet gas weighs. Ideal gases; the gas's own effect on the vapour pressure is left out. Knows no names.
// Source: the definitions of the ASHRAE Handbook, Fundamentals, chapter on psychrometrics (from memory).

import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { waterSaturationPressurePa } from '../substance/water-saturation.ts';

/** Mole share of vapour in the wet gas; undefined when the temperature has no saturation pressure, or it passes the total. */
export function vapourShareAt(relativeHumidity: number, temperatureK: number, pressurePa: number): number | undefined {
  const saturationPa = waterSaturationPressurePa(temperatureK);
  if (saturationPa === undefined) return undefined;
  const share = (relativeHumidity * saturationPa) / pressurePa;
  return share >= 0 && share < 1 ? share : undefined;
}

/** Mole share of vapour from kg of vapour per kg of dry gas. */
export function vapourShareOfRatio(ratioKgPerKg: number, dryKgPerMol: number, waterKgPerMol: number): number {
  const molPerMolDry = (ratioKgPerKg * dryKgPerMol) / waterKgPerMol;
  return molPerMolDry / (1 + molPerMolDry);
}

/** kg of vapour per kg of dry gas from the mole share of vapour. */
export function humidityRatioOf(vapourShare: number, dryKgPerMol: number, waterKgPerMol: number): number {
  return (vapourShare * waterKgPerMol) / ((1 - vapourShare) * dryKgPerMol);
}

/** kg/m³ of an ideal gas. */
export function idealGasDensityKgPerM3(molarMassKgPerMol: number, temperatureK: number, pressurePa: number): number {
  return (molarMassKgPerMol * pressurePa) / (molarGasConstantJPerMolK * temperatureK);
}
