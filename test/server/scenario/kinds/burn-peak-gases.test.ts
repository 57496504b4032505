// NO and CO in the units of emissions, against the shares they are made from and the constants of the cubic metre.
import { expect, test } from 'vitest';
import { evaluate } from '../../../../server/scenario/evaluate.ts';
import type { Table } from '../../../../server/scenario/scenario.ts';

function tablesOf(oxidant: string, lambda: number): readonly Table[] {
  const text = `burn furnace {\n  fuel: methane\n  oxidant: ${oxidant}\n  lambda: ${String(lambda)}\n  flame zone: lambda 0.9\n}\n`;
  const scenario = evaluate('a.stoke', () => ({ text }));
  return scenario.files[0]?.definitions[0]?.tables ?? [];
}

function cell(tables: readonly Table[], id: string, row: string, column: string): number | null {
  const table = tables.find((one) => one.id === id);
  const index = table?.columns.findIndex((one) => one.id === column) ?? -1;
  const found = table?.rows.find(([name]) => name === row)?.[index];
  if (found === undefined || typeof found === 'string') throw new Error(`${id} ${row} ${column}`);
  return found;
}

test('parts per million, mass in a dry normal cubic metre, and brought to 15 % of oxygen', () => {
  const tables = tablesOf('air', 1.5);
  const peak = (row: string, column: string): number => cell(tables, 'peak-gases', row, column) ?? NaN;
  const share = (row: string): number => cell(tables, 'products', row, 'dry-mole-share') ?? NaN;
  expect(peak('NO(g)', 'dry-concentration')).toBeCloseTo(share('NO(g)') * 1e6, 6);
  expect(peak('NO(g)', 'wet-concentration')).toBeLessThan(peak('NO(g)', 'dry-concentration'));
  // 1 ppm is 2.053 mg/m³ as NO2 and 1.250 mg/m³ of CO (46.006 and 28.010 g/mol over 22.414 L/mol).
  expect(peak('NO(g)', 'mass-concentration') / peak('NO(g)', 'dry-concentration')).toBeCloseTo(46.0055 / 22.41397, 4);
  expect(peak('CO(g)', 'mass-concentration') / peak('CO(g)', 'dry-concentration')).toBeCloseTo(28.0101 / 22.41397, 4);
  const toReference = (21 - 15) / (21 - 100 * share('O2(g)'));
  expect(peak('NO(g)', 'reference-mass-concentration') / peak('NO(g)', 'mass-concentration')).toBeCloseTo(
    toReference,
    9,
  );
  expect(cell(tables, 'flame-zone-peak-gases', 'CO(g)', 'flame-zone-dry-concentration')).toBeGreaterThan(1e4);
});

test('no reference oxygen where it is not burnt in air, or hardly anything is burnt in it', () => {
  expect(cell(tablesOf('O2', 1.5), 'peak-gases', 'CO(g)', 'reference-mass-concentration')).toBeNull(); // prettier-ignore
  expect(cell(tablesOf('air', 40), 'peak-gases', 'NO(g)', 'reference-mass-concentration')).toBeNull();
  expect(cell(tablesOf('air', 40), 'peak-gases', 'NO(g)', 'mass-concentration')).toBeGreaterThan(0);
});
