// How a state of lowest energy moves when what it was asked for moves a little: first derivatives of temperature and amounts by
// each element's amount, by the held energy, entropy or temperature, and by pressure or volume, from the converged system.
// Knows no uncertainties and no fuel. Invariant: derivatives by the elements hold each element's balance.
// Method: implicit differentiation of the conditions of equilibrium; the phases present stay present, so at the point where one
// appears the derivatives are those of one side.

import { molarGasConstantJPerMolK } from '../quantity/constants.ts';
import { fillEnthalpies } from '../substance/property-set.ts';
import { solveDense } from './dense.ts';
import type { Equilibrium, Held } from './equilibrium.ts';
import { assemble, takeFractions } from './newton.ts';
import type { Aim } from './newton.ts';
import { aimOf } from './held.ts';
import { startNear } from './start.ts';
import { admitPhases, ionsFromK, takeAmounts, workOf } from './work.ts';
import type { Work } from './work.ts';

/** A first derivative of the state: K and mol per unit of what is moved. Amounts in the order of the candidates' phases. */
export interface Movement {
  readonly temperatureK: number;
  readonly amountsMol: Float64Array;
}

export interface Sensitivities {
  /** Per mol of each element, in the order of the candidates' elements; undefined for an absent element and the charge. */
  readonly byElement: readonly (Movement | undefined)[];
  /** Per J of the held enthalpy or energy, per J/K of the held entropy, or per K of the held temperature. */
  readonly byHeld: Movement;
  /** Per unit of the natural logarithm of the held pressure or volume. */
  readonly byLogPressureOrVolume: Movement;
}

/**
 * The derivatives of a state found for `elementMol` and `held`. Undefined where the conditions fix no single movement: phases
 * that share elements in a way the state leaves open, or elements locked together.
 */
export function sensitivitiesOf(state: Equilibrium, elementMol: Float64Array, held: Held): Sensitivities | undefined {
  const work = workOf(state.candidates);
  if (!takeAmounts(work, elementMol)) return undefined;
  const { temperatureK } = state;
  admitPhases(work, temperatureK, state.candidates.hasCharge && temperatureK >= ionsFromK);
  const aim: Aim = aimOf(held, work.scaleMol);
  if (!startNear(work, aim, temperatureK, state)) return undefined;
  fillEnthalpies(work.set.properties, temperatureK, work.enthalpy, work.heatCapacity);
  takeFractions(work, aim);
  const size = assemble(work, aim);
  const { matrix, right, rank, stride } = work;
  const kept = matrix.slice(0, size * stride);
  const solve = (fill: () => void): boolean => {
    right.fill(0, 0, size);
    fill();
    matrix.set(kept);
    return solveDense(matrix, stride, size, right, work.dense) > 1e-15;
  };
  const seeksHeat = aim.seeks !== 'temperature';
  const hasGasRow = !aim.isVolume && work.gasAmount > 0;
  const { width } = work;
  const chargeRow = work.set.hasCharge ? width - 1 : -1;

  const byElement: (Movement | undefined)[] = [];
  for (let row = 0; row < width; row += 1) {
    if (row === chargeRow || elementMol[row] === 0) {
      byElement.push(undefined);
      continue;
    }
    const shares = inBasis(work, row);
    if (shares === undefined) return undefined;
    const isSolved = solve(() => {
      right.set(shares);
      // With entropy held an element brings its own: T dS = dH - sum of potentials dn.
      if (aim.seeks === 'entropy')
        right[size - 1] = shares.reduce((sum, share, k) => sum + share * (work.potential[k] ?? 0), 0);
    });
    if (!isSolved) return undefined;
    byElement.push(movement(work, aim, size, { perScaled: 1, temperature: 1 / work.scaleMol, heldLogT: 0, shift: 0 }));
  }

  const perUnit = 1 / (molarGasConstantJPerMolK * work.scaleMol);
  const isMoved = solve(() => {
    if (aim.seeks === 'entropy') right[size - 1] = perUnit;
    else if (aim.seeks === 'energy') right[size - 1] = perUnit / temperatureK;
    else warm(work, aim, size);
  });
  if (!isMoved) return undefined;
  const byHeld = movement(
    work,
    aim,
    size,
    seeksHeat
      ? { perScaled: work.scaleMol, temperature: 1, heldLogT: 0, shift: 0 }
      : { perScaled: work.scaleMol / temperatureK, temperature: 1 / temperatureK, heldLogT: 1, shift: 0 },
  );

  const sign = aim.isVolume ? -1 : 1;
  const isPressed = solve(() => {
    const heat = press(work, aim, sign);
    if (hasGasRow) right[rank] = 1;
    // At constant entropy the work p dV or V dp is paid for in heat.
    if (seeksHeat) right[size - 1] = sign * (heat + (aim.seeks === 'entropy' ? work.gasAmount : 0));
  });
  if (!isPressed) return undefined;
  const factors = { perScaled: work.scaleMol, temperature: 1, heldLogT: 0, shift: -sign };
  return { byElement, byHeld, byLogPressureOrVolume: movement(work, aim, size, factors) };
}

