// Slips in the words of an entry: one cause gives one finding, and what is offered mends it.
import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import type { Finding } from '../../../server/findings/finding.ts';
import { evaluateText } from '../../support/facts.ts';

const told = (text: string): readonly Finding[] =>
  findingsOf(evaluateText(text)).filter(({ code }) => !code.startsWith('hazard/'));
const messagesOf = (text: string): string[] => told(text).map(({ message }) => message);

/** The text after a finding's only or preferred mend. */
function mended(text: string, finding: Finding | undefined, at = 0): string {
  return [...(finding?.fixes[at]?.edits ?? [])]
    .sort((left, right) => right.place.start - left.place.start)
    .reduce((done, { place, newText }) => done.slice(0, place.start) + newText + done.slice(place.end), text);
}

describe('an entry without its colon', () => {
  test.each([
    ['burn a {\n  fuel methanol\n  oxidant: air\n  lambda: 2\n}\n', 'fuel', 'methanol'],
    ['burn a { fuel: methanol; oxidant air; lambda: 2 }\n', 'oxidant', 'air'],
    ['burn a { fuel: methanol; oxidant: air; lambda 2 }\n', 'lambda', '2'],
    ['burn a { fuel: methanol; oxidant: air; oxidant per fuel 14.5 kg/kg }\n', 'oxidant per fuel', '14.5 kg/kg'],
    ['burn a { fuel: methanol; oxidant: air; lambda: 2; cooled to 900 degC }\n', 'cooled to', '900 degC'],
    [
      'oxidant humid {\n  79 % mole N2\n  21 % mole O2\n  state: 25 degC, 1 bar\n  relative  humidity 75 %\n}\n',
      'relative humidity',
      '75 %',
    ],
    ['substance oil {\n  formula CH4\n}\n', 'formula', 'CH4'],
    ['blend mix {\n  50 % mass sodium\n  rest gas_oil\n  stored 20 degC, 1 bar\n}\n', 'stored', '20 degC, 1 bar'],
  ])('%j', (text, words, value) => {
    const findings = told(`let x = 1 kg\n${text}`);
    expect(findings.map(({ message }) => message)).toEqual([
      `Write a colon after \`${words}\`: \`${words}: ${value}\`.`,
    ]);
    expect(findings[0]?.code).toBe('syntax/missing');
    const after = mended(`let x = 1 kg\n${text}`, findings[0]);
    expect(after).toContain(': ' + value);
    expect(messagesOf(after)).not.toContain(findings[0]?.message);
    expect(told(after).filter(({ code }) => code.startsWith('syntax/') || code === 'name/missing-entry')).toEqual([]);
  });

  test('a portion of that name is one, and so is a spoilt one', () => {
    const own = 'substance stored { formula: CH4; phase: gas }\n';
    const codes = told(`${own}blend mix { 50 % mass stored; rest gas_oil }`).map(({ code }) => code);
    expect(codes.filter((code) => /syntax|name/.test(code))).toEqual([]);
    expect(messagesOf('blend mix { 50 % mass stored at; rest gas_oil }').join()).not.toContain('Write a colon');
  });

  test.each(['fuels methanol', 'fuel', 'Fuel methanol', 'fuel temprature 20 degC', 'density 780 kg/m3'])(
    'a line that starts otherwise is left to the general words: %s',
    (line) => {
      const messages = messagesOf(`burn a { fuel: methanol; oxidant: air; lambda: 2; ${line} }`);
      expect(messages).toHaveLength(1);
      expect(messages[0]).toContain('neither an entry nor a portion');
    },
  );

  test('another slip of the same line is told in its own words, and the entry is not called missing', () => {
    expect(messagesOf('burn a { fuel = methanol; oxidant: air; lambda: 2 }')).toEqual([
      'An entry has a colon behind its words: `fuel: …`.',
    ]);
  });
});

test.each([
  ['burn a { fuel: methanol; oxydant: air; lambda: 2 }', 'oxidant'],
  ['burn a { fuel: methanol; oxidant: air; lamda: 2 }', 'lambda'],
  ['burn a { Fuel: methanol; oxidant: air; lambda: 2 }', 'fuel'],
  ['substance oil { formla: CH4 }', 'formula'],
])('a misspelt entry is not called missing as well: %s', (text, meant) => {
  const messages = messagesOf(text);
  expect(messages).toHaveLength(1);
  expect(messages[0]).toContain(`Did you mean \`${meant}\`?`);
});

test('an entry that nothing is near to leaves the missing one missing', () => {
  expect(
    told('burn a { fuel: methanol; colour: red; lambda: 2 }')
      .map(({ code }) => code)
      .sort(),
  ).toEqual(['name/missing-entry', 'name/unknown-entry']);
});

test('entries that are all missing are all needed, and of alternatives one is', () => {
  expect(messagesOf('burn a { lambda: 2 }')).toEqual([
    'The burn `a` needs `fuel: …` and `oxidant: …`. Add them inside the braces.',
  ]);
  expect(messagesOf('burn a { fuel: methanol; lambda: 2 }')).toEqual([
    'The burn `a` needs `oxidant: …`. Add it inside the braces.',
  ]);
  expect(messagesOf('substance oil { density: 780 kg/m3 }')).toEqual([
    'The substance `oil` needs `formula: …` or `composition: …`. Add it inside the braces.',
  ]);
});

describe('an excess-air ratio with a unit', () => {
  const burn = (line: string): string => `burn a { fuel: methanol; oxidant: air; ${line} }`;

  test('a mass ratio is pointed to the entry that takes it', () => {
    const text = burn('lambda: 14.5 kg/kg');
    expect(messagesOf(text)).toEqual([
      '`14.5 kg/kg` is a mass of one per mass of the other. `lambda` takes a number without a unit. Such a ratio is written `oxidant per fuel: 14.5 kg/kg`.',
    ]);
    expect(mended(text, told(text)[0])).toBe(burn('oxidant per fuel: 14.5 kg/kg'));
  });

  test('a percentage is told as the number it is', () => {
    const text = burn('lambda: 2 %');
    expect(messagesOf(text)).toEqual(['`2 %` is 0.02. `lambda` takes a number without a unit. Write `2` or `0.02`.']);
    expect(mended(text, told(text)[0])).toBe(burn('lambda: 2'));
    expect(mended(burn('lambda: 200 %'), told(burn('lambda: 200 %'))[0])).toBe(burn('lambda: 2'));
  });

  test('where the `%` is that of a ± as well, no number is offered', () => {
    const [finding] = told(burn('lambda: 2 ± 5 %'));
    expect(finding?.message).toBe('`2 ± 5 %` is 0.02. `lambda` takes a number without a unit.');
    expect(finding?.fixes).toEqual([]);
  });

  test('a bare number, and a mass ratio in its own entry, are neither', () => {
    for (const line of ['lambda: 2', 'lambda: 2 ± 0.1', 'oxidant per fuel: 14.5 kg/kg']) {
      expect(told(burn(line)).map(({ code }) => code)).not.toContain('unit/mismatch');
    }
  });
});
