import { describe, expect, test } from 'vitest';
import { readClaim, readExpression } from '../support/syntax.ts';

const expressions: readonly (readonly [string, string])[] = [
  // Quantities and units.
  ['6.4 MW', '6.4[MW]'],
  ['6.4MW', '6.4[MW]'],
  ['2.1 kJ/(kg K)', '2.1[kJ/(kg*K)]'],
  ['2.1 kJ/kg/K', '2.1[kJ/kg/K]'],
  ['2.1 J/kg K', '2.1[J/kg*K]'],
  ['2.1 kJ·kg^-1·K^-1', '2.1[kJ*kg^-1*K^-1]'],
  ['3 N*m', '3[N*m]'],
  ['3 N·m', '3[N*m]'],
  ['3 kW h', '3[kW*h]'],
  ['210 per year', '210[/year]'],
  ['5 t per year', '5[t/year]'],
  ['25 °C', '25[°C]'],
  ['30 %', '30[%]'],
  ['30%', '30[%]'],
  ['780 kg/m3', '780[kg/m^3]'],
  ['780 kg/m³', '780[kg/m^3]'],
  ['780 kg/m^3', '780[kg/m^3]'],
  ['4 s⁻²', '4[s^-2]'],
  ['4 (m)', ''],
  ['5 µm', '5[µm]'],
  ['5\u00a0kg', '5[kg]'],
  ['9 W/(m K)^2', '9[W/(m*K)^2]'],
  // A word that is no unit is kept as one where nothing else can be meant, for the reader of units to name.
  ['12 knots', '12[knots]'],
  ['12 knots/h', '12[knots/h]'],
  ['70 F', '70[F]'],
  ['2 soda_mass', ''],
  ['2 NaCl', ''],
  ['2 big cows', ''],
  ['2 min(3, 4)', ''],
  // What is no unit is left to the expression.
  ['6 kW * 2 h', '{6[kW] * 2[h]}'],
  ['6 kW / (2 h)', '{6[kW] / (2[h])}'],
  ['6 kW * min(3 h, 4 h)', '{6[kW] * min(3[h], 4[h])}'],
  ['6 kW / slurry_mass', '{6[kW] / slurry_mass}'],
  ['2 * molar_mass(Na)', '{2 * molar_mass(Na?)}'],
  // Numbers.
  ['1/2', '1/2'],
  ['1 / 2', '{1 / 2}'],
  ['1e-3', '0.001'],
  ['1e−3', '0.001'],
  ['2E3', '2000'],
  ['-20 degC', '-20[degC]'],
  ['−20 degC', '-20[degC]'],
  ['+20 degC', '20[degC]'],
  ['.5', '0.5'],
  // Uncertainty.
  ['44.0 ± 0.2 MJ/kg', '44[MJ/kg]±0.2'],
  ['44.0 +/- 0.2 MJ/kg', '44[MJ/kg]±0.2'],
  ['44 MJ/kg ± 2 %', '44[MJ/kg]±2[%]'],
  ['44 MJ/kg ± 0.1 MJ/kg', '44[MJ/kg]±0.1[MJ/kg]'],
  ['2 * 3 kg ± 1 kg + 1 kg', '{{2 * 3[kg]±1[kg]} + 1[kg]}'],
  // Precedence.
  ['a + b * c', '{a + {b * c}}'],
  ['a * b + c', '{{a * b} + c}'],
  ['a - b - c', '{{a - b} - c}'],
  ['a / b / c', '{{a / b} / c}'],
  ['a / b * c', '{{a / b} * c}'],
  ['a^b^c', '{a ^ {b ^ c}}'],
  ['-a^2', '{-{a ^ 2}}'],
  ['-2^2', '{-2 ^ 2}'],
  ['a^-2', '{a ^ -2}'],
  ['a^-b^c', '{a ^ {-{b ^ c}}}'],
  ['- -a', '{-{-a}}'],
  ['a * -b', '{a * {-b}}'],
  ['a - -3', '{a - -3}'],
  ['(a + b) * c', '{({a + b}) * c}'],
  ['a − b', '{a - b}'],
  ['2 · a', '{2 * a}'],
  // References, memberships, calls.
  ['lower heating value of slurry', '<lower heating value of slurry>'],
  ['carbon-factor of slurry', '<carbon-factor of slurry>'],
  ['lower heating value of slurry * 2', '{<lower heating value of slurry> * 2}'],
  ['2 * flame temperature of b at 900 degC', '{2 * <flame temperature of b at 900[degC]>}'],
  ['density of slurry at -20 degC', '<density of slurry at -20[degC]>'],
  ['density of slurry at (a + b)', '<density of slurry at ({a + b})>'],
  ['density of slurry at storage_temperature', '<density of slurry at storage_temperature>'],
  ['mass share of Na2CO3(l) in b at 350 degC', "<mass share of f'Na2CO3(l)' in b at 350[degC]>"],
  ["density of 'sodium oleate'", "<density of 'sodium oleate'>"],
  ['min power of main', '<min power of main>'],
  ['density of K', '<density of K?>'],
  ['sodium in slurry', '<sodium in slurry>'],
  ['Na in slurry', '<Na? in slurry>'],
  ['sodium in slurry by mole', '<sodium in slurry by mole>'],
  ['sodium in slurry by volume + 1', '{<sodium in slurry by volume> + 1}'],
  ['molar_mass(Na2CO3)', "molar_mass(f'Na2CO3')"],
  ['min(3 kW, rated power of main)', 'min(3[kW], <rated power of main>)'],
  ['min(a, max(b, c))', 'min(a, max(b, c))'],
  ['f()', 'f()'],
  ['f (a)', ''],
  // Formulas and names.
  ['Ca(OH)2', "f'Ca(OH)2'"],
  ['MgCl2.6H2O', "f'MgCl2.6H2O'"],
  ['MgCl2·6H2O', "f'MgCl2·6H2O'"],
  ['Fe0.947O', "f'Fe0.947O'"],
  ['Na+', "f'Na+'"],
  ['CO3--', "f'CO3--'"],
  ['CO3^2-', "f'CO3^2-'"],
  ['CO₃²⁻', "f'CO₃²⁻'"],
  ['Na₂CO₃', "f'Na₂CO₃'"],
  ['e-', "f'e-'"],
  ['Na+(aq)', "f'Na+(aq)'"],
  ['(NH4)2SO4', "f'(NH4)2SO4'"],
  ['K(l)', "f'K(l)'"],
  ['sodium(l)', "f'sodium(l)'"],
  ['K', 'K?'],
  ['CO', 'CO?'],
  ['E3', 'E3?'],
  ['NaCl', "f'NaCl'"],
  ['blend', 'blend'],
  ['mass', 'mass'],
  // Line ends.
  ['a +\n  b', '{a + b}'],
  ['a *\n\n  # the other half\n  b', '{a * b}'],
  ['min(a,\n  b)', 'min(a, b)'],
  ['(a\n + b)', '({a + b})'],
];

