// The pressure at which water vapour is in balance with liquid water or ice, for humid air, dew points and steam.
// Knows nothing of air: no enhancement by the gas above it is counted. Ranges: ice 50 to 273.16 K, liquid to 647.096 K.
// Sources: IAPWS-IF97, region 4, equation 30 (Wagner et al. 2000, J. Eng. Gas Turbines Power 122, 150) for the liquid;
// IAPWS R14-08(2011), equation 6 (Wagner et al. 2011, J. Phys. Chem. Ref. Data 40, 043103) for ice.

/** Water's triple point, K. */
export const triplePointK = 273.16;

/** Saturation pressure in Pa at a temperature in K, over ice below the triple point; undefined outside 50 to 647.096 K. */
export function waterSaturationPressurePa(temperatureK: number): number | undefined {
  if (temperatureK >= 50 && temperatureK < triplePointK) return overIce(temperatureK);
  return temperatureK >= triplePointK && temperatureK <= criticalPointK ? overLiquid(temperatureK) : undefined;
}

/**
 * Temperature in K at which liquid water boils at a pressure in Pa: the same equation solved for it (IF97, equation 31);
 * undefined outside the triple point's pressure to 22.064 MPa.
 */
export function waterSaturationTemperatureK(pressurePa: number): number | undefined {
  if (!(pressurePa >= triplePointPa && pressurePa <= criticalPointPa)) return undefined;
  const beta = (pressurePa / 1e6) ** 0.25;
  const e = beta * beta + n3 * beta + n6;
  const f = n1 * beta * beta + n4 * beta + n7;
  const g = n2 * beta * beta + n5 * beta + n8;
  const d = (2 * g) / (-f - Math.sqrt(f * f - 4 * e * g));
  return (n10 + d - Math.sqrt((n10 + d) ** 2 - 4 * (n9 + n10 * d))) / 2;
}

const criticalPointK = 647.096;
const criticalPointPa = 22.064e6;
const triplePointPa = 611.657;

/** Symbols as in IF97: n1 to n10; θ = T + n9 / (T - n10). */
function overLiquid(temperatureK: number): number {
  const theta = temperatureK + n9 / (temperatureK - n10);
  const a = theta * theta + n1 * theta + n2;
  const b = n3 * theta * theta + n4 * theta + n5;
  const c = n6 * theta * theta + n7 * theta + n8;
  return 1e6 * ((2 * c) / (-b + Math.sqrt(b * b - 4 * a * c))) ** 4;
}

const n1 = 0.11670521452767e4;
const n2 = -0.72421316703206e6;
const n3 = -0.17073846940092e2;
const n4 = 0.1202082470247e5;
const n5 = -0.32325550322333e7;
const n6 = 0.1491510861353e2;
const n7 = -0.48232657361591e4;
const n8 = 0.40511340542057e6;
const n9 = -0.23855557567849;
const n10 = 0.65017534844798e3;

/** Symbols as in R14-08: ln(p / p_t) = Σ a_i θ^b_i / θ, θ = T / T_t. */
function overIce(temperatureK: number): number {
  const theta = temperatureK / triplePointK;
  const sum = iceTerms.reduce((total, [a, b]) => total + a * theta ** b, 0);
  return triplePointPa * Math.exp(sum / theta);
}

const iceTerms: readonly (readonly [number, number])[] = [
  [-0.212144006e2, 0.333333333e-2],
  [0.273203819e2, 0.120666667e1],
  [-0.61059813e1, 0.170333333e1],
];
