// Tokens into the small nodes of the tree: spans, numbers, words, texts, units. Pure functions of one or a few tokens.
// They do not know where in a line the tokens stand. Invariant: a node's span is exactly the text it was made of, and
// a number's value is finite (retag.ts has refused the others).
import { endOf, Formula, QuotedName } from './tokens.ts';
import type { Token } from './tokens.ts';
import type { NumberLiteral, Span, TextLiteral, UnitWords, Word } from './tree.ts';
import type { UnitRun } from './unit-run.ts';
import { asPhaseWord } from './words.ts';

/** From the start of one thing to the end of another. */
export const spanBetween = (first: { readonly span: Span }, last: { readonly span: Span }): Span => ({
  start: first.span.start,
  end: last.span.end,
});

export const spanOf = (token: Token): Span => ({ start: token.startOffset, end: endOf(token) });

/** A number with the sign that touches it. */
export function numberLiteral(sign: Token | undefined, digits: Token): NumberLiteral {
  const span = { start: sign?.startOffset ?? digits.startOffset, end: endOf(digits) };
  const factor = sign !== undefined && sign.image !== '+' ? -1 : 1;
  const fraction = readFraction(digits.image);
  if (fraction !== undefined) {
    const [numerator, denominator] = fraction;
    return { span, value: (factor * numerator) / denominator, fraction: [factor * numerator, denominator] };
  }
  return { span, value: factor * readDecimal(digits.image) };
}

/** The value of `6.4` or `1e−3`; infinite when it is too large. */
export const readDecimal = (image: string): number => Number(image.replace('\u2212', '-'));

/** Numerator and denominator of `1/2`, or undefined when the number is no fraction. */
export function readFraction(image: string): readonly [number, number] | undefined {
  const slash = image.indexOf('/');
  return slash < 0 ? undefined : [Number(image.slice(0, slash)), Number(image.slice(slash + 1))];
}

/** A name, formula, listed word or quoted name. */
export function wordNode(token: Token): Word {
  const span = spanOf(token);
  const { image } = token;
  if (image.startsWith("'")) return { kind: 'word', span, text: quotedText(image, "'"), form: 'quoted' };
  if (token.tokenType === Formula) {
    const written = /^(.*)\((g|l|cr|aq)\)$/.exec(image);
    const phase = asPhaseWord(written?.[2] ?? '');
    if (written === null || phase === undefined) return { kind: 'word', span, text: image, form: 'formula' };
    return { kind: 'word', span, text: written[1] ?? image, form: 'formula', phase };
  }
  return { kind: 'word', span, text: image, form: wordForm(image) };
}

/** `"…"`, whether closed or not. */
export const textNode = (token: Token): TextLiteral => ({
  kind: 'text',
  span: spanOf(token),
  value: quotedText(token.image, '"'),
  closed: isClosed(token),
});

/** Whether a text or quoted name has its closing quote. */
export const isClosed = (token: Token): boolean =>
  token.image.length > 1 && token.image.endsWith(token.tokenType === QuotedName ? "'" : '"');

/** The unit a retagged unit token stands for; without any unit word for a token that is none. */
export function unitNode(token: Token): UnitWords {
  const payload: unknown = token.payload;
  return isUnitRun(payload) ? payload.unit : { span: spanOf(token), tokens: [] };
}

/** A token's payload is untyped in the lexer's library; retag.ts alone writes it, and always with a unit's run. */
const isUnitRun = (payload: unknown): payload is UnitRun =>
  typeof payload === 'object' && payload !== null && 'unit' in payload;

/**
 * A name is `lower_snake`. A formula shows two elements and at least one digit or small letter (`NaCl`, `H2O`); plain
 * capitals (`K`, `CO`, `E3`) and everything else stay open.
 */
function wordForm(word: string): 'name' | 'formula' | 'open' {
  if (/^[a-z][a-z0-9_]*$/.test(word)) return 'name';
  const isFormula = /^(?:[A-Z][a-z]?(?:\d+|[\u2080-\u2089]+)?){2,}$/.test(word) && /[a-z\d\u2080-\u2089]/.test(word);
  return isFormula ? 'formula' : 'open';
}

function quotedText(image: string, quote: string): string {
  const isClosedText = image.length > 1 && image.endsWith(quote);
  return image.slice(1, isClosedText ? -1 : undefined);
}
