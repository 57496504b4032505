// Spoilt scenarios for the fuzz tests: every example with a few stretches deleted, tokens swapped, lines of other examples,
// signs and junk put in. Knows no check. Invariant: what comes out is a pure function of the seed.
import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import fc from 'fast-check';
import { lex } from '../../grammar/tokens.ts';

const folder = path.resolve('examples');
/** The texts of all examples. */
export const exampleTexts: readonly string[] = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.stoke'))
  .map((name) => readFileSync(path.join(folder, name), 'utf8'));
const lines = exampleTexts.flatMap((text) => text.split('\n'));
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

export type Mutation = (text: string) => string;

const place = fc.double({ min: 0, max: 1, noNaN: true });
const at = (text: string, share: number): number => Math.floor(share * text.length);
/** One slip. */
export const mutation: fc.Arbitrary<Mutation> = fc.oneof(
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
/** An example with one to five slips. */
export const spoilt: fc.Arbitrary<string> = fc
  .tuple(fc.constantFrom(...exampleTexts), fc.array(mutation, { minLength: 1, maxLength: 5 }))
  .map(([text, mutations]) => mutations.reduce((current, mutate) => mutate(current), text));
