// What stands right before the word that is being typed, as far as it says what may come: a number that wants its unit, an
// amount, `of` with a figure's words, `in`, a connective, or nothing in particular. Reads tokens of one line only.
// Invariant: any tokens give an answer.
import { readUnit, type UnitRun } from '../../grammar/unit-run.ts';
import {
  CloseBracket,
  Comma,
  endOf,
  Formula,
  NumberToken,
  OpenBracket,
  PlusMinus,
  QuotedName,
  Slash,
  Text,
  WordToken,
  type Token,
} from '../../grammar/tokens.ts';
import { asBasisWord, CONNECTIVE_WORDS, isReservedWord } from '../../grammar/words.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';

export type Behind =
  /** An operand may begin here; `call` is the function whose brackets it stands in. */
  | { readonly kind: 'start'; readonly call?: string }
  /** A number whose unit is being written, from `start` (in the file). */
  | { readonly kind: 'number'; readonly start: number; readonly tolerance: boolean }
  /** A number with its unit, a closing bracket, or a whole reference; `share` behind `SUBSTANCE in NAME`. */
  | { readonly kind: 'amount'; readonly share?: boolean }
  /** Plain words; `start` is where they begin. */
  | { readonly kind: 'word'; readonly words?: string; readonly start?: number }
  | { readonly kind: 'of'; readonly words: string }
  | { readonly kind: 'in'; readonly substance: string; readonly table: boolean }
  | { readonly kind: 'by' }
  /** `per` behind a number, or between amounts: a unit. */
  | { readonly kind: 'per' }
  | { readonly kind: 'connective'; readonly word: string }
  | { readonly kind: 'basis' }
  | { readonly kind: 'rest' }
  /** A text, a `±`, or something unreadable: nothing can be offered. */
  | { readonly kind: 'closed' };

export interface Reading {
  readonly portion?: boolean;
  /** Numbers are coefficients. */
  readonly equation?: boolean;
}

/** @param at where the fragment begins, counted as the tokens' offsets are; @param from what they count from. */
export function behindOf(tokens: readonly Token[], at: number, from: number, reading: Reading): Behind {
  const last = tokens.at(-1);
  if (!last) return { kind: 'start' };
  const unit = reading.equation ? null : unitBefore(tokens, at);
  if (unit) return 'start' in unit ? { kind: 'number', start: from + unit.start, tolerance: unit.tolerance } : unit;
  switch (last.tokenType) {
    case NumberToken:
      return { kind: reading.equation ? 'start' : 'closed' };
    case CloseBracket:
      return { kind: 'amount' };
    case PlusMinus:
    case Text:
      return { kind: 'closed' };
    case QuotedName:
    case Formula:
      return ownedBy(tokens.at(-2)) ?? { kind: 'word' };
    case WordToken:
      return behindWord(tokens, last, from, reading);
    default:
      return { kind: 'start', ...callAround(tokens) };
  }
}

/** Behind `of NAME` and `in NAME` a reference is whole. */
function ownedBy(before: Token | undefined): Behind | null {
  if (before?.tokenType !== WordToken || (before.image !== 'of' && before.image !== 'in')) return null;
  return { kind: 'amount', share: before.image === 'in' };
}

/** The function in whose open bracket the last token stands. */
function callAround(tokens: readonly Token[]): { call?: string } {
  const open: (string | null)[] = [];
  for (const [index, token] of tokens.entries()) {
    const before = tokens[index - 1];
    if (token.tokenType === CloseBracket) open.pop();
    if (token.tokenType !== OpenBracket) continue;
    const isCall = before?.tokenType === WordToken && endOf(before) === token.startOffset;
    open.push(isCall ? before.image : null);
  }
  const call = open.at(-1);
  return typeof call === 'string' ? { call } : {};
}

function behindWord(tokens: readonly Token[], last: Token, from: number, reading: Reading): Behind {
  const word = last.image;
  const before = tokens.at(-2);
  if (word === 'rest' && reading.portion && tokens.length === 1) return { kind: 'rest' };
  if (asBasisWord(word) !== undefined && reading.portion) return { kind: 'basis' };
  if (!isReservedWord(word)) return ownedBy(before) ?? { kind: 'word', ...wordsBefore(tokens, tokens.length, from) };
  if (word === 'of' && before) {
    const { words } = wordsBefore(tokens, tokens.length - 1, from);
    return words === '' ? { kind: 'connective', word } : { kind: 'of', words };
  }
  if (word === 'in' && before && isName(before)) {
    return { kind: 'in', substance: before.image.replaceAll("'", ''), table: tokens.at(-3)?.image === 'of' };
  }
  if (word === 'by' && before && isName(before) && tokens.at(-3)?.image === 'in') return { kind: 'by' };
  if (word === 'per') return { kind: 'per' };
  return CONNECTIVE_WORDS.some((one) => one === word) ? { kind: 'connective', word } : { kind: 'closed' };
}

/** The run of plain words that ends before an index. */
function wordsBefore(tokens: readonly Token[], end: number, from: number): { words: string; start: number } {
  let index = end;
  const isPlain = (token: Token | undefined): boolean => token?.tokenType === WordToken && !isReservedWord(token.image);
  while (index > 0 && isPlain(tokens[index - 1])) index--;
  const run = tokens.slice(index, end);
  return { words: run.map(({ image }) => image).join(' '), start: from + (run[0]?.startOffset ?? 0) };
}

/** The number whose unit is being written, `amount` when it has its unit, or null when no number is before. */
function unitBefore(
  tokens: readonly Token[],
  at: number,
): { readonly start: number; readonly tolerance: boolean } | { readonly kind: 'amount' | 'closed' } | null {
  const index = lastNumber(tokens);
  const number = tokens[index];
  if (!number) return null;
  const tolerance = tokens[index - 1]?.tokenType === PlusMinus;
  const next = tokens[index + 1];
  if (!next) return { start: at, tolerance };
  const run: UnitRun | undefined = readUnit(tokens, index + 1, tokens.length, isUnitWord);
  if (!run) return null;
  if (run.next === tokens.length) return { kind: 'amount' };
  // `kJ/(kg ` goes on; `5 kg / ` divides by something, which the space before the sign tells.
  const rest = tokens.slice(run.next);
  const isOpen =
    rest.every(({ tokenType }, place) => tokenType === (place === 0 ? Slash : OpenBracket)) && rest.length <= 2;
  const sign = rest[0];
  const isJoined = sign !== undefined && endOf(tokens[run.next - 1] ?? sign) === sign.startOffset;
  if (isOpen && isJoined) return { start: next.startOffset, tolerance };
  const inBracket = rest[0]?.tokenType === Slash && rest[1]?.tokenType === OpenBracket && isJoined;
  const isUnitsOnly = rest.slice(2).every((token) => token.tokenType === WordToken && isUnitWord(token.image));
  return inBracket && isUnitsOnly ? { start: next.startOffset, tolerance } : null;
}

/** The number nearest before the end that is no power and has nothing but a unit, begun or whole, behind it. */
function lastNumber(tokens: readonly Token[]): number {
  for (let index = tokens.length - 1; index >= 0; index--) {
    const token = tokens[index];
    if (token?.tokenType === NumberToken && tokens[index - 1]?.image !== '^') return index;
    if (token?.tokenType === Comma) return -1;
  }
  return -1;
}

function isName({ tokenType, image }: Token): boolean {
  return tokenType === QuotedName || tokenType === Formula || (tokenType === WordToken && !isReservedWord(image));
}
