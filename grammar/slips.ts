// Slips of the trade that can be told by name: another book's arrow or phase mark, `wt%`, `bar(g)`, a figure without its
// `of`. It is asked only for a line that could not be read, before messages.ts says the general thing, and answers with
// one problem on what was written and, where the mend is mechanical, a fix. It does not know entries, units or names.
// Invariant: whatever a fix writes is read by this grammar; a slip that is not certain is left to the general words.
import { doesNotFit } from './messages.ts';
import type { PlaceInWords } from './messages.ts';
import { spanOf } from './nodes.ts';
import * as t from './tokens.ts';
import type { Token } from './tokens.ts';
import type { Problem, Span } from './tree.ts';

/** A line's raw tokens, the one that does not fit (absent at the line's end) and the one before it. */
export interface Misfit {
  readonly tokens: readonly Token[];
  readonly actual: Token | undefined;
  readonly previous: Token | undefined;
  readonly place: PlaceInWords;
}

/** The slip a line holds, where it is one of those known here. */
export function knownSlip(misfit: Misfit): Problem | undefined {
  return (
    foreignPhase(misfit) ??
    foreignArrow(misfit) ??
    strangeCharacter(misfit) ??
    portionsInARow(misfit) ??
    amountBehind(misfit) ??
    tradeShare(misfit) ??
    tradeUnit(misfit) ??
    coefficient(misfit) ??
    claimForm(misfit) ??
    figureWithoutOf(misfit)
  );
}

const unexpected = (span: Span, message: string, fix?: { title: string; newText: string }): Problem => ({
  code: 'syntax/unexpected',
  span,
  message,
  ...(fix === undefined ? {} : { fix: { ...fix, span } }),
});

const touches = (left: Token | undefined, right: Token | undefined): boolean =>
  left !== undefined && right !== undefined && t.endOf(left) === right.startOffset;

const phases: ReadonlyMap<string, string> = new Map([
  ...['s', 'c', 'sol', 'solid'].map((mark) => [mark, 'cr'] as const),
  ...['l', 'liq', 'liquid'].map((mark) => [mark, 'l'] as const),
  ...['g', 'gas', 'v', 'vap', 'vapor', 'vapour'].map((mark) => [mark, 'g'] as const),
  ...['aq', 'aqueous'].map((mark) => [mark, 'aq'] as const),
]);

/** `Na(s)`, `H2O(liq)`: a phase mark of another book, attached to a formula. */
function foreignPhase({ tokens, place }: Misfit): Problem | undefined {
  for (const [index, open] of tokens.entries()) {
    const [substance, mark, close] = [tokens[index - 1], tokens[index + 1], tokens[index + 2]];
    if (open.tokenType !== t.OpenBracket || mark?.tokenType !== t.WordToken || !touches(substance, open)) continue;
    if (close?.tokenType !== t.CloseBracket) continue;
    const isFormula = place === 'equation' || place === 'portion' || /^[A-Z]/.test(substance?.image ?? '');
    if (!isFormula) continue;
    const phase = phases.get(mark.image.toLowerCase());
    const span = { start: open.startOffset, end: t.endOf(close) };
    const known = 'The phases are `(g)`, `(l)`, `(cr)` for a solid, and `(aq)`.';
    const message = `\`(${mark.image})\` is no phase here. ${known}`;
    return unexpected(
      span,
      message,
      phase === undefined ? undefined : { title: `Write (${phase})`, newText: `(${phase})` },
    );
  }
  return undefined;
}

const arrowParts = new Set([t.Compare, t.Arrow, t.Minus]);
const otherArrows = /^[\u21cc\u21c4\u2194\u21d2\u21d4\u27f6\u21c6\u27f7\u2192]$/;

