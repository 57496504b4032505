// Text into raw tokens. Every character of a text lands in a token or in skipped white space; what nothing else takes
// becomes an `Other` token, so lexing never fails. Comments are kept apart, for the printer and for doc comments.
// It does not know lines, units or which words are reserved: retag.ts decides those from the neighbours.
// Invariant: tokens are in order, do not overlap, and their text and offsets are those of the source.
// Built on chevrotain's lexer; all token types carry a name of their own, so that minified code stays right.
import { createToken, Lexer } from 'chevrotain';
import type { IToken, TokenType } from 'chevrotain';

/**
 * One token: `image` is its text as written, `startOffset` where it starts, `tokenType` one of the types below.
 * `endOffset` is not filled in; use `endOf`.
 */
export type Token = IToken;

export interface LexedText {
  /** All tokens but comments, in order; newlines and semicolons are among them. */
  readonly tokens: Token[];
  /** Comments in order, from `#` to the last character of their line. */
  readonly comments: Token[];
}

/** Tokens of any text, in time linear in its length. */
export function lex(text: string): LexedText {
  const result = lexer.tokenize(text);
  return { tokens: result.tokens, comments: result.groups['comments'] ?? [] };
}

/** The offset behind a token's last character. */
export const endOf = (token: Token): number => token.startOffset + token.image.length;

/** The bare word that starts at an offset, or an empty text. */
export const wordAt = (text: string, offset: number): string =>
  text.slice(offset, offset + matchesAt(wordPattern, text, offset));

/** Whether words alone and then a colon stand at an offset: the head of an entry. */
export const startsEntry = (text: string, offset: number): boolean => matchesAt(entryHeadPattern, text, offset) > 0;

/** Letters a bare word may be made of: Latin, Greek, Cyrillic, and the signs for ohm, kelvin and ångström. */
const LETTER =
  'A-Za-z_\\u00aa\\u00b5\\u00c0-\\u00d6\\u00d8-\\u00f6\\u00f8-\\u024f\\u0370-\\u03ff\\u0400-\\u04ff\\u2126\\u212a\\u212b';
const SUBSCRIPT = '\\u2080-\\u2089';
const SUPERSCRIPT = '\\u2070\\u00b9\\u00b2\\u00b3\\u2074-\\u2079';
const WORD =
  `[${LETTER}][${LETTER}\\d${SUBSCRIPT}]*(?:-[${LETTER}\\d][${LETTER}\\d${SUBSCRIPT}]*)*` +
  `(?:\\u207b?[${SUPERSCRIPT}]+)?`;

const SPACES = '[ \\t\\v\\f\\u00a0\\u2000-\\u200a\\u202f\\u3000\\ufeff]';

const COUNT = `(?:\\d+(?:\\.\\d+)?|[${SUBSCRIPT}]+(?:\\.[${SUBSCRIPT}]+)?)`;
const ATOM = `[A-Z][a-z]?${COUNT}?`;
const INNER_GROUP = `\\((?:${ATOM})+\\)${COUNT}?`;
const GROUP = `\\((?:${ATOM}|${INNER_GROUP})+\\)`;
const CORE = `(?:${ATOM}|${GROUP}${COUNT}?)+`;
// A hydrate's dot is followed by a number or by something that holds one, so that `W·K` in a unit is left alone.
const HYDRATE = `(?:[.\\u00b7\\u22c5](?:\\d+(?:[./]\\d+)?|(?=[A-Za-z]+[\\d${SUBSCRIPT}]))${CORE})*`;
const PHASE = '\\((?:g|l|cr|aq)\\)';
const CHARGE_FOLLOWS = `(?=[\\s),;}]|$|${PHASE})`;
const CHARGE = `(?:\\^\\d*[+\\-\\u2212]|[+\\-\\u2212]+|[${SUPERSCRIPT}]*[\\u207a\\u207b])${CHARGE_FOLLOWS}`;
const ELECTRON = `e[\\-\\u2212\\u207b]${CHARGE_FOLLOWS}`;

const wordPattern = new RegExp(WORD, 'y');
const entryHeadPattern = new RegExp(`${WORD}(?:${SPACES}+(?:${WORD}|\\d+(?=${SPACES}|:)))*${SPACES}*:`, 'y');
const formulaPattern = new RegExp(
  `(?:${ELECTRON}(?:${PHASE})?|(?:${GROUP}${COUNT})?${CORE}${HYDRATE}(?:${CHARGE})?(?:${PHASE})?)`,
  'y',
);
const groupFirstPattern = new RegExp(`${GROUP}${COUNT}`, 'y');
const phasePattern = new RegExp(PHASE, 'y');

