/**
 * A definition lacks an entry without which nothing can be worked out of it. Reported at the definition's header.
 */
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameMissingEntry: Rule<FactOf<'name/missing-entry'>> = {
  severity: 'error',
  message: ({ kind, name, entries, all }) =>
    `The ${kind} ${quoted(name)} needs ${listed(entries.map(wanted), all ? 'and' : 'or')}. Add ${all && entries.length > 1 ? 'them' : 'it'} inside the braces.`,
};

/** An entry as it would be written; `an equation` is no entry and stays as it is. */
function wanted(entry: string): string {
  return /^an? /.test(entry) ? entry : quoted(`${entry}: …`);
}