/** `=`, `=>`, `-->`, `<->`, `⇌` between the sides of an equation, and `=` where an entry has its colon. */
function foreignArrow({ tokens, place }: Misfit): Problem | undefined {
  if (place !== 'equation' && place !== 'portion') return undefined;
  const isPart = (token: Token | undefined): token is Token =>
    token !== undefined && (arrowParts.has(token.tokenType) || otherArrows.test(token.image));
  for (let index = 0; index < tokens.length; index++) {
    const first = tokens[index];
    if (!isPart(first)) continue;
    let last = first;
    let image = first.image;
    for (let next = tokens[index + 1]; isPart(next) && touches(last, next); next = tokens[++index + 1]) {
      last = next;
      image += next.image;
    }
    if (!/[=<>\u2190-\u21ff\u27f0-\u27ff]/.test(image) || /^[-\u2212]>$|^\u2192$/.test(image)) continue;
    const span = { start: first.startOffset, end: t.endOf(last) };
    const before = tokens.slice(0, tokens.indexOf(first));
    const isEntry = before.length > 0 && before.every(({ image: word }) => /^[a-z][a-z-]*$/.test(word));
    if (isEntry && image === '=') {
      const words = before.map(({ image: word }) => word).join(' ');
      const fixed = { start: t.endOf(before.at(-1) ?? first), end: span.end };
      return {
        ...unexpected(span, `An entry has a colon behind its words: \`${words}: …\`.`),
        fix: { title: 'Write a colon', span: fixed, newText: ':' },
      };
    }
    const isEquation = place === 'equation' || tokens.some(({ tokenType }) => tokenType === t.Plus);
    const isFormula = /^[A-Z]/.test(before.at(-1)?.image ?? '');
    if (!isEquation && !isFormula) continue;
    return unexpected(span, `\`${image}\` does not fit here. The sides of an equation are joined by \`->\`.`, {
      title: 'Write ->',
      newText: '->',
    });
  }
  return undefined;
}

/** A character that means nothing is the slip, whatever of its line is tagged differently because of it. */
function strangeCharacter({ tokens, place }: Misfit): Problem | undefined {
  const index = tokens.findIndex(({ tokenType }) => tokenType === t.Other);
  const odd = tokens[index];
  if (odd === undefined) return undefined;
  const scale = tokens[index + 1];
  const isDegree = /^[\u00ba\u02da]$/.test(odd.image);
  if (!isDegree) return doesNotFit(odd, tokens[index - 1], place);
  const isTemperature = touches(odd, scale) && /^[CF]$/.test(scale?.image ?? '');
  const written = isTemperature ? `\u00b0${scale?.image ?? ''}` : '\u00b0C';
  const message = `\`${odd.image}\` is not the sign for a degree. Write \`${written}\`, or \`degC\`.`;
  return unexpected(spanOf(odd), message, { title: 'Write \u00b0', newText: '\u00b0' });
}

const basisWords: ReadonlyMap<string, string> = new Map([
  ...['wt', 'weight', 'w', 'm', 'mass'].map((word) => [word, 'mass'] as const),
  ...['vol', 'v', 'volume'].map((word) => [word, 'volume'] as const),
  ...['mol', 'molar', 'moles', 'mole'].map((word) => [word, 'mole'] as const),
]);

/** Units as words, in small letters. Those of `3 kg sodium`, where only a portion's last word may be unknown. */
const unitNames: ReadonlyMap<string, string> = new Map([
  ...['kg', 'kgs', 'kilo', 'kilos', 'kilogram', 'kilograms'].map((word) => [word, 'kg'] as const),
  ...['gram', 'grams', 'gr', 'gm'].map((word) => [word, 'g'] as const),
  ...['tonne', 'tonnes', 'mt'].map((word) => [word, 't'] as const),
  ...['litre', 'litres', 'liter', 'liters', 'ltr'].map((word) => [word, 'L'] as const),
  ...['mole', 'moles', 'mols'].map((word) => [word, 'mol'] as const),
]);

