// Quantity arithmetic: values, dimensions, the kinds of temperature and pressure, written uncertainties, and faults.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { dimensionless, dimensionOf } from '../../../../server/core/quantity/dimension.ts';
import {
  add,
  asKind,
  compare,
  describeQuantity,
  divide,
  isFault,
  multiply,
  negate,
  quantityFrom,
  quantityOf,
  raise,
  standardUncertainty,
  subtract,
} from '../../../../server/core/quantity/quantity.ts';
import type { Quantity, QuantityFault, QuantityKind } from '../../../../server/core/quantity/quantity.ts';
import { readUnitText } from '../../../../server/core/quantity/read-unit.ts';
import type { Unit } from '../../../../server/core/quantity/read-unit.ts';

function unit(text: string): Unit {
  const reading = readUnitText(text);
  if (!reading.ok) throw new Error(`${text}: ${JSON.stringify(reading.fault)}`);
  return reading.unit;
}

let inputs = 0;

/** `q(44, 'MJ/kg', 2, '%')`: a number with unit and, where given, an uncertainty in its own or the same unit. */
function written(
  number: number,
  unitText = '1',
  uncertainty?: number,
  uncertaintyUnit?: string,
): Quantity | QuantityFault {
  if (uncertainty === undefined) return quantityFrom(number, unit(unitText));
  inputs += 1;
  const own = uncertaintyUnit === undefined ? {} : { unit: unit(uncertaintyUnit) };
  return quantityFrom(number, unit(unitText), { number: uncertainty, input: `input ${inputs}`, ...own });
}

function sound(answer: Quantity | QuantityFault): Quantity {
  if (isFault(answer)) throw new Error(JSON.stringify(answer));
  return answer;
}

const q = (...args: Parameters<typeof written>): Quantity => sound(written(...args));
const faultOf = (answer: Quantity | QuantityFault | number): string =>
  typeof answer !== 'number' && isFault(answer) ? answer.fault : 'none';

const energy = dimensionOf({ mass: 1, length: 2, time: -2 });
const temperature = dimensionOf({ temperature: 1 });

describe('a written number', () => {
  test.each([
    [q(6.4, 'MW'), 6.4e6, 'plain'],
    [q(30, '%'), 0.3, 'plain'],
    [q(210, 'per year'), 210 / 31557600, 'plain'],
    [q(25, 'degC'), 298.15, 'temperature'],
    [q(300, 'K'), 300, 'kelvin'],
    [q(2, 'barg'), 2e5, 'gauge-pressure'],
    [q(2, 'J/(J/K)'), 2, 'temperature-difference'],
    [q(7), 7, 'plain'],
  ] as const)('%#', (quantity, value, kind) => {
    expect(quantity.value).toBe(value);
    expect(quantity.kind).toBe(kind);
    expect(quantity.parts.size).toBe(0);
    expect(standardUncertainty(quantity)).toBe(0);
  });

  test.each([
    ['in its own unit', q(44.0, 'MJ/kg', 0.2), 0.2e6],
    ['in another unit of the dimension', q(44.0, 'MJ/kg', 200, 'kJ/kg'), 0.2e6],
    ['relative', q(44.0, 'MJ/kg', 2, '%'), 0.88e6],
    ['relative in %, of a negative number', q(-44.0, 'MJ/kg', 2, '%'), 0.88e6],
    ['percentage points on a percentage', q(30, '%', 2, '%'), 0.02],
    ['percentage points, written once', q(30, '%', 2), 0.02],
    ['relative on ppm', q(400, 'ppm', 5, '%'), 20e-6],
    ['relative on a plain number', q(0.5, '1', 10, '%'), 0.05],
    ['a difference behind a temperature', q(25, 'degC', 2, 'K'), 2],
    ['a difference in degrees of the scale', q(68, 'degF', 9), 5],
    ['degrees read as a difference', q(25, 'degC', 2, 'degC'), 2],
    ['kelvins', q(2000, 'K', 200, 'K'), 200],
    ['relative on kelvins', q(2000, 'K', 10, '%'), 200],
    ['a gauge pressure', q(2, 'barg', 0.1, 'bar'), 1e4],
  ])('uncertainty %s', (_, quantity, standard) => {
    expect(standardUncertainty(quantity)).toBeCloseTo(standard, 9);
    expect(quantity.parts.size).toBe(1);
  });

  test('an uncertainty of zero leaves no part', () => expect(q(1, 'm', 0).parts.size).toBe(0));

  test.each([
    [written(1, 'm', -1), 'uncertainty-negative'],
    [written(1, 'm', 1, 's'), 'uncertainty-mismatch'],
    [written(25, 'degC', 2, '%'), 'uncertainty-relative'],
    [written(2, 'barg', 2, '%'), 'uncertainty-relative'],
    [written(1e300, 'EJ'), 'range'],
    [written(1, 'EJ', 1e300), 'range'],
    [written(Infinity, 'm'), 'range'],
    [written(NaN, 'm'), 'range'],
  ])('a fault (%#)', (answer, name) => expect(answer).toMatchObject({ fault: name, operation: 'read' }));
});

