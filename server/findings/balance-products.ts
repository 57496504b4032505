/**
 * The products named under `products:` cannot hold what the fuel is made of, or hold something it does not have, so
 * there is no complete combustion to them.
 */
import type { FactOf, Rule } from './rule.ts';

export const balanceProducts: Rule<FactOf<'balance/products'>> = {
  severity: 'error',
  message: ({ reason }) => `Complete combustion to these products is not possible: ${reason.replace(/\.$/, '')}.`,
};
