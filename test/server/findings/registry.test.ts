import { describe, expect, test } from 'vitest';
import { findingsIn, findingsOf } from '../../../server/findings/registry.ts';
import type { Finding, Fix } from '../../../server/findings/finding.ts';
import type { Fact } from '../../../server/scenario/facts.ts';
import { quantity, file, placeIn, scenario } from '../../support/scenario-builder.ts';

test('the findings of a file stand in order of place, whatever the order of the facts', () => {
  const text = 'aa bb cc';
  const unknown = (word: string): readonly [string, Fact] => [
    word,
    { code: 'name/unknown', what: 'value', word, near: [] },
  ];
  const findings = findingsIn(file(text, { facts: [unknown('cc'), unknown('aa'), unknown('bb')] }));
  expect(findings.map(({ place }) => text.slice(place.start, place.end))).toEqual(['aa', 'bb', 'cc']);
});

test('the findings of a scenario are those of its files, in their order', () => {
  const fact: Fact = { code: 'balance/no-portions', name: 'x' };
  const findings = findingsOf(
    scenario(
      file('b', { path: 'b.stoke', facts: [['b', fact]] }),
      file('a', { path: 'a.stoke', used: true, facts: [['a', fact]] }),
    ),
  );
  expect(findings.map(({ place }) => place.path)).toEqual(['b.stoke', 'a.stoke']);
});

test('no fact is acknowledged by itself', () => {
  expect(only('x', ['x', { code: 'balance/no-portions', name: 'x' }]).acknowledged).toBe(false);
});

test('other places are told', () => {
  const others = [placeIn('trial.stoke', 'a a', 'a')];
  expect(only('a a', ['a', { code: 'name/duplicate', name: 'a', others }]).related).toEqual([
    { place: others[0], message: '`a` is also defined here' },
  ]);
});

