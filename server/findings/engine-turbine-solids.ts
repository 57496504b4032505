/**
 * Solid or molten products go through a gas turbine with its gas. They wear blades and build up on them within hours; no gas
 * turbine in use stands more than some parts per million, so the figures describe a machine that does not exist.
 */
import { celsiusText, shareText } from '../wording/quantities.ts';
import type { FactOf, Rule } from './rule.ts';

export const engineTurbineSolids: Rule<FactOf<'engine/turbine-solids'>> = {
  severity: 'warning',
  message: ({ share, inlet }) =>
    `${shareText(share)} of the gas by mass is solid or molten as it enters the turbine at ${celsiusText(inlet)}; blades stand some parts per million. Such a fuel is outside gas-turbine practice: take the solids out before the turbine, or fire it externally through an air heater.`,
};
