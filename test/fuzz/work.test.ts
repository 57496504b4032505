// What large and deep texts cost, in work that is counted and not timed: words asked whether they are units, sections
// parsed, statements answered. Work grows with the text and no faster, and of a text over the limit with what is seen.
import { describe, expect, test } from 'vitest';
import { format } from '../../grammar/printer.ts';
import { MOST_PROBLEMS, parse, problemsOf, type ParseOptions } from '../../grammar/parse.ts';
import type { SyntaxTree } from '../../grammar/tree.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { MemoStore } from '../../server/jobs/memo.ts';
import type { Answer } from '../../server/scenario/answer.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';

/** The tree, and how many words were asked whether they are units. */
function parsed(text: string, options: ParseOptions = {}): { readonly tree: SyntaxTree; readonly asked: number } {
  let asked = 0;
  const isUnit = (word: string): boolean => {
    asked++;
    return isUnitWord(word);
  };
  return { tree: parse(text, isUnit, options), asked };
}

/** How many statements were answered. */
function answered(text: string, reading: ParseOptions = {}): number {
  let kept = 0;
  const run = new MemoStore<Answer>().run('test');
  const keep: typeof run.keep = (...args) => {
    kept++;
    return run.keep(...args);
  };
  evaluate('main.stoke', () => ({ text, reading }), { answers: { recall: (...args) => run.recall(...args), keep } });
  return kept;
}

const repeated = (count: number, line: (index: number) => string): string =>
  Array.from({ length: count }, (_, index) => line(index)).join('');
const codesOf = (tree: SyntaxTree): string[] => [...new Set(problemsOf(tree).map(({ code }) => code))];

describe('5,000 unclosed headers', () => {
  const headers = (count: number): string => repeated(count, (index) => `blend b${index} {\n  30 % mass water, 2 kg\n`);

  test('cost twice what 2,500 do', () => {
    const [half, whole] = [parsed(headers(2500)), parsed(headers(5000))];
    expect(whole.tree.sections).toHaveLength(5000);
    expect(problemsOf(whole.tree)).toHaveLength(MOST_PROBLEMS);
    expect(half.asked).toBeGreaterThan(2500);
    expect(whole.asked).toBe(2 * half.asked);
  });

  test('are each answered once', () => {
    expect(answered(headers(5000))).toBe(5000);
  });

  test('on one line are as many definitions', () => {
    const { tree } = parsed(repeated(5000, (index) => `blend b${index} { `));
    expect(tree.sections).toHaveLength(5000);
  });
});

describe('deep nesting', () => {
  test.each([100, 10_000, 100_000])('of %i brackets is refused at once, and printed as it stands', (depth) => {
    const text = `let a = ${'('.repeat(depth)}1 kg${')'.repeat(depth)}\nlet b = 2 kg\n`;
    const { tree, asked } = parsed(text);
    expect(codesOf(tree)).toEqual(['syntax/too-deep']);
    expect(tree.sections).toHaveLength(2);
    expect(asked).toBeLessThan(20);
    expect(format(text, isUnitWord)).toBe(text);
    expect(answered(text)).toBe(2);
  });

  test.each([
    ['brackets never closed', '('],
    ['calls', 'max('],
    ['signs', '-'],
    ['closing brackets', ')'],
    ['braces', '{'],
    ['closing braces', '}'],
    ['quotes', `'"`],
  ])('100,000 %s cost no more than their length', (_, piece) => {
    const [half, whole] = [parsed(`let a = ${piece.repeat(50_000)}`), parsed(`let a = ${piece.repeat(100_000)}`)];
    expect(whole.asked).toBeLessThanOrEqual(2 * half.asked + 20);
    expect(whole.tree.sections.length).toBeLessThanOrEqual(100_001);
  });
});

describe('a file of 10 MB', () => {
  const line = (index: number): string => `let a${String(index).padStart(7, '0')} = 3 kg\n`;
  const length = line(0).length;
  const count = Math.ceil(10_000_000 / length);
  const text = repeated(count, line);

  test('is read as far as the first megabyte', () => {
    const { tree, asked } = parsed(text);
    expect(codesOf(tree)).toEqual(['syntax/too-large']);
    expect(tree.sections).toHaveLength(Math.ceil(1_000_000 / length));
    expect(asked).toBeLessThanOrEqual(2 * tree.sections.length);
  });

  test('is read and answered where it is seen', () => {
    const visible = [{ start: 5_000_000, end: 5_000_000 + 60 * length }];
    const { tree, asked } = parsed(text, { visible });
    expect(tree.sections.length).toBeLessThanOrEqual(62);
    expect(asked).toBeLessThanOrEqual(2 * 62);
    expect(answered(text, { visible })).toBe(tree.sections.length);
  });

  test.each([
    ['one definition', `blend b {\n${'1 % K\n'.repeat(1_700_000)}}\n`],
    ['one line', `let a = 1${' + 1'.repeat(2_500_000)}\n`],
    ['one bracket after the other', `let a = ${'('.repeat(10_000_000)}`],
  ])('that is %s is not read, and said to be too large', (_, large) => {
    const { tree, asked } = parsed(`${large}let b = 2 kg\n`, { visible: [{ start: 0, end: 100 }] });
    expect(codesOf(tree)).toEqual(['syntax/too-large']);
    expect(asked).toBe(0);
  });
});
