// Formulas: what is read, what is refused and where, and that canonical text reads back to the same formula.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  compositionKey,
  formulaTextWithPhase,
  molarMassKgPerMol,
  parseFormula,
} from '../../../../server/core/substance/formula.ts';
import type { Formula } from '../../../../server/core/substance/formula.ts';

function formula(text: string): Formula {
  const outcome = parseFormula(text);
  if (outcome.kind === 'fault') throw new Error(`${text}: ${outcome.reason} at ${outcome.position}`);
  return outcome;
}

describe('reading', () => {
  test.each([
    ['Na2CO3', 'Na2CO3', { Na: 2, C: 1, O: 3 }, 0],
    ['Ca(OH)2', 'Ca(OH)2', { Ca: 1, O: 2, H: 2 }, 0],
    ['Fe2(SO4)3', 'Fe2(SO4)3', { Fe: 2, S: 3, O: 12 }, 0],
    ['[Co(NH3)6]Cl3', '(Co(NH3)6)Cl3', { Co: 1, N: 6, H: 18, Cl: 3 }, 0],
    ['MgCl2.6H2O', 'MgCl2·6H2O', { Mg: 1, Cl: 2, H: 12, O: 6 }, 0],
    ['MgCl2·6H2O', 'MgCl2·6H2O', { Mg: 1, Cl: 2, H: 12, O: 6 }, 0],
    ['H2SO4.6.5H2O', 'H2SO4·6.5H2O', { H: 15, S: 1, O: 10.5 }, 0],
    ['CaSO4.0.5H2O', 'CaSO4·0.5H2O', { Ca: 1, S: 1, O: 4.5, H: 1 }, 0],
    ['Na2CO3.H2O', 'Na2CO3·H2O', { Na: 2, C: 1, O: 4, H: 2 }, 0],
    ['Fe0.947O', 'Fe0.947O', { Fe: 0.947, O: 1 }, 0],
    ['Na0.5H2O', 'Na0.5H2O', { Na: 0.5, H: 2, O: 1 }, 0],
    ['CO', 'CO', { C: 1, O: 1 }, 0],
    ['Co', 'Co', { Co: 1 }, 0],
    ['H20', 'H20', { H: 20 }, 0],
    ['Na+', 'Na+', { Na: 1 }, 1],
    ['CO3--', 'CO3^2-', { C: 1, O: 3 }, -2],
    ['CO3^2-', 'CO3^2-', { C: 1, O: 3 }, -2],
    ['CO₃²⁻', 'CO3^2-', { C: 1, O: 3 }, -2],
    ['Fe+++', 'Fe^3+', { Fe: 1 }, 3],
    ['N2+', 'N2+', { N: 2 }, 1],
    ['SO4^−', 'SO4-', { S: 1, O: 4 }, -1],
    ['e-', 'e-', {}, -1],
    ['C₂H₅OH', 'C2H5OH', { C: 2, H: 6, O: 1 }, 0],
  ])('%s', (text, canonical, atoms, charge) => {
    const found = formula(text);
    expect(found.text).toBe(canonical);
    expect(Object.fromEntries(found.composition)).toEqual(atoms);
    expect(found.charge).toBe(charge);
    expect(found.phase).toBeUndefined();
  });

  test.each([
    ['K(l)', 'K', 'l'],
    ['Na2CO3(cr)', 'Na2CO3', 'cr'],
    ['Na+(aq)', 'Na+', 'aq'],
    ['e-(g)', 'e-', 'g'],
    ['Ca(OH)2(cr)', 'Ca(OH)2', 'cr'],
  ])('the phase of %s', (text, canonical, phase) => {
    expect(formula(text)).toMatchObject({ text: canonical, phase });
    expect(formulaTextWithPhase(formula(text))).toBe(`${canonical}(${phase})`);
  });

  test('a phase given beside the text counts only where the text has none', () => {
    expect(parseFormula('H2O', 'g')).toMatchObject({ phase: 'g' });
    expect(parseFormula('H2O(l)', 'g')).toMatchObject({ phase: 'l' });
  });

  test('counts of brackets multiply without floating-point dust', () => {
    expect(formula('(Fe0.1O0.1)3').composition.get('Fe')).toBe(0.3);
  });
});

