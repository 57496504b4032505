// The solutions that a deposit of sodium and potassium chloride, hydroxide, carbonate and sulphate is made of: one ionic
// melt, the (Na,K)Cl crystal, the hexagonal (Na,K)2(CO3,SO4) crystal; and the pure crystals beside them. For each, the
// composition at which it lies lowest under given potentials of the ions.
// Knows no amounts and no phase rule. All per equivalent (a mole of charge), so that a composition is a share of cations and
// a share of anions, each adding up to 1. Invariant: at a single salt the Gibbs energy is that of the tables.
// Method: Temkin's ideal ionic mixture (M. Temkin, Acta Physicochim. URSS 20 (1945) 411), in which cations mix among
// cations and anions among anions, with one regular term for sodium and potassium beside each anion, and one for carbonate
// and sulphate in the crystal. The terms are in data/salt-terms.json: each is set so that one binary melts as published.

import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { phaseOfId, propertiesOfPhase } from '../substance/phases.ts';
import terms from './data/salt-terms.json';

export const saltAnions = ['Cl', 'OH', 'CO3', 'SO4'] as const;
export type SaltAnion = (typeof saltAnions)[number];

/** Charge of each anion, in the order of `saltAnions`. */
export const anionCharge: readonly number[] = [1, 1, 2, 2];

/** A phase at one composition, per equivalent. */
export interface SaltColumn {
  readonly phase: 'melt' | 'halite' | 'hexagonal' | 'crystal';
  /** Share of potassium among the cations; the rest is sodium. */
  readonly potassium: number;
  /** Shares of the anions by charge, in the order of `saltAnions`. */
  readonly anions: readonly number[];
  readonly gibbsJ: number;
}

/** Potentials of sodium and potassium and of the anions, J per equivalent. */
export interface IonPotentials {
  readonly cationsJ: readonly [sodium: number, potassium: number];
  readonly anionsJ: readonly number[];
}

/** What the search needs at one temperature: Gibbs energies of single salts, J per equivalent. */
export interface SaltsAtTemperature {
  readonly rtJ: number;
  /** `[cation][anion]` in the order of the potentials. */
  readonly meltJ: readonly (readonly number[])[];
  readonly haliteJ: readonly [number, number];
  readonly hexagonalJ: readonly (readonly [carbonate: number, sulphate: number])[];
  readonly crystals: readonly SaltColumn[];
}

const melts = [
  ['NaCl(l)', 'NaOH(l)', 'Na2CO3(l)', 'Na2SO4(l)'],
  ['KCl(l)', 'KOH(l)', 'K2CO3(l)', 'K2SO4(l)'],
] as const;

const pureCrystals: readonly (readonly [id: string, potassium: 0 | 1, anion: number])[] = [
  ['NaOH(cr)', 0, 1],
  ['KOH(cr)', 1, 1],
  ['Na2SO4(cr,V)', 0, 3],
  ['Na2SO4(cr,IV)', 0, 3],
  ['Na2SO4(cr,III)', 0, 3],
  ['K2SO4(cr,alpha)', 1, 3],
];

/** The Gibbs energies of all single salts at a temperature in K. */
export function saltsAtTemperature(temperatureK: number): SaltsAtTemperature {
  const gibbsJ = (id: string, equivalents: number): number => {
    const phase = phaseOfId(id);
    const values = phase && propertiesOfPhase(phase, temperatureK);
    return (values?.gibbsJPerMol ?? Number.NaN) / equivalents;
  };
  return {
    rtJ: molarGasConstantJPerMolK * temperatureK,
    meltJ: melts.map((row) => row.map((id, anion) => gibbsJ(id, anionCharge[anion] ?? 1))),
    haliteJ: [gibbsJ('NaCl(cr)', 1), gibbsJ('KCl(cr)', 1)],
    hexagonalJ: [
      [gibbsJ('Na2CO3(cr)', 2), gibbsJ('Na2SO4(cr,I)', 2)],
      [gibbsJ('K2CO3(cr)', 2), gibbsJ('K2SO4(cr,beta)', 2)],
    ],
    crystals: pureCrystals
      .filter(([id]) => isStable(id, temperatureK))
      .map(([id, potassium, anion]) => ({
        phase: 'crystal',
        potassium,
        anions: saltAnions.map((_, index) => (index === anion ? 1 : 0)),
        gibbsJ: gibbsJ(id, anionCharge[anion] ?? 1),
      })),
  };
}

