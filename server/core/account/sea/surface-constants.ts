// The equilibrium constants of acids and bases in sea water at the surface (1 atm), and its solubility for carbon dioxide, by
// practical salinity and temperature. It does not know depth, which is constants-at-depth.ts, nor what is dissolved.
// Invariant: every constant is per kg of sea water (mol/kg and its powers), on the pH scale its row names, as published.
// Sources: Dickson, Sabine and Christian (eds) 2007, Guide to best practices for ocean CO2 measurements, PICES Special
// Publication 3, chapter 5, which recommends: Weiss 1974 (K0); Lueker, Dickson and Keeling 2000 (K1, K2); Dickson 1990 (KB,
// KS); Perez and Fraga 1987 (KF); Millero 1995 (KW, phosphoric and silicic acid). Mucci 1983 (calcite, aragonite).

/** At 1 atm. Acidity constants on the total scale, but for the two that define it, which are on the free scale. */
export interface SurfaceConstants {
  /** Solubility of CO2, mol/(kg atm) of fugacity. */
  readonly carbonDioxide: number;
  /** CO2* + H2O = H+ + HCO3-, and its second step. */
  readonly carbonic1: number;
  readonly carbonic2: number;
  /** B(OH)3 + H2O = H+ + B(OH)4-. */
  readonly boric: number;
  /** H2O = H+ + OH-, (mol/kg)². */
  readonly water: number;
  readonly phosphoric1: number;
  readonly phosphoric2: number;
  readonly phosphoric3: number;
  readonly silicic: number;
  /** HSO4- = H+ + SO4--, free scale. */
  readonly hydrogenSulphateFree: number;
  /** HF = H+ + F-, free scale. */
  readonly hydrogenFluorideFree: number;
  /** Solubility products of Ca++ and CO3--, (mol/kg)². */
  readonly calcite: number;
  readonly aragonite: number;
}

/** Where a set of constants was measured; beyond, its equation is extrapolated. */
export interface ConstantsRange {
  readonly of: string;
  readonly salinity: readonly [low: number, high: number];
  readonly celsius: readonly [low: number, high: number];
}

/** The ranges of the constants that decide: the narrowest first. */
export const constantsRanges: readonly ConstantsRange[] = [
  { of: 'carbonic acid (Lueker et al. 2000)', salinity: [19, 43], celsius: [2, 35] },
  { of: 'boric acid and hydrogen sulphate (Dickson 1990)', salinity: [5, 45], celsius: [0, 45] },
  { of: 'calcite and aragonite (Mucci 1983)', salinity: [5, 44], celsius: [5, 40] },
];

/** Mol of sulphate and of fluoride per kg of sea water. */
interface ScaleIons {
  readonly sulphate: number;
}

/**
 * The constants at a practical salinity and a temperature in K. `ions` are the totals at that salinity: KF is published on the
 * total scale, which sulphate defines.
 */
export function surfaceConstants(salinity: number, temperatureK: number, ions: ScaleIons): SurfaceConstants {
  const hydrogenSulphateFree = Math.exp(lnHydrogenSulphate(salinity, temperatureK));
  const totalPerFree = 1 + ions.sulphate / hydrogenSulphateFree;
  return {
    carbonDioxide: Math.exp(lnSolubility(salinity, temperatureK)),
    carbonic1: 10 ** log10Carbonic1(salinity, temperatureK),
    carbonic2: 10 ** log10Carbonic2(salinity, temperatureK),
    boric: Math.exp(lnBoric(salinity, temperatureK)),
    water: Math.exp(lnWater(salinity, temperatureK)),
    phosphoric1: Math.exp(lnPhosphoric1(salinity, temperatureK)),
    phosphoric2: Math.exp(lnPhosphoric2(salinity, temperatureK)),
    phosphoric3: Math.exp(lnPhosphoric3(salinity, temperatureK)),
    silicic: Math.exp(lnSilicic(salinity, temperatureK)),
    hydrogenSulphateFree,
    hydrogenFluorideFree: Math.exp(lnHydrogenFluoride(salinity, temperatureK)) / totalPerFree,
    calcite: 10 ** log10Calcite(salinity, temperatureK),
    aragonite: 10 ** log10Aragonite(salinity, temperatureK),
  };
}

/** Molal ionic strength of sea water, mol per kg of water (Guide, chapter 5). */
export function ionicStrength(salinity: number): number {
  return (19.924 * salinity) / (1000 - 1.005 * salinity);
}

/** Weiss 1974, table 1, per kg of sea water. */
function lnSolubility(salinity: number, temperatureK: number): number {
  const hundredsK = temperatureK / 100;
  return (
    93.4517 / hundredsK -
    60.2409 +
    23.3585 * Math.log(hundredsK) +
    salinity * (0.023517 - 0.023656 * hundredsK + 0.0047036 * hundredsK ** 2)
  );
}

