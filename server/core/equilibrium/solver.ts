// States of lowest energy of one set of candidates: the quick way first, the sure way when that does not end at a certified
// minimum, and a true reason when there is no state.
// Knows no fuel. Invariant: an answer depends on the problem (and on `near`, where it is given) alone, never on what the
// solver did before; nothing is returned without its certificate.

import type { Check } from './answer.ts';
import type { CandidateSet } from './candidates.ts';
import type { Descent } from './descent.ts';
import type { Equilibrium, Held, NoEquilibrium } from './equilibrium.ts';
import type { Aim } from './newton.ts';
import { aimOf, checkOf } from './held.ts';
import { startCold, startNear } from './start.ts';
import { atTemperatureAndPressure, atTemperatureAndVolume, byTemperature, descendAndCertify } from './sure-way.ts';
import { admitPhases, ionsFromK, takeAmounts, workOf } from './work.ts';
import type { Work } from './work.ts';

/** Solves states of one candidate set; keeps its working arrays, so it belongs to one thread. */
export interface EquilibriumSolver {
  readonly candidates: CandidateSet;
  /**
   * The state of lowest energy of `elementMol` (mol, in the order of `candidates.elements`; the charge's is 0) with two
   * properties held. `near` is a state of the same candidates to start from: for use inside one question only.
   */
  solve(elementMol: Float64Array, held: Held, near?: Equilibrium): Equilibrium | NoEquilibrium;
}

/** The temperatures the tables span; a state outside is not answered. */
export const tablesK = { lowestK: 200, highestK: 6000 } as const;

export function equilibriumSolver(candidates: CandidateSet): EquilibriumSolver {
  const work = workOf(candidates);
  return { candidates, solve: (elementMol, held, near) => solve(work, elementMol, held, near) };
}

function solve(
  work: Work,
  elementMol: Float64Array,
  held: Held,
  near: Equilibrium | undefined,
): Equilibrium | NoEquilibrium {
  if (!isFinite(elementMol, held)) return { kind: 'none', reason: 'not-finite' };
  if (!takeAmounts(work, elementMol)) return { kind: 'none', reason: 'nothing' };
  const temperatureK = 'temperatureK' in held ? held.temperatureK : undefined;
  if (temperatureK !== undefined) {
    const { lowestK, highestK } = tablesK;
    if (temperatureK < lowestK) return { kind: 'none', reason: 'outside-tables', side: 'below', limitK: lowestK };
    if (temperatureK > highestK) return { kind: 'none', reason: 'outside-tables', side: 'above', limitK: highestK };
  }
  const aim = aimOf(held, work.scaleMol);
  const check = checkOf(held);
  const pressurePa = 'pressurePa' in held ? held.pressurePa : 0;
  const descent: Descent = { steps: 0, isOffProportion: false, step: { change: 0, taken: 0, gasChange: 0 } };
  const attempt = (hasIons: boolean): Equilibrium | NoEquilibrium => {
    // With temperature unknown a crystal may still be there below its end.
    admitPhases(work, temperatureK, hasIons);
    if (aim.isVolume && work.gasCount === 0) return { kind: 'none', reason: 'no-gas' };
    if (near === undefined || near.candidates !== work.set || !startNear(work, aim, temperatureK, near)) {
      const blamed = startCold(work, aim, temperatureK, tablesK.lowestK, tablesK.highestK);
      if (blamed !== undefined) return cannotForm(work, blamed);
    }
    const quick = descendAndCertify(work, elementMol, aim, tablesK, pressurePa, descent, check);
    if (quick !== undefined) return quick;
    // A neighbour says nothing about whether the elements can be held at this temperature.
    if (near !== undefined) {
      const blamed = startCold(work, aim, temperatureK, tablesK.lowestK, tablesK.highestK);
      if (blamed !== undefined) return cannotForm(work, blamed);
    }
    return sureWay(work, elementMol, aim, held, check, descent) ?? failed(elementMol, held);
  };
  if (!work.set.hasCharge || temperatureK !== undefined) {
    return attempt(work.set.hasCharge && (temperatureK ?? 0) >= ionsFromK);
  }
  const withIons = attempt(true);
  if (withIons.kind === 'equilibrium' && withIons.temperatureK >= ionsFromK) return withIons;
  const without = attempt(false);
  // Warm enough for ions and without an answer that has them is no answer.
  return without.kind === 'equilibrium' && without.temperatureK < ionsFromK * (1 + 1e-9) ? without : withIons;
}

function sureWay(
  work: Work,
  elementMol: Float64Array,
  aim: Aim,
  held: Held,
  check: Check,
  descent: Descent,
): Equilibrium | NoEquilibrium | undefined {
  switch (held.held) {
    case 'temperature-pressure':
      return atTemperatureAndPressure(work, elementMol, held.temperatureK, held.pressurePa, descent);
    case 'temperature-volume':
      return atTemperatureAndVolume(work, elementMol, held.temperatureK, held.volumeM3, descent);
    default:
      return check.kind === 'none' ? undefined : byTemperature(work, elementMol, aim, check, held, tablesK, descent);
  }
}

function cannotForm(work: Work, rows: readonly number[]): NoEquilibrium {
  return { kind: 'none', reason: 'cannot-form', elements: rows.map((row) => work.set.elements[row] ?? '') };
}

function failed(elementMol: Float64Array, held: Held): NoEquilibrium {
  return { kind: 'none', reason: 'not-converged', detail: JSON.stringify({ elementMol: [...elementMol], held }) };
}

function isFinite(elementMol: Float64Array, held: Held): boolean {
  for (const amount of elementMol) if (!(amount >= 0) || amount === Infinity) return false;
  for (const [key, value] of Object.entries(held)) {
    if (typeof value !== 'number') continue;
    const mustBePositive = key === 'temperatureK' || key === 'pressurePa' || key === 'volumeM3';
    if (!Number.isFinite(value) || (mustBePositive && value <= 0)) return false;
  }
  return true;
}
