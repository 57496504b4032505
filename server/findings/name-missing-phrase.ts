/**
 * An entry lacks (part of) its value: nothing stands behind the colon, or a phrase that it cannot do without is missing.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameMissingPhrase: Rule<FactOf<'name/missing-phrase'>> = {
  severity: 'error',
  message: ({ entry, takes }) => `${quoted(entry)} is not complete. It takes ${takes}.`,
};
