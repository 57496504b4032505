// What every code says, one row a shape of its fact: the messages are read here as a person reads them.
import { describe, expect, test } from 'vitest';
import { allCodes, findingsIn } from '../../../server/findings/registry.ts';
import type { Fact } from '../../../server/scenario/facts.ts';
import { file } from '../../support/scenario-builder.ts';
import { LANGUAGE_ROWS } from './language-messages.ts';
import { MATERIAL_ROWS } from './material-messages.ts';
import { RANGE_ROWS } from './range-messages.ts';
import { SEA_MILD, SEA_ROWS } from './sea-messages.ts';
import { WORK_MILD, WORK_ROWS } from './work-messages.ts';

const ROWS: readonly (readonly [Fact, string])[] = [
  ...WORK_ROWS,
  ...SEA_ROWS,
  ...LANGUAGE_ROWS,
  ...MATERIAL_ROWS,
  ...RANGE_ROWS,
];

test.each(ROWS)('%s', (fact, message) => {
  const [finding] = findingsIn(file('10', { facts: [['10', fact]] }));
  expect(finding?.message).toBe(message);
  expect(finding?.code).toBe(fact.code);
});

describe('every code', () => {
  test.each(allCodes())('%s has the form area/what', (code) => {
    expect(code).toMatch(/^[a-z]+\/[a-z]+(-[a-z]+)*$/);
  });

  test('has a row here', () => {
    const shown = new Set(ROWS.map(([fact]) => fact.code));
    const syntax = ['syntax/too-deep', 'syntax/too-large', 'syntax/unclosed', 'syntax/unexpected'];
    // All hazards are said by one file, from their rules' words; rows here show its shapes.
    const others = allCodes().filter((code) => !shown.has(code) && !code.startsWith('hazard/'));
    expect(others).toEqual(syntax);
  });

  test('is an error only where the program cannot mean anything', () => {
    const mild = ROWS.flatMap(([fact]) => {
      const [finding] = findingsIn(file('10', { facts: [['10', fact]] }));
      return finding && finding.severity !== 'error' ? [`${finding.severity} ${finding.code}`] : [];
    });
    const others = mild.filter((one) => !WORK_MILD.includes(one) && !SEA_MILD.includes(one));
    expect(mild.filter((one) => WORK_MILD.includes(one)).sort()).toEqual([...WORK_MILD].sort());
    expect(mild.filter((one) => SEA_MILD.includes(one)).sort()).toEqual([...SEA_MILD].sort());
    expect(others.sort()).toEqual([
      'information balance/water-missing',
      'information balance/water-missing',
      'information hazard/low-flash-point',
      'information hazard/water-reactive',
      'information kind/not-evaluated',
      'information kind/suspended',
      'information name/like-catalogue',
      'information range/burn-out',
      'information range/cold-charge',
      'information range/phase',
      'information range/real-gas',
      'information range/rich',
      'information range/rich',
      'warning balance/contradiction',
      'warning balance/contradiction',
      'warning balance/no-data',
      'warning hazard/blanket',
      'warning name/acknowledged',
      'warning range/burn-out',
      'warning range/heating-value',
      'warning range/rich',
      'warning range/sticky',
      'warning range/sticky',
      'warning range/sticky',
      'warning range/temperature',
      'warning range/temperature',
      'warning range/temperature',
    ]);
  });
});
