// Burns a fuel to products somebody names, in place of the ruled slate: solves their amounts from the fuel's atoms.
// Knows no energies. Oxygen is taken from (or given to) the air, so every element but oxygen must close on the named products.
// Invariant: a slate that is returned closes to 1e-9 of the fuel's atoms and has no negative amount.
// Method: exact row reduction of the atom counts, applied to the fuel's amounts.

import { findSubstanceOfFormula } from '../substance/catalogue.ts';
import { formulaTextWithPhase } from '../substance/formula.ts';
import type { Formula } from '../substance/formula.ts';
import { negligibleMolPerKg, slateOfProducts } from './combustion.ts';
import type { Product, Slate } from './combustion.ts';
import { countOfElement, elementsOfFormulas } from './elements.ts';
import { one, reduceRows, zero } from './exact-linear.ts';

/** Why the named products cannot be what the fuel burns to. */
export type GivenProductsFault =
  /** The fuel holds these elements, no product does. */
  | { readonly kind: 'fault'; readonly reason: 'element-without-product'; readonly elements: readonly string[] }
  /** The products leave this many amounts open; fewer products are needed. */
  | { readonly kind: 'fault'; readonly reason: 'not-unique'; readonly open: number }
  /** These products would come out negative. */
  | { readonly kind: 'fault'; readonly reason: 'negative'; readonly species: readonly string[] }
  /** No amounts close all elements. */
  | { readonly kind: 'fault'; readonly reason: 'impossible' };

/**
 * The slate of a fuel (mol of each element per kg) on named products. O2 needs no naming. A product without a phase takes
 * the phase stable at 25 °C, water the vapour. Returns a fault when the amounts do not exist, are negative or not unique.
 */
export function combustionToProducts(
  fuelMolPerKg: ReadonlyMap<string, number>,
  products: readonly Formula[],
): Slate | GivenProductsFault {
  const named = products.filter((formula) => ![...formula.composition.keys()].every((symbol) => symbol === 'O'));
  const fuelElements = [...fuelMolPerKg].filter(([, mol]) => mol > negligibleMolPerKg).map(([symbol]) => symbol);
  const elements = [...new Set([...fuelElements, ...elementsOfFormulas(named)])].filter((symbol) => symbol !== 'O');
  const orphans = elements.filter((element) => named.every((formula) => countOfElement(formula, element).equals(0)));
  if (orphans.length > 0) return { kind: 'fault', reason: 'element-without-product', elements: orphans };

  // Reducing [A | 1] gives x = (right part) · b in the rows that pivot on a product, and 0 = (right part) · b in the others.
  const { rows, pivots } = reduceRows(
    elements.map((element, row) => [
      ...named.map((formula) => countOfElement(formula, element)),
      ...elements.map((_, column) => (column === row ? one : zero)),
    ]),
  );
  const rank = pivots.filter((column) => column < named.length).length;
  if (rank < named.length) return { kind: 'fault', reason: 'not-unique', open: named.length - rank };
  const fuelAmounts = elements.map((element) => fuelMolPerKg.get(element) ?? 0);
  const scale = Math.max(...fuelAmounts, negligibleMolPerKg);
  const values = rows.map((row) =>
    fuelAmounts.reduce((sum, amount, column) => sum + (row[named.length + column] ?? zero).valueOf() * amount, 0),
  );
  if (values.slice(rank).some((value) => Math.abs(value) > closure * scale))
    return { kind: 'fault', reason: 'impossible' };
  const amounts = named.map((formula, index) => ({ formula: withPhase(formula), molPerKg: values[index] ?? 0 }));
  const negative = amounts.filter(({ molPerKg }) => molPerKg < -closure * scale);
  if (negative.length > 0) {
    return { kind: 'fault', reason: 'negative', species: negative.map(({ formula }) => formulaTextWithPhase(formula)) };
  }
  const present = amounts
    .filter(({ molPerKg }) => molPerKg > negligibleMolPerKg)
    .map(({ formula, molPerKg }): Product => ({ formula, species: formulaTextWithPhase(formula), molPerKg }));
  return slateOfProducts(fuelMolPerKg, present, 'given');
}

const closure = 1e-9;

function withPhase(formula: Formula): Formula {
  if (isWater(formula)) return { ...formula, phase: 'g' };
  if (formula.phase !== undefined) return formula;
  const phase = findSubstanceOfFormula(formula)?.phase;
  return phase === undefined ? formula : { ...formula, phase };
}

/** Slates list water as vapour; the higher heating value condenses it. */
function isWater(formula: Formula): boolean {
  return formula.text === 'H2O' && formula.phase !== 'aq';
}
