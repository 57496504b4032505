// The readers entry tables are made of: a quantity (with a temperature it holds at), a listed word, a text, a formula or
// substance, a list of them, a composition by element, a state. Each reports what it cannot take, at that phrase.
// They know syntax and quantities, not kinds. Invariant: a reader looks at every item of every phrase it is given.

import type { Entry, Expression, Phrase, PhraseItem, Word } from '../../grammar/tree.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { sameDimension } from '../core/quantity/dimension.ts';
import { explainUnitWord } from '../core/quantity/suggest-units.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Formula } from '../core/substance/formula.ts';
import { near, type Context } from './context.ts';
import type { Reader } from './entries.ts';
import { evaluateExpression } from './expressions.ts';
import type { Material } from './material.ts';
import { formulaOfWord, materialNamed } from './materials.ts';
import { fit, type Needed } from './read-quantity.ts';

export interface QuantityAt {
  readonly quantity: Quantity;
  /** The temperature it holds at, K, where one was written. */
  readonly at: Quantity | null;
}

/** What a value must be besides its dimension. */
/** `part`: a share above nothing; `upTo`: a share no larger than that. */
export type Range = 'any' | 'positive' | 'share' | 'part' | { readonly upTo: number };

/** One quantity of the unit's dimension; with `at`, a temperature may follow (`780 kg/m3 at 15 degC`). */
export function quantityReader(
  unit: string,
  what: string,
  options: {
    readonly range?: Range;
    readonly temperature?: boolean;
    readonly at?: boolean;
    /** A bare number is meant; the entry named here takes the same thing as a mass ratio. */
    readonly bareUnlike?: string;
  } = {},
): Reader<QuantityAt> {
  const { dimension } = knownUnit(unit);
  const isThermal = sameDimension(dimension, knownUnit('K').dimension);
  const kind = options.temperature ? 'temperature' : isThermal ? 'temperature-difference' : 'plain';
  const needed: Needed = { dimension, kind, example: unit };
  const takes = options.at ? `${what}, with \`at\` and a temperature if it has one` : what;
  return {
    takes,
    unit,
    ...(options.at ? { connectives: { at: 'degC' } } : {}),
    read(entry, context) {
      const phrase = onlyPhrase(entry, takes, context);
      const [first, ...rest] = phrase?.items ?? [];
      if (!phrase || !first) return undefined;
      if (first.kind === 'connective') return refuse(entry, phrase, takes, context);
      const [connective, temperature, ...beyond] = rest;
      if (connective) {
        if (!options.at || !isConnective(connective, 'at')) return refuseItem(entry, connective, takes, context);
        const extra = temperature?.kind === 'connective' ? temperature : beyond[0];
        if (!temperature || extra) return refuseItem(entry, extra ?? connective, takes, context);
      }
      const quantity = readQuantityItem(first, needed, context);
      if (quantity && options.bareUnlike !== undefined && isUnitOnRatio(first, entry, options.bareUnlike, context)) {
        return undefined;
      }
      const hasAt = temperature !== undefined && temperature.kind !== 'connective';
      const at = hasAt ? readQuantityItem(temperature, temperatureNeeded, context) : null;
      if (hasAt && !at) return undefined;
      if (!quantity || !isInRange(quantity, options.range ?? 'any', entry, first, context)) return undefined;
      return { quantity, at };
    },
  };
}

/** Whether a ratio bears `%` or a unit such as `kg/kg` where its bare number is meant (said). */
function isUnitOnRatio(item: Expression, entry: Entry, instead: string, context: Context): boolean {
  if (item.kind !== 'quantity' || !item.unit) return false;
  const { value } = item.number;
  const unit = context.written(item.unit.span);
  const isPercent = unit === '%';
  const isByMass = /^([a-zA-Z]+) *(?:\/|per) *\1$/.test(unit) && /^(?:[mkM]?g|t|lb)\b/.test(unit);
  const place = context.place(item.span);
  // Of the two numbers a percentage may mean, the one that is nearer to one comes first: these ratios are.
  const meant = [value, value / 100].sort((left, right) => Math.abs(Math.log(left)) - Math.abs(Math.log(right)));
  const asNumber = (isPercent ? meant : [value]).map((number) => {
    const newText = String(Number(number.toPrecision(10)));
    return { title: `Write ${newText}`, place, newText };
  });
  const asEntry = { title: `Write ${instead}`, place: context.place(entry.wordsSpan), newText: instead };
  context.report(item.span, {
    code: 'unit/mismatch',
    form: 'bare',
    text: context.written(item.span),
    entry: entry.words,
    fraction: isPercent ? value / 100 : null,
    instead: isByMass ? instead : null,
    // Of `2 ± 5 %` the `%` is of both numbers, and which of them was to have it cannot be told.
    mends: isByMass ? [asEntry] : item.uncertainty ? [] : asNumber,
  });
  return true;
}

