// Where carbon, alkali and hydrogen are: every phase of the library has its form, and shares add up to exactly 1.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  alkaliFates,
  alkaliFormOf,
  carbonFate,
  carbonFormOf,
  hydrogenFate,
  hydrogenFormOf,
  shareOfForm,
} from '../../../../server/core/burn/fates.ts';
import type { Fate } from '../../../../server/core/burn/fates.ts';
import { sharesAddingToOne } from '../../../../server/core/burn/exact-shares.ts';
import { allPhases, phaseOfId } from '../../../../server/core/substance/phases.ts';
import type { Formula } from '../../../../server/core/substance/formula.ts';
import { handMadeState } from './hand-made-state.ts';

function formula(id: string): Formula {
  const phase = phaseOfId(id);
  if (phase === undefined) throw new Error(id);
  return phase.formula;
}

/** In the order a reader adds them up. */
function total<Form extends string>(fate: Fate<Form>): number {
  return fate.rows.reduce((sum, row) => sum + row.gasShare + row.condensedShare, 0);
}

/** Row by row, gas then condensed. */
function totalInOrder<Form extends string>(fate: Fate<Form>): number {
  return fate.rows.flatMap((row) => [row.gasShare, row.condensedShare]).reduce((sum, share) => sum + share, 0);
}

test.each<[string, string]>([
  ['CO2(g)', 'carbon-dioxide'],
  ['CO2-(g)', 'other'],
  ['CO(g)', 'carbon-monoxide'],
  ['Na2CO3(l)', 'carbonate'],
  ['MgCO3(cr)', 'carbonate'],
  ['CH4(g)', 'hydrocarbon'],
  ['CH3(g)', 'hydrocarbon'],
  ['C(cr,graphite)', 'soot'],
  ['C2(g)', 'other'],
  ['C2O(g)', 'other'],
  ['C3O2(g)', 'other'],
  ['H2CO(g)', 'other'],
  ['HCN(g)', 'other'],
  ['Fe(CO)5(l)', 'other'],
  ['COCl(g)', 'other'],
  ['NaCN(cr)', 'other'],
  ['NaHCO3(cr)', 'carbonate'],
  ['Na2CO3·NaHCO3·2H2O(cr)', 'carbonate'],
  ['CaCO3(cr,calcite)', 'carbonate'],
])('carbon in %s is %s', (id, form) => {
  expect(carbonFormOf(formula(id))).toBe(form);
});

test.each<[string, string]>([
  ['NaOH(l)', 'hydroxide'],
  ['Na2O2H2(g)', 'hydroxide'],
  ['Na2CO3(l)', 'carbonate'],
  ['Na2Cl2(g)', 'chloride'],
  ['Na2SO4(cr,V)', 'sulphate'],
  ['Na2S(cr)', 'other'],
  ['NaO2(cr)', 'oxide'],
  ['Na2O2(cr)', 'oxide'],
  ['LiONa(g)', 'oxide'],
  ['Na2(g)', 'metal'],
  ['Na(l)', 'metal'],
  ['Na+(g)', 'other'],
  ['KOH+(g)', 'other'],
  ['KClO4(cr)', 'other'],
  ['NaH(cr)', 'other'],
  ['NaCN(g)', 'other'],
  ['LiOCl(g)', 'other'],
  ['NaAlO2(cr)', 'other'],
  ['KHCO3(cr)', 'carbonate'],
  ['Na2CO3·10H2O(cr)', 'carbonate'],
  ['NaOH·H2O(cr)', 'hydroxide'],
  ['NaBH4(cr)', 'other'],
])('alkali in %s is %s', (id, form) => {
  expect(alkaliFormOf(formula(id))).toBe(form);
});

test.each<[string, string]>([
  ['H2O(g)', 'water'],
  ['H2O(l)', 'water'],
  ['H2O2(g)', 'other'],
  ['OH(g)', 'other'],
  ['H(g)', 'hydrogen'],
  ['H2(g)', 'hydrogen'],
  ['H2+(g)', 'other'],
  ['NaOH(cr)', 'hydroxide'],
  ['Ca(OH)2(cr)', 'hydroxide'],
  ['MgOH(g)', 'hydroxide'],
  ['HNO(g)', 'other'],
  ['C2H4(g)', 'hydrocarbon'],
  ['H2SO4·H2O(cr)', 'crystal-water'],
  ['LiOH·H2O(cr)', 'crystal-water'],
  ['NaHCO3(cr)', 'other'],
])('hydrogen in %s is %s', (id, form) => {
  expect(hydrogenFormOf(formula(id))).toBe(form);
});

