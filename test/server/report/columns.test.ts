import { expect, test } from 'vitest';
import { alignedAtPoint, columns, cut, figureLines, tableLines } from '../../../server/report/columns.ts';
import type { Table } from '../../../server/scenario/scenario.ts';

test('numbers stand with their points in one column', () => {
  expect(alignedAtPoint(['35.46 ± 0.14', '−1131', '0.1452', '–', '1.205 × 10⁻⁷', '120'])).toEqual([
    '   35.46 ± 0.14 ',
    '−1131           ',
    '    0.1452      ',
    '    –           ',
    '    1.205 × 10⁻⁷',
    '  120           ',
  ]);
});

test('columns are as wide as their widest cell, and no line ends in blanks', () => {
  expect(
    columns([
      ['a', 'b'],
      ['long', ''],
      ['', 'x'],
    ]),
  ).toEqual(['a     b', 'long', '      x']);
  expect(columns([])).toEqual([]);
});

test('a text is cut with a mark', () => {
  expect([cut('abcdef', 4), cut('abcd', 4), cut('😀😀😀', 2)]).toEqual(['abc…', 'abcd', '😀…']);
});

const WIDE = { room: 100, celsius: false };
const lines = (table: Table, look = WIDE): string[] => tableLines(table, look);

test('a table that is wider than the room goes on below, its first column with it', () => {
  const table: Table = {
    id: 'products',
    label: 'Products',
    columns: [
      { id: 'substance', label: 'Product', unit: null },
      { id: 'amount', label: 'Amount', unit: 'mol/kg' },
      { id: 'pressure', label: 'Pressure', unit: 'bar' },
    ],
    rows: [['N2(g)', 500, 1]],
  };
  expect(lines(table, { room: 26, celsius: false })).toEqual([
    'Product  Amount, mol/kg',
    'N2(g)               500',
    '',
    'Product  Pressure, bar',
    'N2(g)                1',
  ]);
  // A column that is wider by itself stays whole.
  expect(lines(table, { room: 10, celsius: false })).toHaveLength(5);
});

test('temperatures in °C for those who write them so; pairs of a vapour as such', () => {
  const table: Table = {
    id: 'products',
    label: 'Products',
    columns: [
      { id: 'substance', label: 'Product', unit: null },
      { id: 'temperature', label: 'Temperature', unit: 'K' },
      { id: 'temperature-difference', label: 'Difference', unit: 'K' },
    ],
    rows: [['Na2O2H2(g)', 623.15, 10]],
  };
  expect(lines(table, { room: 100, celsius: true })).toEqual([
    'Product     Temperature, °C  Difference, K',
    '(NaOH)2(g)              350             10',
  ]);
  expect(lines(table)[0]).toBe('Product     Temperature, K  Difference, K');
});

test('labels that leave no room for their number go on below', () => {
  expect(
    figureLines(
      [
        ['Heat released down to 25 °C, per kg of fuel', '48.30', 'MJ/kg'],
        ['Pressure', ' 1   ', 'bar'],
      ],
      44,
    ),
  ).toEqual([
    'Heat released down to 25 °C,  48.30  MJ/kg',
    '  per kg of fuel',
    'Pressure                       1     bar',
  ]);
});

test('a table: headings with units, shares in percent, empty columns left out', () => {
  const share = (id: string) => ({ id, label: id.split('-')[0] ?? '', unit: '1' });
  expect(
    lines({
      id: 'portions',
      label: 'Portions',
      columns: [
        { id: 'substance', label: 'substance', unit: null },
        share('mass-share'),
        share('volume-share'),
        { id: 'd', label: 'density', unit: 'kg/m3' },
      ],
      rows: [
        ['sodium', 0.3, null, 968],
        ['sodium oleate', 0.02, null, null],
        ['renewable_diesel', 0.68, null, 780.25],
      ],
    }),
  ).toEqual([
    'substance         mass, %  density, kg/m³',
    'sodium                 30           968',
    'sodium oleate           2             –',
    'renewable_diesel       68           780.3',
  ]);
});
