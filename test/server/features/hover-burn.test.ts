// What a burn's hover tells, on a burn made by hand: temperature first, then what is condensed, six leading products, and
// one line each for carbon and alkali, in the flame and where it is coldest.
import { expect, test } from 'vitest';
import { hoverDefinition } from '../../../server/features/hover-definition.ts';
import { asPlainText, MOST_LINES } from '../../../server/features/hover-text.ts';
import type { Table } from '../../../server/scenario/scenario.ts';
import { definition, figure } from '../../support/scenario-builder.ts';

const TEXT = 'burn furnace {\n}\n';

const products: Table = {
  id: 'products',
  label: 'Products',
  columns: [
    { id: 'substance', label: 'Product', unit: null },
    { id: 'amount', label: 'Amount', unit: 'mol/kg' },
    { id: 'mass-share', label: 'by mass', unit: '1' },
  ],
  rows: [
    ['N2(g)', 500, 0.7],
    ['CO2(g)', 60, 0.15],
    ['H2O(g)', 50, 0.07],
    ['O2(g)', 30, 0.05],
    ['NaOH(g)', 8, 0.02],
    ['Ar(g)', 3, 0.009],
    ['CO(g)', 1, 0.001],
  ],
};

const fateColumns: Table['columns'] = [
  { id: 'form', label: 'Form', unit: null },
  { id: 'temperature', label: 'Temperature', unit: 'K' },
  { id: 'element', label: 'Element', unit: null },
  { id: 'gas-share', label: 'in gas', unit: '1' },
  { id: 'condensed-share', label: 'condensed', unit: '1' },
];

const fates: readonly Table[] = [
  {
    id: 'carbon-fate',
    label: 'Carbon',
    columns: fateColumns,
    rows: [
      ['carbon monoxide', 2200, 'C', 0.0204, 0],
      ['carbon dioxide', 2200, 'C', 0.9796, 0],
      ['carbon dioxide', 1173.15, 'C', 0.88, 0],
      ['carbonate', 1173.15, 'C', 0, 0.12],
    ],
  },
  {
    id: 'alkali-fate',
    label: 'Alkali',
    columns: fateColumns,
    rows: [
      ['hydroxide', 2200, 'Na', 0.98, 0],
      ['oxide', 2200, 'Na', 0.0005, 0],
      ['metal', 2200, 'Na', 0.0195, 0],
      ['carbonate', 1173.15, 'Na', 0.001, 0.999],
    ],
  },
];

const figures = [
  figure('flame-temperature', 2200, 'K', { label: 'Flame temperature' }),
  figure('pressure', 150, 'bar', { label: 'Pressure' }),
  figure('condensed-share', 0.018, '1', { label: 'Condensed' }),
];

const place = { path: 'trial.stoke', start: 5, end: 12 };

test('temperature, condensed share, leading products, carbon and alkali, and where gases are not ideal', () => {
  const text = asPlainText(hoverDefinition(place, definition(TEXT, 'burn', 'furnace', figures, [products, ...fates])));
  expect(text.split('\n')).toEqual([
    '2200 K (1927 °C): Flame temperature',
    'Burn furnace',
    'Condensed: 1.8 %',
    'Pressure: 150 bar',
    'Leading products, by mass: N2(g) 70 %, CO2(g) 15 %, H2O(g) 7 %, O2(g) 5 %, NaOH(g) 2 %, Ar(g) 0.9 %',
    'Carbon: 98 % carbon dioxide and 2.04 % carbon monoxide in the flame; 88 % carbon dioxide and 12 % carbonate at 900 °C',
    'Alkali (Na): 98 % hydroxide and 1.95 % metal in the flame; 100 % carbonate at 900 °C',
    'Above 100 bar real gases differ from ideal ones by several percent.',
  ]);
});

test('a burn without cooled states, carbon or alkali tells what it has, and never too much', () => {
  const many = Array.from({ length: 12 }, (_, index) => figure(`figure-${index}`, index, '1'));
  const burnt = definition(
    TEXT,
    'burn',
    'furnace',
    [...figures.slice(0, 1), ...many],
    [products, { ...fates[0], id: 'carbon-fate', label: 'Carbon', columns: fateColumns, rows: [] }],
  );
  const lines = asPlainText(hoverDefinition(place, burnt)).split('\n');
  expect(lines.filter((line) => /^(Carbon|Alkali)/.test(line))).toEqual([]);
  expect(lines.at(-1)).toBe('and 8 more figures');
  expect(lines.length).toBeLessThanOrEqual(MOST_LINES);
});
