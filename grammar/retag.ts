// Re-tags the tokens of one line in one pass from left to right: what a token is, where it stands. Units behind
// numbers become one token each; words turn out to be figure words before `of`, calls, bases, connectives or lone
// units; a minus turns out to be a sign, an operator, or a slip. It also finds the slips that show in the tokens alone.
// It does not know entries or what a name means. Invariant: the result covers the same text in the same order.
// Time is linear in the line: each look ahead is remembered or bounded.
import { checkNumber, checkToken, problems } from './messages.ts';
import { wordNode } from './nodes.ts';
import {
  Basis,
  CallName,
  ClaimCompare,
  CloseBracket,
  Comma,
  Compare,
  ConnectiveToken,
  DateLike,
  DecimalComma,
  endOf,
  Formula,
  GroupedNumber,
  LoneUnitToken,
  MembershipBy,
  MembershipIn,
  Minus,
  NumberToken,
  OpenBracket,
  Plus,
  PlusMinus,
  QuotedName,
  ReferenceAt,
  ReferenceOf,
  ReferenceWord,
  Rest,
  Sign,
  StrayReserved,
  SubstanceToken,
  Text,
  TightMinus,
  TolerancePlusMinus,
  UnaryMinus,
  Unit,
  UnitSign,
  WithinToken,
  WordToken,
} from './tokens.ts';
import type { Token } from './tokens.ts';
import type { Problem } from './tree.ts';
import { readUnit, splitUnitWord } from './unit-run.ts';
import type { IsUnit, UnitRun } from './unit-run.ts';
import { asBasisWord, isReservedWord } from './words.ts';
import type { TokenType } from 'chevrotain';

/** Where the tokens stand: a claim may compare, a portion ends in a substance, an equation has coefficients. */
export type Place = 'value' | 'claim' | 'expression' | 'portion' | 'equation';

export interface Retagged {
  readonly tokens: Token[];
  /** The first slip seen; with `broken`, the line cannot be read. */
  readonly problem?: Problem;
  readonly broken: boolean;
}

/** Brackets nested deeper than this are refused, so that nothing that walks a tree can run out of stack. */
const DEEPEST_BRACKETS = 64;
/** Likewise operators in one line. */
const MOST_OPERATORS = 1000;

export function retag(tokens: readonly Token[], place: Place, isUnit: IsUnit): Retagged {
  return new Retagger(tokens, place, isUnit).run();
}

/** How far the operand being read has got, as far as later words depend on it. */
type OperandState =
  'none' | 'word' | 'reference-of' | 'reference' | 'row' | 'reference-row' | 'membership-in' | 'membership';

class Retagger {
  private readonly tokens: readonly Token[];
  private readonly place: Place;
  private readonly isUnit: IsUnit;
  private readonly result: Token[] = [];
  private problem: Problem | undefined;
  private broken = false;
  private index = 0;
  private state: OperandState = 'none';
  /** Whether a value has just ended, so that a sign behind it would be an operator. */
  private afterOperand = false;
  /** Whether an amount has just ended, so that `mass` behind it is a basis. */
  private afterAmount = false;
  private readonly openBrackets: Token[] = [];
  private withinDepth = -1;
  private operatorCount = 0;
  /** Words up to this index are known not to lead to an `of`. */
  private noOfUntil = 0;
  /** Units may reach up to here: the last word of a portion is its substance. */
  private readonly unitLimit: number;

  constructor(tokens: readonly Token[], place: Place, isUnit: IsUnit) {
    this.tokens = tokens;
    this.place = place;
    this.isUnit = isUnit;
    this.unitLimit = place === 'portion' && isSubstanceWord(tokens.at(-1)) ? tokens.length - 1 : tokens.length;
  }

  run(): Retagged {
    while (this.index < this.tokens.length && !this.broken) {
      const token = this.tokens[this.index];
      if (token === undefined) break;
      this.take(token);
      this.index++;
    }
    const open = this.openBrackets[0];
    if (open !== undefined && !this.broken) this.fail(problems.unclosedBracket(open));
    const { result, broken, problem } = this;
    return problem === undefined ? { tokens: result, broken } : { tokens: result, broken, problem };
  }

  private take(token: Token): void {
    switch (token.tokenType) {
      case NumberToken:
      case DecimalComma:
      case DateLike:
      case GroupedNumber:
        return this.takeNumber(token);
      case WordToken:
        return this.takeWord(token);
      case Formula:
      case QuotedName:
        this.note(checkToken(token));
        return this.takeName(token);
      case Text:
        this.note(checkToken(token));
        return this.push(token, { operand: true });
      case UnitSign:
        return this.takeLoneUnit(token);
      case Plus:
      case Minus:
        return this.takeSign(token);
      case PlusMinus:
        if (this.withinDepth === this.openBrackets.length) retype(token, TolerancePlusMinus);
        return this.push(token, {});
      case OpenBracket:
        this.openBrackets.push(token);
        if (this.openBrackets.length > DEEPEST_BRACKETS) return this.fail(problems.tooDeep(token));
        return this.push(token, {});
      case CloseBracket:
        if (this.openBrackets.pop() === undefined) return this.fail(problems.unopenedBracket(token));
        return this.push(token, { operand: true, amount: true });
      case Compare:
        if (this.place === 'claim' && this.openBrackets.length === 0) retype(token, ClaimCompare);
        return this.push(token, {});
      case Comma:
        if (this.openBrackets.length === 0) this.withinDepth = -1;
        return this.push(token, {});
      default:
        this.countOperator(token);
        return this.push(token, {});
    }
  }

