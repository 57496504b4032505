// How one portion lies in a tank: plain data, for line results and for the fact about a portion in another phase.

import type { Quantity } from '../core/quantity/quantity.ts';

export type StoredPhase = 'solid' | 'liquid' | 'gas';

/** A portion at the stored temperature, by its melting and boiling points at 1 atm. */
export interface PortionState {
  readonly phase: StoredPhase;
  readonly temperature: Quantity;
  /** Its phase at 25 °C where that is another, and the point that lies between; null where it is the same. */
  readonly changed: { readonly from: StoredPhase; readonly at: Quantity | null } | null;
  /** Of a solid in a liquid: its density less that of the liquid around it, kg/m³. */
  readonly excessDensity: Quantity | null;
}
