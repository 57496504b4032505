// Two states at one temperature and pressure that share what is held between them, where the held property jumps: phases that
// change into one another there, a change inside one phase's table, or a crystal at the end of its data.
// Knows no search. Invariant: amounts, enthalpy, entropy and volume are those of the two states in the shares given, so elements
// are held as well as in the worse of the two.

import { answerOf } from './answer.ts';
import { phasesBeyondData } from './beyond-data.ts';
import type { Certificate, Equilibrium, Pinned } from './equilibrium.ts';

/** What is held, and how much of it each side has. */
export interface Parts {
  readonly held: number;
  readonly low: number;
  readonly high: number;
}

/** mol below which an amount has few digits left, and its fraction is that of one side. */
const leastOfGas = 1e-290;

/**
 * Two certified states at one temperature and pressure that share what is held, each with its amount of that. Where these differ
 * by many powers of ten a single share would lose the smaller one in its last digits, so each side has its own.
 */
export function blended(low: Equilibrium, high: Equilibrium, parts: Parts, elementMol: Float64Array): Equilibrium {
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
  const main = highShare < 0.5 ? low : high;
  const logFractions = (hasBoth ? main : low.gasMol > 0 ? low : high).logFractions.map((logarithm, phase) => {
    const amount = amountsMol[phase] ?? 0;
    return hasBoth && phase < set.gasCount && amount > leastOfGas ? Math.log(amount / gasMol) : logarithm;
  });
  const pinned = pinnedBetween(low, high);
  const enthalpyJ = mix(low.enthalpyJ, high.enthalpyJ);
  const entropyJPerK = mix(low.entropyJPerK, high.entropyJPerK);
  const pressurePa = mix(low.pressurePa, high.pressurePa);
  return {
    ...main,
    pressurePa,
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
    extrapolated: phasesBeyondData(set, amountsMol, main.temperatureK, main.massKg),
    // Past the end of a crystal's data there are two states, each with its own potentials; elsewhere one set of them must do.
    certificate:
      pinned.by === 'end-of-phase'
        ? worse(low.certificate, high.certificate)
        : certificateOf({ ...main, pressurePa, amountsMol, logFractions }, elementMol),
  };
}

function certificateOf(state: Equilibrium, elementMol: Float64Array): Certificate {
  const response = { heatCapacityJPerK: null, gamma: null, pinned: null };
  return answerOf(state.candidates, state, response, elementMol, { kind: 'none' }, 0).certificate;
}

function worse(one: Certificate, other: Certificate): Certificate {
  return {
    elementBalance: Math.max(one.elementBalance, other.elementBalance),
    largestAffinity: Math.max(one.largestAffinity, other.largestAffinity),
    potentialResidual: Math.max(one.potentialResidual, other.potentialResidual),
    heldResidual: 0,
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
