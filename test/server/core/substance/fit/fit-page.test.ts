// The generated page and its plot are those of the records as they are.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { fitPage } from '../../../../../server/core/substance/fit/fit-page.ts';
import { fitPlot } from '../../../../../server/core/substance/fit/fit-plot.ts';
import type { FitResiduals } from '../../../../../server/core/substance/phase-fit.ts';
import { phaseFits, phaseLimits } from '../../../../../server/core/substance/phase-records.ts';
import written from '../../../../../server/core/substance/data/phases/residuals.json' with { type: 'json' };

// The compiler reads a pair in JSON as an array of any length.
const residuals = written as readonly unknown[] as readonly FitResiduals[];
const read = (file: string): string => readFileSync(`examples/reference/${file}`, 'utf8');

test('the page is not stale (npm run fit -- --page writes it)', () => {
  expect(read('fit.md')).toBe(fitPage(phaseFits, residuals, phaseLimits, 'fit-worst.svg'));
});

test('the plot is not stale, and shows the worst phase first', () => {
  const plot = fitPlot(residuals);
  expect(read('fit-worst.svg')).toBe(plot);
  expect(/text-anchor="end" fill="#222">([^<]*)</.exec(plot)?.[1]).toBe('NaCN(cr)');
});

test('every phase has its residuals, and nothing else has', () => {
  expect(residuals.map(({ phase }) => phase)).toEqual(phaseFits.map(({ id }) => id).sort());
});

test('a phase over its limits is listed with its reason, and one without a reason says so', () => {
  const [record] = phaseFits;
  const own = residuals.find(({ phase }) => phase === record?.id);
  if (record === undefined || own === undefined) throw new Error('no record');
  const page = fitPage([record], [{ ...own, heatCapacityPercent: [0.7, 500] }], [], 'plot.svg');
  expect(page).toContain(`- **${record.id}**: heat capacity 0.7 % at 500 K. Why: no reason given.`);
  expect(fitPage([record], [own], [], 'plot.svg')).toContain('## Over the limits\n\nNone.');
});
