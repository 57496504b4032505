// From a state at rest to an answer: amounts, potentials, the certificate, and the properties that follow from the state.
// Knows no way by which the state was found. Invariant: certificate and properties are worked out from the amounts and the
// element potentials alone, so that a mistake on the way here shows.
// Derivatives at equilibrium: the converged system solved for a change of temperature and for one of pressure; heat capacities,
// isentropic exponent and speed of sound follow by the relations that hold for any substance (Smith and Missen 1982).

import { molarGasConstantJPerMolK, standardPressurePa } from '../quantity/constants.ts';
import { fillEnthalpies, fillGibbs } from '../substance/property-set.ts';
import { phasesBeyondData } from './beyond-data.ts';
import type { CandidateSet } from './candidates.ts';
import { madeUpBy } from './descent.ts';
import { solveDense } from './dense.ts';
import { at, at32 } from './entry.ts';
import type { Certificate, Equilibrium, Pinned } from './equilibrium.ts';
import { assemble } from './newton.ts';
import type { Aim } from './newton.ts';
import { mayBePresent } from './work.ts';
import type { Work } from './work.ts';

/** The limits of a certificate. */
export const certificateLimits: Certificate = {
  elementBalance: 1e-10,
  largestAffinity: 1e-8,
  potentialResidual: 1e-8,
  heldResidual: 1e-9,
};

export function isCertified(certificate: Certificate): boolean {
  return (
    certificate.elementBalance <= certificateLimits.elementBalance &&
    certificate.largestAffinity <= certificateLimits.largestAffinity &&
    certificate.potentialResidual <= certificateLimits.potentialResidual &&
    certificate.heldResidual <= certificateLimits.heldResidual
  );
}

/** What a state is, in amounts as they were given. */
export interface State {
  readonly temperatureK: number;
  readonly pressurePa: number;
  readonly amountsMol: Float64Array;
  readonly logFractions: Float64Array;
  readonly potentials: Float64Array;
}

/** How a state answers to heat and pressure. */
export interface Response {
  readonly heatCapacityJPerK: number | null;
  readonly gamma: number | null;
  readonly pinned: Pinned | null;
}

/** What is held besides pressure or volume, to be checked: J or J/K of the whole amount. */
export type Check =
  { readonly kind: 'none' } | { readonly kind: 'enthalpy' | 'energy' | 'entropy'; readonly value: number };

/** Reads the state at rest out of the work; its fractions are those at the held pressure. */
export function stateOf(work: Work, pressurePa: number): State {
  const { set, gases, gasCount, gasAmount, fraction, fractionSum, logFraction, scaleMol } = work;
  const amountsMol = new Float64Array(set.phases.length);
  const logFractions = new Float64Array(set.phases.length).fill(-Infinity);
  logFractions.fill(Number.NaN, set.gasCount);
  const shift = gasAmount > 0 ? Math.log(fractionSum) : 0;
  const perFraction = gasAmount > 0 ? (gasAmount * scaleMol) / fractionSum : 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = at32(gases, index);
    amountsMol[gas] = at(fraction, gas) * perFraction;
    logFractions[gas] = at(logFraction, gas) - shift;
  }
  for (let index = 0; index < work.presentCount; index += 1) {
    amountsMol[at32(work.present, index)] = Math.max(0, at(work.presentAmount, index)) * scaleMol;
  }
  return {
    temperatureK: work.temperatureK,
    pressurePa,
    amountsMol,
    logFractions,
    potentials: elementPotentials(work),
  };
}

/**
 * Potentials of the elements over RT: each element is worth what the basis phases that it is of are; NaN for an absent element
 * (and for the charge where no ion takes part), 0 for one locked to others.
 */
function elementPotentials(work: Work): Float64Array {
  const { set, width, rank, basis, potential, given, inverse } = work;
  const chargeRow = set.hasCharge ? width - 1 : -1;
  let hasIons = false;
  for (let k = 0; k < rank; k += 1)
    hasIons ||= chargeRow >= 0 && at(set.atoms, at32(basis, k) * width + chargeRow) !== 0;
  const potentials = new Float64Array(width);
  for (let row = 0; row < width; row += 1) {
    const isAbsent = row === chargeRow ? !hasIons : at(given, row) === 0;
    let worth = 0;
    for (let k = 0; k < rank; k += 1) worth += at(inverse, row * width + k) * at(potential, k);
    potentials[row] = isAbsent ? Number.NaN : worth;
  }
  return potentials;
}

