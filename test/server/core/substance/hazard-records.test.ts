// The hazard records: each passes the schema and belongs to a substance, sources and codes hold together, and what one fact
// says the others of the same substance do not deny.

import * as z from 'zod';
import { describe, expect, test } from 'vitest';
import { findSubstance } from '../../../../server/core/substance/catalogue.ts';
import { flammableLiquidCategory, ghsClasses, readGhsClass } from '../../../../server/core/substance/ghs.ts';
import { hazardRecords, hazardSourceRecords } from '../../../../server/core/substance/hazard-records.ts';
import { hazardRecordSchema } from '../../../../server/core/substance/hazard-schema.ts';
import { parseFormula } from '../../../../server/core/substance/formula.ts';
import { sourceRecords, substanceRecords } from '../../../../server/core/substance/records.ts';
import { sourceRecordSchema } from '../../../../server/core/substance/schema.ts';
import type { Hazards } from '../../../../server/core/substance/hazards.ts';

function hazardsOf(name: string): Hazards {
  const hazards = findSubstance(name)?.hazards;
  if (hazards === undefined) throw new Error(`no hazards of ${name}`);
  return hazards;
}

const statementsOf = (name: string, form?: string): readonly string[] =>
  hazardsOf(name)
    .classes.filter((found) => found.form === undefined || found.form === form)
    .map(({ statement }) => statement);

describe('every hazard record', () => {
  test.each(hazardRecords)('$name', (record) => {
    expect(z.prettifyError(hazardRecordSchema.safeParse(record).error ?? new z.ZodError([]))).toBe('');
    const hazards = hazardsOf(record.name);
    // Nothing may get lost on the way from trade units to SI.
    expect(hazards.classes).toHaveLength((record.classes ?? []).flatMap(({ all }) => all).length);
    expect(hazards.exposure).toHaveLength(record.exposure?.length ?? 0);
    for (const { gases } of hazards.withWater) {
      for (const gas of gases) expect(parseFormula(gas, 'g').kind, gas).toBe('formula');
    }
  });

  test('belongs to a substance of the catalogue, one each', () => {
    const names = hazardRecords.map(({ name }) => name);
    expect(names.filter((name, index) => names.indexOf(name) !== index)).toEqual([]);
    const known = new Set(substanceRecords.map(({ name }) => name));
    expect(names.filter((name) => !known.has(name))).toEqual([]);
  });

  test('has sources that exist, every source is used, and none is another list’s', () => {
    const used = new Set<string>();
    JSON.stringify(hazardRecords, (key, value: unknown) => {
      if (key === 'source' && typeof value === 'string') used.add(value);
      return value;
    });
    for (const source of hazardSourceRecords) expect(sourceRecordSchema.safeParse(source).success).toBe(true);
    expect([...used].sort()).toEqual(hazardSourceRecords.map(({ id }) => id).sort());
    const others = new Set(sourceRecords.map(({ id }) => id));
    expect(hazardSourceRecords.filter(({ id }) => others.has(id))).toEqual([]);
  });

  test('together they cover what people handle', () => {
    const withClasses = hazardRecords.filter(({ classes }) => classes !== undefined);
    const numbers = new Set(hazardRecords.flatMap(({ transport = [] }) => transport.map(({ unNumber }) => unNumber)));
    expect(withClasses.length).toBeGreaterThanOrEqual(120);
    expect(numbers.size).toBeGreaterThanOrEqual(40);
    expect(hazardRecords.filter(({ exposure }) => exposure !== undefined).length).toBeGreaterThanOrEqual(40);
    expect(substanceRecords.filter(({ flammableLimits }) => flammableLimits).length).toBeGreaterThanOrEqual(60);
  });
});

