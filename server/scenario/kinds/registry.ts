// All definition kinds by their word. The words themselves are the grammar's; a test holds the two lists against each
// other. A kind that is not evaluated yet still has its help, so that hovers and completion can speak of it.

import { blend } from './blend.ts';
import { burn } from './burn.ts';
import { compare } from './compare.ts';
import { duty } from './duty.ts';
import { engine } from './engine.ts';
import type { Kind } from './kind.ts';
import { oxidant } from './oxidant.ts';
import { reaction } from './reaction.ts';
import { sea } from './sea.ts';
import { service } from './service.ts';
import { substance } from './substance.ts';

export const kinds: readonly Kind[] = [
  substance,
  blend,
  oxidant,
  reaction,
  burn,
  engine,
  duty,
  service,
  later('supply', 'How a substance is made: electricity, heat, emissions, price and by-products.'),
  sea,
  later('space', 'An enclosed volume with its air changes, and what a leak, spill or boil-off does in it.'),
  later('site', 'Who and what is near a release, the wind and the stack.'),
  later('account', 'The whole: stack, supply, sea, regulation, money and people.'),
  later('fleet', 'A service many times over, year by year.'),
  later('sweep', 'One to three quantities varied over points, and the figures shown for each.'),
  later('find', 'A quantity adjusted until a claim holds.'),
  compare,
];

const byWord: ReadonlyMap<string, Kind> = new Map(kinds.map((kind) => [kind.kind, kind]));

/** The kind of that word, if there is one. */
export function kindOf(word: string): Kind | undefined {
  return byWord.get(word);
}

/** The help of an entry of a kind, for a hover: what it is, what it takes, its default. */
export function entryHelp(kind: string, entry: string): EntryHelp | undefined {
  const rows = Object.values(byWord.get(kind)?.evaluated?.entries ?? {});
  const row = rows.find((candidate) => candidate.name === entry);
  return row && { help: row.help, takes: row.reader.takes, default: row.default ?? null };
}

export interface EntryHelp {
  readonly help: string;
  readonly takes: string;
  readonly default: { readonly text: string; readonly source: string } | null;
}

/**
 * Whether a bare word in an entry of this kind may name a thing: a substance, a definition, or a value where a number is
 * read. Not so a listed word, an element, or a word of an entry that nobody reads: `cycle: diesel` in an engine called
 * `diesel` is no ring.
 */
export function entryWordNamesThing(kind: string, entry: string, word: string): boolean {
  const evaluated = byWord.get(kind)?.evaluated;
  const rows = Object.values(evaluated?.entries ?? {});
  const reader = rows.find((candidate) => candidate.name === entry)?.reader ?? evaluated?.legs;
  if (!reader || reader.elements || reader.words?.includes(word)) return false;
  return (reader.names ?? false) || reader.unit !== undefined;
}

/** Whether texts in quotes in an entry are paths of files. */
export function entryNamesFile(kind: string, entry: string): boolean {
  const rows = Object.values(byWord.get(kind)?.evaluated?.entries ?? {});
  return rows.find(({ name }) => name === entry)?.reader.files ?? false;
}

function later(kind: string, help: string): Kind {
  return { kind, help, evaluated: null };
}
