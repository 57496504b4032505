// Equilibrium constants of written reactions at temperature against those worked from the tables' own rows.
// The fit keeps G/RT of every phase within 0.005, so log10 K of a reaction of up to four species may be off by
// 4 × 0.005 / ln 10 = 0.009; the rows' digits add less than 0.001.
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
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

interface Temperatures {
  readonly rows: readonly { readonly equation: string; readonly celsius: number; readonly toleranceK: number }[];
}

const balanced = JSON.parse(readFileSync('test/reference/equilibrium-temperatures.json', 'utf8')) as Temperatures;

describe('over temperature', () => {
  test.each(balanced.rows)('$equation turns at about $celsius °C', ({ equation, celsius, toleranceK }) => {
    const scenario = checkFacts(`
      reaction trial {
        ${equation}
      }
    `);
    const found = figureOf(scenario, 'trial', 'equilibrium-temperature') ?? NaN;
    expect(Math.abs(found - 273.15 - celsius)).toBeLessThanOrEqual(toleranceK);
  });

  test.each(rows)("$equation has in its table at $temperatureK K what the tables' rows make", (row) => {
    const scenario = checkFacts(`
      reaction trial {
        ${row.equation}
      }
    `);
    const table = scenario.files[0]?.definitions[0]?.tables.find(({ id }) => id === 'over-temperature');
    const cells = table?.rows.find(([temperatureK]) => temperatureK === row.temperatureK);
    expect(Math.abs(Number(cells?.[3]) - row.log10K)).toBeLessThan(0.01);
    // Enthalpy, Gibbs energy and log10 K of one row belong together: ΔG = -R T ln K.
    const gibbsKJ = -0.00831446261815324 * row.temperatureK * Math.LN10 * Number(cells?.[3]);
    expect(Number(cells?.[2])).toBeCloseTo(gibbsKJ, 6);
  });

  test('where the sign never changes there is no figure, and why is told', () => {
    const scenario = checkFacts(`
      reaction trial {
        2 Na(l) + H2O(g) -> Na2O(cr) + H2
      }
    `);
    const definition = scenario.files[0]?.definitions[0];
    expect(figureOf(scenario, 'trial', 'equilibrium-temperature')).toBeUndefined();
    expect(definition?.absent.get('equilibrium-temperature')?.[0]).toMatch(/change of sign/);
    expect(definition?.tables.find(({ id }) => id === 'equilibrium-temperatures')?.rows).toEqual([]);
  });

  test('the state does not move it', () => {
    const at = (state: string): number | undefined =>
      figureOf(
        checkFacts(`
          reaction trial {
            C(cr) + CO2 -> 2 CO
            state: ${state}
          }
        `),
        'trial',
        'equilibrium-temperature',
      );
    expect(at('1000 degC, 1 bar')).toBe(at('25 degC, 1 bar'));
  });
});
