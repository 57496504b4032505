// What a sea is to those who deliver to it: its response to one change of alkalinity and dissolved carbon, at its own numbers or
// at those moved for the propagation of uncertainty. Plain data and pure functions that look up no name; made by the sea.
// Invariant: `inputs` and the values handed back are of one order.

import type { Delivery, SeaResponse } from '../core/account/sea/delivery.ts';
import type { Quantity } from '../core/quantity/quantity.ts';

export interface ReceivingWater {
  readonly machinery: 'sea';
  readonly name: string;
  /** Everything it was worked out from, the constants among them. */
  readonly inputs: readonly Quantity[];
  /** mol per kg of sea water; null where no solution is so acid or basic. */
  respond(values: readonly number[], delivery: Delivery): SeaResponse | null;
  /** Carbon held more in the end per mole of alkalinity, well diluted: uptake is that less the carbon delivered. */
  uptakePerAlkalinity(values: readonly number[]): number;
}
