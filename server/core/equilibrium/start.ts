// Where the search starts when nobody gives a neighbour: at the vertex of least energy, its gases mixed as the vertex has them,
// and balances that the vertex leaves empty brought near their solution one by one.
// Knows no answer. Invariant: the start is a function of the problem alone.

import { standardPressurePa } from '../quantity/constants.ts';
import { fillEnthalpies, fillGibbs } from '../substance/property-set.ts';
import { addPresent } from './descent.ts';
import { at, at32 } from './entry.ts';
import { takeFractions, takePressure, takeTemperature } from './newton.ts';
import type { Aim } from './newton.ts';
import type { Equilibrium } from './equilibrium.ts';
import { startBesideVapour } from './start-vapour.ts';
import { balanceTraces } from './traces.ts';
import { findVertex, forcedDown, markForced, takeBasis } from './vertex.ts';
import { mayBePresent } from './work.ts';
import type { Work } from './work.ts';

const firstTemperatureK = 1500;
const rarenessOfIons = 20;

/**
 * Finds a vertex and starts from it, at the temperature given or, where none is held, near the one at which the vertex has the
 * energy asked for. Returns the blamed element rows when the phases admitted cannot hold the elements.
 */
export function startCold(
  work: Work,
  aim: Aim,
  temperatureK: number | undefined,
  lowestK: number,
  highestK: number,
): readonly number[] | undefined {
  let startK = temperatureK ?? firstTemperatureK;
  const blamed = vertexAt(work, aim, startK);
  if (blamed !== undefined) return blamed;
  if (temperatureK !== undefined) {
    mixVertex(work, aim);
    return undefined;
  }
  const isDry = !hasGas(work);
  const vertexK = temperatureOfVertex(work, aim, startK);
  const warmerK = Math.min(Math.max(vertexK, Math.max(lowestK, 300)), highestK, 3500);
  if (Math.abs(warmerK - startK) > 150) {
    vertexAt(work, aim, warmerK);
    // Too much heat for the condensed phases, too little for the gas: between them.
    const isBetween = isDry && hasGas(work) && temperatureOfVertex(work, aim, warmerK) < warmerK;
    if (isBetween) vertexAt(work, aim, startK);
    else startK = warmerK;
  }
  mixVertex(work, aim);
  if (aim.isVolume || work.gasCount === 0 || hasGas(work)) return undefined;
  if (!(work.fractionSum > 1 || vertexK > startK)) return undefined;
  startBesideVapour(work, aim, vertexK, highestK);
  const boilingK = work.temperatureK;
  if (Math.abs(boilingK - startK) > 150) {
    // Others may be condensed there than where the search began.
    vertexAt(work, aim, boilingK);
    mixVertex(work, aim);
    if (!hasGas(work)) startBesideVapour(work, aim, vertexK, highestK);
  }
  return undefined;
}

/** Whether the vertex has a gas. */
function hasGas({ rank, basis, amounts, set }: Work): boolean {
  for (let k = 0; k < rank; k += 1) if (at32(basis, k) < set.gasCount && at(amounts, k) > 0) return true;
  return false;
}

/**
 * Starts from a state of the same candidates: its phases, its potentials, its temperature where none is held. False when it
 * has not the elements of the problem.
 */
export function startNear(work: Work, aim: Aim, temperatureK: number | undefined, near: Equilibrium): boolean {
  const { set, width, potential, condensed, condensedCount, scaleMol } = work;
  const chargeRow = set.hasCharge ? width - 1 : -1;
  for (let row = 0; row < width; row += 1) {
    if (row !== chargeRow && (at(work.given, row) === 0) !== Number.isNaN(at(near.potentials, row))) return false;
  }
  takeTemperature(work, aim, temperatureK ?? near.temperatureK);
  if (!takeBasis(work, near.amountsMol)) return false;
  for (let k = 0; k < work.rank; k += 1) {
    let sum = 0;
    for (let row = 0; row < width; row += 1) {
      const atoms = at(set.atoms, at32(work.basis, k) * width + row);
      if (atoms !== 0) sum += atoms * at(near.potentials, row);
    }
    // A phase keeps its activity rather than its potential: at another temperature, and where the state is a blend of two.
    const phase = at32(work.basis, k);
    const isGas = phase < set.gasCount;
    const isSame = temperatureK === undefined || temperatureK === near.temperatureK;
    const isAbsent = isSame && (isGas ? !(near.gasMol > 0) : !(at(near.amountsMol, phase) > 0));
    potential[k] = isAbsent
      ? sum
      : at(work.cost, phase) +
        (isGas ? at(near.logFractions, phase) : 0) +
        (isGas && aim.isVolume ? Math.log(near.pressurePa / standardPressurePa) : 0);
    if (work.isForced[k] === 1) potential[k] = at(work.cost, phase) - forcedDown;
    if (!Number.isFinite(at(potential, k))) return false;
  }
  work.presentCount = 0;
  work.isTied = false;
  for (let index = 0; index < condensedCount; index += 1) {
    const phase = at32(condensed, index);
    const amount = at(near.amountsMol, phase);
    if (amount > 0 && work.presentCount <= width) addPresent(work, phase, amount / scaleMol);
  }
  work.gasAmount = near.gasMol / scaleMol;
  takeFractions(work, aim);
  return true;
}