describe('an expression', () => {
  test.each(expressions.filter(([, outline]) => outline !== ''))('%s', (text, outline) => {
    expect(readExpression(text)).toBe(outline);
  });

  test.each(expressions.filter(([, outline]) => outline === ''))('%s is refused', (text) => {
    expect(() => readExpression(text)).toThrow();
  });
});

describe('a claim', () => {
  test.each([
    ['a > 33 MJ/kg', '{a > 33[MJ/kg]}'],
    ['a ≤ b + c', '{a <= {b + c}}'],
    ['a ≥ b', '{a >= b}'],
    ['a = b', '{a = b}'],
    ['net greenhouse gas of a < 2 * b', '{<net greenhouse gas of a> < {2 * b}}'],
    ['a within 2000 K ± 200 K', '{a within 2000[K] ±± 200[K]}'],
    ['a within 2000 K +/- 10 %', '{a within 2000[K] ±± 10[%]}'],
    ['a within b + c ± 1', '{a within {b + c} ±± 1}'],
    ['a within (2000 K ± 5 K) ± 200 K', '{a within (2000[K]±5[K]) ±± 200[K]}'],
    ['3 kg ± 1 kg < b', '{3[kg]±1[kg] < b}'],
  ])('%s', (text, outline) => {
    expect(readClaim(text)).toBe(outline);
  });
});
