/**
 * Water vapour near its saturation at a high pressure is no ideal gas: its dew point and the heat it gives off are then
 * worked out too coarsely.
 */
import { celsiusText, quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeRealGas: Rule<FactOf<'range/real-gas'>> = {
  severity: 'information',
  message: ({ temperature, vapourPressure, saturation }) =>
    `At ${celsiusText(temperature)} the water vapour (${quantityText(vapourPressure, 'bar')}, saturated at ${celsiusText(saturation)}) is no ideal gas any more: take this state as a guess.`,
};
