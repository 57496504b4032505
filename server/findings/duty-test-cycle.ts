/**
 * A duty is a test cycle. Its figures serve a certificate; the fuel of a year needs the legs that are really run.
 */
import type { FactOf, Rule } from './rule.ts';

export const dutyTestCycle: Rule<FactOf<'duty/test-cycle'>> = {
  severity: 'information',
  message: ({ cycle }) =>
    `The test cycle ${cycle} certifies an engine and does not describe what one does. For fuel over a year, write the legs.`,
};
