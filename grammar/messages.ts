// The words of syntax problems that show in a single line's tokens: what the thing is, what is needed, one next step.
// Token names and the parser library's own sentences never reach the user; sections.ts has its words in
// section-messages.ts. Invariant: each function returns one problem, placed on what the user can see, with a fix only
// where the mend is mechanical. It does not decide whether something is wrong, but for numbers and closing quotes.
import { isClosed, readDecimal, readFraction, spanOf } from './nodes.ts';
import * as t from './tokens.ts';
import type { Token } from './tokens.ts';
import type { Problem, Span } from './tree.ts';

/** The parts of a line that have words of their own. */
export type PlaceInWords = 'value' | 'claim' | 'expression' | 'portion' | 'equation';

export const problems = {
  unclosedBracket: (open: Token): Problem => ({
    code: 'syntax/unclosed',
    span: spanOf(open),
    message: 'This bracket is not closed. Add a `)` on the same line.',
  }),
  unopenedBracket: (close: Token): Problem => ({
    code: 'syntax/unexpected',
    span: spanOf(close),
    message: 'This `)` closes no bracket. Remove it, or add the `(` that belongs to it.',
  }),
  tooDeep: (open: Token): Problem => ({
    code: 'syntax/too-deep',
    span: spanOf(open),
    message: 'Brackets are nested more than 64 deep here. Give a part of it a name with `let`.',
  }),
  tooLong: (operator: Token): Problem => ({
    code: 'syntax/too-deep',
    span: spanOf(operator),
    message: 'This line holds more than 1000 operators. Give a part of it a name with `let`.',
  }),
  tightMinus: (minus: Token): Problem => ({
    code: 'syntax/unexpected',
    span: spanOf(minus),
    message: 'A minus between two values needs a space on both sides: `a - b`.',
    fix: { title: 'Put spaces around the minus', span: spanOf(minus), newText: ' - ' },
  }),
  toleranceMissing: (target: Span): Problem => ({
    code: 'syntax/missing',
    span: target,
    message: '`within` needs to know how far from this is allowed. Write for example `within 34 MJ/kg ± 1 MJ/kg`.',
  }),
  hyphenatedName: (word: Token): Problem => ({
    code: 'syntax/unexpected',
    span: spanOf(word),
    message: `\`${shorten(word.image)}\` is no name. A minus needs a space on both sides; a name with a hyphen needs quotes.`,
    fix: { title: 'Put spaces around the minus', span: spanOf(word), newText: word.image.replaceAll('-', ' - ') },
  }),
};

/** What is wrong with a number, looking at the token before it; undefined when it can be read. */
export function checkNumber(number: Token, previous: Token | undefined): Problem | undefined {
  const span = spanOf(number);
  const { image } = number;
  if (number.tokenType === t.DecimalComma) return decimalComma(span, image);
  if (number.tokenType === t.DateLike) {
    return {
      code: 'syntax/unexpected',
      span,
      message: `\`${image}\` looks like a date. A date stands only inside text: \`"${image}"\`.`,
      fix: { title: 'Make it a text', span, newText: `"${image}"` },
    };
  }
  if (number.tokenType === t.GroupedNumber) return groupedNumber(span, image, image.replaceAll('_', ''));
  if (previous?.tokenType === t.NumberToken) return twoNumbers(previous, number);
  const fraction = readFraction(image);
  if (fraction !== undefined && fraction[1] === 0) {
    return { code: 'syntax/unexpected', span, message: `\`${image}\` divides by zero.` };
  }
  const value = fraction === undefined ? readDecimal(image) : Math.max(...fraction);
  if (!Number.isFinite(value)) {
    const message = `\`${shorten(image)}\` is too large for a number here (the largest is about 1.8e308).`;
    return { code: 'syntax/unexpected', span, message };
  }
  if (value === 0 && /^[^eE]*[1-9]/.test(image)) {
    const message = `\`${shorten(image)}\` is too small to be told from zero. Write \`0\`, or a larger number.`;
    return { code: 'syntax/unexpected', span, message };
  }
  return undefined;
}

