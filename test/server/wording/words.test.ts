import { expect, test } from 'vitest';
import {
  counted,
  countedFindings,
  didYouMean,
  listed,
  nameAsWritten,
  quoted,
  sentences,
  sharingHeads,
  withArticle,
} from '../../../server/wording/words.ts';

test('lists', () => {
  expect([listed([]), listed(['a']), listed(['a', 'b'], 'or'), listed(['a', 'b', 'c'])]).toEqual([
    '',
    'a',
    'a or b',
    'a, b and c',
  ]);
});

test('what several things share is said once', () => {
  expect(sharingHeads(['the density of a', 'the density of b', 'the heat of mixing of a', 'x'])).toEqual([
    'the density of a and b',
    'the heat of mixing of a',
    'x',
  ]);
});

test('what is quoted is one short line', () => {
  expect(quoted('a\n  b')).toBe('`a b`');
  expect(Array.from(quoted('x'.repeat(500))).length).toBe(62);
  expect(quoted('😀'.repeat(500))).not.toMatch(/[\ud800-\udbff]…/);
});

test('at most three spellings are offered', () => {
  expect(didYouMean([])).toBe('');
  expect(didYouMean(['a', 'b', 'c', 'd'])).toBe('Did you mean `a`, `b` or `c`?');
});

test('sentences leave out what is empty', () => {
  expect(sentences('A.', '', null, false, 'B.')).toBe('A. B.');
});

test('counts and articles', () => {
  expect([counted(1, 'file'), counted(2, 'entry', 'entries'), withArticle('engine'), withArticle('blend')]).toEqual([
    '1 file',
    '2 entries',
    'an engine',
    'a blend',
  ]);
  expect(countedFindings({})).toBe('no findings');
  expect(countedFindings({ error: 1, information: 2 })).toBe('1 error, 2 notes');
});

test.each([
  ['gas_oil', 'gas_oil'],
  ['Na2CO3', 'Na2CO3'],
  ['Na(cr)', 'Na(cr)'],
  ['MgCl2.6H2O', 'MgCl2.6H2O'],
  ['sodium oleate', "'sodium oleate'"],
  ['Gas_oil', "'Gas_oil'"],
])('%s is written as %s', (name, written) => {
  expect(nameAsWritten(name)).toBe(written);
});
