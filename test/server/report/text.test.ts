import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import { gatherFiles } from '../../../server/report/gather.ts';
import { noPaint, terminalPaint } from '../../../server/report/paint.ts';
import { textReport, type TextOptions } from '../../../server/report/text.ts';
import type { EvaluatedFile } from '../../../server/scenario/scenario.ts';
import { definition, figure, file, placeIn, quantity, scenario } from '../../support/scenario-builder.ts';

const TEXT = `scenario "A trial"
let days_worked = 210 per year
## What is burnt.
blend slurry {
  30 % mass sodum
  rest gas_oil
}
reaction route {
  2 H2(g) + O2(g) -> 2 H2O(l)
}
burn fire {}
expect lower heating value of slurry > 33 MJ/kg
`;

function at(words: string) {
  return placeIn('trial.stoke', TEXT, words);
}

function trial(more: Parameters<typeof file>[1] = {}): EvaluatedFile {
  return file(TEXT, {
    title: 'A trial',
    values: [
      {
        name: 'days_worked',
        place: at('let days_worked = 210 per year'),
        namePlace: at('days_worked'),
        quantity: quantity(210, '1/year'),
      },
    ],
    definitions: [
      {
        ...definition(
          TEXT,
          'blend',
          'slurry',
          [
            figure('lower-heating-value', 35.461, 'MJ/kg', { uncertainty: 0.14, label: 'Lower heating value, per kg' }),
            figure('density', 850.3, 'kg/m3', { label: 'Density' }),
            figure('biogenic-carbon-share', 0.98, '1', { label: 'Biogenic share of the carbon' }),
            figure('flash-point', 338.15, 'K', { label: 'Flash point' }),
          ],
          [
            {
              id: 'portions',
              label: 'Portions',
              columns: [
                { id: 'substance', label: 'Substance', unit: null },
                { id: 'mass-share', label: 'Mass', unit: '1' },
              ],
              rows: [
                ['sodium', 0.3],
                ['gas_oil', 0.7],
              ],
            },
          ],
        ),
        absent: new Map([
          ['molar-mass', ['the molar mass of gas_oil']],
          ['formation-enthalpy', ['the molar mass of gas_oil']],
          ['density', ['the density of sodium']],
          ['water-made', null],
        ]),
      },
      definition(TEXT, 'reaction', 'route', [figure('enthalpy', -571.66, 'kJ', { label: 'Enthalpy' })]),
      definition(TEXT, 'burn', 'fire', []),
    ],
    facts: [
      ['sodum', { code: 'name/unknown', what: 'substance', word: 'sodum', near: ['sodium'] }],
      ['burn fire', { code: 'kind/not-evaluated', kind: 'burn', name: 'fire' }],
    ],
    expectations: [
      {
        place: at('expect lower heating value of slurry > 33 MJ/kg'),
        holds: true,
        found: quantity(35.461, 'MJ/kg'),
        unit: 'MJ/kg',
      },
    ],
    ...more,
  });
}

function told(files: readonly EvaluatedFile[], options: Partial<TextOptions> = {}): string {
  const one = scenario(...files);
  const gathered = gatherFiles([{ scenario: one, findings: findingsOf(one) }]);
  return textReport(gathered, { extent: 'evaluate', paint: noPaint, width: 100, ...options });
}

test('a whole file, as a person reads it', () => {
  expect(told([trial()])).toBe(`trial.stoke  A trial

  days_worked  =  210 per year

blend slurry
  What is burnt.
  Lower heating value, per kg    35.46 ± 0.14  MJ/kg
  Density                       850.3          kg/m³
  Biogenic share of the carbon   98            %
  Flash point                   338.1          K (65 °C)
  Without the molar mass of gas_oil there is no molar mass or formation enthalpy.

  Portions
    Substance  Mass, %
    sodium          30
    gas_oil         70

reaction route
  2 H2(g) + O2(g) → 2 H2O(l)
  Enthalpy  −571.7  kJ

Expected
  ✓ lower heating value of slurry > 33 MJ/kg  found 35.46 MJ/kg

trial.stoke:5:13: error: Neither the catalogue nor this scenario has a substance or blend called \`sodum\`. Did you mean \`sodium\`? [name/unknown]
    5 |   30 % mass sodum
      |             ^^^^^

Read but not worked out by this version: burn fire.

1 file: 1 error, 1 note; 1 expectation met
`);
});

