/**
 * A leg asks an engine for more than its maximum continuous rating. Its consumption there is extrapolated in a straight line;
 * no engine gives that power for long.
 */
import { formatPercent } from '../wording/numbers.ts';
import { quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineOverload: Rule<FactOf<'engine/overload'>> = {
  severity: 'warning',
  message: ({ leg, engine, power, rating }) =>
    `${quoted(leg)} asks ${quoted(engine)} for ${quantityText(power)}, which is ${formatPercent(power.value / rating.value)} of its rating of ${quantityText(rating)}. Lower the load or the speed, or share it with another engine.`,
};