test('no phase of the library that holds alkali and chlorine alone, or alkali and oxygen alone, is passed over', () => {
  for (const phase of allPhases()) {
    const symbols = [...phase.formula.composition.keys()].filter((symbol) => !['Li', 'Na', 'K'].includes(symbol));
    const isNeutralAlkali = phase.formula.charge === 0 && symbols.length < phase.formula.composition.size;
    if (isNeutralAlkali && symbols.join() === 'Cl')
      expect([phase.id, alkaliFormOf(phase.formula)]).toEqual([phase.id, 'chloride']);
    if (isNeutralAlkali && symbols.join() === 'O')
      expect([phase.id, alkaliFormOf(phase.formula)]).toEqual([phase.id, 'oxide']);
  }
});

describe('shares of a state', () => {
  const state = handMadeState(['H', 'C', 'O', 'Na', 'Cl', 'K'], {
    'Na2CO3(l)': 1.5,
    'NaCl(g)': 0.25,
    'Na(g)': 0.125,
    'NaOH(g)': 0.5,
    'Na2O2H2(g)': 0.0625,
    'KOH(l)': 0.3,
    'CO2(g)': 4.5,
    'CO(g)': 0.5,
    'C(cr,graphite)': 0.1,
    'H2O(g)': 2,
  });

  test('carbon', () => {
    const fate = carbonFate(state);
    if (fate === undefined) throw new Error();
    expect(fate.totalMol).toBeCloseTo(6.6, 12);
    expect(shareOfForm(fate, 'carbonate')).toBeCloseTo(1.5 / 6.6, 12);
    expect(shareOfForm(fate, 'soot')).toBeCloseTo(0.1 / 6.6, 12);
    expect(totalInOrder(fate)).toBe(1);
  });

  test('each alkali metal apart, gas and condensed apart', () => {
    const fates = alkaliFates(state);
    expect(fates.map(({ element }) => element)).toEqual(['Na', 'K']);
    const [sodium, potassium] = fates;
    if (sodium === undefined || potassium === undefined) throw new Error();
    expect(sodium.totalMol).toBeCloseTo(4, 12);
    expect(sodium.rows.find(({ form }) => form === 'hydroxide')).toMatchObject({ gasMol: 0.625, condensedMol: 0 });
    expect(sodium.rows.find(({ form }) => form === 'carbonate')).toMatchObject({ gasMol: 0, condensedMol: 3 });
    expect(sodium.rows.find(({ form }) => form === 'metal')).toMatchObject({ gasMol: 0.125, condensedMol: 0 });
    expect(shareOfForm(potassium, 'hydroxide')).toBe(1);
    expect(totalInOrder(sodium)).toBe(1);
    expect(total(sodium)).toBeCloseTo(1, 14);
  });

  test('water', () => {
    const fate = hydrogenFate(state);
    if (fate === undefined) throw new Error();
    expect(shareOfForm(fate, 'water')).toBeCloseTo(4 / (4 + 0.5 + 0.125 + 0.3), 12);
  });

  test('what is not there has no fate', () => {
    const dry = handMadeState(['N', 'O'], { 'N2(g)': 1 });
    expect(carbonFate(dry)).toBeUndefined();
    expect(hydrogenFate(dry)).toBeUndefined();
    expect(alkaliFates(dry)).toEqual([]);
  });
});

test('shares add up to exactly 1 in order, whatever the amounts', () => {
  fc.assert(
    fc.property(fc.array(fc.double({ min: 0, max: 1e6, noNaN: true }), { minLength: 1, maxLength: 14 }), (amounts) => {
      const shares = sharesAddingToOne(amounts);
      const sum = shares.reduce((total, share) => total + share, 0);
      expect(sum).toBe(amounts.some((amount) => amount > 0) ? 1 : 0);
      expect(shares.every((share) => share >= 0)).toBe(true);
    }),
    { numRuns: 2000 },
  );
});
