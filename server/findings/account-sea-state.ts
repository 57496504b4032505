/** Two variables of a carbonate system that no sea water has together, or that two have. */
import { formatNumber } from '../wording/numbers.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const accountSeaState: Rule<FactOf<'account/sea-state'>> = {
  severity: ({ why }) => (why === 'none' ? 'error' : 'information'),
  message: (fact) => {
    const pair = `this ${quoted(fact.first)} and this ${quoted(fact.second)}`;
    return fact.why === 'none'
      ? `No sea water has ${pair} together. Look at both numbers and their units.`
      : `Two waters have ${pair}: one of pH ${formatNumber(fact.ph)}, which is taken, and one of pH ${formatNumber(fact.other)}. Give another variable in place of one of them where that is in doubt.`;
  },
};
