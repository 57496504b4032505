/**
 * A unit that people read in two ways or that may not stand so: `J/kg K` (is the kelvin above or below the line?), a
 * temperature scale inside a compound unit (`J/degC`), a
 * share times an amount of substance (`30 % mol`). Nothing is guessed; the clear ways of writing it are offered.
 */
import { listed, quoted, sentences } from '../wording/words.ts';
import { replacements, type FactOf, type Rule } from './rule.ts';

const reasons = {
  brackets: 'can be read in two ways',
  scale: 'uses a scale with a zero of its own inside a compound unit',
  share: 'multiplies a share by a unit',
  form: 'cannot be read as a unit',
} as const;

export const unitAmbiguous: Rule<FactOf<'unit/ambiguous'>> = {
  severity: 'error',
  message: ({ text, offers, why }) =>
    sentences(
      `${quoted(text)} ${reasons[why]}.`,
      offers.length > 0 && `Write ${listed(offers.slice(0, 3).map(quoted), 'or')}.`,
    ),
  fixes: ({ offers }, site) => replacements(site, offers),
};
