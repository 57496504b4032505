// Tells a unit word: its English name, its exact definition and who defined it, then the number it stands behind in other
// units. The unit table in core/quantity knows all of it.
import { unitCard } from '../core/quantity/read-unit.ts';
import type { Place } from '../scenario/scenario.ts';
import { quantityText } from '../wording/quantities.ts';
import { siblingLines, type ShownQuantity } from './hover-quantity.ts';
import type { HoverText } from './hover-text.ts';

/** null for a word that is no unit. */
export function hoverUnit(place: Place, word: string, behind: ShownQuantity | null): HoverText | null {
  const card = unitCard(word);
  if (!card) return null;
  const siblings = behind ? siblingLines(behind) : [];
  return {
    place,
    title: `${card.symbol}: ${card.name}`,
    origin: card.definition,
    lines: [
      { label: 'Source', text: card.source },
      ...(behind && siblings.length > 0 ? [{ sentence: quantityText(behind.quantity, behind.unit) }] : []),
      ...siblings,
    ],
  };
}
