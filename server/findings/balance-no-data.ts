/**
 * A figure is left out because something it needs is not known: no enthalpy of formation or heating value of a portion,
 * for example. What is missing is named; given in a `substance` definition, the figure appears.
 */
import { capitalised, listed, sharingHeads } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceNoData: Rule<FactOf<'balance/no-data'>> = {
  severity: 'warning',
  message: ({ what, missing }) =>
    `${capitalised(what)} cannot be worked out. Missing: ${listed(sharingHeads(missing))}.`,
};
