// Reads a composition by element (`84.9 % C, 15.1 % H`): shares by mass unless `mole` is written, closed to 100 %, as
// moles of each element per kilogram with their uncertainty. An element whose symbol is also a unit (`K`, `N`, `W`) has
// been read by the grammar as the last word of the amount's unit; it is given back here.

import type { Entry, Phrase, Quantity as QuantityNode, Span } from '../../grammar/tree.ts';
import { massSharesOf, type Basis, type MixturePart } from '../core/balance/mixture.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { noParts } from '../core/quantity/parts.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import { allElements, atomicWeightKgPerMol, elementOfSymbol } from '../core/substance/elements.ts';
import { near, type Context } from './context.ts';
import type { Reader } from './entries.ts';
import { readAmount, reportMixtureFault, type NamedAmount, type WrittenAmount } from './portions.ts';
import { refuse } from './readers.ts';

export interface Composition {
  /** mol/kg */
  readonly elements: ReadonlyMap<string, Quantity>;
  /** The shares missed 100 % by rounding and were scaled. */
  readonly scaled: boolean;
}

export const compositionReader: Reader<Composition> = {
  takes: 'shares of elements, such as `86 % C, 14 % H`',
  unit: '%',
  elements: true,
  read(entry, context) {
    const parts: (NamedAmount & { readonly symbol: string })[] = [];
    for (const phrase of entry.phrases) {
      const part = readPart(entry, phrase, context);
      if (!part) return undefined;
      if (parts.some((other) => other.symbol === part.symbol))
        return refuse(entry, phrase, 'each element once', context);
      parts.push(part);
    }
    return close(entry, parts, context);
  },
};

function readPart(entry: Entry, phrase: Phrase, context: Context): (NamedAmount & { symbol: string }) | undefined {
  const [first, ...rest] = phrase.items;
  if (first?.kind !== 'quantity') return refuse(entry, phrase, compositionReader.takes, context);
  const basisItem = rest[0]?.kind === 'connective' ? rest.shift() : undefined;
  const word = basisItem?.kind === 'connective' ? basisItem.word : undefined;
  if (word === 'volume' || (word !== undefined && word !== 'mass' && word !== 'mole')) {
    return refuse(entry, phrase, compositionReader.takes, context);
  }
  const basis: Basis | undefined = word;
  const [named, extra] = rest;
  if (extra) return refuse(entry, phrase, compositionReader.takes, context);
  let amountNode: QuantityNode = first;
  let symbol: string;
  let symbolSpan: Span;
  if (named?.kind === 'word') {
    ({ text: symbol, span: symbolSpan } = named);
  } else {
    const given = named ? undefined : giveBack(first);
    if (!given) return refuse(entry, phrase, compositionReader.takes, context);
    ({ amountNode, symbol, symbolSpan } = given);
  }
  if (!elementOfSymbol(symbol)) {
    const named = allElements().find(({ name }) => name.toLowerCase() === symbol.toLowerCase());
    const symbols = allElements().map((element) => element.symbol);
    const suggestions = named ? [named.symbol] : near(symbol, symbols);
    context.report(symbolSpan, { code: 'name/unknown', what: 'element', word: symbol, near: suggestions });
    return undefined;
  }
  const amount = readAmount(amountNode, basis, context);
  return amount ? { name: symbol, symbol, amount } : undefined;
}

/** `15 % N` was read as 15 %·newton: the last unit word is the element. */
function giveBack(node: QuantityNode): { amountNode: QuantityNode; symbol: string; symbolSpan: Span } | undefined {
  const tokens = node.unit?.tokens ?? [];
  const last = tokens.at(-1);
  const times = tokens.at(-2);
  if (!node.unit || last?.kind !== 'word' || last.power !== 1 || times?.kind !== 'times') return undefined;
  const kept = tokens.slice(0, -2);
  const end = kept.at(-1)?.span.end ?? node.number.span.end;
  const unit = { tokens: kept, span: { start: node.unit.span.start, end } };
  return {
    amountNode: { ...node, unit, span: { start: node.span.start, end } },
    symbol: last.text,
    symbolSpan: last.span,
  };
}

function close(
  entry: Entry,
  parts: readonly (NamedAmount & { symbol: string })[],
  context: Context,
): Composition | undefined {
  const mixtureParts = (values: readonly number[]): MixturePart[] =>
    parts.map(({ amount, symbol }, index) => ({
      amount:
        amount.kind === 'rest'
          ? { kind: 'rest' }
          : { kind: amount.kind, basis: amount.basis, value: values[index] ?? 0 },
      molarMassKgPerMol: atomicWeightKgPerMol(symbol) ?? null,
      densityKgPerM3: null,
    }));
  const inputs = parts.map(({ amount }) => quantityOfAmount(amount));
  const answer = massSharesOf(mixtureParts(inputs.map((input) => input.value)));
  if ('fault' in answer) {
    reportMixtureFault(answer, parts, context.owner, entry.wordsSpan, context);
    return undefined;
  }
  const outcomes = propagate(inputs, (values) => {
    const moved = massSharesOf(mixtureParts(values), Infinity);
    // Moved by its uncertainty a share may leave its range; the slope from the other side then serves.
    if ('fault' in moved) return [];
    return parts.map(({ symbol }, index) => (moved.massShares[index] ?? 0) / (atomicWeightKgPerMol(symbol) ?? NaN));
  });
  const { dimension } = knownUnit('mol/kg');
  const elements = new Map<string, Quantity>();
  for (const [index, { symbol }] of parts.entries()) {
    const outcome = outcomes[index];
    if (!outcome || !Number.isFinite(outcome.value)) {
      context.report(entry.span, { code: 'balance/no-density', substance: symbol, why: 'molar-mass' });
      return undefined;
    }
    elements.set(symbol, quantityOf(outcome.value, dimension, outcome.parts ?? noParts));
  }
  return { elements, scaled: answer.scaled };
}

function quantityOfAmount(amount: WrittenAmount): Quantity {
  return amount.kind === 'rest' ? quantityOf(0) : amount.quantity;
}
