// Finding substances by word and by formula, and suggestions for words that find nothing.

import { describe, expect, test } from 'vitest';
import {
  allSubstances,
  findSubstance,
  findSubstanceOfFormula,
  phasesOfSubstance,
  substancesOfFormula,
  suggestSubstances,
} from '../../../../server/core/substance/catalogue.ts';
import { atomicWeightKgPerMol } from '../../../../server/core/substance/elements.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';

function found(word: string): string | undefined {
  const substance = findSubstance(word);
  return substance && `${substance.name} ${substance.phase}`;
}

describe('a word finds', () => {
  test.each([
    ['sodium', 'sodium cr'],
    ['Na', 'sodium cr'],
    ['Na(cr)', 'sodium cr'],
    ['Na(l)', 'sodium l'],
    ['sodium oleate', 'sodium_oleate cr'],
    ['sodium_oleate', 'sodium_oleate cr'],
    ['Sodium  Oleate', 'sodium_oleate cr'],
    ['gas_oil', 'gas_oil l'],
    ['diesel', 'gas_oil l'],
    ['mgo', 'gas_oil l'],
    ['MgO', 'magnesium_oxide cr'],
    ['HFO', 'heavy_fuel_oil l'],
    ['H2O', 'water l'],
    ['H2O(g)', 'water g'],
    ['steam', 'water g'],
    ['Na2CO3', 'sodium_carbonate cr'],
    ['soda_ash', 'sodium_carbonate cr'],
    ['C2H6O', 'ethanol l'],
    ['C2H5OH', 'ethanol l'],
    ['CH3OCH3', 'dimethyl_ether g'],
    ['C8H18', 'octane l'],
    ['Fe0.947O', 'wustite cr'],
    ['K', 'potassium cr'],
    ['air', 'air g'],
    ['ice', 'water cr'],
    ['baking soda', 'sodium_hydrogen_carbonate cr'],
    ['Na2CO3.10H2O', 'sodium_carbonate_decahydrate cr'],
    ['NaK', 'sodium_potassium_alloy l'],
    ['DMA', 'dma l'],
    ['OH-', 'hydroxide_ion aq'],
    ['CO3--', 'carbonate_ion aq'],
    ['C3H8(l)', 'propane l'],
  ])('%s: %s', (word, expected) => {
    expect(found(word)).toBe(expected);
  });

  test.each(['', 'H20', 'unobtainium', 'Na2CO3(g)', 'NaCl(aq)', '('])('nothing: %j', (word) => {
    expect(found(word)).toBeUndefined();
  });

  test('a phase asked for beside a name', () => {
    expect(findSubstance('water', 'g')?.energy).toEqual(findSubstance('steam')?.energy);
    expect(findSubstance('ice')?.phase).toBe('cr');
    expect(findSubstance('ice', 'l')?.phase).toBe('l');
    expect(findSubstance('argon', 'cr')).toBeUndefined();
  });
});

test('of isomers the one written alike comes first, then the stable phase', () => {
  const formula = parseFormula('CH3OCH3');
  if (formula.kind === 'fault') throw new Error();
  expect(substancesOfFormula(formula).map((substance) => `${substance.name} ${substance.phase}`)).toEqual([
    'dimethyl_ether g',
    'dimethyl_ether l',
    'ethanol l',
    'ethanol g',
  ]);
  expect(findSubstanceOfFormula(formula)?.name).toBe('dimethyl_ether');
});

describe('suggestions', () => {
  test.each([
    ['H20', 'H2O'],
    ['C02', 'CO2'],
    ['Na2C03', 'Na2CO3'],
    ['NaoH', 'NaOH'],
    ['sodum', 'sodium'],
    ['metanol', 'methanol'],
    ['gasoil', 'gas_oil'],
    ['sodium carbonat', 'sodium_carbonate'],
    ['hydrogne', 'hydrogen'],
  ])('%s: %s first', (word, expected) => {
    expect(suggestSubstances(word)[0]).toBe(expected);
  });

  test('are at most as many as asked for, and none when nothing is near', () => {
    expect(suggestSubstances('H20', 2)).toHaveLength(2);
    expect(suggestSubstances('unobtainium')).toEqual([]);
  });

  test('always find something themselves', () => {
    for (const word of ['H20', 'sodum', 'etanol', 'MgOO', 'gas']) {
      for (const suggestion of suggestSubstances(word)) expect(findSubstance(suggestion), suggestion).toBeDefined();
    }
  });
});

describe('every substance', () => {
  test.each(allSubstances().map((substance) => [`${substance.name}(${substance.phase})`, substance] as const))(
    '%s describes one kilogram',
    (_, substance) => {
      const mass = [...substance.molPerKg].reduce(
        (sum, [symbol, mol]) => sum + mol * (atomicWeightKgPerMol(symbol) ?? 0),
        0,
      );
      // What an ion has lost or gained is electrons.
      expect(mass - substance.chargeMolPerKg * 5.4857990888e-7).toBeCloseTo(1, 9);
      for (const mol of substance.molPerKg.values()) expect(mol).toBeGreaterThan(0);
    },
  );

  test('is found again by its own name and by every alias, in its phases', () => {
    for (const substance of allSubstances()) {
      expect(phasesOfSubstance(substance.name)).toContain(substance);
      for (const word of [substance.name, substance.label, ...substance.aliases]) {
        expect(findSubstance(word)?.name).toBe(substance.name);
      }
    }
  });
});

test('dry air is the mixture of the convention', () => {
  const air = findSubstance('air');
  expect(air?.molarMassKgPerMol).toBeCloseTo(
    0.78084 * 0.028014 + 0.20946 * 0.031998 + 0.00934 * 0.03995 + 0.00036 * 0.044009,
    9,
  );
  // Its only compound is CO2: 0.036 % of -393.522 kJ/mol.
  expect(air?.energy).toMatchObject({ kind: 'formation-enthalpy' });
  if (air?.energy.kind !== 'formation-enthalpy') return;
  expect(air.energy.jPerKg.value * (air.molarMassKgPerMol ?? 0)).toBeCloseTo(-0.00036 * 393_522, 3);
});
