// How long a single droplet or metal particle takes to burn where diffusion decides: beside the time it has in the flame,
// this says whether an equilibrium that counts it as burnt may be believed.
// Knows no sprays (neighbours share the oxygen and slow each other down), no slip (which shortens the time) and no ignition
// delay. Invariant: a time is for the whole particle from ignition on, and the burnt share rises from 0 to 1 within it.
// Methods: Spalding's transfer number and the d² law (Godsave 1953; Spalding 1953) with mean film properties (Law and
// Williams 1972); burning on the surface by oxygen that diffuses to it, with the inward Stefan flow (Ning and
// Dreizler 2024 hold the same solution against measured iron particles); aluminium by the correlation of
// Beckstead (2005, Combust. Explos. Shock Waves 41, 533). All but the last from memory.

import { standardAtmospherePa } from '../quantity/constants.ts';
import { airFilm, oxygenDiffusionKgPerMS, vapourFilm } from './film-properties.ts';
import type { Film, OrganicVapour } from './film-properties.ts';

/** The gas far from the particle. */
export interface Surroundings {
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly oxygenMoleShare: number;
  readonly waterMoleShare: number;
  readonly carbonDioxideMoleShare: number;
  readonly oxygenMassShare: number;
  /** Of the flame around the particle: that of the fuel with as much of this gas as it needs. */
  readonly flameK: number;
}

/** What burns in a flame of its vapour around it. */
export interface VapourFuel {
  /** Of the liquid where it boils. */
  readonly densityKgPerM3: number;
  readonly boilingK: number;
  readonly latentJPerKg: number;
  /** Lower heating value, to the products as they leave the flame. */
  readonly heatingValueJPerKg: number;
  readonly oxygenKgPerKg: number;
  /** Null for metals, whose film is taken as air. */
  readonly vapour: OrganicVapour | null;
}

/** What burns on its surface and keeps its oxide, as iron does. */
export interface SurfaceFuel {
  readonly densityKgPerM3: number;
  readonly oxygenKgPerKg: number;
  /** Of the particle while it burns. */
  readonly surfaceK: number;
}

/**
 * Why a time is to be doubted. `kinetics`: so small that reaction, not diffusion, decides; the true time is longer ·
 * `near-critical`: the pressure is near or above the vapour's critical one, where a droplet has no boiling point.
 */
export type BurnOutDoubt = 'kinetics' | 'near-critical';

export interface BurnOut {
  readonly law: 'vapour' | 'surface' | 'aluminium';
  readonly timeS: number;
  /** Diameter to this power falls evenly with time; null where the diameter stays and oxygen is taken up evenly. */
  readonly exponent: number | null;
  /** Spalding's transfer number, or that of oxygen alone; null for a correlation. */
  readonly transferNumber: number | null;
  /** Published burn times scatter about such laws by this factor up and down. */
  readonly factor: number;
  readonly doubts: readonly BurnOutDoubt[];
}

/** Without oxygen, or too little of it to keep the vapour flame up, nothing burns out. */
export type NoBurnOut = { readonly law: 'none'; readonly reason: 'no-oxygen' | 'no-flame' };

/** d² law: t = ρ d² / (8 (λ/cp) ln(1 + B)), B = (Y/s Q + cp (T - Tb)) / L. */
export function burnOutOfVapour(fuel: VapourFuel, diameterM: number, gas: Surroundings): BurnOut | NoBurnOut {
  if (!(gas.oxygenMassShare > 0)) return { law: 'none', reason: 'no-oxygen' };
  const filmK = (fuel.boilingK + Math.max(gas.flameK, fuel.boilingK)) / 2;
  const film: Film = fuel.vapour === null ? airFilm(filmK) : vapourFilm(filmK, fuel.vapour);
  const transferNumber =
    ((gas.oxygenMassShare / fuel.oxygenKgPerKg) * fuel.heatingValueJPerKg +
      film.heatCapacityJPerKgK * (gas.temperatureK - fuel.boilingK)) /
    fuel.latentJPerKg;
  if (!(transferNumber > 0)) return { law: 'none', reason: 'no-flame' };
  const rateM2PerS =
    ((8 * film.conductivityWPerMK) / (film.heatCapacityJPerKgK * fuel.densityKgPerM3)) * Math.log1p(transferNumber);
  const doubts: BurnOutDoubt[] = [];
  if (diameterM < leastVapourDiameterM) doubts.push('kinetics');
  if (fuel.vapour !== null && gas.pressurePa > organicCriticalPa) doubts.push('near-critical');
  return { law: 'vapour', timeS: diameterM ** 2 / rateM2PerS, exponent: 2, transferNumber, factor: 1.6, doubts };
}

