// The readers of what only a duty takes: legs, standing demands on an engine, a boiler, a service speed, a test cycle.
// Each reports what it cannot take, at that phrase. Knows no law between speed and power, and works nothing out.
// Invariant: a reader looks at every item of every phrase it is given.

import type { Entry, Expression, Phrase, Span, Word } from '../../grammar/tree.ts';
import type { Step } from '../core/duty/plan.ts';
import { testCycles, testCycleNamed, type TestCycle } from '../core/duty/test-cycles.ts';
import { sameDimension } from '../core/quantity/dimension.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import { readUnit } from '../core/quantity/read-unit.ts';
import type { Context } from './context.ts';
import type { Reader } from './entries.ts';
import { evaluateExpression } from './expressions.ts';
import type { EngineMachine } from './machinery.ts';
import type { Material } from './material.ts';
import { materialNamed } from './materials.ts';
import { machineryNamed } from './named-machinery.ts';
import { sided, type Needed } from './read-quantity.ts';
import {
  isConnective,
  isInRange,
  isWord,
  neededIn,
  onlyPhrase,
  readQuantityItem,
  refuse,
  refuseItem,
  reportListedWord,
  shareNeeded,
} from './readers.ts';

/** An engine as it is named in a duty; null where it could not be worked out. */
export interface NamedEngine {
  readonly name: string;
  readonly machine: EngineMachine | null;
}

/** What is asked of an engine on a leg: a share of its rating, or a power in W. Null: what the leg's speed takes. */
export interface DemandEntry {
  readonly engine: NamedEngine;
  readonly by: 'load' | 'power' | 'speed';
  readonly quantity: Quantity | null;
  readonly span: Phrase['span'];
}

export interface LegEntry {
  readonly time: Quantity | null;
  readonly distance: Quantity | null;
  readonly speed: Quantity | null;
  readonly calm: boolean;
  readonly engines: readonly DemandEntry[];
  /** Power from the shore, where that is asked for. */
  readonly shore: Quantity | null;
  /** Measured steps of the first engine, in place of one power. */
  readonly profile?: readonly Step[];
}

const takesLeg =
  'a time or distance, `at` a load, power or speed, and `on` an engine or `shore`: `5.5 h at 85 % on main`, `38 nmi at 11 kn on main`';

/** `5.5 h at 85 % on main`, `38 nmi at 11 kn on main, 300 kW on auxiliary`, `10 h at 220 kW on shore`, with `calm`. */
export const legReader: Reader<LegEntry> = {
  takes: takesLeg,
  words: ['shore', 'calm'],
  unit: 'h',
  otherUnits: ['nmi'],
  connectives: { at: '%', on: '' },
  names: true,
  kinds: ['engine'],
  read(entry, context) {
    const [phrase, ...others] = entry.phrases;
    const [first] = phrase?.items ?? [];
    if (!phrase || !first || first.kind === 'connective') return phrase && refuse(entry, phrase, takesLeg, context);
    const nanometres = nanometresIn(first);
    if (nanometres) {
      const hint = 'In a leg it would be nanometres; a nautical mile is `nmi`.';
      context.report(nanometres, { code: 'unit/unknown', word: 'nm', near: ['nmi'], hint });
      return undefined;
    }
    const extent = readAs(first, [timeNeeded, lengthNeeded], entry, context);
    if (!extent) return undefined;
    const isTime = extent.needed === timeNeeded;
    const rest = readLegRest(entry, phrase, isTime, context);
    if (!rest) return undefined;
    let leg: LegEntry = {
      ...rest,
      time: isTime ? extent.quantity : null,
      distance: isTime ? null : extent.quantity,
      calm: false,
    };
    for (const other of others) {
      const [item, extra] = other.items;
      if (isWord(item, 'calm')) {
        if (extra) return refuseItem(entry, extra, takesLeg, context);
        leg = { ...leg, calm: true };
        continue;
      }
      const demand = readDemand(entry, other, context);
      if (!demand) return undefined;
      leg = { ...leg, engines: [...leg.engines, demand] };
    }
    return leg;
  },
};

