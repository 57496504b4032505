// The readers of what only a burn takes: the oxidant, what is held, a loss of the fuel's energy, a zone, temperatures it
// cools through, a range of temperatures, a switch. Each reports what it cannot take, at that phrase.
// Knows nothing of flames. Invariant: a reader looks at every item of every phrase it is given.

import type { Entry, Phrase, PhraseItem, Word } from '../../grammar/tree.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Formula } from '../core/substance/formula.ts';
import { phasesOfFormula } from '../core/substance/phases.ts';
import type { Context } from './context.ts';
import type { Reader } from './entries.ts';
import { materialNamed } from './materials.ts';
import { streamOfMaterial, type OxidantStream } from './oxidant-stream.ts';
import type { Needed } from './read-quantity.ts';
import {
  isConnective,
  isInRange,
  isWord,
  onlyPhrase,
  pressureNeeded,
  readQuantityItem,
  refuse,
  refuseItem,
  reportListedWord,
  shareNeeded,
  temperatureNeeded,
} from './readers.ts';
import { isNamedPhase, withoutPhase } from './valued-species.ts';

/** An oxidant definition, or a substance whose molecules are known. */
export const oxidantReader: Reader<OxidantStream> = {
  takes: 'an oxidant by name, or a substance such as `air`, `oxygen` or `steam`',
  names: true,
  kinds: ['oxidant', 'substance'],
  read(entry, context) {
    const word = onlyWord(entry, oxidantReader.takes, context);
    if (!word) return undefined;
    const named = word.phase === undefined ? context.scope.lookup(word.text) : undefined;
    if (named?.kind === 'definition' && named.definition.kind === 'oxidant') {
      context.mean(word.span, { kind: 'definition', name: word.text, definition: named.definition });
      return named.stream ?? undefined;
    }
    if (named?.kind === 'definition' && !named.material && named.definition.kind !== 'substance') {
      context.mean(word.span, { kind: 'definition', name: word.text, definition: named.definition });
      const is = `a ${named.definition.kind}`;
      // A blend that could not be worked out has said why.
      if (named.definition.kind === 'blend') return undefined;
      context.report(word.span, { code: 'name/wrong-kind', name: word.text, is, needed: 'an oxidant or substance' });
      return undefined;
    }
    const material = materialNamed(word, context);
    if (!material) return undefined;
    const stream = streamOfMaterial(material);
    if (!stream) {
      const missing = [`the molecules of ${material.name}`];
      context.report(word.span, { code: 'balance/no-data', what: `the composition of ${material.name}`, missing });
    }
    // `steam` is told as it is written, not by its formula.
    return stream ? { ...stream, name: word.text } : undefined;
  },
};

/** What stays as it is while the charge burns. */
export type HeldEntry = { readonly held: 'pressure'; readonly pressure: Quantity } | { readonly held: 'volume' };

/** `pressure 120 bar`, or `volume`. */
export const heldReader: Reader<HeldEntry> = {
  takes: '`pressure` and a pressure, such as `pressure 120 bar`, or `volume`',
  words: ['pressure', 'volume'],
  unit: 'bar',
  read(entry, context) {
    const phrase = onlyPhrase(entry, heldReader.takes, context);
    const [word, amount, ...rest] = phrase?.items ?? [];
    if (!phrase || !word) return undefined;
    if (word.kind !== 'word') return refuse(entry, phrase, heldReader.takes, context);
    if (word.text === 'volume') {
      return amount ? refuseItem(entry, amount, heldReader.takes, context) : { held: 'volume' };
    }
    if (word.text !== 'pressure') {
      reportListedWord(word, entry.words, heldReader.words ?? [], context);
      return undefined;
    }
    const [extra] = rest;
    if (!amount || amount.kind === 'connective') return refuse(entry, phrase, heldReader.takes, context);
    if (extra) return refuseItem(entry, extra, heldReader.takes, context);
    const pressure = readQuantityItem(amount, pressureNeeded, context);
    if (!pressure || !isInRange(pressure, 'positive', entry, amount, context)) return undefined;
    return { held: 'pressure', pressure };
  },
};

/** `14 % of fuel energy`: a share of the lower heating value. */
export const heatLossReader: Reader<Quantity> = {
  takes: "a share of the fuel's lower heating value, such as `14 % of fuel energy`",
  unit: '%',
  connectives: { of: '%' },
  read(entry, context) {
    const { takes } = heatLossReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [share, of, fuel, energy, ...rest] = phrase?.items ?? [];
    if (!phrase || !share) return undefined;
    if (share.kind === 'connective') return refuse(entry, phrase, takes, context);
    const [extra] = rest;
    if (extra) return refuseItem(entry, extra, takes, context);
    const isWhole = isConnective(of, 'of') && isWord(fuel, 'fuel') && isWord(energy, 'energy');
    if (of && !isWhole) return refuseItem(entry, of, takes, context);
    const quantity = readQuantityItem(share, shareNeeded, context);
    return quantity && isInRange(quantity, 'share', entry, share, context) ? quantity : undefined;
  },
};

/** How much oxidant there is, by the way it is written. */
export interface AmountEntry {
  readonly by: 'lambda' | 'equivalence-ratio';
  readonly quantity: Quantity;
}

