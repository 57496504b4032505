// When a condensed mixture of alkali salts first melts, turns sticky and flows. Pure phases alone misplace this by hundreds of
// kelvin: sodium carbonate melts at 850 °C, and with a tenth of hydroxide it is wet from 290 °C on.
// Sodium and potassium chloride, hydroxide, carbonate and sulphate are worked out as one ionic melt over crystals that mix
// (salt-equilibrium.ts); a published first melting temperature of just these ions goes before the one worked out. Lithium
// salts and sulphides have published first melting temperatures only.
// Knows no burn and no surface. Invariant: first melting ≤ sticky ≤ flowing.
// Sources: sticky at 15 % and flowing at 70 % of melt by mass, as deposits of recovery boilers are judged (P. Isaak, H. N.
// Tran, D. Barham, D. W. Reeve, Stickiness of fireside deposits in kraft recovery units, J. Pulp Paper Sci. 12 (1986) J84);
// first melting temperatures in data/salt-eutectics.json.

import { molarMassKgPerMol, type Formula } from '../substance/formula.ts';
import eutectics from './data/salt-eutectics.json';
import { moltenMassShare, type SaltMixture } from './salt-equilibrium.ts';
import { saltAnions } from './salt-solutions.ts';

/** Share of melt by mass from which particles stick, and from which a deposit runs off by itself. */
export const stickyMeltShare = 0.15;
export const flowingMeltShare = 0.7;

/** How far first melting may be off where it is worked out, K: the worst of the published binaries and ternaries. */
export const calculatedUncertaintyK = 30;

/** Moles of a condensed substance; which phase it is in does not matter. */
export interface CondensedAmount {
  readonly formula: Formula;
  readonly mol: number;
}

export interface SaltMelting {
  readonly firstMeltingK: number;
  /** With 15 and 70 % of the salts molten; null where only first melting is published. */
  readonly stickyK: number | null;
  readonly flowingK: number | null;
  readonly basis: 'pure-salt' | 'published-eutectic' | 'ionic-melt';
  /** Of the first melting temperature. */
  readonly source: string;
  readonly uncertaintyK: number;
  /** What a reader must know of how far it holds. */
  readonly validity: readonly SaltMeltingValidity[];
  /** The salts' share of the whole condensed mass; the rest is taken to stay solid and apart. */
  readonly saltMassShare: number;
}

/**
 * `eutectic-of-some`: first melting is the lowest published of salts among these, and may come lower still · `much-else`:
 * less than half of the deposit is salt, and what is solid stiffens it.
 */
export type SaltMeltingValidity = 'eutectic-of-some' | 'much-else';

type Ion = 'Na' | 'K' | 'Li' | (typeof saltAnions)[number] | 'S';

interface Eutectic {
  readonly salts: readonly string[];
  readonly celsius: number;
  readonly source: string;
  readonly provenance: 'seen' | 'from memory';
}

type Salt = readonly [cation: Ion, anion: Ion, equivalents: number];

/** Cation, anion and equivalents a mole of each salt that is known here, by its formula as it is written. */
const salts: ReadonlyMap<string, Salt> = new Map(
  (['Na', 'K', 'Li'] as const).flatMap((cation): readonly (readonly [string, Salt])[] => [
    [`${cation}Cl`, [cation, 'Cl', 1]],
    [`${cation}OH`, [cation, 'OH', 1]],
    [`${cation}2CO3`, [cation, 'CO3', 2]],
    [`${cation}2SO4`, [cation, 'SO4', 2]],
    [`${cation}2S`, [cation, 'S', 2]],
  ]),
);

/** Less of an ion than this share of the charge is not told apart from none. */
const leastShare = 1e-4;
/** Melt by mass that counts as the first. */
const firstMeltShare = 1e-4;
const searchK: readonly [number, number] = [380, 1500];

