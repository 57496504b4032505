// Tells a unit word: its English name, its exact definition and who defined it, then the number it stands behind in other
// units. The unit table in core/quantity knows all of it.
import { unitCard } from '../core/quantity/read-unit.ts';
import type { PlacedMeaning } from '../scenario/scenario.ts';
import { quantityText } from '../wording/quantities.ts';
import { siblingLines } from './hover-quantity.ts';
import type { HoverText } from './hover-text.ts';
import type { UnitAt } from './unit-at.ts';

export function hoverUnit({ place, word }: UnitAt, around: PlacedMeaning | null): HoverText | null {
  const card = unitCard(word);
  if (!card) return null;
  const written = around?.meaning.kind === 'quantity' ? around.meaning : null;
  const siblings = written ? siblingLines(written.quantity, written.unit) : [];
  return {
    place,
    title: `${card.symbol}: ${card.name}`,
    origin: card.definition,
    lines: [
      { label: 'Source', text: card.source },
      ...(written && siblings.length > 0 ? [{ sentence: quantityText(written.quantity, written.unit) }] : []),
      ...siblings,
    ],
  };
}