/** `38 nm`: where a ship's distance is meant, the unit of a wavelength. */
function nanometresIn(item: Expression): Span | null {
  const words = item.kind === 'quantity' ? (item.unit?.tokens ?? []) : [];
  return words.length === 1 && words[0]?.text === 'nm' && words[0].power === 1 ? words[0].span : null;
}

/** Whether the value of an entry begins with a time or a distance, as a leg's does. */
export function startsWithExtent({ phrases: [phrase] }: Entry, context: Context): boolean {
  const [item] = phrase?.items ?? [];
  if (item?.kind === 'quantity') {
    if (!item.unit) return false;
    const reading = readUnit(item.unit.tokens);
    // A unit that cannot be read may be a misspelt hour: the leg says so.
    return !reading.ok || isExtent(reading.unit.dimension);
  }
  if (item?.kind !== 'word') return false;
  const named = context.scope.lookup(item.text);
  return named?.kind === 'value' && named.value.quantity !== null && isExtent(named.value.quantity.dimension);
}

/** Behind the extent: one or two `at`, then `on` and who does it. */
function readLegRest(
  entry: Entry,
  phrase: Phrase,
  isTime: boolean,
  context: Context,
): Pick<LegEntry, 'speed' | 'engines' | 'shore'> | undefined {
  let speed: Quantity | null = null;
  let demand: { readonly by: 'load' | 'power'; readonly quantity: Quantity } | null = null;
  let index = 1;
  const { items } = phrase;
  for (; isConnective(items[index], 'at'); index += 2) {
    const value = items[index + 1];
    if (!value || value.kind === 'connective') return refuse(entry, phrase, takesLeg, context);
    const read = readAs(value, [speedNeeded, powerNeeded, shareNeeded], entry, context);
    if (!read) return undefined;
    if (read.needed === speedNeeded && !speed) speed = read.quantity;
    else if (read.needed !== speedNeeded && !demand) {
      demand = { by: read.needed === powerNeeded ? 'power' : 'load', quantity: read.quantity };
    } else return refuseItem(entry, value, takesLeg, context);
  }
  const [on, who, extra] = items.slice(index);
  if (!isConnective(on, 'on') || who?.kind !== 'word' || (!speed && !demand)) {
    return on && !isConnective(on, 'on')
      ? refuseItem(entry, on, takesLeg, context)
      : refuse(entry, phrase, takesLeg, context);
  }
  if (extra) return refuseItem(entry, extra, takesLeg, context);
  if (who.text === 'shore') {
    if (demand?.by !== 'power' || speed || !isTime) return refuse(entry, phrase, takesLeg, context);
    return { speed, engines: [], shore: demand.quantity };
  }
  const engine = engineNamed(who, context);
  if (!engine) return undefined;
  const { span } = phrase;
  const asked: DemandEntry = demand ? { engine, ...demand, span } : { engine, by: 'speed', quantity: null, span };
  return { speed, engines: [asked], shore: null };
}

const takesDemand = 'a power or a share of the rating, and `on` an engine, such as `180 kW on auxiliary`';

/** `180 kW on auxiliary`, more with commas between them. */
export const demandsReader: Reader<readonly DemandEntry[]> = {
  takes: takesDemand,
  unit: 'kW',
  otherUnits: ['%'],
  connectives: { on: '' },
  names: true,
  kinds: ['engine'],
  read(entry, context) {
    const demands: DemandEntry[] = [];
    for (const phrase of entry.phrases) {
      const demand = readDemand(entry, phrase, context);
      if (!demand) return undefined;
      demands.push(demand);
    }
    return demands;
  },
};

function readDemand(entry: Entry, phrase: Phrase, context: Context): DemandEntry | undefined {
  const [amount, on, who, extra] = phrase.items;
  if (!amount || amount.kind === 'connective' || !isConnective(on, 'on') || who?.kind !== 'word') {
    return refuse(entry, phrase, takesDemand, context);
  }
  if (extra) return refuseItem(entry, extra, takesDemand, context);
  const read = readAs(amount, [powerNeeded, shareNeeded], entry, context);
  const engine = engineNamed(who, context);
  if (!read || !engine) return undefined;
  const { span } = phrase;
  return { engine, by: read.needed === powerNeeded ? 'power' : 'load', quantity: read.quantity, span };
}

