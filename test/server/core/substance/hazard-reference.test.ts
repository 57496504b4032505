// The hazard records against published lists they were not taken from: UN numbers and classes, GHS statement codes, exposure
// limits, lower flammable limits, and the GHS bounds of flammable liquids. A row that `differs` says why, and must still differ.

import { describe, expect, test } from 'vitest';
import { allSubstances, findSubstance } from '../../../../server/core/substance/catalogue.ts';
import { flammableLiquidCategory } from '../../../../server/core/substance/ghs.ts';
import type { Hazards } from '../../../../server/core/substance/hazards.ts';
import exposure from '../../../reference/hazards-exposure-limits.json' with { type: 'json' };
import limits from '../../../reference/hazards-flammable-limits.json' with { type: 'json' };
import flashPoints from '../../../reference/hazards-flash-point-classes.json' with { type: 'json' };
import ghs from '../../../reference/hazards-ghs-classes.json' with { type: 'json' };
import limitingOxygen from '../../../reference/hazards-limiting-oxygen.json' with { type: 'json' };
import packingGroups from '../../../reference/hazards-packing-groups.json' with { type: 'json' };
import unNumbers from '../../../reference/hazards-un-numbers.json' with { type: 'json' };

interface Row {
  readonly provenance: string;
  readonly differs?: string;
}

function hazardsOf(name: string): Hazards {
  const hazards = findSubstance(name)?.hazards;
  if (hazards === undefined) throw new Error(`no hazards of ${name}`);
  return hazards;
}

const all = [
  unNumbers.rows,
  packingGroups.rows,
  ghs.rows,
  exposure.rows,
  limits.rows,
  flashPoints.rows,
  limitingOxygen.rows,
].flat() as readonly Row[];

test('most reference values of hazards were seen in a source', () => {
  const seen = all.filter(({ provenance }) => provenance === 'seen');
  expect(seen.length).toBeGreaterThan(all.length / 2);
});

interface UnRow extends Row {
  readonly substances: readonly string[];
  readonly unNumber: number;
  readonly dangerClass: string;
  readonly named: string;
}

describe('UN numbers', () => {
  test.each(unNumbers.rows as readonly UnRow[])(
    '$unNumber $named',
    ({ substances, unNumber, dangerClass, differs }) => {
      for (const name of substances) {
        const entries = hazardsOf(name).transport.filter((entry) => entry.unNumber === unNumber);
        expect(entries.length, `${name} has no UN ${unNumber}`).toBeGreaterThan(0);
        const isSame = entries.every((entry) => entry.dangerClass === dangerClass);
        expect(isSame, differs).toBe(differs === undefined);
      }
    },
  );

  const transports = allSubstances().flatMap(({ name, hazards }) =>
    (hazards?.transport ?? []).map((entry) => ({ name, entry })),
  );

  test.each(packingGroups.rows)('$unNumber: division, subsidiary hazards and packing group', (row) => {
    const entries = transports.filter(({ entry }) => entry.unNumber === row.unNumber);
    expect(entries.length).toBeGreaterThan(0);
    for (const { name, entry } of entries) {
      const { dangerClass, subsidiary, packingGroup = null } = entry;
      const read = { dangerClass: row.dangerClass, subsidiary: row.subsidiary, packingGroup: row.packingGroup };
      expect({ dangerClass, subsidiary, packingGroup }, name).toEqual(read);
    }
  });

  test('what is said to have been seen in the list is a row here', () => {
    const rows = new Set([...packingGroups.rows, ...unNumbers.rows].map(({ unNumber }) => unNumber));
    const seen = transports.filter(({ entry }) => entry.source.provenance === 'seen');
    expect(seen.filter(({ entry }) => !rows.has(entry.unNumber)).map(({ name }) => name)).toEqual([]);
    expect(seen.length).toBeGreaterThan(transports.length / 2);
  });

  test('at least forty substances are held against the list', () => {
    expect(new Set((unNumbers.rows as readonly UnRow[]).flatMap(({ substances }) => substances)).size).toBeGreaterThan(
      40,
    );
  });

  test('alkali metals have the entries of their dispersions, with and without a flammable carrier', () => {
    for (const name of ['lithium', 'sodium', 'potassium', 'rubidium', 'caesium', 'sodium_potassium_alloy']) {
      expect(hazardsOf(name).transport).toEqual(
        expect.arrayContaining([
          expect.objectContaining({ unNumber: 1391, form: 'dispersion', subsidiary: [], packingGroup: 'I' }),
          expect.objectContaining({
            unNumber: 3482,
            form: 'dispersion-in-flammable-liquid',
            subsidiary: ['3'],
            packingGroup: 'I',
          }),
        ]),
      );
    }
  });
});

