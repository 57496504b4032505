// Equilibrium constants of written reactions at temperature against those worked from the tables' own rows.
// The fit keeps G/RT of every phase within 0.005, so log10 K of a reaction of up to four species may be off by
// 4 × 0.005 / ln 10 = 0.009; the rows' digits add less than 0.001.
import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { checkFacts, figureOf } from '../../support/facts.ts';

interface Rows {
  readonly rows: readonly { readonly equation: string; readonly temperatureK: number; readonly log10K: number }[];
}

const { rows } = JSON.parse(readFileSync('test/reference/janaf-reaction-constants.json', 'utf8')) as Rows;

test.each(rows)('$equation at $temperatureK K', ({ equation, temperatureK, log10K }) => {
  const scenario = checkFacts(`
    reaction trial {
      ${equation}
      state: ${temperatureK} K, 1 bar
    }
  `);
  expect(Math.abs((figureOf(scenario, 'trial', 'log10-k') ?? NaN) - log10K)).toBeLessThan(0.01);
});
