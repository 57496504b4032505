import { describe, expect, test } from 'vitest';
import { isRounded, numbersShown } from './shown-number.ts';

describe('numbersShown', () => {
  test.each([
    ['lower heating value 35.52 MJ/kg, on the carbonate slate', 'MJ/kg', [35.52]],
    ['**(44.00 ± 0.20) MJ/kg**', 'MJ/kg', [44]],
    ['(1.200 ± 0.010) × 10⁻⁷ mol/kg', 'mol/kg', [1.2e-7]],
    ['−1.205 × 10⁻⁷ 1/s', '1/s', [-1.205e-7]],
    ['2.1 kJ/(kg K) and 3 kJ', 'kJ/(kg K)', [2.1]],
    ['12 kg/kg, 13 kg', 'kg', [13]],
    ['| LHV | 26.1 MJ/kg |', 'MJ/kg', [26.1]],
    ['no number at all', 'MJ/kg', []],
  ])('%s', (text, unit, values) => {
    expect(numbersShown(text, unit).map(({ value }) => value)).toEqual(values);
  });
});

describe('isRounded', () => {
  const [shown] = numbersShown('35.52 MJ/kg', 'MJ/kg');
  test.each([
    [35.5171, true],
    [35.5249, true],
    [35.5251, false],
    [35.51, false],
  ])('35.52 stands for %d: %s', (value, expected) => {
    expect(shown && isRounded(shown, value)).toBe(expected);
  });
});
