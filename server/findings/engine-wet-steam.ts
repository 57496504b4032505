/**
 * The steam that leaves the turbine carries more water than its last blades stand: drops wear them, and each per cent costs
 * about a per cent of the stage's efficiency, which is not counted.
 */
import { shareText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineWetSteam: Rule<FactOf<'engine/wet-steam'>> = {
  severity: 'warning',
  message: ({ wetness, usual }) =>
    `${shareText(wetness)} of the steam by mass is water where it leaves the turbine; about ${shareText(usual)} is the usual limit. Superheat further, reheat, lower the boiler pressure or raise that of the condenser.`,
};
