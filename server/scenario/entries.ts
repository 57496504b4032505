// Entry tables: what a definition kind takes, one row an entry, and the one reader of definitions against such a table.
// A row says the entry's words, what its value looks like (a reader), whether it must be there, its default with the
// default's source, and its help. Checking, completion, hover help, the printed reference and the snippets come from it.
// Invariant: whatever is written inside a definition is either read by a row or reported; nothing stays silent.

import { sectionProblems } from '../../grammar/section-messages.ts';
import type { BrokenLine, Definition, Entry } from '../../grammar/tree.ts';
import { near, type Context } from './context.ts';
import { portionMeant } from './portion-meant.ts';
import { nearByTrade } from './trade-names.ts';

/** Reads the value of an entry. `undefined` means it could not be read, and that has been said. */
export interface Reader<T> {
  /** What the entry takes, for a message and the reference: "a specific energy, such as `44 MJ/kg`". */
  readonly takes: string;
  /** Words that may be written as they are, for completion. */
  readonly words?: readonly string[];
  /** A unit that fits, for completion and examples. */
  readonly unit?: string;
  /** Units for what else it may hold: a state is a temperature and a pressure. */
  readonly otherUnits?: readonly string[];
  /** Connectives it takes, each with a unit that fits what stands behind it. */
  readonly connectives?: Readonly<Record<string, string>>;
  /** Bare words here name substances or definitions. */
  readonly names?: boolean;
  /** Kinds of the definitions they name; blends and substances where this is not said. */
  readonly kinds?: readonly string[];
  /** Texts in quotes here are paths of files, relative to the file of the definition. */
  readonly files?: boolean;
  /** Bare words here are chemical elements. */
  readonly elements?: boolean;
  read(entry: Entry, context: Context): T | undefined;
}

export interface EntryRow<T> {
  readonly name: string;
  readonly reader: Reader<T>;
  readonly help: string;
  readonly needed?: boolean;
  /** What holds when the entry is not written, and whose word that is. */
  readonly default?: { readonly text: string; readonly source: string };
}

export type EntryTable = Readonly<Record<string, EntryRow<unknown>>>;

/** What was read, by the table's own keys. An entry that is absent or could not be read is not there. */
export type EntriesRead<Table extends EntryTable> = {
  readonly [Key in keyof Table]?: ReadEntry<Table[Key] extends EntryRow<infer T> ? T : never>;
};

export interface ReadEntry<T> {
  readonly value: T;
  readonly entry: Entry;
}

export interface DefinitionRead<Table extends EntryTable> {
  readonly entries: EntriesRead<Table>;
  /** Keys of entries that are written but could not be read: what depends on them is unknown, and silent. */
  readonly broken: ReadonlySet<keyof Table>;
  /** Some line was meant as a portion (said): the portions are not all there. */
  readonly lacksPortion: boolean;
}

