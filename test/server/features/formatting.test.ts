// Formatting as edits: applied they give the printer's text, and they touch no more than differs.
import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { format } from '../../../grammar/printer.ts';
import { isUnitWord } from '../../../server/core/quantity/read-unit.ts';
import { formatting, rangeFormatting, type TextChange } from '../../../server/features/formatting.ts';
import { readFixture } from '../../support/fixture.ts';

const applied = (text: string, changes: readonly TextChange[]): string =>
  [...changes].reverse().reduce((all, { start, end, newText }) => all.slice(0, start) + newText + all.slice(end), text);

const texts = [
  '',
  'let a=1 kg',
  'let   a = 1 kg\r\nlet b=2\r\n',
  'blend b{\n30 % mass sodium\n   rest gas_oil # the oil\n}\n',
  "blend '𝛼 oil'  {\n  10 % '𝛽' \n  rest    '𝛼𝛽'\n}\n",
  'let a = = 1\nlet   b = 2\n',
  readFileSync('examples/dunlin.stoke', 'utf8').replace(/ {2,}/g, ' '),
];

describe('the edits of a whole text', () => {
  it.each(texts)('lead to the formatted text (%#)', (text) => {
    expect(applied(text, formatting(text))).toBe(format(text, isUnitWord));
  });

  it.each(texts)('are none once it is formatted (%#)', (text) => {
    expect(formatting(format(text, isUnitWord))).toEqual([]);
  });

  it.each(texts)('split no character and do not overlap (%#)', (text) => {
    let last = 0;
    for (const { start, end, newText } of formatting(text)) {
      expect(start).toBeGreaterThanOrEqual(last);
      last = end;
      for (const piece of [text.slice(0, start), text.slice(start, end), newText, text.slice(end)]) {
        expect(() => encodeURIComponent(piece)).not.toThrow(); // it refuses half a character
      }
    }
  });

  it('leave alone what is right', () => {
    expect(formatting('let a = 1 kg\nlet b =  2 kg\nlet c = 3 kg\n')).toEqual([{ start: 21, end: 22, newText: '' }]);
  });
});

describe('the edits of a range', () => {
  it.each([
    ['$0let a=1\n$0let b=2\n', 'let a = 1\nlet b=2\n'],
    ['let a=1\nlet$0 b=2\n', 'let a=1\nlet b = 2\n'],
    ['let a$0=1\nlet b$0=2\n', 'let a = 1\nlet b = 2\n'],
  ])('%j touch its lines only', (marked, formatted) => {
    const { files, file, start, end } = readFixture(marked);
    const text = files.get(file) ?? '';
    expect(applied(text, rangeFormatting(text, start, end))).toBe(formatted);
  });
});
