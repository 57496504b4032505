/**
 * A quantity of another sort than its place needs (a mass where an energy belongs), or two that are added or compared
 * though they are not of one sort. Both are named in words with their SI units.
 */
import { dimensionPhrase } from '../wording/quantities.ts';
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const doings = {
  add: 'added to each other',
  subtract: 'subtracted from each other',
  compare: 'compared with each other',
} as const;

export const unitMismatch: Rule<FactOf<'unit/mismatch'>> = {
  severity: 'error',
  message: (fact) => {
    if (fact.form === 'sides') {
      const { left, right, operation } = fact;
      return (
        `${quoted(left.text)} is ${dimensionPhrase(left)} and ${quoted(right.text)} is ${dimensionPhrase(right)}; ` +
        `they cannot be ${doings[operation]}.`
      );
    }
    const { found, needed, example } = fact;
    return sentences(
      `${quoted(found.text)} is ${dimensionPhrase(found)}, but ${dimensionPhrase(needed)} is needed here.`,
      example !== '' && example !== '1' && `Give it for example in ${quoted(example)}.`,
    );
  },
};
