/**
 * An entry is given twice in one definition. Only one can hold, and which one is meant cannot be told; the first is
 * taken until one of them is removed.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameRepeatedEntry: Rule<FactOf<'name/repeated-entry'>> = {
  severity: 'error',
  message: ({ entry }) => `${quoted(entry)} is already given in this definition. Keep one of the two.`,
  related: ({ entry, first }) => [{ place: first, message: `${quoted(entry)} is first given here` }],
};
