/**
 * A line `words: value` whose words this kind of definition does not have. Nothing would be done with its value, so it
 * is an error rather than passed over. The nearest entries are offered.
 */
import { didYouMean, listed, quoted, sentences, withArticle } from '../wording/words.ts';
import { replacements, type FactOf, type Rule } from './rule.ts';

const MOST_LISTED = 10;

export const nameUnknownEntry: Rule<FactOf<'name/unknown-entry'>> = {
  severity: 'error',
  message: ({ entry, kind, near, known, portion }) =>
    sentences(
      `${withArticle(kind)} has no entry ${quoted(entry)}.`.replace(/^a/, 'A'),
      portion ? `A portion has no colon: ${quoted(portion.text)}.` : didYouMean(near) || has(known),
    ),
  fixes: ({ near, portion }, site) => {
    if (!portion) return replacements(site, near);
    const edits = [{ place: portion.place, newText: portion.text }];
    return [{ title: `Write \`${portion.text}\``, preferred: true, edits }];
  },
};

function has(known: readonly string[]): string {
  if (known.length === 0) return 'It has no entries.';
  const shown = known.slice(0, MOST_LISTED).map(quoted);
  return known.length > MOST_LISTED ? `Among its entries are ${listed(shown)}.` : `It has ${listed(shown)}.`;
}