describe('arithmetic', () => {
  test('keeps dimensions', () => {
    expect(sound(multiply(q(2, 'kW'), q(3, 'h')))).toMatchObject({ value: 2.16e7, dimension: energy, kind: 'plain' });
    expect(sound(divide(q(1, 'kW h'), q(1, 'MJ')))).toMatchObject({ value: 3.6, dimension: dimensionless });
    expect(sound(raise(q(3, 'm'), q(2)))).toMatchObject({ value: 9, dimension: dimensionOf({ length: 2 }) });
    expect(sound(raise(q(2, 's'), q(-1)))).toMatchObject({ value: 0.5, dimension: dimensionOf({ time: -1 }) });
    expect(sound(raise(q(4), q(0.5))).value).toBe(2);
    expect(sound(raise(q(4, 'm'), q(0)))).toMatchObject({ value: 1, dimension: dimensionless });
    expect(sound(add(q(1, 'km'), q(1, 'm'))).value).toBe(1001);
    expect(sound(subtract(q(1, 'km'), q(1, 'm'))).value).toBe(999);
    expect(sound(negate(q(3, 'EUR'))).value).toBe(-3);
    expect(Object.is(sound(negate(q(0))).value, 0)).toBe(true);
    expect(compare(q(1, 'kWh'), q(3.6, 'MJ'))).toBe(0);
    expect(compare(q(1, 'MW'), q(2, 'kW'))).toBe(1);
    expect(compare(q(1, 'g'), q(2, 'kg'))).toBe(-1);
  });

  test.each([
    ['mass + energy', add(q(1, 'kg'), q(1, 'J')), 'mismatch'],
    ['euros - dollars', subtract(q(1, 'EUR'), q(1, 'USD')), 'mismatch'],
    ['percent + metre', add(q(1, '%'), q(1, 'm')), 'mismatch'],
    ['mass < time', compare(q(1, 'kg'), q(1, 's')), 'mismatch'],
    ['x ^ metre', raise(q(2), q(1, 'm')), 'exponent'],
    ['metre ^ 0.5', raise(q(2, 'm'), q(0.5)), 'exponent'],
    ['metre ^ 21', raise(q(2, 'm'), q(21)), 'exponent'],
    ['metre ^ uncertain 2', raise(q(2, 'm'), q(2, '1', 0.1)), 'exponent'],
    ['1 / 0', divide(q(1), q(0)), 'range'],
    ['0 / 0', divide(q(0), q(0)), 'range'],
    ['root of a negative', raise(q(-1), q(0.5)), 'range'],
    ['0 ^ -1', raise(q(0), q(-1)), 'range'],
    ['overflow', multiply(q(1e200), q(1e200)), 'range'],
    ['an uncertainty at the root of 0', raise(q(0, '1', 0.1), q(0.5)), 'range'],
  ])('%s', (_, answer, name) => expect(faultOf(answer)).toBe(name));

  test('a fault carries both sides', () => {
    const [left, right] = [q(1, 'kg'), q(1, 'J')];
    expect(add(left, right)).toEqual({ fault: 'mismatch', operation: 'add', left, right });
  });
});

