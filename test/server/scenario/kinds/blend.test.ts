// Blends: what their figures come to, and how they lie in a tank.
import { describe, expect, test } from 'vitest';
import { standardUncertainty } from '../../../../server/core/quantity/quantity.ts';
import { checkFacts, figureOf, uncertaintyOf, valueOf } from '../../../support/facts.ts';

describe('blend', () => {
  test('shares by mass with a rest', () => {
    const scenario = checkFacts(`
      blend fuel {
        30 % sodium
        rest gas_oil
      }
      let by_mass = gas_oil in fuel
      let by_volume = sodium in fuel by volume
      let sodium_density = density of sodium
    `);
    const sodium = valueOf(scenario, 'sodium_density') ?? NaN;
    expect(sodium).toBeCloseTo(970, -1);
    expect(valueOf(scenario, 'by_mass')).toBeCloseTo(0.7, 12);
    expect(valueOf(scenario, 'by_volume')).toBeCloseTo(0.3 / sodium / (0.3 / sodium + 0.7 / 845), 12);
  });

  test('shares by mole become mass shares by molar mass', () => {
    const scenario = checkFacts(`
      blend gas {
        50 % mole hydrogen
        50 % mole methane
      }
      let x = hydrogen in gas
    `);
    expect(valueOf(scenario, 'x')).toBeCloseTo(2.016 / (2.016 + 16.043), 6);
    expect(figureOf(scenario, 'gas', 'molar-mass')).toBeCloseTo((2.016 + 16.043) / 2, 6);
  });

  test('amounts: one mole of methane with two of sodium', () => {
    const scenario = checkFacts(`
      blend pair {
        1 mol methane
        2 mol sodium
      }
      let share = sodium in pair
    `);
    expect(valueOf(scenario, 'share')).toBeCloseTo(45.97953856 / (45.97953856 + 16.043), 6);
    expect(figureOf(scenario, 'pair', 'alkali-carbon-ratio')).toBeCloseTo(2, 9);
  });

  test('shares on two bases hold together', () => {
    const scenario = checkFacts(`
      blend fuel {
        30 % mass sodium
        20 % volume methanol
        rest gas_oil
      }
      let na = sodium in fuel
      let alcohol = methanol in fuel by volume
    `);
    expect(valueOf(scenario, 'na')).toBeCloseTo(0.3, 12);
    expect(valueOf(scenario, 'alcohol')).toBeCloseTo(0.2, 12);
  });

  test('a blend in a blend', () => {
    const scenario = checkFacts(`
      blend base {
        50 % gas_oil
        50 % methanol
      }
      blend fuel {
        10 % sodium
        rest base
      }
      blend flat {
        10 % sodium
        45 % gas_oil
        45 % methanol
      }
    `);
    const id = 'lower-heating-value';
    expect(figureOf(scenario, 'fuel', id)).toBeCloseTo(figureOf(scenario, 'flat', id) ?? NaN, 9);
  });

  test('two phases of one substance are two portions', () => {
    const scenario = checkFacts(`
      blend alloyed {
        10 % Na(l)
        #    ^^^^^ range/phase
        20 % Na(cr)
        rest hexadecane
      }
      let molten = Na(l) in alloyed
      let solid = sodium in alloyed
    `);
    expect(valueOf(scenario, 'molten')).toBeCloseTo(0.1, 12);
    expect(valueOf(scenario, 'solid')).toBeCloseTo(0.2, 12);
  });

  test('a share out of the table of portions keeps its uncertainty', () => {
    const scenario = checkFacts(`
      blend fuel {
        30 ± 1 % sodium
        rest gas_oil
      }
      let cell = mass share of sodium in fuel
      let share = sodium in fuel
      let none = cell - share
    `);
    const quantities = scenario.files[0]?.values.map(({ quantity }) => quantity && standardUncertainty(quantity));
    expect(quantities).toEqual([0.01, 0.01, 0].map((value): unknown => expect.closeTo(value, 9)));
  });

  test('the uncertainty of a share is taken up by the rest', () => {
    const scenario = checkFacts(`
      substance light {
        composition: 85 % C, 15 % H
        lower heating value: 44 ± 0.2 MJ/kg
      }
      blend alone {
        100 % light
      }
      blend fuel {
        30 ± 1 % sodium
        rest light
      }
      let certain = lower heating value of alone - lower heating value of light
    `);
    expect(uncertaintyOf(scenario, 'alone', 'lower-heating-value')).toBeCloseTo(0.2, 9);
    const slope = 44 - 16.03; // MJ/kg lost per kg of light fuel that sodium replaces, roughly
    const expected = Math.hypot(0.7 * 0.2, 0.01 * slope);
    expect(uncertaintyOf(scenario, 'fuel', 'lower-heating-value')).toBeCloseTo(expected, 2);
    expect(valueOf(scenario, 'certain')).toBeCloseTo(0, 3);
  });

  test('named products override the rule', () => {
    const scenario = checkFacts(`
      blend fuel {
        30 % sodium
        rest gas_oil
        products: NaOH(cr), CO2(g), H2O(g), SO2(g)
      }
    `);
    const hydroxide = figureOf(scenario, 'fuel', 'hydroxide-lower-heating-value') ?? NaN;
    expect(figureOf(scenario, 'fuel', 'lower-heating-value')).toBeCloseTo(hydroxide, 6);
  });
});

describe('a blend in its tank', () => {
  test('solids by volume: the sodium of a slurry, none in a mixture of liquids', () => {
    const scenario = checkFacts(`
      blend slurry {
        30 % sodium
        rest hexadecane
        stored: 25 degC
      }
      let share = sodium in slurry by volume
      blend flat {
        30 % methanol
        rest ethanol
      }
      blend watered {
        10 % water
        rest slurry
      }
    `);
    const share = valueOf(scenario, 'share') ?? NaN;
    expect(figureOf(scenario, 'slurry', 'solids-volume-share')).toBeCloseTo(share, 12);
    expect(figureOf(scenario, 'flat', 'solids-volume-share')).toBeUndefined();
    expect(figureOf(scenario, 'watered', 'solids-volume-share')).toBeLessThan(share);
  });

  test('a portion in another phase than its data are of', () => {
    const scenario = checkFacts(`
      blend hot {
        30 % sodium
      #      ^^^^^^ range/phase
        rest hexadecane
        stored: 120 degC, 1 bar
      }
      blend cold {
        30 % methanol
        rest hexadecane
        #    ^^^^^^^^^^ range/phase
        stored: 5 degC
      }
      blend warm_gas {
        50 % ammonia
        rest water
        stored: 20 degC, 10 bar
      }
    `);
    expect(figureOf(scenario, 'hot', 'solids-volume-share')).toBeUndefined();
    const line = scenario.files[0]?.definitions[0]?.lines[0];
    expect(line).toMatchObject({ state: { phase: 'liquid', changed: { from: 'solid' } } });
  });

  test('a solid heavier than its liquid', () => {
    const scenario = checkFacts(`
      blend slurry {
        30 % sodium
        rest hexadecane
      }
    `);
    const line = scenario.files[0]?.definitions[0]?.lines[0];
    const excess = line?.kind === 'portion' ? line.state?.excessDensity?.value : undefined;
    expect(excess).toBeCloseTo(970 - 770, -1.5);
  });
});
