// A frozen composition: nothing of it changes but the form of what is condensed, and its enthalpy is that of its parts.

import { expect, test } from 'vitest';
import { frozenState } from '../../../../server/core/burn/frozen-state.ts';
import { amountOf } from '../../../../server/core/burn/products.ts';
import { phaseOfId, propertiesOfPhase } from '../../../../server/core/substance/phases.ts';
import { handMadeState } from './hand-made-state.ts';

const hot = handMadeState(['H', 'C', 'O', 'Na'], { 'Na2CO3(l)': 0.5, 'CO2(g)': 3, 'H2O(g)': 2 }, 1500);

function enthalpyOf(id: string, temperatureK: number): number {
  const phase = phaseOfId(id);
  return (phase && propertiesOfPhase(phase, temperatureK)?.enthalpyJPerMol) ?? Number.NaN;
}

test('at its own temperature it is the state itself', () => {
  const frozen = frozenState(hot, 1500, { pressurePa: 1e5 });
  expect(frozen.enthalpyJ).toBeCloseTo(hot.enthalpyJ, 4);
  expect(frozen.frozenHeatCapacityJPerK).toBeCloseTo(hot.frozenHeatCapacityJPerK, 8);
  expect(frozen.frozenGamma).toBeCloseTo(hot.frozenGamma ?? Number.NaN, 12);
  expect(frozen.volumeM3).toBeCloseTo(hot.volumeM3, 12);
  expect([...frozen.amountsMol]).toEqual([...hot.amountsMol]);
});

test('below its melting point the carbonate is a crystal; vapours stay vapours', () => {
  const cold = frozenState(hot, 400, { pressurePa: 1e5 });
  expect(amountOf(cold, 'Na2CO3(l)')).toBe(0);
  expect(amountOf(cold, 'Na2CO3(cr)')).toBe(0.5);
  expect(amountOf(cold, 'H2O(g)')).toBe(2);
  expect(cold.condensedMassShare).toBeCloseTo(hot.condensedMassShare, 12);
  const parts = 0.5 * enthalpyOf('Na2CO3(cr)', 400) + 3 * enthalpyOf('CO2(g)', 400) + 2 * enthalpyOf('H2O(g)', 400);
  expect(cold.enthalpyJ).toBeCloseTo(parts, 4);
});

test('the heat of solidifying comes out at the melting point', () => {
  const above = frozenState(hot, 1123.2, { pressurePa: 1e5 });
  const below = frozenState(hot, 1122.8, { pressurePa: 1e5 });
  const meltingJPerMol = enthalpyOf('Na2CO3(l)', 1123) - enthalpyOf('Na2CO3(cr)', 1123);
  const sensibleJ = 0.4 * above.frozenHeatCapacityJPerK;
  expect(meltingJPerMol).toBeGreaterThan(2e4);
  expect((above.enthalpyJ - below.enthalpyJ - sensibleJ) / (0.5 * meltingJPerMol)).toBeCloseTo(1, 2);
});

test('in a held volume the pressure falls with the temperature', () => {
  const cold = frozenState(hot, 750, { volumeM3: hot.volumeM3 });
  expect(cold.pressurePa).toBeCloseTo(hot.pressurePa / 2, 6);
  expect(cold.volumeM3).toBeCloseTo(hot.volumeM3, 12);
});

test('what is there beyond its data is named', () => {
  const cold = frozenState(hot, 100, { pressurePa: 1e5 });
  const ids = cold.extrapolated.map((phase) => cold.candidates.phases[phase]?.id);
  expect(ids).toContain('CO2(g)');
});
