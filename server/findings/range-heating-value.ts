/**
 * A heating value that nothing has: above that of hydrogen, which sets free more per kilogram than anything else that
 * burns, or far below zero. Mostly its unit is wrong (kJ/kg, or per cubic metre). It is used as written all the same.
 */
import { quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeHeatingValue: Rule<FactOf<'range/heating-value'>> = {
  severity: 'warning',
  message: ({ text, basis, why, most }) =>
    why === 'negative'
      ? `${quoted(text)} would mean that burning takes up heat. A heating value is the heat set free, and positive. Is the sign wrong?`
      : `${quoted(text)} is more than anything that burns sets free: hydrogen has ${quantityText(most, 'MJ/kg')} (${basis}). Is the unit wrong, such as MJ for kJ?`,
};