/**
 * Oxygen alone must come, and the gas as a whole flows inward with it: -2 π d ρD ln(1 - Y) a second for the ρ π d³/6 s that
 * the particle takes up, the diameter held at its first value (iron grows by a fifth to a third as it oxidises, which the
 * factor covers). Spalding's transfer number is -Y. Nearly pure oxygen meets no resistance in the gas: there the time is a
 * lower bound, and doubted.
 */
export function burnOutOnSurface(fuel: SurfaceFuel, diameterM: number, gas: Surroundings): BurnOut | NoBurnOut {
  if (!(gas.oxygenMassShare > 0)) return { law: 'none', reason: 'no-oxygen' };
  const filmK = (fuel.surfaceK + gas.temperatureK) / 2;
  const transferNumber = -Math.min(gas.oxygenMassShare, mostOxygenMassShare);
  const timeS =
    (fuel.oxygenKgPerKg * fuel.densityKgPerM3 * diameterM ** 2) /
    (-12 * oxygenDiffusionKgPerMS(filmK) * Math.log1p(transferNumber));
  const isDoubted = diameterM < leastSurfaceDiameterM || gas.oxygenMassShare > diffusionOxygenMassShare;
  return { law: 'surface', timeS, exponent: null, transferNumber, factor: 1.5, doubts: isDoubted ? ['kinetics'] : [] };
}

/** t = 0.00735 D^1.8 / (X p^0.1 T^0.2) in ms, µm, atm and K, X = O2 + 0.6 H2O + 0.22 CO2 by mole. */
export function burnOutOfAluminium(diameterM: number, gas: Surroundings): BurnOut | NoBurnOut {
  const oxidiser = gas.oxygenMoleShare + 0.6 * gas.waterMoleShare + 0.22 * gas.carbonDioxideMoleShare;
  if (!(oxidiser > 0)) return { law: 'none', reason: 'no-oxygen' };
  const timeMs =
    (0.00735 * (diameterM * 1e6) ** 1.8) /
    (oxidiser * (gas.pressurePa / standardAtmospherePa) ** 0.1 * gas.temperatureK ** 0.2);
  // Below 20 µm the correlation was found to fail (Lynch, Krier and Glumac 2009).
  const doubts: BurnOutDoubt[] = diameterM < 20e-6 ? ['kinetics'] : [];
  return { law: 'aluminium', timeS: timeMs / 1000, exponent: 1.8, transferNumber: null, factor: 2, doubts };
}

/** Share of the particle's mass that has burnt after a time in s from ignition. */
export function burntShareAfter(burnOut: BurnOut, timeS: number): number {
  const passed = Math.min(Math.max(timeS / burnOut.timeS, 0), 1);
  return burnOut.exponent === null ? passed : 1 - (1 - passed) ** (3 / burnOut.exponent);
}

/**
 * Whether a particle may be counted as burnt after a residence in s: `burnt` even if it takes the factor longer, `unburnt`
 * if it would be left even at the factor's quicker end, `open` between the two or where the time itself is doubted.
 */
export function burnOutWithin(burnOut: BurnOut | NoBurnOut, residenceS: number): 'burnt' | 'open' | 'unburnt' {
  if (burnOut.law === 'none') return 'unburnt';
  if (residenceS < burnOut.timeS / burnOut.factor) return 'unburnt';
  return residenceS >= burnOut.timeS * burnOut.factor && burnOut.doubts.length === 0 ? 'burnt' : 'open';
}

/** Flames around smaller droplets and particles of volatile metals are no longer thin against their size. */
const leastVapourDiameterM = 10e-6;
const leastSurfaceDiameterM = 10e-6;
/** From here on diffusion brings oxygen faster than melts were seen to take it up (common practice: half to two thirds). */
const diffusionOxygenMassShare = 0.6;
/** Where the logarithm is cut off, so that pure oxygen still has a time. */
const mostOxygenMassShare = 0.95;
/** Fuel oils' and alcohols' vapours have critical pressures of 1.5 to 8 MPa. */
const organicCriticalPa = 2e6;
