// The formatter's promises: the examples are fixed points; scrambled white space comes back as it was; nothing but
// white space ever changes, on any text; formatting twice is formatting once; broken lines stay as typed.
// Texts to be mangled are the examples themselves, cut, joined and damaged at random.
import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { parse } from '../../grammar/parse.ts';
import { format, formatRange } from '../../grammar/printer.ts';
import { lex } from '../../grammar/tokens.ts';
import { isUnitWord } from '../../server/core/quantity/unit-words.ts';

const formatted = (text: string): string => format(text, isUnitWord);

const examplePaths = readdirSync('examples', { recursive: true, encoding: 'utf8' })
  .filter((path) => path.endsWith('.stoke') && !path.startsWith('errors'))
  .toSorted();
const examples = examplePaths.map((path) => readFileSync(`examples/${path}`, 'utf8'));

test.each(examplePaths)('%s is formatted already', (path) => {
  const text = readFileSync(`examples/${path}`, 'utf8');
  expect(formatted(text)).toBe(text);
  expect(formatRange(text, isUnitWord, 0, text.length)).toEqual([]);
  // A broken line would be a fixed point whatever the formatter does.
  expect(parse(text, isUnitWord).sections.flatMap(({ section }) => section.problems)).toEqual([]);
});

describe('lines', () => {
  const inside = (line: string): string =>
    formatted(`blend x {\n${line}\n}\n`).slice('blend x {\n'.length, -'\n}\n'.length);

  test.each([
    ['fuel:slurry', '  fuel: slurry'],
    ['\tfuel  :   slurry', '  fuel: slurry'],
    ['      cooled   to: 900 degC ,350   degC', '  cooled to: 900 degC, 350 degC'],
    ['lower heating value: 44.0±0.2 MJ/kg', '  lower heating value: 44.0 ± 0.2 MJ/kg'],
    ['mass: 44 MJ/kg+/-2 %', '  mass: 44 MJ/kg +/- 2 %'],
    ['heat: 2.1   kJ/(kg   K)', '  heat: 2.1 kJ/(kg K)'],
    ['power: 6.4MW', '  power: 6.4 MW'],
    ['share: 30%', '  share: 30 %'],
    ['sum: (a+b)*3/c', '  sum: (a + b) * 3 / c'],
    ['sum: a  -  b', '  sum: a - b'],
    ['sum: -( a )', '  sum: -(a)'],
    ['cube: a^3', '  cube: a^3'],
    ['least: min( 3 kW ,power of main )', '  least: min(3 kW, power of main)'],
    ['half: 1/2', '  half: 1/2'],
    ['until: a<=3', '  until: a <= 3'],
    ['until: a=3', '  until: a = 3'],
    ['a:1;b:2', '  a: 1; b: 2'],
    ['2Na(cr)+1/2 O2(g)->Na2O(cr)', '  2 Na(cr) + 1/2 O2(g) -> Na2O(cr)'],
    ['Na+ + e-   →  Na(cr)', '  Na+ + e- → Na(cr)'],
    ['30%mass   sodium', '  30 % mass sodium'],
    ['acknowledge   hazard/water-reactive  :"no  water"', '  acknowledge hazard/water-reactive: "no  water"'],
    ["fuel:   'two  spaces'", "  fuel: 'two  spaces'"],
    ['state: 20\u00a0degC', '  state: 20\u00a0degC'],
    ['state: −20 °C , 1 m³', '  state: −20 °C, 1 m³'],
    ['fuel: slurry   ', '  fuel: slurry'],
    ['   ', ''],
  ])('%j', (line, expected) => {
    expect(inside(line)).toBe(expected);
  });

  test.each(['a: K( g )', 'a: K( Na )', 'a: (Na )2'])(
    'a line that would be read otherwise stays as typed: %j',
    (line) => {
      expect(inside(line)).toBe(line);
    },
  );

  test.each(['fuel: ,  ,', '30 %  mass % sodium', 'a ->   ', 'a:   1e400', '  \tx:  (1', 'let   x'])(
    'a line with a syntax problem stays as typed: %j',
    (line) => {
      expect(inside(line)).toBe(line);
    },
  );

  test('statements and headers go to column 0 with single spaces', () => {
    expect(formatted('  let  a=3 kW\n  blend   x{2 mol K;1 mol Na}\nuse   "a  b"')).toBe(
      'let a = 3 kW\nblend x { 2 mol K; 1 mol Na }\nuse "a  b"',
    );
  });

  test('lines that go on are one step further in, or one for each open bracket', () => {
    const text = 'let a = min(\n3 kW,\nmax(\nb,\nc\n),\n)\nduty d {\ncooled: 1 K,\n2 K\n}\n';
    const expected = 'let a = min(\n  3 kW,\n  max(\n    b,\n    c\n  )\n)\nduty d {\n  cooled: 1 K,\n    2 K\n}\n';
    expect(formatted(text.replace('),\n)', ')\n)'))).toBe(expected);
  });
});

