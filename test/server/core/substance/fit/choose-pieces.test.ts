// The fit on tables whose true curve is known, the cutting of tables, and the meeting points between them.

import { describe, expect, test } from 'vitest';
import { choosePieces } from '../../../../../server/core/substance/fit/choose-pieces.ts';
import { findMeetingPoints } from '../../../../../server/core/substance/fit/meeting-points.ts';
import { gibbsInTable, readSourceTable, withSetAside } from '../../../../../server/core/substance/fit/source-table.ts';
import type { SourceRecord, SourceTransition } from '../../../../../server/core/substance/fit/source-table.ts';
import { gasConstantJPerMolK } from '../../../../../server/core/substance/heat-capacity-terms.ts';

const header = 'T_K,cp_J_per_mol_K,s_J_per_mol_K,h_minus_h298_kJ_per_mol';

function record(
  id: string,
  transitions: readonly SourceTransition[] = [],
  more: Partial<SourceRecord> = {},
): SourceRecord {
  return {
    id,
    name: id,
    formula: 'NaCl',
    structure: 'NaCl',
    form: null,
    phase: 'crystal',
    charge: 0,
    dfH298_kJ_per_mol: 0,
    S298_J_per_mol_K: 50,
    stableRanges_K: [],
    transitions,
    janafTable: 'X-001',
    ...more,
  };
}

/** A table of a constant heat capacity of `r` gas constants up to a transition and twice that above. */
function steppedTable(r: number, stepK: number, heatKJ: number): string {
  const row = (temperatureK: number, isAbove: boolean): string => {
    const below = Math.min(temperatureK, stepK);
    let entropy = 50 + r * gasConstantJPerMolK * Math.log(below / 298.15);
    let enthalpy = (r * gasConstantJPerMolK * (below - 298.15)) / 1000;
    if (isAbove) {
      entropy += (heatKJ * 1000) / stepK + 2 * r * gasConstantJPerMolK * Math.log(temperatureK / stepK);
      enthalpy += heatKJ + (2 * r * gasConstantJPerMolK * (temperatureK - stepK)) / 1000;
    }
    const heatCapacity = (isAbove ? 2 : 1) * r * gasConstantJPerMolK;
    return [temperatureK, heatCapacity, entropy, enthalpy].join(',');
  };
  return [
    header,
    row(100, false),
    ...[200, 298.15, 300, 400, stepK].map((temperatureK) => row(temperatureK, false)),
    ...[stepK, 600, 700, 800, 900].map((temperatureK) => row(temperatureK, true)),
  ].join('\n');
}

const step: SourceTransition = { T_K: 500, kind: 'crystal-crystal', dH_kJ_per_mol: 2, pairInTable: true };

describe('cutting a table', () => {
  test('starts at 200 K and cuts at the pair of rows', () => {
    const { stretches } = readSourceTable(record('x', [step]), steppedTable(3, 500, 2));
    expect(stretches.map(({ rows }) => rows.map((row) => row.temperatureK))).toEqual([
      [200, 298.15, 300, 400, 500],
      [500, 600, 700, 800, 900],
    ]);
    expect(stretches[1]?.begins).toEqual({ kind: 'crystal-crystal', enthalpyKJ: 2 });
  });

  test('leaves out rows that contradict the rest', () => {
    const { stretches } = readSourceTable(record('x', [step], { trustedFrom_K: 298.15 }), steppedTable(3, 500, 2));
    expect(stretches[0]?.rows[0]?.temperatureK).toBe(298.15);
  });

  test('refuses a pair without a transition, and one whose heat is another', () => {
    expect(() => readSourceTable(record('x'), steppedTable(3, 500, 2))).toThrow('without a transition');
    expect(() => readSourceTable(record('x', [step]), steppedTable(3, 500, 2.1))).toThrow('enthalpy of transition');
    expect(() => readSourceTable(record('x'), 'T,cp\n1,2')).toThrow('x: T,cp');
  });

  test('Gibbs energy between rows follows the curve, not the chord', () => {
    const table = readSourceTable(record('x', [step]), steppedTable(3, 500, 2));
    const temperatureK = 350;
    const exact =
      (3 * gasConstantJPerMolK * (temperatureK - 298.15)) / 1000 -
      (temperatureK * (50 + 3 * gasConstantJPerMolK * Math.log(temperatureK / 298.15))) / 1000;
    // The chord of the neighbouring rows is off by 0.09 kJ/mol.
    expect(Math.abs((gibbsInTable(table, temperatureK) ?? 0) - exact)).toBeLessThan(0.002);
    expect(gibbsInTable(table, 950)).toBeUndefined();
  });
});

