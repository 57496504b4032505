/**
 * A share by volume of something without a density, or a share by mole of something without a molar mass: it cannot be
 * turned into mass.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceNoDensity: Rule<FactOf<'balance/no-density'>> = {
  severity: 'error',
  message: ({ substance, why }) =>
    why === 'density'
      ? `No density of ${quoted(substance)} is known, so a volume of it cannot be turned into mass. Give the amount by mass, or a \`density:\` in its definition.`
      : `No molar mass of ${quoted(substance)} is known, so moles of it cannot be turned into mass. Give the number by mass, or a \`formula:\` or \`molar mass:\` in its definition.`,
};