/** Lueker et al. 2000, total scale. */
function log10Carbonic1(salinity: number, temperatureK: number): number {
  return (
    -3633.86 / temperatureK +
    61.2172 -
    9.6777 * Math.log(temperatureK) +
    0.011555 * salinity -
    0.0001152 * salinity ** 2
  );
}

/** Lueker et al. 2000, total scale. */
function log10Carbonic2(salinity: number, temperatureK: number): number {
  return (
    -471.78 / temperatureK - 25.929 + 3.16967 * Math.log(temperatureK) + 0.01781 * salinity - 0.0001122 * salinity ** 2
  );
}

/** Dickson 1990 (Deep-Sea Research 37), total scale. */
function lnBoric(salinity: number, temperatureK: number): number {
  const root = Math.sqrt(salinity);
  return (
    (-8966.9 - 2890.53 * root - 77.942 * salinity + 1.728 * salinity * root - 0.0996 * salinity ** 2) / temperatureK +
    148.0248 +
    137.1942 * root +
    1.62142 * salinity -
    (24.4344 + 25.085 * root + 0.2474 * salinity) * Math.log(temperatureK) +
    0.053105 * root * temperatureK
  );
}

/** Millero 1995, total scale. */
function lnWater(salinity: number, temperatureK: number): number {
  const lnT = Math.log(temperatureK);
  return (
    148.9652 -
    13847.26 / temperatureK -
    23.6521 * lnT +
    (118.67 / temperatureK - 5.977 + 1.0495 * lnT) * Math.sqrt(salinity) -
    0.01615 * salinity
  );
}

/** Millero 1995, total scale. */
function lnPhosphoric1(salinity: number, temperatureK: number): number {
  return (
    -4576.752 / temperatureK +
    115.525 -
    18.453 * Math.log(temperatureK) +
    (-106.736 / temperatureK + 0.69171) * Math.sqrt(salinity) +
    (-0.65643 / temperatureK - 0.01844) * salinity
  );
}

/** Millero 1995, total scale. */
function lnPhosphoric2(salinity: number, temperatureK: number): number {
  return (
    -8814.715 / temperatureK +
    172.0883 -
    27.927 * Math.log(temperatureK) +
    (-160.34 / temperatureK + 1.3566) * Math.sqrt(salinity) +
    (0.37335 / temperatureK - 0.05778) * salinity
  );
}

/** Millero 1995, total scale. */
function lnPhosphoric3(salinity: number, temperatureK: number): number {
  return (
    -3070.75 / temperatureK -
    18.141 +
    (17.27039 / temperatureK + 2.81197) * Math.sqrt(salinity) +
    (-44.99486 / temperatureK - 0.09984) * salinity
  );
}

/** Millero 1995, total scale; the last term turns mol per kg of water into mol per kg of sea water. */
function lnSilicic(salinity: number, temperatureK: number): number {
  const strength = ionicStrength(salinity);
  return (
    -8904.2 / temperatureK +
    117.385 -
    19.334 * Math.log(temperatureK) +
    (-458.79 / temperatureK + 3.5913) * Math.sqrt(strength) +
    (188.74 / temperatureK - 1.5998) * strength +
    (-12.1652 / temperatureK + 0.07871) * strength ** 2 +
    Math.log(1 - 0.001005 * salinity)
  );
}

/** Dickson 1990 (J. Chem. Thermodynamics 22), free scale. */
function lnHydrogenSulphate(salinity: number, temperatureK: number): number {
  const strength = ionicStrength(salinity);
  const lnT = Math.log(temperatureK);
  return (
    -4276.1 / temperatureK +
    141.328 -
    23.093 * lnT +
    (-13856 / temperatureK + 324.57 - 47.986 * lnT) * Math.sqrt(strength) +
    (35474 / temperatureK - 771.54 + 114.723 * lnT) * strength -
    (2698 / temperatureK) * strength ** 1.5 +
    (1776 / temperatureK) * strength ** 2 +
    Math.log(1 - 0.001005 * salinity)
  );
}

/** Perez and Fraga 1987, total scale. */
export function lnHydrogenFluoride(salinity: number, temperatureK: number): number {
  return 874 / temperatureK - 9.68 + 0.111 * Math.sqrt(salinity);
}

/** Mucci 1983. */
function log10Calcite(salinity: number, temperatureK: number): number {
  return (
    -171.9065 -
    0.077993 * temperatureK +
    2839.319 / temperatureK +
    71.595 * Math.log10(temperatureK) +
    (-0.77712 + 0.0028426 * temperatureK + 178.34 / temperatureK) * Math.sqrt(salinity) -
    0.07711 * salinity +
    0.0041249 * salinity ** 1.5
  );
}

/** Mucci 1983. */
function log10Aragonite(salinity: number, temperatureK: number): number {
  return (
    -171.945 -
    0.077993 * temperatureK +
    2903.293 / temperatureK +
    71.595 * Math.log10(temperatureK) +
    (-0.068393 + 0.0017276 * temperatureK + 88.135 / temperatureK) * Math.sqrt(salinity) -
    0.10018 * salinity +
    0.0059415 * salinity ** 1.5
  );
}
