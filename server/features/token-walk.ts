// The words of one statement whose colour depends on what they mean: kinds, entries, names, figures, units, functions, listed
// words, codes. Reads the syntax tree and the kinds' tables; what a name stands for is left open, because that changes
// without the statement. Invariant: a section is walked once, and again only when its text has changed; the words come in
// the order of the text and do not overlap.
import { expressionsIn } from '../../grammar/walk.ts';
import type { Entry, Expression, Line, Section, Span, UnitWords, Word } from '../../grammar/tree.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';
import { functions } from '../scenario/functions.ts';
import { kindOf } from '../scenario/kinds/registry.ts';
import { entryRow, wordsTaken } from './entry-rows.ts';

export type WalkedWord =
  | {
      readonly span: Span;
      readonly role: 'kind' | 'entry' | 'figure' | 'unit' | 'function' | 'word' | 'code';
    }
  | { readonly span: Span; readonly role: 'name'; readonly word: Word; readonly isGiven: boolean };

export function walkedWords(section: Section): readonly WalkedWord[] {
  const known = kept.get(section);
  if (known) return known;
  const words = walk(section).sort((left, right) => left.span.start - right.span.start);
  const apart = words.filter(({ span }, index) => span.start >= (words[index - 1]?.span.end ?? 0));
  kept.set(section, apart);
  return apart;
}

const kept = new WeakMap<Section, readonly WalkedWord[]>();

function walk({ statement }: Section): WalkedWord[] {
  const words: WalkedWord[] = [];
  switch (statement.kind) {
    case 'let':
      addName(statement.name, words, true);
      inExpression(statement.value, words);
      break;
    case 'expect':
      inExpression(statement.claim, words);
      break;
    case 'definition': {
      const { keyword, name, lines } = statement;
      if (kindOf(keyword.text)) words.push({ span: keyword.span, role: 'kind' });
      addName(name, words, true);
      for (const line of lines) inLine(line, keyword.text, words);
      break;
    }
    case 'title':
    case 'use':
    case 'broken':
  }
  return words;
}

function inLine(line: Line, kind: string, words: WalkedWord[]): void {
  switch (line.kind) {
    case 'portion':
      if (line.amount.kind !== 'rest') inExpression(line.amount, words);
      addName(line.substance, words);
      break;
    case 'equation':
      for (const { species } of [...line.left, ...line.right]) addName(species, words);
      break;
    case 'entry':
      inEntry(line, kind, words);
      break;
    case 'acknowledge':
      if (line.code) words.push({ span: line.code.span, role: 'code' });
      break;
    case 'broken-line':
  }
}

function inEntry(entry: Entry, kind: string, words: WalkedWord[]): void {
  const row = entryRow(kind, entry.words);
  const taken = row && wordsTaken(row.reader);
  // Where there is no table the grammar's colours stand; an entry that its table lacks has none.
  if (row) words.push({ span: entry.wordsSpan, role: 'entry' });
  for (const { items } of entry.phrases) {
    for (const item of items) {
      if (item.kind === 'connective') continue;
      if (item.kind !== 'word') inExpression(item, words);
      else if (taken?.listed.includes(item.text)) words.push({ span: item.span, role: 'word' });
      // Elements have the grammar's colour: `C` is not the substance of that formula here.
      else if (!taken?.elements) addName(item, words);
    }
  }
}

function inExpression(expression: Expression | undefined, words: WalkedWord[]): void {
  for (const item of expressionsIn(expression)) {
    switch (item.kind) {
      case 'quantity':
        addUnit(item.unit, words);
        addUnit(item.uncertainty?.unit, words);
        break;
      case 'lone-unit':
        addUnit(item.unit, words);
        break;
      case 'word':
        addName(item, words);
        break;
      case 'reference':
        words.push({ span: item.wordsSpan, role: 'figure' });
        addName(item.row, words);
        addName(item.name, words);
        break;
      case 'membership':
        addName(item.substance, words);
        addName(item.name, words);
        break;
      case 'call':
        if (functions.has(item.name.text)) words.push({ span: item.name.span, role: 'function' });
        break;
      case 'within':
        addUnit(item.tolerance?.unit, words);
        break;
      default:
    }
  }
}

/** Each unit word for itself: the signs between them are no units. */
function addUnit(unit: UnitWords | undefined, words: WalkedWord[]): void {
  for (const { kind, text, span } of unit?.tokens ?? []) {
    if (kind === 'word' && isUnitWord(text)) words.push({ span, role: 'unit' });
  }
}

function addName(word: Word | undefined, words: WalkedWord[], isGiven = false): void {
  if (word) words.push({ span: word.span, role: 'name', word, isGiven });
}
