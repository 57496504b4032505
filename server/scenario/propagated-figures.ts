// Figures out of one pure function of uncertain quantities: each with its uncertainty by the law of propagation, as a band
// where the function gives ends. Knows no kind. Invariant: a number that is not finite is no figure; the function is
// called once for the values, and again for the uncertainties when somebody reads one.

import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, quantityOfOutcome, type Quantity } from '../core/quantity/quantity.ts';
import { propagate, type Propagated } from '../core/quantity/uncertainty.ts';
import type { Band } from '../core/engine/consumption.ts';
import { lazily } from './lazily.ts';
import type { FigureRow } from './material-figures.ts';
import type { Figure } from './scenario.ts';
import type { Working } from './working.ts';

/** By figure id, in SI: a number, or a band with its ends. What is not there is no figure. */
export type FigureValues = Readonly<Record<string, number | Band | undefined>>;

export function propagatedFigures(
  rows: readonly FigureRow[],
  quantities: readonly Quantity[],
  valuesOf: (values: readonly number[]) => FigureValues,
  workingOf: (row: FigureRow) => Working,
): readonly Figure[] {
  const outcomes = propagate(quantities, (values) => {
    const found = valuesOf(values);
    return rows.flatMap(({ id }) => numbersOf(found[id]));
  });
  return rows.flatMap((row, index): Figure[] => {
    const [value, low, high] = outcomes.slice(3 * index, 3 * index + 3);
    if (!value || !Number.isFinite(value.value)) return [];
    const { id, label, unit, method } = row;
    const isBand =
      low && high && Number.isFinite(low.value) && Number.isFinite(high.value) && isApart(low.value, high.value);
    const figure: Figure = {
      id,
      label,
      unit,
      quantity: quantityIn(value, unit),
      ...(isBand ? { band: { low: quantityIn(low, unit), high: quantityIn(high, unit) } } : {}),
      working: { method, inputs: [], sources: [], assumptions: [] },
    };
    return [lazily(figure, { working: () => workingOf(row) })];
  });
}

/** Ends that differ by floating-point rounding only are no band. */
function isApart(low: number, high: number): boolean {
  return high - low > 1e-9 * Math.max(Math.abs(low), Math.abs(high));
}

function numbersOf(found: number | Band | undefined): readonly number[] {
  if (found === undefined) return [NaN, NaN, NaN];
  return typeof found === 'number' ? [found, NaN, NaN] : [found.value, found.low, found.high];
}

function quantityIn(outcome: Propagated, unit: string): Quantity {
  const { dimension, scale } = knownUnit(unit);
  const quantity = quantityOfOutcome(outcome, dimension);
  if (unit !== 'K' && scale !== 'temperature') return quantity;
  return lazily(quantityOf(outcome.value, dimension, undefined, 'temperature'), { parts: () => quantity.parts });
}
