// Carries uncertainty through any numerical function by the law of propagation, to first order and with correlations.
// Each independent input is moved by plus and minus its standard uncertainty, all the values that depend on it together,
// and half the change of the outcome is that input's part. It knows nothing of what the function computes.
// Most outcomes are looked at for their value alone, so the parts are worked out when somebody first reads one of them.
// Invariant: exact for linear functions; the function is called once at the values, and 2n times more for n inputs with
// uncertainty when parts are read. It must be pure.
// Source: JCGM 100:2008 (GUM), sections 5.1.2 and 5.1.3 note 2.

import { noParts } from './parts.ts';
import type { Parts } from './parts.ts';

/** A number and its parts; every `Quantity` is one. */
export interface Uncertain {
  readonly value: number;
  readonly parts: Parts;
}

/** An outcome of `propagate`. */
export interface Propagated {
  /** What the function gave at the values themselves; not finite only if the function gave that. */
  readonly value: number;
  /** Undefined when the outcome could not be had on either side of an uncertain input, so that its part is unknown. */
  readonly parts: Parts | undefined;
}

/**
 * The outcomes of `f` at the inputs' values, each with its parts. Where `f` gives no finite number on one side only (a
 * share at 0, a temperature at the end of its data), the other side alone gives the slope.
 */
export function propagate(
  inputs: readonly Uncertain[],
  f: (values: readonly number[]) => readonly number[],
): readonly Propagated[] {
  const centre = f(inputs.map(({ value }) => value));
  let known: readonly (Parts | undefined)[] | undefined;
  const partsOf = (index: number): Parts | undefined => (known ??= partsOfOutcomes(inputs, f, centre))[index];
  return centre.map((value, index) => new Outcome(value, index, partsOf));
}

class Outcome implements Propagated {
  readonly #index: number;
  readonly #partsOf: (index: number) => Parts | undefined;

  constructor(
    readonly value: number,
    index: number,
    partsOf: (index: number) => Parts | undefined,
  ) {
    this.#index = index;
    this.#partsOf = partsOf;
  }

  get parts(): Parts | undefined {
    return this.#partsOf(this.#index);
  }
}

function partsOfOutcomes(
  inputs: readonly Uncertain[],
  f: (values: readonly number[]) => readonly number[],
  centre: readonly number[],
): readonly (Parts | undefined)[] {
  const roots = new Set<string>();
  for (const input of inputs) for (const root of input.parts.keys()) roots.add(root);
  if (roots.size === 0) return centre.map(() => noParts);

  const parts: (Map<string, number> | undefined)[] = centre.map(() => new Map());
  for (const root of roots) {
    const above = f(inputs.map((input) => input.value + (input.parts.get(root) ?? 0)));
    const below = f(inputs.map((input) => input.value - (input.parts.get(root) ?? 0)));
    for (const [index, value] of centre.entries()) {
      const part = halfChange(above[index] ?? NaN, value, below[index] ?? NaN);
      if (part === undefined) parts[index] = undefined;
      else if (part !== 0) parts[index]?.set(root, part);
    }
  }
  return parts;
}

function halfChange(above: number, centre: number, below: number): number | undefined {
  const [hasAbove, hasBelow] = [Number.isFinite(above), Number.isFinite(below)];
  if (hasAbove && hasBelow) return (above - below) / 2;
  if (!Number.isFinite(centre)) return undefined;
  if (hasAbove) return above - centre;
  return hasBelow ? centre - below : undefined;
}
