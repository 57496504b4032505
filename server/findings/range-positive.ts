/**
 * An entry whose value must be more than zero (a density, a heat capacity) is given as zero or less.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangePositive: Rule<FactOf<'range/positive'>> = {
  severity: 'error',
  message: ({ text, entry }) => `${quoted(entry)} must be more than zero, and ${quoted(text)} is not.`,
};