/** `30 percent`, `30 wt%`, `30 % vol`, `30 % w/w`, `30 % by mass`: how other papers write a share. */
function tradeShare({ tokens, actual, place }: Misfit): Problem | undefined {
  if (place !== 'portion' || actual === undefined) return undefined;
  const index = tokens.findIndex(({ startOffset }) => startOffset === actual.startOffset);
  const [word, next, beyond] = tokens.slice(index, index + 3);
  if (index < 1 || word === undefined) return undefined;
  const text = word.image.toLowerCase();
  if (text === 'percent' || text === 'pct') {
    return unexpected(spanOf(word), `\`${word.image}\` is written \`%\` here.`, { title: 'Write %', newText: '%' });
  }
  if (text === 'parts') {
    const message = 'A portion is a share in `%`, or a mass, an amount or a volume such as `3 kg`.';
    return unexpected(spanOf(word), message);
  }
  const unit = unitNames.get(text);
  if (unit !== undefined && next !== undefined && tokens[index - 1]?.tokenType === t.NumberToken) {
    const message = `\`${word.image}\` is written \`${unit}\` here.`;
    return unexpected(spanOf(word), message, { title: `Write ${unit}`, newText: unit });
  }
  const isBy = text === 'by';
  const basis = basisWords.get(isBy ? (next?.image.toLowerCase() ?? '') : text);
  if (basis === undefined) return undefined;
  const isTwice = next?.tokenType === t.Slash && beyond?.image === word.image;
  const isPercent = !isBy && next?.image === '%';
  const last = isTwice ? beyond : isBy || isPercent ? next : word;
  if (last === undefined || last === tokens.at(-1)) return undefined; // then it is the substance
  const newText = isPercent ? `% ${basis}` : basis;
  const span = { start: word.startOffset, end: t.endOf(last) };
  const said = isBy ? `by ${next?.image ?? ''}` : isTwice ? `${word.image}/${beyond.image}` : word.image;
  const message = `\`${said}${isPercent ? '%' : ''}\` is written \`${newText}\` here, as in \`30 % ${basis} methanol\`.`;
  return unexpected(span, message, { title: `Write ${newText}`, newText });
}

/** `30 % sodium, 70 % gas_oil`: portions on one line, or with commas at their ends. */
function portionsInARow({ tokens, place }: Misfit): Problem | undefined {
  if (place !== 'portion') return undefined;
  const index = tokens.findIndex(({ tokenType }) => tokenType === t.Comma);
  const [comma, next] = [tokens[index], tokens[index + 1]];
  if (index < 2 || comma === undefined) return undefined;
  const amount = tokens[0]?.tokenType;
  if (amount !== t.NumberToken && amount !== t.OpenBracket && amount !== t.Rest) return undefined;
  const message = 'A portion ends without a comma. Write each one on a line of its own, or a `;` between two.';
  return next === undefined
    ? unexpected(spanOf(comma), message, { title: 'Remove the comma', newText: '' })
    : unexpected(spanOf(comma), message, { title: 'Write ;', newText: ';' });
}