/** A text or quoted name that lacks its closing quote, or a quoted name that holds nothing. */
export function checkToken(token: Token): Problem | undefined {
  if (token.tokenType !== t.Text && token.tokenType !== t.QuotedName) return undefined;
  const span = spanOf(token);
  const quote = token.image.charAt(0);
  const thing = token.tokenType === t.Text ? 'text' : 'quoted name';
  if (!isClosed(token)) {
    return {
      code: 'syntax/unclosed',
      span,
      message: `This ${thing} has no closing \`${quote}\`; it ends at the end of its line.`,
      fix: { title: `Add the closing ${quote}`, span: { start: span.end, end: span.end }, newText: quote },
    };
  }
  if (token.tokenType === t.QuotedName && token.image.length === 2) {
    return { code: 'syntax/missing', span, message: 'There is no name between these quotes.' };
  }
  return undefined;
}

/** A line that ends too early: `last` is its last token, `line` where it stands. */
export function endsEarly(last: Token | undefined, place: PlaceInWords, { start, end }: Span): Problem {
  if (last === undefined) return { code: 'syntax/missing', span: { start, end }, message: 'A value is missing here.' };
  return { code: 'syntax/missing', span: spanOf(last), message: endsEarlyMessage(last, place) };
}

/** A token that does not fit behind `previous`. */
export function doesNotFit(actual: Token, previous: Token | undefined, place: PlaceInWords): Problem {
  return { code: 'syntax/unexpected', span: spanOf(actual), message: doesNotFitMessage(actual, previous, place) };
}

/** A line of terms joined by `+` that has no arrow; read as a portion, its first misfit would be told misleadingly. */
export const arrowMissing = (actual: Token): Problem => ({
  code: 'syntax/missing',
  span: spanOf(actual),
  message: 'This looks like an equation without its arrow. Write `->` between its sides, as in `2 Na + H2 -> 2 NaH`.',
});

function endsEarlyMessage(last: Token, place: PlaceInWords): string {
  switch (last.tokenType) {
    case t.Comma:
      return 'Nothing stands behind this comma. Add the next value, or remove the comma.';
    case t.Arrow:
      return 'The right side of this equation is missing. Write for example `2 Na + H2 -> 2 NaH`.';
    case t.PlusMinus:
    case t.TolerancePlusMinus:
      return 'A number is missing behind `±`. Write for example `44.0 ± 0.2 MJ/kg`.';
    case t.ReferenceOf:
    case t.MembershipIn:
      return `A name is missing behind \`${last.image}\`.`;
    case t.CallName:
      return `The values of \`${last.image}\` are missing. Write them in brackets.`;
  }
  if (place === 'portion' && endsAmount.has(last.tokenType)) {
    return 'This portion names no substance. Write for example `30 % mass sodium`.';
  }
  if (place === 'equation' && last.tokenType === t.NumberToken) return 'A substance is missing behind this number.';
  return `A value is missing behind \`${shorten(last.image)}\`.`;
}

