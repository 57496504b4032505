/**
 * A plain number where a quantity with a unit is needed. No unit is ever assumed.
 */
import { dimensionPhrase } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import { replacements, textAt, type FactOf, type Rule, type Site } from './rule.ts';

export const unitMissing: Rule<FactOf<'unit/missing'>> = {
  severity: 'error',
  messageAt: ({ needed, example }, site) =>
    `${quoted(textAt(site))} has no unit, but ${dimensionPhrase({ dimension: needed, kind: 'plain' })} is needed here. ` +
    `Write for example ${quoted(withUnitWritten(example, site))}.`,
  fixes: ({ example }, site) =>
    // Not the preferred mend: which unit the number was meant in, only its writer knows.
    replacements(site, [withUnitWritten(example, site)]).map((fix) => ({ ...fix, preferred: false })),
};

function withUnitWritten(unit: string, site: Site): string {
  const written = textAt(site).trim();
  const isNumber = /^[-−]?[\d.]+(?:e[-+]?\d+)?(?:\/\d+)?$/i.test(written);
  return `${isNumber ? written : `(${written})`} ${unit}`;
}
