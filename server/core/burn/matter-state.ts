// What amounts of phases at a temperature and a pressure come to: gas, mass, enthalpy, heat capacity. Sums and nothing else.
// Knows no reactions, no condensation and no fuel. Invariant: the amounts are as they were given.

import { phasesBeyondData } from '../equilibrium/beyond-data.ts';
import type { CandidateSet } from '../equilibrium/candidates.ts';
import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { fillEnthalpies } from '../substance/property-set.ts';
import type { MatterState } from './burn.ts';

/** Amounts in mol in the order of the candidates' phases. */
export function matterState(
  candidates: CandidateSet,
  amountsMol: Float64Array,
  temperatureK: number,
  pressurePa: number,
): MatterState {
  const { phases, gasCount, properties, molarMassKgPerMol } = candidates;
  const size = phases.length;
  const enthalpies = new Float64Array(size);
  const capacities = new Float64Array(size);
  fillEnthalpies(properties, temperatureK, enthalpies, capacities);
  let enthalpyOverRT = 0;
  let capacityOverR = 0;
  let gasMol = 0;
  let gasKg = 0;
  let condensedKg = 0;
  for (let phase = 0; phase < size; phase += 1) {
    const mol = amountsMol[phase] ?? 0;
    if (mol === 0) continue;
    enthalpyOverRT += mol * (enthalpies[phase] ?? 0);
    capacityOverR += mol * (capacities[phase] ?? 0);
    const kg = mol * (molarMassKgPerMol[phase] ?? 0);
    if (phase < gasCount) {
      gasMol += mol;
      gasKg += kg;
    } else condensedKg += kg;
  }
  const massKg = gasKg + condensedKg;
  return {
    candidates,
    temperatureK,
    pressurePa,
    amountsMol,
    gasMol,
    gasMolarMassKgPerMol: gasMol > 0 ? gasKg / gasMol : 0,
    volumeM3: (gasMol * molarGasConstantJPerMolK * temperatureK) / pressurePa,
    massKg,
    condensedMassShare: condensedKg / massKg,
    enthalpyJ: enthalpyOverRT * molarGasConstantJPerMolK * temperatureK,
    frozenHeatCapacityJPerK: capacityOverR * molarGasConstantJPerMolK,
    frozenGamma: gasMol > 0 ? capacityOverR / (capacityOverR - gasMol) : null,
    extrapolated: phasesBeyondData(candidates, amountsMol, temperatureK, massKg),
  };
}
