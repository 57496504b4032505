/**
 * A unit that is not in the table. Units are a closed list, each with the prefixes it takes; letters count
 * (`mW` is not `MW`). The nearest spellings are offered; a well-known word that is no unit here is explained.
 */
import { didYouMean, quoted, sentences } from '../wording/words.ts';
import { replacements, type FactOf, type Rule } from './rule.ts';

export const unitUnknown: Rule<FactOf<'unit/unknown'>> = {
  severity: 'error',
  message: ({ word, near, hint }) => sentences(`${quoted(word)} is not a unit here.`, hint, didYouMean(near)),
  fixes: ({ near }, site) => replacements(site, near),
};