interface Factors {
  /** From scaled amounts to mol, and from a change of ln T to one of T over T, for one unit of what is moved. */
  readonly perScaled: number;
  readonly temperature: number;
  /** The change of ln T where temperature is held. */
  readonly heldLogT: number;
  /** What pressure or volume adds to every gas's logarithmic amount. */
  readonly shift: number;
}

/** Changes of all amounts from the solved right side. */
function movement(work: Work, aim: Aim, size: number, factors: Factors): Movement {
  const { set, rank, width, right, gases, gasCount, nu, fraction, fractionSum, gasAmount, enthalpy } = work;
  const seeksHeat = aim.seeks !== 'temperature';
  const hasGasRow = !aim.isVolume && gasAmount > 0;
  const warmer = seeksHeat ? (right[size - 1] ?? 0) : factors.heldLogT;
  const amountsMol = new Float64Array(set.phases.length);
  const perFraction = gasAmount > 0 ? gasAmount / fractionSum : 0;
  const more = hasGasRow ? (right[rank] ?? 0) / gasAmount : 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = gases[index] ?? 0;
    let relative = more + factors.shift + ((enthalpy[gas] ?? 0) - (aim.isVolume ? 1 : 0)) * warmer;
    for (let k = 0; k < rank; k += 1) relative += (nu[gas * width + k] ?? 0) * (right[k] ?? 0);
    amountsMol[gas] = (fraction[gas] ?? 0) * perFraction * relative * factors.perScaled;
  }
  const firstPresent = rank + (hasGasRow ? 1 : 0);
  for (let index = 0; index < work.presentCount; index += 1) {
    amountsMol[work.present[index] ?? 0] = (right[firstPresent + index] ?? 0) * factors.perScaled;
  }
  return { temperatureK: work.temperatureK * warmer * factors.temperature, amountsMol };
}

/** Right side of one unit of ln T: what the phases' heats do to the conditions. */
function warm(work: Work, aim: Aim, size: number): void {
  const { right, rank, width, gases, gasCount, nu, fraction, fractionSum, gasAmount, enthalpy } = work;
  const hasGasRow = !aim.isVolume && gasAmount > 0;
  const perFraction = gasAmount > 0 ? gasAmount / fractionSum : 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = gases[index] ?? 0;
    const part = (fraction[gas] ?? 0) * perFraction * ((enthalpy[gas] ?? 0) - (aim.isVolume ? 1 : 0));
    for (let k = 0; k < rank; k += 1) right[k] = (right[k] ?? 0) - part * (nu[gas * width + k] ?? 0);
    if (hasGasRow) right[rank] = (right[rank] ?? 0) - part / gasAmount;
  }
  const firstPresent = rank + (hasGasRow ? 1 : 0);
  for (let row = firstPresent; row < size; row += 1)
    right[row] = -(enthalpy[work.present[row - firstPresent] ?? 0] ?? 0);
}

/** Right side of one unit of ln p (or of -ln V, by the sign) in the balances; returns the heat of the gas over RT. */
function press(work: Work, aim: Aim, sign: number): number {
  const { right, rank, width, gases, gasCount, nu, fraction, fractionSum, gasAmount, enthalpy } = work;
  const perFraction = gasAmount > 0 ? gasAmount / fractionSum : 0;
  let heat = 0;
  for (let index = 0; index < gasCount; index += 1) {
    const gas = gases[index] ?? 0;
    const amount = (fraction[gas] ?? 0) * perFraction;
    for (let k = 0; k < rank; k += 1) right[k] = (right[k] ?? 0) + sign * amount * (nu[gas * width + k] ?? 0);
    heat += amount * ((enthalpy[gas] ?? 0) - (aim.isVolume ? 1 : 0));
  }
  return heat;
}

/** One mole of an element written in the basis phases; undefined when they cannot make it up. */
function inBasis({ set, width, rank, basis, inverse }: Work, row: number): Float64Array | undefined {
  const shares = inverse.slice(row * width, row * width + rank);
  for (let element = 0; element < width; element += 1) {
    let made = 0;
    for (let k = 0; k < rank; k += 1) made += (shares[k] ?? 0) * (set.atoms[(basis[k] ?? 0) * width + element] ?? 0);
    if (Math.abs(made - (element === row ? 1 : 0)) > 1e-9) return undefined;
  }
  return shares;
}
