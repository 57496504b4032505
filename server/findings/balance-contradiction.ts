/**
 * Two things that are given do not agree with each other, more than their rounding explains. The first is taken.
 */
import { capitalised } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceContradiction: Rule<FactOf<'balance/contradiction'>> = {
  severity: 'warning',
  message: ({ what, first, second }) =>
    `${capitalised(what)}: ${first} and ${second} do not agree. Correct one of them.`,
};
