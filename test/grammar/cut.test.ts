import { describe, expect, test } from 'vitest';
import { cut } from '../../grammar/cut.ts';

const pieces = (text: string): string[] => cut(text).map(({ start, end }) => text.slice(start, end));

describe('sections', () => {
  test('are statements and definitions, without the comments between them', () => {
    const text = 'scenario "a" # t\n\n# c\nuse "b"\nlet c = 3\nblend d {\n  rest e # f\n} # g\nexpect c > 2\n';
    expect(pieces(text)).toEqual([
      'scenario "a"',
      'use "b"',
      'let c = 3',
      'blend d {\n  rest e # f\n}',
      'expect c > 2',
    ]);
  });

  test('start at the doc lines right above', () => {
    expect(pieces('## one\n\n## two\n## three\nblend a {\n}\n')).toEqual(['## two\n## three\nblend a {\n}']);
    expect(pieces('## two\n# plain\nblend a {\n}')).toEqual(['blend a {\n}']);
    expect(pieces('#### ruled\nblend a {\n}')).toEqual(['blend a {\n}']);
    expect(pieces('  ## in\nlet a = 3')).toEqual(['## in\nlet a = 3']);
  });

  test('a header ends whatever is open, at any depth', () => {
    expect(pieces('blend a {\n  rest b\n## d\n  blend c {\n  rest d\n}')).toEqual([
      'blend a {\n  rest b',
      '## d\n  blend c {\n  rest d\n}',
    ]);
    expect(pieces('let a = (3 +\nblend c {\n}')).toEqual(['let a = (3 +', 'blend c {\n}']);
  });

  test('a kind in column 0 starts a header even without its brace, unless it is an entry', () => {
    expect(pieces('blend a {\n  rest b\nduty c\n  x: y\n}')).toEqual(['blend a {\n  rest b', 'duty c\n  x: y\n}']);
    expect(pieces('blend a {\nservice: b\nservice speed: c\n}')).toEqual([
      'blend a {\nservice: b\nservice speed: c\n}',
    ]);
    expect(pieces('blend a {\n  duty c\n}')).toEqual(['blend a {\n  duty c\n}']);
    expect(pieces('\ufeffduty c\n}')).toEqual(['duty c\n}']);
  });

  test('a statement word ends what is open, unless it starts an entry', () => {
    expect(pieces('blend a {\n  rest b\n  let c = 3')).toEqual(['blend a {\n  rest b', 'let c = 3']);
    expect(pieces('blend a {\n  use: b\n  expect more of: c\n}')).toEqual([
      'blend a {\n  use: b\n  expect more of: c\n}',
    ]);
    expect(pieces('blend a {\n  letter\n  use_by\n}')).toEqual(['blend a {\n  letter\n  use_by\n}']);
  });

  test('braces in text, quoted names and comments do not count', () => {
    const text = 'blend a {\n  s: "}{"\n  30 % \'{}\' # }{\n}';
    expect(pieces(text)).toEqual([text]);
  });

  test('a statement goes on after an operator or inside brackets', () => {
    expect(pieces('let a = 3 +\n  4\nlet b = min(3,\n  4\n)\n5')).toEqual([
      'let a = 3 +\n  4',
      'let b = min(3,\n  4\n)',
      '5',
    ]);
    expect(pieces('expect Na+\n 3')).toEqual(['expect Na+', '3']);
  });

  test('stray lines hold together up to the next beginning', () => {
    expect(pieces('}\nfoo: 3\n}\n3 kg b\nlet a = 3')).toEqual(['}\nfoo: 3\n}\n3 kg b', 'let a = 3']);
  });

  test('a statement that breaks into a definition takes the stray rest along', () => {
    expect(pieces('blend a {\n  let 30 % b\n  rest c\n}\nblend d {\n}')).toEqual([
      'blend a {',
      'let 30 % b\n  rest c\n}',
      'blend d {\n}',
    ]);
  });
});
