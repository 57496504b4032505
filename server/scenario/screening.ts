// What the hazard rules came to for one definition, also where none fired: how many were looked at, the codes found, of
// which portions nothing is recorded, and what it holds. Plain data for reports and hovers.
// Knows no rule. Invariant: it never says that a thing is harmless; what is not recorded is named.

import type { HazardCode } from '../core/hazard/hazard-codes.ts';
import type { Hazards } from '../core/substance/hazards.ts';

export interface Screening {
  readonly rulesLookedAt: number;
  /** Each code once, the gravest first. */
  readonly found: readonly HazardCode[];
  /** Portions without a hazard on record: rules about families of substances cannot see them. */
  readonly unrecorded: readonly string[];
  /** The substances it holds, each once. */
  readonly substances: readonly { readonly name: string; readonly hazards: Hazards | null }[];
}
