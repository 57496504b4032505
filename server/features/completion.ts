// What may be written at the cursor. Decides by the place (completion-place.ts) which offers are made; the offers themselves
// are made in the files of their kind, from the kinds' tables, the unit table, the catalogue and the evaluated scenario.
// Works on half-written lines: of the line at the cursor only the text before it counts. Works nothing out.
// Invariant: every offer begins at or before the cursor, in the cursor's line, and is made for this very text.
import { kindOf } from '../scenario/kinds/registry.ts';
import { placeOf } from '../scenario/place.ts';
import type { EvaluatedScenario } from '../scenario/scenario.ts';
import { entryItems, lineItems, statementItems } from './completion-kinds.ts';
import type { Completion, CompletionItem } from './completion-item.ts';
import { definitionItems, isMaterial } from './completion-names.ts';
import { completionPlace, type Body, type CompletionPlace, type Where } from './completion-place.ts';
import { substanceItems } from './completion-substances.ts';
import { entryRow } from './entry-rows.ts';
import { takenAt, valueOffers } from './completion-value.ts';

/** The offers at an offset of one file of the scenario; without any where nothing can be offered. */
export function completion(scenario: EvaluatedScenario, path: string, offset: number): Completion {
  const tree = scenario.files.find((file) => file.path === path)?.tree;
  const place = tree ? completionPlace(tree, offset) : null;
  if (!tree || !place) return { items: [], end: offset, wordEnd: offset, isIncomplete: false, isExpected: false };
  const { text } = tree;
  const hasColon = place.where.kind === 'line' && /^[\p{L}\p{N}_ -]*:/u.test(text.slice(offset, offset + 100));
  const lineStart = Math.max(text.lastIndexOf('\n', offset - 1), text.lastIndexOf('\r', offset - 1)) + 1;
  const items = offersAt(scenario, place, hasColon, path).filter(({ start }) => start >= lineStart);
  const wordEnd = endOfWord(text, offset, place, hasColon);
  // An editor that has closed the quote itself must not be left with half a pair.
  const isClosed = place.fragment.text.startsWith("'") && text[offset] === "'";
  return {
    items: items.map((item) => spaced(place.fragment.text.startsWith("'") ? inQuotes(item) : item, text)),
    end: isClosed ? offset + 1 : hasColon ? wordEnd : offset,
    wordEnd: Math.max(wordEnd, isClosed ? offset + 1 : offset),
    isIncomplete: items.some(
      ({ role }) => role === 'substance' || role === 'figure' || role === 'share' || role === 'unit',
    ),
    isExpected: isExpected(place),
  };
}

function offersAt(
  scenario: EvaluatedScenario,
  place: CompletionPlace,
  hasColon: boolean,
  path: string,
): readonly CompletionItem[] {
  const { where, fragment } = place;
  switch (where.kind) {
    case 'top':
      return statementItems(fragment.start);
    case 'line': {
      const { body } = where;
      const lines = kindOf(body.kind)?.evaluated?.lines ?? [];
      const takesRest = lines.includes('portion') && !hasRest(body, fragment.end);
      const isFirstWord = !fragment.text.includes(' ');
      return [
        ...entryItems(body.kind, given(body, path, fragment.end), fragment.start, hasColon),
        ...(isFirstWord && !hasColon ? lineItems(takesRest, fragment.start) : []),
        ...(lines.includes('equation') && isFirstWord && fragment.text !== ''
          ? [
              ...definitionItems(scenario, isMaterial, body.name, fragment.start),
              ...substanceItems('formulas', fragment.text, fragment.start),
            ]
          : []),
      ];
    }
    case 'entry':
    case 'portion':
    case 'equation':
    case 'expression':
      return valueOffers(scenario, place, where);
  }
}

/** The entries of a definition but the one in the cursor's line. */
function given({ placed }: Body, path: string, offset: number): ReadonlySet<string> {
  const words = new Set<string>();
  const { statement } = placed.section;
  for (const line of statement.kind === 'definition' ? statement.lines : []) {
    const span = line.kind === 'entry' || line.kind === 'broken-line' ? line.wordsSpan : undefined;
    if (!span || !('words' in line) || line.words === undefined) continue;
    const place = placeOf(path, placed, span);
    if (offset < place.start || offset > place.end) words.add(line.words);
  }
  return words;
}

function hasRest({ placed }: Body, offset: number): boolean {
  const { statement } = placed.section;
  if (statement.kind !== 'definition') return false;
  return statement.lines.some(
    (line) => line.kind === 'portion' && line.amount.kind === 'rest' && placed.start + line.amount.span.end < offset,
  );
}

function isExpected({ where, behind, fragment }: CompletionPlace): boolean {
  switch (behind.kind) {
    case 'of':
    case 'in':
    case 'by':
    case 'per':
    case 'basis':
    case 'rest':
      return true;
    case 'number':
      return where.kind === 'portion' || behind.start < fragment.start || (where.kind === 'entry' && takesUnit(where));
    case 'start': {
      const taken = where.kind === 'entry' ? takenAt(where) : null;
      return taken !== null && (taken.listed.length > 0 || taken.materials);
    }
    case 'amount':
    case 'word':
    case 'connective':
    case 'closed':
      return false;
  }
}

function takesUnit({ body, entry }: Extract<Where, { kind: 'entry' }>): boolean {
  return entryRow(body.kind, entry)?.reader.unit !== undefined;
}

function endOfWord(text: string, offset: number, { fragment }: CompletionPlace, hasColon: boolean): number {
  const behind = text.slice(offset, offset + 200);
  const pattern = fragment.text.startsWith("'")
    ? /^[^'\r\n]*'/
    : hasColon
      ? /^[\p{L}\p{N}_ -]*?(?=[ \t]*:)/u
      : /^[\p{L}\p{N}_]*/u;
  return offset + (pattern.exec(behind)?.[0].length ?? 0);
}

/** What is typed begins with a quote, so what it is compared with must too. */
function inQuotes(item: CompletionItem): CompletionItem {
  return item.filter === undefined ? { ...item, filter: `'${item.label}` } : item;
}

/** Right behind a colon or comma a space is written too. */
function spaced(item: CompletionItem, text: string): CompletionItem {
  if (!/[:,]/.test(text[item.start - 1] ?? '')) return item;
  const { insert, snippet } = item;
  return { ...item, insert: ` ${insert}`, ...(snippet === undefined ? {} : { snippet: ` ${snippet}` }) };
}
