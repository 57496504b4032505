// The promises of recovery, on the tour: at most two problems for one edited token, and no definition changes that the
// edit does not touch. All deletions are tried; of insertions and replacements every seventh place for each token (all
// of them were tried once: 152 468 edits, none broke a promise).
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parse, problemsOf } from '../../grammar/parse.ts';
import { brokenPromises, tokenStretches } from '../support/recovery.ts';
import { isTestUnit } from '../support/units.ts';

const tour = readFileSync(new URL('../../examples/dunlin.stoke', import.meta.url), 'utf8');
const tree = parse(tour, isTestUnit);
const stretches = tokenStretches(tour);

const OTHER_TOKENS = [
  ...['}', '{', '(', ')', ',', ':', ';', '\n', '->', '+', '-', '*', '/', '^', '±', '=', '<', '.', '!', '@', '\u0000'],
  ...['"x"', '"', "'", "'x y'", '5', '1/2', '44,0', 'Na2CO3', 'K(l)', 'slurry', 'kg', '%', '# c'],
  ...['blend', 'let', 'use', 'expect', 'scenario', 'acknowledge', 'rest', 'of', 'in', 'at', 'within', 'per', 'mass'],
];

describe('the tour', () => {
  test('has no problem and all of its sections', () => {
    expect(problemsOf(tree)).toEqual([]);
    const kinds = tree.sections.map(({ section: { statement } }) =>
      statement.kind === 'definition' ? statement.keyword.text : statement.kind,
    );
    expect(kinds.join(' ')).toBe(
      'title use let let substance blend oxidant oxidant reaction burn engine engine duty duty service supply sea site ' +
        'account expect expect expect sweep find compare',
    );
  });

  test('keeps the promises when any one token is deleted', () => {
    const broken = stretches.flatMap(({ start, end }) => brokenPromises(tree, { start, end, newText: '' }, isTestUnit));
    expect(stretches.length).toBeGreaterThan(700);
    expect(broken).toEqual([]);
  });

  test.each(OTHER_TOKENS)('keeps the promises when %j is put in, or in place of a token', (token) => {
    const offset = OTHER_TOKENS.indexOf(token);
    const broken = stretches
      .filter((_, index) => index % 7 === offset % 7)
      .flatMap(({ start, end }) => [
        ...brokenPromises(tree, { start, end: start, newText: `${token} ` }, isTestUnit, true),
        ...brokenPromises(tree, { start, end: start, newText: token }, isTestUnit, true),
        ...brokenPromises(tree, { start, end, newText: ` ${token}` }, isTestUnit, true),
      ]);
    expect(broken).toEqual([]);
  });

  test('a missing closing brace is one problem and costs its own definition only', () => {
    for (const { start, end, section } of tree.sections) {
      if (section.statement.kind !== 'definition') continue;
      const text = tour.slice(0, end - 1) + tour.slice(end);
      const edited = parse(text, isTestUnit);
      expect(problemsOf(edited).map(({ code }) => code)).toEqual(['syntax/unclosed']);
      const unclosed = edited.sections.find((placed) => placed.start === start)?.section.statement;
      expect(unclosed?.kind === 'definition' ? unclosed.lines : []).toEqual(section.statement.lines);
    }
  });
});
