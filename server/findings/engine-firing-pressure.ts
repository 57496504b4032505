/**
 * The cycle passes the stated maximum firing pressure: while it burns, or by compression alone. The figures are still those
 * of the cycle as written.
 */
import { quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineFiringPressure: Rule<FactOf<'engine/firing-pressure'>> = {
  severity: 'warning',
  message: ({ by, peak, maximum }) =>
    by === 'compression'
      ? `Compression alone reaches ${quantityText(peak, 'bar')}, above the maximum firing pressure of ${quantityText(maximum, 'bar')}. Lower the compression ratio or the boost pressure.`
      : `The peak pressure is ${quantityText(peak, 'bar')}, above the maximum firing pressure of ${quantityText(maximum, 'bar')}. Lower the compression ratio or the boost pressure, or take \`cycle: dual\`, which holds that pressure.`,
};
