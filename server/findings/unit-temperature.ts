/**
 * A temperature where only a temperature difference makes sense, or the other way round, or a temperature that is
 * multiplied or negated. 20 °C is a point on a scale; twice 20 °C is nothing.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const unitTemperature: Rule<FactOf<'unit/temperature'>> = {
  severity: 'error',
  message: ({ why, text }) => {
    switch (why) {
      case 'difference-needed':
        return `${quoted(text)} is a temperature, but a temperature difference is needed here. Write it in K, for example \`100 K\`.`;
      case 'temperature-needed':
        return `${quoted(text)} is a temperature difference, but a temperature is needed here. Write for example \`25 degC\` or \`298 K\`.`;
      case 'scaled':
        return `${quoted(text)} multiplies, divides or negates a temperature, which is a point on a scale. Use a difference, or write the temperature in K.`;
    }
  },
};
