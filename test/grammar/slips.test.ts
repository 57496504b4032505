import { describe, expect, test } from 'vitest';
import { parse, problemsOf } from '../../grammar/parse.ts';
import { isTestUnit } from '../support/units.ts';

/** The text with the one problem's fix applied; the problem's message where it has none. */
function mended(line: string): string {
  const problems = problemsOf(parse(line, isTestUnit));
  expect(problems.map(({ message }) => message)).toHaveLength(1);
  const [problem] = problems;
  const fix = problem?.fix;
  return fix ? line.slice(0, fix.span.start) + fix.newText + line.slice(fix.span.end) : (problem?.message ?? '');
}

describe('a slip of the trade is told by name, and its fix reads', () => {
  test.each([
    ['reaction a { 2 Na(s) + Cl2(g) -> 2 NaCl(cr) }', 'reaction a { 2 Na(cr) + Cl2(g) -> 2 NaCl(cr) }'],
    ['reaction a { H2O(liq) -> H2O(g) }', 'reaction a { H2O(l) -> H2O(g) }'],
    ['reaction a { H2O(l) -> H2O(gas) }', 'reaction a { H2O(l) -> H2O(g) }'],
    ['blend a { 30 % mass Na(s)\n rest water }', 'blend a { 30 % mass Na(cr)\n rest water }'],
    ['reaction a { 2 H2 + O2 = 2 H2O }', 'reaction a { 2 H2 + O2 -> 2 H2O }'],
    ['reaction a { 2 H2 + O2 => 2 H2O }', 'reaction a { 2 H2 + O2 -> 2 H2O }'],
    ['reaction a { 2 H2 + O2 --> 2 H2O }', 'reaction a { 2 H2 + O2 -> 2 H2O }'],
    ['reaction a { 2 H2 + O2 <-> 2 H2O }', 'reaction a { 2 H2 + O2 -> 2 H2O }'],
    ['reaction a { 2 H2 + O2 ⇌ 2 H2O }', 'reaction a { 2 H2 + O2 -> 2 H2O }'],
    ['reaction a { H2O(l) = H2O(g) }', 'reaction a { H2O(l) -> H2O(g) }'],
    ['blend a { 30 percent mass sodium\n rest water }', 'blend a { 30 % mass sodium\n rest water }'],
    ['blend a { 30 wt% sodium\n rest water }', 'blend a { 30 % mass sodium\n rest water }'],
    ['blend a { 30 % wt sodium\n rest water }', 'blend a { 30 % mass sodium\n rest water }'],
    ['blend a { 30 % vol ethanol\n rest water }', 'blend a { 30 % volume ethanol\n rest water }'],
    ['blend a { 30 % v/v ethanol\n rest water }', 'blend a { 30 % volume ethanol\n rest water }'],
    ['blend a { 30 % by mass sodium\n rest water }', 'blend a { 30 % mass sodium\n rest water }'],
    ['blend a { gas_oil 70 %\n rest water }', 'blend a { 70 % gas_oil\n rest water }'],
    ["blend a { 'gas oil' 70 % mass\n rest water }", "blend a { 70 % mass 'gas oil'\n rest water }"],
    ['blend a { Na 30 %\n rest water }', 'blend a { 30 % Na\n rest water }'],
    ['blend a { 30 % sodium,\n 70 % water }', 'blend a { 30 % sodium;\n 70 % water }'],
    ['blend a { 30 % sodium, 70 % water }', 'blend a { 30 % sodium; 70 % water }'],
    ['blend a { 3 Kg sodium\n 4 kg water }', 'blend a { 3 kg sodium\n 4 kg water }'],
    ['blend a { 3 litres methanol }', 'blend a { 3 L methanol }'],
    ['substance a { density = 780 kg/m3 }', 'substance a { density: 780 kg/m3 }'],
    ['substance a { flash point: 65 ºC }', 'substance a { flash point: 65 °C }'],
    ['let a = 5 bar gauge', 'let a = 5 barg'],
    ['let a = 2 bar(g)', 'let a = 2 barg'],
    ['let a = 10 in', 'let a = 10 inch'],
    ['let a = 3 deg C', 'let a = 3 degC'],
    ['expect a == 3 kg', 'expect a = 3 kg'],
  ])('%s', (written, meant) => {
    expect(mended(written)).toBe(meant);
    expect(problemsOf(parse(meant, isTestUnit))).toEqual([]);
  });

  test.each([
    ['let a = 1,000 kW', '`1,000` could be `1000` or `1.000`. Write the one that is meant, without the comma.'],
    ['expect a within 34 MJ/kg', '`within` needs to know how far from this is allowed.'],
    ['expect a within 33 kg to 36 kg', '`within` takes a value and how far from it is allowed'],
    ['expect sodium in a by energy < 30 %', 'A share in a blend is by mass, or `by mole` or `by volume`'],
    ['expect a > 3 kg and a < 5 kg', 'One `expect` makes one claim.'],
    ['expect lower heating value slurry > 33 MJ/kg', '`heating` does not fit behind `lower`. A figure has `of`'],
    ['reaction a { -> H2O }', 'The left side of this equation is missing.'],
    ['reaction a { 2 * Na + Cl2 -> 2 NaCl }', 'A number stands right before its substance'],
    ['reaction a { -2 Na + Cl2 -> 2 NaCl }', 'No number in an equation is negative'],
    ['blend a { 3 parts sodium\n rest water }', 'A portion is a share in `%`, or a mass'],
    ['blend a { 30 % mass sodium\u0000\n rest water }', 'The character `U+0000` means nothing here.'],
    ['reaction a { H2O(ice) -> H2O(g) }', '`(ice)` is no phase here. The phases are `(g)`, `(l)`, `(cr)` for a solid'],
  ])('%s has no mechanical mend, and its words', (written, message) => {
    expect(mended(written).slice(0, message.length)).toBe(message);
  });

  test('a word that is the substance is none of the words for a share', () => {
    expect(problemsOf(parse('blend a { 30 % mass w\n rest v }', isTestUnit))).toEqual([]);
  });
});
