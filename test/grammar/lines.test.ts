import { describe, expect, test } from 'vitest';
import { readLines, readSections } from '../support/syntax.ts';

describe('an entry', () => {
  test.each([
    ['density: 780 kg/m3 at 15 degC', 'density: 780[kg/m^3] |at| 15[degC]'],
    ['composition: 84.9 % C, 15.1 % H', 'composition: 84.9[%] C?, 15.1[%] H?'],
    // The scenario gives the last unit word back to the substance.
    ['composition: 95 % C, 5 % N', 'composition: 95[%] C?, 5[%*N]'],
    ['held: pressure 120 bar', 'held: pressure 120[bar]'],
    ['gauge: pressure -0.2 bar', 'gauge: pressure -0.2[bar]'],
    ['sail: 38 nmi at 11 kn on main', 'sail: 38[nmi] |at| 11[kn] |on| main'],
    ['reserve: 20 % of duty fuel', 'reserve: 20[%] |of| duty fuel'],
    [
      'tanks: maximum filling 95 %, 0.45 kg tank per kg slurry',
      'tanks: maximum filling 95[%], 0.45[kg] tank |per| unit[kg] slurry',
    ],
    ['pilot: 5 % energy gas_oil', 'pilot: 5[%] energy gas_oil'],
    ['pilot: 5 % mass gas_oil', 'pilot: 5[%] |mass| gas_oil'],
    [
      'vary: sodium in slurry from 0 % to 80 % at 33 points',
      'vary: <sodium in slurry> |from| 0[%] |to| 80[%] |at| 33 points',
    ],
    [
      'adjust: sodium in slurry by mole between 0 % and 80 %',
      'adjust: <sodium in slurry by mole> |between| 0[%] |and| 80[%]',
    ],
    ['until: net greenhouse gas of books = 0 t per year', 'until: {<net greenhouse gas of books> = 0[t/year]}'],
    ['until: a within 3 K ± 1 K', 'until: {a within 3[K] ±± 1[K]}'],
    ['range: within 3 K', 'range: |within| 3[K]'],
    [
      'show: lower heating value of a, density of b at 20 degC',
      'show: <lower heating value of a>, <density of b at 20[degC]>',
    ],
    ['cooled to: 900 degC, 350 degC', 'cooled to: 900[degC], 350[degC]'],
    ['by-product: 1.54 kg/kg chlorine, ends as product', 'by-product: 1.54[kg/kg] chlorine, ends as product'],
    ['test cycle: E3', 'test cycle: E3?'],
    ['stability class: D', 'stability class: D?'],
    ['name: K', 'name: K?'],
    ['name: K(l)', "name: f'K(l)'"],
    ['in use at: main', 'in use at: main'],
    ['use: main', 'use: main'],
    ['blend: main', 'blend: main'],
    ['rest of: main', 'rest of: main'],
    ['leg 2: 5 h', 'leg 2: 5[h]'],
    ['power: 2 * (3 kW + 1 kW) at 5 K', 'power: {2 * ({3[kW] + 1[kW]})} |at| 5[K]'],
    ['power: a - b', 'power: {a - b}'],
    ['cost: min(3, 4) per kg fuel', 'cost: min(3, 4) |per| unit[kg] fuel'],
    ['source: "a: b { c } # d ; e"', 'source: "a: b { c } # d ; e"'],
    ["fuel: 'gas: { # oil'", "fuel: 'gas: { # oil'"],
    ['  state  :  25 degC , 1 bar', 'state: 25[degC], 1[bar]'],
    ['ratio: 1/2 kg', 'ratio: 1/2[kg]'],
    ['stack: height 24 m, bore 1.1 m, gas 320 degC', 'stack: height 24[m], bore 1.1[m], gas 320[degC]'],
  ])('%s', (line, outline) => {
    expect(readLines(line)).toEqual([outline]);
  });
});