describe('choosing pieces', () => {
  test('a constant heat capacity is one term a stretch, however many rows there are', () => {
    const { stretches } = readSourceTable(record('x', [step]), steppedTable(3, 500, 2));
    const fitted = choosePieces(stretches, []);
    expect(fitted.pieces.map(({ fromK, terms }) => [fromK, terms])).toEqual([
      [200, [2]],
      [500, [2]],
    ]);
    expect(fitted.terms.map((terms) => terms[2])).toEqual([expect.closeTo(3, 9), expect.closeTo(6, 9)]);
    expect(fitted.worst).toBeLessThan(1e-6);
  });

  test('a kink that no polynomial follows becomes a join right there', () => {
    // cp/R = 3 up to 600 K and rising by 1 each 100 K from there.
    const lines = [298.15, ...Array.from({ length: 12 }, (_, k) => 300 + 100 * k)].map((temperatureK) => {
      const above = Math.max(0, temperatureK - 600);
      const heatCapacity = (3 + above / 100) * gasConstantJPerMolK;
      const enthalpy = gasConstantJPerMolK * (3 * (temperatureK - 298.15) + above ** 2 / 200);
      const beyond = above === 0 ? 0 : above / 100 - 6 * Math.log(temperatureK / 600);
      const entropy = 50 + gasConstantJPerMolK * (3 * Math.log(temperatureK / 298.15) + beyond);
      return [temperatureK, heatCapacity, entropy, enthalpy / 1000].join(',');
    });
    const { stretches } = readSourceTable(record('x'), [header, ...lines].join('\n'));
    const fitted = choosePieces(stretches, []);
    expect(fitted.pieces.map(({ fromK }) => fromK)).toEqual([298.15, 600]);
    expect(fitted.worst).toBeLessThan(0.01);
  });

  test('a Gibbs energy that is asked for is met exactly, at the cost of the rest', () => {
    const { stretches } = readSourceTable(record('x', [step]), steppedTable(3, 500, 2));
    const free = choosePieces(stretches, []);
    const bound = choosePieces(stretches, [{ temperatureK: 800, gibbsKJ: -60.5 }]);
    expect(free.worst).toBeLessThan(1e-6);
    expect(bound.worst).toBeGreaterThan(free.worst);
  });

  test('a value that is set aside does not pull, and its heat is taken up at once', () => {
    const spoiled = steppedTable(3, 500, 2).replace(/^400,[^,]+/m, '400,99');
    const table = readSourceTable(record('x', [step]), spoiled);
    expect(choosePieces(table.stretches, []).pieces.length).toBeGreaterThan(2);
    const aside = withSetAside(table, [
      { atK: 400, values: ['heatCapacity'] },
      { atK: 500, values: [], heatKJ: 1.5 },
    ]);
    expect(aside.stretches[1]?.begins?.enthalpyKJ).toBe(1.5);
    const fitted = choosePieces(withSetAside(table, [{ atK: 400, values: ['heatCapacity'] }]).stretches, []);
    expect(fitted.terms[0]?.[2]).toBeCloseTo(3, 6);
  });
});

test('phases meet where a transition is marked or a stable range ends, once each, at one Gibbs energy', () => {
  const melting = { T_K: 700, kind: 'melting', dH_kJ_per_mol: 5 } as const;
  const crystal = readSourceTable(
    record('c', [step, { ...melting, with: 'l' }], { stableRanges_K: [[0, 700]] }),
    steppedTable(3, 500, 2),
  );
  const liquid = readSourceTable(
    record('l', [step, { ...melting, with: 'c' }], {
      stableRanges_K: [[700, 900]],
      phase: 'liquid',
      dfH298_kJ_per_mol: 1,
    }),
    steppedTable(3, 500, 2),
  );
  const points = findMeetingPoints([liquid, crystal]);
  expect(points).toHaveLength(1);
  expect(points[0]).toMatchObject({ temperatureK: 700, phases: ['c', 'l'], kind: 'melting', enthalpyKJ: 5 });
  const both = (gibbsInTable(crystal, 700) ?? 0) + (gibbsInTable(liquid, 700) ?? 0);
  expect(points[0]?.gibbsKJ).toBeCloseTo(both / 2, 9);
});
