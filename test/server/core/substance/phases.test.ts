// What the program answers about phases: lookups, properties with their range, and the stable condensed phase.

import { describe, expect, test } from 'vitest';
import { parseFormula } from '../../../../server/core/substance/formula.ts';
import type { Formula } from '../../../../server/core/substance/formula.ts';
import {
  phaseOfId,
  phasesOfFormula,
  propertiesOfPhase,
  stableCondensedPhase,
} from '../../../../server/core/substance/phases.ts';
import type { ThermoPhase } from '../../../../server/core/substance/phases.ts';

function formulaOf(text: string): Formula {
  const formula = parseFormula(text);
  if (formula.kind === 'fault') throw new Error(`${text} is no formula`);
  return formula;
}

function phase(id: string): ThermoPhase {
  const found = phaseOfId(id);
  if (found === undefined) throw new Error(`no ${id}`);
  return found;
}

describe('lookups', () => {
  test('by id and by formula, however the formula is written', () => {
    expect(phase('Na2CO3(cr)').formula.text).toBe('Na2CO3');
    expect(phaseOfId('Na2CO3')).toBeUndefined();
    expect(phasesOfFormula(formulaOf('CaO2H2')).map(({ id }) => id)).toEqual(['Ca(OH)2(cr)', 'Ca(OH)2(g)']);
    expect(phasesOfFormula(formulaOf('H2O(l)')).map(({ id }) => id)).toEqual(['H2O(l)']);
    expect(phasesOfFormula(formulaOf('UO2'))).toEqual([]);
  });

  test('the form that is stable at 298.15 K comes first', () => {
    expect(phasesOfFormula(formulaOf('Al2O3'))[0]?.id).toBe('Al2O3(cr,alpha)');
    expect(phasesOfFormula(formulaOf('TiO2(cr)')).map(({ id }) => id)).toEqual(['TiO2(cr,rutile)', 'TiO2(cr,anatase)']);
  });
});

describe('properties', () => {
  test('at 298.15 K are those of the table', () => {
    const { heatCapacityJPerMolK, enthalpyJPerMol, entropyJPerMolK } = propertiesOfPhase(phase('H2O(g)'), 298.15) ?? {};
    expect(enthalpyJPerMol).toBeCloseTo(-241826, 6);
    expect(entropyJPerMolK).toBeCloseTo(188.834, 9);
    expect(heatCapacityJPerMolK).toBeCloseTo(33.59, 3);
  });

  test('say when they are extrapolated, and hold the heat capacity there', () => {
    const gas = phase('CO2(g)');
    expect(propertiesOfPhase(gas, 200)?.extrapolated).toBe('no');
    expect(propertiesOfPhase(gas, 6000)?.extrapolated).toBe('no');
    expect(propertiesOfPhase(gas, 150)?.extrapolated).toBe('below');
    const beyond = propertiesOfPhase(gas, 9000);
    expect(beyond?.extrapolated).toBe('above');
    expect(beyond?.heatCapacityJPerMolK).toBeCloseTo(propertiesOfPhase(gas, 6000)?.heatCapacityJPerMolK ?? 0, 9);
  });

  test('a crystal ends at its real end, not at the end of its table', () => {
    const peroxide = phase('K2O2(cr)');
    expect(peroxide.validK).toEqual([298.15, 818.15]);
    expect(peroxide.limit?.event).toBe('melts');
    expect(propertiesOfPhase(peroxide, 900)?.extrapolated).toBe('above');
  });

  test('a crystal that falls apart into phases of the data is not cut: pressure decides where it ends', () => {
    const carbonate = phase('MgCO3(cr)');
    expect(carbonate).toMatchObject({ limit: { atK: 675, byEquilibrium: true }, endK: Infinity });
    expect(propertiesOfPhase(carbonate, 800)?.extrapolated).toBe('no');
    expect(propertiesOfPhase(carbonate, 950)?.extrapolated).toBe('above');
    expect(stableCondensedPhase(formulaOf('MgCO3'), 800)).toMatchObject({ kind: 'past-limit' });
  });

  test.each([0, -5, Number.NaN, Number.POSITIVE_INFINITY])('there are none at %d K', (temperatureK) => {
    expect(propertiesOfPhase(phase('CO2(g)'), temperatureK)).toBeUndefined();
  });
});

describe('the stable condensed phase', () => {
  test.each([
    ['Na2CO3', 300, 'Na2CO3(cr)'],
    ['Na2CO3', 1123.15, 'Na2CO3(l)'],
    ['Fe', 1000, 'Fe(cr,alpha-delta)'],
    ['Fe', 1400, 'Fe(cr,gamma)'],
    ['Fe', 1700, 'Fe(cr,alpha-delta)'],
    ['Na2SO4', 400, 'Na2SO4(cr,V)'],
    ['Na2SO4', 800, 'Na2SO4(cr,I)'],
    ['SiO2', 1500, 'SiO2(cr,cristobalite-high)'],
    ['S', 375, 'S(cr,monoclinic)'],
    ['H2O', 298.15, 'H2O(l)'],
    ['K2O', 1000, 'K2O(cr)'],
    ['K2O', 1100, 'K2O(l)'],
    ['CaCO3', 1000, 'CaCO3(cr,calcite)'],
  ])('%s at %d K is %s', (formula, temperatureK, id) => {
    const found = stableCondensedPhase(formulaOf(formula), temperatureK);
    expect(found.kind === 'phase' ? found.phase.id : found.kind).toBe(id);
  });

  test('says why there is none', () => {
    expect(stableCondensedPhase(formulaOf('UO2'), 500).kind).toBe('unknown-composition');
    expect(stableCondensedPhase(formulaOf('H2O'), 250)).toMatchObject({
      kind: 'outside-data',
      stableK: [[280, 372.78]],
    });
    expect(stableCondensedPhase(formulaOf('CH4'), 300).kind).toBe('unknown-composition');
    expect(stableCondensedPhase(formulaOf('NaO2'), 900)).toMatchObject({
      kind: 'past-limit',
      phase: { id: 'NaO2(cr)' },
      limit: { atK: 825.15 },
    });
  });
});
