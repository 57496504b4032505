// The table of verdicts by itself: it is large enough, its look-alikes are look-alikes, and its words exist.

import { expect, test } from 'vitest';
import { hazardCodes } from '../../../../server/core/hazard/hazard-codes.ts';
import type { HazardCode } from '../../../../server/core/hazard/hazard-codes.ts';
import { titleOf, verdicts } from './verdicts.ts';

const codes: Readonly<Record<string, { readonly cause: string }>> = hazardCodes;

test('at least 120 rows, each once, a third of them harmless look-alikes', () => {
  expect(verdicts.length).toBeGreaterThanOrEqual(120);
  expect(new Set(verdicts.map(titleOf)).size).toBe(verdicts.length);
  expect(verdicts.filter((verdict) => verdict.harmless === true).length / verdicts.length).toBeGreaterThan(1 / 3);
});

test.each(verdicts.map((verdict) => [titleOf(verdict), verdict] as const))('%s', (_, verdict) => {
  const earned = Object.keys(verdict.earns);
  expect(earned.filter((code) => codes[code] === undefined)).toEqual([]);
  if (verdict.harmless === true) expect(earned.filter((code) => codes[code]?.cause !== 'alone')).toEqual([]);
  expect(Object.values(verdict.percent).reduce((sum, share) => sum + share, 0)).toBeCloseTo(100, 9);
  expect(verdict.because).toMatch(/^[A-Z0-9].*\.$/);
});

test('every code is earned somewhere', () => {
  const earned = new Set(verdicts.flatMap((verdict) => Object.keys(verdict.earns)));
  expect(Object.keys(hazardCodes).filter((code) => !earned.has(code as HazardCode))).toEqual([]);
});
