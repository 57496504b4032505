// Propagation through functions: exact for linear ones, first order for others, correlated where inputs are shared.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { standardUncertaintyOf } from '../../../../server/core/quantity/parts.ts';
import type { Parts } from '../../../../server/core/quantity/parts.ts';
import { divide, isFault, multiply, quantityOf } from '../../../../server/core/quantity/quantity.ts';
import { propagate } from '../../../../server/core/quantity/uncertainty.ts';
import type { Uncertain } from '../../../../server/core/quantity/uncertainty.ts';

const certain = (value: number): Uncertain => ({ value, parts: new Map() });
const uncertain = (value: number, parts: Record<string, number>): Uncertain => ({
  value,
  parts: new Map(Object.entries(parts)),
});
const standard = (parts: Parts | undefined): number => (parts ? standardUncertaintyOf(parts) : NaN);

describe('propagate', () => {
  test('is exact for linear functions of shared inputs', () => {
    const whole = fc.integer({ min: -1000, max: 1000 });
    fc.assert(
      fc.property(whole, whole, whole, whole, whole, (a, b, partX, partY, shared) => {
        const x = uncertain(5, { x: partX, both: shared });
        const y = uncertain(7, { y: partY, both: 2 * shared });
        const [outcome] = propagate([x, y], ([first = 0, second = 0]) => [a * first + b * second + 3]);
        expect(outcome?.value).toBe(5 * a + 7 * b + 3);
        const part = (name: string): number => outcome?.parts?.get(name) ?? 0;
        // toBeCloseTo takes 0 and -0 for the same number.
        expect(part('x')).toBeCloseTo(a * partX, 9);
        expect(part('y')).toBeCloseTo(b * partY, 9);
        expect(part('both')).toBeCloseTo((a + 2 * b) * shared, 9);
      }),
    );
  });

  test('gives what the arithmetic gives, to first order', () => {
    const [x, y] = [
      quantityOf(10, undefined, new Map([['x', 1e-4]])),
      quantityOf(3, undefined, new Map([['y', 2e-4]])),
    ];
    const outcomes = propagate([x, y], ([a = 0, b = 0]) => [a * b, a / b]);
    for (const [index, exact] of [multiply(x, y), divide(x, y)].entries()) {
      if (isFault(exact)) throw new Error(exact.fault);
      expect(outcomes[index]?.value).toBe(exact.value);
      for (const input of ['x', 'y']) {
        expect(outcomes[index]?.parts?.get(input)).toBeCloseTo(exact.parts.get(input) ?? NaN, 9);
      }
    }
  });

  test('x - x through a function is certain', () => {
    const x = uncertain(12.5, { x: 0.3 });
    const [outcome] = propagate([x, x], ([a = 0, b = 0]) => [a - b]);
    expect(outcome?.parts?.size).toBe(0);
  });

  test('calls the function once, and once parts are read twice more for each root input', () => {
    const count = (inputs: readonly Uncertain[]): number => {
      let calls = 0;
      const outcomes = propagate(inputs, (values) => {
        calls += 1;
        return values;
      });
      expect(outcomes.map(({ value }) => value)).toEqual(inputs.map(({ value }) => value));
      expect(calls).toBe(1);
      for (const { parts } of [...outcomes, ...outcomes]) expect(parts).toBeDefined();
      return calls;
    };
    expect(count([certain(1), certain(2)])).toBe(1);
    expect(count([uncertain(1, { x: 0.1 }), certain(2)])).toBe(3);
    expect(count([uncertain(1, { x: 0.1, y: 1 }), uncertain(2, { x: 1, z: 1 })])).toBe(7);
    expect(count([])).toBe(1);
  });

  test('the GUM example H.1 (end gauge): u_c = 32 nm from its stated contributions', () => {
    // JCGM 100:2008, table H.1: contributions to u(l) in nm, each from an independent input.
    const parts = uncertain(0, { standard: 25, difference: 9.7, expansion: 2.9, temperature: 16.6 });
    const [outcome] = propagate([parts], ([length = 0]) => [length]);
    expect(Math.round(standard(outcome?.parts))).toBe(32);
  });

  test('uses the one side that there is, and says nothing where there is none', () => {
    const share = uncertain(0, { x: 0.01 });
    const [root, log] = propagate([share], ([x = 0]) => [x >= 0 ? 3 * x : NaN, Math.abs(x) > 0 ? NaN : 1]);
    expect(root).toMatchObject({ value: 0 });
    expect(root?.parts?.get('x')).toBeCloseTo(0.03, 14);
    expect(log).toEqual({ value: 1, parts: undefined });
  });

  test('a value that is not finite has no parts', () => {
    const [outcome] = propagate([uncertain(0, { x: 1 })], ([x = 0]) => [x > 0 ? x : NaN]);
    expect(outcome).toEqual({ value: NaN, parts: undefined });
  });
});
