// Every single unit word, prefix included, with its exact measure: the unit table multiplied out once at start.
// Factors are worked out as exact fractions from the definitions and kept as two numbers, `up` and `down`, because
// 57 / 100 is 0.57 where 57 * 0.01 is not. It does not know how words join to compound units (read-unit.ts).
// Invariant: a word has one meaning; two rows that claim one spelling are a mistake in the table, which a test finds.

import { dimensionKey, dimensionless, dimensionOf, multiplyDimensions, raiseDimension } from './dimension.ts';
import type { Dimension } from './dimension.ts';
import { prefixes, unitTable } from './units.ts';
import type { UnitRow, UnitScale } from './units.ts';

/** One unit word: `n` of it are `(n * up + shift) / down` in SI base units. */
export interface UnitWord {
  /** The spelling used in answers: canonical prefix and symbol. */
  readonly symbol: string;
  /** The name in the singular, prefix included. */
  readonly name: string;
  readonly plural: string;
  readonly dimension: Dimension;
  readonly scale: UnitScale;
  readonly up: number;
  readonly down: number;
  readonly shift: number;
  readonly row: UnitRow;
  /** The prefix letter, empty without one. */
  readonly prefix: string;
}

/** What a hover says about a unit word. */
export interface UnitCard {
  readonly symbol: string;
  readonly name: string;
  /** `1 nmi = 1852 m`, as the table defines it. */
  readonly definition: string;
  readonly source: string;
}

/** The unit word of this spelling (prefix included, power not), or undefined. */
export function findUnitWord(word: string): UnitWord | undefined {
  return wordsBySpelling.get(word);
}

/** Whether a word is a unit's, prefix included and without its power: `kJ`, `degC`, `hours`, `%`. */
export function isUnitWord(word: string): boolean {
  return wordsBySpelling.has(word);
}

/** All spellings with what they mean, for completion, colouring and the tests. */
export function listUnitWords(): ReadonlyMap<string, UnitWord> {
  return wordsBySpelling;
}

/** The single words (canonical spellings, no prefix variants beyond those of the table) that measure a dimension. */
export function unitWordsOf(dimension: Dimension): readonly UnitWord[] {
  return wordsByDimension.get(dimensionKey(dimension)) ?? [];
}

/** Name, definition and source of a unit word for its hover, or undefined when there is no such unit. */
export function unitCard(word: string): UnitCard | undefined {
  const found = wordsBySpelling.get(word);
  if (!found) return undefined;
  const { row, symbol, name } = found;
  return { symbol, name, definition: defineInWords(found), source: row.source };
}

interface Measure {
  readonly numerator: bigint;
  readonly denominator: bigint;
  readonly dimension: Dimension;
}

const wordsBySpelling = new Map<string, UnitWord>();
const wordsByDimension = new Map<string, UnitWord[]>();

const measures = new Map<string, Measure>();
for (const row of unitTable) addRow(row);

function addRow(row: UnitRow): void {
  const measure = measureOf(row);
  for (const prefix of ['', ...row.prefixes]) {
    const power = prefix === '' ? 0 : (prefixes[prefix]?.power ?? 0);
    const scaled = simplify({
      numerator: measure.numerator * (power > 0 ? 10n ** BigInt(power) : 1n),
      denominator: measure.denominator * (power < 0 ? 10n ** BigInt(-power) : 1n),
      dimension: measure.dimension,
    });
    const zero = zeroOf(row);
    const prefixName = prefix === '' ? '' : (prefixes[prefix]?.name ?? '');
    const word: UnitWord = {
      symbol: `${prefix}${row.symbol}`,
      name: `${prefixName}${row.name}`,
      plural: `${prefixName}${row.plural}`,
      dimension: measure.dimension,
      scale: row.scale,
      up: Number(scaled.numerator * zero.parts),
      down: Number(scaled.denominator * zero.parts),
      shift: Number(scaled.numerator * zero.count),
      row,
      prefix,
    };
    measures.set(word.symbol, scaled);
    const key = dimensionKey(word.dimension);
    wordsByDimension.set(key, [...(wordsByDimension.get(key) ?? []), word]);
    for (const prefixSpelling of prefix === '' ? [''] : (prefixes[prefix]?.spellings ?? [])) {
      for (const spelling of [row.symbol, ...row.spellings]) {
        const whole = `${prefixSpelling}${spelling}`;
        if (!wordsBySpelling.has(whole)) wordsBySpelling.set(whole, word);
      }
    }
  }
}

/**
 * A scale's zero as a whole number of small parts (a thousandth where it is written in hundredths): with them -40 degC is
 * 233.15 K, where -40 + 273.15 is 233.14999999999998.
 */
function zeroOf(row: UnitRow): { readonly count: bigint; readonly parts: bigint } {
  if (row.zero === undefined) return { count: 0n, parts: 1n };
  const [whole = '', decimals = ''] = row.zero.split('.');
  return { count: BigInt(`${whole}${decimals}0`), parts: 10n ** BigInt(decimals.length + 1) };
}

function measureOf(row: UnitRow): Measure {
  if (typeof row.definition !== 'string') {
    return { numerator: 1n, denominator: 1n, dimension: dimensionOf({ [row.definition.base]: 1 }) };
  }
  let product: Measure = { numerator: 1n, denominator: 1n, dimension: dimensionless };
  for (const factor of row.definition.split(' ')) {
    const [word = '', exponent = '1'] = factor.split('^');
    const measure = measures.get(word) ?? readFraction(word);
    const power = Number(exponent);
    const [above, below] =
      power >= 0 ? [measure.numerator, measure.denominator] : [measure.denominator, measure.numerator];
    product = {
      numerator: product.numerator * above ** BigInt(Math.abs(power)),
      denominator: product.denominator * below ** BigInt(Math.abs(power)),
      dimension: multiplyDimensions(product.dimension, raiseDimension(measure.dimension, power)),
    };
  }
  return simplify(product);
}

/** `0.45359237` or `5/9`, exactly. A word that is neither is a mistake in the table and stops the program at start. */
function readFraction(text: string): Measure {
  const parts = /^(\d+)(?:\.(\d+))?(?:\/(\d+))?$/.exec(text);
  if (!parts) throw new Error(`The unit table uses "${text}", which is neither a number nor an earlier unit.`);
  const [, whole = '', decimals = '', denominator = '1'] = parts;
  return simplify({
    numerator: BigInt(whole + decimals),
    denominator: 10n ** BigInt(decimals.length) * BigInt(denominator),
    dimension: dimensionless,
  });
}

function simplify(measure: Measure): Measure {
  let [larger, smaller] = [measure.numerator, measure.denominator];
  while (smaller !== 0n) [larger, smaller] = [smaller, larger % smaller];
  return { ...measure, numerator: measure.numerator / larger, denominator: measure.denominator / larger };
}

function defineInWords(word: UnitWord): string {
  const { row, prefix } = word;
  const statements: string[] = [];
  if (prefix !== '') statements.push(`1 ${word.symbol} = ${Number(`1e${prefixes[prefix]?.power ?? 0}`)} ${row.symbol}`);
  if (typeof row.definition !== 'string') {
    statements.push(`${row.symbol} is a base unit`);
  } else {
    const above = row.scale === 'gauge-pressure' ? ' above 1 atm' : '';
    const step = row.scale === 'temperature' ? ' in steps' : '';
    statements.push(`1 ${row.symbol} = ${row.definition.replaceAll(/\^(?=\d)/g, '')}${above}${step}`);
    if (row.zero !== undefined) statements.push(`absolute zero is -${row.zero} ${row.symbol}`);
  }
  return statements.join('; ');
}