describe('facts of one substance agree', () => {
  test.each(hazardRecords.filter(({ name }) => findSubstance(name)?.flashPointK !== undefined))(
    '$name: flammable liquid class as the flash point has it',
    ({ name, classes = [] }) => {
      const substance = findSubstance(name);
      const given = classes
        .flatMap(({ all, form }) => (form === undefined ? all : []))
        .map((text) => readGhsClass(text))
        .find((found) => found?.hazardClass === 'Flam. Liq.');
      const flashPointK = substance?.flashPointK?.value;
      if (given === undefined || flashPointK === undefined) return;
      const category = flammableLiquidCategory(flashPointK, substance?.boilingPointK?.value);
      const reason = classifiedOtherwise[name];
      if (reason === undefined) expect(given.category).toBe(category);
      else expect(given.category, reason).not.toBe(category);
    },
  );

  test.each(hazardRecords.filter(({ transport }) => transport !== undefined))(
    '$name: class 3, 4.3 or 5.1 in transport has its hazard class',
    ({ name, transport = [] }) => {
      for (const { dangerClass, form } of transport) {
        const codes = statementsOf(name, form);
        const due = classOfDanger[dangerClass];
        if (due === undefined || name in notClassified) continue;
        expect(
          codes.some((code) => due.includes(code)),
          `${name} ${dangerClass} ${form ?? ''}: ${codes.join()}`,
        ).toBe(true);
      }
    },
  );

  test('what water makes flammable gas from is in class 4.3 or has a reason', () => {
    for (const { name, withWater = [] } of hazardRecords) {
      if (!withWater.some(({ gases, pace, form }) => gases.includes('H2') && pace !== 'slow' && form === undefined))
        continue;
      const { transport, classes } = hazardsOf(name);
      const isIn = transport.some(({ dangerClass }) => dangerClass === '4.3');
      expect(isIn || classes.some(({ statement }) => statement === 'H220'), name).toBe(true);
    }
  });

  test('what is pyrophoric says so in its class, unless it is a gas or only its powder is', () => {
    for (const { name, pyrophoric } of hazardRecords) {
      if (pyrophoric === undefined || pyrophoric.form !== undefined) continue;
      const codes = statementsOf(name);
      const reason =
        name === 'sodium_potassium_alloy' ? 'its crust and films take fire, the bulk is classed by water' : '';
      if (reason === '') expect(codes.includes('H250') || codes.includes('H232'), name).toBe(true);
    }
  });

  test('lower limits of exposure come with the longer time', () => {
    for (const { name } of hazardRecords) {
      const { exposure } = hazardsOf(name);
      for (const long of exposure.filter(({ kind }) => kind === 'eight-hour')) {
        const others = exposure.filter(
          ({ authority, kind, measuredAs }) =>
            kind !== 'eight-hour' &&
            (authority === long.authority || kind === 'immediately-dangerous') &&
            measuredAs === long.measuredAs,
        );
        for (const short of others) {
          const least = long.moleFraction ?? long.kgPerM3 ?? NaN;
          const most = long.moleFraction === undefined ? short.kgPerM3 : short.moleFraction;
          if (most !== undefined)
            expect(most, `${name} ${short.kind} ${short.authority}`).toBeGreaterThanOrEqual(least);
        }
      }
    }
  });

  test('no flame passes with less oxygen than its fuel’s lower limit would burn', () => {
    // Below the limiting oxygen nothing burns: it cannot be above the oxygen of air.
    for (const { name } of hazardRecords) {
      for (const { moleFraction } of hazardsOf(name).limitingOxygen) {
        expect(moleFraction, name).toBeGreaterThan(0.03);
        expect(moleFraction, name).toBeLessThan(0.16);
      }
    }
  });
});

/** Whose harmonised class is not what the flash point in the catalogue says, and why. */
const classifiedOtherwise: Readonly<Record<string, string>> = {};

const classOfDanger: Readonly<Record<string, readonly string[]>> = {
  '2.1': ['H220', 'H221'],
  '2.3': ['H330', 'H331'],
  '3': ['H224', 'H225', 'H226', 'H227'],
  '4.2': ['H250', 'H251', 'H252'],
  '4.3': ['H260', 'H261'],
  '5.1': ['H271', 'H272', 'H270'],
  '8': ['H314', 'H290'],
};
/** Whose transport class rests on something else than a class the record has. */
const notClassified: Readonly<Record<string, string>> = {
  undecane: 'listed by name; its flash point lies between 60 °C, where the GHS ends, and the 65 °C of older rules',
  formaldehyde: 'the methanol in its solution burns',
  heavy_fuel_oil: 'class 3 only where it is carried above its flash point',
  iron: 'turnings heat themselves, the metal as such does not',
  sodium_sulphide: 'the list has it as self-heating, the harmonised class as corrosive',
  potassium_sulphide: 'the list has it as self-heating, the harmonised class as corrosive',
  calcium_oxide: 'carried as corrosive by air alone; classed as damaging the eyes',
  silicon_tetrachloride: 'corrosive by the hydrogen chloride that moist air makes; harmonised as an irritant',
};

describe('GHS table', () => {
  test('reads what lists write, and nothing else', () => {
    expect(readGhsClass('Water-react. 1 H260')).toMatchObject({ hazardClass: 'Water-react.', category: '1' });
    expect(readGhsClass('STOT SE 3 H336')).toMatchObject({ statement: 'H336', area: 'health' });
    for (const text of ['Water-react. 1 H261', 'Flam. Liq. 2', 'H260', 'Flam. Liq. 5 H226', '']) {
      expect(readGhsClass(text), text).toBeUndefined();
    }
    expect(ghsClasses.every(({ statements }) => statements.every((code) => /^H\d{3}$/.test(code)))).toBe(true);
  });
});
