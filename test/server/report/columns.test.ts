import { expect, test } from 'vitest';
import { alignedAtPoint, columns, cut, tableLines } from '../../../server/report/columns.ts';

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

test('a table: headings with units, shares in percent, empty columns left out', () => {
  const share = (id: string) => ({ id, label: id.split('-')[0] ?? '', unit: '1' });
  expect(
    tableLines({
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
