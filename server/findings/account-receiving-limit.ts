/**
 * A receiving water outside what it is held to: by itself, or where an effluent has been mixed into it and no gas has been
 * exchanged yet.
 */
import { formatNumber } from '../wording/numbers.ts';
import { sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const accountReceivingLimit: Rule<FactOf<'account/receiving-limit'>> = {
  severity: 'warning',
  message: ({ of, why, ph, limit, enough }) => {
    const where = of === 'water' ? 'The water by itself has' : 'In the near field the water has';
    const told =
      why === 'change'
        ? `The near field moves the pH by ${formatNumber(ph)}, and ${formatNumber(limit)} is the most that is allowed.`
        : `${where} a pH of ${formatNumber(ph)} (total scale), ${why} the limit of ${formatNumber(limit)}.`;
    return sentences(
      told,
      enough !== null && `At a dilution of ${formatNumber(Math.ceil(enough))} it would keep the limit.`,
    );
  },
};
