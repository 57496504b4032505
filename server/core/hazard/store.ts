// What a tank holds and how: portions with their phases, the gas over them, walls and seals, and what stands ready to put
// their fire out. The one form in which the rules see a blend, whoever wrote it.
// Knows no rule. Invariant: a phase is the one by melting and boiling points at 1 atm; an unknown property is null, never a
// guess, and a portion without a hazard record has no family but those its atoms prove.

import { formationEnthalpyOf } from '../balance/formation-enthalpy.ts';
import type { Formula } from '../substance/formula.ts';
import { hazardsOrProven } from './proven-hazards.ts';
import { nothingRecorded } from '../substance/hazards.ts';
import type { ExtinguishingAgent, Hazards, ReactiveFamily } from '../substance/hazards.ts';
import type { Substance } from '../substance/substance.ts';

export type StoredPhase = 'solid' | 'liquid' | 'gas';

/** What a fluid touches beside itself. `steel` is plain steel, which rusts. */
export const contactMaterials = [
  'steel',
  'stainless-steel',
  'cast-iron',
  'aluminium',
  'magnesium',
  'titanium',
  'zinc',
  'galvanised-steel',
  'copper',
  'brass',
  'bronze',
  'silver',
  'lead',
  'mercury',
  'ptfe',
] as const;
export type ContactMaterial = (typeof contactMaterials)[number];

export interface StoredPortion {
  readonly name: string;
  readonly massShare: number;
  /** Null where nothing tells it. */
  readonly phase: StoredPhase | null;
  /** Its phase at 25 °C. */
  readonly usualPhase: StoredPhase | null;
  readonly hazards: Hazards;
  /** Null for mixtures. */
  readonly formula: Formula | null;
  /** mol of each element per kg of the portion. */
  readonly molPerKg: ReadonlyMap<string, number>;
  readonly molarMassKgPerMol: number | null;
  readonly formationEnthalpyJPerKg: number | null;
  readonly heatCapacityJPerKgK: number | null;
  readonly flashPointK: number | null;
  readonly autoignitionK: number | null;
  readonly meltingPointK: number | null;
  readonly boilingPointK: number | null;
  readonly decompositionPointK: number | null;
  readonly flammableLimits: {
    readonly lower: number;
    readonly upper: number | null;
    readonly temperatureK: number | null;
  } | null;
}

/** The gas over a blend: mole shares by formula without phase (`O2`), of a gas without one by its name. */
export interface GasOver {
  readonly moleShares: ReadonlyMap<string, number>;
  /** Nobody said what it is, so it is air. */
  readonly assumed: boolean;
}

export interface Store {
  /** What is meant to bring oxygen is not told that it does. */
  readonly kind: 'tank' | 'oxidant';
  readonly portions: readonly StoredPortion[];
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly blanket: GasOver;
  readonly contact: readonly ContactMaterial[];
  readonly extinguishing: readonly ExtinguishingAgent[];
}

/** Above this (1.2 bar) a boiling point at 1 atm says nothing of a tank. */
const boilingPressurePa = 1.2e5;

const phases: Readonly<Record<string, StoredPhase>> = { cr: 'solid', l: 'liquid', g: 'gas' };

/** A catalogue substance as a portion of a blend kept at a temperature and pressure. */
export function portionOf(
  substance: Substance,
  massShare: number,
  temperatureK: number,
  pressurePa: number,
): StoredPortion {
  const enthalpy = formationEnthalpyOf(substance);
  const limits = substance.flammableLimits;
  const points = {
    meltingPointK: substance.meltingPointK?.value ?? null,
    boilingPointK: substance.boilingPointK?.value ?? null,
  };
  const usualPhase = phases[substance.phase] ?? null;
  return {
    name: substance.name,
    massShare,
    phase: phaseAt(usualPhase, points, temperatureK, pressurePa),
    usualPhase,
    // The atoms of an ion in water are not those of the metal.
    hazards:
      substance.phase === 'aq'
        ? (substance.hazards ?? nothingRecorded)
        : hazardsOrProven(substance.hazards ?? null, substance.molPerKg),
    formula: substance.formula ?? null,
    molPerKg: substance.molPerKg,
    molarMassKgPerMol: substance.molarMassKgPerMol ?? null,
    formationEnthalpyJPerKg: enthalpy.kind === 'known' ? enthalpy.jPerKg.value : null,
    heatCapacityJPerKgK: substance.heatCapacityJPerKgK?.value ?? null,
    flashPointK: substance.flashPointK?.value ?? null,
    autoignitionK: substance.autoignitionK?.value ?? null,
    ...points,
    decompositionPointK: substance.decompositionPointK?.value ?? null,
    flammableLimits:
      limits === undefined
        ? null
        : {
            lower: limits.lower.value,
            upper: limits.upper?.value ?? null,
            temperatureK: limits.temperatureK ?? null,
          },
  };
}

