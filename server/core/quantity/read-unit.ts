// Reads compound units, as tokens from a scenario or as text from our own tables, into one exact scale and dimension.
// A second `/` divides again; what may mean two things (`J/kg K`) is a fault that carries its mend, never a guess.
// It knows no source positions: a fault names the token by its index. Answers are kept, since few units recur often.
// Invariant: reading a unit's `text` gives the same unit again. Rules of writing: SI Brochure, 9th edition, section 5.2.

import { dimensionless, multiplyDimensions, raiseDimension } from './dimension.ts';
import type { Dimension } from './dimension.ts';
import { explainUnitWord } from './suggest-units.ts';
import { findUnitWord, unitWordsOf } from './unit-words.ts';
import type { UnitWord } from './unit-words.ts';
import type { UnitScale } from './units.ts';

export { isUnitWord, unitCard } from './unit-words.ts';
export { suggestUnits } from './suggest-units.ts';

/** A unit: `n` of it are `(n * up + shift) / down` in SI base units. */
export interface Unit {
  /** In canonical spelling: `kJ/(kg K)`. Empty text does not occur; a plain number's unit is `1`. */
  readonly text: string;
  readonly dimension: Dimension;
  readonly scale: UnitScale;
  readonly up: number;
  readonly down: number;
  readonly shift: number;
}

/** One token of a written unit; the syntax tree's unit tokens are of this shape. */
export interface UnitTokenLike {
  readonly kind: 'word' | 'times' | 'over' | 'open' | 'close';
  readonly text: string;
  /** Whole-number power of a word or of a closing bracket; 1 when none is written. */
  readonly power: number;
}

/** Why a unit cannot be read. `index` is the token that is to blame. */
export type UnitFault =
  | {
      readonly fault: 'unknown';
      readonly index: number;
      readonly word: string;
      /** Up to three texts that may be meant, best first; each replaces the word together with its power. */
      readonly offers: readonly string[];
      readonly why?: string;
    }
  /** `J/kg K`: does the kelvin divide? `offer` is the reading with brackets. */
  | { readonly fault: 'ambiguous'; readonly index: number; readonly offer: string }
  /** `J/degC`, `barg/s`: a scale with a zero of its own has no place in a product. */
  | { readonly fault: 'scale-in-compound'; readonly index: number; readonly word: string; readonly offer: string }
  /** A mark or bracket where a unit word should stand, or a bracket in a bracket. */
  | { readonly fault: 'stray'; readonly index: number }
  /** A power beyond any use, or a unit too large or too small to compute with. */
  | { readonly fault: 'power'; readonly index: number };

export type UnitReading =
  { readonly ok: true; readonly unit: Unit } | { readonly ok: false; readonly fault: UnitFault };

/** The unit of a plain number. */
export const unitOne: Unit = { text: '1', dimension: dimensionless, scale: 'plain', up: 1, down: 1, shift: 0 };

const largestPower = 20;
const mostKept = 2000;
const keptReadings = new Map<string, UnitReading>();

/**
 * Reads the tokens of a unit as written after a number, `210 per year` included. No tokens are a plain number's unit.
 * Never throws; the first fault found is reported, unknown words before everything else.
 */
export function readUnit(tokens: readonly UnitTokenLike[]): UnitReading {
  let key = '';
  for (const { kind, text, power } of tokens) key += kind === 'word' ? `${text} ${power}\n` : `\t${kind} ${power}\n`;
  return keep(key, () => readAfresh(tokens));
}

/**
 * Reads a unit from text: `kJ/(kg K)`, `m^3`, `t/year`, `1/s`, `1`, `per year`. For units of our own tables and
 * settings; a scenario's units come as tokens.
 */
export function readUnitText(text: string): UnitReading {
  return keep(`=${text}`, () => readUnit(splitUnitText(text)));
}

/** A value in this unit, in SI base units. For gauge pressures: pascals above the standard atmosphere. */
export function toSi(value: number, unit: Unit): number {
  return (value * unit.up + unit.shift) / unit.down;
}

/** A value in SI base units, in this unit: the inverse of `toSi`. */
export function fromSi(valueSi: number, unit: Unit): number {
  return (valueSi * unit.down - unit.shift) / unit.up;
}

/** A step (a difference, an uncertainty) of this unit in SI base units; the scale's zero plays no part. */
export function stepToSi(step: number, unit: Unit): number {
  return (step * unit.up) / unit.down;
}

