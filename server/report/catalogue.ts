// The catalogue for a terminal: one line a substance, or everything known of a few, each number with its source.
// Shows cards and knows no records. Invariant: no number without its source.

import type { CardProperty, MaterialCard } from '../scenario/scenario.ts';
import { figureText } from '../wording/quantities.ts';
import { counted } from '../wording/words.ts';
import { columns } from './columns.ts';

/** One line a substance: name, formula and phase, other names. */
export function catalogueList(cards: readonly MaterialCard[]): string {
  const rows = cards.map((card) => [card.name, formula(card), card.aliases.join(', ')]);
  return `${[...columns(rows), '', `${counted(cards.length, 'entry', 'entries')}. Give a name to see its numbers and their sources.`].join('\n')}\n`;
}

/** All that is known of each; sources stand once below, by number. */
export function catalogueCards(cards: readonly MaterialCard[]): string {
  const sources = new Map<string, number>();
  const texts = cards.map((card, index) => cardText(withoutRepeats(card, cards.slice(0, index)), sources));
  const notes = columns([...sources].map(([source, number]) => [`[${number}]`, source]));
  return `${[...texts, ['Sources', ...notes.map((line) => `  ${line}`)].join('\n')].join('\n\n')}\n`;
}

/** What a substance has in every phase (its melting point, what rules say of it) is told with its first phase only. */
function withoutRepeats(card: MaterialCard, before: readonly MaterialCard[]): MaterialCard {
  const told = before.filter(({ name }) => name === card.name).flatMap(({ properties }) => properties);
  const isTold = ({ id, quantity, source }: CardProperty): boolean =>
    told.some((other) => other.id === id && other.quantity.value === quantity.value && other.source === source);
  return { ...card, properties: card.properties.filter((property) => !isTold(property)) };
}

function cardText(card: MaterialCard, sources: Map<string, number>): string {
  const heading = [card.name, formula(card)].filter((part) => part !== '').join('  ');
  const rows = card.properties.map((property) => {
    const { label, condition, source } = property;
    const number = sources.get(source) ?? sources.size + 1;
    sources.set(source, number);
    return [label, [figureText(property), condition].filter((part) => part !== '').join(' '), `[${number}]`];
  });
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
