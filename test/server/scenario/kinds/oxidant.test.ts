// Oxidants: composition, humidity and density, and what is said of slips in them.
import { describe, expect, test } from 'vitest';
import { checkFacts, figureOf, uncertaintyOf } from '../../../support/facts.ts';

describe('oxidant', () => {
  test('dry air is what the language says it is', () => {
    const scenario = checkFacts(`
      oxidant intake {
        100 % air
      }
    `);
    expect(figureOf(scenario, 'intake', 'oxygen-share')).toBeCloseTo(0.20946, 9);
    expect(figureOf(scenario, 'intake', 'vapour-share')).toBe(0);
    // 1 bar, 25 °C: p M / (R T)
    expect(figureOf(scenario, 'intake', 'density')).toBeCloseTo((1e5 * 0.0289651) / (8.31446 * 298.15), 3);
  });

  test('humidity by relative humidity and by its ratio come to the same', () => {
    const scenario = checkFacts(`
      oxidant one {
        100 % air
        state: 18 degC, 1.013 bar
        relative humidity: 75 %
      }
      oxidant two {
        100 % air
        state: 18 degC, 1.013 bar
        humidity ratio: 9.62 g/kg
      }
    `);
    const ratio = figureOf(scenario, 'one', 'humidity-ratio') ?? NaN;
    expect(ratio).toBeCloseTo(0.00962, 4);
    expect(figureOf(scenario, 'two', 'humidity-ratio')).toBeCloseTo(0.00962, 9);
    expect(figureOf(scenario, 'one', 'oxygen-share')).toBeLessThan(0.20946);
  });

  test('portions by mole, vapour among them', () => {
    const scenario = checkFacts(`
      oxidant exhaust_like {
        10 % mole oxygen
        20 % mole steam
        rest      nitrogen
      }
    `);
    expect(figureOf(scenario, 'exhaust_like', 'oxygen-share')).toBeCloseTo(0.1, 12);
    expect(figureOf(scenario, 'exhaust_like', 'vapour-share')).toBeCloseTo(0.2, 12);
  });

  test('the uncertainty of the humidity reaches the density', () => {
    const scenario = checkFacts(`
      oxidant intake {
        100 % air
        state: 35 degC, 1 bar
        relative humidity: 80 ± 5 %
      }
    `);
    const relative =
      (uncertaintyOf(scenario, 'intake', 'humidity-ratio') ?? 0) /
      (figureOf(scenario, 'intake', 'humidity-ratio') ?? 1);
    expect(relative).toBeCloseTo(5 / 80, 2);
  });

  test('slips: humidity that cannot be, two humidities, a portion of unknown molecules, an oxidant as a portion', () => {
    checkFacts(`
      oxidant hot {
        100 % air
        state: 120 degC, 1 bar
        relative humidity: 80 %
      # ^^^^^^^^^^^^^^^^^^^^^^^ range/humidity
      }
      oxidant twice {
        100 % air
        relative humidity: 80 %
        humidity ratio: 10 g/kg
      # ^^^^^^^^^^^^^^ balance/contradiction
      }
      oxidant odd {
      #       ^^^ balance/no-data
        100 % gas_oil
      }
      oxidant intake {
        100 % air
      }
      blend fuel {
        100 % intake
        #     ^^^^^^ name/wrong-kind
      }
    `);
  });
});
