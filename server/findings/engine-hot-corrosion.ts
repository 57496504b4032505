/**
 * Hot metal lies in a window of temperature in which salts destroy its oxide: sulphate of alkali with sulphur from the fuel
 * (type II about 650 to 800 °C by pits, type I about 800 to 950 °C over a front), or melts of vanadium with alkali from
 * about 590 °C on. The windows are indications; rates depend on the alloy and on sulphur trioxide in the gas.
 */
import { metalText } from '../wording/metal.ts';
import { listed } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineHotCorrosion: Rule<FactOf<'engine/hot-corrosion'>> = {
  severity: 'warning',
  message: ({ by, from, to, salts }) => {
    const metal = metalText(from, to);
    if (by === 'vanadate') {
      return `Vanadium in the fuel meets ${metal}: its melts with alkali attack metal from about 590 °C on. Keep the metal colder, or bind the vanadium with magnesium.`;
    }
    const [type, window] =
      by === 'sulphate-type-1' ? ['type I', 'about 800 to 950 °C'] : ['type II', 'about 650 to 800 °C'];
    return `${listed(salts)} ${salts.length > 1 ? 'lie' : 'lies'} on ${metal}, in the window of ${type} sulphate hot corrosion (${window}). Keep sulphur or alkali out of the fuel, the metal out of the window, or coat it for that attack.`;
  },
};
