/**
 * The compression ratio is the cylinder volume at bottom dead centre over the clearance volume, so it is above 1. At 1 or below nothing is
 * compressed and the engine has no cycle.
 */
import { quantityText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineCompressionRatio: Rule<FactOf<'engine/compression-ratio'>> = {
  severity: 'error',
  message: ({ ratio }) =>
    `A compression ratio is the cylinder volume at bottom dead centre over the clearance volume, so it is above 1; ${quantityText(ratio, '1')} is not. Write for example \`16.5\`.`,
};
