// Expressions as a person writes them in `let` and `expect`: values, kinds of temperature, slips with their places.
import { describe, expect, test } from 'vitest';
import { checkFacts, valueOf } from '../../support/facts.ts';

describe('values', () => {
  test.each([
    ['2 + 3 * 4', 14],
    ['(2 + 3) * 4', 20],
    ['2 ^ 3 ^ 2', 512],
    ['-2 ^ 2', 4], // a sign belongs to its literal
    ['-(2 ^ 2)', -4],
    ['7 - 2 - 1', 4],
    ['8 / 2 / 2', 2],
    ['57 %', 0.57],
    ['1/2', 0.5],
    ['6.4 MW', 6.4e6],
    ['210 per year', 210 / (365.25 * 86400)],
    ['25 degC', 298.15],
    ['-20 degC', 253.15],
    ['80 degC - 20 degC', 60],
    ['20 degC + 5 K', 298.15],
    ['13 kn', (13 * 1852) / 3600],
    ['min(3 kW, 2 MW, 4 kW)', 3000],
    ['max(1, 2, 3)', 3],
    ['sqrt(9 m^2)', 3],
    ['abs(3 - 5)', 2],
    ['ln(exp(2))', 2],
    ['log10(1000)', 3],
    ['molar_mass(Na2CO3)', (2 * 22.98976928 + 12.011 + 3 * 15.999) / 1000],
    ['molar_mass(sodium) / molar_mass(Na)', 1],
  ])('%s', (text, expected) => {
    expect(valueOf(checkFacts(`let x = ${text}`), 'x')).toBeCloseTo(expected, 9);
  });

  test('a `let` uses others, whatever their order', () => {
    const scenario = checkFacts(`
      let q = 2 * p
      let p = 3 kg
    `);
    expect(valueOf(scenario, 'q')).toBe(6);
  });

  test('a sum of two hundred terms is worked out', () => {
    const terms = Array.from({ length: 200 }, () => '1').join(' + ');
    expect(valueOf(checkFacts(`let x = ${terms}`), 'x')).toBe(200);
  });

  test('a chain of two thousand names is worked out', () => {
    const lines = Array.from({ length: 2000 }, (_, index) => `let n${index + 1} = n${index} + 1`);
    expect(valueOf(checkFacts([...lines.reverse(), 'let n0 = 0'].join('\n')), 'n2000')).toBe(2000);
  });
});

describe('slips', () => {
  test('an unknown name', () => {
    checkFacts(`
      let pressure_drop = 3 bar
      let x = 2 * presure_drop
      #           ^^^^^^^^^^^^ name/unknown
    `);
  });

  test('two independent slips are two facts; what depends on them is silent', () => {
    checkFacts(`
      let p = 3 kg + 2 s
      #       ^^^^^^^^^^ unit/mismatch
      let q = nothing_known
      #       ^^^^^^^^^^^^^ name/unknown
      let r = p + q
      expect r > 3 m
    `);
  });

  test('two temperatures are not added, and a temperature is not scaled', () => {
    checkFacts(`
      let p = 120 degC + 100 degC
      #                  ^^^^^^^^ unit/two-temperatures
      let q = 2 * 20 degC
      #       ^^^^^^^^^^^ unit/temperature
    `);
  });

  test('gauge and absolute pressures do not mix', () => {
    checkFacts(`
      let p = 2 barg + 3 bar
      #       ^^^^^^^^^^^^^^ unit/gauge
    `);
  });

  test('a unit that may mean two things, and one that is none', () => {
    checkFacts(`
      let p = 3 J/kg K
      #         ^^^^^^ unit/ambiguous
      let q = 3 kJ/kgg
      #            ^^^ unit/unknown
    `);
  });

  test('division by zero, a logarithm of nothing, an overflow', () => {
    checkFacts(`
      let p = 3 / 0
      #       ^^^^^ range/number
      let q = ln(0)
      #       ^^^^^ range/number
      let r = 1e300 * 1e300
      #       ^^^^^^^^^^^^^ range/number
    `);
  });

  test('below absolute zero', () => {
    checkFacts(`
      let p = -300 degC
      #       ^^^^^^^^^ range/temperature
    `);
  });

  test('functions: unknown, too few values, the wrong dimension', () => {
    checkFacts(`
      let p = sqr(4)
      #       ^^^ name/unknown
      let q = sqrt(4, 5)
      #       ^^^^^^^^^^ name/arguments
      let r = ln(4 m)
      #          ^^^ unit/mismatch
      let z = min(3 kW, 4 m)
      #           ^^^^^^^^^ unit/mismatch
    `);
  });

  test('a blend is no number', () => {
    checkFacts(`
      blend oil {
        100 % gas_oil
      }
      let x = oil + 1
      #       ^^^ name/wrong-kind
    `);
  });
});

describe('cycles', () => {
  test('of names are one fact, at the name that closes them', () => {
    checkFacts(`
      let p = q
      let q = r + 1
      let r = 2 * p
      #           ^ name/cycle
      let z = p + 1
    `);
  });

  test('of a name with itself', () => {
    checkFacts(`
      let p = p + 1
      #       ^ name/cycle
    `);
  });
});

describe('temperatures and gauge pressures have a zero of their own', () => {
  test('no function takes one, and a number of kelvins stays open', () => {
    const scenario = checkFacts(`
      let a = abs(-20 degC)
      #           ^^^^^^^^ unit/temperature
      let b = abs(-0.2 barg)
      #           ^^^^^^^^^ unit/gauge
      let c = abs(-20 K)
      let limit = 25 degC + c
    `);
    expect(valueOf(scenario, 'limit')).toBeCloseTo(318.15, 9);
  });

  test('below absolute zero, worked out or written in K', () => {
    checkFacts(`
      let cold = 25 degC - 500 K
      #          ^^^^^^^^^^^^^^^ range/temperature
      let difference = -5 K
      substance oil {
        composition: 86 % C, 14 % H
        flash point: -5 K
      #              ^^^^ range/temperature
        density: 800 kg/m3 at 0 K - 3 K
      #                       ^^^^^^^^^ range/temperature
      }
    `);
  });
});

test('a tolerance of nothing holds for numbers that differ by rounding only', () => {
  checkFacts(`
    expect 0.1 + 0.2 within 0.3 ± 0
    expect 0.31 within 0.3 ± 0
    #      ^^^^^^^^^^^^^^^^^^^ expect/failed
  `);
});

test('a table of a definition that could not be worked out is not asked for rows', () => {
  checkFacts(`
    blend fuel {
      30 % sodiumm
    #      ^^^^^^^ name/unknown
      rest methanol
    }
    expect mass share of sodium in fuel > 1 %
  `);
});
