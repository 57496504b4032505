// Two states at one temperature and pressure that share what is held between them, where the held property jumps: phases that
// change into one another there, a change inside one phase's table, or a crystal at the end of its data.
// Knows no search. Invariant: amounts, enthalpy, entropy and volume are those of the two states in the shares given, so elements
// are held as well as in the worse of the two.

import type { Equilibrium, Pinned } from './equilibrium.ts';

/** Two certified states at one temperature and pressure that share what is held. */
export function blended(low: Equilibrium, high: Equilibrium, share: number): Equilibrium {
  const mix = (a: number, b: number): number => a + share * (b - a);
  const set = low.candidates;
  const amountsMol = low.amountsMol.map((amount, phase) => mix(amount, high.amountsMol[phase] ?? 0));
  let gasMol = 0;
  let gasMass = 0;
  for (let phase = 0; phase < set.gasCount; phase += 1) {
    gasMol += amountsMol[phase] ?? 0;
    gasMass += (amountsMol[phase] ?? 0) * (set.molarMassKgPerMol[phase] ?? 0);
  }
  const hasBoth = low.gasMol > 0 && high.gasMol > 0;
  const logFractions = (low.gasMol > 0 ? low : high).logFractions.map((logarithm, phase) => {
    const amount = amountsMol[phase] ?? 0;
    return hasBoth && phase < set.gasCount && amount > 0 ? Math.log(amount / gasMol) : logarithm;
  });
  const enthalpyJ = mix(low.enthalpyJ, high.enthalpyJ);
  const entropyJPerK = mix(low.entropyJPerK, high.entropyJPerK);
  const { certificate: one } = low;
  const { certificate: other } = high;
  return {
    ...(share < 0.5 ? low : high),
    pressurePa: mix(low.pressurePa, high.pressurePa),
    amountsMol,
    logFractions,
    gasMol,
    gasMolarMassKgPerMol: gasMol > 0 ? gasMass / gasMol : 0,
    volumeM3: mix(low.volumeM3, high.volumeM3),
    condensedMassShare: mix(low.condensedMassShare, high.condensedMassShare),
    enthalpyJ,
    entropyJPerK,
    gibbsEnergyJ: enthalpyJ - low.temperatureK * entropyJPerK,
    frozenHeatCapacityJPerK: mix(low.frozenHeatCapacityJPerK, high.frozenHeatCapacityJPerK),
    heatCapacityJPerK: null,
    frozenGamma: null,
    gamma: null,
    speedOfSoundMPerS: null,
    pinned: pinnedBetween(low, high),
    extrapolated: [...new Set([...low.extrapolated, ...high.extrapolated])],
    certificate: {
      elementBalance: Math.max(one.elementBalance, other.elementBalance),
      largestAffinity: Math.max(one.largestAffinity, other.largestAffinity),
      potentialResidual: Math.max(one.potentialResidual, other.potentialResidual),
      heldResidual: 0,
    },
  };
}

function pinnedBetween(low: Equilibrium, high: Equilibrium): Pinned {
  const set = low.candidates;
  const leaving: number[] = [];
  const appearing: number[] = [];
  let atoms = 0;
  for (let phase = 0; phase < set.phases.length; phase += 1)
    atoms += (low.amountsMol[phase] ?? 0) * (set.atomCount[phase] ?? 1);
  for (let phase = set.gasCount; phase < set.phases.length; phase += 1) {
    const change = (high.amountsMol[phase] ?? 0) - (low.amountsMol[phase] ?? 0);
    if (change < -1e-9 * atoms) leaving.push(phase);
    else if (change > 1e-9 * atoms) appearing.push(phase);
  }
  const gasGrows = high.gasMol - low.gasMol > 1e-9 * atoms;
  const endsHere = leaving.some((phase) => (set.endK[phase] ?? Infinity) <= high.temperatureK);
  const isStill = leaving.length === 0 && appearing.length === 0 && !gasGrows;
  return { by: endsHere ? 'end-of-phase' : isStill ? 'transition' : 'phase-change', leaving, appearing, gasGrows };
}
