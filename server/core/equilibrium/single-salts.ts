// The alkali salts a deposit is judged by, each with its ions, its melting point and its enthalpy of fusion from the tables;
// and how far a little of another salt lowers where one of them is partly molten.
// Knows no mixtures beyond that. Invariant: a salt without a table of its liquid has no melting point, never a guessed one.
// Source: the phases' own records (M. W. Chase Jr., NIST-JANAF Thermochemical Tables, 4th ed., 1998); the lowering is the
// law of dilute solutions (van 't Hoff) for a melt in which all of the other salt stays.

import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { phaseOfId, propertiesOfPhase, stableCondensedPhase } from '../substance/phases.ts';
import { saltAnions } from './salt-solutions.ts';

export const alkaliCations = ['Na', 'K', 'Li'] as const;
export type AlkaliCation = (typeof alkaliCations)[number];
/** The last only with published melting: sulphides are no part of the ionic melt. */
export const depositAnions = [...saltAnions, 'S'] as const;
export type DepositAnion = (typeof depositAnions)[number];
export type SaltIon = AlkaliCation | DepositAnion;

export interface SingleSalt {
  /** As it is written: `Na2CO3`. */
  readonly text: string;
  readonly cation: AlkaliCation;
  readonly anion: DepositAnion;
  /** Equivalents a mole, which is also its cations a mole. */
  readonly equivalents: number;
}

const divalent: ReadonlySet<DepositAnion> = new Set(['CO3', 'SO4', 'S']);

const salts: readonly SingleSalt[] = alkaliCations.flatMap((cation) =>
  depositAnions.map((anion) => {
    const isDivalent = divalent.has(anion);
    return { text: `${cation}${isDivalent ? '2' : ''}${anion}`, cation, anion, equivalents: isDivalent ? 2 : 1 };
  }),
);
const byText = new Map(salts.map((salt) => [salt.text, salt]));

/** The salt of a formula as it is written; undefined for anything else. */
export function singleSalt(text: string): SingleSalt | undefined {
  return byText.get(text);
}

/** All salts that ions can pair to. */
export function saltsOfIons(ions: ReadonlySet<SaltIon>): readonly SingleSalt[] {
  return salts.filter(({ cation, anion }) => ions.has(cation) && ions.has(anion));
}

export interface Fusion {
  readonly meltingK: number;
  readonly enthalpyJPerMol: number;
}

/** Melting point and enthalpy of fusion; undefined where the tables have no liquid of the salt, or no crystal below it. */
export function fusionOf({ text }: SingleSalt): Fusion | undefined {
  const liquid = phaseOfId(`${text}(l)`);
  const meltingK = liquid?.stableK[0]?.[0];
  if (!liquid || meltingK === undefined) return undefined;
  const crystal = stableCondensedPhase(liquid.formula, meltingK - 0.01);
  const molten = propertiesOfPhase(liquid, meltingK);
  if (crystal.kind !== 'phase' || crystal.phase === liquid || !molten) return undefined;
  return { meltingK, enthalpyJPerMol: molten.enthalpyJPerMol - crystal.properties.enthalpyJPerMol };
}

/**
 * How much lower, at most, a salt is molten to a share, with other ions of a share of the charge beside it, K. All of them
 * are taken to be in the melt, and each equivalent of them counts as an ion of its own: the most that they can do while
 * they are few. Infinite where the salt's fusion is not known.
 */
export function loweringByOthersK(salt: SingleSalt, shareOfOthers: number, moltenShare: number): number {
  const fusion = fusionOf(salt);
  if (!fusion) return Infinity;
  const ionsPerMole = (salt.equivalents * shareOfOthers) / moltenShare;
  return (molarGasConstantJPerMolK * fusion.meltingK ** 2 * ionsPerMole) / fusion.enthalpyJPerMol;
}