describe('portions', () => {
  const body = (...lines: string[]): string => formatted(`blend x {\n${lines.join('\n')}\n}`);

  test('the substances of a run stand two spaces behind the longest amount', () => {
    expect(body('30 % mass sodium', "2 % mass 'sodium oleate'", 'rest gas_oil')).toBe(
      "blend x {\n  30 % mass  sodium\n  2 % mass   'sodium oleate'\n  rest       gas_oil\n}",
    );
  });

  test('a lone portion has one space', () => {
    expect(body('100 %     air', 'state: 20 degC')).toBe('blend x {\n  100 % air\n  state: 20 degC\n}');
  });

  test('a comment or a half-typed portion does not part a run; a blank line does', () => {
    expect(body('1 mol K', '# more', '200 mol Na')).toBe('blend x {\n  1 mol    K\n  # more\n  200 mol  Na\n}');
    expect(body('1 mol K', '20  %  mass', '200 mol Na')).toBe('blend x {\n  1 mol    K\n20  %  mass\n  200 mol  Na\n}');
    expect(body('1 mol K', '', '200 mol Na')).toBe('blend x {\n  1 mol K\n\n  200 mol Na\n}');
  });

  test('portions that share a line are left out of the run', () => {
    expect(body('1 mol K; 1 mol  Na', '200 mol Ca')).toBe('blend x {\n  1 mol K; 1 mol Na\n  200 mol Ca\n}');
  });
});

describe('comments, line ends', () => {
  test('a trailing comment stands in column 40, or two spaces behind longer code', () => {
    const long = `let a_rather_long_name = 123456.789 kW`;
    expect(formatted('let a = 3 # x')).toBe(`let a = 3${' '.repeat(30)}# x`);
    expect(formatted(`${long} # x`)).toBe(`${long}  # x`);
  });

  test('comments on lines of their own follow the indentation', () => {
    expect(formatted('  # a\nblend x {\n# b   \n1 mol K\n   ## c\n}\n # d')).toBe(
      '# a\nblend x {\n  # b\n  1 mol K\n  ## c\n}\n# d',
    );
  });

  test('blank lines, kinds of line ends, the byte order mark and the last line are kept', () => {
    const text = '\ufeff  let a=1\r\n\r\n \t\r\n\r\nlet b=2\rlet c=3\n\n\n';
    expect(formatted(text)).toBe('\ufefflet a = 1\r\n\r\n\r\n\r\nlet b = 2\rlet c = 3\n\n\n');
    expect(formatted('let a=1\r  \nlet b=2')).toBe('let a = 1\r  \nlet b = 2');
    expect(formatted('')).toBe('');
    expect(formatted('let a=1')).toBe('let a = 1');
  });
});

test('a range gives edits for its own lines only', () => {
  const text = 'let a=1\nlet b=2\nlet c=3\nlet d = 4\n';
  const second = text.indexOf('let b');
  expect(formatRange(text, isUnitWord, second + 1, second + 2)).toEqual([
    { start: second, end: second + 'let b=2'.length, newText: 'let b = 2' },
  ]);
  // A selection of the second line that ends before the first character of the third.
  expect(formatRange(text, isUnitWord, second, text.indexOf('let c'))).toHaveLength(1);
  expect(formatRange(text, isUnitWord, 0, text.length)).toHaveLength(3);
});

/** The tokens and comments of each line, and nothing of the white space between them. */
function content(text: string): unknown[] {
  const { tokens, comments } = lex(text);
  return [...tokens, ...comments]
    .toSorted((a, b) => a.startOffset - b.startOffset)
    .map(({ tokenType, image }) => [tokenType.name, tokenType.name === 'Comment' ? image.trimEnd() : image]);
}

/** The tree without positions. */
function shape(text: string): unknown {
  const ofPosition = new Set(['span', 'start', 'end', 'text', 'truncated']);
  const bare = JSON.stringify(parse(text, isUnitWord).sections, (key, value: unknown) =>
    key === 'problems' || (ofPosition.has(key) && typeof value !== 'string') || /[sS]pan$/.test(key)
      ? undefined
      : value,
  );
  // A section's own text and the space in a unit are white space as typed.
  return JSON.parse(bare, (key, value: unknown) => (key === 'text' && /\s/.test(String(value)) ? '' : value));
}

