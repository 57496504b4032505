/**
 * An indicator of knock: the ignition integral of the last of the unburnt gas, its time over its ignition delay, is above 1
 * (integral of Livengood and Wu, delays of Douaud and Eyzat by octane number, burning over 40 degrees of the crankshaft). It
 * orders engines and fuels; it does not forecast.
 */
import { formatNumber } from '../wording/numbers.ts';
import { celsiusText, quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineKnock: Rule<FactOf<'engine/knock'>> = {
  severity: 'warning',
  message: ({ integral, endGas, octaneNumber }) =>
    `Knock is likely: at ${celsiusText(endGas)} and an octane number of ${quantityText(octaneNumber, '1')} the ignition integral of the end gas reaches ${formatNumber(integral)}, and it ignites at 1 (Livengood and Wu, delays of Douaud and Eyzat). Lower the compression ratio, the boost or its temperature, or burn leaner.`,
};
