// What there is to say of a sea: water outside the range of its constants, variables that are too few or too many, no state or
// two, a receiving limit that is passed, alkali that would precipitate. Works nothing out but what a mend needs.
// Invariant: one cause, one fact; figures that do not depend on it are given all the same.

import type { Span } from '../../../grammar/tree.ts';
import { constantsRanges } from '../../core/account/sea/surface-constants.ts';
import type { CarbonateState } from '../../core/account/sea/carbonate-state.ts';
import { enoughDilution } from '../../core/account/sea/delivery.ts';
import { precipitationRisk, type DeliveryWay } from '../../core/account/sea/precipitation.ts';
import { celsiusZeroK } from '../../core/quantity/constants.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { noParts } from '../../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import type { EntriesRead } from '../entries.ts';
import type { Fact } from '../facts.ts';
import type { ReceivingLimit } from '../sea-readers.ts';
import { seaEntries } from './sea-entries.ts';
import { carbonateEntries, type CarbonateEntry, type SolvedSea } from './sea-question.ts';

export type SeaRead = EntriesRead<typeof seaEntries>;

/** A variable that is written, and where. */
export interface WrittenVariable {
  readonly entry: CarbonateEntry;
  readonly quantity: Quantity;
  readonly span: Span;
}

/** Beyond these no constants are worth extrapolating. */
const farthest = { salinity: [0, 50], temperature: [-2, 45], depth: [0, 11000] } as const;

/** Whether the water is one for which there are constants at all; says where they are extrapolated, or not to be had. */
export function checkWater(read: SeaRead, context: Context): boolean {
  const celsius = (value: number): Quantity =>
    quantityOf(value + celsiusZeroK, knownUnit('K').dimension, noParts, 'temperature');
  const metres = (value: number): Quantity => quantityOf(value, knownUnit('m').dimension);
  const salinity = read.practicalSalinity;
  const temperature = read.temperature;
  const { depth } = read;
  const salinityHolds =
    salinity === undefined ||
    checkRange('salinity', salinity.value.quantity.value, salinity.value.quantity, (value) => quantityOf(value), {
      span: salinity.entry.span,
      context,
    });
  const temperatureHolds =
    temperature === undefined ||
    checkRange('temperature', temperature.value.quantity.value - celsiusZeroK, temperature.value.quantity, celsius, {
      span: temperature.entry.span,
      context,
    });
  const depthHolds =
    depth === undefined ||
    checkRange('depth', depth.value.quantity.value, depth.value.quantity, metres, { span: depth.entry.span, context });
  return salinityHolds && temperatureHolds && depthHolds;
}

function checkRange(
  what: keyof typeof farthest,
  value: number,
  quantity: Quantity,
  asQuantity: (value: number) => Quantity,
  { span, context }: { readonly span: Span; readonly context: Context },
): boolean {
  const [least, most] = farthest[what];
  if (value < least || value > most) {
    const range = { low: asQuantity(least), high: asQuantity(most) };
    context.report(span, { code: 'range/sea-water', what, quantity, beyond: [], refused: range });
    return false;
  }
  if (what === 'depth') return true;
  const beyond = constantsRanges.flatMap((range) => {
    const [low, high] = what === 'salinity' ? range.salinity : range.celsius;
    return value < low || value > high ? [{ of: range.of, low: asQuantity(low), high: asQuantity(high) }] : [];
  });
  if (beyond.length > 0) context.report(span, { code: 'range/sea-water', what, quantity, beyond, refused: null });
  return true;
}

/** The variables of the carbonate system that are written, in the order they stand. */
export function writtenVariables(read: SeaRead): readonly WrittenVariable[] {
  return carbonateEntries
    .flatMap((entry): WrittenVariable[] => {
      const written = read[entry.key];
      if (!written || typeof written.value !== 'object' || !('quantity' in written.value)) return [];
      return [{ entry, quantity: written.value.quantity, span: written.entry.span }];
    })
    .sort((left, right) => left.span.start - right.span.start);
}

export interface TakenVariables {
  readonly taken: readonly [WrittenVariable, WrittenVariable] | null;
  readonly extra: readonly WrittenVariable[];
}

/** The first two that say different things; the rest is too many. */
export function takeTwo(written: readonly WrittenVariable[]): TakenVariables {
  const [first, ...others] = written;
  const second = others.find(({ entry }) => entry.variable !== first?.entry.variable);
  if (!first || !second) return { taken: null, extra: [] };
  return { taken: [first, second], extra: others.filter((other) => other !== second) };
}

