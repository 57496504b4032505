// Claims after `expect`: what holds, what fails, and what cannot be told.
import { describe, expect, test } from 'vitest';
import { checkFacts } from '../../support/facts.ts';

describe('expect', () => {
  test('holds, fails, and cannot be told', () => {
    const scenario = checkFacts(`
      expect 3 kg > 2 kg
      expect 3 kg < 2 kg
      #      ^^^^^^^^^^^ expect/failed
      expect 2 + 1 within 3 ± 1 %
      expect 44 MJ/kg within 40 MJ/kg ± 2 %
      #      ^^^^^^^^^^^^^^^^^^^^^^^^^^^^^^ expect/failed
      expect lower heating value of methane > 49 MJ/kg
      expect flame temperature of unknown_burn > 300 K
      #                           ^^^^^^^^^^^^ name/unknown
      expect 3 kg > 2 m
      #      ^^^^^^^^^^ unit/mismatch
    `);
    const holds = scenario.files[0]?.expectations.map((expectation) => expectation.holds);
    expect(holds).toEqual([true, false, true, false, true, null, null]);
    expect(scenario.files[0]?.expectations[4]?.unit).toBe('MJ/kg');
  });

  test('a number is no claim', () => {
    checkFacts(`
      expect 3 kg
      #      ^^^^ syntax/missing
    `);
  });

  test('within a name, a sum, a temperature', () => {
    const scenario = checkFacts(`
      let limit = 3 kg
      expect 3.5 kg within limit ± 1 kg
      expect 3.5 kg within limit ± 10 %
      #      ^^^^^^^^^^^^^^^^^^^^^^^^^^ expect/failed
      expect 3.2 kg within 2 kg + 1 kg ± 0.3 kg
      expect 25 degC within 20 degC ± 5 K
      expect 3 kg within limit ± 2 m
      #                  ^^^^^^^^^^^ unit/uncertainty
    `);
    expect(scenario.files[0]?.expectations.map(({ holds }) => holds)).toEqual([true, false, true, true, null]);
  });

  test('figures and rows by words', () => {
    checkFacts(`
      blend fuel {
        30 % sodium
        rest gas_oil
      }
      expect mass share of sodium in fuel within 30 % ± 0.001 %
      expect stoichiometric air of fuel > 9 kg/kg
      expect lower heating valu of fuel > 9 MJ/kg
      #      ^^^^^^^^^^^^^^^^^^ name/unknown
    `);
  });
});
