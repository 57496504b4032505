// Builds the composite nodes of an expression out of parts that were read already. Pure functions; what may stand
// beside what is parser.ts's business. Invariant: a node's span covers its parts, from the first to the last.
import { spanBetween, spanOf, unitNode } from './nodes.ts';
import { endOf } from './tokens.ts';
import type { Token } from './tokens.ts';
import type {
  Binary,
  Comparison,
  Connective,
  Expression,
  NumberLiteral,
  Phrase,
  PhraseItem,
  Portion,
  Quantity,
  Reference,
  Uncertainty,
  Word,
} from './tree.ts';
import { asBasisWord } from './words.ts';

export const connectiveNode = (token: Token): Connective => ({
  kind: 'connective',
  word: token.image,
  span: spanOf(token),
});

export const basisNode = (token: Token): NonNullable<Portion['basis']> => ({
  basis: asBasisWord(token.image) ?? 'mass',
  span: spanOf(token),
});

/**
 * A number with its unit and spread. In `44.0 ± 0.2 MJ/kg` the unit stands behind the spread but belongs to the whole:
 * it becomes the quantity's unit, and the spread has none of its own.
 */
export function quantityNode(
  number: NumberLiteral,
  unitToken: Token | undefined,
  uncertainty: Uncertainty | undefined,
): Quantity {
  if (uncertainty === undefined) {
    if (unitToken === undefined) return { kind: 'quantity', span: number.span, number };
    const unit = unitNode(unitToken);
    return { kind: 'quantity', span: spanBetween(number, unit), number, unit };
  }
  const span = spanBetween(number, uncertainty);
  if (unitToken !== undefined) return { kind: 'quantity', span, number, unit: unitNode(unitToken), uncertainty };
  const { unit, number: spread } = uncertainty;
  if (unit === undefined) return { kind: 'quantity', span, number, uncertainty };
  const spreadSpan = { start: uncertainty.span.start, end: spread.span.end };
  return { kind: 'quantity', span, number, unit, uncertainty: { span: spreadSpan, number: spread } };
}

/** A phrase of at least one item. */
export function phraseNode(items: readonly PhraseItem[]): Phrase {
  const [first] = items;
  const last = items.at(-1);
  const span = first === undefined || last === undefined ? { start: 0, end: 0 } : spanBetween(first, last);
  return { span, items };
}

/** `words of first`, or `words of first in second`: then `first` is the row. */
export function referenceNode(
  words: readonly Token[],
  of: Token,
  first: Word,
  second: Word | undefined,
  at: Expression | undefined,
): Reference {
  const wordsSpan = { start: (words[0] ?? of).startOffset, end: endOf(words.at(-1) ?? of) };
  const span = { start: wordsSpan.start, end: (at ?? second ?? first).span.end };
  const text = words.map((word) => word.image).join(' ');
  const node = { kind: 'reference' as const, span, words: text, wordsSpan, name: second ?? first };
  return { ...node, ...(second === undefined ? {} : { row: first }), ...(at === undefined ? {} : { at }) };
}

export function binaryNode(left: Expression, sign: Token, right: Expression): Expression {
  const operator = BINARY[sign.image] ?? '*';
  return { kind: 'binary', span: spanBetween(left, right), operator, operatorSpan: spanOf(sign), left, right };
}

export function comparisonNode(left: Expression, sign: Token, right: Expression): Expression {
  const operator = COMPARISON[sign.image] ?? '=';
  return { kind: 'comparison', span: spanBetween(left, right), operator, operatorSpan: spanOf(sign), left, right };
}

/** The operand with a minus for each sign, the nearest one innermost. */
export const unaryNode = (signs: readonly Token[], operand: Expression): Expression =>
  signs.reduceRight<Expression>((inner, sign) => {
    const span = { start: sign.startOffset, end: inner.span.end };
    return { kind: 'unary', span, operator: '-', operand: inner };
  }, operand);

export interface Exponent {
  readonly caret: Token;
  readonly signs: readonly Token[];
  readonly exponent: Expression;
}

/** `a^b^c` as a^(b^c). */
export function powerNode(first: Expression, further: readonly Exponent[]): Expression {
  const operands = [first, ...further.map(({ exponent }) => exponent)];
  let right: Expression | undefined;
  for (let index = further.length - 1; index >= 0; index--) {
    const step = further[index];
    const base = operands[index];
    if (step === undefined || base === undefined) break;
    const exponent = unaryNode(step.signs, right ?? step.exponent);
    right = binaryNode(base, step.caret, exponent);
  }
  return right ?? first;
}

const BINARY: Readonly<Record<string, Binary['operator']>> = {
  '+': '+',
  '-': '-',
  '−': '-',
  '*': '*',
  '·': '*',
  '⋅': '*',
  '/': '/',
  '^': '^',
};

const COMPARISON: Readonly<Record<string, Comparison['operator']>> = {
  '<': '<',
  '<=': '<=',
  '≤': '<=',
  '>': '>',
  '>=': '>=',
  '≥': '>=',
  '=': '=',
};
