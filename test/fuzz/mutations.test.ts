// Spoilt scenarios: mutations of all examples go through parser, formatter, evaluation and findings. Nothing may throw, hang
// for a second, or lose a character that is no white space; formatting must be stable. Runs for FUZZ_SECONDS (twenty
// seconds in the suite, longer by `npm run fuzz`), with a fresh seed that is printed and can be given back as FUZZ_SEED.
import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { lex } from '../../grammar/tokens.ts';
import { format } from '../../grammar/printer.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { findingsOf } from '../../server/findings/registry.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';

const SECONDS = Number(process.env['FUZZ_SECONDS'] ?? 20);
const SEED = Number(process.env['FUZZ_SEED'] ?? Date.now() % 2 ** 31);
const SLOWEST_MS = 1000;

const folder = path.resolve('examples');
const texts = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.stoke'))
  .map((name) => readFileSync(path.join(folder, name), 'utf8'));
const lines = texts.flatMap((text) => text.split('\n'));
const pieces = [
  '{',
  '}',
  '(',
  ')',
  ':',
  ',',
  ';',
  '#',
  '"',
  "'",
  '->',
  '±',
  '%',
  '\0',
  '\r\n',
  '\ufeff',
  '\ud800',
  '1e400',
  ' of ',
  ' in ',
];

type Mutation = (text: string) => string;

const place = fc.double({ min: 0, max: 1, noNaN: true });
const at = (text: string, share: number): number => Math.floor(share * text.length);
const mutation: fc.Arbitrary<Mutation> = fc.oneof(
  fc.tuple(place, fc.nat(30)).map(([share, length]): Mutation => (text) => {
    const start = at(text, share);
    return text.slice(0, start) + text.slice(start + length);
  }),
  fc.tuple(place, fc.constantFrom(...pieces)).map(([share, piece]): Mutation => (text) => {
    const start = at(text, share);
    return text.slice(0, start) + piece + text.slice(start);
  }),
  fc.tuple(place, fc.string({ maxLength: 12, unit: 'binary' })).map(([share, junk]): Mutation => (text) => {
    const start = at(text, share);
    return text.slice(0, start) + junk + text.slice(start);
  }),
  fc.tuple(place, fc.constantFrom(...lines)).map(([share, line]): Mutation => (text) => {
    const start = text.indexOf('\n', at(text, share)) + 1;
    return `${text.slice(0, start)}${line}\n${text.slice(start)}`;
  }),
  fc.tuple(place, place).map(([from, to]): Mutation => (text) => {
    const all = lex(text).tokens;
    const [one, other] = [all[Math.floor(from * all.length)], all[Math.floor(to * all.length)]];
    if (!one || !other || one.startOffset >= other.startOffset) return text;
    const end = (token: typeof one): number => token.startOffset + token.image.length;
    const between = text.slice(end(one), other.startOffset);
    return text.slice(0, one.startOffset) + other.image + between + one.image + text.slice(end(other));
  }),
);
const spoilt = fc
  .tuple(fc.constantFrom(...texts), fc.array(mutation, { minLength: 1, maxLength: 5 }))
  .map(([text, mutations]) => mutations.reduce((current, mutate) => mutate(current), text));

test(`spoilt scenarios for ${SECONDS} s`, { timeout: (SECONDS + 30) * 1000 }, () => {
  let count = 0;
  const holds = fc.property(spoilt, (text) => {
    count++;
    const start = performance.now();
    const scenario = evaluate('main.stoke', (asked) => (asked === 'main.stoke' ? { text } : { fault: 'missing' }));
    expect(findingsOf(scenario).filter(({ code }) => code === 'program/failed')).toEqual([]);
    const formatted = format(text, isUnitWord);
    expect(solid(formatted)).toBe(solid(text));
    expect(format(formatted, isUnitWord)).toBe(formatted);
    // A busy machine may hold one run up; the same input twice over the limit is a hang.
    if (performance.now() - start > SLOWEST_MS) expect(secondsOf(text)).toBeLessThan(SLOWEST_MS / 1000);
  });
  fc.assert(holds, { seed: SEED, numRuns: Number.MAX_SAFE_INTEGER, interruptAfterTimeLimit: SECONDS * 1000 });
  console.log(`fuzz: ${count} spoilt scenarios, seed ${SEED}`);
  expect(count).toBeGreaterThan(SECONDS);
});

function solid(text: string): string {
  return text.replace(/\s/g, '');
}

function secondsOf(text: string): number {
  const start = performance.now();
  evaluate('main.stoke', (asked) => (asked === 'main.stoke' ? { text } : { fault: 'missing' }));
  return (performance.now() - start) / 1000;
}
