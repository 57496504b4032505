// Substances of a scenario: what their figures come to, and what is said of slips in them.
import { describe, expect, test } from 'vitest';
import { checkFacts, figureOf, valueOf } from '../../../support/facts.ts';

describe('substance', () => {
  test('a heating value comes back as it was given, lower or higher', () => {
    const scenario = checkFacts(`
      substance one {
        composition: 86 % C, 14 % H
        lower heating value: 42.7 MJ/kg
      }
      substance two {
        composition: 86 % C, 14 % H
        higher heating value: 45.6 MJ/kg
      }
    `);
    expect(figureOf(scenario, 'one', 'lower-heating-value')).toBeCloseTo(42.7, 9);
    expect(figureOf(scenario, 'two', 'higher-heating-value')).toBeCloseTo(45.6, 9);
  });

  test('a formula and an enthalpy of formation, per mole or per kg, are the same substance', () => {
    const scenario = checkFacts(`
      substance one {
        formula: CH4
        phase: gas
        formation enthalpy: -74.873 kJ/mol
      }
      substance two {
        formula: CH4
        phase: gas
        formation enthalpy: -74.873 kJ/mol / molar_mass(CH4)
      }
    `);
    const own = figureOf(scenario, 'one', 'lower-heating-value') ?? NaN;
    expect(figureOf(scenario, 'two', 'lower-heating-value')).toBeCloseTo(own, 9);
    expect(own).toBeCloseTo(50.03, 1);
  });

  test('elements whose symbols are units are given back', () => {
    const scenario = checkFacts(`
      substance one {
        composition: 80 % C, 10 % H, 10 % N
        lower heating value: 30 MJ/kg
      }
      substance two {
        composition: 50 % K, 50 % C
        lower heating value: 30 MJ/kg
      }
    `);
    expect(figureOf(scenario, 'one', 'lower-heating-value')).toBeCloseTo(30, 9);
    expect(figureOf(scenario, 'two', 'lower-heating-value')).toBeCloseTo(30, 9);
  });

  test('what is given can be asked for, of a definition and of the catalogue', () => {
    const scenario = checkFacts(`
      substance oil {
        composition: 86 % C, 14 % H
        heat capacity: 2.1 kJ/(kg K)
        flash point: 65 degC
      }
      let own = flash point of oil
      let known = boiling point of methanol
      expect heat capacity of oil within 2.1 kJ/(kg K) ± 1 %
      expect lower flammable limit of methanol > 5 %
    `);
    expect(figureOf(scenario, 'oil', 'flash-point')).toBeCloseTo(338.15, 9);
    expect(valueOf(scenario, 'own')).toBeCloseTo(338.15, 9);
    expect(valueOf(scenario, 'known')).toBeCloseTo(337.8, 0);
  });

  test('carbon origin', () => {
    const scenario = checkFacts(`
      substance part {
        composition: 86 % C, 14 % H
        lower heating value: 42 MJ/kg
        carbon origin: fossil 25 %
      }
      blend half {
        50 % part
        50 % gas_oil
      }
    `);
    expect(figureOf(scenario, 'part', 'biogenic-carbon-share')).toBeCloseTo(0.75, 12);
    const expected = (0.86 * 0.75) / (0.86 + 0.8744);
    expect(figureOf(scenario, 'half', 'biogenic-carbon-share')).toBeCloseTo(expected, 9);
  });

  test('slips: nothing it is made of, a composition that does not close, an unknown element, two energies', () => {
    checkFacts(`
      substance one {
      #         ^^^ name/missing-entry
        lower heating value: 30 MJ/kg
      }
      substance two {
        composition: 80 % C, 10 % H
      # ^^^^^^^^^^^ balance/shares
        lower heating value: 30 MJ/kg
      }
      substance three {
        composition: 80 % C, 20 % Hx
        #                         ^^ name/unknown
        lower heating value: 30 MJ/kg
      }
      substance four {
        formula: CH3OH
        formation enthalpy: -239 kJ/mol
        lower heating value: 19.9 MJ/kg
      # ^^^^^^^^^^^^^^^^^^^ balance/contradiction
      }
    `);
  });

  test('a certificate with both heating values is fine while they agree', () => {
    checkFacts(`
      substance agreed {
        composition: 86 % C, 14 % H
        lower heating value: 42.7 MJ/kg
        higher heating value: 45.8 MJ/kg
      }
      substance mistyped {
        composition: 86 % C, 14 % H
        lower heating value: 42.7 MJ/kg
        higher heating value: 48.5 MJ/kg
      # ^^^^^^^^^^^^^^^^^^^^ balance/contradiction
      }
    `);
  });

  test('slips: a wrong dimension, a word that is not listed, a number without a unit', () => {
    checkFacts(`
      substance one {
        composition: 86 % C, 14 % H
        lower heating value: 42 kJ
        #                    ^^^^^ unit/mismatch
        phase: liquide
        #      ^^^^^^^ name/unknown
        density: 845
        #        ^^^ unit/missing
        source: supplier
        #       ^^^^^^^^ name/unknown-phrase
        flash point: 60 C
        #               ^ unit/unknown
      }
    `);
  });
});
