// What the evaluation has to say about gas turbines and steam plants: one variant a finding code, as in facts.ts, each with the
// numbers and names its message needs and nothing of its wording.

import type { Quantity } from '../core/quantity/quantity.ts';
import type { MetalFact } from './metal-facts.ts';

export type PlantFact =
  | MetalFact
  /** Pressure behind over before the compressor of 1 or less. */
  | { readonly code: 'engine/pressure-ratio'; readonly ratio: Quantity }
  /** No air makes the gas so hot (`reaches`, at λ = 1), or it comes hotter than it is to leave (`comes`). */
  | {
      readonly code: 'engine/turbine-inlet';
      readonly why: 'not-hot-enough';
      readonly of: 'inlet' | 'reheat';
      readonly asked: Quantity;
      readonly reaches: Quantity;
    }
  | {
      readonly code: 'engine/turbine-inlet';
      readonly why: 'comes-hotter';
      readonly of: 'inlet' | 'reheat';
      readonly asked: Quantity;
      readonly comes: Quantity;
    }
  /** Condensed products go through the turbine: their share of the gas's mass at its inlet. */
  | { readonly code: 'engine/turbine-solids'; readonly share: Quantity; readonly inlet: Quantity }
  /** A state of the plant lies beyond all data, or it gives no work. */
  | {
      readonly code: 'engine/no-plant';
      readonly why: 'no-state';
      readonly stage: string;
      readonly side: 'below' | 'above' | null;
      readonly limit: Quantity | null;
    }
  | { readonly code: 'engine/no-plant'; readonly why: 'no-work' }
  /** States of water and steam that no plant can have. */
  | { readonly code: 'engine/steam-states'; readonly why: 'pressures' }
  | {
      readonly code: 'engine/steam-states';
      readonly why: 'not-steam';
      readonly asked: Quantity;
      readonly boils: Quantity;
    }
  | {
      readonly code: 'engine/steam-states';
      readonly why: 'reheat';
      readonly asked: Quantity;
      readonly from: Quantity;
    }
  | {
      readonly code: 'engine/steam-states';
      readonly why: 'feedwater';
      readonly asked: Quantity;
      readonly from: Quantity;
      readonly to: Quantity;
    }
  | {
      readonly code: 'engine/steam-states';
      readonly why: 'outside';
      readonly at: 'condenser' | 'pump' | 'boiler' | 'turbine' | 'reheater';
      readonly limit: 'near-critical' | 'pressure' | 'temperature';
    }
  /** Heat that cannot flow from the gas to the water, or not enough of it to cover the walls. */
  | { readonly code: 'engine/boiler-heat'; readonly why: 'none-left' }
  | {
      readonly code: 'engine/boiler-heat';
      readonly why: 'cold-stack';
      readonly stack: Quantity;
      readonly feedwater: Quantity;
    }
  | {
      readonly code: 'engine/boiler-heat';
      readonly why: 'pinch';
      readonly boils: Quantity;
      /** Heat given above boiling over heat needed there. */
      readonly share: Quantity;
    }
  /** Steam at the end of the turbine with more water than blades stand. */
  | { readonly code: 'engine/wet-steam'; readonly wetness: Quantity; readonly usual: Quantity };
