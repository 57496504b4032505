// Looks into the kinds' tables for what stands at a place: an entry's row, and what the words and numbers of its value may
// be. The tables are the only source; a kind without one has no rows. Knows no text and no cursor.
import type { EntryRow, Reader } from '../scenario/entries.ts';
import { kindOf } from '../scenario/kinds/registry.ts';
import { formulaReader } from '../scenario/readers.ts';

/** The rows of a kind's table, in the table's order; none for a kind that is unknown or not evaluated yet. */
export function entryRows(kind: string): readonly EntryRow<unknown>[] {
  return Object.values(kindOf(kind)?.evaluated?.entries ?? {});
}

export function entryRow(kind: string, entry: string): EntryRow<unknown> | undefined {
  return entryRows(kind).find(({ name }) => name === entry);
}

/** What a bare word in an entry's value can be. Several may hold: `biogenic` is listed, and a share may be a name. */
export interface WordsTaken {
  readonly listed: readonly string[];
  /** Substances and definitions. */
  readonly materials: boolean;
  /** Kinds of those definitions. */
  readonly kinds: readonly string[];
  readonly elements: boolean;
  readonly formulas: boolean;
  /** Names of values, figures and functions: anything that comes to a number. */
  readonly numbers: boolean;
}

export function wordsTaken(reader: Reader<unknown>): WordsTaken {
  const elements = reader.elements ?? false;
  return {
    listed: reader.words ?? [],
    materials: reader.names ?? false,
    kinds: reader.kinds ?? ['substance', 'blend'],
    elements,
    formulas: reader === formulaReader,
    numbers: reader.unit !== undefined && !elements,
  };
}
