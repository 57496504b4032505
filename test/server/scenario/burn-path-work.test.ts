// A figure of a burn's cooling path, asked for by another statement: long work, done elsewhere in an editor, and only where
// somebody asks.
import { describe, expect, test } from 'vitest';
import { pathAccountOf } from '../../../server/core/burn/path-account.ts';
import { evaluate, evaluateInSteps } from '../../../server/scenario/evaluate.ts';
import { onTheSpot, type WorkElsewhere } from '../../../server/scenario/long-work.ts';
import type { EvaluatedScenario } from '../../../server/scenario/scenario.ts';

const BURN = `burn furnace {
  fuel: methanol
  oxidant: air
  lambda: 1.2
}
`;
const ASKING = `${BURN}let dew = dew point of 'H2O(l)' in furnace
expect dew point of 'H2O(l)' in furnace > 300 K
`;
const read = (text: string) => (): { text: string } => ({ text });

/** Work that is done when the evaluation first waits for it. */
function later(): { elsewhere: WorkElsewhere; asked: unknown[] } {
  const asked: unknown[] = [];
  const done = new Map<string, unknown>();
  const open = new Map<string, () => unknown>();
  return {
    asked,
    elsewhere: {
      ask(work, key, input) {
        const id = `\n${key}`;
        if (!done.has(id) && !open.has(id)) {
          asked.push(work);
          open.set(id, () => onTheSpot(work, input));
        }
        // The map holds what the same work gave.
        return { id, kept: done.has(id) ? { key: id, value: done.get(id) as never } : undefined };
      },
      keyNow: (id) => (done.has(id) ? id : null),
      isDone(id) {
        const work = open.get(id);
        if (work) done.set(id, work());
        open.delete(id);
        return true;
      },
    },
  };
}

function finished(steps: Generator<unknown, EvaluatedScenario>): EvaluatedScenario {
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

describe('the dew point of water', () => {
  test('is long work of those who ask, done once, and the very answer of the command line', () => {
    const { elsewhere, asked } = later();
    const scenario = finished(evaluateInSteps('a.stoke', read(ASKING), {}, elsewhere));
    const direct = evaluate('a.stoke', read(ASKING));
    expect(asked).toEqual([pathAccountOf]);
    expect(scenario.files[0]?.values[0]?.quantity?.value).toBe(direct.files[0]?.values[0]?.quantity?.value);
    // At λ 1.2 a mole of methanol gives 2 H2O in 10.64 moles of gas: 0.19 bar, saturated at 332 K.
    expect(direct.files[0]?.values[0]?.quantity?.value).toBeGreaterThan(330);
    expect(direct.files[0]?.values[0]?.quantity?.value).toBeLessThan(335);
    expect(scenario.files[0]?.expectations.map(({ holds }) => holds)).toEqual([true]);
  });

  test('is not asked for by a burn that nobody looks at, nor by a name that is not there', () => {
    const { elsewhere, asked } = later();
    finished(evaluateInSteps('a.stoke', read(BURN), {}, elsewhere));
    finished(evaluateInSteps('a.stoke', read(`${BURN}let x = mass share of 'Na(l)' in furnace\n`), {}, elsewhere));
    expect(asked).toEqual([]);
  });
});
