import { readdirSync, readFileSync } from 'node:fs';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { LARGEST_TEXT, MOST_PROBLEMS, parse, parseSection, problemsOf } from '../../grammar/parse.ts';
import type { SyntaxTree } from '../../grammar/tree.ts';
import { readSections } from '../support/syntax.ts';
import { isTestUnit } from '../support/units.ts';

const examples = new URL('../../examples/', import.meta.url);
const names = readdirSync(examples).filter((name) => name.endsWith('.stoke'));
const readExample = (name: string): string => readFileSync(new URL(name, examples), 'utf8');

/** Every span of a tree lies inside its section, and no number in it is other than finite. */
function checkSpans(tree: SyntaxTree): void {
  for (const { start, end, section } of tree.sections) {
    expect(tree.text.slice(start, end)).toBe(section.text);
    checkNode(section, section.text.length);
  }
}

function checkNode(node: unknown, length: number): void {
  if (typeof node === 'number' && !Number.isFinite(node)) expect(node).toBe('finite');
  if (typeof node !== 'object' || node === null) return;
  if ('start' in node && 'end' in node && typeof node.start === 'number' && typeof node.end === 'number') {
    if (!(node.start >= 0 && node.start <= node.end && node.end <= length)) expect(node).toBe('a span in its section');
  }
  for (const part of Object.values(node)) checkNode(part, length);
}

describe('any text gives a tree', () => {
  test.each(names)('every prefix of %s', (name) => {
    const text = readExample(name);
    let previous: SyntaxTree | undefined;
    for (let length = 0; length <= text.length; length++) {
      const tree = parse(text.slice(0, length), isTestUnit, previous === undefined ? {} : { previous });
      previous = tree;
      if (length % 97 === 0) checkSpans(tree);
    }
  });

  test.each([
    ['nothing', ''],
    ['a byte order mark', '\ufeff'],
    ['null bytes', 'blend a {\u0000\n\u0000 rest\u0000b\n}\u0000'],
    ['lone surrogates', 'blend \ud800 {\n rest \udc00\n "\ud800\n}'],
    ['emoji', 'blend 🔥 {\n 3 🔥 🔥\n}'],
    ['only a comment', '# c'],
    ['only a doc comment', '## c'],
    ['control characters', Array.from({ length: 32 }, (_, code) => String.fromCharCode(code)).join('')],
    ['line separators', 'let a = 3\u2028let b = 4\u2029'],
  ])('%s', (_name, text) => {
    checkSpans(parse(text, isTestUnit));
  });

  test('random soups of tokens', () => {
    const words = ['blend', 'a', '{', '}', '\n', ';', ':', ',', '(', ')', '5', 'kg', '/', '^', '2', '-', '+', '±', '%'];
    const more = [
      'let',
      '=',
      '->',
      'of',
      'in',
      'at',
      'within',
      'expect',
      '<',
      'Na(cr)',
      '"t',
      "'q'",
      '#',
      '##',
      ' ',
      'rest',
    ];
    const soup = fc.array(
      fc.constantFrom(...words, ...more, 'mass', 'per', 'by', 'until', '1e400', '1,5', '\r\n', 'É', '·'),
    );
    fc.assert(
      fc.property(soup, fc.constantFrom('', ' '), (tokens, gap) => {
        checkSpans(parse(tokens.join(gap), isTestUnit));
      }),
      { numRuns: 2000, seed: 7 },
    );
  });

  test('random characters', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 60 }), (text) => {
        checkSpans(parse(text, isTestUnit));
      }),
      { numRuns: 1000, seed: 7 },
    );
  });
});

describe('a byte order mark and carriage returns', () => {
  test('change nothing but offsets', () => {
    const text = readExample('dunlin.stoke');
    expect(problemsOf(parse(`\ufeff${text}`, isTestUnit))).toEqual([]);
    expect(readSections(text.replaceAll('\n', '\r\n'))).toEqual(readSections(text));
    expect(problemsOf(parse(text.replaceAll('\n', '\r\n'), isTestUnit))).toEqual([]);
  });
});

