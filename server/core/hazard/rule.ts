// What a hazard rule is and what it answers: the code it belongs to, what happens, what mends it, its source; where in a
// store it applies, how badly, with which partner and with which numbers.
// Knows no single rule. Invariant: numbers are per kilogram of the whole blend, in SI, and null where a datum is missing;
// a missing number never silences a rule.

import type { HazardCode, HazardSeverity } from './hazard-codes.ts';
import type { ContactMaterial, Store } from './store.ts';
import type { ExtinguishingAgent } from '../substance/hazards.ts';

/** What a portion meets. A gas is one over the blend, by formula. */
export type Partner =
  | { readonly kind: 'portion'; readonly index: number }
  | { readonly kind: 'gas'; readonly formula: string; readonly moleShare: number }
  | { readonly kind: 'contact'; readonly material: ContactMaterial }
  | { readonly kind: 'agent'; readonly agent: ExtinguishingAgent };

export interface HazardNumbers {
  /** J given off per kg of the blend when all that can react has. */
  readonly heatJPerKg?: number;
  /** What that heat would warm the blend by if none of it went elsewhere, K. */
  readonly riseK?: number;
  /** mol of each gas made per kg of the blend. */
  readonly gasMolPerKg?: Readonly<Record<string, number>>;
  /** The estimated flash point of the blend, K. */
  readonly flashPointK?: number;
  /** Vapour over the lower limit of its mixture: 1 is the limit. */
  readonly overLowerLimit?: number;
  /** mol of vapour per mol of the gas over the blend. */
  readonly vapourShare?: number;
  readonly oxygenShare?: number;
  readonly limitingOxygenShare?: number;
  /** A temperature that the stored one is held against, K. */
  readonly limitK?: number;
}

export interface Hit {
  readonly severity: HazardSeverity;
  /** Index of the portion that causes it; null where the blend as a whole does. */
  readonly portion: number | null;
  readonly partner: Partner | null;
  readonly numbers: HazardNumbers;
}

export interface HazardRule {
  /** Unique: `metal-with-water`. */
  readonly id: string;
  readonly code: HazardCode;
  /** In a sentence without names: the finding adds who meets whom. */
  readonly happens: string;
  readonly mend: string;
  readonly source: string;
  readonly find: (store: Store) => readonly Hit[];
}

/** m³ of gas per mol at 25 °C and 1 bar, the state in which amounts of gas are told. */
export const molarVolumeM3PerMol = 0.02478957;

/** Sources the rules rest on, short as they are shown; all but common practice are recalled from memory. */
export const ruleSources = {
  /** Urben (ed.), Bretherick’s Handbook of Reactive Chemical Hazards, 8th ed. (2017). */
  bretherick: 'Urben 2017, Bretherick’s Handbook',
  /** Standard for Combustible Metals. */
  nfpa484: 'NFPA 484',
  solas: 'SOLAS II-2/4.2',
  /** MSC.370(93), chapters 6, 9 and 17. */
  igc: 'IGC Code',
  /** 9th revised edition (2021). */
  ghs: 'UN GHS',
  practice: 'common practice',
  /** Chemical Process Safety, 3rd ed., chapter 6. */
  crowl: 'Crowl and Louvar 2011',
} as const;
