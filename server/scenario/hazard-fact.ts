// A hazard as the evaluation says it: the rule's words, who meets whom, the numbers, and whether its author has
// acknowledged it. Plain data, so that findings are made from it alone.

import type { HazardCode, HazardSeverity } from '../core/hazard/hazard-codes.ts';
import type { HazardNumbers } from '../core/hazard/rule.ts';
import type { Place } from './place.ts';

export { hazardCodes, isHazardCode } from '../core/hazard/hazard-codes.ts';
/** Every rule's words, for the reference. */
export { allRules as hazardRuleWords } from '../core/hazard/find-hazards.ts';
export type { HazardCode } from '../core/hazard/hazard-codes.ts';

export interface HazardFact {
  readonly code: HazardCode;
  readonly severity: HazardSeverity;
  readonly acknowledged: boolean;
  /** The blend, and the portion of it that is the cause; null where the whole is. */
  readonly blend: string;
  readonly portion: string | null;
  readonly partner: HazardPartner | null;
  /** Where the partner stands, for related information; null where it stands nowhere. */
  readonly partnerPlace: Place | null;
  readonly happens: string;
  readonly mend: string;
  readonly source: string;
  readonly numbers: HazardNumbers;
  /** Edits that would mend it, the best first. */
  readonly mends: readonly {
    readonly title: string;
    /** The only mend of its kind: an editor may apply it without asking which. */
    readonly preferred: boolean;
    readonly place: Place;
    readonly newText: string;
  }[];
}

export type HazardPartner =
  | { readonly kind: 'portion'; readonly name: string }
  /** `assumed`: nobody said what is over the blend, so it is air. */
  | { readonly kind: 'gas'; readonly formula: string; readonly moleShare: number; readonly assumed: boolean }
  | { readonly kind: 'contact'; readonly material: string }
  | { readonly kind: 'agent'; readonly agent: string };
