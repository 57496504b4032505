// When a condensed mixture of alkali salts first melts, turns sticky and flows. Pure phases alone misplace this by hundreds of
// kelvin: sodium carbonate melts at 850 °C, and with a tenth of hydroxide it is wet from 290 °C on.
// Sodium and potassium chloride, hydroxide, carbonate and sulphate are worked out as one ionic melt over crystals that mix
// (salt-equilibrium.ts); a published first melting temperature of just these ions goes before the one worked out. Lithium
// salts and sulphides melt as their tables say where they are alone; mixed they have published first melting temperatures at
// most, unless there is so little of them that the rest can be judged without.
// Knows no burn and no surface. Invariant: first melting ≤ sticky ≤ flowing; where a deposit sticks is never taken from
// where it first melts, as a little of the lowest melt can lie in much crystal.
// Sources: sticky at 15 % and flowing at 70 % of melt by mass, as deposits of recovery boilers are judged (P. Isaak, H. N.
// Tran, D. Barham, D. W. Reeve, Stickiness of fireside deposits in kraft recovery units, J. Pulp Paper Sci. 12 (1986) J84);
// first melting temperatures in data/salt-eutectics.json.

import { molarMassKgPerMol, type Formula } from '../substance/formula.ts';
import eutectics from './data/salt-eutectics.json';
import { moltenMassShare, type SaltMixture } from './salt-equilibrium.ts';
import { saltAnions } from './salt-solutions.ts';
import {
  alkaliCations,
  depositAnions,
  fusionOf,
  loweringByOthersK,
  saltsOfIons,
  singleSalt,
  type SaltIon as Ion,
} from './single-salts.ts';

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
  /** Null where nothing is published for these salts together. */
  readonly firstMeltingK: number | null;
  /** With 15 and 70 % of the salts molten; null where that is not known. */
  readonly stickyK: number | null;
  readonly flowingK: number | null;
  readonly basis: 'pure-salt' | 'published-eutectic' | 'ionic-melt' | 'not-known';
  /** Of the first melting temperature; null where there is none. */
  readonly source: string | null;
  readonly uncertaintyK: number | null;
  /** What a reader must know of how far it holds. */
  readonly validity: readonly SaltMeltingValidity[];
  /** The salts' share of the whole condensed mass; the rest is taken to stay solid and apart. */
  readonly saltMassShare: number;
}

/**
 * `eutectic-of-some`: first melting is the lowest published of salts among these, and may come lower still · `much-else`:
 * less than half of the deposit is salt, and what is solid stiffens it · `traces-left-out`: it is judged without traces of
 * other salts; with them a film of melt comes earlier, and it sticks up to `calculatedUncertaintyK` earlier.
 */
export type SaltMeltingValidity = 'eutectic-of-some' | 'much-else' | 'traces-left-out';

interface Eutectic {
  readonly salts: readonly string[];
  readonly celsius: number;
  readonly source: string;
  readonly provenance: 'seen' | 'from memory';
}

/** Less of an ion than this share of the charge is not told apart from none. */
const leastShare = 1e-4;
/** Melt by mass that counts as the first. */
const firstMeltShare = 1e-4;
const searchK: readonly [number, number] = [380, 1500];

/**
 * First melting, stickiness and flow of a condensed mixture; undefined when it holds no alkali salt known here. Salts that
 * are known, but not how they melt together, have an answer of nulls.
 */
export function saltMelting(condensed: readonly CondensedAmount[]): SaltMelting | undefined {
  const { shares, saltMassShare } = ionShares(condensed);
  if (shares.size === 0) return undefined;
  const { kept, leavesTraces } = judged(shares);
  const validity: SaltMeltingValidity[] = saltMassShare < 0.5 ? ['much-else'] : [];
  if (leavesTraces) validity.push('traces-left-out');
  const there = new Set(kept.keys());
  if (!isCalculable(there))
    return singleOf(there, saltMassShare, validity) ?? lowestPublished(there, saltMassShare, validity);
  const mixture = mixtureOf(kept);
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
    uncertaintyK: published ? 10 : there.size === 2 ? pureUncertaintyK : calculatedUncertaintyK,
    validity,
    saltMassShare,
  };
}

