// A user's own substance: what a definition gives, and what keeps it from being a substance.

import { describe, expect, test } from 'vitest';
import { defineSubstance } from '../../../../server/core/substance/define-substance.ts';
import type { SubstanceDefinition } from '../../../../server/core/substance/define-substance.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';

function formula(text: string) {
  const outcome = parseFormula(text);
  if (outcome.kind === 'fault') throw new Error(text);
  return outcome;
}

function defined(definition: Partial<SubstanceDefinition>) {
  const outcome = defineSubstance({ name: 'trial_fuel', phase: 'l', ...definition });
  if (outcome.kind === 'fault') throw new Error(outcome.reason);
  return outcome.substance;
}

describe('a definition by mass shares', () => {
  const substance = defined({
    massShares: new Map([
      ['C', 0.849],
      ['H', 0.151],
    ]),
    lowerHeatingValueJPerKg: { value: 44.0e6, uncertainty: 0.2e6 },
    densityKgPerM3: { value: 780, temperatureK: 288.15 },
    carbonBiogenicShare: 0.98,
    source: "supplier's certificate 14/3",
  });

  test('gives moles, energy, density and origin', () => {
    expect(substance.molPerKg.get('C')).toBeCloseTo(0.849 / 0.012011, 9);
    expect(substance.molPerKg.get('H')).toBeCloseTo(0.151 / 0.001008, 9);
    expect(substance.energy).toMatchObject({
      kind: 'heating-value',
      basis: 'lower',
      jPerKg: {
        value: 44e6,
        uncertainty: 0.2e6,
        source: { title: "supplier's certificate 14/3", provenance: 'stated' },
      },
    });
    expect(substance.density).toMatchObject({ value: 780, temperatureK: 288.15 });
    expect(substance.carbonBiogenicShare).toBe(0.98);
    expect(substance.molarMassKgPerMol).toBeUndefined();
    expect(substance.label).toBe('trial fuel');
  });
});

describe('a definition by formula', () => {
  test('takes molar mass and phase, and a molar formation enthalpy per kilogram', () => {
    const substance = defined({
      formula: formula('C2H5OH'),
      formationEnthalpyJPerMol: { value: -277_600, uncertainty: 300 },
    });
    expect(substance.formula).toMatchObject({ text: 'C2H5OH', phase: 'l' });
    expect(substance.molarMassKgPerMol).toBeCloseTo(0.046069, 9);
    expect(substance.energy).toMatchObject({ kind: 'formation-enthalpy' });
    if (substance.energy.kind !== 'formation-enthalpy') return;
    expect(substance.energy.jPerKg.value).toBeCloseTo(-277_600 / 0.046069, 3);
    expect(substance.energy.jPerKg.uncertainty).toBeCloseTo(300 / 0.046069, 6);
  });

  test('without any energy has none', () => {
    expect(defined({ formula: formula('NaBH4') }).energy).toEqual({ kind: 'unknown' });
  });

  test('a formation enthalpy goes before a heating value', () => {
    const both = defined({
      formula: formula('CH4'),
      formationEnthalpyJPerKg: { value: -1 },
      higherHeatingValueJPerKg: { value: 55e6 },
    });
    expect(both.energy.kind).toBe('formation-enthalpy');
  });
});

describe('no substance', () => {
  test.each([
    ['nothing said of what it is made of', {}, { reason: 'no-composition' }],
    [
      'an element without a weight',
      { massShares: new Map([['Tc', 1]]) },
      { reason: 'unknown-elements', elements: ['Tc'] },
    ],
    [
      'a molar enthalpy without a molar mass',
      { massShares: new Map([['C', 1]]), formationEnthalpyJPerMol: { value: 1 } },
      { reason: 'no-molar-mass' },
    ],
  ])('%s', (_, definition, fault) => {
    expect(defineSubstance({ name: 'x', phase: 'l', ...definition })).toEqual({ kind: 'fault', ...fault });
  });
});
