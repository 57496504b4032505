/**
 * Two entries say the same thing in different ways (a formula and a composition, a formation enthalpy and a heating
 * value), so that they may contradict each other. One of them is taken, and which is said. A lower and a higher heating value
 * may stand together as long as they agree within 1 %.
 */
import { quantityText } from '../wording/quantities.ts';
import { quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceContradiction: Rule<FactOf<'balance/contradiction'>> = {
  severity: 'warning',
  message: ({ what, first, second, compared }) =>
    compared
      ? `${quoted(first)} and the composition make ${quoted(second)} ${quantityText(compared.worked, compared.unit)}, and ${quantityText(compared.written, compared.unit)} is written. ${quoted(first)} is taken; is one of the three mistyped?`
      : `${quoted(first)} and ${quoted(second)} both say ${what}. ${quoted(first)} is taken; remove one of the two.`,
};
