// What is being written at the cursor: where in the file it stands, the word typed so far, and what stands right before
// that word. Reads the text before the cursor by the grammar's tokens, because the line that is being written is broken as
// a rule; the tree says only in which definition it is. Knows no names, no tables and nothing of the text behind.
// Invariant: any text and offset give an answer; null means that nothing can be offered (comment, text, new name).
import { entryColon } from '../../grammar/lines.ts';
import {
  Arrow,
  CloseBrace,
  Compare,
  endOf,
  Formula,
  lex,
  Newline,
  NumberToken,
  OpenBrace,
  QuotedName,
  Semicolon,
  startsEntry,
  Text,
  UnitSign,
  wordAt,
  WordToken,
  type Token,
} from '../../grammar/tokens.ts';
import type { PlacedSection, SyntaxTree } from '../../grammar/tree.ts';
import { asStatementWord } from '../../grammar/words.ts';
import { kindOf } from '../scenario/kinds/registry.ts';
import { behindOf, type Behind, type Reading } from './completion-behind.ts';

/** The word being typed. Offsets are those of the file; `start` is the cursor where nothing is typed yet. */
export interface Fragment {
  readonly start: number;
  readonly end: number;
  /** As typed, with an opening quote. */
  readonly text: string;
}

export type Where =
  /** Where a statement or definition may begin. */
  | { readonly kind: 'top' }
  /** Where a line of a definition begins; the fragment holds all its words so far. */
  | { readonly kind: 'line'; readonly body: Body }
  | { readonly kind: 'entry'; readonly body: Body; readonly entry: string }
  | { readonly kind: 'portion'; readonly body: Body }
  | { readonly kind: 'equation'; readonly body: Body }
  /** Behind `let name =`, or in the claim of an `expect`. */
  | { readonly kind: 'expression'; readonly claim: boolean; readonly name: string };

/** The definition the cursor stands in. */
export interface Body {
  readonly kind: string;
  readonly name: string;
  readonly placed: PlacedSection;
}

export interface CompletionPlace {
  readonly where: Where;
  readonly fragment: Fragment;
  readonly behind: Behind;
  /** The text up to the cursor from where the unit or the run of words begins that it may belong to; else the fragment. */
  readonly run: string;
  /** The tokens of the value, equation or portion before the fragment. */
  readonly before: readonly Token[];
}

export function completionPlace(tree: SyntaxTree, offset: number): CompletionPlace | null {
  const from = startOfStatement(tree.text, offset);
  const { tokens: all, comments } = lex(tree.text.slice(from, offset));
  const comment = comments.at(-1);
  if (comment && from + endOf(comment) === offset) return null;
  const tokens = lineTokens(all);
  const last = tokens.at(-1);
  const touches = last !== undefined && from + endOf(last) === offset;
  // Right behind a digit the number itself is still being typed.
  if (touches && (last.tokenType === Text || last.tokenType === NumberToken)) return null;
  if (touches && last.tokenType === QuotedName && last.image.length > 1 && last.image.endsWith("'")) return null;
  const isFragment = touches && isWordLike(last);
  const fragment: Fragment = isFragment
    ? { start: from + last.startOffset, end: offset, text: last.image }
    : { start: offset, end: offset, text: '' };
  const { text } = tree;
  const read = { text, from, fragment, line: tokens, before: isFragment ? tokens.slice(0, -1) : tokens };
  const body = bodyAt(tree, offset);
  return inStatement(read) ?? (body ? inBody(read, body) : atTop(read));
}

interface Read {
  readonly text: string;
  /** Where the tokens' offsets count from. */
  readonly from: number;
  readonly fragment: Fragment;
  /** All tokens of the line up to the cursor, and those before the fragment. */
  readonly line: readonly Token[];
  readonly before: readonly Token[];
}

/** `undefined` where the line is no `let`, `expect`, `use` or `scenario`; null where such a one takes nothing. */
function inStatement(read: Read): CompletionPlace | null | undefined {
  const { line, before, fragment } = read;
  const [first] = before;
  const word = first?.tokenType === WordToken ? asStatementWord(first.image) : undefined;
  if (word === undefined || entryColon(line, 0, line.length) >= 0) return undefined;
  if (word === 'expect') return placed(read, { kind: 'expression', claim: true, name: '' }, 1);
  const sign = before.findIndex(({ tokenType, image }) => tokenType === Compare && image === '=');
  if (word !== 'let' || sign < 0 || fragment.text.startsWith('"')) return null;
  const name = before[1]?.image.replaceAll("'", '') ?? '';
  return placed(read, { kind: 'expression', claim: false, name }, sign + 1);
}