function doesNotFitMessage(actual: Token, previous: Token | undefined, place: PlaceInWords): string {
  const image = shorten(actual.image);
  switch (actual.tokenType) {
    case t.Other:
      return `The character \`${printable(image)}\` means nothing here. Remove it, or put it inside text.`;
    case t.OpenBrace:
      return 'A `{` stands only behind the kind and name of a definition. Remove it.';
    case t.Colon:
      return place === 'portion' || place === 'equation'
        ? 'A colon stands only behind the words of an entry, as in `words: value`.'
        : 'A colon does not fit here. Start a new line for another entry.';
    case t.Compare:
    case t.ClaimCompare:
      return place === 'claim'
        ? 'Only one comparison can stand here. Write the second one as a claim of its own.'
        : `\`${image}\` compares, and a comparison stands only in \`expect\` and in \`until\`.`;
    case t.PlusMinus:
    case t.TolerancePlusMinus:
      return '`±` belongs right behind a number and its unit, as in `44.0 ± 0.2 MJ/kg`.';
    case t.Arrow:
      return 'An arrow belongs in the equation of a reaction, on a line of its own, and only once.';
    case t.Semicolon:
    case t.Newline:
      return 'The line ends too early.';
    case t.ConnectiveToken:
    case t.StrayReserved:
    case t.WithinToken:
      return `\`${image}\` is a reserved word and does not fit here. A name that is spelt so needs quotes.`;
    case t.UnitSign:
    case t.LoneUnitToken:
      return `The unit \`${image}\` does not fit here. A unit stands behind a number, as in \`30 %\`.`;
    case t.CloseBracket:
      return 'A value is missing before this `)`.';
    case t.Comma:
      return place === 'portion' || place === 'equation'
        ? 'A comma does not fit here. Write each portion on a line of its own.'
        : 'A value is missing before this comma.';
  }
  if (previous === undefined && place === 'portion') {
    return 'This line is neither an entry nor a portion. An entry has a colon behind its words: `words: value`; a portion starts with its amount: `30 % mass sodium`.';
  }
  if (place === 'portion') {
    return `\`${image}\` does not fit here. A portion is an amount and one substance, as in \`30 % mass sodium\`; a name that holds spaces needs quotes.`;
  }
  if (place === 'equation') {
    return `\`${image}\` does not fit here. An equation joins its terms with \`+\` and its sides with \`->\`.`;
  }
  const before = previous === undefined ? '' : ` behind \`${shorten(previous.image)}\``;
  if (startsOperand.has(actual.tokenType) && previous !== undefined && !joins.has(previous.tokenType)) {
    return `\`${image}\` does not fit${before}. Is an operator missing between them, such as \`*\`?`;
  }
  return `A value is needed here, but \`${image}\` stands${before === '' ? ' first' : before}.`;
}

const endsAmount = new Set([t.NumberToken, t.Unit, t.Basis, t.Rest, t.CloseBracket]);
const startsOperand = new Set([
  t.NumberToken,
  t.Sign,
  t.WordToken,
  t.Formula,
  t.QuotedName,
  t.Text,
  t.CallName,
  t.ReferenceWord,
  t.OpenBracket,
  t.Basis,
  t.SubstanceToken,
]);
const joins = new Set([t.Plus, t.Minus, t.UnaryMinus, t.Star, t.Dot, t.Slash, t.Caret, t.Comma, t.OpenBracket]);

function decimalComma(span: Span, image: string): Problem {
  const isPlain = /^\d+,\d+(?:[eE][+-]?\d+)?$/.test(image);
  const withPoint = image.replace(',', '.');
  if (/^[1-9]\d{0,2},\d{3}$/.test(image)) {
    const joined = image.replace(',', '');
    const message = `\`${image}\` could be \`${joined}\` or \`${withPoint}\`. Write the one that is meant, without the comma.`;
    return { code: 'syntax/unexpected', span, message };
  }
  if (!isPlain) {
    const message = `\`${shorten(image)}\` is not a number: write the decimals behind a point, and no commas in between.`;
    return { code: 'syntax/unexpected', span, message };
  }
  return {
    code: 'syntax/unexpected',
    span,
    message: `\`${image}\` has a decimal comma. Write \`${withPoint}\`; two values need a space behind the comma.`,
    fix: { title: `Write ${withPoint}`, span, newText: withPoint },
  };
}

function groupedNumber(span: Span, image: string, joined: string): Problem {
  return {
    code: 'syntax/unexpected',
    span,
    message: `\`${shorten(image)}\` is not one number here. Write it without gaps: \`${shorten(joined)}\`.`,
    fix: { title: `Write ${shorten(joined)}`, span, newText: joined },
  };
}

function twoNumbers(first: Token, second: Token): Problem {
  const span = { start: first.startOffset, end: t.endOf(second) };
  const areGroups = /^\d{1,3}$/.test(first.image) && /^\d{3}(?:\.\d+)?$/.test(second.image);
  if (areGroups) return groupedNumber(span, `${first.image} ${second.image}`, first.image + second.image);
  const message = `Two numbers stand side by side: \`${first.image}\` and \`${second.image}\`. Is a comma or an operator missing?`;
  return { code: 'syntax/unexpected', span, message: message };
}

export const shorten = (text: string): string => (text.length > 40 ? `${text.slice(0, 39)}…` : text);

/** A character that cannot be seen is named by its number. */
const printable = (character: string): string =>
  /^[\p{L}\p{N}\p{P}\p{S}]+$/u.test(character)
    ? character
    : `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`;
