// The readers of what only a service and a comparison take: a duty or service by name, a reserve, tanks, what becomes of the
// residue, fuels to set side by side. Each reports what it cannot take, at that phrase. Works nothing out.
// Invariant: a reader looks at every item of every phrase it is given.

import type { Entry, Phrase } from '../../grammar/tree.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import type { Context } from './context.ts';
import type { Reader } from './entries.ts';
import type { Material } from './material.ts';
import { materialNamed } from './materials.ts';
import { machineryNamed, type MachineryKind, type MachineryOf } from './named-machinery.ts';
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

/** A definition of one kind by its name: what it is to the work done, or null where it could not be worked out. */
export function machineryReader<Kind extends MachineryKind>(kind: Kind): Reader<MachineryOf<Kind> | null> {
  const takes = `a ${kind} by name`;
  return {
    takes,
    names: true,
    kinds: [kind],
    read(entry, context) {
      const phrase = onlyPhrase(entry, takes, context);
      const [word, extra] = phrase?.items ?? [];
      if (!phrase || !word) return undefined;
      if (extra) return refuseItem(entry, extra, takes, context);
      if (word.kind !== 'word') return refuse(entry, phrase, takes, context);
      return machineryNamed(word, kind, context);
    },
  };
}

/** `20 % of duty fuel` */
export const reserveReader: Reader<Quantity> = {
  takes: 'a share of the fuel of the duties, such as `20 % of duty fuel`',
  unit: '%',
  connectives: { of: '' },
  read(entry, context) {
    const { takes } = reserveReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [share, of, duty, fuel, extra] = phrase?.items ?? [];
    if (!phrase || !share) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (share.kind === 'connective') return refuse(entry, phrase, takes, context);
    const isWhole = isConnective(of, 'of') && isWord(duty, 'duty') && isWord(fuel, 'fuel');
    if (of && !isWhole) return refuseItem(entry, of, takes, context);
    const quantity = readQuantityItem(share, shareNeeded, context);
    if (!quantity) return undefined;
    return quantity.value >= 0 || isInRange(quantity, 'positive', entry, share, context) ? quantity : undefined;
  },
};

/** Shares of the space a tank takes up that is tank: common practice of tank arrangements. */
export const tankForms = {
  prismatic: 0.95,
  cylindrical: 0.65,
  cryogenic: 0.5,
  inerted: 0.9,
} as const;
export type TankForm = keyof typeof tankForms;
const formWords = Object.keys(tankForms) as TankForm[];

export interface TanksEntry {
  readonly maximumFilling: Quantity | null;
  readonly massPerFuel: Quantity | null;
  /** The fuel that the mass of tank is for; null: any. */
  readonly massFuel: Material | null;
  readonly capacity: Quantity | null;
  readonly form: TankForm | null;
}

/** `maximum filling 95 %, 0.45 kg tank per kg slurry, cylindrical, capacity 120 m3` */
export const tanksReader: Reader<TanksEntry> = {
  takes:
    '`maximum filling` and a share, a mass of tank per mass of fuel, a form, and a `capacity`: `maximum filling 95 %, 0.45 kg tank per kg slurry, cylindrical, capacity 120 m3`',
  words: ['maximum filling', 'capacity', ...formWords],
  unit: '%',
  otherUnits: ['kg/kg', 'm3'],
  connectives: { per: 'kg' },
  names: true,
  read(entry, context) {
    let tanks: TanksEntry = { maximumFilling: null, massPerFuel: null, massFuel: null, capacity: null, form: null };
    for (const phrase of entry.phrases) {
      const part = readTankPhrase(entry, phrase, context);
      if (!part) return undefined;
      const isTwice = Object.keys(part).some((key) => tanks[key as keyof TanksEntry] !== null);
      if (isTwice) return refuse(entry, phrase, tanksReader.takes, context);
      tanks = { ...tanks, ...part };
    }
    return tanks;
  },
};