/** How the state at rest answers to heat and pressure. `aim` holds a pressure. */
export function responseOf(work: Work, aim: Aim): Response {
  const { rank, stride, matrix, right, gasAmount, scaleMol } = work;
  fillEnthalpies(work.set.properties, work.temperatureK, work.enthalpy, work.heatCapacity);
  const size = assemble(work, { ...aim, seeks: 'energy' }) - 1;
  const heatRow = size;
  const own = matrix[heatRow * stride + heatRow] as number;
  const heats = Float64Array.from({ length: size }, (_, row) => at(matrix, row * stride + heatRow));
  const kept = matrix.slice(0, size * stride);
  for (let row = 0; row < size; row += 1) right[row] = -at(heats, row);
  const quality = size === 0 ? 1 : solveDense(matrix, stride, size, right, work.dense);
  if (!(quality > 1e-13)) return { heatCapacityJPerK: null, gamma: null, pinned: phaseChange(work) };
  let capacity = own;
  for (let row = 0; row < size; row += 1) capacity += at(heats, row) * at(right, row);
  const heatCapacityJPerK = capacity * molarGasConstantJPerMolK * scaleMol;
  if (!(gasAmount > 0)) return { heatCapacityJPerK, gamma: null, pinned: null };
  const expansion = 1 + at(right, rank) / gasAmount;
  matrix.set(kept);
  right.fill(0, 0, size);
  for (let k = 0; k < rank; k += 1) right[k] = at(matrix, k * stride + rank) * gasAmount;
  right[rank] = 1;
  if (!(solveDense(matrix, stride, size, right, work.dense) > 1e-13)) {
    return { heatCapacityJPerK, gamma: null, pinned: null };
  }
  const compression = 1 - at(right, rank) / gasAmount;
  const atVolume = capacity - (gasAmount * expansion * expansion) / compression;
  return { heatCapacityJPerK, gamma: capacity / atVolume / compression, pinned: null };
}

/** Which phases make each other up, seen as heat is added. */
function phaseChange(work: Work): Pinned | null {
  const { presentCount, present, enthalpy, gasAmount } = work;
  for (let index = 0; index < presentCount; index += 1) {
    const phase = at32(present, index);
    // Put the phase last and ask whether the others make it up.
    const last = presentCount - 1;
    swapPresent(work, index, last);
    work.presentCount = last;
    const shares = madeUpBy(work, phase, gasAmount > 0)?.slice();
    work.presentCount = presentCount;
    swapPresent(work, index, last);
    if (shares === undefined) continue;
    const others = Array.from({ length: presentCount }, (_, other) => other).filter((other) => other !== index);
    // The order the shares stand in: that of the others after the swap.
    if (index !== last) others.splice(index, 0, ...others.splice(others.indexOf(last), 1));
    let heat = at(enthalpy, phase);
    others.forEach((other, place) => (heat -= at(shares, place) * at(enthalpy, at32(present, other))));
    const gasShare = gasAmount > 0 ? at(shares, presentCount - 1) : 0;
    if (gasShare !== 0) heat -= gasShare * meanEnthalpyOfGas(work);
    const sign = heat > 0 ? 1 : -1;
    const leaving: number[] = [];
    const appearing: number[] = [];
    (sign > 0 ? appearing : leaving).push(phase);
    others.forEach((other, place) => {
      const share = at(shares, place) * sign;
      if (share > 1e-9) leaving.push(at32(present, other));
      else if (share < -1e-9) appearing.push(at32(present, other));
    });

    return { by: 'phase-change', leaving, appearing, gasGrows: gasShare * sign < 0 };
  }
  return null;
}

function swapPresent({ present, presentAmount }: Work, a: number, b: number): void {
  const phase = at32(present, a);
  present[a] = at32(present, b);
  present[b] = phase;
  const amount = at(presentAmount, a);
  presentAmount[a] = at(presentAmount, b);
  presentAmount[b] = amount;
}

function meanEnthalpyOfGas({ gases, gasCount, fraction, fractionSum, enthalpy }: Work): number {
  let sum = 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = at32(gases, index);
    sum += at(fraction, gas) * at(enthalpy, gas);
  }
  return sum / fractionSum;
}

const roomOf = new WeakMap<CandidateSet, { gibbs: Float64Array; enthalpy: Float64Array; capacity: Float64Array }>();

/**
 * The answer of a state: properties of the whole amount, and its certificate against the elements given (mol), every
 * candidate, and what was held.
 */
