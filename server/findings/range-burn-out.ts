/**
 * Droplets or particles have less time in the flame than they take to burn out, or hardly more: what is worked out here
 * counts them as burnt. Burn-out times of single particles are good within a factor of 1.5 to 2, by the law they burn by.
 */
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import { formatNumber } from '../wording/numbers.ts';
import { quantityText } from '../wording/quantities.ts';
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeBurnOut: Rule<FactOf<'range/burn-out'>> = {
  severity: ({ portions }) => (portions.some(({ verdict }) => verdict === 'unburnt') ? 'warning' : 'information'),
  message: ({ residence, portions }) =>
    sentences(
      ...portions.map(({ name, verdict, timeS, factor }) => {
        if (timeS === null) return `${quoted(name)} finds too little free oxygen in this gas to keep a flame.`;
        const time = quantityText(quantityOf(timeS, knownUnit('s').dimension), 'ms');
        const has = quantityText(residence, 'ms');
        const within = factor === null ? '' : `, good within a factor of ${formatNumber(factor)}`;
        return verdict === 'unburnt'
          ? `${quoted(name)} takes about ${time} to burn out and has ${has}.`
          : `${quoted(name)} takes about ${time} to burn out${within}, and has ${has}: it may not be burnt.`;
      }),
      'All figures here count it as burnt.',
    ),
};
