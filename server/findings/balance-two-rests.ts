/**
 * More than one portion is to take the `rest`. How it would be divided between them is not said, so only one may.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceTwoRests: Rule<FactOf<'balance/two-rests'>> = {
  severity: 'error',
  message: ({ name }) =>
    `${quoted(name)} already has a portion that takes the \`rest\`; only one can. Give this one a share.`,
};
