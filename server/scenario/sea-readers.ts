// The readers of what only a sea takes: an effluent by the forms of its alkali, and what the receiving water is held to.
// Knows no chemistry. Invariant: a reader looks at every item of every phrase it is given.

import type { Entry, Phrase } from '../../grammar/tree.ts';
import { deliveredForms, type DeliveredForm } from '../core/account/sea/delivery.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Context } from './context.ts';
import type { Reader } from './entries.ts';
import {
  isConnective,
  isInRange,
  isWord,
  neededIn,
  readQuantityItem,
  refuse,
  refuseItem,
  reportListedWord,
} from './readers.ts';

export type EffluentEntry = ReadonlyMap<DeliveredForm, Quantity>;

const amountNeeded = neededIn('mmol/kg');
const numberNeeded = neededIn('1');

/** `20 mmol/kg hydroxide, 5 mmol/kg carbonate`: moles of each form per kg of effluent, an acid by its protons. */
export const effluentReader: Reader<EffluentEntry> = {
  takes:
    'moles per kg of effluent of `hydroxide`, `carbonate`, `hydrogen-carbonate` or `acid`, with commas between them, such as `20 mmol/kg hydroxide, 5 mmol/kg carbonate`',
  words: deliveredForms,
  unit: 'mmol/kg',
  read(entry, context) {
    const { takes } = effluentReader;
    const read = new Map<DeliveredForm, Quantity>();
    for (const phrase of entry.phrases) {
      const [amount, word, extra] = phrase.items;
      if (!amount || amount.kind === 'connective') return refuse(entry, phrase, takes, context);
      if (extra) return refuseItem(entry, extra, takes, context);
      if (word?.kind !== 'word') return refuse(entry, phrase, takes, context);
      const form = deliveredForms.find((listed) => listed === word.text);
      if (form === undefined) {
        reportListedWord(word, entry.words, deliveredForms, context);
        return undefined;
      }
      const quantity = readQuantityItem(amount, amountNeeded, context);
      if (!quantity || !isInRange(quantity, 'positive', entry, amount, context)) return undefined;
      if (read.has(form)) return refuse(entry, phrase, takes, context);
      read.set(form, quantity);
    }
    return read;
  },
};

/** What a receiving water is held to; null where no such limit is written. */
export interface ReceivingLimit {
  readonly band: { readonly low: Quantity; readonly high: Quantity } | null;
  /** How far its pH may move. */
  readonly change: Quantity | null;
}

/** `pH between 6.5 and 9.0`, `change within 0.2`, or both. */
export const receivingLimitReader: Reader<ReceivingLimit> = {
  takes: '`pH between 6.5 and 9.0`, `change within 0.2`, or both with a comma between them',
  words: ['pH', 'change'],
  connectives: { between: '1', and: '1', within: '1' },
  read(entry, context) {
    let limit: ReceivingLimit = { band: null, change: null };
    for (const phrase of entry.phrases) {
      const part = isWord(phrase.items[0], 'change')
        ? readChange(entry, phrase, context)
        : readBand(entry, phrase, context);
      if (!part) return undefined;
      if ((part.band && limit.band) || (part.change && limit.change)) {
        return refuse(entry, phrase, receivingLimitReader.takes, context);
      }
      limit = { ...limit, ...part };
    }
    return limit;
  },
};

function readChange(entry: Entry, phrase: Phrase, context: Context): Partial<ReceivingLimit> | undefined {
  const { takes } = receivingLimitReader;
  const [, within, amount, extra] = phrase.items;
  if (extra) return refuseItem(entry, extra, takes, context);
  if (!isConnective(within, 'within')) return refuse(entry, phrase, takes, context);
  if (!amount || amount.kind === 'connective') return refuse(entry, phrase, takes, context);
  const change = readQuantityItem(amount, numberNeeded, context);
  return change && isInRange(change, 'positive', entry, amount, context) ? { change } : undefined;
}

function readBand(entry: Entry, phrase: Phrase, context: Context): Partial<ReceivingLimit> | undefined {
  const { takes } = receivingLimitReader;
  const [word, between, first, and, second, extra] = phrase.items;
  if (extra) return refuseItem(entry, extra, takes, context);
  if (!isWord(word, 'pH') || !isConnective(between, 'between') || !isConnective(and, 'and')) {
    return refuse(entry, phrase, takes, context);
  }
  if (!first || first.kind === 'connective' || !second || second.kind === 'connective') {
    return refuse(entry, phrase, takes, context);
  }
  const [one, two] = [first, second].map((item) => readQuantityItem(item, numberNeeded, context));
  if (!one || !two) return undefined;
  if (!isInRange(one, 'positive', entry, first, context)) return undefined;
  return { band: one.value <= two.value ? { low: one, high: two } : { low: two, high: one } };
}
