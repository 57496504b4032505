// The generated page and its plot are those of the records as they are.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { fitPage } from '../../../../../server/core/substance/fit/fit-page.ts';
import { fitPlot } from '../../../../../server/core/substance/fit/fit-plot.ts';
import { phaseFits, phaseLimits } from '../../../../../server/core/substance/phase-records.ts';

const written = (file: string): string => readFileSync(`examples/reference/${file}`, 'utf8');

test('the page is not stale (npm run fit -- --page writes it)', () => {
  expect(written('fit.md')).toBe(fitPage(phaseFits, phaseLimits, 'fit-worst.svg'));
});

test('the plot is not stale, and shows the worst phase first', () => {
  const plot = fitPlot(phaseFits);
  expect(written('fit-worst.svg')).toBe(plot);
  expect(/text-anchor="end" fill="#222">([^<]*)</.exec(plot)?.[1]).toBe('NaCN(cr)');
});

test('a record over its limits is listed with its reason, and one without a reason says so', () => {
  const [record] = phaseFits;
  if (record === undefined) throw new Error('no record');
  const spoiled = { ...record, worst: { ...record.worst, heatCapacityPercent: [0.7, 500] as const } };
  const page = fitPage([spoiled], [], 'plot.svg');
  expect(page).toContain(`- **${record.id}**: heat capacity 0.7 % at 500 K. Why: no reason given.`);
  expect(fitPage([record], [], 'plot.svg')).toContain('## Over the limits\n\nNone.');
});
