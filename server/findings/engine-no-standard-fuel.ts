/**
 * By its elements this is no marine fuel of ISO 8217:2024 at all, so none of that standard's limits says anything about it, and
 * no engine maker's approval for fuels of the standard covers it.
 */
import { listed, quoted } from '../wording/words.ts';
import type { FactOf, Rule } from './rule.ts';

const reasons = {
  metal: 'holds metal beyond any ash limit',
  oxygenate: 'holds more oxygen than fatty acid methyl esters do',
  nitrogen: 'holds nitrogen as no hydrocarbon does',
} as const;

export const engineNoStandardFuel: Rule<FactOf<'engine/no-standard-fuel'>> = {
  severity: 'information',
  message: ({ fuel, why }) =>
    `${quoted(fuel)} ${listed(why.map((one) => reasons[one]))}: it is no fuel of ISO 8217:2024 at all, rather than one above its limits. Ask the engine's maker.`,
};
