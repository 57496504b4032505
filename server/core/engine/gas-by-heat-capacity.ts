// A gas that the tables do not have, as a species of a mixture: its elements and molar mass, its enthalpy at 298.15 K and a
// heat capacity on a straight line of temperature. For the vapour of technical fuels, and for gases of constant properties.
// Knows no data. Invariant: enthalpy and entropy are the integrals of that heat capacity; the entropy at 298.15 K is
// the same for every such gas, and moves no engine, as its amount never changes while a state moves.

import { compileCurve } from '../substance/phase-curve.ts';
import { referenceTemperatureK } from '../substance/substance.ts';
import { tablesK } from '../equilibrium/solver.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import type { MixtureSpecies } from './frozen-mixture.ts';

export interface GasByHeatCapacity {
  /** Unlike that of any species it is mixed with. */
  readonly id: string;
  readonly composition: ReadonlyMap<string, number>;
  readonly molarMassKgPerMol: number;
  /** J/mol at 298.15 K. */
  readonly enthalpyJPerMol: number;
  /** J/(mol K) at 298.15 K, and its rise in J/(mol K²), which may be 0. */
  readonly heatCapacityJPerMolK: number;
  readonly heatCapacityRiseJPerMolK2: number;
  readonly validK: readonly [fromK: number, toK: number];
}

export function gasByHeatCapacity(gas: GasByHeatCapacity): MixtureSpecies {
  const { heatCapacityJPerMolK, heatCapacityRiseJPerMolK2: rise } = gas;
  const atZero = heatCapacityJPerMolK - rise * referenceTemperatureK;
  return {
    id: gas.id,
    molarMassKgPerMol: gas.molarMassKgPerMol,
    validK: gas.validK,
    formula: { composition: gas.composition, phase: 'g', charge: 0 },
    curve: compileCurve({
      // Terms of t^-2, t^-1, 1 and t in cp/R.
      pieces: [
        {
          fromK: tablesK.lowestK,
          terms: [0, 0, atZero / molarGasConstantJPerMolK, (1000 * rise) / molarGasConstantJPerMolK],
        },
      ],
      toK: tablesK.highestK,
      formationKJPerMol: gas.enthalpyJPerMol / 1000,
      entropyJPerMolK: nominalEntropyJPerMolK,
    }),
  };
}

/** About that of any gas; it cancels in every difference. */
const nominalEntropyJPerMolK = 200;
