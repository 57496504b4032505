/**
 * A leg has a name that is one letter from an entry of a duty. It counts as a leg; was the entry meant?
 */
import { listed, quoted } from '../wording/words.ts';
import { replacements } from './rule.ts';
import type { FactOf, Rule } from './rule.ts';

export const dutyLegName: Rule<FactOf<'duty/leg-name'>> = {
  severity: 'hint',
  message: ({ leg, near }) =>
    `${quoted(leg)} is taken as a leg of that name. Did you mean the entry ${listed(near.map(quoted), 'or')}?`,
  fixes: ({ near }, site) => replacements(site, near),
};