const visible = (text: string): string => text.replace(/\s/g, '');

/** Examples in which random tokens, characters and line ends are struck out, doubled or put in. */
const damaged = fc
  .record({
    text: fc.constantFrom(...examples),
    from: fc.nat(),
    length: fc.integer({ min: 20, max: 1500 }),
    damage: fc.array(
      fc.record({
        at: fc.nat(),
        remove: fc.nat({ max: 12 }),
        insert: fc.constantFrom(
          ...[
            '',
            ' ',
            '\n',
            '\r\n',
            '\t',
            '{',
            '}',
            '(',
            ')',
            '"',
            "'",
            '#',
            ';',
            ',',
            ':',
            '->',
            '+',
            '-',
            '±',
            '/',
            '·',
          ],
          ...[
            '3',
            '1/2',
            ' K',
            'Na+',
            'K( g )',
            'kg',
            ' of ',
            'rest ',
            'let ',
            'blend x {',
            '\u00a0',
            '\ufeff',
            '²',
            '\0',
            '💧',
          ],
        ),
      }),
      { maxLength: 8 },
    ),
  })
  .map(({ text, from, length, damage }) => {
    const start = from % text.length;
    let result = text.slice(start, start + length);
    for (const { at, remove, insert } of damage) {
      const offset = at % (result.length + 1);
      result = result.slice(0, offset) + insert + result.slice(offset + remove);
    }
    return result;
  });

describe('on any text', () => {
  const runs = { numRuns: 250 };

  test('tokens, comments and their lines stay, and so does the tree', () => {
    fc.assert(
      fc.property(damaged, (text) => {
        expect(content(formatted(text))).toEqual(content(text));
        expect(shape(formatted(text))).toEqual(shape(text));
      }),
      runs,
    );
  });

  test('no visible character is lost', () => {
    const anyText = fc.oneof(damaged, fc.string({ unit: 'binary' }), fc.string({ unit: 'grapheme' }));
    fc.assert(
      fc.property(anyText, (text) => {
        expect(visible(formatted(text))).toBe(visible(text));
      }),
      runs,
    );
  });

  test('formatting twice is formatting once', () => {
    fc.assert(
      fc.property(damaged, (text) => {
        expect(formatted(formatted(text))).toBe(formatted(text));
      }),
      runs,
    );
  });

  test('lines with a syntax problem stay as typed', () => {
    fc.assert(
      fc.property(damaged, (text) => {
        const after = formatted(text);
        for (const { start, section } of parse(text, isUnitWord).sections) {
          for (const { span } of section.problems) {
            const offset = start + span.start;
            const before = /[^\r\n]*$/.exec(text.slice(0, offset))?.[0] ?? '';
            const behind = /^[^\r\n]*/.exec(text.slice(offset))?.[0] ?? '';
            expect(after).toContain(before + behind);
          }
        }
      }),
      runs,
    );
  });
});

test('scrambled white space comes back as it was', () => {
  const spaces = fc.array(fc.constantFrom(' ', '  ', '\t', '      '), { minLength: 7, maxLength: 31 });
  fc.assert(
    fc.property(fc.nat({ max: examples.length - 1 }), spaces, (index, someSpaces) => {
      const text = examples[index] ?? '';
      expect(formatted(respace(text, someSpaces))).toBe(text);
    }),
    { numRuns: 60 },
  );
});

/** The text with other white space between its tokens and at the ends of its lines. */
function respace(text: string, spaces: readonly string[]): string {
  const { tokens, comments } = lex(text);
  let result = '';
  let done = 0;
  let count = 0;
  const nextSpace = (): string => spaces[count++ % spaces.length] ?? ' ';
  for (const { startOffset, image } of [...tokens, ...comments].toSorted((a, b) => a.startOffset - b.startOffset)) {
    const gap = text.slice(done, startOffset);
    const startsLine = /[\r\n]$/.test(result) || result === '';
    const endsLine = image === '\n';
    // A header's kind word must stay in column 0 or keep its brace, so the first column is left alone.
    if (gap !== '' || (endsLine && !startsLine)) result += /\u00a0/.test(gap) ? gap : nextSpace();
    result += image;
    done = startOffset + image.length;
  }
  return result + text.slice(done);
}
