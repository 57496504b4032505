// Offers at the start of a line: the statements and the kinds of definition with a skeleton, and inside a definition the
// entries of its kind that are not given yet. Skeletons and help come from the kinds' tables and from nowhere else.
// Invariant: what a skeleton writes is a definition its kind reads, once the places in it are filled.
import type { EntryRow } from '../scenario/entries.ts';
import { kinds } from '../scenario/kinds/registry.ts';
import type { Kind } from '../scenario/kinds/kind.ts';
import { withArticle } from '../wording/words.ts';
import { escapedSnippet, type CompletionItem, type Documentation } from './completion-item.ts';
import { entryRows } from './entry-rows.ts';

/** Kinds and statements. */
export function statementItems(start: number): CompletionItem[] {
  return [...kinds.map((kind, index) => kindItem(kind, start, index)), ...STATEMENTS.map((one) => ({ ...one, start }))];
}

function kindItem(kind: Kind, start: number, index: number): CompletionItem {
  const { kind: word, help, evaluated } = kind;
  const later = evaluated
    ? []
    : [{ sentence: 'Not worked out yet: what it says is kept, and its figures follow later.' }];
  return {
    label: word,
    role: 'kind',
    detail: 'definition',
    insert: `${word} `,
    snippet: skeleton(kind),
    start,
    rank: evaluated ? index : 40 + index,
    documentation: { title: word, origin: help, lines: later },
  };
}

function skeleton({ kind, evaluated }: Kind): string {
  const lines: string[] = [];
  let next = 2;
  const place = (text: string): string => `\${${next++}:${escapedSnippet(text)}}`;
  if (evaluated?.lines.includes('portion')) {
    lines.push(`${place('30')} % mass ${place('substance')}`, `rest ${place('substance')}`);
  }
  if (evaluated?.lines.includes('equation')) lines.push(`${place('2 H2(g) + O2(g)')} -> ${place('2 H2O(l)')}`);
  for (const row of entryRows(kind)) if (row.needed) lines.push(`${row.name}: ${place(exampleOf(row) ?? '')}`);
  return `${kind} \${1:name} {\n${lines.map((line) => `  ${line}\n`).join('')}${lines.length > 0 ? '}' : '  $0\n}'}`;
}

const STATEMENTS: readonly Omit<CompletionItem, 'start'>[] = [
  statement('let', 'let ', 'let \${1:name} = \${0:value}', 'Gives a value a name.', 20),
  statement(
    'expect',
    'expect ',
    'expect ',
    'A claim that must hold; one that fails is an error with the value found.',
    21,
  ),
  statement(
    'use',
    'use ',
    'use "\${1:file}.stoke"',
    'Brings in the definitions of another file, by its relative path.',
    22,
  ),
  statement('scenario', 'scenario ', 'scenario "\${1:title}"', 'The title of the file.', 23),
];

function statement(
  label: string,
  insert: string,
  snippet: string,
  help: string,
  rank: number,
): Omit<CompletionItem, 'start'> {
  const documentation = { title: label, origin: help, lines: [] };
  return { label, role: 'keyword', detail: 'statement', insert, snippet, rank, documentation };
}

/** The entries of a kind but those given. Where a colon follows already, only their words are written. */
export function entryItems(
  kind: string,
  given: ReadonlySet<string>,
  start: number,
  hasColon: boolean,
): CompletionItem[] {
  return entryRows(kind)
    .filter(({ name }) => !given.has(name))
    .map((row, index) => ({
      label: row.name,
      role: 'entry',
      detail: row.needed ? 'needed' : row.default ? `otherwise ${row.default.text}` : '',
      insert: hasColon ? row.name : `${row.name}: `,
      ...(hasColon ? {} : { snippet: `${row.name}: ${valueSnippet(row)}` }),
      start,
      continues: row.reader.names ?? false,
      rank: (row.needed ? 0 : 20) + index,
      documentation: entryDocumentation(kind, row),
    }));
}

/** `rest`, and `acknowledge`. */
export function lineItems(takesRest: boolean, start: number): CompletionItem[] {
  const rest: CompletionItem = {
    label: 'rest',
    role: 'keyword',
    detail: 'portion',
    insert: 'rest ',
    continues: true,
    start,
    rank: 10,
    documentation: { title: 'rest', origin: 'This portion takes what the others leave of the whole.', lines: [] },
  };
  const acknowledge: CompletionItem = {
    label: 'acknowledge',
    role: 'keyword',
    detail: 'hazard',
    insert: 'acknowledge hazard/',
    snippet: 'acknowledge hazard/\${1:code}: "\${2:reason}"',
    start,
    rank: 90,
    documentation: {
      title: 'acknowledge',
      origin: 'Says why a hazard found in this definition is accepted. It stays listed, as information.',
      lines: [],
    },
  };
  return takesRest ? [rest, acknowledge] : [acknowledge];
}

function entryDocumentation(
  kind: string,
  { name, help, reader, default: otherwise }: EntryRow<unknown>,
): Documentation {
  return {
    title: `${name}, of ${withArticle(kind)}`,
    origin: help,
    lines: [
      { label: 'Takes', text: reader.takes },
      ...(otherwise ? [{ label: 'Otherwise', text: `${otherwise.text} (${otherwise.source})` }] : []),
    ],
  };
}

function valueSnippet(row: EntryRow<unknown>): string {
  const { words = [], names } = row.reader;
  if (words.length > 0) return `\${1|${words.map((word) => word.replace(/[\\,|$}]/g, '\\$&')).join(',')}|}`;
  const example = names ? null : exampleOf(row);
  // The number alone is a place to fill: its unit is right as it stands.
  const quantity = example === null ? null : /^(-?[\d.]+)( [^,]+)$/.exec(example);
  if (quantity) return `\${1:${quantity[1] ?? ''}}${escapedSnippet(quantity[2] ?? '')}`;
  return example === null ? '$1' : `\${1:${escapedSnippet(example)}}`;
}

/** What the table gives as an example of the entry: `such as `44 MJ/kg``. */
function exampleOf({ reader }: EntryRow<unknown>): string | null {
  return /such as `([^`]+)`/.exec(reader.takes)?.[1] ?? /^`([^`]+)`$/.exec(reader.takes)?.[1] ?? null;
}