/** A step in SI base units, in steps of this unit. */
export function stepFromSi(stepSi: number, unit: Unit): number {
  return (stepSi * unit.down) / unit.up;
}

/** The single-word units of a dimension and scale, for completion; kelvins serve temperatures and differences alike. */
export function unitsOf(dimension: Dimension, scale: UnitScale = 'plain'): readonly { unit: string; name: string }[] {
  return unitWordsOf(dimension)
    .filter((word) => word.scale === scale || (scale === 'temperature' && word.scale === 'kelvin'))
    .map(({ symbol, name }) => ({ unit: symbol, name }));
}

function keep(key: string, read: () => UnitReading): UnitReading {
  const kept = keptReadings.get(key);
  if (kept) return kept;
  const reading = read();
  if (keptReadings.size >= mostKept) keptReadings.clear();
  keptReadings.set(key, reading);
  return reading;
}

interface Factor {
  readonly word: UnitWord;
  readonly power: number;
}

function readAfresh(tokens: readonly UnitTokenLike[]): UnitReading {
  for (const [index, token] of tokens.entries()) {
    if (token.kind !== 'word' || findUnitWord(token.text)) continue;
    return failed({ fault: 'unknown', index, word: token.text, ...explainUnitWord(token.text, token.power) });
  }
  const factors = readFactors(tokens);
  if ('fault' in factors) return failed(factors);
  const scaled = findScaleInCompound(tokens, factors);
  if (scaled) return failed(scaled);
  return combine(factors);
}

function failed(fault: UnitFault): UnitReading {
  return { ok: false, fault };
}

/** The words with the powers they end up with, brackets and divisions worked in; or the first fault of form. */
function readFactors(tokens: readonly UnitTokenLike[]): Factor[] | UnitFault {
  const factors: Factor[] = [];
  // What a word is multiplied with: -1 behind a division, inside a bracket the bracket's sign and power too.
  let sign = 1;
  let bracketStart = -1;
  let divided = false;
  let wantsOperand = true;
  // The first product behind a division; it is read on as if all that follows divides, which is what is offered.
  let ambiguousIndex: number | undefined;
  for (const [index, token] of tokens.entries()) {
    const stray: UnitFault = { fault: 'stray', index };
    switch (token.kind) {
      case 'word': {
        if (!wantsOperand) return stray;
        if (!isUsablePower(token.power)) return { fault: 'power', index };
        const word = findUnitWord(token.text);
        if (!word) return stray;
        factors.push({ word, power: token.power * sign });
        wantsOperand = false;
        break;
      }
      case 'open':
        if (!wantsOperand || bracketStart >= 0) return stray;
        bracketStart = factors.length;
        break;
      case 'close':
        if (wantsOperand || bracketStart < 0) return stray;
        if (!isUsablePower(token.power)) return { fault: 'power', index };
        raiseFrom(factors, bracketStart, token.power);
        if (!factors.every(({ power }) => isUsablePower(power))) return { fault: 'power', index };
        bracketStart = -1;
        // Inside the bracket a `/` may have turned the sign; behind it the sign from before the bracket holds again.
        sign = divided ? -1 : 1;
        break;
      case 'over':
        // `per year` and `/year` may open a unit, but only once and only at its start.
        if (wantsOperand && index > 0) return stray;
        if (bracketStart >= 0) {
          sign = divided ? 1 : -1;
        } else {
          divided = true;
          sign = -1;
        }
        wantsOperand = true;
        break;
      case 'times':
        if (wantsOperand) return stray;
        if (bracketStart >= 0 ? sign !== (divided ? -1 : 1) : divided) ambiguousIndex ??= index;
        wantsOperand = true;
        break;
    }
  }
  if (tokens.length > 0 && (wantsOperand || bracketStart >= 0)) return { fault: 'stray', index: tokens.length - 1 };
  if (ambiguousIndex !== undefined) return { fault: 'ambiguous', index: ambiguousIndex, offer: writeInSteps(factors) };
  return factors;
}

function isUsablePower(power: number): boolean {
  return Number.isInteger(power) && Math.abs(power) <= largestPower;
}

function raiseFrom(factors: Factor[], start: number, power: number): void {
  if (power === 1) return;
  for (let index = start; index < factors.length; index += 1) {
    const factor = factors[index];
    if (factor) factors[index] = { word: factor.word, power: factor.power * power };
  }
}

function writeWord(symbol: string, power: number): string {
  return power === 1 ? symbol : `${symbol}${power}`;
}

