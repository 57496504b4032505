// Saturation pressure of water and ice against the iapws library, and against the printed check values of IF97.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { triplePointK, waterSaturationPressurePa } from '../../../../server/core/substance/water-saturation.ts';

interface Rows {
  readonly rows: readonly { readonly over: string; readonly temperatureK: number; readonly pressurePa: number }[];
}

const { rows } = JSON.parse(readFileSync('test/reference/steam-iapws.json', 'utf8')) as Rows;

test.each(rows)('over $over at $temperatureK K', ({ temperatureK, pressurePa }) => {
  const found = waterSaturationPressurePa(temperatureK) ?? NaN;
  expect(Math.abs(found / pressurePa - 1)).toBeLessThan(1e-9);
});

test('ice and liquid meet at the triple point', () => {
  const below = waterSaturationPressurePa(triplePointK - 1e-6) ?? NaN;
  const above = waterSaturationPressurePa(triplePointK) ?? NaN;
  // The two formulations are independent; both give the triple-point pressure of 611.657 Pa to seven digits.
  expect(below).toBeCloseTo(611.657, 2);
  expect(above).toBeCloseTo(611.657, 2);
});

test('nothing outside the ranges', () => {
  expect(waterSaturationPressurePa(40)).toBeUndefined();
  expect(waterSaturationPressurePa(650)).toBeUndefined();
});
