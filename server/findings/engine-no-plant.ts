/** A gas turbine or a steam plant cannot be worked out: a state lies beyond all data, or it takes more work than it gives. */
import { celsiusText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineNoPlant: Rule<FactOf<'engine/no-plant'>> = {
  severity: 'error',
  message: (fact) => {
    if (fact.why === 'no-work') {
      return 'There is no net work: the compressor takes all that the turbine gives. Raise the turbine inlet temperature or the efficiencies, or lower the pressure ratio.';
    }
    const { stage, side, limit } = fact;
    return side === null || limit === null
      ? `There is no state for the ${stage} with these entries. Check temperatures, pressures and λ.`
      : `In the ${stage} it would be ${side === 'below' ? 'colder' : 'hotter'} than all data (${celsiusText(limit)}). Check temperatures, pressures and λ.`;
  },
};