/** First melting, stickiness and flow of a condensed mixture; undefined when it holds no alkali salt known here. */
export function saltMelting(condensed: readonly CondensedAmount[]): SaltMelting | undefined {
  const { shares, saltMassShare } = ionShares(condensed);
  if (shares.size === 0) return undefined;
  const validity: SaltMeltingValidity[] = saltMassShare < 0.5 ? ['much-else'] : [];
  const there = new Set(shares.keys());
  if (there.has('Li') || there.has('S')) return lowestPublished(there, saltMassShare, validity);
  const mixture = mixtureOf(shares);
  const calculatedK = temperatureOfShare(mixture, firstMeltShare, searchK[0]);
  const sticky = temperatureOfShare(mixture, stickyMeltShare, calculatedK);
  const flowing = temperatureOfShare(mixture, flowingMeltShare, sticky);
  const published = eutecticOf(there);
  const firstMeltingK = published ? published.celsius + 273.15 : calculatedK;
  // What melts at once in the calculation melts at once at the published temperature.
  const shifted = (temperatureK: number): number =>
    temperatureK - calculatedK < 1 ? firstMeltingK : Math.max(temperatureK, firstMeltingK);
  return {
    firstMeltingK,
    stickyK: shifted(sticky),
    flowingK: Math.max(shifted(flowing), shifted(sticky)),
    basis: there.size === 2 ? 'pure-salt' : published ? 'published-eutectic' : 'ionic-melt',
    source: published?.source ?? (there.size === 2 ? tables : calculation),
    uncertaintyK: published ? 10 : there.size === 2 ? 2 : calculatedUncertaintyK,
    validity,
    saltMassShare,
  };
}

const tables = 'Chase 1998';
const calculation = 'ionic melt over mixed crystals, single salts as in Chase 1998';

/** Shares of the charge by ion, cations and anions apart, and the salts' share of the mass. */
function ionShares(condensed: readonly CondensedAmount[]): {
  readonly shares: ReadonlyMap<Ion, number>;
  readonly saltMassShare: number;
} {
  const equivalents = new Map<Ion, number>();
  let [whole, saltKg, allKg] = [0, 0, 0];
  for (const { formula, mol } of condensed) {
    const massKg = mol * (molarMassKgPerMol(formula) ?? 0);
    allKg += massKg;
    const salt = salts.get(formula.text);
    if (!salt || !(mol > 0)) continue;
    const [cation, anion, perMole] = salt;
    for (const ion of [cation, anion]) equivalents.set(ion, (equivalents.get(ion) ?? 0) + mol * perMole);
    whole += mol * perMole;
    saltKg += massKg;
  }
  const shares = new Map([...equivalents].map(([ion, amount]) => [ion, amount / whole]));
  for (const [ion, share] of shares) if (share < leastShare) shares.delete(ion);
  return { shares, saltMassShare: allKg > 0 ? saltKg / allKg : 0 };
}

function mixtureOf(shares: ReadonlyMap<Ion, number>): SaltMixture {
  const of = (ion: Ion): number => shares.get(ion) ?? 0;
  const cations = of('Na') + of('K');
  const anions = saltAnions.reduce((sum, anion) => sum + of(anion), 0);
  return { potassium: of('K') / cations, anions: saltAnions.map((anion) => of(anion) / anions) };
}

/** Where the melt reaches a share of the mass, to a tenth of a kelvin; it only grows with temperature. */
function temperatureOfShare(mixture: SaltMixture, share: number, fromK: number): number {
  let [low, high] = [fromK, searchK[1]];
  if (moltenMassShare(mixture, low) >= share) return low;
  while (high - low > 0.1) {
    const middle = (low + high) / 2;
    if (moltenMassShare(mixture, middle) < share) low = middle;
    else high = middle;
  }
  return high;
}

/** The published eutectic of just these ions; only where one ion is common, for else it depends on the composition. */
function eutecticOf(there: ReadonlySet<Ion>): Eutectic | undefined {
  return published.find(({ ions }) => ions.size === there.size && [...ions].every((ion) => there.has(ion)))?.eutectic;
}

function lowestPublished(
  there: ReadonlySet<Ion>,
  saltMassShare: number,
  validity: readonly SaltMeltingValidity[],
): SaltMelting | undefined {
  const within = published
    .filter(({ ions }) => [...ions].every((ion) => there.has(ion)))
    .sort((a, b) => a.eutectic.celsius - b.eutectic.celsius);
  const [lowest] = within;
  if (!lowest) return undefined;
  return {
    firstMeltingK: lowest.eutectic.celsius + 273.15,
    stickyK: null,
    flowingK: null,
    basis: 'published-eutectic',
    source: lowest.eutectic.source,
    uncertaintyK: 10,
    validity: lowest.ions.size < there.size ? [...validity, 'eutectic-of-some'] : validity,
    saltMassShare,
  };
}

const published = (eutectics as readonly unknown[] as readonly Eutectic[]).map((eutectic) => ({
  eutectic,
  ions: new Set(eutectic.salts.flatMap((text) => ionsOf(text))),
}));

function ionsOf(text: string): readonly Ion[] {
  const [cation, anion] = salts.get(text) ?? [];
  return cation && anion ? [cation, anion] : [];
}
