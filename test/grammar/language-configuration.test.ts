// What the editor does with keys before any server answers: words under a double click, indentation, doc comments.
// The patterns are checked as the editor uses them: compiled from the file, against whole lines.
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import configuration from '../../grammar/language-configuration.json';

const word = new RegExp(configuration.wordPattern.pattern, `${configuration.wordPattern.flags}g`);
const increase = new RegExp(configuration.indentationRules.increaseIndentPattern);
const decrease = new RegExp(configuration.indentationRules.decreaseIndentPattern);
const docLine = new RegExp(configuration.onEnterRules[0]?.beforeText ?? '$^');

test.each([
  ['lower heating value', ['lower', 'heating', 'value']],
  ['days_worked', ['days_worked']],
  ['by-product: 1.54', ['by-product', '1.54']],
  ['hazard/water-reactive', ['hazard', 'water-reactive']],
  ['2 Na(cr) + 1/2 O2(g)', ['2', 'Na(cr)', '1/2', 'O2(g)']],
  ['Ca(OH)2 MgCl2.6H2O MgCl2·6H2O Fe0.947O', ['Ca(OH)2', 'MgCl2.6H2O', 'MgCl2·6H2O', 'Fe0.947O']],
  ['3.5e-4 −20 µmol', ['3.5e-4', '−20', 'µmol']],
  ["'sodium oleate'", ['sodium', 'oleate']],
])('the words of %s', (text, expected) => {
  expect(text.match(word)).toEqual(expected);
});

describe('indentation', () => {
  test.each(['blend x {', 'blend x {   # note { }', "blend 'a { b' {", 'blend x { 2 mol K;'])('%s opens', (line) => {
    expect(increase.test(line)).toBe(true);
  });
  test.each(['blend x { 2 mol K }', '# blend x {', 'source: "a {', "fuel: 'a {", 'let a = 2'])(
    '%s does not',
    (line) => {
      expect(increase.test(line)).toBe(false);
    },
  );
  test('only a closing brace goes back', () => {
    expect(decrease.test('  }')).toBe(true);
    expect(decrease.test('  a: 1 }')).toBe(false);
  });
  test('a long line without a brace is read in linear time', () => {
    const line = `"a' `.repeat(20_000);
    const started = performance.now();
    expect(increase.test(line)).toBe(false);
    expect(performance.now() - started).toBeLessThan(1000);
  });
});

test('Enter continues a doc comment that has words, and lets an empty one end', () => {
  expect(docLine.test('## Renewable diesel')).toBe(true);
  expect(docLine.test('##')).toBe(false);
  expect(docLine.test('# plain')).toBe(false);
});

test('quotes close themselves outside text and comments only', () => {
  for (const quote of ['"', "'"]) {
    const pair = configuration.autoClosingPairs.find(({ open }) => open === quote);
    expect(pair?.notIn).toEqual(['string', 'comment']);
  }
});

test('the file stays plain JSON, which every editor reads', () => {
  expect(JSON.parse(readFileSync('grammar/language-configuration.json', 'utf8'))).toEqual(configuration);
});
