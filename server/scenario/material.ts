// A material: whatever can be a portion, a reactant or a fuel, be it from the catalogue, defined in the scenario, or a
// blend of others. Per kilogram, as quantities with their uncertainty, so that one computation serves all three.
// Plain data; how it is come by is in materials.ts (catalogue, formula) and in the kinds (substance, blend).

import type { Parts } from '../core/quantity/parts.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Formula } from '../core/substance/formula.ts';
import type { HeatCapacity } from '../core/substance/substance.ts';
import type { MaterialCard } from './scenario.ts';
import type { AssumptionId } from './working.ts';

export interface Material {
  /** The name it is known by: the catalogue's, the definition's, or the formula as written. */
  readonly name: string;
  readonly origin: 'catalogue' | 'scenario' | 'formula';
  /** null for a mixture without one. */
  readonly formula: Formula | null;
  readonly phase: string | null;
  /** Mole share of each species by its formula with phase (`O2(g)`); null where the molecules are not known. */
  readonly species: ReadonlyMap<string, number> | null;
  /** mol of each element per kg. */
  readonly elements: ReadonlyMap<string, Quantity>;
  /** kg/mol */
  readonly molarMass: Quantity | null;
  /** J/kg at 298.15 K from the elements. */
  readonly formationEnthalpy: Quantity | null;
  /** Whether its enthalpy of formation is given or worked back from a heating value. */
  readonly energyFrom: 'formation-enthalpy' | 'heating-value';
  /** J/(mol K) at 298.15 K and 1 bar. */
  readonly entropy: Quantity | null;
  /** Per kilogram, with the range it is good for. */
  readonly heatCapacity: HeatCapacity | null;
  /** What makes it uncertain, as shares of itself; absent where it is certain. */
  readonly heatCapacityParts?: Parts;
  /** kg/m³ */
  readonly density: Quantity | null;
  /** At 1 atm. */
  readonly meltingPoint: Quantity | null;
  readonly boilingPoint: Quantity | null;
  /** Biogenic share of the carbon, 0 to 1. */
  readonly biogenicShare: Quantity;
  /** Products of complete combustion where a definition names them; otherwise the rule's. */
  readonly products: readonly Formula[] | null;
  /** A blend's portions. */
  readonly portions: readonly PortionShare[] | null;
  readonly assumptions: readonly AssumptionId[];
  /** Where its numbers come from, each once. */
  readonly sources: readonly string[];
  readonly card: MaterialCard;
  /** Names of data that are not known, in words, for "missing …": empty when all are there. */
  readonly missing: ReadonlyMap<MissingProperty, readonly string[]>;
}

export type MissingProperty = 'molarMass' | 'formationEnthalpy' | 'density';

/** A blend's portion with its shares on each basis; null where a property that the basis takes is not known. */
export interface PortionShare {
  readonly name: string;
  readonly material: Material;
  readonly mass: Quantity;
  readonly mole: Quantity | null;
  readonly volume: Quantity | null;
}

/** In so many blends in blends in blends the parts of uncertainty may stand unread: reading one reads those below it. */
export const deepestUnread = 32;