describe('mends', () => {
  test('a near name is put in place; one alone is preferred, of several none is', () => {
    const text = '30 % mass sodum';
    const unknown = (near: string[]): Fact => ({ code: 'name/unknown', what: 'substance', word: 'sodum', near });
    expect(applied(text, only(text, ['sodum', unknown(['sodium'])]))).toEqual([['30 % mass sodium', true]]);
    expect(applied(text, only(text, ['sodum', unknown(['sodium', 'sodium oleate'])]))).toEqual([
      ['30 % mass sodium', false],
      ["30 % mass 'sodium oleate'", false],
    ]);
  });

  test('a figure is written with spaces, not by its id', () => {
    const text = 'heting value of a';
    const fact: Fact = {
      code: 'name/unknown',
      what: 'figure',
      word: 'heting value',
      owner: 'a',
      near: ['lower-heating-value'],
    };
    expect(applied(text, only(text, ['heting value', fact]))).toEqual([['lower heating value of a', true]]);
  });

  test('a unit is offered behind the number and never preferred', () => {
    const needed = quantity(1, 'Pa').dimension;
    expect(applied('at 10', only('at 10', ['10', { code: 'unit/missing', needed, example: 'bar' }]))).toEqual([
      ['at 10 bar', false],
    ]);
    expect(applied('at 3 * 4', only('at 3 * 4', ['3 * 4', { code: 'unit/missing', needed, example: 'bar' }]))).toEqual([
      ['at (3 * 4) bar', false],
    ]);
  });

  test('the clear spelling of a unit', () => {
    const fact: Fact = { code: 'unit/ambiguous', text: 'J/kg K', offers: ['J/(kg K)'], why: 'brackets' };
    expect(applied('2 J/kg K', only('2 J/kg K', ['J/kg K', fact]))).toEqual([['2 J/(kg K)', true]]);
  });

  test('the second of two temperatures becomes a difference, only where the finding stands at it', () => {
    const side = (text: string, value: number) => ({ text, ...quantity(value, 'degC', 0, 'temperature') });
    const fact: Fact = {
      code: 'unit/two-temperatures',
      left: side('20 degC', 20),
      right: side('100 degC', 100),
      asDifference: '100 K',
    };
    const text = '20 degC + 100 degC';
    expect(applied(text, only(text, ['100 degC', fact]))).toEqual([['20 degC + 100 K', true]]);
    expect(only(text, [text, fact]).fixes).toEqual([]);
  });

  test('the balanced equation takes the place of the whole one, though the finding stands at its arrow', () => {
    const text = 'reaction r {\n  H2 + O2 -> H2O\n}\n';
    const span = (words: string) => ({ start: text.indexOf(words), end: text.indexOf(words) + words.length });
    const word = { kind: 'word', span: span('reaction'), text: 'reaction', form: 'name' } as const;
    const equation = {
      kind: 'equation',
      span: span('H2 + O2 -> H2O'),
      left: [],
      right: [],
      arrow: span('->'),
    } as const;
    const statement = {
      kind: 'definition',
      span: span(text.trimEnd()),
      keyword: word,
      header: span('reaction r {'),
      lines: [equation],
      closed: true,
    } as const;
    const section = { text, doc: '', statement, problems: [] };
    const tree = { text, sections: [{ start: 0, end: text.length, section }], fileProblems: [], truncated: false };
    const fact: Fact = {
      code: 'balance/elements',
      differences: [{ element: 'O', left: 2, right: 1 }],
      solution: { kind: 'unique', equation: '2 H2 + O2 -> 2 H2O' },
    };
    const place = { path: 'trial.stoke', ...span('->') };
    const [finding] = findingsIn({ ...file(text), tree, facts: [{ fact, place }] });
    expect(applied(text, finding)).toEqual([['reaction r {\n  2 H2 + O2 -> 2 H2O\n}\n', true]]);
  });

  test('an equation that nothing balances has none', () => {
    const fact: Fact = {
      code: 'balance/elements',
      differences: [],
      solution: { kind: 'none', why: { reason: 'too-large' } },
    };
    expect(only('->', ['->', fact]).fixes).toEqual([]);
  });

  test('shares are closed where the evaluation says', () => {
    const text = '40 % a, 50 % b';
    const mends = [
      { title: 'Make it 60 %', place: placeIn('trial.stoke', text, '50 %'), newText: '60 %' },
      { title: 'Let b take the rest', place: placeIn('trial.stoke', text, '50 %'), newText: 'rest' },
    ];
    const fact: Fact = { code: 'balance/shares', why: 'sum', name: 'x', sum: 0.9, mends };
    expect(applied(text, only(text, [text, fact]))).toEqual([
      ['40 % a, 60 % b', true],
      ['40 % a, rest b', false],
    ]);
  });

  test("the grammar's own mend is moved to its place in the file", () => {
    const text = 'let a = 1\nblend b { ';
    const problem = {
      code: 'syntax/unclosed',
      span: { start: 8, end: 9 },
      message: 'The brace is not closed.',
      fix: { title: 'Close it', span: { start: 10, end: 10 }, newText: '}' },
    } as const;
    expect(applied(text, only(text, ['{', { code: 'syntax/unclosed', problem }]))).toEqual([
      ['let a = 1\nblend b { }', true],
    ]);
  });
});

function only(text: string, fact: readonly [string, Fact]): Finding {
  const findings = findingsIn(file(text, { facts: [fact] }));
  expect(findings).toHaveLength(1);
  const [finding] = findings;
  if (!finding) throw new Error('no finding');
  return finding;
}

/** The text after each fix, and whether that fix is the preferred one. */
function applied(text: string, finding: Finding | undefined): (readonly [string, boolean])[] {
  return (finding?.fixes ?? []).map((fix: Fix) => [
    [...fix.edits]
      .sort((left, right) => right.place.start - left.place.start)
      .reduce((done, { place, newText }) => done.slice(0, place.start) + newText + done.slice(place.end), text),
    fix.preferred,
  ]);
}
