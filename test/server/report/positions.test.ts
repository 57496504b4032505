import { expect, test } from 'vitest';
import { Lines } from '../../../server/report/positions.ts';

const text = 'one\r\ntwö 😀 x\n\rlast';
const lines = new Lines(text);

test.each([
  ['one', 1, 1],
  ['two'.replace('o', 'ö'), 2, 1],
  ['x', 2, 8],
  ['last', 4, 1],
])('%s is at %d:%d', (word, line, column) => {
  expect(lines.position(text.indexOf(word))).toEqual({ line, column });
});

test('the end of the text, and whatever is beyond', () => {
  expect(lines.position(text.length)).toEqual({ line: 4, column: 5 });
  expect(lines.position(9999)).toEqual({ line: 4, column: 5 });
  expect(lines.position(-3)).toEqual({ line: 1, column: 1 });
  expect(new Lines('').position(0)).toEqual({ line: 1, column: 1 });
});

test('the text of a line goes without its end', () => {
  expect([lines.lineText(1), lines.lineText(2), lines.lineText(3), lines.lineText(9)]).toEqual([
    'one',
    'twö 😀 x',
    '',
    '',
  ]);
});
