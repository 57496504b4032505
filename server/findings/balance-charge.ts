/**
 * Fuel and oxidant cannot be burnt as they are written: λ has no meaning for them, the flame zone would have more oxidant
 * than the whole, or a volume is held that no gas fills.
 */
import { formatNumber } from '../wording/numbers.ts';
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const byMass = 'Say how much there is with `oxidant per fuel: … kg/kg`.';

export const balanceCharge: Rule<FactOf<'balance/charge'>> = {
  severity: 'error',
  message: ({ fault, fuel, oxidant }) => {
    switch (fault.reason) {
      case 'no-valence': {
        const name = fault.of === 'fuel' ? fuel : oxidant;
        const counted = fault.elements.length === 1 ? 'has no valence that λ counts' : 'have no valence that λ counts';
        return `In ${quoted(name)}, ${listed(fault.elements)} ${counted}. ${byMass}`;
      }
      case 'no-oxygen-needed':
        return `${quoted(fuel)} needs no oxygen, so λ says nothing of it. ${byMass}`;
      case 'no-oxygen-offered':
        return `${quoted(oxidant)} has no oxygen to spare as λ counts it: what it holds is bound already. ${byMass}`;
      case 'not-positive':
        return fault.of === 'zone'
          ? 'The oxidant of the flame zone must be more than nothing.'
          : 'The oxidant must be more than nothing.';
      case 'zone-leaner':
        return `The flame zone would have ${formatNumber(fault.zoneKgPerKg)} kg of oxidant per kg of fuel, more than the ${formatNumber(fault.wholeKgPerKg)} kg of the whole. Make the zone richer, or the whole leaner.`;
      case 'no-gas':
        return `Neither ${quoted(fuel)} nor ${quoted(oxidant)} is a gas before it burns, so there is no volume to hold. Hold a pressure instead: \`held: pressure 10 bar\`.`;
    }
  },
};
