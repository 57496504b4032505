import { describe, expect, test } from 'vitest';
import {
  dimensionPhrase,
  distanceText,
  figureText,
  handyUnit,
  quantityText,
  readingIn,
  toldText,
} from '../../../server/wording/quantities.ts';
import { figure, quantity } from '../../support/scenario-builder.ts';

test('a quantity in the unit asked for, with its uncertainty', () => {
  expect(quantityText(quantity(35.4612, 'MJ/kg'), 'MJ/kg')).toBe('35.46 MJ/kg');
  expect(quantityText(quantity(44, 'MJ/kg', 0.2), 'MJ/kg')).toBe('(44.00 ± 0.20) MJ/kg');
  expect(quantityText(quantity(44, 'MJ/kg', 0.2), 'MJ/kg', 'plain')).toBe('(44.00 +/- 0.20) MJ/kg');
  expect(quantityText(quantity(780, 'kg/m3'), 'kg/m3')).toBe('780 kg/m³');
});

describe('without a unit, one that gives a handy number', () => {
  test.each([
    [quantity(210, '1/year'), '210 per year'],
    [quantity(44, 'MJ/kg'), '44 MJ/kg'],
    [quantity(6400, 'kW'), '6.4 MW'],
    [quantity(231, 'g/kWh'), '231 g/kWh'],
    [quantity(105.99, 'g/mol'), '106.0 g/mol'],
    [quantity(2.5, '1'), '2.5'],
    [quantity(0, 'kg'), '0 mg'],
    [quantity(3, 'barg', 0, 'gauge-pressure'), '3 barg'],
  ])('%#', (value, text) => {
    expect(quantityText(value)).toBe(text);
  });

  test('a dimension without trade units is in SI', () => {
    expect(handyUnit(quantity(1, 'kg m'))).toBe('kg m');
  });
});

test('a temperature is told in °C, too; a difference is not', () => {
  expect(toldText(quantity(1985.3, 'K', 0, 'temperature'), 'K')).toBe('1985 K (1712 °C)');
  expect(toldText(quantity(200, 'K', 0, 'temperature-difference'), 'K')).toBe('200 K');
  expect(quantityText(quantity(18, 'degC', 0, 'temperature'), 'degC')).toBe('18 °C');
});

test('the uncertainty of a temperature in °C is a step', () => {
  expect(readingIn({ ...quantity(300, 'K', 2, 'temperature') }, 'degC').uncertainty).toBeCloseTo(2, 12);
});

test('shares are read in percent, other plain numbers are not', () => {
  expect(figureText(figure('condensed-share', 0.1234, '1'))).toBe('12.34 %');
  expect(figureText(figure('condensed-share', 0.3, '1', { uncertainty: 0.02 }))).toBe('(30.0 ± 2.0) %');
  expect(figureText(figure('alkali-carbon-ratio', 0.3, '1'))).toBe('0.3');
  // An uncertainty below half a unit of the fourth digit says nothing of four digits.
  expect(figureText(figure('flame-temperature', 2446.76, 'K', { uncertainty: 0.041 }))).toBe('2447 K (2174 °C)');
  expect(figureText(figure('flame-temperature', 2446.76, 'K', { uncertainty: 0.51 }))).toMatch(
    /^\(2446\.76 ± 0\.51\) K/,
  );
  expect(figureText(figure('released-share', 0.99999999641, '1', { uncertainty: 1.6e-8 }))).toBe('100.0 %');
  expect(figureText(figure('condensed-share', 0, '1', { uncertainty: 1e-9 }))).toMatch(/±/);
});

test('a distance is positive, and of temperatures it is in K', () => {
  expect(distanceText(quantity(32.1, 'MJ/kg'), quantity(33, 'MJ/kg'), 'MJ/kg')).toBe('0.9 MJ/kg');
  expect(distanceText(quantity(0.3, '1'), quantity(0.4, '1'), '%')).toBe('10 percentage points');
  const [hot, cold] = [quantity(500, 'degC', 0, 'temperature'), quantity(300, 'degC', 0, 'temperature')];
  expect(distanceText(hot, cold, 'degC')).toBe('200 K');
  expect(distanceText(hot, cold, 'K')).toBe('200 K');
});

test('dimensions in words', () => {
  expect(dimensionPhrase(quantity(1, 'kW'))).toBe('a power (W)');
  expect(dimensionPhrase(quantity(1, 'kg/m3'))).toBe('a density (kg/m³)');
  expect(dimensionPhrase(quantity(1, '1'))).toBe('a plain number');
  expect(dimensionPhrase(quantity(1, 'K', 0, 'temperature-difference'))).toBe('a temperature difference (K)');
  expect(dimensionPhrase(quantity(1, 'kg3 m'))).toBe('a quantity in kg³ m');
});
