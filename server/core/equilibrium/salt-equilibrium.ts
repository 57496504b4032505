// How much of a salt deposit is molten at a temperature: the phases of lowest Gibbs energy among those of
// salt-solutions.ts, and the melt's share of the mass.
// Knows no published melting points and nothing of what is not a salt of sodium or potassium.
// Invariant: the balance of each ion closes; no phase lies more than a joule per equivalent below the answer.
// Method: a linear programme over compositions of the phases, to which each phase adds the composition that lies lowest
// under the present potentials, until none lies lower (column generation; revised simplex of at most five rows).

import { atomicWeightKgPerMol } from '../substance/elements.ts';
import { denseWork, solveDense } from './dense.ts';
import {
  anionCharge,
  lowestHalite,
  lowestHexagonal,
  lowestMelt,
  saltAnions,
  saltsAtTemperature,
  type IonPotentials,
  type SaltColumn,
} from './salt-solutions.ts';

/** A deposit per equivalent of its salts. */
export interface SaltMixture {
  /** Share of potassium among the cations; the rest is sodium. */
  readonly potassium: number;
  /** Shares of the anions by charge, in the order of `saltAnions`, adding up to 1. */
  readonly anions: readonly number[];
}

/** The melt's share of the mass of the salts at a temperature in K, 0 to 1. */
export function moltenMassShare(mixture: SaltMixture, temperatureK: number): number {
  const salts = saltsAtTemperature(temperatureK);
  const programme = programmeOf(mixture);
  for (const crystal of salts.crystals) programme.add(crystal);
  let potentials = programme.potentials();
  for (let round = 0; round < 300; round += 1) {
    const found = [
      lowestMelt(salts, potentials),
      ...lowestHalite(salts, potentials),
      lowestHexagonal(salts, potentials),
    ].filter((one) => one.gibbsJ - planeJ(one, potentials) < -toleranceJ);
    if (found.length === 0) break;
    for (const one of found) programme.add(one);
    programme.solve();
    potentials = programme.potentials();
  }
  let [melt, whole] = [0, 0];
  for (const [one, amount] of programme.present()) {
    const mass = amount * kgPerEquivalent(one);
    whole += mass;
    if (one.phase === 'melt') melt += mass;
  }
  return melt / whole;
}

const toleranceJ = 1;
/** Of an ion that is not there: no phase wants it. */
const absentJ = -1e7;
/** Of the columns a programme starts from, above anything real. */
const artificialJ = 1e7;

interface Programme {
  add(column: SaltColumn): void;
  solve(): void;
  potentials(): IonPotentials;
  present(): readonly (readonly [SaltColumn, number])[];
}

/** The programme of a mixture: one row for each ion that is there but the last anion, whose balance the others close. */
function programmeOf({ potassium, anions }: SaltMixture): Programme {
  const given = [1 - potassium, potassium, ...anions];
  const there = given.flatMap((share, ion) => (share > 0 ? [ion] : []));
  const rows = there.slice(0, -1);
  const asIons = (column: SaltColumn): readonly number[] => [1 - column.potassium, column.potassium, ...column.anions];
  const columns: { readonly column: SaltColumn | undefined; readonly entries: number[]; readonly costJ: number }[] =
    rows.map((_, row) => ({
      column: undefined,
      entries: rows.map((_each, k) => (k === row ? 1 : 0)),
      costJ: artificialJ,
    }));
  const wanted = rows.map((ion) => given[ion] ?? 0);
  let basis = rows.map((_, row) => row);
  let amounts = [...wanted];
  let prices = rows.map(() => artificialJ);

  const solve = (): void => {
    for (let pivot = 0; pivot < 400; pivot += 1) {
      const matrix = rows.map((_, row) => basis.map((index) => columns[index]?.entries[row] ?? 0));
      amounts = solved(matrix, wanted);
      const transposed = rows.map((_, row) => matrix.map((line) => line[row] ?? 0));
      prices = solved(
        transposed,
        basis.map((index) => columns[index]?.costJ ?? 0),
      );
      let entering = -1;
      let lowestJ = -toleranceJ / 100;
      columns.forEach(({ entries, costJ }, index) => {
        const reducedJ = costJ - entries.reduce((sum, entry, row) => sum + entry * (prices[row] ?? 0), 0);
        if (reducedJ < lowestJ && !basis.includes(index)) [entering, lowestJ] = [index, reducedJ];
      });
      if (entering < 0) return;
      const direction = solved(matrix, columns[entering]?.entries ?? []);
      let leaving = -1;
      let step = Infinity;
      direction.forEach((change, place) => {
        const ratio = change > 1e-12 ? Math.max(amounts[place] ?? 0, 0) / change : Infinity;
        if (ratio < step) [leaving, step] = [place, ratio];
      });
      if (leaving < 0) return;
      basis = basis.map((index, place) => (place === leaving ? entering : index));
    }
  };
  return {
    add: (column) => {
      const ions = asIons(column);
      // A crystal of an ion that is not there can have no part.
      if (ions.some((share, ion) => share > 1e-6 && !there.includes(ion))) return;
      columns.push({ column, entries: rows.map((ion) => ions[ion] ?? 0), costJ: column.gibbsJ });
    },
    solve,
    potentials: () => {
      const ofIon = (ion: number): number => {
        if (!there.includes(ion)) return absentJ;
        const row = rows.indexOf(ion);
        return row < 0 ? 0 : (prices[row] ?? 0);
      };
      return { cationsJ: [ofIon(0), ofIon(1)], anionsJ: saltAnions.map((_, anion) => ofIon(anion + 2)) };
    },
    present: () =>
      basis.flatMap((index, place) => {
        const { column } = columns[index] ?? {};
        return column ? [[column, Math.max(amounts[place] ?? 0, 0)] as const] : [];
      }),
  };
}

function planeJ({ potassium, anions }: SaltColumn, { cationsJ, anionsJ }: IonPotentials): number {
  const cationJ = (1 - potassium) * cationsJ[0] + potassium * cationsJ[1];
  return anions.reduce((sum, share, anion) => sum + share * (anionsJ[anion] ?? 0), cationJ);
}

const anionKgPerMol: readonly number[] = [
  atomicWeight('Cl'),
  atomicWeight('O') + atomicWeight('H'),
  atomicWeight('C') + 3 * atomicWeight('O'),
  atomicWeight('S') + 4 * atomicWeight('O'),
];

function kgPerEquivalent({ potassium, anions }: SaltColumn): number {
  const cations = (1 - potassium) * atomicWeight('Na') + potassium * atomicWeight('K');
  return anions.reduce(
    (sum, share, anion) => sum + (share * (anionKgPerMol[anion] ?? 0)) / (anionCharge[anion] ?? 1),
    cations,
  );
}

function atomicWeight(symbol: string): number {
  return atomicWeightKgPerMol(symbol) ?? Number.NaN;
}

/** The solution of a small square system. */
function solved(matrix: readonly (readonly number[])[], right: readonly number[]): number[] {
  const size = matrix.length;
  const solution = Float64Array.from(right);
  solveDense(Float64Array.from(matrix.flat()), size, size, solution, denseWork(size));
  return [...solution];
}