  private takeNumber(token: Token): void {
    const previous = this.result.at(-1);
    const slip = checkNumber(token, previous);
    if (slip !== undefined) return this.fail(slip);
    this.push(token, { operand: true, amount: true });
    if (this.place === 'equation') return;
    const from = this.index + 1;
    const run = readUnit(this.tokens, from, this.unitLimit, this.isUnit) ?? this.readUnknownUnit(from);
    if (run !== undefined) this.pushUnit(run, Unit, from);
  }

  /**
   * In an expression nothing but a unit can follow a number, so a plain word there is a misspelt unit (`5 knots`, `70 F`)
   * for the reader of units to name. Not so a name with `_` or a formula: there an operator is missing.
   */
  private readUnknownUnit(from: number): UnitRun | undefined {
    const word = this.tokens[from];
    if ((this.place !== 'expression' && this.place !== 'claim') || word?.tokenType !== WordToken) return undefined;
    const next = this.tokens[from + 1];
    const isFollowed = next?.tokenType === WordToken || next?.tokenType === OpenBracket;
    if (isFollowed || isReservedWord(word.image) || wordNode(word).form === 'formula') return undefined;
    if (/[_-]/.test(word.image)) return undefined;
    const { image } = word;
    const base = image.replace(/(?:\d+|\u207b?[\u2070\u00b9\u00b2\u00b3\u2074-\u2079]+)$/, '');
    return readUnit(
      this.tokens,
      from,
      this.tokens.length,
      (part) => part === image || part === base || this.isUnit(part),
    );
  }

  private takeWord(token: Token): void {
    const word = token.image;
    if (this.place === 'equation') {
      if (isReservedWord(word)) retype(token, StrayReserved);
      return this.push(token, { operand: true });
    }
    if (isReservedWord(word)) return this.takeReserved(token);
    const isListedWordAllowed = this.place === 'value' && this.openBrackets.length === 0;
    const next = this.tokens[this.index + 1];
    if (next?.tokenType === OpenBracket && next.startOffset === endOf(token)) {
      retype(token, CallName);
      return this.push(token, {});
    }
    if (this.state === 'none' && this.takeReferenceWords()) return;
    if (word.includes('-') && !isListedWordAllowed) return this.fail(problems.hyphenatedName(token));
    const startsBasis = this.afterAmount || this.result.at(-1)?.tokenType === MembershipBy;
    if (startsBasis && asBasisWord(word) !== undefined) {
      retype(token, Basis);
      return this.push(token, {});
    }
    if (this.place === 'portion' && this.index === this.tokens.length - 1) {
      retype(token, SubstanceToken);
      return this.push(token, { operand: true });
    }
    const isCapital = /^[A-Z]/.test(word);
    const namesSomething = this.state === 'reference-of' || this.state === 'row' || this.state === 'membership-in';
    if (this.place !== 'portion' && !namesSomething) {
      if (this.isAfterPer() || (!isCapital && splitUnitWord(word, this.isUnit) !== undefined)) {
        const run = readUnit(this.tokens, this.index, this.tokens.length, this.isUnit);
        if (run !== undefined) return this.pushUnit(run, LoneUnitToken, this.index);
      }
    }
    this.takeName(token);
  }

  private takeReserved(token: Token): void {
    const word = token.image;
    if (word === 'rest' && this.place === 'portion' && this.result.length === 0) {
      retype(token, Rest);
      return this.push(token, {});
    }
    if (word === 'in' && (this.state === 'word' || this.state === 'reference')) {
      retype(token, MembershipIn);
      const next = this.state === 'word' ? 'membership-in' : 'row';
      this.push(token, {});
      this.state = next;
      return;
    }
    if (
      word === 'at' &&
      (this.state === 'reference' || this.state === 'reference-row') &&
      this.isValueStart(this.index + 1)
    ) {
      retype(token, ReferenceAt);
      return this.push(token, {});
    }
    if (word === 'by' && this.state === 'membership') {
      const next = this.tokens[this.index + 1];
      if (next !== undefined && asBasisWord(next.image) !== undefined) {
        retype(token, MembershipBy);
        return this.push(token, {});
      }
    }
    if (word === 'within' && this.place === 'claim' && this.openBrackets.length === 0) {
      retype(token, WithinToken);
      this.push(token, {});
      this.withinDepth = 0;
      return;
    }
    const isConnective = !['rest', 'let', 'use', 'expect', 'scenario', 'acknowledge'].includes(word);
    retype(token, isConnective ? ConnectiveToken : StrayReserved);
    this.push(token, {});
  }

