// What carries heat and oxygen through the gas around a burning droplet or particle: conductivity and heat capacity of air
// and of a fuel's vapour, and how fast oxygen diffuses in nitrogen.
// Estimates of a few per cent for air and of some twenty per cent for vapours; they serve burn-out times, which are no
// better, and nothing else. Knows no particle. Invariant: every value is positive at every positive temperature.
// Sources: thermal conductivity of air by the formula of the U.S. Standard Atmosphere (1976), from memory, carried on above
// 2000 K; heat capacity of nitrogen from the tables; binary diffusion by a power law through 0.21 cm²/s at 298 K and 1 atm
// with the exponent 1.75 of Fuller et al. (1966), from memory; vapours by what each atom adds to the heat capacity, a viscosity
// that falls with molar mass, and the modified Eucken relation, from memory.

import { molarGasConstantJPerMolK, standardAtmospherePa } from '../quantity/constants.ts';
import { phaseOfId, propertiesOfPhase } from '../substance/phases.ts';

/** Of the gas between the surface and the surroundings, at the film's mean temperature. */
export interface Film {
  readonly conductivityWPerMK: number;
  readonly heatCapacityJPerKgK: number;
}

/** W/(m K) of air. */
export function airConductivityWPerMK(temperatureK: number): number {
  return (2.64638e-3 * temperatureK ** 1.5) / (temperatureK + 245.4 * 10 ** (-12 / temperatureK));
}

/** Of air, its heat capacity taken as nitrogen's, which differs from it by less than 3 %. */
export function airFilm(temperatureK: number): Film {
  return {
    conductivityWPerMK: airConductivityWPerMK(temperatureK),
    heatCapacityJPerKgK: nitrogenHeatCapacityJPerKgK(temperatureK),
  };
}

/** The molecules of a droplet's vapour: their mean molar mass and the elements of a kilogram. */
export interface OrganicVapour {
  readonly molarMassKgPerMol: number;
  readonly elementMolPerKg: ReadonlyMap<string, number>;
}

/**
 * Around a droplet of a liquid fuel: heat capacity of the vapour, conductivity two fifths of the vapour's and three fifths
 * of air's (Law and Williams 1972, from memory).
 */
export function vapourFilm(temperatureK: number, vapour: OrganicVapour): Film {
  const heatCapacityJPerKgK = vapourHeatCapacityJPerKgK(temperatureK, vapour);
  const gasConstantJPerKgK = molarGasConstantJPerMolK / vapour.molarMassKgPerMol;
  const viscosityPaS = 6.2e-6 * (vapour.molarMassKgPerMol / 0.1) ** -0.42 * (temperatureK / 300) ** 0.9;
  const vapourWPerMK = viscosityPaS * (1.32 * (heatCapacityJPerKgK - gasConstantJPerKgK) + 1.77 * gasConstantJPerKgK);
  return {
    conductivityWPerMK: 0.4 * vapourWPerMK + 0.6 * airConductivityWPerMK(temperatureK),
    heatCapacityJPerKgK,
  };
}

/** kg/(m s): density times diffusivity of oxygen in nitrogen, which does not depend on pressure. */
export function oxygenDiffusionKgPerMS(temperatureK: number): number {
  const diffusivityM2PerS = 2.1e-5 * (temperatureK / 298.15) ** 1.75;
  const densityKgPerM3 = (standardAtmospherePa * nitrogenKgPerMol) / (molarGasConstantJPerMolK * temperatureK);
  return densityKgPerM3 * diffusivityM2PerS;
}

/** By what each atom adds to a molecule's heat capacity, straight between a few temperatures. */
function vapourHeatCapacityJPerKgK(temperatureK: number, { elementMolPerKg }: OrganicVapour): number {
  const nearest = Math.min(Math.max(temperatureK, 300), 1500);
  const last = atomShares.length - 1;
  const place = Math.max(
    1,
    atomShares.findIndex(({ atK }) => atK >= nearest),
  );
  const right = atomShares[Math.min(place, last)] ?? reference;
  const left = atomShares[Math.min(place, last) - 1] ?? reference;
  const share = (nearest - left.atK) / (right.atK - left.atK);
  let sum = 0;
  for (const symbol of ['C', 'H', 'O'] as const) {
    sum += (elementMolPerKg.get(symbol) ?? 0) * (left[symbol] + share * (right[symbol] - left[symbol]));
  }
  return sum;
}

/**
 * J/(mol K) an atom, from the gas heat capacities of n-heptane (166, 253, 318, 369), benzene (82, 157, 209, 246) and
 * methanol (44, 67, 90, 106) at these temperatures, rounded and from memory.
 */
const reference = { atK: 300, C: 5.9, H: 7.8, O: 7 } as const;
const atomShares: readonly { readonly atK: number; readonly C: number; readonly H: number; readonly O: number }[] = [
  reference,
  { atK: 600, C: 18.4, H: 7.8, O: 17.5 },
  { atK: 1000, C: 26.6, H: 8.2, O: 30 },
  { atK: 1500, C: 31.9, H: 9.1, O: 38 },
];

const nitrogenKgPerMol = 0.0280134;

function nitrogenHeatCapacityJPerKgK(temperatureK: number): number {
  const nitrogen = phaseOfId('N2(g)');
  const molar = nitrogen && propertiesOfPhase(nitrogen, temperatureK)?.heatCapacityJPerMolK;
  if (molar === undefined) throw new Error('The tables hold no nitrogen.');
  return molar / nitrogenKgPerMol;
}