/** Low forms count where they are the stable ones: their tables run on for hundreds of kelvin, and cross back. */
function isStable(id: string, temperatureK: number): boolean {
  const ranges = phaseOfId(id)?.stableK ?? [];
  return ranges.some(([fromK, toK]) => fromK <= temperatureK && temperatureK <= toK);
}

/** The melt where it lies lowest: at each share of potassium the best anions in closed form, then the best such share. */
export function lowestMelt({ rtJ, meltJ }: SaltsAtTemperature, potentials: IonPotentials): SaltColumn {
  const { cationsJ, anionsJ } = potentials;
  const [sodiumJ = [], potassiumJ = []] = meltJ;
  const at = (potassium: number): { readonly excessJ: number; readonly slopeJ: number; readonly anions: number[] } => {
    const energies = anionsJ.map(
      (potentialJ, anion) =>
        between(potassium, sodiumJ[anion] ?? 0, potassiumJ[anion] ?? 0) +
        potassium * (1 - potassium) * meltTerm(anion) -
        potentialJ,
    );
    const multiplierJ = lowestMultiplier(energies, rtJ);
    const shares = energies.map((energyJ, anion) => {
      const charge = anionCharge[anion] ?? 1;
      return charge * Math.exp((-charge * (energyJ - multiplierJ)) / rtJ);
    });
    const whole = shares.reduce((sum, share) => sum + share, 0);
    const anions = shares.map((share) => share / whole);
    // The anions are the best already, so only the cations' own change counts.
    const slopeJ = anions.reduce(
      (sum, share, anion) =>
        sum + share * ((potassiumJ[anion] ?? 0) - (sodiumJ[anion] ?? 0) + (1 - 2 * potassium) * meltTerm(anion)),
      rtJ * Math.log(potassium / (1 - potassium)) - (cationsJ[1] - cationsJ[0]),
    );
    return { excessJ: multiplierJ + rtJ * mixing(potassium) - between(potassium, ...cationsJ), slopeJ, anions };
  };
  const potassium = whereRising((share) => at(share).slopeJ);
  const { excessJ, anions } = at(potassium);
  return column('melt', potassium, anions, excessJ, potentials);
}

function meltTerm(anion: number): number {
  return terms.melt[saltAnions[anion] ?? 'Cl'];
}

/** The chloride crystal on both sides of its gap. */
export function lowestHalite(salts: SaltsAtTemperature, potentials: IonPotentials): readonly SaltColumn[] {
  const { cationsJ, anionsJ } = potentials;
  const excessAt = (potassium: number): number =>
    between(potassium, salts.haliteJ[0] - cationsJ[0], salts.haliteJ[1] - cationsJ[1]) +
    potassium * (1 - potassium) * terms.halite +
    salts.rtJ * mixing(potassium) -
    (anionsJ[0] ?? 0);
  return [
    [0, 0.5],
    [0.5, 1],
  ].map(([from = 0, to = 1]) => {
    const potassium = lowest(excessAt, from, to);
    return column('halite', potassium, [1, 0, 0, 0], excessAt(potassium), potentials);
  });
}

/**
 * The hexagonal crystal where it lies lowest, with as much of either anion as is best. Its terms are too small for a gap at
 * any temperature at which something melts, so the slopes rise and have one zero.
 */
