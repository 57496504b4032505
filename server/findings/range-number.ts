/**
 * A number that cannot be worked with: too large to be held, a division by zero, or a function asked for a value it does
 * not have, as the root of a negative number.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const reasons = {
  'not-finite': 'is beyond the numbers that can be worked with (about 10³⁰⁸)',
  'division-by-zero': 'divides by zero',
  'outside-function': 'asks a function for a value that it does not have',
} as const;

export const rangeNumber: Rule<FactOf<'range/number'>> = {
  severity: 'error',
  message: ({ text, why }) => `${quoted(text)} ${reasons[why]}, so it has no value.`,
};