describe('faults', () => {
  test.each([
    ['', 'empty', 0, ''],
    ['   ', 'empty', 0, '   '],
    ['Xx2', 'unknown-element', 0, 'Xx'],
    ['NaXO', 'unknown-element', 2, 'X'],
    ['na', 'unexpected', 0, 'n'],
    ['2H2O', 'unexpected', 0, '2'],
    ['Ca(OH', 'unclosed', 2, '('],
    ['Ca(OH]2', 'unexpected', 5, ']'],
    ['Ca(OH))', 'unexpected', 6, ')'],
    ['()', 'unexpected', 1, ')'],
    ['H0', 'bad-count', 1, '0'],
    ['H9999999', 'bad-count', 1, '9999999'],
    ['Na2 CO3', 'unexpected', 3, ' '],
    ['H2O(g)x', 'unexpected', 6, 'x'],
    ['Na^0+', 'bad-count', 2, '^0+'],
    ['MgCl2·', 'empty', 6, ''],
  ])('%j', (text, reason, position, found) => {
    expect(parseFormula(text)).toEqual({ kind: 'fault', reason, position, length: found.length, found });
  });

  test('brackets deeper than 64 are refused, 64 are not', () => {
    expect(parseFormula('('.repeat(64) + 'H' + ')'.repeat(64)).kind).toBe('formula');
    expect(parseFormula('('.repeat(65) + 'H' + ')'.repeat(65))).toMatchObject({ reason: 'too-deep', position: 64 });
  });

  test('any text gives a formula or a fault inside the text, and never throws', () => {
    const piece = fc.constantFrom(
      'Na',
      'C',
      'H',
      'O',
      '(',
      ')',
      '2',
      '0',
      '.',
      '·',
      '+',
      '-',
      '^',
      ' ',
      '(g)',
      'x',
      '²',
      '⁻',
      '\0',
    );
    fc.assert(
      fc.property(fc.array(piece, { maxLength: 12 }), (pieces) => {
        const text = pieces.join('');
        const outcome = parseFormula(text);
        if (outcome.kind === 'fault') {
          expect(outcome.position).toBeGreaterThanOrEqual(0);
          expect(outcome.position + outcome.length).toBeLessThanOrEqual(text.length);
        } else {
          expect(parseFormula(formulaTextWithPhase(outcome))).toEqual(outcome);
        }
      }),
      { numRuns: 2000 },
    );
  });
});

describe('molar mass', () => {
  test('is the sum of the conventional atomic weights', () => {
    expect(molarMassKgPerMol(formula('Na2CO3'))).toBeCloseTo((2 * 22.98976928 + 12.011 + 3 * 15.999) / 1000, 12);
  });

  test('leaves out the electrons an ion lacks, and the electron itself weighs', () => {
    const atom = molarMassKgPerMol(formula('Na')) ?? 0;
    const electron = molarMassKgPerMol(formula('e-')) ?? 0;
    expect(electron).toBeCloseTo(5.4858e-7, 11);
    expect(molarMassKgPerMol(formula('Na+'))).toBeCloseTo(atom - electron, 15);
  });

  test('is unknown with an element that has no standard weight', () => {
    expect(molarMassKgPerMol(formula('TcO2'))).toBeUndefined();
  });
});

test('the composition key is blind to how a formula is written, not to its charge', () => {
  expect(compositionKey(formula('C2H5OH'))).toBe(compositionKey(formula('C2H6O')));
  expect(compositionKey(formula('O2'))).not.toBe(compositionKey(formula('O2-')));
});
