// The pilot's share of the energy of all fuel, whether it was given by energy or by mass, with its uncertainty. Knows no
// engine and no fuel but their heating values. Invariant: a share of energy comes back as it is; source: its definition.

import type { PilotEntry } from './machinery.ts';
import type { QuantityList } from './quantity-list.ts';

/** Adds the share to the list; the heating values of the main fuel and of the pilot's are in J/kg. */
export function pilotShareIn(
  { share, by }: PilotEntry,
  list: QuantityList,
): (values: readonly number[], mainJPerKg: number, pilotJPerKg: number) => number {
  const given = list.add(share);
  return (values, mainJPerKg, pilotJPerKg) => {
    const value = given(values);
    return by === 'energy' ? value : (value * pilotJPerKg) / (value * pilotJPerKg + (1 - value) * mainJPerKg);
  };
}
