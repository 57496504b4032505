/**
 * Part of an entry's value is nothing that the entry takes: a word too many, or a quantity in a place where the entry
 * has none. The rest of the value is still read.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameUnknownPhrase: Rule<FactOf<'name/unknown-phrase'>> = {
  severity: 'error',
  message: ({ entry, text, takes }) => `${quoted(entry)} cannot be read with ${quoted(text)}. It takes ${takes}.`,
};