export function answerOf(
  set: CandidateSet,
  state: State,
  response: Response,
  elementMol: Float64Array,
  check: Check,
  iterations: number,
): Equilibrium {
  const size = set.phases.length;
  let room = roomOf.get(set);
  if (room === undefined) {
    room = { gibbs: new Float64Array(size), enthalpy: new Float64Array(size), capacity: new Float64Array(size) };
    roomOf.set(set, room);
  }
  const { gibbs, enthalpy, capacity } = room;
  const { temperatureK, pressurePa, amountsMol, logFractions, potentials } = state;
  fillGibbs(set.properties, temperatureK, gibbs);
  fillEnthalpies(set.properties, temperatureK, enthalpy, capacity);
  const width = set.elements.length;
  const logPressure = Math.log(pressurePa / standardPressurePa);
  let gasMol = 0;
  let gasMass = 0;
  let mass = 0;
  let heat = 0;
  let entropy = 0;
  let frozen = 0;
  let largestAffinity = -Infinity;
  let potentialResidual = 0;
  let gasSum = 0;
  const found = new Float64Array(width);
  for (let phase = 0; phase < size; phase += 1) {
    const amount = at(amountsMol, phase);
    const isGas = phase < set.gasCount;
    const column = phase * width;
    let residual = -at(gibbs, phase);
    for (let row = 0; row < width; row += 1) {
      const atoms = at(set.atoms, column + row);
      if (atoms === 0) continue;
      if (amount !== 0) found[row] = at(found, row) + atoms * amount;
      residual += atoms * at(potentials, row);
    }
    // An absent element's potential is NaN: its phases cannot form.
    if (Number.isNaN(residual)) continue;
    if (isGas) gasSum += Math.exp(Math.min(300, residual - logPressure));
    if (amount > 0) {
      const logFraction = isGas ? at(logFractions, phase) : 0;
      potentialResidual = Math.max(potentialResidual, Math.abs(residual - (isGas ? logFraction + logPressure : 0)));
      if (isGas) {
        gasMol += amount;
        gasMass += amount * at(set.molarMassKgPerMol, phase);
      }
      mass += amount * at(set.molarMassKgPerMol, phase);
      heat += amount * at(enthalpy, phase);
      frozen += amount * at(capacity, phase);
      entropy += amount * (at(enthalpy, phase) - at(gibbs, phase) - (isGas ? logFraction + logPressure : 0));
    } else if (!isGas && mayBePresent(set, phase, temperatureK)) {
      largestAffinity = Math.max(largestAffinity, residual);
    }
  }
  // Of gases the sum of what the potentials ask for must be 1, or no more than 1 where there is no gas.
  if (gasMol > 0) potentialResidual = Math.max(potentialResidual, Math.abs(Math.log(gasSum)));
  else if (gasSum > 0) largestAffinity = Math.max(largestAffinity, Math.log(gasSum));
  let elementBalance = 0;
  let atoms = 0;
  for (let row = 0; row < width; row += 1) {
    const given = at(elementMol, row);
    atoms += given;
    if (given > 0) elementBalance = Math.max(elementBalance, Math.abs(at(found, row) - given) / given);
  }
  if (set.hasCharge) elementBalance = Math.max(elementBalance, Math.abs(at(found, width - 1)) / atoms);
  const gasConstant = molarGasConstantJPerMolK;
  const enthalpyJ = heat * gasConstant * temperatureK;
  const entropyJPerK = entropy * gasConstant;
  const reached =
    check.kind === 'entropy'
      ? entropyJPerK
      : enthalpyJ - (check.kind === 'energy' ? gasMol * gasConstant * temperatureK : 0);
  const heldScale = gasConstant * atoms * (check.kind === 'entropy' ? 1 : temperatureK);
  const frozenHeatCapacityJPerK = frozen * gasConstant;
  const frozenGamma = gasMol > 0 ? frozen / (frozen - gasMol) : null;
  return {
    kind: 'equilibrium',
    candidates: set,
    temperatureK,
    pressurePa,
    amountsMol,
    logFractions,
    potentials,
    gasMol,
    gasMolarMassKgPerMol: gasMol > 0 ? gasMass / gasMol : 0,
    volumeM3: (gasMol * gasConstant * temperatureK) / pressurePa,
    massKg: mass,
    condensedMassShare: mass > 0 ? (mass - gasMass) / mass : 0,
    enthalpyJ,
    entropyJPerK,
    gibbsEnergyJ: enthalpyJ - temperatureK * entropyJPerK,
    frozenHeatCapacityJPerK,
    heatCapacityJPerK: response.heatCapacityJPerK,
    frozenGamma,
    gamma: response.gamma,
    speedOfSoundMPerS:
      response.gamma === null ? null : Math.sqrt((response.gamma * gasMol * gasConstant * temperatureK) / mass),
    pinned: response.pinned,
    extrapolated: phasesBeyondData(set, amountsMol, temperatureK, mass),
    certificate: {
      elementBalance,
      largestAffinity: largestAffinity === -Infinity ? 0 : largestAffinity,
      potentialResidual,
      heldResidual: check.kind === 'none' ? 0 : Math.abs(reached - check.value) / heldScale,
    },
    iterations,
  };
}