  /** Words that lead to `of` are a figure's words, even where one of them is spelt like a unit. */
  private takeReferenceWords(): boolean {
    if (this.index < this.noOfUntil) return false;
    let end = this.index;
    let token = this.tokens[end];
    while (token?.tokenType === WordToken && !isReservedWord(token.image)) token = this.tokens[++end];
    if (token?.tokenType !== WordToken || token.image !== 'of') {
      this.noOfUntil = end;
      return false;
    }
    for (; this.index < end; this.index++) {
      const word = this.tokens[this.index];
      if (word !== undefined) this.push(retype(word, ReferenceWord), {});
    }
    this.push(retype(token, ReferenceOf), {});
    this.state = 'reference-of';
    return true;
  }

  private takeName(token: Token): void {
    const before = this.state;
    this.push(token, { operand: true });
    if (before === 'reference-of') this.state = 'reference';
    else if (before === 'row') this.state = 'reference-row';
    else if (before === 'membership-in') this.state = 'membership';
    else this.state = 'word';
  }

  private takeLoneUnit(token: Token): void {
    const run = readUnit(this.tokens, this.index, this.tokens.length, this.isUnit);
    if (run === undefined) return this.push(token, {});
    this.pushUnit(run, LoneUnitToken, this.index);
  }

  /** A sign touches the number behind it; an operator has a value before it and, for a minus, a space on both sides. */
  private takeSign(token: Token): void {
    const isMinus = token.tokenType === Minus;
    const previous = this.tokens[this.index - 1];
    const next = this.tokens[this.index + 1];
    const spaceBefore = previous === undefined || token.startOffset > endOf(previous);
    const spaceAfter = next === undefined || next.startOffset > endOf(token);
    const signsNumber = next?.tokenType === NumberToken && !spaceAfter;
    if (!this.afterOperand) {
      if (signsNumber && this.place !== 'equation') retype(token, Sign);
      else if (isMinus) retype(token, UnaryMinus);
    } else if (isMinus && this.place !== 'equation' && !(spaceBefore && spaceAfter)) {
      // `pressure -0.2 bar` in a phrase is a word and a number; `3 -2` and `a -b` are slips.
      const isNextToWord = this.state === 'word' && this.place === 'value' && this.openBrackets.length === 0;
      retype(token, signsNumber && spaceBefore && isNextToWord ? Sign : TightMinus);
    }
    if (token.tokenType === TightMinus) return this.fail(problems.tightMinus(token));
    if (token.tokenType !== Sign) this.countOperator(token);
    this.push(token, {});
  }

  private countOperator(token: Token): void {
    this.operatorCount++;
    if (this.operatorCount > MOST_OPERATORS) this.fail(problems.tooLong(token));
  }

  private isAfterPer(): boolean {
    const previous = this.result.at(-1);
    return previous?.tokenType === ConnectiveToken && previous.image === 'per';
  }

  /** Whether a number, bracket, call or name stands at an index. */
  private isValueStart(index: number): boolean {
    const token = this.tokens[index];
    switch (token?.tokenType) {
      case NumberToken:
      case OpenBracket:
        return true;
      case WordToken:
        return !isReservedWord(token.image);
      case Minus:
      case Plus:
        return this.tokens[index + 1]?.tokenType === NumberToken;
      default:
        return false;
    }
  }

  private pushUnit(run: UnitRun, type: TokenType, from: number): void {
    const first = this.tokens[from];
    const last = this.tokens[run.next - 1];
    if (first === undefined || last === undefined) return;
    first.payload = run;
    this.push(retype(first, type), { operand: true, amount: type === Unit });
    this.index = run.next - 1;
  }

  private push(token: Token, ends: { readonly operand?: boolean; readonly amount?: boolean }): void {
    this.result.push(token);
    this.afterOperand = ends.operand ?? false;
    this.afterAmount = ends.amount ?? false;
    this.state = 'none';
  }

  private note(problem: Problem | undefined): void {
    this.problem ??= problem;
  }

  private fail(problem: Problem): void {
    this.problem ??= problem;
    this.broken = true;
  }
}

/** Only a formula can be a substance that is spelt like a unit: names cannot, so `5 kg` is an amount of nothing. */
const isSubstanceWord = (token: Token | undefined): boolean =>
  token?.tokenType === WordToken && /^(?:[A-Z][a-z]?\d*)+$/.test(token.image);

function retype(token: Token, type: TokenType): Token {
  token.tokenType = type;
  token.tokenTypeIdx = type.tokenTypeIdx ?? token.tokenTypeIdx;
  return token;
}
