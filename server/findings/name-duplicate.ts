/**
 * Two definitions or values share a name. All files reached by `use` share one set of names, so that a name always
 * means one thing; neither of the two is taken until one of them is renamed. Reported at each of them.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const nameDuplicate: Rule<FactOf<'name/duplicate'>> = {
  severity: 'error',
  messageAt: ({ name, others }, { place }) => {
    const elsewhere = others.find(({ path }) => path !== place.path);
    const where = elsewhere ? ` (also in ${elsewhere.path})` : '';
    return `${quoted(name)} is defined more than once${where}, so it could mean either. Rename one of them.`;
  },
  related: ({ name, others }) => others.map((place) => ({ place, message: `${quoted(name)} is also defined here` })),
};
