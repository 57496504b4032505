// Reading compound units: what each form means, which faults the slips give, and that written text reads back.

import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { dimensionOf, isDimensionless, sameDimension } from '../../../../server/core/quantity/dimension.ts';
import {
  fromSi,
  isUnitWord,
  readUnit,
  readUnitText,
  stepFromSi,
  stepToSi,
  suggestUnits,
  toSi,
  unitCard,
  unitOne,
  unitsOf,
} from '../../../../server/core/quantity/read-unit.ts';
import type { Unit, UnitFault, UnitTokenLike } from '../../../../server/core/quantity/read-unit.ts';
import { listUnitWords } from '../../../../server/core/quantity/unit-words.ts';

function unit(text: string): Unit {
  const reading = readUnitText(text);
  if (!reading.ok) throw new Error(`${text}: ${JSON.stringify(reading.fault)}`);
  return reading.unit;
}

function fault(text: string): UnitFault {
  const reading = readUnitText(text);
  if (reading.ok) throw new Error(`${text} was read as ${reading.unit.text}`);
  return reading.fault;
}

const word = (text: string, power = 1): UnitTokenLike => ({ kind: 'word', text, power });
const mark = (kind: 'times' | 'over' | 'open' | 'close', power = 1): UnitTokenLike => ({ kind, text: kind, power });

describe('a unit is read', () => {
  test.each([
    ['kg', 'kg', 1, 1],
    ['kJ/(kg K)', 'kJ/(kg K)', 1000, 1],
    ['J/mol/K', 'J/(mol K)', 1, 1],
    ['kW h', 'kW h', 3.6e6, 1],
    ['kW·h', 'kW h', 3.6e6, 1],
    ['kW*h', 'kW h', 3.6e6, 1],
    ['g/kWh', 'g/kWh', 1, 3.6e9],
    ['m3', 'm3', 1, 1],
    ['m^3', 'm3', 1, 1],
    ['m³', 'm3', 1, 1],
    ['s^-2', '1/s2', 1, 1],
    ['s⁻²', '1/s2', 1, 1],
    ['kg m s^-2', 'kg m/s2', 1, 1],
    ['(kg m)^2', 'kg2 m2', 1, 1],
    ['J/(kg K)^2', 'J/(kg2 K2)', 1, 1],
    ['W/(m2/K)', 'W K/m2', 1, 1],
    ['(J/K) mol', 'J mol/K', 1, 1],
    ['J/(kg K)/s', 'J/(kg K s)', 1, 1],
    ['per year', '1/year', 1, 31557600],
    ['t per year', 't/year', 1000, 31557600],
    ['/h', '1/h', 1, 3600],
    ['1/h', '1/h', 1, 3600],
    ['1', '1', 1, 1],
    ['', '1', 1, 1],
    ['km/h', 'km/h', 1000, 3600],
    ['kg/kg', 'kg/kg', 1, 1],
    ['mol%', undefined, 0, 0],
    ['\u00b5mol/kg', 'umol/kg', 1, 1e6],
    ['\u03bcmol/kg', 'umol/kg', 1, 1e6],
    ['years', 'year', 31557600, 1],
  ])('%s', (text, canonical, up, down) => {
    if (canonical === undefined) return expect(readUnitText(text).ok).toBe(false);
    const read = unit(text);
    expect(read.text).toBe(canonical);
    expect(read.up / read.down).toBeCloseTo(up / down, 14);
    expect(read.up * down).toBe(read.down * up);
  });

  test('`per` opens a unit given as tokens', () => {
    expect(readUnit([mark('over'), word('year')])).toEqual(readUnitText('1/year'));
  });

  test('no tokens are a plain number', () => {
    expect(readUnit([])).toEqual({ ok: true, unit: unitOne });
  });

  test('kg/kg and % are plain numbers', () => {
    expect(isDimensionless(unit('kg/kg').dimension)).toBe(true);
    expect(isDimensionless(unit('%').dimension)).toBe(true);
  });

  test('a lone K counts kelvins, K in a compound is plain', () => {
    expect(unit('K').scale).toBe('kelvin');
    expect(unit('mK').scale).toBe('kelvin');
    expect(unit('J/K').scale).toBe('plain');
    expect(unit('degC').scale).toBe('temperature');
    expect(unit('\u00b0C')).toEqual(unit('degC'));
    expect(unit('barg').scale).toBe('gauge-pressure');
  });
});

