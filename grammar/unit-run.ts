// Finds the unit that stands behind a number: the longest run of unit words joined by a space, `·`, `*`, `/`, a whole
// power, `per`, or one bracket behind `/`. Which words are units is asked of the caller; what a unit means, and whether
// `J/kg K` was meant as `J/(kg K)`, is for the reader of units. Invariant: a run that is found starts and ends with a
// unit word or bracket, and an operator that is not followed by a unit word is left to the expression.
import {
  Caret,
  CloseBracket,
  Dot,
  endOf,
  Minus,
  NumberToken,
  OpenBracket,
  Slash,
  Star,
  UnitSign,
  WordToken,
} from './tokens.ts';
import type { Token } from './tokens.ts';
import type { UnitToken, UnitWords } from './tree.ts';

export type IsUnit = (word: string) => boolean;

export interface UnitRun {
  readonly unit: UnitWords;
  /** The index of the first token behind the run. */
  readonly next: number;
}

/** The longest unit that starts at index `from` and ends before `to`, or undefined. */
export function readUnit(tokens: readonly Token[], from: number, to: number, isUnit: IsUnit): UnitRun | undefined {
  const reader = new UnitReader(tokens, to, isUnit);
  return reader.read(from);
}

/** A unit word and the power written on it (`m3`, `m³`), or undefined when the word is no unit. */
export function splitUnitWord(
  word: string,
  isUnit: IsUnit,
): { readonly text: string; readonly power: number } | undefined {
  const written = /^(.*?[^\d\u207b])(\u207b?[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]{1,2}|\d{1,2})$/.exec(word);
  const base = written?.[1];
  const digits = written?.[2];
  if (base !== undefined && digits !== undefined && isUnit(base)) {
    const power = Number(plainDigits(digits));
    if (power !== 0) return { text: base, power };
  }
  return isUnit(word) ? { text: word, power: 1 } : undefined;
}

class UnitReader {
  private readonly tokens: readonly Token[];
  private readonly to: number;
  private readonly isUnit: IsUnit;
  private parts: UnitToken[] = [];

  constructor(tokens: readonly Token[], to: number, isUnit: IsUnit) {
    this.tokens = tokens;
    this.to = to;
    this.isUnit = isUnit;
  }

  read(from: number): UnitRun | undefined {
    const first = this.tokens[from];
    if (first === undefined || from >= this.to) return undefined;
    let index: number;
    if (isPer(first)) {
      this.mark('over', first);
      index = this.readFactor(from + 1, true);
    } else index = this.readWord(from, true);
    if (index < 0) return undefined;
    index = this.readRest(index, true);
    const start = this.parts[0];
    const end = this.parts.at(-1);
    if (start === undefined || end === undefined) return undefined;
    return { unit: { span: { start: start.span.start, end: end.span.end }, tokens: this.parts }, next: index };
  }

  /** Further factors behind the first one; returns the index behind the last that belongs. */
  private readRest(from: number, bracketsAllowed: boolean): number {
    let index = from;
    for (;;) {
      const token = this.tokens[index];
      if (token === undefined || index >= this.to) return index;
      const kept = this.parts.length;
      let next: number;
      if (token.tokenType === Star || token.tokenType === Dot) {
        this.mark('times', token);
        next = this.readWord(index + 1, false);
      } else if (token.tokenType === Slash || isPer(token)) {
        this.mark('over', token);
        next = this.readFactor(index + 1, bracketsAllowed);
      } else {
        this.parts.push({ kind: 'times', text: ' ', power: 1, span: this.gapBefore(index) });
        next = this.readWord(index, false);
      }
      if (next < 0) {
        this.parts.length = kept;
        return index;
      }
      index = next;
    }
  }

  /** A word, or a bracket of words where one may stand. */
  private readFactor(index: number, bracketsAllowed: boolean): number {
    const open = this.tokens[index];
    if (open?.tokenType !== OpenBracket || !bracketsAllowed || index >= this.to) return this.readWord(index, false);
    const kept = this.parts.length;
    this.mark('open', open);
    let next = this.readWord(index + 1, true);
    if (next >= 0) next = this.readRest(next, false);
    const close = this.tokens[next];
    if (next < 0 || next >= this.to || close?.tokenType !== CloseBracket) {
      this.parts.length = kept;
      return -1;
    }
    this.mark('close', close);
    return this.readPower(next + 1);
  }

  /**
   * One unit word with its power. A word directly followed by `(` is a call and no unit, unless nothing else can be
   * meant because a number stands right before it: without this, `2 kW * min(3, 4)` would be kilowatt minutes.
   */
  private readWord(index: number, mayTouchBracket: boolean): number {
    const token = this.tokens[index];
    if (token === undefined || index >= this.to) return -1;
    if (token.tokenType !== WordToken && token.tokenType !== UnitSign) return -1;
    const following = this.tokens[index + 1];
    if (!mayTouchBracket && following?.tokenType === OpenBracket && following.startOffset === endOf(token)) return -1;
    const word = splitUnitWord(token.image, this.isUnit);
    if (word === undefined) return -1;
    const span = { start: token.startOffset, end: endOf(token) };
    this.parts.push({ kind: 'word', text: word.text, power: word.power, span });
    return word.power === 1 ? this.readPower(index + 1) : index + 1;
  }

  /** `^2` or `^-2` behind a word or bracket: widens the last part. */
  private readPower(index: number): number {
    if (this.tokens[index]?.tokenType !== Caret) return index;
    const isNegative = this.tokens[index + 1]?.tokenType === Minus;
    const digitsIndex = isNegative ? index + 2 : index + 1;
    const digits = this.tokens[digitsIndex];
    const part = this.parts.at(-1);
    if (digits?.tokenType !== NumberToken || digitsIndex >= this.to || part === undefined) return index;
    if (!/^\d{1,2}$/.test(digits.image) || Number(digits.image) === 0) return index;
    const power = isNegative ? -Number(digits.image) : Number(digits.image);
    this.parts[this.parts.length - 1] = { ...part, power, span: { start: part.span.start, end: endOf(digits) } };
    return digitsIndex + 1;
  }

  private mark(kind: 'times' | 'over' | 'open' | 'close', token: Token): void {
    this.parts.push({ kind, text: token.image, power: 1, span: { start: token.startOffset, end: endOf(token) } });
  }

  private gapBefore(index: number): { start: number; end: number } {
    const end = this.tokens[index]?.startOffset ?? 0;
    return { start: this.parts.at(-1)?.span.end ?? end, end };
  }
}

const isPer = (token: Token): boolean => token.tokenType === WordToken && token.image === 'per';

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

const plainDigits = (digits: string): string =>
  Array.from(digits, (digit) => {
    if (digit === '\u207b') return '-';
    const value = SUPERSCRIPTS.indexOf(digit);
    return value < 0 ? digit : String(value);
  }).join('');
