/**
 * A temperature below absolute zero (0 K, −273.15 °C, −459.67 °F).
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeTemperature: Rule<FactOf<'range/temperature'>> = {
  severity: 'error',
  message: ({ text }) => `${quoted(text)} is below absolute zero (−273.15 °C). Is the sign or the unit wrong?`,
};
