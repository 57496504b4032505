// A state put together by hand for tests of what is read of states: candidates of some elements, amounts by phase id.
// Not an equilibrium: only the fields that follow from amounts and temperature are right, the rest are placeholders.

import { candidateSet } from '../../../../server/core/equilibrium/candidates.ts';
import type { Equilibrium } from '../../../../server/core/equilibrium/equilibrium.ts';
import { molarGasConstantJPerMolK } from '../../../../server/core/quantity/constants.ts';
import { fillEnthalpies } from '../../../../server/core/substance/property-set.ts';

export function handMadeState(
  elements: readonly string[],
  amounts: Readonly<Record<string, number>>,
  temperatureK = 1500,
  pressurePa = 1e5,
): Equilibrium {
  const candidates = candidateSet(elements, { ions: true });
  const amountsMol = new Float64Array(candidates.phases.length);
  for (const [id, mol] of Object.entries(amounts)) {
    const phase = candidates.phases.findIndex((one) => one.id === id);
    if (phase < 0) throw new Error(`No candidate ${id}`);
    amountsMol[phase] = mol;
  }
  const enthalpies = new Float64Array(amountsMol.length);
  const capacities = new Float64Array(amountsMol.length);
  fillEnthalpies(candidates.properties, temperatureK, enthalpies, capacities);
  const sum = (weights: Float64Array, from = 0, to = amountsMol.length): number => {
    let total = 0;
    for (let phase = from; phase < to; phase += 1) total += (amountsMol[phase] ?? 0) * (weights[phase] ?? 0);
    return total;
  };
  const gasMol = sum(new Float64Array(amountsMol.length).fill(1), 0, candidates.gasCount);
  const gasKg = sum(candidates.molarMassKgPerMol, 0, candidates.gasCount);
  const massKg = sum(candidates.molarMassKgPerMol);
  return {
    kind: 'equilibrium',
    candidates,
    temperatureK,
    pressurePa,
    amountsMol,
    logFractions: new Float64Array(amountsMol.length).fill(Number.NaN),
    potentials: new Float64Array(candidates.elements.length),
    gasMol,
    gasMolarMassKgPerMol: gasMol > 0 ? gasKg / gasMol : 0,
    volumeM3: (gasMol * molarGasConstantJPerMolK * temperatureK) / pressurePa,
    massKg,
    condensedMassShare: (massKg - gasKg) / massKg,
    enthalpyJ: sum(enthalpies) * molarGasConstantJPerMolK * temperatureK,
    entropyJPerK: Number.NaN,
    gibbsEnergyJ: Number.NaN,
    frozenHeatCapacityJPerK: sum(capacities) * molarGasConstantJPerMolK,
    heatCapacityJPerK: null,
    frozenGamma: gasMol > 0 ? sum(capacities) / (sum(capacities) - gasMol) : null,
    gamma: null,
    speedOfSoundMPerS: null,
    pinned: null,
    extrapolated: [],
    certificate: { elementBalance: 0, largestAffinity: 0, potentialResidual: 0, heldResidual: 0 },
    iterations: 0,
  };
}