export function lowestHexagonal({ rtJ, hexagonalJ }: SaltsAtTemperature, potentials: IonPotentials): SaltColumn {
  const { cationsJ, anionsJ } = potentials;
  const [, , carbonateJ = 0, sulphateJ = 0] = anionsJ;
  const [sodium = [0, 0], kalium = [0, 0]] = hexagonalJ;
  const { CO3, SO4, anions } = terms.hexagonal;
  const bestSulphate = (potassium: number): number => {
    const fixedJ =
      between(potassium, sodium[1] - sodium[0], kalium[1] - kalium[0]) +
      potassium * (1 - potassium) * (SO4 - CO3) -
      (sulphateJ - carbonateJ);
    return whereRising((share) => fixedJ + anions * (1 - 2 * share) + (rtJ / 2) * Math.log(share / (1 - share)));
  };
  const potassium = whereRising((share) => {
    const sulphate = bestSulphate(share);
    return (
      between(sulphate, kalium[0] - sodium[0], kalium[1] - sodium[1]) +
      (1 - 2 * share) * between(sulphate, CO3, SO4) +
      rtJ * Math.log(share / (1 - share)) -
      (cationsJ[1] - cationsJ[0])
    );
  });
  const sulphate = bestSulphate(potassium);
  const excessJ =
    between(sulphate, between(potassium, sodium[0], kalium[0]), between(potassium, sodium[1], kalium[1])) +
    potassium * (1 - potassium) * between(sulphate, CO3, SO4) +
    sulphate * (1 - sulphate) * anions +
    rtJ * (mixing(potassium) + mixing(sulphate) / 2) -
    between(potassium, ...cationsJ) -
    between(sulphate, carbonateJ, sulphateJ);
  return column('hexagonal', potassium, [0, 0, 1 - sulphate, sulphate], excessJ, potentials);
}

/** A column with its own Gibbs energy, from its excess over the potentials. */
function column(
  phase: SaltColumn['phase'],
  potassium: number,
  anions: readonly number[],
  excessJ: number,
  { cationsJ, anionsJ }: IonPotentials,
): SaltColumn {
  const plane = between(potassium, ...cationsJ) + anions.reduce((sum, share, k) => sum + share * (anionsJ[k] ?? 0), 0);
  return { phase, potassium, anions, gibbsJ: excessJ + plane };
}

/** The multiplier at which the anions' shares exp(-z (e - m) / RT) add up to 1; they rise with it. */
function lowestMultiplier(energiesJ: readonly number[], rtJ: number): number {
  let multiplierJ = Math.min(...energiesJ);
  for (let step = 0; step < 60; step += 1) {
    let sum = 0;
    let slope = 0;
    energiesJ.forEach((energyJ, anion) => {
      const charge = anionCharge[anion] ?? 1;
      const share = Math.exp((-charge * (energyJ - multiplierJ)) / rtJ);
      sum += share;
      slope += (charge * share) / rtJ;
    });
    // Newton on the logarithm, which is nearly straight, from the right: the sum is at least 1 at the start.
    const move = (sum * Math.log(sum)) / slope;
    multiplierJ -= move;
    if (Math.abs(move) < 1e-7) break;
  }
  return multiplierJ;
}

function between(share: number, first: number, second: number): number {
  return (1 - share) * first + share * second;
}

/** Entropy of mixing of two kinds over -R. */
function mixing(share: number): number {
  const part = (x: number): number => (x > 0 ? x * Math.log(x) : 0);
  return part(share) + part(1 - share);
}

/** The share at which a rising function of it passes zero, to a ten-billionth. */
function whereRising(f: (share: number) => number): number {
  let [low, high] = [0, 1];
  for (let k = 0; k < 34; k += 1) {
    const middle = (low + high) / 2;
    if (f(middle) < 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Where a function is lowest in an interval: the best of a grid, then golden sections around it. */
function lowest(f: (x: number) => number, from: number, to: number): number {
  const pieces = 12;
  let best = 0;
  let bestValue = Infinity;
  for (let k = 0; k <= pieces; k += 1) {
    const value = f(from + ((to - from) * k) / pieces);
    if (value < bestValue) [best, bestValue] = [k, value];
  }
  let low = from + ((to - from) * Math.max(best - 1, 0)) / pieces;
  let high = from + ((to - from) * Math.min(best + 1, pieces)) / pieces;
  const golden = (Math.sqrt(5) - 1) / 2;
  for (let k = 0; k < 34; k += 1) {
    const [a, b] = [high - golden * (high - low), low + golden * (high - low)];
    if (f(a) < f(b)) high = b;
    else low = a;
  }
  return (low + high) / 2;
}
