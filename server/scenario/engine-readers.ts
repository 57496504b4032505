// The readers of what only an engine takes: consumption or efficiency against load, what a consumption was measured on, a
// pilot fuel, and emissions that slip through. Each reports what it cannot take, at that phrase.
// Knows nothing of cycles and works nothing out. Invariant: a reader looks at every item of every phrase it is given.

import type { Entry, Expression, Phrase, Word } from '../../grammar/tree.ts';
import { sameDimension } from '../core/quantity/dimension.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Context } from './context.ts';
import type { Reader } from './entries.ts';
import { evaluateExpression } from './expressions.ts';
import type { PilotEntry, SlipEntry } from './machinery.ts';
import type { Material } from './material.ts';
import { materialNamed } from './materials.ts';
import { fit } from './read-quantity.ts';
import {
  isConnective,
  isInRange,
  isWord,
  neededIn,
  onlyPhrase,
  pressureNeeded,
  readQuantityItem,
  refuse,
  refuseItem,
  reportListedWord,
  shareNeeded,
  temperatureNeeded,
} from './readers.ts';

/** One measured point: what was measured, at a load as a share of the rating. */
export interface AtLoad {
  readonly value: Quantity;
  readonly load: Quantity;
  readonly item: Expression;
}

/** `231 g/kWh at 25 %, 209 g/kWh at 50 %`; one value without a load holds at the rating alone. */
export function atLoadsReader(unit: string, what: string, range: 'positive' | 'share'): Reader<readonly AtLoad[]> {
  const needed = neededIn(unit);
  const takes = `${what}, each with \`at\` and a load in % of the rating`;
  return {
    takes,
    unit,
    connectives: { at: '%' },
    read(entry, context) {
      const points: AtLoad[] = [];
      for (const phrase of entry.phrases) {
        const [first, at, load, extra] = phrase.items;
        if (!first || first.kind === 'connective') return refuse(entry, phrase, takes, context);
        if (extra) return refuseItem(entry, extra, takes, context);
        if (!isConnective(at, 'at')) return refuse(entry, phrase, takes, context);
        if (!load || load.kind === 'connective') return refuse(entry, phrase, takes, context);
        const value = readQuantityItem(first, needed, context);
        const share = readQuantityItem(load, shareNeeded, context);
        if (!value || !share || !isInRange(value, range, entry, first, context)) return undefined;
        // An efficiency of nothing would make a consumption without end.
        if (range === 'share' && !isInRange(value, 'positive', entry, first, context)) return undefined;
        if (!isInRange(share, 'positive', entry, load, context)) return undefined;
        points.push({ value, load: share, item: first });
      }
      return points;
    },
  };
}

/** What a specific consumption was measured on. */
export interface MeasuredOn {
  /** The fuel it was measured with, where it is not the engine's own. */
  readonly fuel: Material | null;
  /** J/kg of the fuel it was measured with. */
  readonly heatingValue: Quantity | null;
  readonly basis: 'lower' | 'higher';
  /** A share: consumption may be higher by as much. */
  readonly tolerance: Quantity | null;
  readonly temperature: Quantity | null;
  readonly pressure: Quantity | null;
}

/** `42.7 MJ/kg lower, tolerance 5 %`, and the ambient state as `25 degC, 100 kPa`, in any order. */
export const measuredOnReader: Reader<MeasuredOn> = {
  takes:
    "a heating value with `lower` or `higher`, `tolerance` and a share, the fuel if it is not the engine's own, and the ambient temperature and pressure: `42.7 MJ/kg lower, tolerance 5 %, gas_oil, 25 degC, 100 kPa`",
  words: ['lower', 'higher', 'tolerance'],
  names: true,
  unit: 'MJ/kg',
  otherUnits: ['%', 'degC', 'kPa'],
  read(entry, context) {
    const { takes } = measuredOnReader;
    let read: MeasuredOn = {
      fuel: null,
      heatingValue: null,
      basis: 'lower',
      tolerance: null,
      temperature: null,
      pressure: null,
    };
    for (const phrase of entry.phrases) {
      const [first, second] = phrase.items;
      const part = isWord(first, 'tolerance')
        ? readTolerance(entry, phrase, context)
        : first?.kind === 'word' && !second && isFuelName(first, context)
          ? readMeasuredFuel(first, context)
          : readMeasuredPhrase(entry, phrase, context);
      if (!part) return undefined;
      const isTwice = Object.keys(part).some((key) => key !== 'basis' && read[key as keyof MeasuredOn] !== null);
      if (isTwice) return refuse(entry, phrase, takes, context);
      read = { ...read, ...part };
    }
    return read;
  },
};

