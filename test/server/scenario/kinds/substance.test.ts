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

describe('hazards a substance says of itself', () => {
  /** What a blend of it alone is told of its portion. */
  const hazardsOf = (line: string) =>
    checkFacts(`
      substance own {
        formula: C2H5ONa
        ${line}
        source: "sheet 4"
      }
      blend all_of_it {
        100 % own
      }
    `)
      .files.flatMap(({ definitions }) => definitions)
      .flatMap(({ lines }) => lines)
      .flatMap((result) => (result?.kind === 'portion' ? [result.material.hazards] : []))[0];
  const cardOf = (hazards: string) => hazardsOf(`hazards: ${hazards}`);

  test('are codes, UN numbers and families, in any order, each once', () => {
    const hazards = cardOf('H260, UN 1422, alkali-metal, H314, H260, H360FD, UN1428');
    expect(hazards?.classes.map(({ hazardClass, category, statement }) => [hazardClass, category, statement])).toEqual([
      ['Water-react.', '1', 'H260'],
      ['Skin Corr.', '1', 'H314'],
      ['Repr.', '1A', 'H360'],
    ]);
    expect(hazards?.families).toEqual(['alkali-metal']);
    expect(hazards?.transport).toMatchObject([
      { unNumber: 1422, dangerClass: '4.3', packingGroup: 'I', properShippingName: 'POTASSIUM SODIUM ALLOYS, LIQUID' },
      { unNumber: 1428, dangerClass: '4.3' },
    ]);
    expect(hazards?.classes[0]?.source.title).toBe('sheet 4');
  });

  test('a UN number that no catalogue substance has is kept as it is', () => {
    const [entry] = cardOf('UN 3077')?.transport ?? [];
    expect(entry).toMatchObject({ unNumber: 3077, subsidiary: [] });
    expect(entry).not.toHaveProperty('dangerClass');
  });

  test('what is not written is not known', () => {
    expect(hazardsOf('phase: liquid')).toBeNull();
  });

  test('slips are said where they stand', () => {
    checkFacts(`
      substance one {
        formula: Na
        hazards: H261, H99
        #              ^^^ name/unknown
      }
      substance two {
        formula: Na
        hazards: alkali-metl
        #        ^^^^^^^^^^^ name/unknown
      }
      substance three {
        formula: Na
        hazards: UN 1428.5
        #        ^^^^^^^^^ name/unknown-phrase
      }
      substance four {
        formula: Na
        hazards: H260 H314
        #        ^^^^^^^^^ name/unknown-phrase
      }
    `);
  });
});
