// The catalogue for a terminal: one line a substance, or everything known of a few, each number with its source.
// Shows cards and knows no records. Invariant: no number without its source.

import type { CardProperty, MaterialCard } from '../scenario/scenario.ts';
import { cautionText, familiesText, hazardRows } from '../wording/hazards.ts';
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
  const isHazardTold = before.some(({ name }) => name === card.name);
  const properties = card.properties.filter((property) => !isTold(property));
  return { ...card, properties, hazards: isHazardTold ? null : card.hazards };
}

function cardText(card: MaterialCard, sources: Map<string, number>): string {
  const heading = [card.name, formula(card)].filter((part) => part !== '').join('  ');
  const row = (label: string, text: string, source: string): string[] => {
    const number = sources.get(source) ?? sources.size + 1;
    sources.set(source, number);
    return [label, text, `[${number}]`];
  };
  const rows = card.properties.map((property) => {
    const { label, condition, source } = property;
    return row(label, [figureText(property), condition].filter((part) => part !== '').join(' '), source);
  });
  const { hazards } = card;
  const caution = hazards && cautionText(card.name.replaceAll('_', ' '), hazards);
  // Texts of hazards are long: the source's number stands behind each, not in a column of its own.
  const dangers = (hazards ? hazardRows(hazards) : []).map(({ label, text, source }) => {
    const [first = '', ...others] = row(label, text, source);
    return [first, others.join('  ')];
  });
  return [
    heading,
    ...(card.aliases.length > 0 ? [`  also ${card.aliases.join(', ')}`] : []),
    ...(caution === null ? [] : [`  ${caution}`]),
    ...(hazards && hazards.families.length > 0 ? [`  reacts as ${familiesText(hazards)}`] : []),
    ...columns(rows).map((line) => `  ${line}`),
    ...columns(dangers).map((line) => `  ${line}`),
  ].join('\n');
}

function formula({ formula: text, phase }: MaterialCard): string {
  if (text === null) return phase ?? '';
  return phase === null || text.endsWith(`(${phase})`) ? text : `${text}(${phase})`;
}