function vertexAt(work: Work, aim: Aim, temperatureK: number): readonly number[] | undefined {
  takeTemperature(work, aim, temperatureK);
  const { set, cost } = work;
  // A phase past its ends is not taken; ions only where nothing neutral can hold a balance, since a vertex that leaves both
  // empty must choose, and ions are the rarer traces.
  if (set.hasCharge) {
    for (let index = 0; index < work.gasCount; index += 1) {
      const gas = at32(work.gases, index);
      if (set.phases[gas]?.formula.charge !== 0) cost[gas] = at(cost, gas) + rarenessOfIons;
    }
  }
  for (let index = 0; index < work.condensedCount; index += 1) {
    const phase = at32(work.condensed, index);
    if (!mayBePresent(set, phase, temperatureK)) cost[phase] = at(cost, phase) + 1e3;
  }
  const blamed = findVertex(work);
  takePressure(work, aim.isVolume ? 0 : aim.logPressure);
  return blamed;
}

/** Temperature at which the vertex's phases hold the energy or the entropy asked for, by a few Newton steps. */
function temperatureOfVertex(work: Work, aim: Aim, fromK: number): number {
  const { rank, basis, amounts, enthalpy, heatCapacity, gibbs, set } = work;
  let gasAmount = 0;
  for (let k = 0; k < rank; k += 1) if (at32(basis, k) < set.gasCount) gasAmount += at(amounts, k);
  let temperatureK = fromK;
  for (let count = 0; count < 3; count += 1) {
    fillEnthalpies(set.properties, temperatureK, enthalpy, heatCapacity);
    if (aim.seeks === 'entropy') fillGibbs(set.properties, temperatureK, gibbs);
    let energy = 0;
    let entropy = 0;
    let capacity = 0;
    for (let k = 0; k < rank; k += 1) {
      const phase = at32(basis, k);
      const amount = at(amounts, k);
      if (amount <= 0) continue;
      const isGas = phase < set.gasCount;
      const lost = aim.isVolume && isGas ? 1 : 0;
      energy += amount * (at(enthalpy, phase) - lost);
      capacity += amount * (at(heatCapacity, phase) - lost);
      const logPressure = !isGas
        ? 0
        : aim.isVolume
          ? Math.log((amount * temperatureK) / aim.gasKPerBar)
          : Math.log(amount / gasAmount) + aim.logPressure;
      entropy += amount * (at(enthalpy, phase) - at(gibbs, phase) - logPressure);
    }
    const next =
      aim.seeks === 'entropy'
        ? temperatureK * Math.exp(Math.min(1, Math.max(-1, (aim.aimed - entropy) / capacity)))
        : temperatureK + (aim.aimed - energy * temperatureK) / capacity;
    temperatureK = Math.min(Math.max(next, 0.4 * temperatureK), 2.5 * temperatureK);
    if (Math.abs(next - temperatureK) < 20) break;
  }
  return Number.isFinite(temperatureK) ? temperatureK : fromK;
}

/** Potentials and amounts from the vertex. */
function mixVertex(work: Work, aim: Aim): void {
  const { rank, basis, amounts, set, cost, potential, isForced } = work;
  markForced(work);
  let gasAmount = 0;
  for (let k = 0; k < rank; k += 1) if (at32(basis, k) < set.gasCount) gasAmount += Math.max(0, at(amounts, k));
  work.presentCount = 0;
  work.isTied = false;
  work.gasAmount = gasAmount;
  const inGas = aim.isVolume ? aim.gasKPerBar / work.temperatureK : gasAmount;
  for (let k = 0; k < rank; k += 1) {
    const phase = at32(basis, k);
    const amount = at(amounts, k);
    potential[k] = at(cost, phase);
    if (phase >= set.gasCount) {
      // Also an empty one: with it the balances are independent, and it leaves if it comes out below nothing.
      if (isForced[k] === 1) potential[k] = at(potential, k) - forcedDown;
      else addPresent(work, phase, Math.max(0, amount));
    } else if (isForced[k] === 1) potential[k] = at(potential, k) - forcedDown;
    else if (inGas > 0) {
      const fraction = Math.max(amount, traceOfVertex * Math.max(gasAmount, 1e-30)) / inGas;
      potential[k] = at(potential, k) + Math.log(fraction);
    } else potential[k] = at(potential, k) + Math.log(traceOfVertex);
  }
  takeFractions(work, aim);
  if (work.gasAmount > 0) balanceTraces(work, aim);
}

/** What an empty balance's basis phase starts with, as a share of the gas. */
const traceOfVertex = 1e-9;
