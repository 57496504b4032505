/** Heat would have to flow from colder gas to hotter water, or the gas gives off less than the walls lose. */
import { celsiusText, shareText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineBoilerHeat: Rule<FactOf<'engine/boiler-heat'>> = {
  severity: 'error',
  message: (fact) => {
    switch (fact.why) {
      case 'none-left':
        return 'Down to that exhaust temperature the gas gives the steam nothing: it leaves hotter than the flame, or the walls take all. Lower the exhaust temperature or the heat loss.';
      case 'cold-stack':
        return `The gas cannot leave with ${celsiusText(fact.stack)}: the coldest water it meets, the feedwater, has ${celsiusText(fact.feedwater)}. Raise the exhaust temperature or take colder feedwater.`;
      case 'pinch':
        return `The gas above the boiling water's ${celsiusText(fact.boils)} gives only ${shareText(fact.share)} of the heat that evaporating and superheating take. Use less air, a lower boiler pressure, or let the gas leave hotter.`;
    }
  },
};
