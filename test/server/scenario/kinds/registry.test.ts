// The kinds as a whole: the list of them, and those that are not worked out yet.
import { describe, expect, test } from 'vitest';
import { KIND_WORDS } from '../../../../grammar/words.ts';
import { kinds } from '../../../../server/scenario/kinds/registry.ts';
import { checkFacts } from '../../../support/facts.ts';

test('the kinds are those the grammar knows', () => {
  expect(kinds.map((kind) => kind.kind)).toEqual(KIND_WORDS);
});

describe('kinds not evaluated yet', () => {
  test('one information each; what refers to them is silent', () => {
    const scenario = checkFacts(`
      let x = 1
        fleet ferries {
      # ^^^^^ kind/not-evaluated
        ships: 12
      }
      expect sodium of ferries > 3 t
    `);
    expect(scenario.files[0]?.expectations[0]?.holds).toBeNull();
  });

  test('only hazards can be acknowledged, with a reason', () => {
    checkFacts(`
      blend fuel {
        100 % gas_oil
        acknowledge balance/shares: "it is fine"
        #           ^^^^^^^^^^^^^^ name/acknowledged
        acknowledge hazard/water-reactive: ""
        #                                  ^^ name/acknowledged
        acknowledge hazard/flammable: "design note 3"
        #           ^^^^^^^^^^^^^^^^ name/acknowledged
        acknowledge hazard/toxic: "design note 4"
        #           ^^^^^^^^^^^^ name/acknowledged
      }
    `);
  });
});
