// What a fuel takes up between 25 °C and the temperature it comes in with, where that changes its phase.
import { describe, expect, test } from 'vitest';
import { materialOfSubstance } from '../../../server/scenario/materials.ts';
import { preheatOf, type Preheat } from '../../../server/scenario/preheat.ts';
import { findSubstance } from '../../../server/core/substance/catalogue.ts';

function preheat(name: string, celsius: number, pressurePa = 1e5): Preheat {
  const substance = findSubstance(name);
  if (!substance) throw new Error(name);
  return preheatOf(materialOfSubstance(substance), celsius + 273.15, pressurePa);
}

function mjPerKg(found: Preheat): number {
  if (found.kind === 'missing') throw new Error(found.missing.join());
  return found.jPerKg / 1e6;
}

describe('ammonia as it is stored', () => {
  test('gives up its latent heat between gas and liquid at its boiling point', () => {
    const [above, below] = [preheat('ammonia', -33.3), preheat('ammonia', -33.4)];
    // 23.351 kJ/mol over 17.031 g/mol.
    expect(mjPerKg(above) - mjPerKg(below)).toBeCloseTo(1.371, 3);
    expect([above, below].map((one) => one.kind === 'preheat' && one.gasMolPerKg > 0)).toEqual([true, false]);
  });

  test('is liquid under pressure too, and cools as one', () => {
    expect(mjPerKg(preheat('ammonia', -40, 10e5))).toBeCloseTo(mjPerKg(preheat('ammonia', -40)), 12);
    expect(mjPerKg(preheat('ammonia', -35)) - mjPerKg(preheat('ammonia', -40))).toBeCloseTo(5 * 0.00445, 3);
  });
});

test('what is not known of a liquefied gas is named, and never taken as gas', () => {
  expect(preheat('hydrogen', -253)).toEqual({ kind: 'missing', missing: ['the heat of vaporization of hydrogen'] });
  expect(preheat('ammonia', -77)).toEqual({
    kind: 'missing',
    missing: ['the heat capacity of liquid ammonia so cold'],
  });
});
