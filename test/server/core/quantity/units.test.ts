// Laws of the whole unit table, and every factor against GNU units (test/reference/units-gnu.json).
// The reference prints 15 significant digits, all that double arithmetic is sure of; a factor here must print the same.

import Fraction from 'fraction.js';
import { describe, expect, test } from 'vitest';
import { BASIS_WORDS, KIND_WORDS, RESERVED_WORDS } from '../../../../grammar/words.ts';
import {
  celsiusZeroK,
  molarGasConstantJPerMolK,
  standardAtmospherePa,
} from '../../../../server/core/quantity/constants.ts';
import { readUnitText, fromSi, toSi, unitCard } from '../../../../server/core/quantity/read-unit.ts';
import type { Unit } from '../../../../server/core/quantity/read-unit.ts';
import { listOtherSpellings } from '../../../../server/core/quantity/suggest-units.ts';
import { findUnitWord, isUnitWord, listUnitWords } from '../../../../server/core/quantity/unit-words.ts';
import { prefixes, unitTable } from '../../../../server/core/quantity/units.ts';
import reference from '../../../reference/units-gnu.json' with { type: 'json' };

function unit(text: string): Unit {
  const reading = readUnitText(text);
  if (!reading.ok) throw new Error(`${text}: ${JSON.stringify(reading.fault)}`);
  return reading.unit;
}
const words = [...new Set(listUnitWords().values())];

describe('the table', () => {
  test('has one meaning for each spelling, prefixes included', () => {
    const owners = new Map<string, string>();
    for (const row of unitTable) {
      for (const prefix of ['', ...row.prefixes.flatMap((letter) => prefixes[letter]?.spellings ?? ['?'])]) {
        for (const spelling of [row.symbol, ...row.spellings]) {
          const whole = prefix + spelling;
          expect(owners.get(whole), `${whole} is claimed by ${row.symbol} and ${owners.get(whole)}`).toBeUndefined();
          owners.set(whole, row.symbol);
        }
      }
    }
    expect([...owners.keys()].sort()).toEqual([...listUnitWords().keys()].sort());
  });

  test('spells no unit like a word of the language, nor like an element that is no unit here', () => {
    for (const word of [...RESERVED_WORDS, ...KIND_WORDS, ...BASIS_WORDS, 'C', 'F', 'H', 'S', 'Mg', 'points']) {
      expect(isUnitWord(word), word).toBe(false);
    }
  });

  test('spells units as the lexer can read them: letters and _, or one of the marks', () => {
    for (const spelling of listUnitWords().keys())
      expect(spelling).toMatch(/^([A-Za-z_\u00b5\u03bc]+|\u00b0[CF]|[%\u2030\u2103\u2109])$/);
  });

  test('gives every time unit its plural', () => {
    for (const name of ['second', 'minute', 'hour', 'day', 'week', 'year']) {
      expect(findUnitWord(`${name}s`), name).toBe(findUnitWord(name));
      expect(findUnitWord(name), name).toBeDefined();
    }
  });

  test('names a source and a card for every word', () => {
    for (const word of listUnitWords().keys()) {
      const card = unitCard(word);
      expect(card?.source.length, word).toBeGreaterThan(5);
      expect(card?.definition.length, word).toBeGreaterThan(5);
    }
    expect(new Set(words.map(({ name }) => name)).size).toBe(words.length);
  });

  test('has each factor exactly as defined', () => {
    // The definitions worked out once more with a library of exact fractions.
    const exact = new Map<string, Fraction>();
    for (const row of unitTable) {
      let product = new Fraction(1);
      for (const factor of typeof row.definition === 'string' ? row.definition.split(' ') : []) {
        const [base = '', power = '1'] = factor.split('^');
        product = product.mul((exact.get(base) ?? new Fraction(base)).pow(Number(power)) ?? NaN);
      }
      for (const prefix of ['', ...row.prefixes]) {
        const scaled = product.mul(new Fraction(10).pow(prefixes[prefix]?.power ?? 0) ?? NaN);
        exact.set(prefix + row.symbol, scaled);
        const word = findUnitWord(prefix + row.symbol);
        if (word?.symbol === 'hp') {
          // Its numerator is beyond 2^53: the horsepower alone is right to one unit in the last place, not exactly.
          expect(Math.abs(word.up / word.down / scaled.valueOf() - 1)).toBeLessThanOrEqual(2 ** -52);
        } else {
          expect(word && new Fraction(word.up).div(word.down).equals(scaled), prefix + row.symbol).toBe(true);
        }
      }
    }
  });

  test('offers only what it can read', () => {
    for (const [word, { offers }] of listOtherSpellings()) {
      expect(isUnitWord(word), word).toBe(false);
      for (const offer of offers) expect(readUnitText(offer).ok, `${word}: ${offer}`).toBe(true);
    }
  });
});

describe(`factors against ${reference.source}`, () => {
  const rows = reference.rows as readonly {
    from: string;
    to: string;
    factor?: number;
    value?: number;
    result?: number;
  }[];

  test('every word that GNU units can know is among them', () => {
    const asked = new Set(rows.map(({ from }) => from));
    const missing = words.filter(({ symbol }) => !asked.has(symbol));
    for (const { symbol, dimension, scale } of missing) {
      const isMoney = dimension.euro + dimension.dollar + dimension.pound === 1;
      expect(isMoney || scale === 'gauge-pressure', symbol).toBe(true);
    }
    expect(rows.filter(({ from }) => !isUnitWord(from)).length).toBeGreaterThanOrEqual(40);
  });

  test.each(rows.filter(({ factor }) => factor !== undefined))(
    '1 $from = $factor $to',
    ({ from, to, factor = NaN }) => {
      const ours = fromSi(toSi(1, unit(from)), unit(to));
      expect(ours.toPrecision(15)).toBe(factor.toPrecision(15));
    },
  );

  test.each(rows.filter(({ value }) => value !== undefined))(
    '$value $from = $result $to',
    ({ from, to, value = NaN, result = NaN }) => {
      const ours = fromSi(toSi(value, unit(from)), unit(to));
      // GNU units works from -459.67 °F to 0 K in floating point and is left with 6e-14 K; it is 0.
      if (Math.abs(result) < 1e-12) expect(ours).toBe(0);
      else expect(ours.toPrecision(15)).toBe(result.toPrecision(15));
    },
  );
});

test('a gauge unit has the step of its absolute unit', () => {
  expect(toSi(1, unit('barg'))).toBe(toSi(1, unit('bar')));
  expect(toSi(1, unit('psig'))).toBe(toSi(1, unit('psi')));
});

test('the constants agree with the table', () => {
  expect(toSi(1, unit('atm'))).toBe(standardAtmospherePa);
  expect(toSi(0, unit('degC'))).toBe(celsiusZeroK);
  // SI Brochure, 9th edition: k = 1.380649e-23 J/K and N_A = 6.02214076e23 /mol, both exact.
  expect(molarGasConstantJPerMolK).toBe(new Fraction('1.380649').mul('6.02214076').valueOf());
});
