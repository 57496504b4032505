import { describe, expect, test } from 'vitest';
import { findingsOf } from '../../../server/findings/registry.ts';
import { gatherFiles, hasFailed } from '../../../server/report/gather.ts';
import { jsonDocument, jsonReport } from '../../../server/report/json.ts';
import type { EvaluatedFile, EvaluatedScenario, Expectation } from '../../../server/scenario/scenario.ts';
import { checkContract, evaluateContract } from '../../support/json-contract.ts';
import { definition, figure, file, placeIn, quantity, scenario } from '../../support/scenario-builder.ts';

const TEXT = `let days_worked = 210 per year

blend slurry {
  30 % mass sodum
}

expect lower heating value of slurry > 33 MJ/kg
`;

const products = {
  id: 'complete-combustion-products',
  label: 'Products',
  columns: [
    { id: 'substance', label: 'Product', unit: null },
    { id: 'amount', label: 'Amount', unit: 'mol/kg' },
  ],
  rows: [
    ['Na2CO3(cr)', 1.93],
    ['NaOH(cr)', Number.NaN],
    ['H2O(g)', null],
  ],
};

const expectation: Expectation = {
  place: placeIn('trial.stoke', TEXT, 'expect lower heating value of slurry > 33 MJ/kg'),
  holds: true,
  found: quantity(35.5, 'MJ/kg', 0.2),
  unit: 'MJ/kg',
};

function trial(more: Parameters<typeof file>[1] = {}): EvaluatedFile {
  return file(TEXT, {
    definitions: [
      definition(
        TEXT,
        'blend',
        'slurry',
        [
          figure('lower-heating-value', 35.5, 'MJ/kg', { uncertainty: 0.2 }),
          figure('flash-point', 338.15, 'K'),
          figure('density', Number.NaN, 'kg/m3'),
        ],
        [products],
      ),
    ],
    values: [
      {
        name: 'days_worked',
        place: placeIn('trial.stoke', TEXT, 'let days_worked = 210 per year'),
        namePlace: placeIn('trial.stoke', TEXT, 'days_worked'),
        quantity: quantity(210, '1/year'),
      },
      {
        name: 'unknown',
        place: placeIn('trial.stoke', TEXT, 'let'),
        namePlace: placeIn('trial.stoke', TEXT, 'let'),
        quantity: null,
      },
    ],
    facts: [['sodum', { code: 'name/unknown', what: 'substance', word: 'sodum', near: ['sodium'] }]],
    expectations: [expectation],
    ...more,
  });
}

function gathered(...scenarios: readonly EvaluatedScenario[]): ReturnType<typeof gatherFiles> {
  return gatherFiles(scenarios.map((one) => ({ scenario: one, findings: findingsOf(one) })));
}

describe('the document of evaluate', () => {
  test('has the form and units of the contract', () => {
    const document = jsonDocument(gathered(scenario(trial())), 'evaluate');
    expect(document).toEqual({
      schema: 1,
      files: [
        {
          path: 'trial.stoke',
          used: false,
          definitions: [
            {
              kind: 'blend',
              name: 'slurry',
              line: 3,
              figures: [
                {
                  id: 'lower-heating-value',
                  label: 'lower heating value',
                  value: near(35.5, 12),
                  unit: 'MJ/kg',
                  uncertainty: near(0.2, 12),
                },
                { id: 'flash-point', label: 'flash point', value: 338.15, unit: 'K', uncertainty: null },
              ],
              tables: [
                {
                  id: 'complete-combustion-products',
                  columns: [
                    { id: 'substance', unit: null },
                    { id: 'amount', unit: 'mol/kg' },
                  ],
                  rows: [
                    ['Na2CO3(cr)', 1.93],
                    ['NaOH(cr)', null],
                    ['H2O(g)', null],
                  ],
                },
              ],
            },
          ],
          values: [{ name: 'days_worked', line: 1, value: near(6.6545e-6, 10), unit: '1/s', uncertainty: null }],
          findings: [
            {
              code: 'name/unknown',
              severity: 'error',
              message: containing('Did you mean `sodium`?'),
              line: 4,
              column: 13,
              endLine: 4,
              endColumn: 18,
              acknowledged: false,
            },
          ],
          expectations: [
            {
              line: 7,
              column: 1,
              endLine: 7,
              endColumn: 48,
              holds: true,
              found: near(35.5, 12),
              unit: 'MJ/kg',
            },
          ],
        },
      ],
    });
    expect(evaluateContract.parse(JSON.parse(jsonReport(gathered(scenario(trial())), 'evaluate')))).toBeTruthy();
  });

  test('what was compared without a single reference is in SI, what is not known is null', () => {
    const place = expectation.place;
    const expectations: Expectation[] = [
      { place, holds: false, found: quantity(35.5, 'MJ/kg'), unit: null },
      { place, holds: null, found: null, unit: 'MJ/kg' },
      { place, holds: true, found: quantity(0.3, '1'), unit: null },
    ];
    const [answered] = jsonDocument(gathered(scenario(trial({ expectations }))), 'evaluate').files;
    expect(answered?.expectations.map(({ holds, found, unit }) => ({ holds, found, unit }))).toEqual([
      { holds: false, found: 35.5e6, unit: 'J/kg' },
      { holds: null, found: null, unit: null },
      { holds: true, found: 0.3, unit: '1' },
    ]);
  });

  test('ends with a newline and holds no NaN', () => {
    const text = jsonReport(gathered(scenario(trial())), 'evaluate');
    expect(text.endsWith('}\n')).toBe(true);
    expect(text).not.toMatch(/NaN|Infinity/);
  });
});

