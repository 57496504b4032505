/** Pressures and temperatures of water and steam that contradict each other, or that the formulation does not reach. */
import { celsiusText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

const limits = {
  'near-critical': 'lies near the critical point (above 350 °C and denser than steam)',
  pressure: 'lies outside 0.6 kPa to 100 MPa',
  temperature: 'lies outside 0 to 800 °C',
} as const;

export const engineSteamStates: Rule<FactOf<'engine/steam-states'>> = {
  severity: 'error',
  message: (fact) => {
    switch (fact.why) {
      case 'pressures':
        return 'The pressures do not fall from the boiler (over the reheater) to the condenser. Are two of them exchanged, or is one gauge instead of absolute?';
      case 'not-steam':
        return `Live steam of ${celsiusText(fact.asked)} is below saturation: at that pressure water boils at ${celsiusText(fact.boils)}. Raise the temperature or lower the boiler pressure.`;
      case 'reheat':
        return `Steam comes to the reheater with ${celsiusText(fact.from)} and would leave it with ${celsiusText(fact.asked)}. Reheat to more, or at a lower pressure.`;
      case 'feedwater':
        return `Feedwater of ${celsiusText(fact.asked)} is impossible here: it leaves the pump with ${celsiusText(fact.from)} and boils in the boiler at ${celsiusText(fact.to)}. Give a temperature between, or leave it out.`;
      case 'outside':
        return `The state at the ${fact.at} ${limits[fact.limit]}, where the formulation of water used here has no equation. Move the pressure or the temperature.`;
    }
  },
};
