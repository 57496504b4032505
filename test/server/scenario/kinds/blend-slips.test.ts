// What is said of slips in a blend, each at its place.
import { describe, expect, test } from 'vitest';
import { checkFacts, figureOf } from '../../../support/facts.ts';

describe('slips in a blend', () => {
  test('shares that do not close', () => {
    checkFacts(`
      blend fuel {
      #     ^^^^ balance/shares
        30 % sodium
        60 % gas_oil
      }
      expect lower heating value of fuel > 1 MJ/kg
    `);
  });

  test('no room for the rest', () => {
    checkFacts(`
      blend fuel {
      #     ^^^^ balance/shares
        70 % sodium
        60 % methanol
        rest gas_oil
      }
    `);
  });

  test('shares off by rounding are taken up', () => {
    const scenario = checkFacts(`
      blend fuel {
        33.3 % sodium
        33.3 % methanol
        33.3 % gas_oil
      }
    `);
    expect(figureOf(scenario, 'fuel', 'lower-heating-value')).toBeGreaterThan(20);
  });

  test('two rests, a negative amount, nothing at all', () => {
    checkFacts(`
      blend one {
        rest sodium
        rest gas_oil
      # ^^^^ balance/two-rests
      }
      blend two {
        -3 % sodium
      # ^^^^ balance/negative
        rest gas_oil
      }
      blend three {
      #     ^^^^^ balance/no-portions
      }
    `);
  });

  test('volume without a density, mole without a molar mass', () => {
    checkFacts(`
      substance powder {
        composition: 100 % C
        lower heating value: 33 MJ/kg
      }
      blend one {
        30 % volume powder
      # ^^^^ balance/no-density
        rest gas_oil
      }
      blend two {
        30 % mole methanol
        rest gas_oil
      # ^^^^ balance/no-density
      }
    `);
  });

  test('a figure asked for that lacks its data says what is missing, where it is asked for', () => {
    checkFacts(`
      substance powder {
        composition: 100 % C
        lower heating value: 33 MJ/kg
      }
      let x = density of powder
      #       ^^^^^^^^^^^^^^^^^ balance/no-data
    `);
  });

  test('an unknown substance costs the blend, once', () => {
    checkFacts(`
      blend fuel {
        30 % sodum
      #      ^^^^^ name/unknown
        rest gas_oil
      }
      expect lower heating value of fuel > 1 MJ/kg
      let x = sodium in fuel
    `);
  });

  test('a share above one', () => {
    checkFacts(`
      blend fuel {
        30 sodium
      # ^^ range/share
        rest gas_oil
      }
    `);
  });

  test('shares beside amounts', () => {
    checkFacts(`
      blend fuel {
        30 % sodium
        2 kg gas_oil
      # ^^^^ balance/shares
      }
    `);
  });

  test('entries: unknown, repeated, misshapen; an equation', () => {
    checkFacts(`
      blend fuel {
        100 % gas_oil
        store: 20 degC
      # ^^^^^ name/unknown-entry
        blanket: argon
        blanket: nitrogen
      # ^^^^^^^ name/repeated-entry
        stored: 20 degC, 3 kg
        #                ^^^^ unit/mismatch
        2 H2 + O2 -> 2 H2O
      # ^^^^^^^^^^^^^^^^^^ name/unexpected-line
      }
    `);
  });

  test('sodium alone lacks water and carbon for its alkali', () => {
    const scenario = checkFacts(`
      blend metal {
      #     ^^^^^ balance/water-missing
        100 % sodium
      }
    `);
    // Half a water for each sodium: 18.015 / (2 * 22.990)
    expect(figureOf(scenario, 'metal', 'water-missing')).toBeCloseTo(18.015 / (2 * 22.98976928), 6);
  });
});