/** Whether the ionic melt has all of these ions. */
function isCalculable(ions: ReadonlySet<Ion>): boolean {
  return !ions.has('Li') && !ions.has('S');
}

/**
 * What the deposit is judged by: all of its ions, unless lithium or sulphide is among them and the rest of it, or its
 * leading salt alone, is known better and sticks hardly earlier for what is left out.
 */
function judged(shares: ReadonlyMap<Ion, number>): {
  readonly kept: ReadonlyMap<Ion, number>;
  readonly leavesTraces: boolean;
} {
  if (isCalculable(new Set(shares.keys())) || shares.size === 2) return { kept: shares, leavesTraces: false };
  const share = (ion: Ion): number => shares.get(ion) ?? 0;
  const leading = (ions: readonly Ion[]): Ion | undefined => [...ions].sort((a, b) => share(b) - share(a))[0];
  const leadingSalt = [leading(alkaliCations), leading(depositAnions)];
  const choices = [(ion: Ion) => ion !== 'Li' && ion !== 'S', (ion: Ion) => leadingSalt.includes(ion)];
  for (const keeps of choices) {
    const kept = new Map([...shares].filter(([ion]) => keeps(ion)));
    const leftOut = [...shares].reduce((sum, [ion, part]) => sum + (kept.has(ion) ? 0 : part), 0);
    const stays = saltsOfIons(new Set(kept.keys()));
    const loweringK = Math.max(...stays.map((salt) => loweringByOthersK(salt, leftOut, stickyMeltShare)));
    if (stays.length > 0 && loweringK <= calculatedUncertaintyK) return { kept, leavesTraces: true };
  }
  return { kept: shares, leavesTraces: false };
}

const pureUncertaintyK = 2;
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
    const salt = singleSalt(formula.text);
    if (!salt || !(mol > 0)) continue;
    const { cation, anion, equivalents: perMole } = salt;
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

/** A salt alone, from its tables; undefined for a mixture, or without a table of the liquid. */
function singleOf(
  there: ReadonlySet<Ion>,
  saltMassShare: number,
  validity: readonly SaltMeltingValidity[],
): SaltMelting | undefined {
  const [salt, another] = saltsOfIons(there);
  const fusion = salt && !another ? fusionOf(salt) : undefined;
  if (!fusion) return undefined;
  const { meltingK } = fusion;
  return {
    firstMeltingK: meltingK,
    stickyK: meltingK,
    flowingK: meltingK,
    basis: 'pure-salt',
    source: tables,
    uncertaintyK: pureUncertaintyK,
    validity,
    saltMassShare,
  };
}

function lowestPublished(
  there: ReadonlySet<Ion>,
  saltMassShare: number,
  validity: readonly SaltMeltingValidity[],
): SaltMelting {
  const within = published
    .filter(({ ions }) => [...ions].every((ion) => there.has(ion)))
    .sort((a, b) => a.eutectic.celsius - b.eutectic.celsius);
  const [lowest] = within;
  const unknown = { stickyK: null, flowingK: null, saltMassShare };
  if (!lowest)
    return { ...unknown, firstMeltingK: null, basis: 'not-known', source: null, uncertaintyK: null, validity };
  return {
    ...unknown,
    firstMeltingK: lowest.eutectic.celsius + 273.15,
    basis: 'published-eutectic',
    source: lowest.eutectic.source,
    uncertaintyK: 10,
    validity: lowest.ions.size < there.size ? [...validity, 'eutectic-of-some'] : validity,
  };
}

const published = (eutectics as readonly unknown[] as readonly Eutectic[]).map((eutectic) => ({
  eutectic,
  ions: new Set(eutectic.salts.flatMap((text) => ionsOf(text))),
}));

function ionsOf(text: string): readonly Ion[] {
  const salt = singleSalt(text);
  return salt ? [salt.cation, salt.anion] : [];
}
