import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  formatCount,
  formatNumber,
  formatPercent,
  formatWithUncertainty,
  superscript,
} from '../../../server/wording/numbers.ts';

describe('four significant digits, never fixed decimals', () => {
  test.each([
    [35.4612, '35.46'],
    [1985.3, '1985'],
    [105.988, '106.0'],
    [12345.6, '12350'],
    [0.0001205, '0.0001205'],
    [0.145249, '0.1452'],
    [9999.6, '10000'],
    [0.00009999, '9.999 × 10⁻⁵'],
    [1.2051e-7, '1.205 × 10⁻⁷'],
    [9_999_999, '1.000 × 10⁷'],
    [1e7, '1 × 10⁷'],
    [6.02214076e23, '6.022 × 10²³'],
    [-1130.68, '−1131'],
    [-1.2051e-7, '−1.205 × 10⁻⁷'],
  ])('%d is %s', (value, text) => {
    expect(formatNumber(value)).toBe(text);
  });

  test('an exact number goes without zeros, a rounded one keeps them', () => {
    expect([0.3, 0.1 + 0.2, 25, 120, 2.1].map((value) => formatNumber(value))).toEqual([
      '0.3',
      '0.3',
      '25',
      '120',
      '2.1',
    ]);
    expect([119.96, 1.99996].map((value) => formatNumber(value))).toEqual(['120.0', '2.000']);
  });

  test('plain style is ASCII', () => {
    expect(formatNumber(-1.2051e-7, 'plain')).toBe('-1.205e-7');
    expect(formatNumber(-12, 'plain')).toBe('-12');
  });

  test('zero has no sign, and what is no number is a dash', () => {
    expect([0, -0].map((value) => formatNumber(value))).toEqual(['0', '0']);
    expect([Number.NaN, Number.POSITIVE_INFINITY].map((value) => formatNumber(value))).toEqual(['–', '–']);
  });

  test('law: the plain text read back is within half a unit of its fourth digit', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e200, max: 1e200 }), (value) => {
        // Below about 1e-308 a double has no four digits of its own to be kept.
        fc.pre(value === 0 || Math.abs(value) > 1e-300);
        const back = Number(formatNumber(value, 'plain'));
        expect(Math.abs(back - value)).toBeLessThanOrEqual(Math.abs(value) * 0.5001e-3);
      }),
    );
  });
});

describe('value ± uncertainty', () => {
  test.each([
    [44.0, 0.2, '44.00 ± 0.20'],
    [35.4612, 0.1243, '35.46 ± 0.12'],
    [35.4612, 0.0996, '35.46 ± 0.10'],
    [35.4612, 12.43, '35 ± 12'],
    [1985.3, 123.4, '1990 ± 120'],
    [0.00012, 0.00034, '0.00012 ± 0.00034'],
    [0.5, 7, '0.5 ± 7.0'],
    [-285.83, 0.04, '−285.830 ± 0.040'],
    [1.2051e-7, 1.24e-9, '(1.205 ± 0.012) × 10⁻⁷'],
    [6.0221e23, 1.2e21, '(6.022 ± 0.012) × 10²³'],
  ])('%d ± %d is %s', (value, uncertainty, text) => {
    expect(formatWithUncertainty(value, uncertainty)).toBe(text);
  });

  test.each([null, 0, 1e-14])('with %s there is nothing to show', (uncertainty) => {
    expect(formatWithUncertainty(44.2, uncertainty)).toBe('44.2');
  });

  test('plain style is ASCII', () => {
    expect(formatWithUncertainty(-1.2051e-7, 1.24e-9, 'plain')).toBe('(-1.205 +/- 0.012)e-7');
  });

  test('law: value and uncertainty end at the same decimal', () => {
    const decimals = (text: string): number => (text.split('.')[1] ?? '').length;
    fc.assert(
      fc.property(
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e5, noNaN: true }),
        (value, uncertainty) => {
          const [left = '', right = ''] = formatWithUncertainty(value, uncertainty).split(' ± ');
          expect(decimals(left)).toBe(decimals(right));
        },
      ),
    );
  });
});

test('percent, counts and powers', () => {
  expect([formatPercent(0.3), formatPercent(0.00012), formatPercent(-0.05)]).toEqual(['30 %', '0.012 %', '−5 %']);
  expect(formatCount(-3)).toBe('−3');
  expect(superscript('-17')).toBe('⁻¹⁷');
});
