// What the evaluation has to say about engines, duties and services: one variant a finding code, as in facts.ts, each with
// the numbers and names its message needs and nothing of its wording.

import type { Quantity } from '../core/quantity/quantity.ts';

export type WorkFact =
  /** Two measured points at one load. */
  | { readonly code: 'engine/repeated-load'; readonly load: Quantity }
  /** Measured on a heating value that the engine's own fuel does not have, and no other fuel is named. */
  | {
      readonly code: 'engine/measured-fuel';
      readonly fuel: string;
      readonly measured: Quantity;
      readonly own: Quantity;
    };