describe('temperatures and differences', () => {
  const operands = {
    degC: q(25, 'degC'),
    kelvin: q(300, 'K'),
    difference: sound(subtract(q(30, 'degC'), q(20, 'degC'))),
  };
  type Name = keyof typeof operands;
  const table: readonly (readonly [
    Name,
    '+' | '-' | '<',
    Name,
    QuantityKind | 'two-temperatures' | 'difference-needed' | 'ok',
  ])[] = [
    ['degC', '+', 'degC', 'two-temperatures'],
    ['degC', '+', 'kelvin', 'temperature'],
    ['degC', '+', 'difference', 'temperature'],
    ['kelvin', '+', 'degC', 'two-temperatures'],
    ['kelvin', '+', 'kelvin', 'temperature'],
    ['kelvin', '+', 'difference', 'temperature'],
    ['difference', '+', 'degC', 'temperature'],
    ['difference', '+', 'kelvin', 'temperature-difference'],
    ['difference', '+', 'difference', 'temperature-difference'],
    ['degC', '-', 'degC', 'temperature-difference'],
    ['degC', '-', 'kelvin', 'temperature'],
    ['degC', '-', 'difference', 'temperature'],
    ['kelvin', '-', 'degC', 'temperature-difference'],
    ['kelvin', '-', 'kelvin', 'temperature'],
    ['kelvin', '-', 'difference', 'temperature'],
    ['difference', '-', 'degC', 'difference-needed'],
    ['difference', '-', 'kelvin', 'temperature-difference'],
    ['difference', '-', 'difference', 'temperature-difference'],
    ['degC', '<', 'kelvin', 'ok'],
    ['difference', '<', 'kelvin', 'ok'],
    ['degC', '<', 'difference', 'difference-needed'],
  ];
  test.each(table)('%s %s %s is %s', (leftName, operator, rightName, outcome) => {
    const [left, right] = [operands[leftName], operands[rightName]];
    const answer =
      operator === '+' ? add(left, right) : operator === '-' ? subtract(left, right) : compare(left, right);
    if (typeof answer === 'number') return expect(outcome).toBe('ok');
    expect(isFault(answer) ? answer.fault : answer.kind).toBe(outcome);
    if (!isFault(answer))
      expect(answer.value).toBe(operator === '+' ? left.value + right.value : left.value - right.value);
  });

  test.each([
    ['degC * 2', multiply(q(25, 'degC'), q(2)), 'temperature-scaled'],
    ['2 * degC', multiply(q(2), q(25, 'degC')), 'temperature-scaled'],
    ['degC / 2', divide(q(25, 'degC'), q(2)), 'temperature-scaled'],
    ['heat capacity * degC', multiply(q(2, 'J/K'), q(25, 'degC')), 'temperature-scaled'],
    ['degC ^ 2', raise(q(25, 'degC'), q(2)), 'temperature-scaled'],
    ['-(degC)', negate(q(25, 'degC')), 'temperature-scaled'],
  ])('%s is a fault', (_, answer, name) => expect(faultOf(answer)).toBe(name));

  test('kelvins can be multiplied and keep their choice', () => {
    expect(sound(multiply(q(2), q(300, 'K')))).toMatchObject({ kind: 'kelvin', value: 600, dimension: temperature });
    expect(sound(divide(q(300, 'K'), q(2))).kind).toBe('kelvin');
    expect(sound(multiply(q(2, 'J/K'), q(300, 'K')))).toMatchObject({ kind: 'plain', value: 600, dimension: energy });
    expect(sound(divide(q(600, 'J'), q(2, 'J/K')))).toMatchObject({ kind: 'temperature-difference', value: 300 });
    expect(sound(raise(q(300, 'K'), q(4))).kind).toBe('plain');
  });

  test('a ratio of temperatures is one of thermodynamic temperatures', () => {
    expect(sound(divide(q(26.85, 'degC'), q(600, 'K')))).toMatchObject({ value: 0.5, kind: 'plain' });
  });

  test('a place decides what kelvins are, and nothing else', () => {
    expect(sound(asKind(q(300, 'K'), 'temperature')).kind).toBe('temperature');
    expect(sound(asKind(q(300, 'K'), 'temperature-difference')).kind).toBe('temperature-difference');
    expect(faultOf(asKind(operands.difference, 'temperature'))).toBe('temperature-needed');
    expect(faultOf(asKind(operands.degC, 'temperature-difference'))).toBe('difference-needed');
    expect(faultOf(asKind(q(1, 'm'), 'temperature'))).toBe('mismatch');
    expect(sound(asKind(operands.degC, 'temperature'))).toBe(operands.degC);
  });

  test('are told apart in words', () => {
    expect(describeQuantity(operands.degC)).toEqual({ words: 'a temperature', si: 'K' });
    expect(describeQuantity(operands.difference)).toEqual({ words: 'a temperature difference', si: 'K' });
    expect(describeQuantity(q(1, 'barg'))).toEqual({ words: 'a gauge pressure', si: 'Pa' });
    expect(describeQuantity(q(1, 'bar'))).toEqual({ words: 'a pressure', si: 'Pa' });
  });

  test('a value from core in kelvins is a difference unless said otherwise', () => {
    expect(quantityOf(3, temperature).kind).toBe('temperature-difference');
    expect(quantityOf(3, temperature, new Map(), 'temperature').kind).toBe('temperature');
    expect(quantityOf(3).dimension).toBe(dimensionless);
  });
});

