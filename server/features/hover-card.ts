// Tells what is known of a substance or blend: its formula and phase first, then each property with its condition and
// source. Shows the card as it is handed over. Invariant: no property without its unit and where it comes from.
import type { MaterialCard, Place } from '../scenario/scenario.ts';
import { cautionText } from '../wording/hazards.ts';
import { listed } from '../wording/words.ts';
import { figureText } from '../wording/quantities.ts';
import { shortened, type HoverLine, type HoverText } from './hover-text.ts';

export function hoverCard(place: Place, card: MaterialCard): HoverText {
  return { place, title: cardTitle(card), origin: cardOrigin(card), lines: cardLines(card) };
}

/** `sodium: Na, solid`. */
export function cardTitle({ name, formula, phase }: MaterialCard): string {
  const state = phase === null ? null : (PHASES[phase] ?? phase);
  const nature = [formula === name ? null : formula, state].filter((part) => part !== null && part !== '');
  return nature.length > 0 ? `${name}: ${nature.join(', ')}` : name;
}

/** The caution first, so that no length of a card can cut it off. */
export function cardLines({ name, hazards, properties }: MaterialCard): HoverLine[] {
  const caution = hazards && cautionText(name.replaceAll('_', ' '), hazards);
  const known = properties.map((property) => {
    const { label, condition, source } = property;
    const value = condition === '' ? figureText(property) : `${figureText(property)} ${condition}`;
    return { label, text: source === '' ? value : `${value} (${authorAndYear(source)})` };
  });
  return caution === null ? known : [{ sentence: caution }, ...known];
}

/** A hover has room for who and when; the whole source is in the catalogue and in a figure's working. */
function authorAndYear(source: string): string {
  const [, author, year] = /^(.{1,60}?) \((\d{4})\)/.exec(source) ?? [];
  return author && year ? `${author}, ${year}` : shortened(source, 60);
}

function cardOrigin({ origin, aliases }: MaterialCard): string {
  const from = ORIGINS[origin];
  return aliases.length > 0 ? `${from}; also ${listed(aliases.slice(0, 4))}` : from;
}

const ORIGINS: Readonly<Record<MaterialCard['origin'], string>> = {
  catalogue: 'Catalogue substance',
  scenario: 'Defined in this scenario',
  formula: 'Known by its formula alone',
};

/** The phases of published tables in words. */
const PHASES: Readonly<Record<string, string>> = { g: 'gas', l: 'liquid', cr: 'solid', aq: 'dissolved in water' };
