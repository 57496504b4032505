// Where a duty asks an engine for what is not known of it: idling without idle consumption, loads outside those measured.
// Reports nothing. Invariant: what is known of an engine's loads is the same on any fuel; so its own is asked.

import { fuelPowerAt } from '../core/engine/consumption.ts';
import type { DutyMachine } from './machinery.ts';

export interface UnmeasuredLoads {
  /** Engines that idle though their idle consumption is not known: there is no sum of fuel then. */
  readonly idling: readonly string[];
  /** Some load lies where consumption goes on in a straight line. */
  readonly isBeyond: boolean;
}

export function unmeasuredLoads(duty: DutyMachine): UnmeasuredLoads {
  const burning = duty.engines.map(({ machine }) => machine?.burning(machine.fuel));
  const idling = new Set<string>();
  let isBeyond = false;
  for (const { demands } of duty.planAt(duty.uncertain.map(({ value }) => value))) {
    for (const { engine, powerW } of demands) {
      const on = burning[engine];
      if (on?.kind !== 'burning' || !on.consumption) continue;
      const { fuelW, range } = fuelPowerAt(on.consumption, powerW);
      if (!fuelW) idling.add(duty.engines[engine]?.name ?? '');
      else if (range !== 'within') isBeyond = true;
    }
  }
  return { idling: [...idling], isBeyond };
}
