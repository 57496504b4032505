/**
 * The products have no state of lowest energy that could be told: no product that is known and allowed holds some
 * element, or the flame would be hotter or colder than any of the data.
 */
import { celsiusText } from '../wording/quantities.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import { formatNumber } from '../wording/numbers.ts';
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

export const balanceNoEquilibrium: Rule<FactOf<'balance/no-equilibrium'>> = {
  severity: 'error',
  message: ({ name, of, fault }) => {
    const what = of === 'zone' ? `The flame zone of ${quoted(name)}` : `The flame of ${quoted(name)}`;
    if (fault.reason === 'cannot-form') {
      return `${what} cannot be worked out: no combination of the products that are known and allowed holds its ${listed(fault.elements)}. Allow more products, or leave the element out.`;
    }
    if (fault.reason === 'no-gas') {
      return `${what} cannot be worked out: none of the products that may form is a gas, so nothing fills the volume that is held. Hold a pressure, or allow a gas.`;
    }
    const limit = quantityOf(fault.limitK, knownUnit('K').dimension, undefined, 'temperature');
    const end = `${formatNumber(fault.limitK)} K (${celsiusText(limit)})`;
    return fault.side === 'above'
      ? `${what} would be hotter than ${end}, where the data of all products end. Is a temperature or the oxidant mistyped?`
      : `${what} would be colder than ${end}, where the data of all products begin. Does the fuel burn at all?`;
  },
};
