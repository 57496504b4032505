/**
 * Carbonate or hydroxide of alkali lies molten on hot metal and dissolves the oxide that protects it. This is no matter of
 * sulphur, and alloys made against sulphate hot corrosion need not stand it.
 */
import { celsiusText } from '../wording/quantities.ts';
import { metalText } from '../wording/metal.ts';
import { listed } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineBasicAttack: Rule<FactOf<'engine/basic-attack'>> = {
  severity: 'warning',
  message: ({ from, to, salts, firstMelting }) =>
    `${listed(salts)} ${salts.length > 1 ? 'lie' : 'lies'} molten on ${metalText(from, to)}${firstMelting ? ` (first melting at ${celsiusText(firstMelting)})` : ''} and ${salts.length > 1 ? 'dissolve' : 'dissolves'} its oxide (basic fluxing). Keep the metal below first melting, or take the solids out before it.`,
};
