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
    }
  /** The end gas lights before the flame reaches it, by the integral over its ignition delay. */
  | {
      readonly code: 'engine/knock';
      readonly integral: number;
      readonly endGas: Quantity;
      readonly octaneNumber: Quantity;
    }
  /** The charge does not light in time, or at all. */
  | {
      readonly code: 'engine/misfire';
      readonly why: 'delay';
      readonly delay: Quantity;
      readonly degrees: number;
      readonly temperature: Quantity;
    }
  | {
      readonly code: 'engine/misfire';
      readonly why: 'autoignition';
      readonly temperature: Quantity;
      readonly autoignition: Quantity;
    }
  | {
      readonly code: 'engine/misfire';
      readonly why: 'lean';
      readonly share: Quantity;
      readonly limit: Quantity;
      readonly temperature: Quantity;
    }
  /** No fuel of the standard for marine fuels at all, by its elements. */
  | {
      readonly code: 'engine/no-standard-fuel';
      readonly fuel: string;
      readonly why: readonly ('metal' | 'oxygenate' | 'nitrogen')[];
    };
