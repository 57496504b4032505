/**
 * A measured consumption has two points at the same load, so that no curve goes through both. The engine has no
 * consumption until one of them is taken away.
 */
import { formatPercent } from '../wording/numbers.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineRepeatedLoad: Rule<FactOf<'engine/repeated-load'>> = {
  severity: 'error',
  message: ({ load }) =>
    `There is more than one measured point at a load of ${formatPercent(load.value)}. Keep one for each load.`,
};
