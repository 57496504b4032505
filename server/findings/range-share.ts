/**
 * A share outside of what it can be, for example more than 100 % of a blend.
 */
import { formatPercent } from '../wording/numbers.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeShare: Rule<FactOf<'range/share'>> = {
  severity: 'error',
  message: ({ text, low, high }) =>
    `${quoted(text)} is not possible here; it can be from ${formatPercent(low)} to ${formatPercent(high)}.`,
};
