// Saturation pressure of water and ice against the iapws library, and against the printed check values of IF97.
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { phaseOfId, propertiesOfPhase, type PhaseProperties } from '../../../../server/core/substance/phases.ts';
import { triplePointK, waterSaturationPressurePa } from '../../../../server/core/substance/water-saturation.ts';

interface Row {
  readonly over: 'ice' | 'liquid' | 'steam' | 'vaporisation';
  readonly temperatureK: number;
  readonly pressurePa?: number;
  readonly heatCapacityKJPerKgK?: number;
  readonly enthalpyRiseKJPerKg?: number;
  readonly heatKJPerKg?: number;
}
interface Rows {
  readonly rows: readonly Row[];
}

const { rows } = JSON.parse(readFileSync('test/reference/steam-iapws.json', 'utf8')) as Rows;

const pressures = rows.filter(({ pressurePa }) => pressurePa !== undefined);

test.each(pressures)('over $over at $temperatureK K', ({ temperatureK, pressurePa = NaN }) => {
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

describe('steam', () => {
  const waterKgPerMol = 0.018015;
  const vapour = phaseOfId('H2O(g)');
  const at = (temperatureK: number): PhaseProperties | undefined => vapour && propertiesOfPhase(vapour, temperatureK);

  // The table's ideal gas against IF97's: the fit may be off by 0.5 % in cp and 0.2 kJ/mol = 11 kJ/kg in H.
  test.each(rows.filter(({ over }) => over === 'steam'))('at $temperatureK K', (row) => {
    const { heatCapacityKJPerKgK = NaN, enthalpyRiseKJPerKg = NaN, temperatureK } = row;
    const heatCapacity = (at(temperatureK)?.heatCapacityJPerMolK ?? NaN) / waterKgPerMol / 1000;
    expect(Math.abs(heatCapacity / heatCapacityKJPerKgK - 1)).toBeLessThan(0.005);
    const rise = (at(temperatureK)?.enthalpyJPerMol ?? NaN) - (at(298.15)?.enthalpyJPerMol ?? NaN);
    expect(Math.abs(rise / waterKgPerMol / 1000 - enthalpyRiseKJPerKg)).toBeLessThan(11);
  });

  test('the heat of vaporisation at 25 °C', () => {
    const heat = rows.find(({ over }) => over === 'vaporisation')?.heatKJPerKg ?? NaN;
    const [gas = NaN, liquid = NaN] = ['H2O(g)', 'H2O(l)'].map((id) => phaseOfId(id)?.formationEnthalpyJPerMol ?? NaN);
    // The vapour of the table is an ideal gas, IF97's a real one at 3170 Pa: it lies about 0.9 kJ/kg lower.
    expect(Math.abs((gas - liquid) / waterKgPerMol / 1000 - heat)).toBeLessThan(1.5);
  });
});
