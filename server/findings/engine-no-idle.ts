/**
 * An engine runs without load, as in the idle mode of a test cycle, and its consumption at idle is not known. The fuel of the
 * duty is not known either.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineNoIdle: Rule<FactOf<'engine/no-idle'>> = {
  severity: 'warning',
  message: ({ leg, engine }) =>
    `${quoted(leg)} runs ${quoted(engine)} without load, and its consumption at idle is not known. Give its \`idle consumption\`.`,
};