test('check tells the findings and no figures', () => {
  const text = told([trial()], { extent: 'check' });
  expect(text).toMatch(/^trial\.stoke:5:13: error: /);
  expect(text).not.toContain('Density');
});

test('nothing wrong is one line', () => {
  expect(told([trial({ facts: [] })], { extent: 'check' })).toBe('1 file: no findings; 1 expectation met\n');
});

test('a used file shows its findings only', () => {
  const text = told([file('', { path: 'one.stoke' }), { ...trial(), path: 'trial.stoke', used: true }]);
  expect(text).toContain('trial.stoke:5:13: error:');
  expect(text).not.toContain('blend slurry');
});

test('failed and unknown claims', () => {
  const place = at('expect lower heating value of slurry > 33 MJ/kg');
  const text = told([
    trial({
      facts: [],
      expectations: [
        { place, holds: false, found: quantity(32.1, 'MJ/kg'), unit: 'MJ/kg' },
        { place, holds: null, found: null, unit: null },
      ],
    }),
  ]);
  expect(text).toContain('✗ lower heating value of slurry > 33 MJ/kg  found 32.1 MJ/kg');
  expect(text).toContain('– lower heating value of slurry > 33 MJ/kg  not worked out');
  expect(text).toContain('; 1 expectation failed, 1 not worked out');
});

test('a reaction that balances has no table of differences, one that does not has', () => {
  const elements = (difference: number) => ({
    id: 'elements',
    label: 'Elements',
    columns: ['left', 'right', 'difference'].map((id) => ({ id, label: id, unit: '1' })),
    rows: [
      [2, 2, 0],
      [2, 2 + difference, difference],
    ],
  });
  const with_ = (difference: number): string =>
    told([trial({ definitions: [definition(TEXT, 'reaction', 'route', [], [elements(difference)])] })]);
  expect(with_(0)).not.toContain('Elements');
  expect(with_(1)).toContain('Elements');
});

describe('colour', () => {
  test('changes no letter and no column', () => {
    const painted = told([trial()], { paint: terminalPaint });
    expect(painted).toContain('\u001b[');
    expect(painted.replace(/\u001b\[\d+m/g, '')).toBe(told([trial()]));
  });

  test('is absent unless told', () => {
    expect(told([trial()])).not.toContain('\u001b');
  });
});

describe('lines of source', () => {
  const frame = (text: string, words: string, width = 100): string[] => {
    const one = file(text, { facts: [[words, { code: 'balance/no-portions', name: 'x' }]] });
    return told([one], { extent: 'check', width }).split('\n').slice(1, 3);
  };

  test('tabs are widened, and the carets follow', () => {
    expect(frame('\tx = abc', 'abc')).toEqual(['    1 |     x = abc', '      |         ^^^']);
  });

  test('what goes over the line is marked to its end', () => {
    expect(frame('a b {\n c\n}', 'b {\n c\n}')).toEqual(['    1 | a b {', '      |   ^^^']);
  });

  test('a long line is shown around what is meant', () => {
    const [source = '', carets = ''] = frame(`${'a '.repeat(200)}wrong${' b'.repeat(200)}`, 'wrong');
    expect(source.length).toBeLessThanOrEqual(100);
    expect(source.slice(carets.indexOf('^'), carets.lastIndexOf('^') + 1)).toBe('wrong');
  });

  test('an empty line and an empty place still give a verdict', () => {
    expect(frame('', '')).toEqual(['', '1 file: 1 error']);
  });

  test('no control character of a file reaches the terminal', () => {
    const text = 'let \u001b[31mred\u202e = 1';
    const one = file(text, {
      facts: [['red', { code: 'name/unknown', what: 'value', word: 'r\u001b[2Jed', near: [] }]],
    });
    expect(told([one])).not.toMatch(/[\u001b\u202e]/);
  });
});
