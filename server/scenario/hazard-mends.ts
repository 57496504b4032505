// Edits that mend a hazard in the text: another gas over the blend, a lower stored temperature, a line that acknowledges it.
// Knows no rule: whether a change mends is asked of the rules themselves, by judging the store as it would then be.
// Invariants: an edit is offered only where its hazard is gone afterwards and no new one has come; the reason of an
// acknowledgement is left empty, which is an error until its author has written one. Margin below a flash point: SOLAS
// II-2/4.2.1 (10 K); the same below a melting point is common practice.

import type { Definition, Entry, Span } from '../../grammar/tree.ts';
import type { Hazard } from '../core/hazard/find-hazards.ts';
import { gasOver, isGas } from '../core/hazard/store.ts';
import type { Store } from '../core/hazard/store.ts';
import { flashPointK } from '../core/hazard/vapour.ts';
import { inUnit, knownUnit } from '../core/quantity/convert.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import type { Context } from './context.ts';
import type { HazardFact } from './hazard-fact.ts';

type Mend = HazardFact['mends'][number];

/** What a mend is looked for in. */
export interface Mendable {
  readonly definition: Definition;
  readonly store: Store;
  readonly stored?: Entry | undefined;
  readonly blanket?: Entry | undefined;
  readonly hazards: readonly Hazard[];
  /** The same blend kept at another temperature. */
  readonly storeAt: (temperatureK: number) => Store;
  readonly judge: (store: Store) => readonly Hazard[];
}

export function mendsOf(hazard: Hazard, mendable: Mendable, context: Context): readonly Mend[] {
  return [...gasMends(hazard, mendable, context), ...temperatureMends(hazard, mendable, context)];
}

const gasCodes: readonly string[] = [
  'hazard/blanket',
  'hazard/superoxide',
  'hazard/flammable-range',
  'hazard/near-flash-point',
  'hazard/oxygen-enriched',
  'hazard/peroxide-former',
];

/** Nitrogen is cheaper, argon suits all. */
const gases = ['nitrogen', 'argon'] as const;

function gasMends(hazard: Hazard, mendable: Mendable, context: Context): readonly Mend[] {
  const { definition, store, blanket } = mendable;
  if (!gasCodes.includes(hazard.code) || store.kind !== 'tank') return [];
  const span = blanket?.phrases[0]?.span;
  if (blanket && !span) return [];
  // Under a gas that is said and is not the matter, another one would be no mend.
  if (blanket && hazard.partner?.kind !== 'gas') return [];
  const found = gases.filter((gas) => isMended(hazard, mendable, hazardsUnder(gas, mendable)));
  return found.map((gas) => ({
    title: `Blanket it with ${gas}`,
    preferred: found.length === 1,
    ...(span ? { place: context.place(span), newText: gas } : lineAfter(definition, `blanket: ${gas}`, context)),
  }));
}

/** The hazards under another gas, worked out once a store: several of its hazards may ask. */
function hazardsUnder(gas: (typeof gases)[number], { store, hazards: asItIs, judge }: Mendable): readonly Hazard[] {
  const ofStore = underGas.get(store) ?? new Map<string, readonly Hazard[]>();
  underGas.set(store, ofStore);
  const known = ofStore.get(gas);
  if (known) return known;
  const substance = findSubstance(gas);
  const hazards = substance ? judge({ ...store, blanket: gasOver([{ substance, moleShare: 1 }], false) }) : asItIs;
  ofStore.set(gas, hazards);
  return hazards;
}

const underGas = new WeakMap<Store, Map<string, readonly Hazard[]>>();

const marginK = 10;
/** Nobody chills a tank below this to keep it from its flash point: there it is inerted. */
const coldestOfferedK = 273.15;

function temperatureMends(hazard: Hazard, mendable: Mendable, context: Context): readonly Mend[] {
  const { stored } = mendable;
  const limitK = limitOf(hazard, mendable.store);
  if (!stored || limitK === null) return [];
  for (const { items } of stored.phrases) {
    const [item, ...others] = items;
    if (item?.kind !== 'quantity' || !item.unit || others.length > 0) continue;
    const unit = temperatureUnits[context.written(item.unit.span)];
    if (unit === undefined) continue;
    const target = quantityOf(limitK - marginK, knownUnit('K').dimension, undefined, 'temperature');
    const number = Math.floor(inUnit(target, unit));
    const isMend =
      target.value >= coldestOfferedK && isMended(hazard, mendable, mendable.judge(mendable.storeAt(target.value)));
    if (!isMend) return [];
    const newText = String(number);
    const title = `Store it at ${newText} ${unit}, 10 K below its ${hazard.code === 'hazard/molten-metal' ? 'melting' : 'flash'} point`;
    return [{ title, preferred: false, place: context.place(item.number.span), newText }];
  }
  return [];
}

const temperatureUnits: Readonly<Partial<Record<string, string>>> = {
  degC: 'degC',
  '°C': 'degC',
  degF: 'degF',
  '°F': 'degF',
  K: 'K',
};

/** What its temperature is too high for; null where that is not the matter. */
function limitOf({ code, numbers }: Hazard, store: Store): number | null {
  if (code === 'hazard/molten-metal') return numbers.limitK ?? null;
  const isOfFlash = code === 'hazard/near-flash-point' || code === 'hazard/flammable-range';
  return isOfFlash && !isGas(store) ? flashPointK(store) : null;
}

function isMended(hazard: Hazard, { hazards }: Mendable, after: readonly Hazard[]): boolean {
  const before = new Set(hazards.map(({ code, portion }) => `${code} ${String(portion)}`));
  return (
    !after.some(({ code, portion }) => code === hazard.code && portion === hazard.portion) &&
    after.every(({ code, portion }) => before.has(`${code} ${String(portion)}`))
  );
}

/** A line that acknowledges the code; its reason is its author's to write. */
export function acknowledgement(code: string, definition: Definition, context: Context): Mend {
  return {
    title: `Acknowledge ${code} with a reason of yours`,
    preferred: false,
    ...lineAfter(definition, `acknowledge ${code}: ""`, context),
  };
}

/**
 * An edit that puts a line behind the last one of a definition. It hangs on what the text says and not on comments and
 * blank space, so that it stays where it belongs when these change.
 */
function lineAfter(definition: Definition, line: string, context: Context): Pick<Mend, 'place' | 'newText'> {
  const { text } = context.placed.section;
  const last: Span = definition.lines.at(-1)?.span ?? definition.header;
  const brace = definition.closed ? definition.span.end - 1 : -1;
  if (brace >= last.end && text.slice(last.end, brace).includes('\n')) {
    return { place: context.place({ start: brace, end: brace }), newText: `  ${line}\n` };
  }
  const mark = definition.lines.length === 0 ? ' ' : '; ';
  return { place: context.place({ start: last.end, end: last.end }), newText: `${mark}${line}` };
}
