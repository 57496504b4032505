// Two states at one temperature and pressure that share what is held between them, where the held property jumps: phases that
// change into one another there, a change inside one phase's table, or a crystal at the end of its data.
// Knows no search. Invariant: amounts, enthalpy, entropy and volume are those of the two states in the shares given, so elements
// are held as well as in the worse of the two.

import type { Equilibrium, Pinned } from './equilibrium.ts';

/** What is held, and how much of it each side has. */
export interface Parts {
  readonly held: number;
  readonly low: number;
  readonly high: number;
}

/**
 * Two certified states at one temperature and pressure that share what is held, each with its amount of that. Where these differ
 * by many powers of ten a single share would lose the smaller one in its last digits, so each side has its own.
 */
export function blended(low: Equilibrium, high: Equilibrium, parts: Parts): Equilibrium {
  const span = parts.high - parts.low;
  const highShare = (parts.held - parts.low) / span;
  const lowShare = (parts.high - parts.held) / span;
  const mix = (a: number, b: number): number => lowShare * a + highShare * b;
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
  const main = highShare < 0.5 ? low : high;
  const pinned = pinnedBetween(low, high);
  // The potentials are those of one side. Where the other's are not the same, a gas is there in another fraction than they ask
  // for, and the certificate says so; past the end of a crystal's data there are two, each with its own.
  let differing = 0;
  for (let phase = 0; phase < set.gasCount && pinned.by !== 'end-of-phase'; phase += 1) {
    if ((amountsMol[phase] ?? 0) > leastOfGas)
      differing = Math.max(differing, Math.abs((logFractions[phase] ?? NaN) - (main.logFractions[phase] ?? NaN)));
  }
  const enthalpyJ = mix(low.enthalpyJ, high.enthalpyJ);
  const entropyJPerK = mix(low.entropyJPerK, high.entropyJPerK);
  const { certificate: one } = low;
  const { certificate: other } = high;
  return {
    ...main,
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
    pinned,
    extrapolated: [...new Set([...low.extrapolated, ...high.extrapolated])],
    certificate: {
      elementBalance: Math.max(one.elementBalance, other.elementBalance),
      largestAffinity: Math.max(one.largestAffinity, other.largestAffinity),
      potentialResidual: Math.max(one.potentialResidual, other.potentialResidual) + differing,
      heldResidual: 0,
    },
  };
}

/** mol below which an amount has few digits left. */
const leastOfGas = 1e-290;

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
