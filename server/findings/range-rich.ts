/**
 * There is less oxygen than the fuel needs (λ below 1), so that carbon monoxide and hydrogen stay, and soot may. Soot is
 * expected from about one atom of carbon on two of oxygen on, well before any carbon is left over at equilibrium.
 */
import { formatNumber, formatPercent } from '../wording/numbers.ts';
import { sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeRich: Rule<FactOf<'range/rich'>> = {
  severity: ({ sootShare }) => (sootShare > 0 ? 'warning' : 'information'),
  message: ({ of, lambda, carbonMonoxideShare, hydrogenShare, sootShare, carbonPerOxygen, sootingFrom }) =>
    sentences(
      `${of === 'zone' ? 'The flame zone' : 'The charge'} is rich (λ ${formatNumber(lambda)}):`,
      `at equilibrium its dry gas holds ${formatPercent(carbonMonoxideShare)} CO and ${formatPercent(hydrogenShare)} H2.`,
      sootShare > 0
        ? `${formatPercent(sootShare)} of the carbon is soot even at equilibrium.`
        : carbonPerOxygen !== null && carbonPerOxygen > sootingFrom
          ? `With ${formatNumber(carbonPerOxygen)} atoms of carbon per atom of oxygen a flame soots, though equilibrium has no soot.`
          : null,
    ),
};
