// What an engineer is told of slips that once were told wrongly, truncated, or not at all.
import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import { evaluateText } from '../../support/facts.ts';

/** Hazards have tables of their own. */
const messagesOf = (text: string): string[] =>
  findingsOf(evaluateText(text))
    .filter(({ code }) => !code.startsWith('hazard/'))
    .map(({ message }) => message);

const slurry = 'blend slurry { 30 % mass sodium; rest gas_oil }\n';

describe('what is told', () => {
  test.each([
    [
      'each side of a call by its own name',
      'let x = min(1 m, 2 kg)',
      '`1 m` is a length (m) and `2 kg` is a mass (kg)',
    ],
    [
      'the portion whose molar mass is missing',
      `${slurry}expect sodium in slurry by mole < 1`,
      'of `gas_oil` is known',
    ],
    [
      'a balanced equation in full',
      'reaction a { MnO4-(aq) + Fe++(aq) + H+(aq) -> Mn++(aq) + Fe+++(aq) + H2O(l) }',
      '-> Mn++(aq) + 5 Fe+++(aq) + 4 H2O(l)`',
    ],
    [
      'a value that would read like its limit, with more digits',
      'expect molar_mass(Na) = 22.99 g/mol',
      'found 22.9898 g/mol, 0.0002307 g/mol below 22.99 g/mol. For a margin',
    ],
    ['a number without its unit', `${slurry}expect lower heating value of slurry > 33`, 'Does `33` lack its unit?'],
    [
      'an energy per volume as one',
      'substance oil { formula: CH4; lower heating value: 42 MJ/L }',
      '`42 MJ/L` is an energy per volume (J/m³), but a specific energy',
    ],
    [
      'a misspelt unit at the head of a quotient',
      'substance oil { formula: CH4; lower heating value: 40 Mj/kg }',
      '`Mj` is not a unit here. Did you mean `MJ`',
    ],
    ['a unit in other capitals alone', 'let x = 3 KW', '`KW` is not a unit here. Did you mean `kW`?'],
    [
      'a unit of other papers, though a name is near',
      'let r = 2\nlet x = 3 Gt/yr',
      '`yr` is not a unit here. Did you mean `year`?',
    ],
    [
      'an entry by its other name',
      'substance oil { formula: CH4; LHV: 50 MJ/kg }',
      'no entry `LHV`. Did you mean `lower heating value`?',
    ],
    ['a figure by its other name', `${slurry}expect NCV of slurry > 3 MJ/kg`, 'Did you mean `lower heating value`?'],
    [
      'an element by its name',
      'substance oil { composition: 84 % carbon, 16 % H }',
      '`carbon` is not the symbol of a chemical element. Did you mean `C`?',
    ],
    ['a coefficient of zero', 'reaction a { 0 Na(cr) + Cl2(g) -> Cl2(g) }', '`coefficient` must be more than zero'],
    ['a name in other capitals alone', 'reaction r2 { 2 h2 + O2(g) -> 2 H2O(l) }', 'called `h2`. Did you mean `H2`?'],
    [
      'a formula without data as one, and not as a slip for another',
      'blend a { 30 % mass C14H29Na; rest gas_oil }',
      "Define it with `substance 'C14H29Na' { … }`",
    ],
    [
      'a molar enthalpy without a molar mass',
      'substance oil { composition: 84 % C, 16 % H; formation enthalpy: -250 kJ/mol }',
      'moles of it cannot be turned into mass. Give the number by mass',
    ],
    [
      'a missing file, and not the names that may be in it',
      'use "gone.stoke"\nblend a { 30 % mass sodium; rest house_oil }',
      'No file `gone.stoke`',
    ],
    [
      'a heating value that nothing has',
      'substance oil { formula: C8H18; higher heating value: 47900 MJ/kg }',
      '`47900 MJ/kg` is more than anything that burns sets free: hydrogen has 141.8 MJ/kg (higher).',
    ],
    [
      'a heating value with the sign of a reaction',
      'substance oil { formula: C8H18; lower heating value: -44 MJ/kg }',
      '`-44 MJ/kg` would mean that burning takes up heat.',
    ],
    ['a path of another system', 'use "sub\\lib.stoke"', 'Write `sub/lib.stoke`.'],
    ['an empty path', 'use ""', 'There is no path between these quotes.'],
  ])('%s', (_, text, expected) => {
    const messages = messagesOf(text);
    expect(messages).toHaveLength(1);
    expect(messages[0]).toContain(expected);
  });

  test('the unit behind a tolerance is that of both its numbers', () => {
    expect(messagesOf(`${slurry}expect lower heating value of slurry within 34 ± 1 MJ/kg`)).toEqual([]);
    expect(messagesOf(`${slurry}expect lower heating value of slurry within 38 ± 1 MJ/kg`)[0]).toContain(
      'below 38 MJ/kg, where 1 MJ/kg is allowed',
    );
  });

  test('of a definition with a spoilt header, no figures of what is left of it', () => {
    const scenario = evaluateText('blend my blend { 50 % mass sodium; rest water }');
    expect(findingsOf(scenario)).toHaveLength(1);
    expect(scenario.files[0]?.definitions[0]?.figures).toEqual([]);
  });
});