/** `lambda 0.9`, or `equivalence ratio 1.1`. */
export const zoneReader: Reader<AmountEntry> = {
  takes: '`lambda` and a number, such as `lambda 0.9`, or `equivalence ratio 1.1`',
  words: ['lambda', 'equivalence ratio'],
  read(entry, context) {
    const { takes } = zoneReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [first, second, third] = phrase?.items ?? [];
    if (!phrase || !first) return undefined;
    const isRatio = isWord(first, 'equivalence') && isWord(second, 'ratio');
    if (!isRatio && !isWord(first, 'lambda')) {
      if (first.kind !== 'word') return refuse(entry, phrase, takes, context);
      reportListedWord(first, entry.words, zoneReader.words ?? [], context);
      return undefined;
    }
    const number = isRatio ? third : second;
    const extra = phrase.items[isRatio ? 3 : 2];
    if (!number || number.kind === 'connective') return refuse(entry, phrase, takes, context);
    if (extra) return refuseItem(entry, extra, takes, context);
    const needed: Needed = { dimension: shareNeeded.dimension, kind: 'plain', example: '1' };
    const quantity = readQuantityItem(number, needed, context);
    if (!quantity || !isInRange(quantity, 'positive', entry, number, context)) return undefined;
    return { by: isRatio ? 'equivalence-ratio' : 'lambda', quantity };
  },
};

/** Temperatures with commas between them. */
export const temperaturesReader: Reader<readonly Quantity[]> = {
  takes: 'temperatures with commas between them, such as `900 degC, 350 degC`',
  unit: 'degC',
  read(entry, context) {
    const temperatures: Quantity[] = [];
    for (const phrase of entry.phrases) {
      const [item, extra] = phrase.items;
      if (extra) return refuseItem(entry, extra, temperaturesReader.takes, context);
      const temperature = readTemperature(entry, phrase, item, temperaturesReader.takes, context);
      if (!temperature) return undefined;
      temperatures.push(temperature);
    }
    return temperatures;
  },
};

/** From a lower to a higher temperature. */
export interface TemperatureRange {
  readonly from: Quantity;
  readonly to: Quantity;
}

/** `400 degC to 550 degC`, with `from` before it or not, `between … and …`, or one temperature. */
export const temperatureRangeReader: Reader<TemperatureRange> = {
  takes: 'a temperature or a range of them, such as `400 degC to 550 degC`',
  unit: 'degC',
  connectives: { to: 'degC', from: 'degC', between: 'degC', and: 'degC' },
  read(entry, context) {
    const { takes } = temperatureRangeReader;
    const phrase = onlyPhrase(entry, takes, context);
    if (!phrase) return undefined;
    const [opening] = phrase.items;
    const opens = opening?.kind === 'connective' ? opening.word : null;
    if (opens !== null && opens !== 'from' && opens !== 'between') return refuse(entry, phrase, takes, context);
    const [first, joint, second, extra] = opens === null ? phrase.items : phrase.items.slice(1);
    if (extra) return refuseItem(entry, extra, takes, context);
    const low = readTemperature(entry, phrase, first, takes, context);
    if (!low) return undefined;
    if (!joint) return opens === null ? { from: low, to: low } : refuse(entry, phrase, takes, context);
    const joins = opens === 'between' ? 'and' : 'to';
    if (joint.kind !== 'connective' || joint.word !== joins) return refuseItem(entry, joint, takes, context);
    const high = readTemperature(entry, phrase, second, takes, context);
    if (!high) return undefined;
    return low.value <= high.value ? { from: low, to: high } : { from: high, to: low };
  },
};

/** Formulas or substances as products: a formula without a phase means all its phases. */
export const productsReader: Reader<readonly Formula[]> = {
  takes: 'formulas with commas between them, such as `NO(g), Na2O2`',
  names: true,
  read(entry, context) {
    const formulas: Formula[] = [];
    for (const phrase of entry.phrases) {
      const [item, extra] = phrase.items;
      if (extra) return refuseItem(entry, extra, productsReader.takes, context);
      if (item?.kind !== 'word') return refuse(entry, phrase, productsReader.takes, context);
      const material = materialNamed(item, context, 'composition');
      if (!material?.formula) return undefined;
      const isWritten = item.phase !== undefined || isNamedPhase(material);
      formulas.push(isWritten ? material.formula : withoutPhase(material.formula));
      if (phasesOfFormula(material.formula).length > 0) continue;
      const missing = ['values of it in the tables'];
      context.report(item.span, { code: 'balance/no-data', what: `the product ${material.name}`, missing });
    }
    return formulas;
  },
};

/** `on` or `off`. */
export const switchReader: Reader<boolean> = {
  takes: '`on` or `off`',
  words: ['on', 'off'],
  read(entry, context) {
    const phrase = onlyPhrase(entry, switchReader.takes, context);
    const [item, extra] = phrase?.items ?? [];
    if (!phrase || !item) return undefined;
    if (extra) return refuseItem(entry, extra, switchReader.takes, context);
    // `on` also joins operands, so the grammar does not take it for a word.
    if (isConnective(item, 'on')) return true;
    if (isWord(item, 'off')) return false;
    if (item.kind !== 'word') return refuse(entry, phrase, switchReader.takes, context);
    reportListedWord(item, entry.words, switchReader.words ?? [], context);
    return undefined;
  },
};

function readTemperature(
  entry: Entry,
  phrase: Phrase,
  item: PhraseItem | undefined,
  takes: string,
  context: Context,
): Quantity | null {
  if (!item || item.kind === 'connective') return refuse(entry, phrase, takes, context) ?? null;
  const temperature = readQuantityItem(item, temperatureNeeded, context);
  return temperature && isInRange(temperature, 'positive', entry, item, context) ? temperature : null;
}

function onlyWord(entry: Entry, takes: string, context: Context): Word | undefined {
  const phrase = onlyPhrase(entry, takes, context);
  const [item, extra] = phrase?.items ?? [];
  if (!phrase || !item) return undefined;
  if (extra) return refuseItem(entry, extra, takes, context);
  return item.kind === 'word' ? item : refuse(entry, phrase, takes, context);
}
