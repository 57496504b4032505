/** A gas turbine compresses: the pressure behind its compressor is above that before it. */
import { formatNumber } from '../wording/numbers.ts';
import type { FactOf, Rule } from './rule.ts';

export const enginePressureRatio: Rule<FactOf<'engine/pressure-ratio'>> = {
  severity: 'error',
  message: ({ ratio }) =>
    `A pressure ratio of ${formatNumber(ratio.value)} compresses nothing. Write the pressure behind over that before the compressor: 10 to 30 for gas turbines without a recuperator, 3 to 8 with one.`,
};
