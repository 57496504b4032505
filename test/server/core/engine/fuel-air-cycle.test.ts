// The cycle on the real charge beside the air standard, in bands about what texts give for its price: coarse, and common practice,
// so they would not tell an error of some per cent. Energy and mass are closed in work-cycle.test.ts.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { stream } from '../burn/streams.ts';
import { engine, solvedCycle } from './engines.ts';

interface References {
  readonly rows: readonly {
    readonly compressionRatio: number;
    readonly lambda: number;
    readonly low: number;
    readonly high: number;
  }[];
}

const { rows } = JSON.parse(readFileSync('test/reference/fuel-air-cycles.json', 'utf8')) as References;

test.each(rows)('ratio $compressionRatio, λ = $lambda', ({ compressionRatio, lambda, low, high }) => {
  const charge = engine(stream('gas_oil'), lambda, { compressionRatio, heatRelease: { at: 'volume' } });
  const { indicatedWorkJ } = solvedCycle(charge).cycle.balance;
  const share = indicatedWorkJ / charge.lowerHeatingValueJ / (1 - compressionRatio ** -0.4);
  expect(share).toBeGreaterThan(low);
  expect(share).toBeLessThan(high);
});