function readTankPhrase(entry: Entry, phrase: Phrase, context: Context): Partial<TanksEntry> | undefined {
  const { takes } = tanksReader;
  const [first, second, third, ...more] = phrase.items;
  if (!first || first.kind === 'connective') return refuse(entry, phrase, takes, context);
  if (first.kind !== 'word') return readTankMass(entry, phrase, context);
  const form = formWords.find((word) => word === first.text);
  if (form) return second ? refuseItem(entry, second, takes, context) : { form };
  const isFilling = first.text === 'maximum' && isWord(second, 'filling');
  const [value, extra] = isFilling ? [third, more[0]] : [second, third];
  if (!isFilling && first.text !== 'capacity') {
    reportListedWord(first, entry.words, ['maximum filling', 'capacity', ...formWords], context);
    return undefined;
  }
  if (!value || value.kind === 'connective') return refuse(entry, phrase, takes, context);
  if (extra) return refuseItem(entry, extra, takes, context);
  const quantity = readQuantityItem(value, isFilling ? shareNeeded : volumeNeeded, context);
  if (!quantity || !isInRange(quantity, 'positive', entry, value, context)) return undefined;
  if (isFilling && !isInRange(quantity, 'share', entry, value, context)) return undefined;
  return isFilling ? { maximumFilling: quantity } : { capacity: quantity };
}

/** `0.45 kg tank per kg slurry`, or `0.45 kg/kg` */
function readTankMass(entry: Entry, phrase: Phrase, context: Context): Partial<TanksEntry> | undefined {
  const { takes } = tanksReader;
  const [amount, tank, per, unit, fuel, extra] = phrase.items;
  if (!amount || amount.kind === 'connective') return refuse(entry, phrase, takes, context);
  if (!tank) {
    const ratio = readQuantityItem(amount, ratioNeeded, context);
    return ratio && isInRange(ratio, 'positive', entry, amount, context) ? { massPerFuel: ratio } : undefined;
  }
  if (!isWord(tank, 'tank') || !isConnective(per, 'per') || unit?.kind !== 'lone-unit' || fuel?.kind !== 'word') {
    return refuseItem(entry, tank, takes, context);
  }
  if (extra) return refuseItem(entry, extra, takes, context);
  const mass = readQuantityItem(amount, massNeeded, context);
  const fuelUnit = knownMassUnit(context.written(unit.span));
  if (!mass || !isInRange(mass, 'positive', entry, amount, context)) return undefined;
  if (fuelUnit === null) return refuseItem(entry, unit, takes, context);
  const massFuel = materialNamed(fuel, context);
  if (!massFuel) return undefined;
  const parts = new Map([...mass.parts].map(([input, part]) => [input, part / fuelUnit]));
  return { massPerFuel: quantityOf(mass.value / fuelUnit, ratioNeeded.dimension, parts), massFuel };
}

function knownMassUnit(text: string): number | null {
  const kilograms: Readonly<Record<string, number>> = { kg: 1, g: 1e-3, t: 1e3 };
  return kilograms[text] ?? null;
}

export type ResidueEntry = { readonly to: 'kept' } | { readonly to: 'discharged'; readonly permit: string };

/** `kept on board`, or `discharged under "permit"` */
export const residueReader: Reader<ResidueEntry> = {
  takes: '`kept on board`, or `discharged under "…"` with the permit that allows it',
  words: ['kept on board', 'discharged under'],
  read(entry, context) {
    const { takes } = residueReader;
    const phrase = onlyPhrase(entry, takes, context);
    const [first, second, third, extra] = phrase?.items ?? [];
    if (!phrase || !first) return undefined;
    if (extra) return refuseItem(entry, extra, takes, context);
    if (isWord(first, 'kept') && isConnective(second, 'on') && isWord(third, 'board')) return { to: 'kept' };
    if (isWord(first, 'discharged') && isWord(second, 'under') && third?.kind === 'text' && third.value.trim() !== '') {
      return { to: 'discharged', permit: third.value };
    }
    return refuse(entry, phrase, takes, context);
  },
};

/** Fuels by name with commas between them. */
export const fuelsReader: Reader<readonly Material[]> = {
  takes: 'blends and substances with commas between them, such as `slurry, gas_oil, methanol`',
  names: true,
  read(entry, context) {
    const fuels: Material[] = [];
    for (const phrase of entry.phrases) {
      const [word, extra] = phrase.items;
      if (extra) return refuseItem(entry, extra, fuelsReader.takes, context);
      if (word?.kind !== 'word') return refuse(entry, phrase, fuelsReader.takes, context);
      const fuel = materialNamed(word, context);
      if (!fuel) return undefined;
      if (!fuels.some(({ name }) => name === fuel.name)) fuels.push(fuel);
    }
    return fuels;
  },
};

const volumeNeeded = neededIn('m3');
const massNeeded = neededIn('kg');
const ratioNeeded = neededIn('kg/kg');