describe('numbers survive as typed', () => {
  test('a percentage is divided by 100, not multiplied with 0.01', () => {
    for (let percent = 0; percent <= 1000; percent += 1) expect(toSi(percent, unit('%'))).toBe(percent / 100);
  });

  test.each([
    [25, 'degC', 298.15],
    [-40, 'degC', 233.15],
    [18.37, 'degC', 291.52],
    [-40, 'degF', 233.15],
    [68, 'degF', 293.15],
    [-273.15, 'degC', 0],
    [212, 'degF', 373.15],
    [0, 'degC', 273.15],
    [491.67, 'degR', 273.15],
    [13, 'kn', 6.687777777777778],
    [10.4, 'kWh/kg', 37440000],
    [2310, 'umol/kg', 0.00231],
  ])('%d %s', (value, text, si) => expect(toSi(value, unit(text))).toBe(si));

  test('fromSi undoes toSi', () => {
    const texts = ['degC', 'degF', 'barg', 'kn', 'MJ/kg', 'g/kWh', 'hp', 'mmHg', 'Btu/(lb degR)', 'uatm'];
    fc.assert(
      fc.property(
        fc.constantFrom(...texts),
        fc.integer({ min: -1e9, max: 1e9 }).map((whole) => whole / 997),
        (text, value) => {
          const read = unit(text);
          expect(Math.abs(fromSi(toSi(value, read), read) - value)).toBeLessThanOrEqual(
            1e-12 * (1000 + Math.abs(value)),
          );
          expect(Math.abs(stepFromSi(stepToSi(value, read), read) - value)).toBeLessThanOrEqual(
            1e-15 * Math.abs(value),
          );
        },
      ),
    );
  });
});

describe('a slip is a fault with its place', () => {
  test.each([
    ['J/kg K', 2 + 1, 'J/(kg K)'],
    ['J/kg*K', 3, 'J/(kg K)'],
    ['J/mol K/s', 3, 'J/(mol K s)'],
    ['J/kg degC', 3, 'J/(kg K)'],
    ['W/(kg/m K)', 6, 'W m K/kg'],
    ['(W/m K)', 4, 'W/(m K)'],
    ['kg m/s2 K mol', 5, 'kg m/(s2 K mol)'],
    ['J/(kg K) m', 7, 'J/(kg K m)'],
  ])('%s is ambiguous and %s is offered', (text, index, offer) => {
    expect(fault(text)).toEqual({ fault: 'ambiguous', index, offer });
    expect(readUnitText(offer).ok).toBe(true);
  });

  test.each([
    ['J/degC', 2, 'degC', 'J/K'],
    ['kJ/(kg \u00b0C)', 5, '\u00b0C', 'kJ/(kg K)'],
    ['Btu/(lb degF)', 5, 'degF', 'Btu/(lb degR)'],
    ['degC2', 0, 'degC', 'K2'],
    ['barg/s', 0, 'barg', 'bar/s'],
  ])('%s holds a scale', (text, index, scale, offer) => {
    expect(fault(text)).toEqual({ fault: 'scale-in-compound', index, word: scale, offer });
    expect(readUnitText(offer).ok).toBe(true);
  });

  test('an unknown word is reported before anything else', () => {
    expect(fault('J/kg Kelvin')).toMatchObject({ fault: 'unknown', index: 4, word: 'Kelvin', offers: ['K'] });
    expect(fault('foo/degC bar')).toMatchObject({ fault: 'unknown', index: 0, word: 'foo' });
  });

  test.each([
    [[mark('times'), word('m')], 0],
    [[word('m'), mark('over')], 1],
    [[word('m'), mark('over'), mark('over'), word('s')], 2],
    [[word('m'), word('s')], 1],
    [[mark('open'), word('m')], 1],
    [[word('m'), mark('close')], 1],
    [[mark('open'), mark('open'), word('m'), mark('close'), mark('close')], 1],
    [[mark('open'), mark('close')], 1],
    [[mark('open'), mark('over'), word('s'), mark('close')], 1],
    [[mark('over')], 0],
  ])('a stray mark (%#)', (tokens, index) => {
    expect(readUnit(tokens)).toEqual({ ok: false, fault: { fault: 'stray', index } });
  });

  test.each([
    ['m21', 0],
    ['kg/m^-21', 2],
    ['EJ20 EJ20', 0],
    ['m/(kg3)^7', 4],
  ])('%s is beyond use', (text, index) => {
    expect(fault(text)).toEqual({ fault: 'power', index });
  });

  test('any tokens give an answer', () => {
    const token = fc.record({
      kind: fc.constantFrom('word' as const, 'times' as const, 'over' as const, 'open' as const, 'close' as const),
      text: fc.constantFrom('kg', 'm', 'degC', 'nonsense', '', '%', 'K', '/', '__proto__', 'constructor'),
      power: fc.integer({ min: -30, max: 30 }),
    });
    fc.assert(
      fc.property(fc.array(token, { maxLength: 8 }), (tokens) => {
        const reading = readUnit(tokens);
        if (reading.ok) {
          const again = readUnitText(reading.unit.text);
          expect(again.ok && sameDimension(again.unit.dimension, reading.unit.dimension)).toBe(true);
          return;
        }
        expect(reading.fault.index).toBeGreaterThanOrEqual(0);
        expect(reading.fault.index).toBeLessThan(tokens.length);
      }),
      { numRuns: 2000 },
    );
  });
});

