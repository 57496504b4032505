// Uncertain quantities in one list, each with a way back to its number among the values of all: what a pure function of
// many quantities is handed for the law of propagation. Knows nothing of what they are.

import type { Quantity } from '../core/quantity/quantity.ts';

/** Reads one number out of the values of the whole list. */
export type NumberIn = (values: readonly number[]) => number;

export class QuantityList {
  readonly #quantities: Quantity[] = [];

  /** In the order in which they were added. */
  get quantities(): readonly Quantity[] {
    return this.#quantities;
  }

  get values(): readonly number[] {
    return this.#quantities.map(({ value }) => value);
  }

  /** Adds a quantity; one that is not there reads as `otherwise`. */
  add(quantity: Quantity | null, otherwise = NaN): NumberIn {
    if (!quantity) return () => otherwise;
    const index = this.#quantities.push(quantity) - 1;
    return (values) => values[index] ?? otherwise;
  }

  /** Adds several; reads their numbers in order. */
  addAll(quantities: readonly Quantity[]): (values: readonly number[]) => readonly number[] {
    const start = this.#quantities.length;
    this.#quantities.push(...quantities);
    return (values) => values.slice(start, start + quantities.length);
  }
}
