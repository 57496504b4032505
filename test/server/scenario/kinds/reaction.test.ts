// Reactions: balance, energies at their state, and what is said of slips in them.
import { describe, expect, test } from 'vitest';
import { checkFacts, figureOf } from '../../../support/facts.ts';

describe('reaction', () => {
  test('the carbonate route', () => {
    const scenario = checkFacts(`
      reaction route {
        2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2CO3(cr)
      }
    `);
    expect(figureOf(scenario, 'route', 'enthalpy')).toBeCloseTo(-1130.768 + 393.522, 3);
    const left = (2 * 22.98976928 + 15.999 + 44.009) / 1000;
    expect(figureOf(scenario, 'route', 'specific-enthalpy')).toBeCloseTo((-1130.768 + 393.522) / left, 0);
  });

  test('one that does not balance has the deficit and the balanced equation', () => {
    const scenario = checkFacts(`
      reaction burn {
        CH4 + O2 -> CO2 + H2O
      # ^^^^^^^^^^^^^^^^^^^^^ balance/elements
      }
      expect enthalpy of burn < 0 kJ
    `);
    const fact = scenario.files[0]?.facts[0]?.fact;
    expect(fact).toMatchObject({
      differences: [
        { element: 'H', left: 4, right: 2 },
        { element: 'O', left: 2, right: 3 },
      ],
      solution: { kind: 'unique', equation: 'CH4 + 2 O2 -> CO2 + 2 H2O' },
    });
    expect(scenario.files[0]?.expectations[0]?.holds).toBeNull();
  });

  test('a formula outside the catalogue is counted, and its energy is missing', () => {
    checkFacts(`
      reaction odd {
        XeF2 -> Xe + F2
      # ^^^^^^^^^^^^^^^ balance/no-data
      }
    `);
  });

  test('a zero for the letter O', () => {
    checkFacts(`
      reaction burn {
        CH4 + 2 O2 -> C02 + 2 H20
      #               ^^^ name/unknown
      #                       ^^^ name/unknown
      }
    `);
  });

  test('at another temperature, a bare formula takes its stable phase there', () => {
    const takenAs = (state: string): unknown => {
      const scenario = checkFacts(`
        reaction melt {
          2 Na + H2O -> Na2O + H2
          state: ${state}
        }
      `);
      const table = scenario.files[0]?.definitions[0]?.tables.find(({ id }) => id === 'species');
      return table?.rows.map((row) => row[1]);
    };
    expect(takenAs('25 degC, 1 bar')).toEqual(['Na(cr)', 'H2O(l)', 'Na2O(cr)', 'H2(g)']);
    expect(takenAs('90 degC, 1 bar')).toEqual(['Na(cr)', 'H2O(l)', 'Na2O(cr)', 'H2(g)']);
    expect(takenAs('110 degC, 1 bar')).toEqual(['Na(l)', 'H2O(g)', 'Na2O(cr)', 'H2(g)']);
    expect(takenAs('110 degC, 5 bar')).toEqual(['Na(l)', 'H2O(l)', 'Na2O(cr)', 'H2(g)']);
  });

  test('a written phase stays, and an extrapolated one is told', () => {
    const scenario = checkFacts(`
      reaction hydride {
        2 Na(l) + H2(g) -> 2 NaH(cr)
        state: 900 degC, 1 bar
      # ^^^^^^^^^^^^^^^^^^^^^^ range/temperature
      }
    `);
    expect(figureOf(scenario, 'hydride', 'enthalpy')).toBeLessThan(0);
  });

  test('what the tables lack rises by its own heat capacity', () => {
    const scenario = checkFacts(`
      reaction cold {
        C2H5OH(g) -> C2H4(g) + H2O(g)
      }
      reaction hot {
        C2H5OH(g) -> C2H4(g) + H2O(g)
        state: 300 degC
      }
    `);
    const [cold, hot] = ['cold', 'hot'].map((name) => figureOf(scenario, name, 'enthalpy') ?? NaN);
    // ΔCp of dehydration is about -7 J/(mol K) near 25 °C, so the heat changes by a few kilojoules at the most.
    expect(Math.abs((hot ?? NaN) - (cold ?? NaN))).toBeLessThan(5);
    expect(hot).not.toBe(cold);
    // and at the higher temperature the entropy carries it
    expect(figureOf(scenario, 'hot', 'log10-k')).toBeGreaterThan(0);
  });

  test('a substance without a heat capacity is known at 25 °C only', () => {
    checkFacts(`
      substance odd_gas {
        formula: N2O5
        phase: gas
        formation enthalpy: 11 kJ/mol
      }
      reaction split {
        2 odd_gas -> 4 NO2 + O2
      # ^^^^^^^^^^^^^^^^^^^^^^^ balance/no-data
        state: 200 degC
      }
    `);
  });

  test('a mixture has no formula', () => {
    checkFacts(`
      reaction burn {
        gas_oil + O2 -> CO2 + H2O
      # ^^^^^^^ name/wrong-kind
      }
    `);
  });

  test('without an equation', () => {
    checkFacts(`
      reaction none {
      #        ^^^^ name/missing-entry
        state: 25 degC
      }
    `);
  });
});
