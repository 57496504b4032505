// Whether a heating value given for a substance can be one at all: hydrogen sets free more per kilogram than anything
// else that burns, and nothing that burns takes up more than the evaporation of its water. It doubts and refuses nothing:
// the value is used as written. Invariant: no value of a real fuel or of a wet waste is doubted.
// Source: enthalpies of formation of water's phases in M. W. Chase (1998), over the molar mass of hydrogen.

import type { Entry } from '../../grammar/tree.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import type { Context } from './context.ts';

const hydrogenJPerKg = { lower: 120.0e6, higher: 141.8e6 } as const;
/** A measurement may err by this much. */
const margin = 1.01;
/** Evaporating a kilogram of water takes 2.4 MJ. */
const leastJPerKg = -3e6;

/** Says so, at the value, where the entry's quantity (J/kg) is no heating value of anything. */
export function checkHeatingValue(
  entry: Entry,
  { value }: Quantity,
  basis: keyof typeof hydrogenJPerKg,
  context: Context,
): void {
  const mostJPerKg = hydrogenJPerKg[basis];
  if (value >= leastJPerKg && value <= margin * mostJPerKg) return;
  const span = entry.phrases[0]?.span ?? entry.span;
  context.report(span, {
    code: 'range/heating-value',
    text: context.written(span),
    why: value < 0 ? 'negative' : 'too-large',
    basis,
    most: quantityOf(mostJPerKg, knownUnit('J/kg').dimension),
  });
}
