// Offsets and positions: every answer lies in the text, and columns count UTF-16 units.
import { TextDocument } from 'vscode-languageserver-textdocument';
import { describe, expect, it } from 'vitest';
import { offsetAt, rangeOf, toCodeAction, toDiagnostic, type PlacedText } from '../../../server/lsp/convert.ts';

const document = (text: string, uri = 'file:///a.stoke'): TextDocument =>
  TextDocument.create(uri, 'stokehold', 3, text);
const placed = (text: string, uri: string, version: number | null): PlacedText => ({
  uri,
  version,
  document: document(text, uri),
});

describe('offsets and positions', () => {
  it('agree for every offset of a text with all kinds of line ends and wide characters', () => {
    const text = 'let a = 1\r\nlet ü = 𝛼\n\nlast\rend';
    const read = document(text);
    for (let offset = 0; offset <= text.length; offset++) {
      if (text[offset - 1] === '\r' && text[offset] === '\n') continue; // inside a line end there is no position
      expect(offsetAt(read, rangeOf(read, offset, offset).start), `offset ${offset}`).toBe(offset);
    }
  });

  it.each([NaN, Infinity, -Infinity, -5, 1e12, 2.5])('stay in the text for the offset %d', (offset) => {
    const { start, end } = rangeOf(document('ab\ncd'), offset, offset);
    for (const { line, character } of [start, end]) {
      expect(line).toBeGreaterThanOrEqual(0);
      expect(line).toBeLessThanOrEqual(1);
      expect(character).toBeGreaterThanOrEqual(0);
      expect(character).toBeLessThanOrEqual(2);
    }
  });

  it.each([
    [{ line: 0, character: 99 }, 2],
    [{ line: 99, character: 0 }, 5],
    [{ line: -1, character: 0 }, 0],
    [{ line: 1, character: -7 }, 3],
    [{ line: NaN, character: NaN }, 0],
  ])('stay in the text for the position %j', (position, offset) => {
    expect(offsetAt(document('ab\ncd'), position)).toBe(offset);
  });

  it('never give a range whose end is before its start', () => {
    const { start, end } = rangeOf(document('ab\ncd'), 4, 1);
    expect(end).toEqual(start);
  });
});

describe('a diagnostic', () => {
  const texts = new Map([
    ['a', placed('let x = y\n', 'file:///a.stoke', 3)],
    ['b', placed('\nlet x = 2\n', 'file:///b.stoke', null)],
  ]);
  const plain = {
    code: 'name/duplicate',
    severity: 'error',
    message: 'Twice.',
    place: { path: 'a', start: 4, end: 5 },
    related: [{ place: { path: 'b', start: 5, end: 6 }, message: 'Here too.' }],
  } as const;

  it('carries its code, place and related places', () => {
    expect(toDiagnostic(plain, (path) => texts.get(path), true)).toEqual({
      code: 'name/duplicate',
      severity: 1,
      source: 'stokehold',
      message: 'Twice.',
      range: { start: { line: 0, character: 4 }, end: { line: 0, character: 5 } },
      relatedInformation: [
        {
          message: 'Here too.',
          location: {
            uri: 'file:///b.stoke',
            range: { start: { line: 1, character: 4 }, end: { line: 1, character: 5 } },
          },
        },
      ],
    });
  });

  it('leaves related places out for a client that cannot show them', () => {
    expect(toDiagnostic(plain, (path) => texts.get(path), false)).not.toHaveProperty('relatedInformation');
  });

  it('in a text that is not at hand is not made', () => {
    expect(toDiagnostic(plain, () => undefined, true)).toBeNull();
  });
});

describe('a fix', () => {
  const a = placed('let x = 1', 'file:///a.stoke', 3);
  const b = placed('let x = 2', 'file:///b.stoke', null);
  const fix = {
    title: 'Rename both',
    preferred: true,
    edits: [
      { place: { path: 'a', start: 4, end: 5 }, newText: 'y' },
      { place: { path: 'b', start: 4, end: 5 }, newText: 'y' },
      { place: { path: 'a', start: 0, end: 0 }, newText: '# ' },
    ],
    finding: {
      code: 'x/y',
      severity: 'error',
      message: '',
      place: { path: 'a', start: 0, end: 1 },
      related: [],
      fixes: [],
      acknowledged: false,
    },
  } as const;
  const textOf = (path: string): PlacedText | undefined => (path === 'a' ? a : path === 'b' ? b : undefined);

  it('names the version of each open file', () => {
    expect(toCodeAction(fix, null, textOf, true)?.edit?.documentChanges).toMatchObject([
      { textDocument: { uri: 'file:///a.stoke', version: 3 }, edits: [{ newText: 'y' }, { newText: '# ' }] },
      { textDocument: { uri: 'file:///b.stoke', version: null }, edits: [{ newText: 'y' }] },
    ]);
  });

  it('is one plain list a file for older clients', () => {
    const changes = toCodeAction(fix, null, textOf, false)?.edit?.changes ?? {};
    expect(Object.entries(changes).map(([uri, edits]) => [uri, edits.length])).toEqual([
      ['file:///a.stoke', 2],
      ['file:///b.stoke', 1],
    ]);
  });

  it('is not offered when one of its files is not at hand', () => {
    expect(toCodeAction(fix, null, (path) => (path === 'a' ? a : undefined), true)).toBeNull();
  });
});
