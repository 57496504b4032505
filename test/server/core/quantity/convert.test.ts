// Conversion out of SI: contract units, their uncertainties, and the sibling units of hovers.

import { describe, expect, test } from 'vitest';
import {
  canBeIn,
  inUnit,
  knownUnit,
  siblingUnits,
  tradeUnitsOf,
  uncertaintyInUnit,
} from '../../../../server/core/quantity/convert.ts';
import { dimensionOf } from '../../../../server/core/quantity/dimension.ts';
import { isFault, quantityFrom, subtract } from '../../../../server/core/quantity/quantity.ts';
import type { Quantity, QuantityFault } from '../../../../server/core/quantity/quantity.ts';

function sound(answer: Quantity | QuantityFault): Quantity {
  if (isFault(answer)) throw new Error(answer.fault);
  return answer;
}

const q = (number: number, unit: string, uncertainty?: number): Quantity =>
  sound(
    quantityFrom(number, knownUnit(unit), uncertainty === undefined ? undefined : { number: uncertainty, input: 'x' }),
  );

describe('inUnit', () => {
  test.each([
    [q(35.5, 'MJ/kg'), 'MJ/kg', 35.5],
    [q(780, 'kg/m3'), 'kg/m3', 780],
    [q(105.98844, 'g/mol'), 'g/mol', 105.98844],
    [q(30, '%'), '1', 0.3],
    [q(12, 't/year'), 't/year', 12],
    [q(-1130.8, 'kJ/mol'), 'kJ/mol', -1130.8],
    [q(1, 'kg'), 'g', 1000],
    [q(25, 'degC'), 'K', 298.15],
    [q(298.15, 'K'), 'degC', 25],
    [q(2, 'barg'), 'psig', 29.0075475],
  ])('%# in %s', (quantity, unit, value) => expect(inUnit(quantity, unit)).toBeCloseTo(value, 6));

  test('an uncertainty is a step: no zero of a scale gets into it', () => {
    expect(uncertaintyInUnit(q(25, 'degC', 2), 'degC')).toBe(2);
    expect(uncertaintyInUnit(q(25, 'degC', 5), 'degF')).toBe(9);
    expect(uncertaintyInUnit(q(44, 'MJ/kg', 0.2), 'MJ/kg')).toBeCloseTo(0.2, 15);
    expect(uncertaintyInUnit(q(44, 'MJ/kg'), 'MJ/kg')).toBe(0);
  });

  test('a promise that cannot be kept is a mistake in the program', () => {
    expect(() => inUnit(q(1, 'kg'), 'J')).toThrow('a mass cannot be given in J');
    expect(() => inUnit(q(1, 'kg'), 'furlong')).toThrow('"furlong" is no unit');
    expect(() => inUnit(q(1, 'barg'), 'bar')).toThrow('a gauge pressure cannot be given in bar');
    const difference = sound(subtract(q(30, 'degC'), q(20, 'degC')));
    expect(() => inUnit(difference, 'degC')).toThrow('a temperature difference cannot be given in degC');
    expect(inUnit(difference, 'K')).toBe(10);
  });

  test('canBeIn asks without throwing', () => {
    expect(canBeIn(q(1, 'bar'), knownUnit('psi'))).toBe(true);
    expect(canBeIn(q(1, 'bar'), knownUnit('psig'))).toBe(false);
    expect(canBeIn(q(1, 'K'), knownUnit('degC'))).toBe(true);
  });
});

describe('siblings', () => {
  const texts = (quantity: Quantity, written?: string): string[] =>
    siblingUnits(quantity, written).map(({ unit }) => unit);

  test('are the units of the trade without the one written', () => {
    expect(texts(q(1, 'MJ/kg'), 'MJ/kg')).toEqual(['kWh/kg', 'kJ/kg', 'Btu/lb', 'kcal/kg']);
    expect(texts(q(1, 'kn'), 'kn')).toEqual(['m/s', 'km/h', 'mile/h']);
    expect(texts(q(1, 'bar'), 'bar')).toEqual(['kPa', 'MPa', 'psi', 'atm', 'mmHg']);
    expect(texts(q(25, 'degC'), '\u00b0C')).toEqual(['K', 'degF', 'degR']);
    expect(texts(q(1, 'barg'), 'barg')).toEqual(['psig']);
    expect(texts(q(1, 'mol5'), 'mol5')).toEqual([]);
  });

  test('a difference is never given on a scale', () => {
    expect(texts(sound(subtract(q(30, 'degC'), q(20, 'degC'))))).toEqual(['K', 'degR']);
  });

  test('the written unit chooses between trades that share a dimension', () => {
    expect(texts(q(35, 'MJ/L'), 'MJ/L')).toContain('kWh/m3');
    expect(texts(q(35, 'bar'), 'kPa')).toContain('bar');
  });

  test('have the right values', () => {
    expect(siblingUnits(q(3.6, 'MJ/kg'), 'MJ/kg')[0]).toEqual({ unit: 'kWh/kg', value: 1 });
    expect(siblingUnits(q(25, 'degC'), 'degC')[0]).toEqual({ unit: 'K', value: 298.15 });
  });

  test('completion always has a unit to offer for a dimension', () => {
    expect(tradeUnitsOf(dimensionOf({ mass: 1 }))).toEqual(['kg', 'g', 't', 'lb']);
    expect(tradeUnitsOf(dimensionOf({ temperature: 1 }), 'temperature-difference')).toEqual(['K', 'degR']);
    expect(tradeUnitsOf(dimensionOf({ mass: 3 }))).toEqual(['kg3']);
    expect(tradeUnitsOf(dimensionOf({}))).toEqual(['%', 'ppm']);
  });
});
