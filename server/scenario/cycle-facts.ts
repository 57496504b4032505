// What the evaluation has to say about engines with pistons and about what their exhaust does to metal: one variant a finding
// code, as in facts.ts, each with the numbers and names its message needs and nothing of its wording.

import type { Quantity } from '../core/quantity/quantity.ts';

export type CycleFact =
  /** Largest over smallest volume of 1 or less. */
  | { readonly code: 'engine/compression-ratio'; readonly ratio: Quantity }
  /** The stated limit of pressure is passed: by burning, or by compression alone. */
  | {
      readonly code: 'engine/firing-pressure';
      readonly by: 'burning' | 'compression';
      readonly peak: Quantity;
      readonly maximum: Quantity;
    }
  /** Residual gas would fill the cylinder, or a state of the cycle lies beyond all data. */
  | { readonly code: 'engine/no-cycle'; readonly why: 'no-fresh-gas' }
  | {
      readonly code: 'engine/no-cycle';
      readonly why: 'no-state';
      readonly state: 'intake' | 'compression' | 'combustion' | 'expansion' | 'blow-down' | 'exhaust' | 'residual';
      readonly side: 'below' | 'above' | null;
      readonly limit: Quantity | null;
    };
