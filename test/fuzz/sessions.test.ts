// Sessions at random on two files joined by `use`: typing, deleting, undoing, renaming by the server's own edits, the used
// file open or on the disk, requests in flight while the text changes, some cancelled. After every act each answer is
// compared with that of a server which has just been started on the same texts. SESSION_STEPS acts (1,000 in the suite),
// with a fresh seed that is printed and can be given back as FUZZ_SEED; a failure is shrunk to the shortest session that
// still fails.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { EditingSession, HOUSE, MAIN, type Act, type Ask } from '../support/editing-session.ts';

const STEPS = Number(process.env['SESSION_STEPS'] ?? 1000);
const SEED = Number(process.env['FUZZ_SEED'] ?? Date.now() % 2 ** 31);
const LONGEST_SESSION = 40;

const MAIN_TEXT = `scenario "Trial"
use "house.stoke"

let share = 30 %
let tank = 12 m3
## Thick.
blend slurry {
  (share) mass sodium
  2 % mass 'sodium oleate'
  rest house_oil          # from the house
}
blend thin {
  50 % mass slurry
  rest methanol
}
reaction carbonate {
  2 Na(cr) + 1/2 O2(g) + CO2(g) -> Na2CO3(cr)
}
let load = tank * density of thin
expect lower heating value of thin > 20 MJ/kg
expect margin = 3 %
`;
const HOUSE_TEXT = `let margin = 3 %
substance house_oil {
  phase: liquid
  composition: 84.9 % C, 15.1 % H
  lower heating value: 44.0 ± 0.2 MJ/kg
  density: 780 kg/m3 at 15 degC
}
blend spare {
  (margin) mass ethanol
  rest house_oil
}
`;

const share = fc.double({ min: 0, max: 1, noNaN: true });
const file = fc.constantFrom(MAIN, MAIN, HOUSE);
const snippet = fc.constantFrom(
  '', ' ', '\n', '\n\n', '\r\n', '#', '# a remark\n', '##\n', '{', '}', '(', ')', ';', ':', ',', '"', "'", '->', '+', '± 2 %',
  '1', '5 kg', ' of ', '12 %', 'x', '𝛼', 'let margin = 4 %\n', 'let extra = 2 * tank\n', 'use "house.stoke"\n', 'use "gone.stoke"\n',
  'blend slurry {\n', 'blend new {\n  rest thin\n}\n', 'expect tank > 2 kg\n', 'let load = share\n', '  rest water\n', 'margin', 'house_oil',
  'let = 4\n'.repeat(16),
); // prettier-ignore
const ask: fc.Arbitrary<Ask> = fc.record({
  what: fc.constantFrom('hover', 'completion', 'definition'),
  at: share,
  cancel: fc.boolean(),
});
const act: fc.Arbitrary<Act> = fc.oneof(
  {
    weight: 6,
    arbitrary: fc.record({
      do: fc.constant('type' as const),
      file,
      at: share,
      deleted: fc.oneof({ weight: 3, arbitrary: fc.constant(0) }, fc.nat(4), fc.nat(60)),
      text: snippet,
    }),
  },
  { weight: 3, arbitrary: fc.record({ do: fc.constant('undo' as const), file }) },
  {
    weight: 2,
    arbitrary: fc.record({
      do: fc.constant('rename' as const),
      at: share,
      name: fc.constantFrom('thinner', 'the new name', 'margin', 'kg', 'water', 'x1'),
    }),
  },
  { weight: 1, arbitrary: fc.record({ do: fc.constant('open or close the used file' as const) }) },
  {
    weight: 1,
    arbitrary: fc.record({
      do: fc.constant('race' as const),
      asks: fc.array(ask, { minLength: 1, maxLength: 4 }),
      at: share,
      text: snippet,
    }),
  },
);
const session = fc.array(fc.record({ act, look: share }), { minLength: 1, maxLength: LONGEST_SESSION, size: 'max' });

test(`${STEPS} acts at random`, { timeout: 60_000 + STEPS * 1000 }, async () => {
  let played = 0;
  let hasFailed = false;
  const holds = fc.asyncProperty(session, async (steps) => {
    // Enough is played; but what has failed is shrunk.
    if (played >= STEPS && !hasFailed) return;
    const editing = new EditingSession(MAIN_TEXT, HOUSE_TEXT);
    await editing.start();
    try {
      for (const { act: next, look } of steps) {
        await editing.act(next);
        await editing.check([look]);
        played++;
      }
    } catch (error) {
      hasFailed = true;
      throw error;
    } finally {
      await editing.stop();
    }
  });
  await fc.assert(holds, { seed: SEED, numRuns: STEPS, interruptAfterTimeLimit: 30_000 + STEPS * 1000 });
  console.log(`fuzz: ${played} acts in sessions, seed ${SEED}`);
  expect(played).toBeGreaterThanOrEqual(STEPS);
});
