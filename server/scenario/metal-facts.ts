// What the products of an engine do to hot metal, as facts: one variant a finding code, as in facts.ts. For valves of engines
// with pistons, blades of gas turbines and superheaters of boilers alike.

import type { SaltMeltingValidity } from '../core/equilibrium/melts.ts';
import type { Quantity } from '../core/quantity/quantity.ts';

export type MetalFact =
  /** Salts stick to metal of these temperatures; or how they melt together is not known (`sticky` null). */
  | {
      readonly code: 'engine/deposits';
      readonly from: Quantity;
      readonly to: Quantity;
      readonly firstMelting: Quantity | null;
      readonly sticky: Quantity | null;
      readonly uncertaintyK: number | null;
      readonly salts: readonly string[];
      readonly validity: readonly SaltMeltingValidity[];
    }
  /** Sulphate lies on metal inside one of its windows, or vanadium meets metal hot enough for its melts. */
  | {
      readonly code: 'engine/hot-corrosion';
      readonly by: 'sulphate-type-1' | 'sulphate-type-2' | 'vanadate';
      readonly from: Quantity;
      readonly to: Quantity;
      readonly salts: readonly string[];
    }
  /** Carbonate or caustic lies molten on metal. */
  | {
      readonly code: 'engine/basic-attack';
      readonly from: Quantity;
      readonly to: Quantity;
      readonly salts: readonly string[];
      readonly firstMelting: Quantity | null;
    };
