// Whether a refusal of the minimiser is true: that the elements really cannot be put together from the candidates, that a
// state really lies beyond the tables. Uses no part of the minimiser but its answers at a given temperature, which are proven
// elsewhere. Invariant: `not-converged` is never true.

import { charge } from '../../server/core/equilibrium/candidates.ts';
import type { CandidateSet } from '../../server/core/equilibrium/candidates.ts';
import type { Equilibrium, Held, NoEquilibrium } from '../../server/core/equilibrium/equilibrium.ts';
import type { EquilibriumSolver } from '../../server/core/equilibrium/solver.ts';
import { ionsFromK } from '../../server/core/equilibrium/work.ts';

/** Why the refusal is not believed, or undefined for one that holds. */
export function doubtOf(
  solver: EquilibriumSolver,
  elementMol: Float64Array,
  held: Held,
  refusal: NoEquilibrium,
): string | undefined {
  switch (refusal.reason) {
    case 'not-converged':
      return `not converged: ${refusal.detail}`;
    case 'not-finite': {
      const isInRange = ([name, value]: [string, unknown]): boolean =>
        typeof value !== 'number' ||
        (Number.isFinite(value) && (value > 0 || !/temperature|pressure|volume/.test(name)));
      const isSound =
        Object.entries(held).every(isInRange) && elementMol.every((mol) => mol >= 0 && Number.isFinite(mol));
      return isSound ? 'every number given is finite and in its range' : undefined;
    }
    case 'nothing':
      return elementMol.every((mol) => mol === 0) ? undefined : 'there is something';
    case 'cannot-form': {
      const temperatureK = 'temperatureK' in held ? held.temperatureK : undefined;
      const shortage = leastShortage(solver.candidates, elementMol, temperatureK);
      if (shortage < 1e-12) return `the candidates can form it, short of ${shortage.toExponential(1)}`;
      return refusal.elements.length > 0 ? undefined : 'nobody is to blame';
    }
    case 'no-gas': {
      if (!('volumeM3' in held)) return 'no volume is held';
      const gas = gasOf(solver.candidates, elementMol, 'temperatureK' in held ? held.temperatureK : Infinity);
      return gas === undefined ? undefined : `${gas} can fill the volume`;
    }
    case 'outside-tables':
      return doubtOfLimit(solver, elementMol, held, refusal);
  }
}

/** A gas among the candidates that consists of elements that are there; ions only where it is warm enough for them. */
function gasOf(
  { elements, phases, gasCount, atoms }: CandidateSet,
  elementMol: Float64Array,
  temperatureK: number,
): string | undefined {
  const isPossible = (index: number): boolean =>
    elements.every((element, e) => {
      const count = atoms[index * elements.length + e] ?? NaN;
      return count === 0 || (element === charge ? temperatureK >= ionsFromK : (elementMol[e] ?? 0) > 0);
    });
  return phases.find((_, index) => index < gasCount && isPossible(index))?.id;
}

/** At the limit of the tables the held property must still be on the other side of what was asked. */
function doubtOfLimit(
  solver: EquilibriumSolver,
  elementMol: Float64Array,
  held: Held,
  { side, limitK }: NoEquilibrium & { readonly reason: 'outside-tables' },
): string | undefined {
  if (held.held === 'temperature-pressure' || held.held === 'temperature-volume') {
    const isBeyond = side === 'below' ? held.temperatureK < limitK : held.temperatureK > limitK;
    return isBeyond ? undefined : `${held.temperatureK} K is not ${side} ${limitK} K`;
  }
  const stateAt = (temperatureK: number): Equilibrium | NoEquilibrium =>
    solver.solve(
      elementMol,
      'pressurePa' in held
        ? { held: 'temperature-pressure', temperatureK, pressurePa: held.pressurePa }
        : { held: 'temperature-volume', temperatureK, volumeM3: held.volumeM3 },
    );
  if (side === 'below' ? limitK > 300 : limitK < 5000) {
    // Short of the tables' own ends only where the elements cannot be together any further: past the end of a crystal.
    const beyond = stateAt(limitK * (side === 'below' ? 1 - 1e-6 : 1 + 1e-6));
    const isNone = beyond.kind === 'none' && (beyond.reason === 'cannot-form' || beyond.reason === 'no-gas');
    if (!isNone) return `tables do not end at ${limitK} K`;
  }
  const atLimit = stateAt(limitK * (side === 'below' ? 1 : 1 - 1e-12));
  if (atLimit.kind === 'none') return `no state at ${limitK} K either: ${JSON.stringify(atLimit)}`;
  const [asked, found] =
    held.held === 'enthalpy-pressure'
      ? [held.enthalpyJ, atLimit.enthalpyJ]
      : held.held === 'energy-volume'
        ? [held.energyJ, atLimit.enthalpyJ - atLimit.pressurePa * atLimit.volumeM3]
        : [held.entropyJPerK, atLimit.entropyJPerK];
  const isBeyond = side === 'below' ? asked < found : asked > found;
  return isBeyond ? undefined : `asked ${asked}, and ${found} at ${limitK} K`;
}

