/**
 * A portion or coefficient below zero. There is no less than nothing of a substance.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceNegative: Rule<FactOf<'balance/negative'>> = {
  severity: 'error',
  message: ({ text }) => `${quoted(text)} is less than nothing. An amount is zero or more.`,
};
