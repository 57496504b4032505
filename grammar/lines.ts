// Splits the tokens of a section into lines and says what each line is by its form: an entry, an equation, an
// `acknowledge`, or else a portion. It decides which newlines end a line: all but those inside closed round brackets,
// and those behind a comma, an arrow or an operator when the next line can go on. It does not look inside a line.
// Invariant: every token but newlines and semicolons lands in one line; an unclosed bracket swallows no further line.
// Time is linear in the tokens.
import {
  Arrow,
  Caret,
  CloseBrace,
  CloseBracket,
  Colon,
  Comma,
  Compare,
  Dot,
  endOf,
  Minus,
  Newline,
  NumberToken,
  OpenBrace,
  OpenBracket,
  Plus,
  PlusMinus,
  Semicolon,
  Slash,
  Star,
  WordToken,
} from './tokens.ts';
import type { Token } from './tokens.ts';
import { asStatementWord } from './words.ts';

export type LineShape = 'entry' | 'equation' | 'acknowledge' | 'portion';

export interface RawLine {
  readonly shape: LineShape;
  /** The words of an entry and its colon; otherwise empty. */
  readonly head: readonly Token[];
  /** What stands behind the colon; all of the line when it is no entry. */
  readonly tokens: Token[];
  readonly start: number;
  readonly end: number;
}

/** The lines of `tokens` from index `from` up to `to`, in order. */
export function splitLines(tokens: readonly Token[], from: number, to: number): RawLine[] {
  const closing = matchBrackets(tokens, from, to);
  const lines: RawLine[] = [];
  let current: Token[] = [];
  let insideUntil = from;
  for (let index = from; index < to; index++) {
    const token = tokens[index];
    if (token === undefined) break;
    if (!isLineBreak(token)) {
      current.push(token);
      insideUntil = Math.max(insideUntil, closing.get(index) ?? 0);
      continue;
    }
    const last = current.at(-1);
    if (last === undefined || index < insideUntil) continue;
    if (continuing.has(last.tokenType) && canContinueAt(tokens, nextWord(tokens, index, to), to)) continue;
    lines.push(shapeLine(current, last));
    current = [];
  }
  const last = current.at(-1);
  if (last !== undefined) lines.push(shapeLine(current, last));
  return lines;
}

/**
 * The index of the colon when words alone and then a colon stand at `from`, else -1. Whole numbers count as words
 * behind the first one (`leg 2:`).
 */
export function entryColon(tokens: readonly Token[], from: number, to: number): number {
  if (tokens[from]?.tokenType !== WordToken) return -1;
  let index = from + 1;
  for (; index < to; index++) {
    const token = tokens[index];
    if (token === undefined) return -1;
    if (token.tokenType === Colon) return index;
    const isWholeNumber = token.tokenType === NumberToken && /^\d+$/.test(token.image);
    const previous = tokens[index - 1];
    const isApart = previous !== undefined && token.startOffset > endOf(previous);
    if ((token.tokenType !== WordToken && !isWholeNumber) || !isApart) return -1;
  }
  return -1;
}

export const isLineBreak = (token: Token): boolean => token.tokenType === Newline || token.tokenType === Semicolon;

const continuing = new Set([Comma, Arrow, Plus, Minus, Star, Slash, Dot, Caret, Compare, PlusMinus]);

function shapeLine(tokens: Token[], last: Token): RawLine {
  const start = tokens[0]?.startOffset ?? 0;
  const end = endOf(last);
  const colon = entryColon(tokens, 0, tokens.length);
  if (colon >= 0)
    return { shape: 'entry', head: tokens.slice(0, colon + 1), tokens: tokens.slice(colon + 1), start, end };
  const startsAcknowledge = isAcknowledge(tokens[0]);
  const isEquation = !startsAcknowledge && tokens.some((token) => token.tokenType === Arrow);
  return {
    shape: startsAcknowledge ? 'acknowledge' : isEquation ? 'equation' : 'portion',
    head: [],
    tokens,
    start,
    end,
  };
}

const isAcknowledge = (token: Token | undefined): boolean =>
  token?.tokenType === WordToken && token.image === 'acknowledge';

/** A line that cannot go on what stands above it: an entry, a statement, an `acknowledge` or a brace. */
function canContinueAt(tokens: readonly Token[], index: number, to: number): boolean {
  const token = tokens[index];
  if (token === undefined || index >= to) return false;
  if (token.tokenType === CloseBrace || token.tokenType === OpenBrace) return false;
  if (token.tokenType !== WordToken) return true;
  if (asStatementWord(token.image) !== undefined || isAcknowledge(token)) return false;
  return entryColon(tokens, index, to) < 0;
}

function nextWord(tokens: readonly Token[], from: number, to: number): number {
  let index = from;
  for (; index < to; index++) {
    const token = tokens[index];
    if (token === undefined || !isLineBreak(token)) break;
  }
  return index;
}

/** For the index of each `(` that is closed before the next line that cannot go on: the index of its `)`. */
function matchBrackets(tokens: readonly Token[], from: number, to: number): ReadonlyMap<number, number> {
  const closing = new Map<number, number>();
  let open: number[] = [];
  for (let index = from; index < to; index++) {
    const token = tokens[index];
    if (token === undefined) break;
    if (token.tokenType === OpenBracket) open.push(index);
    else if (token.tokenType === CloseBracket) {
      const opened = open.pop();
      if (opened !== undefined) closing.set(opened, index);
    } else if (open.length > 0 && isLineBreak(token)) {
      const next = tokens[index + 1];
      if (next !== undefined && !isLineBreak(next) && !canContinueAt(tokens, index + 1, to)) open = [];
    }
  }
  return closing;
}
