// Specific volume, enthalpy, entropy and heat capacity of liquid water (region 1) and of steam (region 2) from the
// fundamental equations of the industrial formulation: a specific Gibbs energy as a function of pressure and temperature.
// Knows no region's bounds: who asks has chosen the equation. Invariant: all four properties are derivatives of one Gibbs
// energy, so they agree with each other exactly. The zero of enthalpy and entropy is liquid water at its triple point.
// Source: IAPWS R7-97(2012), equations 7 and 15 to 17; coefficients in data/if97.json.

import if97 from './data/if97.json' with { type: 'json' };

export interface SinglePhase {
  readonly volumeM3PerKg: number;
  readonly enthalpyJPerKg: number;
  readonly entropyJPerKgK: number;
  /** At constant pressure. */
  readonly heatCapacityJPerKgK: number;
}

/** Specific gas constant of the formulation, J/(kg K): not that of today's constants, and not to be mended. */
export const waterGasConstantJPerKgK = 461.526;

/** Liquid water: 273.15 to 623.15 K, from saturation to 100 MPa. */
export function liquidWater(temperatureK: number, pressurePa: number): SinglePhase {
  const scalePa = 16.53e6;
  const x = 7.1 - pressurePa / scalePa;
  const tau = 1386 / temperatureK;
  const sums = sumOf(liquidTerms, x, tau - 1.222);
  return fromGibbs(temperatureK, tau, { ...sums, byPressure: -sums.byPressure / scalePa });
}

/** Steam: 273.15 to 1073.15 K, up to saturation, above 623.15 K up to the boundary with region 3. */
export function steam(temperatureK: number, pressurePa: number): SinglePhase {
  const scalePa = 1e6;
  const pi = pressurePa / scalePa;
  const tau = 540 / temperatureK;
  const ideal = sumOf(steamIdealTerms, 1, tau);
  const rest = sumOf(steamTerms, pi, tau - 0.5);
  return fromGibbs(temperatureK, tau, {
    gibbs: Math.log(pi) + ideal.gibbs + rest.gibbs,
    byPressure: 1 / pressurePa + rest.byPressure / scalePa,
    byTau: ideal.byTau + rest.byTau,
    twiceByTau: ideal.twiceByTau + rest.twiceByTau,
  });
}

/** Pressure in Pa of the boundary between steam and region 3 at a temperature from 623.15 to 863.15 K (equation 5). */
export function boundaryPressurePa(temperatureK: number): number {
  const [n1 = Number.NaN, n2 = Number.NaN, n3 = Number.NaN] = if97.boundary23;
  return 1e6 * (n1 + n2 * temperatureK + n3 * temperatureK * temperatureK);
}

/** The same boundary by pressure (equation 6): the larger root of equation 5. */
export function boundaryTemperatureK(pressurePa: number): number {
  const [n1 = Number.NaN, n2 = Number.NaN, n3 = Number.NaN] = if97.boundary23;
  const middle = -n2 / (2 * n3);
  return middle + Math.sqrt(middle * middle - (n1 - pressurePa / 1e6) / n3);
}

/** Powers and coefficients, three numbers a term: of the pressure's variable, of the temperature's, n. */
type Terms = Float64Array;

const liquidTerms = termsOf(if97.region1.terms);
const steamTerms = termsOf(if97.region2.residual);
const steamIdealTerms = termsOf(if97.region2.ideal.map(([power = Number.NaN, n = Number.NaN]) => [0, power, n]));

function termsOf(rows: readonly (readonly number[])[]): Terms {
  return Float64Array.from(rows.flat());
}

/** A Gibbs energy over RT with its derivatives; by pressure in 1/Pa once scaled. */
interface Gibbs {
  readonly gibbs: number;
  readonly byPressure: number;
  readonly byTau: number;
  readonly twiceByTau: number;
}

/** Sum of n x^I y^J with its derivatives by x and y; neither x nor y is 0 inside the ranges. */
function sumOf(terms: Terms, x: number, y: number): Gibbs {
  let gibbs = 0;
  let byX = 0;
  let byY = 0;
  let twiceByY = 0;
  for (let k = 0; k < terms.length; k += 3) {
    const i = terms[k] ?? 0;
    const j = terms[k + 1] ?? 0;
    const term = (terms[k + 2] ?? 0) * x ** i * y ** j;
    gibbs += term;
    byX += i * term;
    byY += j * term;
    twiceByY += j * (j - 1) * term;
  }
  return { gibbs, byPressure: byX / x, byTau: byY / y, twiceByTau: twiceByY / (y * y) };
}

function fromGibbs(temperatureK: number, tau: number, gibbs: Gibbs): SinglePhase {
  const scaleJPerKg = waterGasConstantJPerKgK * temperatureK;
  return {
    volumeM3PerKg: scaleJPerKg * gibbs.byPressure,
    enthalpyJPerKg: scaleJPerKg * tau * gibbs.byTau,
    entropyJPerKgK: waterGasConstantJPerKgK * (tau * gibbs.byTau - gibbs.gibbs),
    heatCapacityJPerKgK: -waterGasConstantJPerKgK * tau * tau * gibbs.twiceByTau,
  };
}
