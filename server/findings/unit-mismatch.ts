/**
 * A quantity of another sort than its place needs (a mass where an energy belongs), or two that are added or compared
 * though they are not of one sort. Both are named in words with their SI units.
 */
import { dimensionPhrase } from '../wording/quantities.ts';
import { formatNumber } from '../wording/numbers.ts';
import { listed, quoted, sentences } from '../wording/words.ts';
import type { Sided } from '../scenario/facts.ts';
import type { FactOf, Rule } from './rule.ts';

const doings = {
  add: 'added to each other',
  subtract: 'subtracted from each other',
  compare: 'compared with each other',
} as const;

const energyPerVolume =
  /\b(?:[kMGT]?J|[kMGT]?Wh|k?cal|(?:MM)?Btu) *(?:\/|per) *(?:m?L|l|m3|m\u00b3|m\^3|gal|bbl|ft3)\b/;

/** A dimension in words. `MJ/L` has that of a pressure, but nobody who writes it thinks of one. */
const phraseOf = (side: Sided): string =>
  energyPerVolume.test(side.text) ? 'an energy per volume (J/m³)' : dimensionPhrase(side);

export const unitMismatch: Rule<FactOf<'unit/mismatch'>> = {
  severity: 'error',
  message: (fact) => {
    if (fact.form === 'sides') {
      const { left, right, operation } = fact;
      const bare = [left, right].find(({ text }) => /^[-\u2212]?[\d.]+$/.test(text));
      return sentences(
        `${quoted(left.text)} is ${phraseOf(left)} and ${quoted(right.text)} is ${phraseOf(right)};`,
        `they cannot be ${doings[operation]}.`,
        bare && `Does ${quoted(bare.text)} lack its unit?`,
      );
    }
    if (fact.form === 'bare') {
      const { text, entry, fraction, instead, mends } = fact;
      return sentences(
        fraction !== null && `${quoted(text)} is ${formatNumber(fraction)}.`,
        fraction === null && instead !== null && `${quoted(text)} is a mass of one per mass of the other.`,
        `${quoted(entry)} takes a number without a unit.`,
        fraction !== null &&
          mends.length > 0 &&
          `Write ${listed(
            mends.map(({ newText }) => quoted(newText)),
            'or',
          )}.`,
        fraction === null &&
          (instead === null ? 'Leave the unit out.' : `Such a ratio is written ${quoted(`${instead}: ${text}`)}.`),
      );
    }
    const { found, needed, example } = fact;
    return sentences(
      `${quoted(found.text)} is ${phraseOf(found)}, but ${dimensionPhrase(needed)} is needed here.`,
      example !== '' && example !== '1' && `Give it for example in ${quoted(example)}.`,
    );
  },
  fixes: (fact) =>
    fact.form === 'bare'
      ? fact.mends.map(({ title, place, newText }) => ({
          title,
          preferred: fact.mends.length === 1,
          edits: [{ place, newText }],
        }))
      : [],
};
