/**
 * What stands behind `expect` (or `until`) is a value and no claim: nothing is compared, so it can be neither true nor
 * false.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const expectNotAClaim: Rule<FactOf<'expect/not-a-claim'>> = {
  severity: 'error',
  message: ({ text }) =>
    `${quoted(text)} is not a claim. Compare it with something: \`… > 33 MJ/kg\`, or \`… within 33 MJ/kg ± 1 MJ/kg\`.`,
};