/** A bare word that stands for no number is a fuel's name. */
function isFuelName(word: Word, context: Context): boolean {
  return context.scope.lookup(word.text)?.kind !== 'value';
}

function readMeasuredFuel(word: Word, context: Context): Partial<MeasuredOn> | undefined {
  const fuel = materialNamed(word, context);
  return fuel ? { fuel } : undefined;
}

function readTolerance(entry: Entry, phrase: Phrase, context: Context): Partial<MeasuredOn> | undefined {
  const { takes } = measuredOnReader;
  const [, share, extra] = phrase.items;
  if (extra) return refuseItem(entry, extra, takes, context);
  if (!share || share.kind === 'connective') return refuse(entry, phrase, takes, context);
  const tolerance = readQuantityItem(share, shareNeeded, context);
  return tolerance && isInRange(tolerance, 'share', entry, share, context) ? { tolerance } : undefined;
}

function readMeasuredPhrase(entry: Entry, phrase: Phrase, context: Context): Partial<MeasuredOn> | undefined {
  const { takes } = measuredOnReader;
  const [first, word, extra] = phrase.items;
  if (!first || first.kind === 'connective') return refuse(entry, phrase, takes, context);
  if (extra) return refuseItem(entry, extra, takes, context);
  const quantity = evaluateExpression(first, context);
  if (!quantity) return undefined;
  const needed =
    [pressureNeeded, temperatureNeeded].find(({ dimension }) => sameDimension(dimension, quantity.dimension)) ??
    heatingNeeded;
  const fitted = fit(quantity, needed, first.span, context);
  if (!fitted || !isInRange(fitted, 'positive', entry, first, context)) return undefined;
  if (needed !== heatingNeeded) {
    if (word) return refuseItem(entry, word, takes, context);
    return needed === pressureNeeded ? { pressure: fitted } : { temperature: fitted };
  }
  if (!word) return { heatingValue: fitted, basis: 'lower' };
  if (word.kind !== 'word') return refuseItem(entry, word, takes, context);
  if (word.text === 'lower' || word.text === 'higher') return { heatingValue: fitted, basis: word.text };
  reportListedWord(word, entry.words, ['lower', 'higher'], context);
  return undefined;
}

/** `5 % energy gas_oil` */
export const pilotReader: Reader<PilotEntry> = {
  takes: 'a share of the fuel by `energy` or `mass`, and the fuel that lights it: `5 % energy gas_oil`',
  words: ['energy', 'mass'],
  names: true,
  unit: '%',
  read(entry, context) {
    const { takes } = pilotReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [share, by, fuel, extra] = phrase?.items ?? [];
    if (!phrase) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (!share || share.kind === 'connective' || by?.kind !== 'word' || fuel?.kind !== 'word') {
      return refuse(entry, phrase, takes, context);
    }
    if (by.text !== 'energy' && by.text !== 'mass') {
      reportListedWord(by, entry.words, ['energy', 'mass'], context);
      return undefined;
    }
    const quantity = readQuantityItem(share, shareNeeded, context);
    const material = materialNamed(fuel, context);
    if (!quantity || !material || !isInRange(quantity, 'share', entry, share, context)) return undefined;
    return { share: quantity, by: by.text, fuel: material };
  },
};

/** `3.1 %` of the fuel's mass, or `5.5 g/kWh`. */
export const slipReader: Reader<SlipEntry> = {
  takes: "a share of the fuel's mass, such as `3.1 %`, or a mass for the work at the shaft, such as `5.5 g/kWh`",
  unit: '%',
  otherUnits: ['g/kWh'],
  read(entry, context) {
    const { takes } = slipReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [item, extra] = phrase?.items ?? [];
    if (!phrase || !item) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (item.kind === 'connective') return refuse(entry, phrase, takes, context);
    const quantity = evaluateExpression(item, context);
    if (!quantity) return undefined;
    const isForWork = sameDimension(quantity.dimension, perWorkNeeded.dimension);
    const fitted = fit(quantity, isForWork ? perWorkNeeded : shareNeeded, item.span, context);
    if (!fitted) return undefined;
    if (!isForWork && !isInRange(fitted, 'share', entry, item, context)) return undefined;
    if (isForWork && fitted.value < 0 && !isInRange(fitted, 'positive', entry, item, context)) return undefined;
    return { per: isForWork ? 'work' : 'fuel', quantity: fitted };
  },
};

const heatingNeeded = neededIn('MJ/kg');
const perWorkNeeded = neededIn('g/kWh');
