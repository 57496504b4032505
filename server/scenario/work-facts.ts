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
    }
  /** A leg asks an engine for more than its rating. */
  | {
      readonly code: 'engine/overload';
      readonly leg: string;
      readonly engine: string;
      readonly power: Quantity;
      readonly rating: Quantity;
    }
  /** A leg runs an engine at a load at which its consumption is not known; loads are shares of the rating. */
  | {
      readonly code: 'engine/measured-range';
      readonly leg: string;
      readonly engine: string;
      readonly load: number;
      readonly fromLoad: number;
      readonly toLoad: number;
    }
  /** An engine idles, and what it takes then is not known. */
  | { readonly code: 'engine/no-idle'; readonly leg: string; readonly engine: string }
  /** A leg goes faster than the service speed. */
  | { readonly code: 'duty/speed'; readonly leg: string; readonly speed: Quantity; readonly service: Quantity }
  /** A leg whose name is one edit from an entry. */
  | { readonly code: 'duty/leg-name'; readonly leg: string; readonly near: readonly string[] }
  /** An entry that nothing in the duty uses. */
  | { readonly code: 'duty/unused'; readonly entry: string }
  /** A duty that is a test cycle. */
  | { readonly code: 'duty/test-cycle'; readonly cycle: string }
  /** The fuel to be carried does not fit; `leg` is the first that would be without. */
  | {
      readonly code: 'service/tank';
      readonly fuel: string;
      readonly needed: Quantity;
      readonly capacity: Quantity;
      readonly leg: string | null;
    };