test('the document of check goes without definitions and values', () => {
  const document = JSON.parse(jsonReport(gathered(scenario(trial())), 'check')) as unknown;
  expect(checkContract.parse(document)).toEqual(document);
});

describe('several files', () => {
  const shared = (facts: EvaluatedFile['facts'] = [], used = true): EvaluatedFile => ({
    ...file('blend a {}\n', { path: 'shared.stoke', used }),
    facts,
  });
  const duplicate = {
    fact: { code: 'name/duplicate', name: 'a', others: [] },
    place: placeIn('shared.stoke', 'blend a {}\n', 'a {'),
  } as const;

  test('each is told once, named ones first and as named', () => {
    const first = scenario(file('', { path: 'one.stoke' }), shared());
    const second = scenario(file('', { path: 'two.stoke' }), shared());
    expect(gathered(first, second).map((one) => [one.file.path, one.used])).toEqual([
      ['one.stoke', false],
      ['two.stoke', false],
      ['shared.stoke', true],
    ]);
    expect(gathered(first, scenario(shared([], false))).map((one) => [one.file.path, one.used])).toEqual([
      ['one.stoke', false],
      ['shared.stoke', false],
    ]);
  });

  test('a used file keeps the findings of all that reach it, each once', () => {
    const first = scenario(file('', { path: 'one.stoke' }), shared());
    const second = scenario(file('', { path: 'two.stoke' }), shared([duplicate]));
    const third = scenario(file('', { path: 'three.stoke' }), shared([duplicate]));
    const files = gathered(first, second, third);
    expect(files.find((one) => one.used)?.findings.map(({ code }) => code)).toEqual(['name/duplicate']);
    expect(hasFailed(files, false)).toBe(true);
  });
});

describe('whether a run has failed', () => {
  const noFacts = { facts: [] };
  test.each([
    ['nothing found', noFacts, false, false],
    ['an error', {}, true, true],
    ['a failed claim', { ...noFacts, expectations: [{ ...expectation, holds: false }] }, true, true],
    [
      'a claim that could not be worked out',
      { ...noFacts, expectations: [{ ...expectation, holds: null }] },
      false,
      false,
    ],
  ])('%s', (_, more, lenient, strict) => {
    const files = gathered(scenario({ ...trial(), ...more }));
    expect([hasFailed(files, false), hasFailed(files, true)]).toEqual([lenient, strict]);
  });

  test('a warning counts only where asked for; a note never', () => {
    const warned = file('x', { facts: [['x', { code: 'balance/no-data', what: 'it', missing: ['a'] }]] });
    const noted = file('x', { facts: [['x', { code: 'kind/not-evaluated', kind: 'burn', name: 'x' }]] });
    expect([hasFailed(gathered(scenario(warned)), false), hasFailed(gathered(scenario(warned)), true)]).toEqual([
      false,
      true,
    ]);
    expect(hasFailed(gathered(scenario(noted)), true)).toBe(false);
  });
});

/** As `expect.closeTo`, whose type says nothing. */
function near(value: number, digits: number): unknown {
  return expect.closeTo(value, digits);
}

function containing(text: string): unknown {
  return expect.stringContaining(text);
}
