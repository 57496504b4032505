/**
 * A temperature below absolute zero (0 K, −273.15 °C, −459.67 °F), or one at which the data of some species are not good
 * any more: their published tables end there, or the substance melts, boils or falls apart. Where the tables of all
 * products end, a burn has no state at all. An exhaust cannot be hotter than the flame it comes from.
 */
import { celsiusText } from '../wording/quantities.ts';
import { quoted, sentences } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const rangeTemperature: Rule<FactOf<'range/temperature'>> = {
  severity: ({ why }) => (why === 'below-absolute-zero' ? 'error' : 'warning'),
  message: (fact) => {
    if (fact.why === 'below-absolute-zero') {
      return `${quoted(fact.text)} is below absolute zero (−273.15 °C). Is the sign or the unit wrong?`;
    }
    if (fact.why === 'outside-tables') {
      const [from, to] = fact.range;
      return `${stateNames[fact.what]} cannot be worked out at ${celsiusText(fact.temperature)}: the data of all products lie between ${celsiusText(from)} and ${celsiusText(to)}.`;
    }
    if (fact.why === 'hotter-than-flame') {
      return `The exhaust would be at ${celsiusText(fact.temperature)}, hotter than the flame at ${celsiusText(fact.flame)}: heat above it would have to be brought in. Is the temperature or its unit mistyped?`;
    }
    const ranges = fact.species.map(({ name, range: [from, to] }) =>
      from.value === to.value
        ? `${quoted(name)} has one heat capacity, at ${celsiusText(from)}, taken as constant`
        : `${quoted(name)} has data from ${celsiusText(from)} to ${celsiusText(to)}`,
    );
    return sentences(
      fact.of === 'cooled-products'
        ? `Cooled to ${celsiusText(fact.temperature)} the products lean on values beyond their data: ${ranges.join('; ')}.`
        : `At ${celsiusText(fact.temperature)} this ${fact.of ?? 'reaction'} leans on values beyond their data: ${ranges.join('; ')}.`,
      fact.of !== undefined
        ? 'Take the result as a guess.'
        : 'Take the result as a guess, or give a state within the data.',
    );
  },
};

const stateNames = {
  cooled: 'The cooled products',
  exhaust: 'The exhaust',
  wall: 'What meets the wall',
} as const;