/** Reads a definition's entries by its kind's table. Portions and equations, where it takes them, are left to the kind. */
export function readEntries<Table extends EntryTable>(
  definition: Definition,
  table: Table,
  context: Context,
  taken: readonly ('portion' | 'equation')[] = [],
  /** Takes an entry that the table does not know, such as a leg of a duty; false where it is none either. */
  takes: (entry: Entry) => boolean = () => false,
): DefinitionRead<Table> {
  const keyOf = new Map<string, keyof Table>();
  for (const key of Object.keys(table)) keyOf.set(table[key]?.name ?? key, key);
  const firsts = new Map<string, Entry>();
  const read: { [Key in keyof Table]?: ReadEntry<unknown> } = {};
  const broken = new Set<keyof Table>();
  const misspelt = new Set<string>();
  let lacksPortion = false;
  for (const line of definition.lines) {
    if (line.kind !== 'entry') continue;
    const key = keyOf.get(line.words);
    if (key === undefined && takes(line)) continue;
    if (key === undefined) {
      const known = [...keyOf.keys()];
      const meant = nearByTrade(line.words, known);
      const portion = taken.includes('portion') ? portionMeant(line, context) : null;
      if (portion !== null) lacksPortion = true;
      context.report(line.wordsSpan, {
        code: 'name/unknown-entry',
        entry: line.words,
        kind: definition.keyword.text,
        near: meant,
        known,
        ...(portion === null ? {} : { portion: { place: context.place(line.span), text: portion } }),
      });
      for (const name of meant) misspelt.add(name);
      continue;
    }
    context.mean(line.wordsSpan, { kind: 'entry', definitionKind: definition.keyword.text, entry: line.words });
    const first = firsts.get(line.words);
    if (first) {
      context.report(line.wordsSpan, {
        code: 'name/repeated-entry',
        entry: line.words,
        first: context.place(first.wordsSpan),
      });
      continue;
    }
    firsts.set(line.words, line);
    const row = table[key];
    if (!row) continue;
    context.startLine(line.words);
    const value = line.phrases.length === 0 ? undefined : row.reader.read(line, context);
    if (value === undefined) broken.add(key);
    else read[key] = { value, entry: line };
  }
  const unread = unreadEntries(definition, [...keyOf.keys()], context);
  // What a misspelt entry may have meant is written, unless it is there as well.
  for (const name of misspelt) if (!firsts.has(name)) unread.add(name);
  for (const words of unread) {
    const key = keyOf.get(words);
    if (key !== undefined) broken.add(key);
  }
  const missing = Object.values(table).filter(({ name, needed }) => needed && !firsts.has(name) && !unread.has(name));
  if (missing.length > 0) {
    context.report(definition.name?.span ?? definition.header, {
      code: 'name/missing-entry',
      kind: definition.keyword.text,
      name: definition.name?.text ?? '',
      entries: missing.map((row) => row.name),
      all: true,
    });
  }
  // Each value was made by the reader of its own row, which is what the mapped type says; the loop cannot show it.
  return { entries: read as EntriesRead<Table>, broken, lacksPortion };
}

/** The entries whose lines could not be read: they are written, so they are not called missing as well. */
function unreadEntries(definition: Definition, known: readonly string[], context: Context): Set<string> {
  const unread = new Set<string>();
  for (const line of definition.lines) {
    if (line.kind !== 'broken-line') continue;
    const words = line.words ?? withoutColon(line, known, context);
    if (words !== undefined) unread.add(words);
  }
  return unread;
}

/**
 * The entry with whose name a line starts that has no colon, `fuel methanol`. The grammar knows no entries and took it for
 * a portion; where that is all it said of the line, what it said is replaced by the colon that is missing.
 */
function withoutColon({ span }: BrokenLine, known: readonly string[], context: Context): string | undefined {
  const text = context.written(span);
  const longestFirst = [...known].sort((left, right) => right.length - left.length);
  for (const name of longestFirst) {
    const [, written, value] = new RegExp(`^(${name.replaceAll(' ', '[ \\t]+')})[ \\t]+(\\S.*)$`, 's').exec(text) ?? [];
    if (written === undefined || value === undefined) continue;
    if (isOfLonger(name, text, known)) return undefined;
    const { problems } = context.placed.section;
    const isTakenForPortion = problems.some(({ span: of }) => of.start === span.start && of.end <= span.end);
    if (isTakenForPortion) {
      const wordsSpan = { start: span.start, end: span.start + written.length };
      const problem = sectionProblems.colonMissing(wordsSpan, name, value);
      context.report(wordsSpan, { code: problem.code, problem });
    }
    return name;
  }
  return undefined;
}

/** `fuel temprature 20 degC` is a slip of the longer entry's: no fuel is meant. */
function isOfLonger(name: string, text: string, known: readonly string[]): boolean {
  const words = text.split(/[ \t]+/);
  return known.some((longer) => {
    const written = words.slice(0, longer.split(' ').length).join(' ');
    return longer.startsWith(`${name} `) && near(written, [longer]).length > 0;
  });
}

/** Reports lines of a form this kind does not take. */
export function refuseLines(
  definition: Definition,
  taken: readonly ('portion' | 'equation')[],
  context: Context,
): void {
  for (const line of definition.lines) {
    if ((line.kind === 'portion' || line.kind === 'equation') && !taken.includes(line.kind)) {
      context.report(line.span, { code: 'name/unexpected-line', kind: definition.keyword.text, line: line.kind });
    }
  }
}
