/**
 * An indicator of misfire. A spray without a pilot must light by itself: compression has to pass the autoignition temperature,
 * and the ignition delay (Wolfer, for fuels with a cetane number above 50) must be short beside the turn of the crankshaft. A premixed
 * charge must hold enough fuel for a flame (lower flammable limit, lowered with temperature after Zabetakis).
 */
import { formatNumber } from '../wording/numbers.ts';
import { celsiusText, quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineMisfire: Rule<FactOf<'engine/misfire'>> = {
  severity: 'warning',
  message: (fact) => {
    switch (fact.why) {
      case 'autoignition':
        return `Compression ends at ${celsiusText(fact.temperature)}, below the autoignition temperature of the fuel (${celsiusText(fact.autoignition)}): without a pilot it does not light. Raise the compression ratio or the boost temperature, or write a \`pilot\`.`;
      case 'delay':
        return `At ${celsiusText(fact.temperature)} the ignition delay of the spray is ${quantityText(fact.delay, 'ms')} (Wolfer), ${formatNumber(fact.degrees)} degrees of the crankshaft at its speed: it is likely to misfire. Raise the compression ratio or the boost temperature.`;
      case 'lean':
        return `The charge holds ${quantityText(fact.share, '%')} of fuel by volume, below the lower flammable limit of ${quantityText(fact.limit, '%')} at ${celsiusText(fact.temperature)} (Zabetakis): it is likely to misfire. Lower λ or write a \`pilot\`.`;
    }
  },
};