/**
 * The share of the elements (each over its own amount, summed) that no combination of the candidates that may be there at
 * the temperature accounts for: the first phase of the simplex method with the rule of least indices, which always ends.
 */
function leastShortage(
  { elements, phases, atoms, startK, endK }: CandidateSet,
  elementMol: Float64Array,
  temperatureK: number | undefined,
): number {
  const width = elements.length;
  const rows = elements.flatMap((element, e) => (element === charge || (elementMol[e] ?? 0) > 0 ? [e] : []));
  // A charge is as large as the rarest element that may carry it.
  const rarest = Math.min(...elementMol.filter((mol) => mol > 0));
  const scale = (e: number): number => 1 / (elements[e] === charge ? rarest : (elementMol[e] ?? NaN));
  const columns = phases.flatMap((phase, index) => {
    const own = elements.map((_, e) => atoms[index * width + e] ?? NaN);
    const isThere =
      temperatureK === undefined ||
      (temperatureK >= (startK[index] ?? NaN) &&
        temperatureK < (endK[index] ?? NaN) &&
        (phase.formula.charge === 0 || temperatureK >= ionsFromK));
    const isPossible = isThere && own.every((count, e) => count === 0 || rows.includes(e));
    return isPossible ? [rows.map((e) => (own[e] ?? NaN) * scale(e))] : [];
  });
  // Columns scaled to one, so that traces and main elements are treated alike.
  const table = rows.map((e, row) => [
    ...columns.map((column) => (column[row] ?? NaN) / Math.max(...column.map(Math.abs))),
    elements[e] === charge ? 0 : 1,
  ]);
  const basis = rows.map((_, row) => -1 - row);
  const objective = (column: number): number =>
    table.reduce((sum, row, at) => ((basis[at] ?? 0) < 0 ? sum + (row[column] ?? NaN) : sum), 0);
  for (let step = 0; step < 10_000; step += 1) {
    const entering = columns.findIndex((_, column) => objective(column) > 1e-11);
    if (entering < 0) break;
    let [leaving, best] = [-1, Infinity];
    table.forEach((row, at) => {
      const pivot = row[entering] ?? NaN;
      if (pivot <= 1e-11) return;
      const ratio = (row.at(-1) ?? NaN) / pivot;
      const isLess = ratio < best - 1e-14 || (ratio <= best && (basis[at] ?? 0) < (basis[leaving] ?? 0));
      if (isLess) [leaving, best] = [at, ratio];
    });
    const pivotRow = table[leaving];
    if (pivotRow === undefined) break;
    const pivot = pivotRow[entering] ?? NaN;
    for (let column = 0; column < pivotRow.length; column += 1) pivotRow[column] = (pivotRow[column] ?? NaN) / pivot;
    table.forEach((row, at) => {
      const factor = row[entering] ?? NaN;
      if (at === leaving || factor === 0) return;
      for (let column = 0; column < row.length; column += 1) {
        row[column] = (row[column] ?? NaN) - factor * (pivotRow[column] ?? NaN);
      }
    });
    basis[leaving] = entering;
  }
  return objective(columns.length);
}