/**
 * What only a formula can be: brackets, a charge, a hydrate, a broken count or an attached phase. Everything shorter
 * (`Na2CO3`, `K`, `main`) is left to the plain word, because position decides what it is.
 */
function matchFormula(text: string, offset: number): [string] | null {
  if (text[offset] === '(' && !matchesAt(groupFirstPattern, text, offset)) return null;
  const wordLength = matchesAt(wordPattern, text, offset);
  const formulaLength = matchesAt(formulaPattern, text, offset);
  if (formulaLength > wordLength) return [text.slice(offset, offset + formulaLength)];
  const phaseLength = wordLength > 0 ? matchesAt(phasePattern, text, offset + wordLength) : 0;
  return phaseLength > 0 ? [text.slice(offset, offset + wordLength + phaseLength)] : null;
}

function matchesAt(pattern: RegExp, text: string, offset: number): number {
  pattern.lastIndex = offset;
  return pattern.test(text) ? pattern.lastIndex - offset : 0;
}

const LATIN_LETTERS_AND_BRACKET = Array.from('ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz(');

// Types the lexer itself gives.
const Space = createToken({
  name: 'Space',
  pattern: new RegExp(`${SPACES}+`),
  group: Lexer.SKIPPED,
});
export const Newline = createToken({ name: 'Newline', pattern: /\r\n|\r|\n/, line_breaks: true });
export const Semicolon = createToken({ name: 'Semicolon', pattern: ';' });
const Comment = createToken({ name: 'Comment', pattern: /#[^\r\n]*/, group: 'comments', line_breaks: false });
/** `"…"`, closed or ended by the line's end. */
export const Text = createToken({ name: 'Text', pattern: /"[^"\r\n]*"?/, line_breaks: false });
/** `'…'`, closed or ended by the line's end. */
export const QuotedName = createToken({ name: 'QuotedName', pattern: /'[^'\r\n]*'?/, line_breaks: false });
/** A date outside text. */
export const DateLike = createToken({
  name: 'DateLike',
  pattern: /\d{4}-\d{1,2}-\d{1,2}|\d{1,2}\.\d{1,2}\.\d{2,4}|\d{1,2}\/\d{1,2}\/\d{2,4}/,
});
/** `44,0`: digits, a comma and digits without a space. */
export const DecimalComma = createToken({ name: 'DecimalComma', pattern: /\d+(?:,\d+)+(?:\.\d+)?(?:[eE][+-]?\d+)?/ });
/** `1_000` */
export const GroupedNumber = createToken({ name: 'GroupedNumber', pattern: /\d+(?:_\d+)+(?:\.\d+)?/ });
/** Without a sign: `6.4`, `1/2`, `1e-3`. */
export const NumberToken = createToken({
  name: 'Number',
  pattern: /\d+\/\d+(?![\d.])|(?:\d+(?:\.\d+)?|\.\d+)(?:[eE][+\-\u2212]?\d+)?/,
});
/** A formula that cannot be a plain word: `Ca(OH)2`, `Na+`, `MgCl2.6H2O`, `Na(cr)`. */
export const Formula = createToken({
  name: 'Formula',
  pattern: { exec: matchFormula },
  start_chars_hint: LATIN_LETTERS_AND_BRACKET,
  line_breaks: false,
});
/** Any other word: names, plain formulas, unit words, reserved words, listed words with hyphens. */
export const WordToken = createToken({ name: 'Word', pattern: new RegExp(WORD), line_breaks: false });
/** `%`, `‰`, `°C`: units that are not spelt with letters alone. */
export const UnitSign = createToken({ name: 'UnitSign', pattern: /[%\u2030\u2103\u2109]|\u00b0[A-Za-z]?/ });
export const Comma = createToken({ name: 'Comma', pattern: ',' });
export const Colon = createToken({ name: 'Colon', pattern: ':' });
export const OpenBrace = createToken({ name: 'OpenBrace', pattern: '{' });
export const CloseBrace = createToken({ name: 'CloseBrace', pattern: '}' });
export const OpenBracket = createToken({ name: 'OpenBracket', pattern: '(' });
export const CloseBracket = createToken({ name: 'CloseBracket', pattern: ')' });
/** `->` and `→` */
export const Arrow = createToken({ name: 'Arrow', pattern: /[-\u2212]>|\u2192/ });
/** `±` and `+/-` */
export const PlusMinus = createToken({ name: 'PlusMinus', pattern: /\u00b1|\+\/[-\u2212]/ });
export const Plus = createToken({ name: 'Plus', pattern: '+' });
/** `-` and `−`, before it is known whether it is a sign or an operator. */
export const Minus = createToken({ name: 'Minus', pattern: /[-\u2212]/ });
export const Star = createToken({ name: 'Star', pattern: '*' });
export const Dot = createToken({ name: 'Dot', pattern: /[\u00b7\u22c5]/ });
export const Slash = createToken({ name: 'Slash', pattern: '/' });
export const Caret = createToken({ name: 'Caret', pattern: '^' });
/** `<`, `<=`, `≤`, `>`, `>=`, `≥`, `=` */
export const Compare = createToken({ name: 'Compare', pattern: /[<>]=?|[\u2264\u2265]|=/ });
/** One character (or surrogate pair) that means nothing here. */
export const Other = createToken({
  name: 'Other',
  pattern: /[\ud800-\udbff][\udc00-\udfff]|[\u0000-\uffff]/,
  line_breaks: false,
});

/** In the order they are tried. */
const lexedTypes: TokenType[] = [
  Space,
  Newline,
  Semicolon,
  Comment,
  Text,
  QuotedName,
  DateLike,
  DecimalComma,
  GroupedNumber,
  NumberToken,
  Formula,
  WordToken,
  UnitSign,
  Comma,
  Colon,
  OpenBrace,
  CloseBrace,
  OpenBracket,
  CloseBracket,
  Arrow,
  PlusMinus,
  Plus,
  Minus,
  Star,
  Dot,
  Slash,
  Caret,
  Compare,
  Other,
];

// Types that only retagging gives: what a raw token turns out to be where it stands.
const retagged = (name: string): TokenType => createToken({ name, pattern: Lexer.NA });
/** A unit's whole run of tokens as one, its parts in `payload`. */
export const Unit = retagged('Unit');
/** The same without a number before it. */
export const LoneUnitToken = retagged('LoneUnit');
/** The `-` or `+` of a number literal. */
export const Sign = retagged('Sign');
export const UnaryMinus = retagged('UnaryMinus');
/** A minus between two values that lacks a space on a side. */
export const TightMinus = retagged('TightMinus');
/** The `±` behind `within`. */
export const TolerancePlusMinus = retagged('TolerancePlusMinus');
/** A word directly followed by `(`. */
export const CallName = retagged('CallName');
/** A word before the `of` of a reference. */
export const ReferenceWord = retagged('ReferenceWord');
export const ReferenceOf = retagged('ReferenceOf');
/** The `in` behind a substance. */
export const MembershipIn = retagged('MembershipIn');
/** The `at` of a reference, when a value follows. */
export const ReferenceAt = retagged('ReferenceAt');
/** The `by` before a basis, in a membership. */
export const MembershipBy = retagged('MembershipBy');
/** `mass`, `mole`, `volume` behind an amount or `by`. */
export const Basis = retagged('Basis');
export const Rest = retagged('Rest');
/** Any reserved word of a phrase that is no part of an operand. */
export const ConnectiveToken = retagged('Connective');
/** `within` in a claim. */
export const WithinToken = retagged('Within');
/** A comparison sign in a claim; elsewhere it stays `Compare` and is refused. */
export const ClaimCompare = retagged('ClaimCompare');
/** `let`, `use`, `expect`, `scenario`, `acknowledge` where they mean nothing. */
export const StrayReserved = retagged('StrayReserved');
/** The last word of a portion. */
export const SubstanceToken = retagged('Substance');

/** Everything the parser must know of. */
export const parserTypes: TokenType[] = [
  ...lexedTypes,
  Unit,
  LoneUnitToken,
  Sign,
  UnaryMinus,
  TightMinus,
  TolerancePlusMinus,
  CallName,
  ReferenceWord,
  ReferenceOf,
  MembershipIn,
  ReferenceAt,
  MembershipBy,
  Basis,
  Rest,
  ConnectiveToken,
  WithinToken,
  ClaimCompare,
  StrayReserved,
  SubstanceToken,
];

/** The patterns are checked by a test, and not again whenever a program starts. */
export function makeLexer(skipValidations = true): Lexer {
  return new Lexer(lexedTypes, { positionTracking: 'onlyOffset', ensureOptimizations: true, skipValidations });
}

const lexer = makeLexer();