/** Says that the system is not settled by what is written. */
export function reportTooFew(written: readonly WrittenVariable[], span: Span, context: Context): void {
  const given = written.map(({ entry }) => seaEntries[entry.key].name);
  context.report(span, { code: 'account/sea-variables', why: 'too-few', name: context.owner, given });
}

/** Says of each variable beyond two what the first two make of it. */
export function reportTooMany({ taken, extra }: TakenVariables, sea: SolvedSea, context: Context): void {
  if (!taken) return;
  const names = taken.map(({ entry }) => seaEntries[entry.key].name);
  for (const { entry, quantity, span } of extra) {
    const worked = sea.state ? quantityOf(entry.value(sea.state, sea.water), quantity.dimension) : null;
    context.report(span, {
      code: 'account/sea-variables',
      why: 'too-many',
      taken: names,
      extra: seaEntries[entry.key].name,
      line: context.place(span),
      written: quantity,
      worked,
      unit: entry.unit,
    });
  }
}

/** Says that the two taken have no state, or two. */
export function reportState(taken: readonly WrittenVariable[], sea: SolvedSea, context: Context): void {
  const [first = '', second = ''] = taken.map(({ entry }) => seaEntries[entry.key].name);
  const span = taken[1]?.span ?? taken[0]?.span;
  if (!span || !sea.pair) return;
  if (sea.pair.kind !== 'solved') {
    context.report(span, { code: 'account/sea-state', why: 'none', first, second });
  } else if (sea.pair.other) {
    const [ph, other] = [sea.pair.state.ph, sea.pair.other.ph];
    context.report(span, { code: 'account/sea-state', why: 'two', first, second, ph, other });
  }
}

/** What is looked at in the near field. */
export interface NearField {
  readonly way: DeliveryWay;
  readonly limit: { readonly value: ReceivingLimit; readonly span: Span } | null;
  readonly dilution: { readonly value: number; readonly span: Span } | null;
}

/** Says what the water is held to and does not keep, and what would precipitate; with the dilution that would do. */
export function reportNearField(sea: SolvedSea, { way, limit, dilution }: NearField, context: Context): void {
  const { state, effluent, nearField } = sea;
  if (!state) return;
  if (limit) {
    const passed = passedLimit(state, state, limit.value);
    if (passed) context.report(limit.span, { ...passed, of: 'water', enough: null });
  }
  if (!effluent || !dilution) return;
  const enough = (holds: (mixed: CarbonateState) => boolean): number | null =>
    enoughDilution(state, effluent, dilution.value, holds);
  if (!nearField) {
    const text = context.written(dilution.span);
    context.report(dilution.span, { code: 'range/number', text, why: 'outside-function' });
    return;
  }
  if (limit) {
    const passed = passedLimit(nearField.mixed, state, limit.value);
    const isOwn = passedLimit(state, state, limit.value) !== null;
    const holds = (mixed: CarbonateState): boolean => passedLimit(mixed, state, limit.value) === null;
    if (passed && !isOwn) context.report(limit.span, { ...passed, of: 'near-field', enough: enough(holds) });
  }
  const risk = precipitationRisk(nearField.mixed, way);
  if (risk === 'none') return;
  context.report(dilution.span, {
    code: 'account/precipitation',
    risk,
    ph: nearField.mixed.ph,
    aragoniteSaturation: nearField.mixed.aragoniteSaturation,
    enough: enough((mixed) => precipitationRisk(mixed, way) === 'none'),
  });
}

type PassedLimit = Omit<Extract<Fact, { readonly code: 'account/receiving-limit' }>, 'of' | 'enough'>;

function passedLimit(mixed: CarbonateState, before: CarbonateState, limit: ReceivingLimit): PassedLimit | null {
  const { band, change } = limit;
  const code = 'account/receiving-limit';
  const { ph } = mixed;
  if (band && ph < band.low.value) return { code, why: 'below', ph, limit: band.low.value };
  if (band && ph > band.high.value) return { code, why: 'above', ph, limit: band.high.value };
  const moved = Math.abs(ph - before.ph);
  return change && moved > change.value ? { code, why: 'change', ph: moved, limit: change.value } : null;
}
