// Where a liquid metal boils at a pressure and what that takes, from the tables' liquid and monatomic gas.
// Knows no mixtures and no dimers: vapours of alkali metals hold some pairs, which lower the boiling point by a few kelvin.
// Invariant: at the temperature given back liquid and vapour have the same Gibbs energy at that pressure.

import { molarGasConstantJPerMolK, standardPressurePa } from '../quantity/constants.ts';
import { phaseOfId, propertiesOfPhase } from '../substance/phases.ts';

export interface Vaporisation {
  readonly boilingK: number;
  readonly latentJPerKg: number;
}

/** Of an element by its symbol at a pressure in Pa; undefined where the tables lack a phase or it does not boil below 6000 K. */
export function vaporisationOf(symbol: string, pressurePa: number): Vaporisation | undefined {
  const liquid = phaseOfId(`${symbol}(l)`);
  const gas = phaseOfId(`${symbol}(g)`);
  if (liquid === undefined || gas === undefined) return undefined;
  /** Positive where the liquid would rather be a gas. */
  const excessJPerMol = (temperatureK: number): number =>
    (propertiesOfPhase(liquid, temperatureK)?.gibbsJPerMol ?? Number.NaN) -
    (propertiesOfPhase(gas, temperatureK)?.gibbsJPerMol ?? Number.NaN) -
    molarGasConstantJPerMolK * temperatureK * Math.log(pressurePa / standardPressurePa);
  let lowK = 300;
  let highK = 6000;
  if (!(excessJPerMol(lowK) < 0 && excessJPerMol(highK) > 0)) return undefined;
  while (highK - lowK > 1e-6) {
    const middleK = (lowK + highK) / 2;
    if (excessJPerMol(middleK) > 0) highK = middleK;
    else lowK = middleK;
  }
  const boilingK = (lowK + highK) / 2;
  const latentJPerMol =
    (propertiesOfPhase(gas, boilingK)?.enthalpyJPerMol ?? Number.NaN) -
    (propertiesOfPhase(liquid, boilingK)?.enthalpyJPerMol ?? Number.NaN);
  return { boilingK, latentJPerKg: latentJPerMol / gas.molarMassKgPerMol };
}
