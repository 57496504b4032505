/**
 * The products named under `products:` cannot hold what the fuel is made of, or hold something it does not have, so
 * there is no complete combustion to them.
 */
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceProducts: Rule<FactOf<'balance/products'>> = {
  severity: 'error',
  message: ({ fault }) => {
    switch (fault.reason) {
      case 'element-without-product':
        return `No product under \`products\` holds the ${listed(fault.elements)} of the fuel. Add one that does.`;
      case 'not-unique':
        return `With these products the amounts are not determined. Leave out ${fault.open === 1 ? 'one product' : `${fault.open} products`}.`;
      case 'negative':
        return `With these products there would be less than nothing of ${listed(fault.species.map(quoted))}. Take it out, or add another product.`;
      case 'impossible':
        return 'No amounts of these products hold just the elements of the fuel. Add a product, or exchange one.';
    }
  },
};
