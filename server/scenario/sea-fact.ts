// What the evaluation has to say of seas: variants of `Fact`, for facts.ts alone.

import type { Quantity } from '../core/quantity/quantity.ts';
import type { Place } from './place.ts';

export type SeaFact =
  /** A sea whose constants are extrapolated (`beyond`: those, with their ranges), or for which there are none. */
  | {
      readonly code: 'range/sea-water';
      readonly what: 'salinity' | 'temperature' | 'depth';
      readonly quantity: Quantity;
      readonly beyond: readonly { readonly of: string; readonly low: Quantity; readonly high: Quantity }[];
      readonly refused: { readonly low: Quantity; readonly high: Quantity } | null;
    }
  /** Variables of a carbonate system: `given` do not settle it. */
  | {
      readonly code: 'account/sea-variables';
      readonly why: 'too-few';
      readonly name: string;
      readonly given: readonly string[];
    }
  /** `taken` settle it already; `worked` is what they make of the one that is too many. */
  | {
      readonly code: 'account/sea-variables';
      readonly why: 'too-many';
      readonly taken: readonly string[];
      readonly extra: string;
      /** Its whole line. */
      readonly line: Place;
      readonly written: Quantity;
      readonly worked: Quantity | null;
      readonly unit: string;
    }
  /** No sea water has both. */
  | { readonly code: 'account/sea-state'; readonly why: 'none'; readonly first: string; readonly second: string }
  /** Two have both, of these pH; the first is taken. */
  | {
      readonly code: 'account/sea-state';
      readonly why: 'two';
      readonly first: string;
      readonly second: string;
      readonly ph: number;
      readonly other: number;
    }
  /** A water that does not keep what it is held to; `enough` is the dilution at which it would. */
  | {
      readonly code: 'account/receiving-limit';
      readonly of: 'water' | 'near-field';
      readonly why: 'below' | 'above' | 'change';
      /** The pH, or its change. */
      readonly ph: number;
      readonly limit: number;
      readonly enough: number | null;
    }
  /** Alkali delivered to a sea that would come out as a solid; `enough` is the dilution at which it would not. */
  | {
      readonly code: 'account/precipitation';
      readonly risk: 'careful' | 'runaway' | 'brucite' | 'aragonite';
      readonly ph: number;
      readonly aragoniteSaturation: number;
      readonly enough: number | null;
    };
