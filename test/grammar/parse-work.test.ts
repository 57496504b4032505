// The work of parsing grows with the text and no faster, whatever the text: counted, not timed, so that a busy machine
// changes nothing.
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startCounting, type Counting } from '../support/counted-work.ts';

let counting: Counting;
let parse: (text: string) => void;
beforeAll(async () => {
  counting = await startCounting();
  const [grammar, units] = [await import('../../grammar/parse.ts'), await import('../support/units.ts')];
  parse = (text) => void grammar.parse(text, units.isTestUnit);
});
afterAll(() => {
  counting.stop();
});

const numbered = (count: number, make: (number: number) => string): string =>
  Array.from({ length: count }, (_, number) => make(number)).join('');

test.each([
  ['unclosed headers', (count: number) => numbered(count, (n) => `blend a${n} {\n`)],
  ['stray braces', (count: number) => '}'.repeat(count)],
  ['open brackets', (count: number) => `let a = ${'( '.repeat(count)}`],
  ['bracketed letters', (count: number) => `let a = ${'(H'.repeat(count)}`],
  ['a long formula', (count: number) => `let a = ${'H2'.repeat(count)}+x`],
  ['a long run of units', (count: number) => `let a = 3 ${'kg '.repeat(count)}`],
  ['words that lead to no reference', (count: number) => `blend a {\n x: ${'word '.repeat(count)}\n}`],
  ['an entry over many lines', (count: number) => `blend a {\n x: ${'word,\n'.repeat(count)} y\n}`],
  ['blank lines', (count: number) => `blend a {\n x: y,${'\n'.repeat(count)}}`],
  ['plus signs', (count: number) => `let a = H${'+'.repeat(count)}x`],
])('%s', async (_name, make) => {
  const steps = (count: number): Promise<number> =>
    counting.stepsOf(() => parse(make(count)), /\/grammar\/|chevrotain/);
  await steps(100); // What is made once is made.
  const [short, long] = [await steps(2000), await steps(8000)];
  expect(short).toBeGreaterThan(2000);
  // Four times the text: four times the work, and a little for what is sorted or doubled; squared it would be sixteen times.
  expect(long / short).toBeLessThan(5);
});

test('the count tells squared work', async () => {
  const { squared } = await import('../support/squared-work.ts');
  const steps = (count: number): Promise<number> => counting.stepsOf(() => void squared(count), /squared-work/);
  expect((await steps(400)) / (await steps(100))).toBeGreaterThan(12);
});