/** Heat from a fuel, at an efficiency on its lower heating value. */
export interface BoilerEntry {
  readonly heat: Quantity;
  readonly fuel: Material;
  readonly efficiency: Quantity;
}

/** `400 kW of gas_oil at 88 %` */
export const boilerReader: Reader<BoilerEntry> = {
  takes: "a heat flow, `of` a fuel, and `at` the boiler's efficiency: `400 kW of gas_oil at 88 %`",
  unit: 'kW',
  connectives: { of: '', at: '%' },
  names: true,
  read(entry, context) {
    const { takes } = boilerReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [heat, of, fuel, at, share, extra] = phrase?.items ?? [];
    if (!phrase || !heat) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (heat.kind === 'connective' || !isConnective(of, 'of') || fuel?.kind !== 'word') {
      return refuse(entry, phrase, takes, context);
    }
    if (!isConnective(at, 'at') || !share || share.kind === 'connective') return refuse(entry, phrase, takes, context);
    const quantity = readQuantityItem(heat, powerNeeded, context);
    const material = materialNamed(fuel, context);
    const efficiency = readQuantityItem(share, shareNeeded, context);
    if (!quantity || !material || !efficiency) return undefined;
    if (!isInRange(quantity, 'positive', entry, heat, context)) return undefined;
    // An efficiency of nothing would take fuel without end.
    if (!isInRange(efficiency, 'share', entry, share, context)) return undefined;
    if (!isInRange(efficiency, 'positive', entry, share, context)) return undefined;
    return { heat: quantity, fuel: material, efficiency };
  },
};

export interface ServiceSpeedEntry {
  readonly speed: Quantity;
  readonly load: Quantity;
  readonly seaMargin: Quantity | null;
  readonly fouling: Quantity | null;
  readonly exponent: Quantity | null;
}

const serviceParts = { 'sea margin': 'seaMargin', fouling: 'fouling', exponent: 'exponent' } as const;

/** `13 kn at 85 %, sea margin 15 %, fouling 8 %, exponent 3` */
export const serviceSpeedReader: Reader<ServiceSpeedEntry> = {
  takes:
    'a speed `at` a share of the rating, with `sea margin`, `fouling` and `exponent` if they count: `13 kn at 85 %, sea margin 15 %`',
  words: Object.keys(serviceParts),
  unit: 'kn',
  otherUnits: ['%'],
  connectives: { at: '%' },
  read(entry, context) {
    const { takes } = serviceSpeedReader;
    const [phrase, ...others] = entry.phrases;
    const [speed, at, load, extra] = phrase?.items ?? [];
    if (!phrase || !speed) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (speed.kind === 'connective' || !isConnective(at, 'at') || !load || load.kind === 'connective') {
      return refuse(entry, phrase, takes, context);
    }
    const read = {
      speed: readQuantityItem(speed, speedNeeded, context),
      load: readQuantityItem(load, shareNeeded, context),
    };
    if (!read.speed || !read.load || !isInRange(read.speed, 'positive', entry, speed, context)) return undefined;
    if (!isInRange(read.load, 'positive', entry, load, context)) return undefined;
    let parts: Pick<ServiceSpeedEntry, 'seaMargin' | 'fouling' | 'exponent'> = {
      seaMargin: null,
      fouling: null,
      exponent: null,
    };
    for (const other of others) {
      const part = readServicePart(entry, other, context);
      if (!part) return undefined;
      if (parts[part.key]) return refuse(entry, other, takes, context);
      parts = { ...parts, [part.key]: part.quantity };
    }
    return { speed: read.speed, load: read.load, ...parts };
  },
};

