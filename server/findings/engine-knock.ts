/**
 * An indicator of knock: the time that the last of the unburnt gas has, over the time it takes to light by itself, is above 1
 * (integral of Livengood and Wu, delays of Douaud and Eyzat by octane number, burning over 40 degrees of the crankshaft). It
 * orders engines and fuels; it does not forecast.
 */
import { formatNumber } from '../wording/numbers.ts';
import { celsiusText, quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineKnock: Rule<FactOf<'engine/knock'>> = {
  severity: 'warning',
  message: ({ integral, endGas, octaneNumber }) =>
    `Knock is likely: at ${celsiusText(endGas)} and an octane number of ${quantityText(octaneNumber, '1')} the end gas has ${formatNumber(integral)} times the time it takes to light by itself (Livengood and Wu, delays of Douaud and Eyzat). Lower the compression ratio, the boost or its temperature, or burn leaner.`,
};
