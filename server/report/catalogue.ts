// The catalogue for a terminal: one line a substance, or everything known of a few, each number with its source.
// Shows cards and knows no records. Invariant: no number without its source.

import type { MaterialCard } from '../scenario/scenario.ts';
import { toldText } from '../wording/quantities.ts';
import { counted } from '../wording/words.ts';
import { columns } from './columns.ts';

/** One line a substance: name, formula and phase, other names. */
export function catalogueList(cards: readonly MaterialCard[]): string {
  const rows = cards.map((card) => [card.name, formula(card), card.aliases.join(', ')]);
  return `${[...columns(rows), '', `${counted(cards.length, 'entry', 'entries')}. Give a name to see its numbers and their sources.`].join('\n')}\n`;
}

/** All that is known of each, with sources. */
export function catalogueCards(cards: readonly MaterialCard[]): string {
  return `${cards.map(cardText).join('\n\n')}\n`;
}

function cardText(card: MaterialCard): string {
  const heading = [card.name, formula(card)].filter((part) => part !== '').join('  ');
  const rows = card.properties.map(({ label, quantity, unit, condition, source }) => [
    label,
    [toldText(quantity, unit), condition].filter((part) => part !== '').join(' '),
    source,
  ]);
  return [
    heading,
    ...(card.aliases.length > 0 ? [`  also ${card.aliases.join(', ')}`] : []),
    ...columns(rows).map((line) => `  ${line}`),
  ].join('\n');
}

function formula({ formula: text, phase }: MaterialCard): string {
  if (text === null) return phase ?? '';
  return phase === null || text.endsWith(`(${phase})`) ? text : `${text}(${phase})`;
}
