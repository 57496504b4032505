// Every word of one statement that gives or may use a name of the scenario, from the syntax tree, so that names are found
// in definitions too that are not evaluated yet. Knows no bindings: whether such a word stands for anything is asked of
// the scenario. Invariant: a section is looked through once, and again only when its text has changed.
import { expressionsIn } from '../../grammar/walk.ts';
import type { Entry, Expression, Line, Section, Span, Word } from '../../grammar/tree.ts';
import { entryWordNamesThing } from '../scenario/kinds/registry.ts';
import { entryRow } from './entry-rows.ts';

export interface NameUse {
  readonly name: string;
  /** In the section, with the quotes where there are some. */
  readonly span: Span;
  /** The statement gives the name, or speaks of it. */
  readonly role: 'definition' | 'use';
}

/** The names a section gives and speaks of, in the order of the text. */
export function namesInSection(section: Section): readonly NameUse[] {
  const known = kept.get(section);
  if (known) return known;
  const uses = collect(section).sort((left, right) => left.span.start - right.span.start);
  kept.set(section, uses);
  return uses;
}

const kept = new WeakMap<Section, readonly NameUse[]>();

function collect({ statement }: Section): NameUse[] {
  const uses: NameUse[] = [];
  switch (statement.kind) {
    case 'let':
      add(statement.name, 'definition', uses);
      inExpression(statement.value, uses);
      break;
    case 'expect':
      inExpression(statement.claim, uses);
      break;
    case 'definition':
      add(statement.name, 'definition', uses);
      for (const line of statement.lines) inLine(line, statement.keyword.text, statement.name?.text ?? '', uses);
      break;
    case 'title':
    case 'use':
    case 'broken':
  }
  return uses;
}

function inLine(line: Line, kind: string, owner: string, uses: NameUse[]): void {
  switch (line.kind) {
    case 'portion':
      if (line.amount.kind !== 'rest') inExpression(line.amount, uses);
      add(line.substance, 'use', uses);
      break;
    case 'equation':
      for (const { species } of line.left) add(species, 'use', uses);
      for (const { species } of line.right) add(species, 'use', uses);
      break;
    case 'entry':
      inEntry(line, kind, owner, uses);
      break;
    case 'acknowledge':
    case 'broken-line':
  }
}

function inEntry(entry: Entry, kind: string, owner: string, uses: NameUse[]): void {
  for (const { items } of entry.phrases) {
    for (const item of items) {
      if (item.kind === 'connective' || (item.kind === 'word' && !mayBeName(item, entry, kind, owner))) continue;
      inExpression(item, uses);
    }
  }
}

/** A bare word of an entry may as well be a listed word, an element or a formula: its kind's table decides. */
function mayBeName({ text }: Word, { words }: Entry, kind: string, owner: string): boolean {
  // Without a table: in an engine called `diesel`, `cycle: diesel` does not speak of the engine.
  return entryRow(kind, words) ? entryWordNamesThing(kind, words, text) : text !== owner;
}

function inExpression(expression: Expression | undefined, uses: NameUse[]): void {
  for (const item of expressionsIn(expression)) {
    if (item.kind === 'word') add(item, 'use', uses);
    else if (item.kind === 'reference') {
      add(item.row, 'use', uses);
      add(item.name, 'use', uses);
    } else if (item.kind === 'membership') {
      add(item.substance, 'use', uses);
      add(item.name, 'use', uses);
    }
  }
}

/** A word with a phase attached is a formula, whatever else is called so. */
function add(word: Word | undefined, role: NameUse['role'], uses: NameUse[]): void {
  if (word && word.phase === undefined && word.text !== '') uses.push({ name: word.text, span: word.span, role });
}
