/**
 * A blend, or a burn's whole charge, has too little hydrogen for all its alkali to end as hydroxide, as it would in moist
 * exhaust. The water that would have to come from outside is given; it may come from humid air, a pilot fuel or injection.
 */
import { formatNumber } from '../wording/numbers.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceWaterMissing: Rule<FactOf<'balance/water-missing'>> = {
  severity: 'information',
  message: ({ of, name, waterKgPerKg }) =>
    of === 'burn'
      ? `Neither fuel nor oxidant of ${quoted(name)} brings enough hydrogen for all the alkali to end as hydroxide or carbonate: ${formatNumber(waterKgPerKg)} kg of water per kg of fuel is missing, so oxide and peroxide stay. Humid air or injected water would bring it.`
      : `${quoted(name)} makes too little water for all its alkali to end as hydroxide: ${formatNumber(waterKgPerKg)} kg of water per kg would have to come from outside.`,
};
