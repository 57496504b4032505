/**
 * Two temperatures are added. A temperature is a point on a scale: 20 °C and 100 °C have a difference, but no sum.
 * To a temperature a temperature difference can be added, which is written in K.
 */
import { quoted, sentences } from '../wording/words.ts';
import { replacements, textAt, type FactOf, type Rule } from './rule.ts';

export const unitTwoTemperatures: Rule<FactOf<'unit/two-temperatures'>> = {
  severity: 'error',
  message: ({ left, right, asDifference }) =>
    sentences(
      `${quoted(left.text)} and ${quoted(right.text)} are both temperatures and cannot be added.`,
      asDifference === null
        ? 'Only a temperature difference, in K, can be added to a temperature.'
        : `Is the second one a difference? Write ${quoted(asDifference)}.`,
    ),
  fixes: ({ right, asDifference }, site) =>
    // Only where the finding stands at the second one alone would the replacement leave the first.
    asDifference !== null && textAt(site) === right.text ? replacements(site, [asDifference]) : [],
};
