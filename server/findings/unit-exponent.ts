/**
 * A power that cannot be taken: the exponent has a unit, or it is not a small whole number though what is raised has a
 * unit. `(3 m)^2` is an area; `(3 m)^1.5` and `2^(3 kg)` are nothing.
 */
import { dimensionPhrase } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const unitExponent: Rule<FactOf<'unit/exponent'>> = {
  severity: 'error',
  message: ({ text, base }) =>
    `${quoted(base.text)} (${dimensionPhrase(base)}) cannot be raised to ${quoted(text)}. An exponent is a plain number, and a whole one where the base has a unit.`,
};