const stepUnits: Readonly<Record<string, string>> = {
  degC: 'K',
  degF: 'degR',
  barg: 'bar',
  mbarg: 'mbar',
  psig: 'psi',
};

function findScaleInCompound(tokens: readonly UnitTokenLike[], factors: readonly Factor[]): UnitFault | undefined {
  if (factors.length === 1 && factors[0]?.power === 1) return undefined;
  for (const [index, token] of tokens.entries()) {
    const word = token.kind === 'word' ? findUnitWord(token.text) : undefined;
    if (!word || (word.scale !== 'temperature' && word.scale !== 'gauge-pressure')) continue;
    return { fault: 'scale-in-compound', index, word: token.text, offer: writeInSteps(factors) };
  }
  return undefined;
}

/** The compound with the step of each scale in the scale's place: kelvins for degrees Celsius. */
function writeInSteps(factors: readonly Factor[]): string {
  return writeFactors(factors.map(({ word, power }) => ({ symbol: stepUnits[word.symbol] ?? word.symbol, power })));
}

function combine(factors: readonly Factor[]): UnitReading {
  const [first] = factors;
  if (!first) return { ok: true, unit: unitOne };
  if (factors.length === 1 && first.power === 1) {
    const { symbol, dimension, scale, up, down, shift } = first.word;
    return { ok: true, unit: { text: symbol, dimension, scale, up, down, shift } };
  }
  let dimension = dimensionless;
  let up = 1;
  let down = 1;
  for (const { word, power } of factors) {
    const size = Math.abs(power);
    dimension = multiplyDimensions(dimension, raiseDimension(word.dimension, power));
    up *= (power > 0 ? word.up : word.down) ** size;
    down *= (power > 0 ? word.down : word.up) ** size;
  }
  const usable = [up, down, up / down].every((number) => Number.isFinite(number) && number > 0);
  if (!usable) return failed({ fault: 'power', index: 0 });
  const text = writeFactors(factors.map(({ word, power }) => ({ symbol: word.symbol, power })));
  return { ok: true, unit: { text, dimension, scale: 'plain', up, down, shift: 0 } };
}

/** Canonical text: what multiplies, then one `/`, then what divides, in brackets when it is more than one word. */
function writeFactors(factors: readonly { readonly symbol: string; readonly power: number }[]): string {
  const above = factors.filter(({ power }) => power > 0).map(({ symbol, power }) => writeWord(symbol, power));
  const below = factors.filter(({ power }) => power < 0).map(({ symbol, power }) => writeWord(symbol, -power));
  const numerator = above.length > 0 ? above.join(' ') : '1';
  if (below.length === 0) return numerator;
  return `${numerator}/${below.length > 1 ? `(${below.join(' ')})` : below.join('')}`;
}

const superscripts: Readonly<Record<string, string>> = { '⁰': '0', '¹': '1', '²': '2', '³': '3', '⁴': '4', '⁻': '-' };

/** Cuts unit text into tokens. What is no part of a unit becomes a word, which then is unknown. */
function splitUnitText(text: string): UnitTokenLike[] {
  const tokens: UnitTokenLike[] = [];
  const plain = text.trim().replaceAll(/[⁰¹²³⁴⁻]/g, (mark) => superscripts[mark] ?? '');
  const pattern = /\s*(?:(\()|(\))(?:\^?(-?\d+))?|(\/|per(?=\s))|([*·])|([^\s()/*·^\d-]+)(?:\^?(-?\d+))?|(\S))/gu;
  for (const [, open, close, closePower, over, times, word, power, other] of plain.matchAll(pattern)) {
    const follows = tokens.at(-1)?.kind;
    const opensOperand = open !== undefined || word !== undefined;
    if (opensOperand && (follows === 'word' || follows === 'close'))
      tokens.push({ kind: 'times', text: ' ', power: 1 });
    if (open) tokens.push({ kind: 'open', text: open, power: 1 });
    else if (close) tokens.push({ kind: 'close', text: close, power: Number(closePower ?? 1) });
    else if (over) tokens.push({ kind: 'over', text: over, power: 1 });
    else if (times) tokens.push({ kind: 'times', text: times, power: 1 });
    else if (word) tokens.push({ kind: 'word', text: word, power: Number(power ?? 1) });
    // The 1 of `1/s` and `1` alone is no word of a unit; behind anything else it is a mistake.
    else if (other === '1' && tokens.length === 0) continue;
    else if (other) tokens.push({ kind: 'word', text: other, power: 1 });
  }
  return tokens;
}