describe('gauge pressures', () => {
  test.each([
    ['gauge + absolute', add(q(2, 'barg'), q(1, 'bar')), 'gauge-and-absolute'],
    ['absolute - gauge', subtract(q(1, 'bar'), q(2, 'barg')), 'gauge-and-absolute'],
    ['gauge < absolute', compare(q(2, 'barg'), q(1, 'bar')), 'gauge-and-absolute'],
    ['an absolute pressure needed', asKind(q(2, 'barg'), 'plain'), 'gauge-and-absolute'],
  ])('%s offers the absolute pressure', (_, answer, name) => {
    expect(answer).toMatchObject({ fault: name, absolutePa: 301325 });
  });

  test.each([
    ['gauge + gauge', add(q(2, 'barg'), q(1, 'barg')), 'gauge-scaled'],
    ['2 * gauge', multiply(q(2), q(1, 'barg')), 'gauge-scaled'],
    ['gauge / gauge', divide(q(2, 'barg'), q(1, 'barg')), 'gauge-scaled'],
    ['-gauge', negate(q(1, 'barg')), 'gauge-scaled'],
    ['a gauge pressure needed', asKind(q(1, 'bar'), 'gauge-pressure'), 'gauge-needed'],
    ['a gauge pressure needed, a mass given', asKind(q(1, 'kg'), 'gauge-pressure'), 'mismatch'],
  ])('%s is a fault', (_, answer, name) => expect(faultOf(answer)).toBe(name));

  test('their difference is a pressure', () => {
    expect(sound(subtract(q(3, 'barg'), q(1, 'barg')))).toMatchObject({ value: 2e5, kind: 'plain' });
    expect(compare(q(3, 'barg'), q(1, 'barg'))).toBe(1);
  });
});

describe('uncertainty follows to first order', () => {
  test('x - x and x / x are certain, whatever x is', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: 1, max: 1e4 }), (value, standard) => {
        const x = q(value / 7, 'kg', standard / 11);
        expect(sound(subtract(x, x)).parts.size).toBe(0);
        expect(standardUncertainty(sound(divide(x, x)))).toBeLessThan(1e-15 * (standard / value));
      }),
    );
  });

  test('independent inputs add in squares, the same input in full', () => {
    const [x, y] = [q(10, 'kg', 3), q(20, 'kg', 4)];
    expect(standardUncertainty(sound(add(x, y)))).toBe(5);
    expect(standardUncertainty(sound(subtract(x, y)))).toBe(5);
    expect(standardUncertainty(sound(add(x, x)))).toBe(6);
    expect(standardUncertainty(sound(negate(x)))).toBe(3);
  });

  test('products, quotients and powers', () => {
    const [x, y] = [q(10, 'm', 1, '%'), q(4, 's', 2, '%')];
    const relative = (answer: Quantity | QuantityFault): number =>
      standardUncertainty(sound(answer)) / sound(answer).value;
    expect(relative(multiply(x, y))).toBeCloseTo(Math.hypot(0.01, 0.02), 14);
    expect(relative(divide(x, y))).toBeCloseTo(Math.hypot(0.01, 0.02), 14);
    expect(relative(raise(x, q(3)))).toBeCloseTo(0.03, 14);
    expect(relative(multiply(x, x))).toBeCloseTo(0.02, 14);
    expect(relative(raise(q(2), q(3, '1', 0.1)))).toBeCloseTo(0.1 * Math.log(2), 14);
  });
});
