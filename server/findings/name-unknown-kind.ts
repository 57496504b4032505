/**
 * A definition starts with a word that is no definition kind. The kinds are a closed list (`substance`, `blend`,
 * `reaction`, `burn`, `engine` …); the body of the definition is not looked at until its kind is known.
 */
import { didYouMean, quoted, sentences } from '../wording/words.ts';
import { replacements, type FactOf, type Rule } from './rule.ts';

export const nameUnknownKind: Rule<FactOf<'name/unknown-kind'>> = {
  severity: 'error',
  message: ({ word, near }) =>
    sentences(
      `${quoted(word)} is not a kind of definition.`,
      didYouMean(near) || 'A definition starts with its kind, for example `blend` or `reaction`.',
    ),
  fixes: ({ near }, site) => replacements(site, near),
};
