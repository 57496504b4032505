// Fugacity of carbon dioxide against its partial pressure, and against its share of dry air, at 1 atm over sea water.
// It knows no water chemistry. Invariant: fugacity and partial pressure are in atm, in proportion to each other.
// Sources: Weiss 1974 (virial coefficients); Weiss and Price 1980 (water vapour over sea water); Guide to best practices for
// ocean CO2 measurements (2007), chapter 5 and procedure 24.

const atmosphereBar = 1.01325;
const gasConstantCm3Bar = 83.1446261815324;

/** Second virial coefficient of CO2, cm³/mol (Weiss 1974, equation 6), 265 to 320 K. */
export function carbonDioxideVirialCm3PerMol(temperatureK: number): number {
  return -1636.75 + 12.0408 * temperatureK - 3.27957e-2 * temperatureK ** 2 + 3.16528e-5 * temperatureK ** 3;
}

/** Cross virial coefficient of CO2 in air, cm³/mol (Weiss 1974, equation 11), 273 to 313 K. */
export function carbonDioxideInAirVirialCm3PerMol(temperatureK: number): number {
  return 57.7 - 0.118 * temperatureK;
}

/** Fugacity over partial pressure of CO2, dilute in air at 1 atm. */
export function fugacityCoefficient(temperatureK: number): number {
  const virial = carbonDioxideVirialCm3PerMol(temperatureK) + 2 * carbonDioxideInAirVirialCm3PerMol(temperatureK);
  return Math.exp((virial * atmosphereBar) / (gasConstantCm3Bar * temperatureK));
}

/** Saturation pressure of water vapour over sea water, atm (Weiss and Price 1980, equation 10), 273 to 313 K. */
export function seaVapourPressureAtm(salinity: number, temperatureK: number): number {
  const hundredsK = temperatureK / 100;
  return Math.exp(24.4543 - 67.4509 / hundredsK - 4.8489 * Math.log(hundredsK) - 0.000544 * salinity);
}

/** Partial pressure of CO2, atm, in moist air at 1 atm of which it is that share by mole when dry. */
export function partialPressureOfDryShareAtm(dryShare: number, salinity: number, temperatureK: number): number {
  return dryShare * (1 - seaVapourPressureAtm(salinity, temperatureK));
}
