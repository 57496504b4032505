/**
 * A blend without portions. There is nothing to work out.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceNoPortions: Rule<FactOf<'balance/no-portions'>> = {
  severity: 'error',
  message: ({ name }) => `${quoted(name)} has no portions. Add one a line, for example \`30 % mass sodium\`.`,
};
