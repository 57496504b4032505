import { expect, test } from 'vitest';
import { readUnitText } from '../../../server/core/quantity/read-unit.ts';
import { bracketed, unitForPeople, withUnit } from '../../../server/wording/units.ts';

const FORMS: readonly (readonly [string, string])[] = [
  ['kg/m3', 'kg/m³'],
  ['kJ/(kg K)', 'kJ/(kg K)'],
  ['s^-2', 's⁻²'],
  ['degC', '°C'],
  ['umol/kg', 'µmol/kg'],
  ['m2/s', 'm²/s'],
  ['MJ/L', 'MJ/L'],
  ['t/year', 't/year'],
  ['1/year', 'per year'],
  ['1/(kg s)', 'per (kg s)'],
  ['g/kWh', 'g/kWh'],
];

test.each(FORMS)('%s is shown as %s', (written, shown) => {
  expect(unitForPeople(written)).toBe(shown);
});

test.each(FORMS)('law: the form for people is read back as the same unit (%s)', (written, shown) => {
  expect(readUnitText(shown)).toEqual(readUnitText(written));
  expect(readUnitText(shown).ok).toBe(true);
});

test('a plain number has no unit to show', () => {
  expect(withUnit('1.2', unitForPeople('1'))).toBe('1.2');
});

test('a number with ± is bracketed once, so that the unit belongs to both', () => {
  expect(withUnit(bracketed('44.00 ± 0.20'), 'MJ/kg')).toBe('(44.00 ± 0.20) MJ/kg');
  expect(bracketed('(1.2 ± 0.1) × 10⁻⁷')).toBe('(1.2 ± 0.1) × 10⁻⁷');
  expect(bracketed('44')).toBe('44');
});
