// What a problem holds, in the forms the solver's parts take it.
// Knows no state. Invariant: one place turns J, J/K, Pa and m³ into scaled numbers without dimension.

import { molarGasConstantJPerMolK, standardPressurePa } from '../quantity/constants.ts';
import type { Check } from './answer.ts';
import type { Held } from './equilibrium.ts';
import type { Aim } from './newton.ts';

/** What is held as the Newton step takes it, scaled by the amount of atoms. */
export function aimOf(held: Held, scaleMol: number): Aim {
  const isVolume = 'volumeM3' in held;
  const perScale = 1 / (molarGasConstantJPerMolK * scaleMol);
  const common = {
    isVolume,
    logPressure: 'pressurePa' in held ? Math.log(held.pressurePa / standardPressurePa) : 0,
    gasKPerBar: 'volumeM3' in held ? held.volumeM3 * standardPressurePa * perScale : 0,
  };
  switch (held.held) {
    case 'enthalpy-pressure':
      return { ...common, seeks: 'energy', aimed: held.enthalpyJ * perScale };
    case 'energy-volume':
      return { ...common, seeks: 'energy', aimed: held.energyJ * perScale };
    case 'entropy-pressure':
    case 'entropy-volume':
      return { ...common, seeks: 'entropy', aimed: held.entropyJPerK * perScale };
    default:
      return { ...common, seeks: 'temperature', aimed: 0 };
  }
}

/** What is held besides pressure, volume or temperature, to check an answer by. */
export function checkOf(held: Held): Check {
  switch (held.held) {
    case 'enthalpy-pressure':
      return { kind: 'enthalpy', value: held.enthalpyJ };
    case 'energy-volume':
      return { kind: 'energy', value: held.energyJ };
    case 'entropy-pressure':
    case 'entropy-volume':
      return { kind: 'entropy', value: held.entropyJPerK };
    default:
      return { kind: 'none' };
  }
}
