// A kilogram of fuel with its oxidant: amounts, λ, energy and volume, and the questions that have no answer.

import { describe, expect, test } from 'vitest';
import { chargeOf } from '../../../../server/core/burn/charge.ts';
import type { BurnStream, Charge, OxidantAmount } from '../../../../server/core/burn/burn.ts';
import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import { stoichiometricAirKgPerKg } from '../../../../server/core/balance/stoichiometry.ts';

const atPressure = { held: 'pressure', pressurePa: 1e5 } as const;

function stream(elements: Readonly<Record<string, number>>, more: Partial<BurnStream> = {}): BurnStream {
  return {
    elementMolPerKg: new Map(Object.entries(elements)),
    enthalpyJPerKg: -1e6,
    referenceEnthalpyJPerKg: -1.1e6,
    temperatureK: 300,
    gasMolPerKg: 0,
    ...more,
  };
}

const methane = stream({ C: 62.334, H: 249.336 }, { gasMolPerKg: 62.334 });
const oxygen = stream(
  { O: 62.504 },
  { enthalpyJPerKg: 5e4, referenceEnthalpyJPerKg: 0, temperatureK: 350, gasMolPerKg: 31.252 },
);

function charge(fuel: BurnStream, oxidant: BurnStream, amount: OxidantAmount): Charge {
  const found = chargeOf(fuel, oxidant, amount, atPressure);
  if (found.kind === 'fault') throw new Error(found.reason);
  return found;
}

describe('amount of oxidant', () => {
  test('at λ = 1 methane takes two molecules of oxygen', () => {
    const found = charge(methane, oxygen, { by: 'lambda', lambda: 1 });
    expect(found.oxidantKgPerKg).toBeCloseTo((2 * 62.334) / 31.252, 9);
    expect(found.lambda).toBeCloseTo(1, 12);
    expect(found.elements).toEqual(['H', 'C', 'O']);
    expect(found.elementMol[2]).toBeCloseTo(4 * 62.334, 9);
    expect(found.massKg).toBeCloseTo(1 + found.oxidantKgPerKg, 12);
  });

  test('an equivalence ratio is the inverse of λ, a mass is taken as it is', () => {
    const lean = charge(methane, oxygen, { by: 'lambda', lambda: 2 });
    const byRatio = charge(methane, oxygen, { by: 'equivalence-ratio', ratio: 0.5 });
    const byMass = charge(methane, oxygen, { by: 'mass', kgPerKg: lean.oxidantKgPerKg });
    expect(byRatio).toEqual(lean);
    expect(byMass.lambda).toBeCloseTo(2, 12);
  });

  test('air by λ is the stoichiometric air of the balance', () => {
    const air = findSubstance('air');
    const airStream = { ...stream({}), elementMolPerKg: air?.molPerKg ?? new Map<string, number>() };
    const found = charge(methane, airStream, { by: 'lambda', lambda: 1 });
    expect(found.oxidantKgPerKg).toBeCloseTo(stoichiometricAirKgPerKg(methane.elementMolPerKg) ?? Number.NaN, 12);
  });

  test('no oxidant at all is a charge', () => {
    const found = charge(methane, oxygen, { by: 'mass', kgPerKg: 0 });
    expect(found.elements).toEqual(['H', 'C']);
    expect(found.massKg).toBe(1);
  });
});

describe('energy and volume', () => {
  const found = charge(methane, oxygen, { by: 'mass', kgPerKg: 4 });

  test('enthalpies add up', () => {
    expect(found.enthalpyJ).toBeCloseTo(-1e6 + 4 * 5e4, 6);
    expect(found.referenceEnthalpyJ).toBeCloseTo(-1.1e6, 6);
  });

  test('each gas takes its volume at its own temperature', () => {
    expect(found.volumeM3).toBeCloseTo((8.31446261815324 * (62.334 * 300 + 4 * 31.252 * 350)) / 1e5, 9);
    expect(found.pressureVolumeJ / found.volumeM3).toBeCloseTo(1e5, 6);
  });

  test('an unknown energy stays unknown, unless there is none of it', () => {
    const blind = { ...oxygen, enthalpyJPerKg: null };
    expect(charge(methane, blind, { by: 'mass', kgPerKg: 1 }).enthalpyJ).toBeNull();
    expect(charge(methane, blind, { by: 'mass', kgPerKg: 0 }).enthalpyJ).toBe(-1e6);
  });

  test('a zone and the rest of the oxidant make the whole', () => {
    const zone = charge(methane, oxygen, { by: 'mass', kgPerKg: 1.5 });
    const rest = 2.5;
    expect((zone.enthalpyJ ?? 0) + rest * 5e4).toBeCloseTo(found.enthalpyJ ?? Number.NaN, 6);
    expect((zone.elementMol[2] ?? 0) + rest * 62.504).toBeCloseTo(found.elementMol[2] ?? Number.NaN, 9);
  });
});

describe('no charge', () => {
  test.each<[string, BurnStream, BurnStream, OxidantAmount, object]>([
    ['λ of zero', methane, oxygen, { by: 'lambda', lambda: 0 }, { reason: 'not-positive', of: 'whole' }],
    ['a ratio of zero', methane, oxygen, { by: 'equivalence-ratio', ratio: 0 }, { reason: 'not-positive' }],
    ['a negative mass', methane, oxygen, { by: 'mass', kgPerKg: -1 }, { reason: 'not-positive' }],
    [
      'a fuel that needs no oxygen',
      stream({ N: 70 }),
      oxygen,
      { by: 'lambda', lambda: 1 },
      { reason: 'no-oxygen-needed' },
    ],
    [
      'steam as oxidant',
      methane,
      stream({ H: 111.01, O: 55.505 }),
      { by: 'lambda', lambda: 1 },
      { reason: 'no-oxygen-offered' },
    ],
    [
      'an element without valence',
      stream({ U: 4 }),
      oxygen,
      { by: 'lambda', lambda: 1 },
      { reason: 'no-valence', of: 'fuel', elements: ['U'] },
    ],
    ['nothing', stream({}), stream({}), { by: 'mass', kgPerKg: 1 }, { reason: 'nothing' }],
  ])('%s', (_, fuel, oxidant, amount, fault) => {
    expect(chargeOf(fuel, oxidant, amount, atPressure)).toMatchObject({ kind: 'fault', ...fault });
  });

  test('steam by mass is a charge without λ', () => {
    expect(charge(methane, stream({ H: 111.01, O: 55.505 }), { by: 'mass', kgPerKg: 2 }).lambda).toBeNull();
  });
});