function readServicePart(
  entry: Entry,
  phrase: Phrase,
  context: Context,
): { readonly key: 'seaMargin' | 'fouling' | 'exponent'; readonly quantity: Quantity } | undefined {
  const { takes } = serviceSpeedReader;
  const words = phrase.items.filter((item): item is Word => item.kind === 'word');
  const [value, extra] = phrase.items.slice(words.length);
  const name = words.map(({ text }) => text).join(' ');
  const key = Object.entries(serviceParts).find(([known]) => known === name)?.[1];
  const [first] = words;
  if (!key) {
    if (!first) return refuse(entry, phrase, takes, context);
    reportListedWord(first, entry.words, Object.keys(serviceParts), context);
    return undefined;
  }
  if (extra) return refuseItem(entry, extra, takes, context);
  if (!value || value.kind === 'connective') return refuse(entry, phrase, takes, context);
  const quantity = readQuantityItem(value, shareNeeded, context);
  if (!quantity) return undefined;
  const isNegative = quantity.value < 0 || (key === 'exponent' && quantity.value === 0);
  if (isNegative && !isInRange(quantity, 'positive', entry, value, context)) return undefined;
  return { key, quantity };
}

export interface TestCycleEntry {
  readonly cycle: TestCycle;
  readonly engine: NamedEngine | null;
}

const cycleNames = testCycles.map(({ name }) => name);

/** `E3`, or `E3 on main` */
export const testCycleReader: Reader<TestCycleEntry> = {
  takes: `a test cycle of ISO 8178-4, with \`on\` and an engine if energy is asked for: one of ${cycleNames.map((name) => `\`${name}\``).join(', ')}`,
  words: cycleNames,
  connectives: { on: '' },
  names: true,
  kinds: ['engine'],
  read(entry, context) {
    const { takes } = testCycleReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [word, on, who, extra] = phrase?.items ?? [];
    if (!phrase || !word) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (word.kind !== 'word') return refuse(entry, phrase, takes, context);
    const cycle = testCycleNamed(word.text);
    if (!cycle) {
      reportListedWord(word, entry.words, cycleNames, context);
      return undefined;
    }
    if (!on) return { cycle, engine: null };
    if (!isConnective(on, 'on') || who?.kind !== 'word') return refuseItem(entry, on, takes, context);
    const engine = engineNamed(who, context);
    return engine && { cycle, engine };
  },
};

/** The engine a word stands for; undefined where it is none (said). One that could not be worked out is without a machine. */
export function engineNamed(word: Word, context: Context): NamedEngine | undefined {
  const machine = machineryNamed(word, 'engine', context);
  return machine === undefined ? undefined : { name: word.text, machine };
}

/** The first of the things needed that an expression is, in range; undefined where it is none (said). */
function readAs(
  item: Expression,
  needed: readonly Needed[],
  entry: Entry,
  context: Context,
): { readonly quantity: Quantity; readonly needed: Needed } | undefined {
  const quantity = evaluateExpression(item, context);
  if (!quantity) return undefined;
  const fitting = needed.find(({ dimension }) => sameDimension(dimension, quantity.dimension));
  const [meant] = needed;
  if (!fitting || (fitting === shareNeeded && !isWrittenShare(item, context))) {
    if (meant) {
      const found = sided(quantity, item.span, context);
      context.report(item.span, { code: 'unit/mismatch', form: 'place', found, needed: meant, example: meant.example });
    }
    return undefined;
  }
  // An engine may idle; nothing else of a leg may be nothing.
  const mayBeNothing = (fitting === powerNeeded || fitting === shareNeeded) && quantity.value === 0;
  if (!mayBeNothing && !isInRange(quantity, 'positive', entry, item, context)) return undefined;
  return { quantity, needed: fitting };
}

/** A bare number where a power or a share may stand is neither: `at 85` has lost its unit. */
function isWrittenShare(item: Expression, context: Context): boolean {
  return item.kind !== 'quantity' || /[%a-z]/i.test(context.written(item.span)) || item.number.value <= 1.5;
}

const timeNeeded = neededIn('h');
const lengthNeeded = neededIn('nmi');
const speedNeeded = neededIn('kn');
const powerNeeded = neededIn('kW');

function isExtent(dimension: Needed['dimension']): boolean {
  return sameDimension(dimension, timeNeeded.dimension) || sameDimension(dimension, lengthNeeded.dimension);
}