describe('sections', () => {
  test('are a pure function of their text', () => {
    const tree = parse(readExample('dunlin.stoke'), isTestUnit);
    for (const { section } of tree.sections) expect(parseSection(section.text, isTestUnit)).toEqual(section);
  });

  test('with the same text are taken over from the tree before', () => {
    const before = parse('blend a {\n rest b\n}\nlet c = 3\n', isTestUnit);
    const after = parse('# moved\nblend a {\n rest b\n}\nlet c = 4\n', isTestUnit, { previous: before });
    expect(after.sections[0]?.section).toBe(before.sections[0]?.section);
    expect(after.sections[0]?.start).toBe(8);
    expect(after).toEqual(parse(after.text, isTestUnit));
  });

  test('above a change they keep their very place, and below it all that moves is where they start', () => {
    const text = readExample('dunlin.stoke');
    const before = parse(text, isTestUnit);
    const middle = before.sections[Math.floor(before.sections.length / 2)];
    const [start, end] = [middle?.start ?? 0, middle?.end ?? 0];
    const after = parse(`${text.slice(0, end)} # x${text.slice(end)}`, isTestUnit, { previous: before });
    expect(after).toEqual(parse(after.text, isTestUnit));
    const above = after.sections.filter((placed) => before.sections.includes(placed));
    expect(above.length).toBeGreaterThan(before.sections.length / 4);
    for (const placed of above) expect(placed.start).toBeLessThan(start);
    for (const [index, { section }] of after.sections.entries()) expect(section).toBe(before.sections[index]?.section);
  });

  test('are after any edits what they are of the text alone', () => {
    const snippets = [
      '#', '##', '## so\n', '\n', '\r\n', '\r', ' ', '{', '}', '(', ')', ';', '"', "'", ':', '+', '->', ',', '\ufeff',
      'blend a {\n', 'blend a {', '}\n', 'duty b\n', 'let c = 3\n', 'let ', 'expect ', 'use: ', '3 kg d\n', '\u00a0',
    ]; // prettier-ignore
    const edit = fc.record({
      at: fc.double({ min: 0, max: 1, noNaN: true }),
      removed: fc.oneof(fc.constant(0), fc.nat(3), fc.nat(80), fc.nat(1000)),
      snippet: fc.oneof(fc.constant(''), fc.constantFrom(...snippets)),
      moved: fc.boolean(),
    });
    const start = fc.oneof(
      fc.constantFrom(...names.map(readExample)),
      fc.array(fc.constantFrom(...snippets), { maxLength: 30 }).map((pieces) => pieces.join('')),
    );
    const holds = fc.property(start, fc.array(edit, { minLength: 1, maxLength: 12 }), (text, edits) => {
      let tree = parse(text, isTestUnit);
      for (const { at, removed, snippet, moved } of edits) {
        const from = Math.floor(at * tree.text.length);
        const taken = tree.text.slice(from, from + removed);
        const rest = tree.text.slice(0, from) + snippet + tree.text.slice(from + removed);
        tree = parse(moved ? rest + taken : rest, isTestUnit, { previous: tree });
        expect(tree).toEqual(parse(tree.text, isTestUnit));
      }
    });
    fc.assert(holds, { numRuns: 150 });
  });

  test('carry the doc lines above them', () => {
    expect(readSections('## One.\n##two  \nlet a = 3\n')).toEqual(['[One.\ntwo] let a = 3']);
    expect(readSections('## apart\n\nlet a = 3\n')).toEqual(['let a = 3']);
    expect(readSections('let b = 2 ## behind\nlet a = 3\n')).toEqual(['let b = 2', 'let a = 3']);
  });
});

describe('limits', () => {
  test('64 brackets are read, one more is too deep', () => {
    const nested = (depth: number): string => `let a = ${'('.repeat(depth)}3${')'.repeat(depth)}`;
    expect(problemsOf(parse(nested(64), isTestUnit))).toEqual([]);
    expect(problemsOf(parse(nested(65), isTestUnit)).map(({ code }) => code)).toEqual(['syntax/too-deep']);
    expect(problemsOf(parse(nested(100_000), isTestUnit)).map(({ code }) => code)).toEqual(['syntax/too-deep']);
  });

  test('a thousand operators are read, more are refused', () => {
    const codes = (text: string): string[] => problemsOf(parse(text, isTestUnit)).map(({ code }) => code);
    expect(codes(`let a = b${' + b'.repeat(1000)}`)).toEqual([]);
    expect(codes(`let a = b${' + b'.repeat(1001)}`)).toEqual(['syntax/too-deep']);
    expect(codes(`let a = ${'- '.repeat(50_000)}b`)).toEqual(['syntax/too-deep']);
    expect(codes(`let a = b${'^b'.repeat(50_000)}`)).toEqual(['syntax/too-deep']);
  });

  test('no more than 128 problems are told', () => {
    const tree = parse('}\nlet a\n'.repeat(300), isTestUnit);
    expect(tree.truncated).toBe(true);
    expect(problemsOf(tree)).toHaveLength(MOST_PROBLEMS);
    const lines = parse(`blend a {\n${'x\n'.repeat(300)}}`, isTestUnit);
    expect(problemsOf(lines)).toHaveLength(MOST_PROBLEMS);
    expect(parse('}', isTestUnit).truncated).toBe(false);
  });

  test('a file that is too large is read in part, and says so', () => {
    const text = 'let a = 3\n'.repeat(LARGEST_TEXT / 10 + 1);
    const tree = parse(text, isTestUnit);
    expect(problemsOf(tree).map(({ code, span }) => [code, span])).toEqual([
      ['syntax/too-large', { start: 0, end: 9 }],
    ]);
    expect(tree.sections).toHaveLength(LARGEST_TEXT / 10);
    const seen = parse(text, isTestUnit, { visible: [{ start: 501, end: 519 }] });
    expect(seen.sections.map(({ start }) => start)).toEqual([500, 510]);
    expect(parse('let a = 3', isTestUnit, { largestText: 5 }).fileProblems).toHaveLength(1);
  });
});
