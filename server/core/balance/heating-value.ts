// Lower and higher heating values of a fuel at 25 °C, and the formation enthalpy behind a heating value.
// Rests on a combustion slate and on formation enthalpies of fuel and products; atomic weights are conventional.
// Invariant: higher less lower is the heat of condensation of the slate's water. Values are per kg of fuel, positive when
// heat is released; O2 from the air counts zero; there is no heat of mixing.

import type { Formula } from '../substance/formula.ts';
import type { SourceRecord } from '../substance/record.ts';
import { completeCombustion } from './combustion.ts';
import type { Slate, SlateFault, SlateRule } from './combustion.ts';
import { enthalpyBehindHeatingValue, enthalpyOfProducts } from './formation-enthalpy.ts';
import type { EnergyFault } from './formation-enthalpy.ts';
import { combustionToProducts } from './given-products.ts';
import type { GivenProductsFault } from './given-products.ts';

export interface HeatingValue {
  readonly kind: 'heating-value';
  /** J/kg, water stays vapour. */
  readonly lowerJPerKg: number;
  /** J/kg, water condenses. */
  readonly higherJPerKg: number;
  readonly slate: Slate;
  /** Sources of the enthalpies of the products, each once. */
  readonly sources: readonly SourceRecord[];
}

/** Lets a slate be chosen: a rule, or named products that override it. */
export type SlateChoice = SlateRule | { readonly products: readonly Formula[] };

/**
 * Heating values of a fuel by its elements (mol per kg) and its formation enthalpy (J/kg). `sources` are those of the
 * products. Returns a fault when an element has no ruled product, or a product no data.
 */
export function heatingValueOfFuel(
  fuelMolPerKg: ReadonlyMap<string, number>,
  fuelEnthalpyJPerKg: number,
  choice: SlateChoice = 'as-ruled',
): HeatingValue | EnergyFault {
  const slate = slateOfChoice(fuelMolPerKg, choice);
  return slate.kind === 'fault' ? slate : heatingValueOnSlate(slate, fuelEnthalpyJPerKg);
}

/** The same on a slate that is at hand. Returns a fault when a product has no data. */
export function heatingValueOnSlate(slate: Slate, fuelEnthalpyJPerKg: number): HeatingValue | EnergyFault {
  const products = enthalpyOfProducts(slate);
  if (products.kind === 'fault') return products;
  return {
    kind: 'heating-value',
    lowerJPerKg: released(fuelEnthalpyJPerKg, products.jPerKg),
    higherJPerKg: released(fuelEnthalpyJPerKg, products.jPerKg - products.condensationJPerKg),
    slate,
    sources: products.sources,
  };
}

/** Fuel less products; nothing where they differ by floating-point rounding only, as water and its own vapour condensed. */
function released(fuelJPerKg: number, productsJPerKg: number): number {
  const difference = fuelJPerKg - productsJPerKg;
  return Math.abs(difference) > roundingOfDoubles * Math.abs(fuelJPerKg) ? difference : 0;
}

/** A few times the spacing of doubles, relative. */
const roundingOfDoubles = 1e-14;

/**
 * The formation enthalpy (J/kg) that gives a fuel of these elements (mol per kg) this heating value (J/kg) on a slate.
 * Faults as for `heatingValueOfFuel`.
 */
export function formationEnthalpyBehind(
  fuelMolPerKg: ReadonlyMap<string, number>,
  basis: 'lower' | 'higher',
  heatingValueJPerKg: number,
  choice: SlateChoice = 'as-ruled',
): { readonly kind: 'formation-enthalpy'; readonly jPerKg: number; readonly slate: Slate } | EnergyFault {
  const slate = slateOfChoice(fuelMolPerKg, choice);
  if (slate.kind === 'fault') return slate;
  const jPerKg = enthalpyBehindHeatingValue(slate, basis, heatingValueJPerKg);
  return typeof jPerKg === 'number' ? { kind: 'formation-enthalpy', jPerKg, slate } : jPerKg;
}

/** The slate of a fuel by its elements (mol per kg); a fault where the rule or the named products give none. */
export function slateOfChoice(
  fuelMolPerKg: ReadonlyMap<string, number>,
  choice: SlateChoice,
): Slate | SlateFault | GivenProductsFault {
  return typeof choice === 'string'
    ? completeCombustion(fuelMolPerKg, choice)
    : combustionToProducts(fuelMolPerKg, choice.products);
}