interface GhsRow extends Row {
  readonly substance: string;
  readonly form?: string;
  readonly statements?: readonly string[];
  readonly holds?: readonly string[];
}

describe('GHS statement codes', () => {
  test.each(ghs.rows as readonly GhsRow[])('$substance $form', ({ substance, form, statements, holds, differs }) => {
    const classes = findSubstance(substance)?.hazards?.classes ?? [];
    const codes = new Set(
      classes.filter((found) => found.form === undefined || found.form === form).map(({ statement }) => statement),
    );
    if (holds !== undefined) {
      for (const code of holds) expect(codes.has(code), code).toBe(true);
      return;
    }
    // A label that carries H410 does not carry H400 beside it.
    if (codes.has('H410')) codes.delete('H400');
    if (differs === undefined) expect([...codes].sort()).toEqual([...(statements ?? [])].sort());
    else expect([...codes].sort(), differs).not.toEqual([...(statements ?? [])].sort());
  });
});

interface ExposureRow extends Row {
  readonly substance: string;
  readonly authority: string;
  readonly kind: string;
  readonly ppm?: number;
  readonly mgPerM3?: number;
}

describe('exposure limits', () => {
  test.each(exposure.rows as readonly ExposureRow[])(
    '$substance, $authority, $kind',
    ({ substance, authority, kind, ppm, mgPerM3, differs }) => {
      const found = hazardsOf(substance).exposure.filter(
        (limit) => limit.authority === authority && limit.kind === kind,
      );
      expect(found).toHaveLength(1);
      const value = ppm === undefined ? found[0]?.kgPerM3 : found[0]?.moleFraction;
      // Limits are exact numbers of a list; only the change of unit rounds.
      const isSame = Math.abs((value ?? NaN) / ((ppm ?? mgPerM3 ?? NaN) * 1e-6) - 1) < 1e-9;
      expect(isSame, differs).toBe(differs === undefined);
    },
  );
});

interface LimitRow extends Row {
  readonly substance: string;
  readonly lowerPercent: number;
}

describe('lower flammable limits', () => {
  test.each(limits.rows as readonly LimitRow[])('$substance', ({ substance, lowerPercent, differs }) => {
    const lower = findSubstance(substance)?.flammableLimits?.lower;
    expect(lower).toBeDefined();
    // The limit is one of the vessel and of the way it is read as much as of the gas: good lists are up to a quarter apart.
    const isNear = Math.abs((lower?.value ?? NaN) * 100 - lowerPercent) <= 0.25 * lowerPercent + 1e-9;
    expect(isNear, `${(lower?.value ?? NaN) * 100} %: ${differs ?? ''}`).toBe(differs === undefined);
  });
});

describe('limiting oxygen', () => {
  test.each(limitingOxygen.rows)('$substance with $inert', ({ substance, inert, percent }) => {
    const found = hazardsOf(substance).limitingOxygen.filter((one) => one.inert === inert);
    expect(found).toHaveLength(1);
    expect((found[0]?.moleFraction ?? NaN) * 100).toBeCloseTo(percent, 9);
  });
});

interface FlashPointRow extends Row {
  readonly of: string;
  readonly flashPointC: number;
  readonly boilingPointC: number;
  readonly category: string | null;
}

describe('flammable liquids by flash and boiling point', () => {
  test.each(flashPoints.rows as readonly FlashPointRow[])(
    '$of: $flashPointC °C, boils at $boilingPointC °C',
    ({ flashPointC, boilingPointC, category }) => {
      expect(flammableLiquidCategory(flashPointC + 273.15, boilingPointC + 273.15)).toBe(category);
    },
  );

  test('of an unknown boiling point the greater danger is taken', () => {
    expect(flammableLiquidCategory(273.15, undefined)).toBe('1');
    expect(flammableLiquidCategory(313.15, undefined)).toBe('3');
  });
});
