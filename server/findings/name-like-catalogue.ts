/**
 * A definition has the name of a catalogue substance. That is allowed: in this scenario the name means the definition,
 * everywhere. It is said because a reader may take the name for the catalogue's substance.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameLikeCatalogue: Rule<FactOf<'name/like-catalogue'>> = {
  severity: 'information',
  message: ({ name, substance }) => {
    const known =
      name === substance ? 'a substance of the catalogue' : `another name of ${quoted(substance)} in the catalogue`;
    return `${quoted(name)} is also ${known}. In this scenario it means this definition.`;
  },
};