/** `gas_oil 70 %`: the amount behind its substance. */
function amountBehind({ tokens, actual, place }: Misfit): Problem | undefined {
  const [substance, number, percent, basis, more] = tokens;
  if (place !== 'portion' || substance === undefined || actual?.startOffset !== substance.startOffset) return undefined;
  if (number?.tokenType !== t.NumberToken || percent === undefined || more !== undefined) return undefined;
  if (/^[^a-z'%]/i.test(substance.image) || !/^(?:%|[a-z]+)$/i.test(percent.image)) return undefined;
  if (basis !== undefined && !/^(?:mass|mole|volume)$/.test(basis.image)) return undefined;
  const amount = [number, percent, ...(basis === undefined ? [] : [basis])].map(({ image }) => image).join(' ');
  const newText = `${amount} ${substance.image}`;
  const span = { start: substance.startOffset, end: t.endOf(basis ?? percent) };
  const message = `The amount of a portion stands before its substance: \`${newText}\`.`;
  return unexpected(span, message, { title: `Write ${newText}`, newText });
}

const pressureOf: ReadonlyMap<string, string> = new Map([
  ['bar gauge', 'barg'],
  ['bar abs', 'bar'],
  ['bar absolute', 'bar'],
  ['psi gauge', 'psig'],
  ['psi abs', 'psi'],
  ['psi absolute', 'psi'],
]);

/** `5 bar gauge`, `2 bar(g)`, `20 deg C`, `10 in`: units with a second word, or spelt like a word of the language. */
function tradeUnit({ tokens, actual }: Misfit): Problem | undefined {
  const index = tokens.findIndex(({ startOffset }) => startOffset === actual?.startOffset);
  const [before, word, next] = [tokens[index - 1], tokens[index], tokens[index + 1]];
  if (before === undefined || word === undefined) return undefined;
  const write = (first: Token, last: Token, unit: string): Problem => {
    const gap = touches(first, last) || first === last ? '' : ' ';
    const said = first === last ? first.image : `${first.image}${gap}${last.image}`;
    const span = { start: first.startOffset, end: t.endOf(last) };
    return unexpected(span, `\`${said}\` is written \`${unit}\` here.`, { title: `Write ${unit}`, newText: unit });
  };
  const pressure = pressureOf.get(`${before.image} ${word.image}`);
  if (pressure !== undefined) return write(before, word, pressure);
  if (before.tokenType !== t.NumberToken) return undefined;
  if (/^(?:bar|psi)\(g\)$/.test(word.image)) return write(word, word, `${word.image.slice(0, 3)}g`);
  if (word.image === 'in') return write(word, word, 'inch');
  if (next !== undefined && /^deg(?:rees?)?$/.test(word.image) && /^[CF]$/.test(next.image)) {
    return write(word, next, `deg${next.image}`);
  }
  return undefined;
}

/** `2 * Na`, `-2 Na`, and an arrow with nothing before it. */
function coefficient({ actual, previous, place }: Misfit): Problem | undefined {
  if (place !== 'equation' || actual === undefined) return undefined;
  if (actual.tokenType === t.Arrow && previous === undefined) {
    const message = 'The left side of this equation is missing. Write for example `2 Na + H2 -> 2 NaH`.';
    return { code: 'syntax/missing', span: spanOf(actual), message };
  }
  if (/^[*\u00b7\u22c5]$/.test(actual.image) && previous?.tokenType === t.NumberToken) {
    return unexpected(spanOf(actual), 'A number stands right before its substance, as in `2 Na`. Remove the sign.');
  }
  if (/^[-\u2212]$/.test(actual.image) && previous?.tokenType !== t.Formula && previous?.tokenType !== t.WordToken) {
    const message =
      'No number in an equation is negative: what is used up stands on the left, what is made on the right.';
    return unexpected(spanOf(actual), message);
  }
  return undefined;
}

/** `==`, two claims in one, and `within` with two limits. */
function claimForm({ tokens, actual, previous, place }: Misfit): Problem | undefined {
  if (place !== 'claim' || actual === undefined) return undefined;
  if (actual.image === '=' && previous?.image === '=' && touches(previous, actual)) {
    const span = { start: previous.startOffset, end: t.endOf(actual) };
    return unexpected(span, '`==` is written `=` here.', { title: 'Write =', newText: '=' });
  }
  if (actual.image === 'by') {
    const message = 'A share in a blend is by mass, or `by mole` or `by volume` where that stands behind it.';
    return unexpected(spanOf(actual), message);
  }
  if (!/^(?:and|or|to|of)$/.test(actual.image)) return undefined;
  if (tokens.some(({ image }) => image === 'within')) {
    const message = '`within` takes a value and how far from it is allowed: `within 34 MJ/kg ± 1 MJ/kg`.';
    return unexpected(spanOf(actual), message);
  }
  if (actual.image !== 'and' && actual.image !== 'or') return undefined;
  return unexpected(spanOf(actual), 'One `expect` makes one claim. Write the second one as a claim of its own.');
}

/** `lower heating value slurry`: words in a row, where only a figure with its `of` has several. */
function figureWithoutOf({ tokens, actual, previous, place }: Misfit): Problem | undefined {
  if (place !== 'claim' && place !== 'expression') return undefined;
  const index = tokens.findIndex(({ startOffset }) => startOffset === actual?.startOffset);
  const row = tokens.slice(Math.max(index - 1, 0), index + 2);
  const areWords = row.every((token) => token.tokenType === t.WordToken && /^[a-z][a-z_-]*$/.test(token.image));
  if (row.length < 3 || !areWords || actual === undefined || previous === undefined) return undefined;
  const message = `\`${actual.image}\` does not fit behind \`${previous.image}\`. A figure has \`of\` before its owner: \`lower heating value of slurry\`.`;
  return unexpected(spanOf(actual), message);
}
