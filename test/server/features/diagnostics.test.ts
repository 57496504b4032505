// The list of findings as shown: ordered, with a person's choices, and with hazards and failed claims always in it.
import { describe, expect, it } from 'vitest';
import { codeActions } from '../../../server/features/code-actions.ts';
import { diagnostics, type SeverityChoices } from '../../../server/features/diagnostics.ts';
import type { Finding, Fix, Severity } from '../../../server/findings/finding.ts';

const finding = (code: string, start: number, severity: Severity = 'error', fixes: readonly Fix[] = []): Finding => ({
  code,
  severity,
  message: `${code} at ${start}`,
  place: { path: 'a', start, end: start + 3 },
  related: [],
  fixes,
  acknowledged: false,
});
const choices = (chosen: Record<string, Severity | 'off'>): SeverityChoices => new Map(Object.entries(chosen));

describe('the list', () => {
  it('is in the order of the text, and of the codes at one place', () => {
    const found = [finding('x/b', 9), finding('x/b', 2), finding('x/a', 2)];
    expect(diagnostics(found).map(({ code, place }) => [code, place.start])).toEqual([
      ['x/a', 2],
      ['x/b', 2],
      ['x/b', 9],
    ]);
  });

  it.each<[string, Severity, Severity | 'off', Severity | null]>([
    ['name/unknown', 'error', 'hint', 'hint'],
    ['name/unknown', 'error', 'off', null],
    ['kind/not-evaluated', 'information', 'error', 'information'],
    ['hazard/water-reactive', 'warning', 'off', 'warning'],
    ['hazard/water-reactive', 'warning', 'hint', 'warning'],
    ['expect/failed', 'error', 'hint', 'error'],
  ])('%s, by itself %s, chosen as %s, shows as %s', (code, severity, chosen, shown) => {
    const list = diagnostics([finding(code, 0, severity)], choices({ [code]: chosen }));
    expect(list.map((one) => one.severity)).toEqual(shown === null ? [] : [shown]);
  });
});

describe('the mends at a place', () => {
  const fix = (title: string, preferred: boolean): Fix => ({ title, preferred, edits: [] });
  const found = [
    finding('x/a', 2, 'error', [fix('one', false), fix('two', true), fix('three', true)]),
    finding('x/b', 10, 'error', [fix('four', true)]),
  ];

  it.each([
    [2, 2, ['two', 'one', 'three']],
    [5, 5, ['two', 'one', 'three']], // right behind the finding
    [1, 1, []],
    [6, 9, []],
    [0, 99, ['two', 'four', 'one', 'three']],
  ])('from %d to %d are %j, the preferred ones first', (start, end, titles) => {
    expect(codeActions(found, { path: 'a', start, end }).map(({ title }) => title)).toEqual(titles);
  });

  it('have one preferred mend a finding', () => {
    const actions = codeActions(found, { path: 'a', start: 0, end: 99 });
    expect(actions.filter(({ preferred }) => preferred).map(({ title }) => title)).toEqual(['two', 'four']);
  });

  it('are those of the file asked for', () => {
    expect(codeActions(found, { path: 'b', start: 0, end: 99 })).toEqual([]);
  });
});
