// Density of sea water, and the pressure at a depth. It knows no chemistry: two waters of one salinity are one here.
// Invariant: pressures are applied ones, above the atmosphere's, in bar; density in kg/m³.
// Sources: Unesco technical papers in marine science 36 and 44 (1981, 1983): the international equation of state of sea water
// 1980 (Millero and Poisson 1981; Millero et al. 1980), good for salinities of 0 to 42, -2 to 40 °C and 0 to 1000 bar; Saunders
// 1981 (J. Phys. Oceanography 11, 573) for pressure by depth. Temperatures on the scale of 1968 differ by up to 0.01 K: left aside.

/** Density of sea water at a place. */
export function seaDensityKgPerM3(salinity: number, celsius: number, appliedPressureBar: number): number {
  const surface = surfaceDensityKgPerM3(salinity, celsius);
  return appliedPressureBar === 0
    ? surface
    : surface / (1 - appliedPressureBar / secantBulkModulusBar(salinity, celsius, appliedPressureBar));
}

/** Applied pressure at a depth in m; latitude in degrees (gravity grows to the poles). */
export function pressureAtDepthBar(depthM: number, latitudeDegrees = 45): number {
  const sine = Math.sin((latitudeDegrees * Math.PI) / 180);
  const linear = 1 - (5.92e-3 + 5.25e-3 * sine ** 2);
  const decibar = (linear - Math.sqrt(linear ** 2 - 8.84e-6 * depthM)) / 4.42e-6;
  return decibar / 10;
}

function surfaceDensityKgPerM3(salinity: number, t: number): number {
  const pure = polynomial([999.842594, 6.793952e-2, -9.09529e-3, 1.001685e-4, -1.120083e-6, 6.536332e-9], t);
  const linear = polynomial([8.24493e-1, -4.0899e-3, 7.6438e-5, -8.2467e-7, 5.3875e-9], t);
  const threeHalves = polynomial([-5.72466e-3, 1.0227e-4, -1.6546e-6], t);
  return pure + linear * salinity + threeHalves * salinity ** 1.5 + 4.8314e-4 * salinity ** 2;
}

function secantBulkModulusBar(salinity: number, t: number, pressureBar: number): number {
  const root = salinity * Math.sqrt(salinity);
  const atmospheric =
    polynomial([19652.21, 148.4206, -2.327105, 1.360477e-2, -5.155288e-5], t) +
    polynomial([54.6746, -0.603459, 1.09987e-2, -6.167e-5], t) * salinity +
    polynomial([7.944e-2, 1.6483e-2, -5.3009e-4], t) * root;
  const linear =
    polynomial([3.239908, 1.43713e-3, 1.16092e-4, -5.77905e-7], t) +
    polynomial([2.2838e-3, -1.0981e-5, -1.6078e-6], t) * salinity +
    1.91075e-4 * root;
  const square =
    polynomial([8.50935e-5, -6.12293e-6, 5.2787e-8], t) + polynomial([-9.9348e-7, 2.0816e-8, 9.1697e-10], t) * salinity;
  return atmospheric + linear * pressureBar + square * pressureBar ** 2;
}

/** c0 + c1 x + c2 x² + … */
function polynomial(coefficients: readonly number[], x: number): number {
  return coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0);
}
