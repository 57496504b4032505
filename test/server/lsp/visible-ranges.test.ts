// What is seen of a document, as far as a client tells it: any message is survived, and no more is read than may be.
import { describe, expect, it } from 'vitest';
import { TextDocument } from 'vscode-languageserver-textdocument';
import { VisibleRanges } from '../../../server/lsp/visible-ranges.ts';

const uri = 'file:///large.stoke';
const text = 'let a = 1\n'.repeat(100);
const document = TextDocument.create(uri, 'stokehold', 1, text);
const range = (from: number, to: number) => ({
  start: { line: from, character: 0 },
  end: { line: to, character: 0 },
});
const told = (...ranges: unknown[]): VisibleRanges => {
  const visible = new VisibleRanges((asked) => asked === uri);
  visible.take({ uri, ranges });
  return visible;
};

describe('what is seen', () => {
  it('is read of a text that is too large', () => {
    expect(told(range(3, 5), range(50, 52)).readingOf(text, document, 500)).toEqual({
      largestText: 500,
      visible: [
        { start: 30, end: 50 },
        { start: 500, end: 520 },
      ],
    });
  });

  it('does not matter for a text that is not, nor for a file that is not open', () => {
    expect(told(range(3, 5)).readingOf(text, document, 1000)).toEqual({ largestText: 1000 });
    expect(told(range(3, 5)).readingOf(text, null, 500)).toEqual({ largestText: 500 });
  });

  it('is never more than may be read', () => {
    const { visible } = told(range(0, 30), range(40, 1e6), range(60, 70)).readingOf(text, document, 500);
    expect(visible).toEqual([
      { start: 0, end: 300 },
      { start: 400, end: 600 },
      { start: 600, end: 600 },
    ]);
  });

  it('is the beginning where nothing is told, or no longer', () => {
    expect(told().readingOf(text, document, 500)).toEqual({ largestText: 500 });
    const visible = told(range(3, 5));
    visible.drop(uri);
    expect(visible.readingOf(text, document, 500)).toEqual({ largestText: 500 });
  });
});

describe('a message', () => {
  it('tells of news once', () => {
    const visible = told(range(3, 5));
    expect(visible.take({ uri, ranges: [range(3, 5)] })).toBeNull();
    expect(visible.take({ uri, ranges: [range(3, 6)] })).toBe(uri);
    expect(visible.take({ uri, ranges: [] })).toBe(uri);
  });

  it.each([
    null,
    undefined,
    7,
    {},
    { uri },
    { uri, ranges: 'all' },
    { uri: 7, ranges: [] },
    { uri: 'file:///closed.stoke', ranges: [range(0, 1)] },
    {
      uri,
      ranges: [null, 3, {}, { start: { line: -1, character: 0 }, end: { line: 2, character: 0 } }, range(1, NaN)],
    },
  ])('%j is passed over', (message) => {
    const visible = new VisibleRanges((asked) => asked === uri);
    expect(visible.take(message)).toBeNull();
  });
});
