/**
 * The gas of a gas turbine cannot have the temperature that is asked for: no amount of air makes it so hot, or it comes into
 * the combustor hotter than it is to leave it.
 */
import { celsiusText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineTurbineInlet: Rule<FactOf<'engine/turbine-inlet'>> = {
  severity: 'error',
  message: (fact) => {
    const where = fact.of === 'inlet' ? 'The turbine inlet' : 'The reheat';
    if (fact.why === 'not-hot-enough') {
      const mend =
        fact.of === 'inlet' ? 'Ask for less.' : 'Ask for less, or for a colder turbine inlet that leaves more oxygen.';
      return `${where} cannot reach ${celsiusText(fact.asked)}: with all its oxygen burnt the gas has ${celsiusText(fact.reaches)}. ${mend}`;
    }
    const comes = fact.of === 'inlet' ? 'the air already comes' : 'the gas already comes';
    return `${where} is to have ${celsiusText(fact.asked)}, but ${comes} with ${celsiusText(fact.comes)}. Ask for more.`;
  },
};
