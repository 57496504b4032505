/**
 * A relative humidity that cannot be at its state: the vapour would need more than the whole pressure, or the temperature
 * is one at which water has no saturation pressure.
 */
import { celsiusText, quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeHumidity: Rule<FactOf<'range/humidity'>> = {
  severity: 'error',
  message: ({ temperature, pressure }) =>
    `There is no air of that relative humidity at ${celsiusText(temperature)} and ${quantityText(pressure, 'bar')}: its vapour alone would reach the whole pressure, or water has no saturation pressure there. Give the state it was measured at, or a humidity ratio such as \`10 g/kg\`.`,
};
