/**
 * A salinity, temperature or depth for which the constants of sea water were not measured: they are extrapolated, or, far
 * beyond, not used at all.
 */
import { inUnit } from '../core/quantity/convert.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import { formatNumber } from '../wording/numbers.ts';
import { listed } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

type SeaWater = FactOf<'range/sea-water'>;

export const rangeSeaWater: Rule<SeaWater> = {
  severity: ({ refused }) => (refused ? 'error' : 'warning'),
  message: ({ what, quantity, beyond, refused }) => {
    const own = `${names[what]} of ${told(what, quantity)}`;
    if (refused) {
      return `There are no constants for sea water at ${own}; from ${told(what, refused.low)} to ${told(what, refused.high)} there are.`;
    }
    const ranges = beyond.map(({ of, low, high }) => `${of} from ${told(what, low)} to ${told(what, high)}`);
    return `The constants are extrapolated to ${own}: they were measured for ${listed(ranges)}. Take the figures as rough.`;
  },
};

const names = { salinity: 'a practical salinity', temperature: 'a temperature', depth: 'a depth' } as const;
const units = { salinity: null, temperature: 'degC', depth: 'm' } as const;
const shown = { salinity: '', temperature: ' °C', depth: ' m' } as const;

function told(what: SeaWater['what'], quantity: Quantity): string {
  const unit = units[what];
  return `${formatNumber(unit === null ? quantity.value : inUnit(quantity, unit))}${shown[what]}`;
}