/** One of the listed words. */
export function wordReader<const Listed extends string>(words: readonly Listed[]): Reader<Listed> {
  const takes = `one of ${words.map((word) => `\`${word}\``).join(', ')}`;
  return {
    takes,
    words,
    read(entry, context) {
      const phrase = onlyPhrase(entry, takes, context);
      const [item, ...rest] = phrase?.items ?? [];
      if (!phrase || !item) return undefined;
      const extra = rest[0];
      if (extra) return refuseItem(entry, extra, takes, context);
      if (item.kind !== 'word') return refuse(entry, phrase, takes, context);
      const found = words.find((word) => word === item.text);
      if (found === undefined) reportListedWord(item, entry.words, words, context);
      return found;
    },
  };
}

/** Listed words with commas between them, each once. */
export function wordsReader<const Listed extends string>(words: readonly Listed[]): Reader<readonly Listed[]> {
  const takes = `any of ${words.map((word) => `\`${word}\``).join(', ')}, with commas between them`;
  return {
    takes,
    words,
    read(entry, context) {
      const read = new Set<Listed>();
      for (const phrase of entry.phrases) {
        const [item, ...rest] = phrase.items;
        const extra = rest[0];
        if (extra) return refuseItem(entry, extra, takes, context);
        if (item?.kind !== 'word') return refuse(entry, phrase, takes, context);
        const found = words.find((word) => word === item.text);
        if (found === undefined) {
          reportListedWord(item, entry.words, words, context);
          return undefined;
        }
        read.add(found);
      }
      return [...read];
    },
  };
}

/** `"text"` */
export function textReader(what: string): Reader<string> {
  return {
    takes: what,
    read(entry, context) {
      const phrase = onlyPhrase(entry, what, context);
      const [item, ...rest] = phrase?.items ?? [];
      if (!phrase || !item) return undefined;
      const extra = rest[0];
      if (extra) return refuseItem(entry, extra, what, context);
      return item.kind === 'text' ? item.value : refuse(entry, phrase, what, context);
    },
  };
}

/** A chemical formula. */
export const formulaReader: Reader<Formula> = {
  takes: 'a formula, such as `Na2CO3` or `H2O(l)`',
  read(entry, context) {
    const phrase = onlyPhrase(entry, formulaReader.takes, context);
    const [item, ...rest] = phrase?.items ?? [];
    if (!phrase || !item) return undefined;
    const extra = rest[0];
    if (extra) return refuseItem(entry, extra, formulaReader.takes, context);
    if (item.kind !== 'word') return refuse(entry, phrase, formulaReader.takes, context);
    return formulaOfWord(item, context) ?? undefined;
  },
};

/** Formulas or substances, one a phrase. */
export const formulasReader: Reader<readonly Formula[]> = {
  takes: 'formulas with commas between them, such as `NaOH(cr), CO2(g), H2O(g)`',
  names: true,
  read(entry, context) {
    const formulas: Formula[] = [];
    for (const phrase of entry.phrases) {
      const [item, ...rest] = phrase.items;
      const extra = rest[0];
      if (extra) return refuseItem(entry, extra, formulasReader.takes, context);
      if (item?.kind !== 'word') return refuse(entry, phrase, formulasReader.takes, context);
      const formula = materialNamed(item, context, 'composition')?.formula;
      if (!formula) return undefined;
      formulas.push(formula);
    }
    return formulas;
  },
};

/** One substance or blend. */
export const materialReader: Reader<Material> = {
  takes: 'a substance or blend by name',
  names: true,
  read(entry, context) {
    const phrase = onlyPhrase(entry, materialReader.takes, context);
    const [item, ...rest] = phrase?.items ?? [];
    if (!phrase || !item) return undefined;
    const extra = rest[0];
    if (extra) return refuseItem(entry, extra, materialReader.takes, context);
    if (item.kind !== 'word') return refuse(entry, phrase, materialReader.takes, context);
    return materialNamed(item, context) ?? undefined;
  },
};

export interface State {
  readonly temperature?: Quantity;
  readonly pressure?: Quantity;
}

/** A temperature, a pressure, or both, in any order: `20 degC, 1 atm`. */
export const stateReader: Reader<State> = {
  takes: 'a temperature and a pressure, such as `25 degC, 1 bar`',
  unit: 'degC',
  otherUnits: ['bar'],
  read(entry, context) {
    let state: State = {};
    for (const phrase of entry.phrases) {
      const [item, ...rest] = phrase.items;
      const extra = rest[0];
      if (extra) return refuseItem(entry, extra, stateReader.takes, context);
      if (!item || item.kind === 'connective') return refuse(entry, phrase, stateReader.takes, context);
      const quantity = evaluateExpression(item, context);
      if (!quantity) return undefined;
      const isPressure = sameDimension(quantity.dimension, pressureNeeded.dimension);
      const read = fit(quantity, isPressure ? pressureNeeded : temperatureNeeded, item.span, context);
      if (!read) return undefined;
      const key = isPressure ? 'pressure' : 'temperature';
      if (state[key]) return refuse(entry, phrase, stateReader.takes, context);
      if (!isInRange(read, 'positive', entry, item, context)) return undefined;
      state = { ...state, [key]: read };
    }
    return state;
  },
};

/** `biogenic`, `fossil`, or either with a share: the biogenic share of the carbon, 0 to 1. */
export const carbonOriginReader: Reader<Quantity> = {
  takes: '`biogenic` or `fossil`, with a share if it is not all: `biogenic 98 %`',
  words: ['biogenic', 'fossil'],
  unit: '%',
  read(entry, context) {
    const phrase = onlyPhrase(entry, carbonOriginReader.takes, context);
    const [word, share, ...rest] = phrase?.items ?? [];
    if (!phrase || !word) return undefined;
    const extra = rest[0] ?? (share?.kind === 'connective' ? share : undefined);
    if (extra) return refuseItem(entry, extra, carbonOriginReader.takes, context);
    if (word.kind !== 'word') return refuse(entry, phrase, carbonOriginReader.takes, context);
    if (word.text !== 'biogenic' && word.text !== 'fossil') {
      reportListedWord(word, entry.words, carbonOriginReader.words ?? [], context);
      return undefined;
    }
    const whole: Quantity = { value: 1, dimension: shareNeeded.dimension, kind: 'plain', parts: new Map() };
    const given = share && share.kind !== 'connective' ? readQuantityItem(share, shareNeeded, context) : whole;
    if (!given || !isInRange(given, 'share', entry, share ?? word, context)) return undefined;
    if (word.text === 'biogenic') return given;
    return {
      ...given,
      value: 1 - given.value,
      parts: new Map([...given.parts].map(([input, part]) => [input, -part])),
    };
  },
};

/** What is written in a unit or others of its dimension. */
export function neededIn(unit: string): Needed {
  return { dimension: knownUnit(unit).dimension, kind: 'plain', example: unit };
}

export const shareNeeded = neededIn('%');
export const temperatureNeeded: Needed = { dimension: knownUnit('K').dimension, kind: 'temperature', example: 'degC' };
export const pressureNeeded = neededIn('bar');

export function isConnective(item: PhraseItem | undefined, word: string): boolean {
  return item?.kind === 'connective' && item.word === word;
}

export function isWord(item: PhraseItem | undefined, text: string): boolean {
  return item?.kind === 'word' && item.text === text;
}

/** Says that a phrase is not what the entry takes. */
export function refuse(entry: Entry, phrase: Phrase, takes: string, context: Context): undefined {
  context.report(phrase.span, {
    code: 'name/unknown-phrase',
    entry: entry.words,
    text: context.written(phrase.span),
    takes,
  });
  return undefined;
}

/** Says that one item of a phrase, and what follows it, is too much. */
export function refuseItem(entry: Entry, item: PhraseItem, takes: string, context: Context): undefined {
  const text = context.written(item.span);
  const word = firstOperand(item);
  if (word.kind === 'word' && isBehindBareNumber(entry, item)) {
    const { offers, why } = explainUnitWord(word.text);
    context.report(word.span, { code: 'unit/unknown', word: word.text, near: offers, hint: why ?? null });
  } else {
    context.report(item.span, { code: 'name/unknown-phrase', entry: entry.words, text, takes });
  }
  return undefined;
}

/** `Mj/kg` is read as a quotient: its first word is where the unit was to be. */
function firstOperand(item: PhraseItem): PhraseItem {
  let first = item;
  while (first.kind === 'binary') first = first.left;
  return first;
}

/** Whether an item stands where a number's unit is looked for: `20 C`, `12 knots`, `40 Mj/kg`. */
function isBehindBareNumber(entry: Entry, item: PhraseItem): boolean {
  return entry.phrases.some(({ items }) => {
    const before = items[items.indexOf(item) - 1];
    return before?.kind === 'quantity' && !before.unit;
  });
}

/** Whether the value lies in the range its entry asks for (said when it does not). */
export function isInRange(
  quantity: Quantity,
  range: Range,
  entry: Pick<Entry, 'words'>,
  item: Pick<Expression, 'span'>,
  context: Context,
): boolean {
  const text = context.written(item.span);
  if ((range === 'positive' || range === 'part') && !(quantity.value > 0)) {
    context.report(item.span, { code: 'range/positive', text, entry: entry.words });
    return false;
  }
  if (range === 'any' || range === 'positive') return true;
  const high = typeof range === 'object' ? range.upTo : 1;
  if (!(quantity.value >= 0 && quantity.value <= high)) {
    context.report(item.span, { code: 'range/share', text, low: 0, high });
    return false;
  }
  return true;
}

/** A quantity that fits its place; null when it does not (said). */
export function readQuantityItem(item: Expression, needed: Needed, context: Context): Quantity | null {
  const quantity = evaluateExpression(item, context);
  return quantity && fit(quantity, needed, item.span, context);
}

/** The phrase of an entry that takes one; undefined when there are more (said). */
export function onlyPhrase(entry: Entry, takes: string, context: Context): Phrase | undefined {
  const [phrase, second] = entry.phrases;
  if (second) return refuse(entry, second, takes, context);
  return phrase;
}

/** Says that a word is none of those that may stand there. */
export function reportListedWord(word: Word, owner: string, allowed: readonly string[], context: Context): void {
  context.report(word.span, {
    code: 'name/unknown',
    what: 'word',
    word: word.text,
    near: near(word.text, allowed),
    owner,
    allowed,
  });
}
