// Reads how much of each part a mixture has: the amount before a substance in a blend, or before an element in a
// composition. An amount is a share (a plain number or %), or a mass, an amount of substance or a volume.
// Also turns what is wrong with the amounts as a whole into facts, with the edits that would mend them.

import type { Expression, Span } from '../../grammar/tree.ts';
import { roundingOfShares, type Basis, type MixtureFault } from '../core/balance/mixture.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { isDimensionless, sameDimension } from '../core/quantity/dimension.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Context } from './context.ts';
import { evaluateExpression } from './expressions.ts';
import type { Mend } from './facts.ts';

/** A part's amount with its uncertainty, and where it is written. */
export type WrittenAmount =
  | { readonly kind: 'share' | 'amount'; readonly basis: Basis; readonly quantity: Quantity; readonly span: Span }
  | { readonly kind: 'rest'; readonly span: Span };

const basisOfUnit: readonly (readonly [string, Basis])[] = [
  ['kg', 'mass'],
  ['mol', 'mole'],
  ['m3', 'volume'],
];

/** The amount an expression stands for; null when it is none (said). `basis` is that written behind it, if any. */
export function readAmount(expression: Expression, basis: Basis | undefined, context: Context): WrittenAmount | null {
  if (isShareTimesUnit(expression, context)) return null;
  const quantity = evaluateExpression(expression, context);
  if (!quantity) return null;
  const { span } = expression;
  if (quantity.value < 0) {
    context.report(span, { code: 'balance/negative', text: context.written(span) });
    return null;
  }
  if (isDimensionless(quantity.dimension)) {
    if (quantity.value > 1 + roundingOfShares) {
      context.report(span, { code: 'range/share', text: context.written(span), low: 0, high: 1 });
      return null;
    }
    return { kind: 'share', basis: basis ?? 'mass', quantity, span };
  }
  const own = basisOfUnit.find(([unit]) => sameDimension(knownUnit(unit).dimension, quantity.dimension))?.[1];
  if (!own || (basis && basis !== own)) {
    const found = { text: context.written(span), dimension: quantity.dimension, kind: quantity.kind };
    const example = basisOfUnit.find(([, of]) => of === basis)?.[0] ?? '%';
    const { dimension } = knownUnit(example);
    context.report(span, {
      code: 'unit/mismatch',
      form: 'place',
      found,
      needed: { dimension, kind: 'plain' },
      example,
    });
    return null;
  }
  return { kind: 'amount', basis: own, quantity, span };
}

/** `30 % mol` (said): the unit word multiplies the percent, where the basis `mole` was meant. */
function isShareTimesUnit(expression: Expression, context: Context): boolean {
  if (expression.kind !== 'quantity' || !expression.unit) return false;
  const [percent, times, word, ...more] = expression.unit.tokens;
  if (percent?.text !== '%' || times?.kind !== 'times' || word?.kind !== 'word' || more.length > 0) return false;
  const { dimension } = knownUnit(word.text);
  const basis = basisOfUnit.find(([unit]) => sameDimension(knownUnit(unit).dimension, dimension))?.[1];
  if (!basis) return false;
  const { span } = expression.unit;
  const offers = [`% ${basis}`];
  context.report(span, { code: 'unit/ambiguous', text: context.written(span), offers, why: 'share' });
  return true;
}

/** What the finding about a mixture's amounts needs to know of its parts. */
export interface NamedAmount {
  readonly name: string;
  readonly amount: WrittenAmount;
}

/** Says what is wrong with the amounts of a mixture. `header` is where a fault of the whole is put. */
export function reportMixtureFault(
  fault: MixtureFault,
  parts: readonly NamedAmount[],
  name: string,
  header: Span,
  context: Context,
): void {
  const blamed = 'index' in fault ? parts[fault.index] : undefined;
  const span = blamed?.amount.span ?? header;
  switch (fault.fault) {
    case 'nothing':
      return context.report(header, { code: 'balance/no-portions', name });
    case 'two-rests':
      return context.report(span, { code: 'balance/two-rests', name });
    case 'negative':
      return context.report(span, { code: 'balance/negative', text: context.written(span) });
    case 'no-density':
      return context.report(span, { code: 'balance/no-density', substance: blamed?.name ?? name, why: 'density' });
    case 'no-molar-mass':
      return context.report(span, { code: 'balance/no-density', substance: blamed?.name ?? name, why: 'molar-mass' });
    case 'mixed-amounts':
    case 'rest-with-amounts':
      return context.report(span, { code: 'balance/shares', why: fault.fault, name, sum: null, mends: [] });
    case 'inconsistent':
      return context.report(span, { code: 'balance/shares', why: 'inconsistent', name, sum: fault.found, mends: [] });
    case 'sum':
    case 'no-room': {
      const mends = mendsOf(fault.sum, parts, context);
      return context.report(header, { code: 'balance/shares', why: fault.fault, name, sum: fault.sum, mends });
    }
  }
}

/** Makes the largest share the rest, or changes the last share so that the sum is 1, where these are plain edits. */
function mendsOf(sum: number, parts: readonly NamedAmount[], context: Context): readonly Mend[] {
  const mends: Mend[] = [];
  const shares = parts.flatMap((part) => (part.amount.kind === 'share' ? [{ ...part, amount: part.amount }] : []));
  const largest = shares.reduce<(typeof shares)[number] | undefined>(
    (best, part) => (best && best.amount.quantity.value >= part.amount.quantity.value ? best : part),
    undefined,
  );
  const hasRest = parts.some((part) => part.amount.kind === 'rest');
  const others = largest ? sum - largest.amount.quantity.value : 1;
  if (largest && !hasRest && others < 1 && isLine(largest.amount.span, context)) {
    const place = context.place(withBasis(largest.amount.span, context));
    mends.push({ title: `Make ${largest.name} the rest`, place, newText: 'rest' });
  }
  const last = shares.at(-1);
  if (last) {
    const needed = last.amount.quantity.value + (1 - sum);
    const written = context.written(last.amount.span);
    const percent = /^([\d.]+)( *%)$/.exec(written);
    if (needed > 0 && percent) {
      const newText = `${Number((needed * 100).toPrecision(10))}${percent[2] ?? ' %'}`;
      mends.push({
        title: `Change ${written} ${last.name} to ${newText}`,
        place: context.place(last.amount.span),
        newText,
      });
    }
  }
  return mends;
}

/** The amount with the `mass`, `mole` or `volume` behind it: `rest` takes none, and `rest mass methanol` does not parse. */
function withBasis(span: Span, context: Context): Span {
  const basis = /^[ \t]+(?:mass|mole|volume)(?=[ \t])/.exec(context.placed.section.text.slice(span.end));
  return { start: span.start, end: span.end + (basis?.[0].length ?? 0) };
}

/** Whether an amount stands at the start of a portion's line, where `rest` may replace it together with its basis. */
function isLine(span: Span, context: Context): boolean {
  const before = context.placed.section.text.slice(0, span.start);
  return /(^|\n|;|\{)[ \t]*$/.test(before);
}
