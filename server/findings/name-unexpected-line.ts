/**
 * A line of a form that this kind of definition does not have: a portion in a reaction, an equation in a
 * blend, or a second equation in a reaction.
 */
import { capitalised, withArticle } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameUnexpectedLine: Rule<FactOf<'name/unexpected-line'>> = {
  severity: 'error',
  message: ({ kind, line }) => {
    const here = capitalised(withArticle(kind));
    if (kind === 'reaction' && line === 'equation') {
      return 'A reaction has one equation, and this is a second one. Put it in a reaction of its own.';
    }
    return line === 'portion'
      ? `${here} has no portions. If this is an entry, write a colon behind its words; portions belong in a \`blend\` or an \`oxidant\`.`
      : `${here} has no equation. Put it in a definition of its own: \`reaction name { … }\`.`;
  },
};
