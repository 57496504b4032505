/**
 * A file with sixteen or more lines that cannot be read is being pasted, merged or is no scenario: what is computed of the
 * rest is not told until fewer are left.
 */
import { counted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const kindSuspended: Rule<FactOf<'kind/suspended'>> = {
  severity: 'information',
  message: ({ problems, hidden }) =>
    `${counted(hidden, 'further finding', 'further findings')} about this file ${hidden === 1 ? 'is' : 'are'} told once fewer than 16 of its lines are unreadable (now ${problems}).`,
};
