// Dimensions: the laws of a commutative group, and names that say what their SI units measure.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  describeDimension,
  dimensionKey,
  dimensionless,
  dimensionOf,
  divideDimensions,
  isDimensionless,
  listNamedDimensions,
  multiplyDimensions,
  raiseDimension,
  sameDimension,
} from '../../../../server/core/quantity/dimension.ts';
import type { Dimension } from '../../../../server/core/quantity/dimension.ts';
import { readUnitText } from '../../../../server/core/quantity/read-unit.ts';

const exponent = fc.integer({ min: -5, max: 5 });
const dimension: fc.Arbitrary<Dimension> = fc.record({
  length: exponent,
  mass: exponent,
  time: exponent,
  temperature: exponent,
  amount: exponent,
  current: exponent,
  euro: exponent,
  dollar: exponent,
  pound: exponent,
});

function dimensionOfUnit(text: string): Dimension {
  const reading = readUnitText(text);
  if (!reading.ok) throw new Error(`${text}: ${reading.fault.fault}`);
  return reading.unit.dimension;
}

describe('dimensions are a commutative group', () => {
  test('multiplication is associative and commutative, with an identity and inverses', () => {
    fc.assert(
      fc.property(dimension, dimension, dimension, (a, b, c) => {
        expect(multiplyDimensions(multiplyDimensions(a, b), c)).toEqual(
          multiplyDimensions(a, multiplyDimensions(b, c)),
        );
        expect(multiplyDimensions(a, b)).toEqual(multiplyDimensions(b, a));
        expect(multiplyDimensions(a, dimensionless)).toEqual(a);
        expect(divideDimensions(a, a)).toEqual(dimensionless);
        expect(multiplyDimensions(divideDimensions(a, b), b)).toEqual(a);
      }),
    );
  });

  test('raising is repeated multiplication', () => {
    fc.assert(
      fc.property(dimension, exponent, exponent, (a, m, n) => {
        expect(raiseDimension(a, m + n)).toEqual(multiplyDimensions(raiseDimension(a, m), raiseDimension(a, n)));
        expect(raiseDimension(raiseDimension(a, m), n)).toEqual(raiseDimension(a, m * n));
      }),
    );
    expect(Object.is(raiseDimension(dimensionless, -1).mass, 0)).toBe(true);
  });

  test('equality, keys and records agree', () => {
    fc.assert(
      fc.property(dimension, dimension, (a, b) => {
        const same = JSON.stringify(a) === JSON.stringify(b);
        expect(sameDimension(a, b)).toBe(same);
        expect(dimensionKey(a) === dimensionKey(b)).toBe(same);
        expect(sameDimension(a, { ...a })).toBe(true);
      }),
    );
    expect(isDimensionless(dimensionOf({}))).toBe(true);
    expect(isDimensionless(dimensionOf({ pound: 1 }))).toBe(false);
  });
});

describe('a dimension in words', () => {
  test.each([
    ['MJ/kg', 'a specific energy', 'J/kg'],
    ['bar', 'a pressure', 'Pa'],
    ['kW', 'a power', 'W'],
    ['t/year', 'a mass flow', 'kg/s'],
    ['g/kWh', 'a mass per energy', 'kg/J'],
    ['EUR/MWh', 'a price per energy in euros', 'EUR/J'],
    ['USD', 'an amount of money in US dollars', 'USD'],
    ['umol/kg', 'an amount per mass', 'mol/kg'],
    ['%', 'a plain number', '1'],
    ['kJ/(kg K)', 'a specific heat capacity', 'J/(kg K)'],
    ['1/year', 'a rate', '1/s'],
    ['m5 kg', 'a quantity in kg m5', 'kg m5'],
    ['m/(kg2 K)', 'a quantity in m/(kg2 K)', 'm/(kg2 K)'],
    ['1/mol3', 'a quantity in 1/mol3', '1/mol3'],
    ['EUR/USD', 'a quantity in EUR/USD', 'EUR/USD'],
  ])('%s is %s', (unit, words, si) => expect(describeDimension(dimensionOfUnit(unit))).toEqual({ words, si }));

  test('the SI units of every named dimension measure it, with factor 1', () => {
    expect(listNamedDimensions().length).toBeGreaterThan(70);
    for (const named of listNamedDimensions()) {
      const reading = readUnitText(named.si);
      expect(reading.ok && reading.unit.up === reading.unit.down, named.si).toBe(true);
      expect(describeDimension(dimensionOfUnit(named.si)), named.si).toEqual(named);
      expect(named.words).toMatch(/^an? /);
    }
  });

  test('names are not used twice', () => {
    const words = listNamedDimensions().map((named) => named.words);
    expect(new Set(words).size).toBe(words.length);
  });

  test('the SI text of any dimension reads back', () => {
    fc.assert(
      fc.property(dimension, (any) => {
        expect(dimensionOfUnit(describeDimension(any).si)).toEqual(any);
      }),
    );
  });
});
