// Shares that are closed to a whole: their uncertainty against the slope worked out by hand.
import { describe, expect, test } from 'vitest';
import { standardUncertainty } from '../../../server/core/quantity/quantity.ts';
import { checkFacts, uncertaintyOf } from '../../support/facts.ts';

describe('shares without a rest keep their uncertainty, however large', () => {
  // The shares are kept at a sum of 1: with u more of the first part its share is (0.3 + u) / (1 + u).
  test.each([0.05, 1, 5])('a blend, %s percentage points', (percentagePoints) => {
    const scenario = checkFacts(`
      blend fuel {
        30 ± ${percentagePoints} % sodium
        70 %     methanol
      }
      let sodium_share = sodium in fuel
    `);
    const share = scenario.files[0]?.values[0]?.quantity;
    const moved = (by: number): number => (0.3 + by) / (1 + by);
    const halfChange = (moved(percentagePoints / 100) - moved(-percentagePoints / 100)) / 2;
    expect(share && standardUncertainty(share)).toBeCloseTo(halfChange, 9);
  });

  test.each([0.05, 0.5])('a composition, %s percentage points', (percentagePoints) => {
    const scenario = checkFacts(`
      substance oil {
        composition: 84.9 ± ${percentagePoints} % C, 15.1 % H
      }
    `);
    const shareOfCarbon = 0.151 * (percentagePoints / 100);
    expect(uncertaintyOf(scenario, 'oil', 'carbon-factor')).toBeCloseTo((shareOfCarbon * 44.009) / 12.011, 5);
  });

  test('shares on two bases', () => {
    const scenario = checkFacts(`
      blend fuel {
        50 ± 2 % mass  methanol
        50 % mass      ethanol
        0 % mole       water
      }
      let part = methanol in fuel
    `);
    const share = scenario.files[0]?.values[0]?.quantity;
    expect(share && standardUncertainty(share)).toBeGreaterThan(0.009);
  });
});

test('uncertainty goes through a long chain of blends, whenever it is asked for', () => {
  const chain = Array.from(
    { length: 100 },
    (_, index) => `blend step_${index + 1} {\n  98 % mass  step_${index}\n  rest       water\n}`,
  );
  const scenario = checkFacts(`
      substance step_0 {
        phase: liquid
        composition: 85 % C, 15 % H
        lower heating value: 42 ± 0.5 MJ/kg
      }
      ${chain.join('\n')}
    `);
  expect(uncertaintyOf(scenario, 'step_100', 'lower-heating-value')).toBeCloseTo(0.5 * 0.98 ** 100, 10);
});
