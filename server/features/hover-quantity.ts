// Tells a number: the same quantity in the units the trade uses beside the one written, and for a name given by `let` its
// value too. Converts by core/quantity and rounds by wording/; works nothing out. Invariant: the value first shown is in
// the unit that was written.
import { siblingUnits } from '../core/quantity/convert.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { EvaluatedValue, Place } from '../scenario/scenario.ts';
import { formatNumber } from '../wording/numbers.ts';
import { dimensionPhrase, quantityText, handyUnit } from '../wording/quantities.ts';
import { unitForPeople, withUnit } from '../wording/units.ts';
import { capitalised } from '../wording/words.ts';
import type { HoverLine, HoverText } from './hover-text.ts';

/** null for a plain number, of which nothing more is to be said than stands there. */
export function hoverQuantity(place: Place, quantity: Quantity, unit: string): HoverText | null {
  if (unit === '1') return null;
  return {
    place,
    title: quantityText(quantity, unit),
    origin: capitalised(dimensionPhrase(quantity)),
    lines: siblingLines(quantity, unit),
  };
}

export function hoverValue(place: Place, { name, quantity }: EvaluatedValue): HoverText {
  if (!quantity) return { place, title: name, origin: 'A value that could not be worked out', lines: [] };
  const unit = handyUnit(quantity);
  return {
    place,
    title: `${quantityText(quantity, unit)}: ${name}`,
    origin: capitalised(dimensionPhrase(quantity)),
    lines: siblingLines(quantity, unit),
  };
}

/** The quantity in further units, one line each. */
export function siblingLines(quantity: Quantity, unit: string): HoverLine[] {
  if (unit === '1') return []; // 12 is not better known as 1200 %
  return siblingUnits(quantity, unit).map((sibling) => ({
    sentence: `= ${withUnit(formatNumber(sibling.value), unitForPeople(sibling.unit))}`,
  }));
}
