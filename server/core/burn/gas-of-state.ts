// The gas of a state apart from what floats in it: what it weighs, its heat capacity and its ratio of heat capacities, with
// the composition held. Knows no reactions. Invariant: condensed phases count in nothing here; ideal gas.

import { fillEnthalpies } from '../substance/property-set.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import type { MatterState } from './burn.ts';
import { amountOf } from './products.ts';

export interface GasOfState {
  readonly mol: number;
  readonly massKg: number;
  readonly molarMassKgPerMol: number;
  /** Without its water vapour; null where it is nothing else. */
  readonly dryMolarMassKgPerMol: number | null;
  /** J/(kg K) of gas at constant pressure. */
  readonly heatCapacityJPerKgK: number;
  readonly gamma: number;
}

/** Null without gas. */
export function gasOfState(state: MatterState): GasOfState | null {
  const { candidates, amountsMol, gasMol, gasMolarMassKgPerMol } = state;
  if (!(gasMol > 0)) return null;
  const size = candidates.phases.length;
  const capacities = new Float64Array(size);
  fillEnthalpies(candidates.properties, state.temperatureK, new Float64Array(size), capacities);
  let capacityOverR = 0;
  for (let phase = 0; phase < candidates.gasCount; phase += 1) {
    capacityOverR += (amountsMol[phase] ?? 0) * (capacities[phase] ?? 0);
  }
  const massKg = gasMol * gasMolarMassKgPerMol;
  const waterMol = amountOf(state, 'H2O(g)');
  const waterPhase = candidates.phases.findIndex(({ id }) => id === 'H2O(g)');
  const waterKg = waterMol * (candidates.molarMassKgPerMol[waterPhase] ?? 0);
  return {
    mol: gasMol,
    massKg,
    molarMassKgPerMol: gasMolarMassKgPerMol,
    dryMolarMassKgPerMol: gasMol - waterMol > 0 ? (massKg - waterKg) / (gasMol - waterMol) : null,
    heatCapacityJPerKgK: (capacityOverR * molarGasConstantJPerMolK) / massKg,
    gamma: capacityOverR / (capacityOverR - gasMol),
  };
}