describe('a portion', () => {
  test.each([
    ['30 % mass  sodium', 'portion 30[%] by mass of sodium'],
    ["2 % mass 'sodium oleate'", "portion 2[%] by mass of 'sodium oleate'"],
    ['rest gas_oil', 'portion rest of gas_oil'],
    ['2 mol Na(cr)', "portion 2[mol] of f'Na(cr)'"],
    ['2 mol K', 'portion 2[mol] of K?'],
    ['5 kg N', 'portion 5[kg] of N?'],
    ['79 % mole N2', 'portion 79[%] by mole of N2?'],
    ['79 % N2', 'portion 79[%] of N2?'],
    ['1 kg K(l)', "portion 1[kg] of f'K(l)'"],
    ['3 m3 volume water', 'portion 3[m^3] by volume of water'],
    ['30 ± 1 % mass sodium', 'portion 30[%]±1 by mass of sodium'],
    ['(share * 2) mass sodium', 'portion ({share * 2}) by mass of sodium'],
    ['min(a, b) mole sodium', 'portion min(a, b) by mole of sodium'],
    ['1 kg MgCl2.6H2O', "portion 1[kg] of f'MgCl2.6H2O'"],
  ])('%s', (line, outline) => {
    expect(readLines(line)).toEqual([outline]);
  });
});

describe('an equation', () => {
  test.each([
    ['2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2CO3(cr)', "2 f'Na(cr)' + 1/2 f'O2(g)' + f'CO2(g)' -> f'Na2CO3(cr)'"],
    ['2Na + H2 → 2NaH', "2 Na? + H2? -> 2 f'NaH'"],
    ['2 K + S -> K2S', "2 K? + S? -> f'K2S'"],
    ['Na+ + Cl- -> NaCl', "f'Na+' + f'Cl-' -> f'NaCl'"],
    ['Na -> Na+ + e-', "Na? -> f'Na+' + f'e-'"],
    ['Ca++ + CO3-- -> CaCO3', "f'Ca++' + f'CO3--' -> f'CaCO3'"],
    ['2 sodium + water -> Na2O + hydrogen', "2 sodium + water -> f'Na2O' + hydrogen"],
    ["'gas oil' + O2 -> CO2", "'gas oil' + O2? -> f'CO2'"],
    ['a + b ->\n  c +\n  d', 'a + b -> c + d'],
    // A number is a coefficient, never an amount of a unit.
    ['2 K + 1 N -> 3 V', '2 K? + 1 N? -> 3 V?'],
  ])('%s', (line, outline) => {
    expect(readLines(line)).toEqual([outline]);
  });
});

describe('lines', () => {
  test('an acknowledgement keeps its code and reason', () => {
    expect(readLines('acknowledge hazard/water-reactive: "closed tanks"')).toEqual([
      'acknowledge hazard/water-reactive "closed tanks"',
    ]);
  });

  test('a semicolon is a newline', () => {
    expect(readLines('fuel: a; 3 kg b ;; rest c')).toEqual(['fuel: a', 'portion 3[kg] of b', 'portion rest of c']);
  });

  test('a comma goes on to the next line unless that is an entry', () => {
    expect(readLines('show: a,\n  b,\n\n  # and\n  c\nfuel: z')).toEqual(['show: a, b, c', 'fuel: z']);
  });

  test('a bracket goes on over lines', () => {
    expect(readLines('power: (\n 3 kW\n + 2 kW\n)\nfuel: z')).toEqual(['power: ({3[kW] + 2[kW]})', 'fuel: z']);
  });

  test('carriage returns end lines too', () => {
    expect(readSections('blend a {\r\n  fuel: b\r  fuel: c\r\n}\r\n')).toEqual(['blend a {fuel: b; fuel: c}']);
  });

  test('a definition may stand on one line', () => {
    expect(readSections('blend a { 30 % mass b; rest c } let d = 3')).toEqual([
      'blend a {portion 30[%] by mass of b; portion rest of c}',
      'let d = 3',
    ]);
  });

  test('the opening brace may stand on the next line', () => {
    expect(readSections('blend a\n{\n  rest c\n}')).toEqual(['blend a {portion rest of c}']);
  });
});
