/**
 * Two entries say the same thing in different ways (a formula and a composition, a formation enthalpy and a heating
 * value), so that they may contradict each other. One of them is taken, and which is said.
 */
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceContradiction: Rule<FactOf<'balance/contradiction'>> = {
  severity: 'warning',
  message: ({ what, first, second }) =>
    `${quoted(first)} and ${quoted(second)} both say ${what}. ${quoted(first)} is taken; remove one of the two.`,
};