test('what is written reads back as the same unit', () => {
  const words = [...listUnitWords()].filter(([, { scale }]) => scale === 'plain' || scale === 'kelvin');
  const factor = fc.tuple(fc.constantFrom(...words.map(([spelling]) => spelling)), fc.integer({ min: -3, max: 3 }));
  fc.assert(
    fc.property(fc.array(factor, { minLength: 1, maxLength: 4 }), (factors) => {
      const tokens = factors.flatMap(([text, power], index) =>
        index === 0 ? [word(text, power)] : [mark('times'), word(text, power)],
      );
      const reading = readUnit(tokens);
      expect(reading.ok).toBe(true);
      if (!reading.ok) return;
      const again = unit(reading.unit.text);
      expect(again.text).toBe(reading.unit.text);
      expect(again.dimension).toEqual(reading.unit.dimension);
      expect(again.up / again.down / (reading.unit.up / reading.unit.down)).toBeCloseTo(1, 13);
    }),
    { numRuns: 1000 },
  );
});

describe('words', () => {
  test('prefixes go where the table allows them', () => {
    for (const known of [
      'kJ',
      'MW',
      'umol',
      '\u00b5mol',
      '\u03bcmol',
      'mbar',
      'uatm',
      'kWh',
      'kmol',
      'ppm',
      '%',
      'nmi',
    ]) {
      expect(isUnitWord(known), known).toBe(true);
    }
    for (const unknown of ['kdegC', 'khp', 'Mg', 'mm3', 'C', 'F', 'H', 'S', 'in', 'per', 'points', 'toString', '']) {
      expect(isUnitWord(unknown), unknown).toBe(false);
    }
  });

  test.each([
    ['knots', ['kn']],
    ['kph', ['km/h']],
    ['C', ['degC', 'A s']],
    ['litres', ['L']],
    ['liter', ['L']],
    ['kilojoules', ['kJ']],
    ['tonnes', ['t']],
    ['ton', ['t', 'short_ton', 'long_ton']],
    ['KW', ['kW']],
    ['mpa', ['MPa', 'mPa']],
    ['inches', ['inch']],
    ['xyzzy', []],
  ])('%s suggests %j', (text, offers) => {
    const found = suggestUnits(text);
    expect(found.slice(0, offers.length)).toEqual(offers);
    expect(found.length).toBeLessThanOrEqual(3);
    if (offers.length === 0) expect(found).toEqual([]);
  });

  test.each([
    ['Nm3', ['m3']],
    ['Nm', ['N m']],
    ['kg/Nm3', ['m3']],
    ['in^3', ['inch3']],
    ['sec^-2', ['s^-2']],
    ['kph2', []],
  ])('offers for %s carry its power', (text, offers) => {
    expect(fault(text)).toMatchObject({ fault: 'unknown', offers });
    for (const offer of offers) expect(readUnitText(offer).ok).toBe(true);
  });

  test('a gas volume without its reference state is explained', () => {
    expect(fault('Nm3')).toMatchObject({ why: expect.stringContaining('reference state') as string });
    expect(fault('ton')).toMatchObject({ why: expect.stringContaining('2240 lb') as string });
  });

  test('a card defines the unit and names its source', () => {
    expect(unitCard('nmi')).toMatchObject({ symbol: 'nmi', name: 'nautical mile', definition: '1 nmi = 1852 m' });
    expect(unitCard('kWh')).toMatchObject({ symbol: 'kWh', definition: '1 kWh = 1000 Wh; 1 Wh = 1 W h' });
    expect(unitCard('\u00b0F')?.definition).toBe('1 degF = 5/9 K in steps; absolute zero is -459.67 degF');
    expect(unitCard('barg')?.definition).toBe('1 barg = 1 bar above 1 atm');
    expect(unitCard('kg')?.definition).toBe('kg is a base unit');
    expect(unitCard('C')).toBeUndefined();
  });

  test('units of a dimension, for completion', () => {
    const pressure = dimensionOf({ mass: 1, length: -1, time: -2 });
    const plain = unitsOf(pressure).map(({ unit: text }) => text);
    expect(plain).toEqual(expect.arrayContaining(['Pa', 'kPa', 'bar', 'mbar', 'psi', 'atm']));
    expect(plain).not.toContain('barg');
    expect(unitsOf(pressure, 'gauge-pressure').map(({ unit: text }) => text)).toEqual(['barg', 'mbarg', 'psig']);
    const temperatures = unitsOf(dimensionOf({ temperature: 1 }), 'temperature').map(({ unit: text }) => text);
    expect(temperatures).toEqual(expect.arrayContaining(['K', 'degC', 'degF']));
  });
});
