/**
 * An uncertainty behind `±` that does not belong to its number: below zero, of another sort than the number, or in
 * percent of a temperature or gauge pressure, whose zero is arbitrary.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const reasons = {
  negative: 'has an uncertainty below zero. Write it as a positive number.',
  mismatch: 'has an uncertainty in a unit that does not fit its number. Write it in the same unit, or in %.',
  relative:
    'has an uncertainty in % of a scale whose zero is arbitrary. Write it as a difference, for example `± 2 K`.',
} as const;

export const unitUncertainty: Rule<FactOf<'unit/uncertainty'>> = {
  severity: 'error',
  message: ({ text, why }) => `${quoted(text)} ${reasons[why]}`,
};