function atTop({ before, fragment }: Read): CompletionPlace | null {
  return before.length === 0
    ? { where: { kind: 'top' }, fragment, behind: { kind: 'start' }, run: fragment.text, before }
    : null;
}

function inBody(read: Read, body: Body): CompletionPlace | null {
  const { line, before, from, fragment } = read;
  const colon = entryColon(before, 0, before.length);
  if (colon >= 0) {
    const entry = before
      .slice(0, colon)
      .map(({ image }) => image)
      .join(' ');
    return placed(read, { kind: 'entry', body, entry }, colon + 1);
  }
  const [first] = line;
  if (before[0]?.tokenType === WordToken && before[0].image === 'acknowledge') return null;
  const takesEquation = kindOf(body.kind)?.evaluated?.lines.includes('equation') ?? false;
  if (before.some(({ tokenType }) => tokenType === Arrow))
    return placed(read, { kind: 'equation', body }, 0, { equation: true });
  const isWords = line.every((token) => token.tokenType === WordToken) && before[0]?.image !== 'rest';
  if (isWords) {
    const start = first === undefined ? fragment.start : from + first.startOffset;
    const text = first === undefined ? '' : line.map(({ image }) => image).join(' ');
    return {
      where: { kind: 'line', body },
      fragment: { start, end: fragment.end, text },
      behind: { kind: before.length === 0 ? 'start' : 'word' },
      run: text,
      before,
    };
  }
  if (takesEquation) return placed(read, { kind: 'equation', body }, 0, { equation: true });
  return placed(read, { kind: 'portion', body }, 0, { portion: true });
}

function placed(
  { text, from, fragment, before }: Read,
  where: Where,
  index: number,
  more: Reading = {},
): CompletionPlace {
  const tokens = before.slice(index).filter(({ tokenType }) => tokenType !== Newline);
  const behind = behindOf(tokens, fragment.start - from, from, more);
  const runStart = 'start' in behind ? (behind.start ?? fragment.start) : fragment.start;
  const run = text.slice(runStart, fragment.end).replace(/\s+/g, ' ');
  return { where, fragment, behind, run, before: tokens };
}

/** The tokens of the line the cursor is in. What is on the lines before has been found to go on here. */
function lineTokens(tokens: readonly Token[]): readonly Token[] {
  const cut = tokens.findLastIndex(({ tokenType }) => enders.has(tokenType));
  return tokens.slice(cut + 1).filter(({ tokenType }) => tokenType !== Newline);
}

const enders = new Set([Semicolon, OpenBrace, CloseBrace]);

function isWordLike(token: Token): boolean {
  const { tokenType } = token;
  return tokenType === WordToken || tokenType === Formula || tokenType === QuotedName || tokenType === UnitSign;
}

/** Upwards from the cursor's line for as long as the line above goes on: it ends in a comma, an operator or a bracket. */
function startOfStatement(text: string, offset: number): number {
  let start = lineStart(text, offset);
  for (let lines = 0; lines < MOST_LINES && start > 0; lines++) {
    if (startsAnew(text, start)) break;
    const above = lineStart(text, start - 1);
    if (!/(?:[,(+\-−*/^·⋅<>=≤≥±→]|->)[ \t]*(?:#.*)?\r?\n?$/.test(text.slice(above, start))) break;
    start = above;
  }
  return start;
}

const MOST_LINES = 40;

function startsAnew(text: string, lineStartOffset: number): boolean {
  const start = lineStartOffset + (/^[ \t]*/.exec(text.slice(lineStartOffset, lineStartOffset + 200))?.[0].length ?? 0);
  const word = wordAt(text, start);
  return asStatementWord(word) !== undefined || word === 'acknowledge' || startsEntry(text, start);
}

function lineStart(text: string, offset: number): number {
  return Math.max(text.lastIndexOf('\n', offset - 1), text.lastIndexOf('\r', offset - 1)) + 1;
}

/** The definition between whose braces the offset stands. Without a closing brace it reaches to the next section. */
function bodyAt({ text, sections }: SyntaxTree, offset: number): Body | null {
  const section = lastStartingBefore(sections, offset);
  const statement = section?.section.statement;
  if (!section || statement?.kind !== 'definition') return null;
  const brace = section.start + statement.header.end;
  if (text[brace] !== '{' || offset <= brace || (statement.closed && offset >= section.start + statement.span.end))
    return null;
  return { kind: statement.keyword.text, name: statement.name?.text ?? '', placed: section };
}

function lastStartingBefore(sections: readonly PlacedSection[], offset: number): PlacedSection | undefined {
  let [low, high] = [0, sections.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sections[middle]?.start ?? Infinity) <= offset) low = middle + 1;
    else high = middle;
  }
  return sections[low - 1];
}