/** The phase at a temperature and pressure of what has `usual` at 25 °C and 1 bar. */
export function phaseAt(
  usual: StoredPhase | null,
  points: { readonly meltingPointK: number | null; readonly boilingPointK: number | null },
  temperatureK: number,
  pressurePa: number,
): StoredPhase | null {
  const { meltingPointK, boilingPointK } = points;
  const isPressed = pressurePa > boilingPressurePa;
  if (usual === null) return null;
  if (boilingPointK !== null && !isPressed && temperatureK > boilingPointK) return 'gas';
  if (meltingPointK !== null && temperatureK < meltingPointK) return 'solid';
  if (usual === 'solid') return meltingPointK === null ? 'solid' : 'liquid';
  return usual === 'gas' && boilingPointK !== null && !isPressed ? 'liquid' : usual;
}

/** The gas over a blend from substances and mole shares; `assumed` air where nothing is given. */
export function gasOver(
  parts: readonly { readonly substance: Substance; readonly moleShare: number }[],
  assumed: boolean,
): GasOver {
  const moleShares = new Map<string, number>();
  const add = (key: string, share: number): void => {
    moleShares.set(key, (moleShares.get(key) ?? 0) + share);
  };
  for (const { substance, moleShare } of parts) {
    if (substance.members === undefined) add(substance.formula?.text ?? substance.name, moleShare);
    else for (const member of substance.members) add(member.formula.text, member.moleShare * moleShare);
  }
  return { moleShares, assumed };
}

export function shareOver(store: Store, formula: string): number {
  return store.blanket.moleShares.get(formula) ?? 0;
}

/** True when it is in one of the families. */
export function isIn(portion: StoredPortion, ...families: readonly ReactiveFamily[]): boolean {
  return families.some((family) => portion.hazards.families.includes(family));
}

/** The only element of a metal or other element; null for compounds and alloys. */
export function soleElement(portion: StoredPortion): string | null {
  const elements = [...portion.molPerKg.keys()];
  return elements.length === 1 ? (elements[0] ?? null) : null;
}

/**
 * A metal in anything else is there as powder: nobody mixes an ingot into a fuel. By itself it counts as a piece. Hydrides
 * and salts of metals are powders wherever they are solid.
 */
export function isPowder(portion: StoredPortion, store: Store): boolean {
  if (portion.phase !== 'solid') return false;
  return store.portions.length > 1 || isIn(portion, 'metal-hydride');
}

/** A melt or an alloy that is liquid by nature. */
export function isMolten(portion: StoredPortion): boolean {
  return portion.phase === 'liquid' && isMetal(portion);
}

export function isMetal(portion: StoredPortion): boolean {
  return isIn(portion, 'alkali-metal', 'alkaline-earth-metal', 'passivated-metal', 'active-metal-powder');
}

/** A solid under enough of a liquid that is no metal: the gas over the tank reaches it slowly. */
export function isCovered(portion: StoredPortion, store: Store): boolean {
  if (portion.phase !== 'solid') return false;
  const liquidShare = liquids(store).reduce((sum, liquid) => sum + (isMetal(liquid) ? 0 : liquid.massShare), 0);
  return liquidShare >= leastCover;
}

/** A tenth of the mass: less wets a powder, but does not stand over it. */
const leastCover = 0.1;

export function liquids(store: Store): readonly StoredPortion[] {
  return store.portions.filter((portion) => portion.phase === 'liquid');
}

/** Nothing liquid or solid: the blend fills its tank and has no ullage. */
export function isGas(store: Store): boolean {
  return store.portions.every((portion) => portion.phase === 'gas');
}

export function holdsWater(store: Store): boolean {
  return store.portions.some((portion) => isIn(portion, 'water'));
}

/** J/(kg K) of the whole; 2000 where a portion's is unknown, as of oils (water has twice that, metals half). */
export function heatCapacityJPerKgK(store: Store): number {
  return store.portions.reduce(
    (sum, { massShare, heatCapacityJPerKgK: own }) => sum + massShare * (own ?? usualHeatCapacityJPerKgK),
    0,
  );
}

const usualHeatCapacityJPerKgK = 2000;
