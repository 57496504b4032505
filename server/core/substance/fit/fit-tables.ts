// Fits a table and writes it as a record of data/phases/: names, rounded terms, transitions, residuals.
// The residuals are those of the rounded record as the program evaluates it, against every row of the table.
// Knows no files. Invariant: the same tables give the same record.

import { gasConstantJPerMolK } from '../heat-capacity-terms.ts';
import { compileCurve, evaluateCurve } from '../phase-curve.ts';
import type { PhaseCurve } from '../phase-curve.ts';
import type { FitResiduals, PhaseFit, PieceFit, WorstResidual } from '../phase-fit.ts';
import { choosePieces } from './choose-pieces.ts';
import type { FittedPieces } from './choose-pieces.ts';
import { limits } from './equations.ts';
import type { Piece } from './equations.ts';
import { findMeetingPoints } from './meeting-points.ts';
import type { MeetingPoint } from './meeting-points.ts';
import { namePhase } from './phase-names.ts';
import { leftOut, notes, setAside } from './remarks.ts';
import { withSetAside } from './source-table.ts';
import type { SourceTable } from './source-table.ts';

/** What the fit of one table needs to know of the others. */
export interface FitContext {
  readonly points: readonly MeetingPoint[];
  /** Our ids by the tables' ids. */
  readonly ids: ReadonlyMap<string, string>;
}

/** The context of a set of tables. */
export function fitContext(tables: readonly SourceTable[]): FitContext {
  return {
    points: findMeetingPoints(tables),
    ids: new Map(tables.map(({ record }) => [record.id, namePhase(record).id])),
  };
}

/** What of a phase is over the limits, in words; empty when nothing is. */
export function overLimits({ heatCapacityPercent, enthalpyKJPerMol, gibbsOverRT }: FitResiduals): readonly string[] {
  const over: string[] = [];
  if (heatCapacityPercent[0] > limits.heatCapacityShare * 100)
    over.push(`heat capacity ${heatCapacityPercent[0]} % at ${heatCapacityPercent[1]} K`);
  if (enthalpyKJPerMol[0] > limits.enthalpyKJ)
    over.push(`enthalpy ${enthalpyKJPerMol[0]} kJ/mol at ${enthalpyKJPerMol[1]} K`);
  if (gibbsOverRT[0] > limits.gibbsOverRT) over.push(`G/RT ${gibbsOverRT[0]} at ${gibbsOverRT[1]} K`);
  return over;
}

export interface FittedTable {
  readonly fit: PhaseFit;
  readonly residuals: FitResiduals;
}

/** The record of one table, and how far it is from the rows. */
export function fitTable(table: SourceTable, { points, ids }: FitContext): FittedTable {
  const { record } = table;
  const own = points.filter((point) => point.phases.includes(record.id));
  const gibbsPoints = own.map(({ temperatureK, gibbsKJ }) => ({
    temperatureK,
    gibbsKJ: gibbsKJ - record.dfH298_kJ_per_mol,
  }));
  const fitted = choosePieces(withSetAside(table, setAside[record.id] ?? []).stretches, gibbsPoints);
  const { anchor, pieces } = fitted;
  const fromK = pieces[0]?.fromK ?? 0;
  const toK = pieces.at(-1)?.toK ?? 0;
  const stableK = record.stableRanges_K
    .map(([startK, endK]) => [Math.max(startK, fromK), Math.min(endK, toK)] as const)
    .filter(([startK, endK]) => startK < endK);
  const reason = leftOut[record.id];
  const note = notes[record.id];
  const changes = changesOf(table, own, ids);
  const fit: PhaseFit = {
    ...namePhase(record),
    ...(record.S298_J_per_mol_K === null
      ? {
          anchor: {
            atK: anchor.row.temperatureK,
            kJPerMol: rounded(record.dfH298_kJ_per_mol + anchor.row.enthalpyKJ, 3),
            jPerMolK: anchor.row.entropy,
          },
        }
      : { formationKJPerMol: record.dfH298_kJ_per_mol, entropyJPerMolK: anchor.row.entropy }),
    pieces: pieces.map((piece, index) => pieceFit(piece, fitted, index)),
    toK,
    ...(record.phase === 'gas' ? {} : { stableK }),
    ...(changes.length === 0 ? {} : { changes }),
    ...(reason === undefined ? {} : { leftOut: reason }),
    ...(note === undefined ? {} : { note }),
    table: record.janafTable,
  };
  return { fit, residuals: worstResiduals(fit, fitted, record.dfH298_kJ_per_mol) };
}

function pieceFit(piece: Piece, fitted: FittedPieces, index: number): PieceFit {
  const begins =
    piece.begins === undefined || piece.begins === 'join'
      ? undefined
      : {
          kind: piece.begins.kind,
          ...(piece.begins.enthalpyKJ === 0 ? {} : { kJPerMol: piece.begins.enthalpyKJ }),
        };
  return {
    fromK: piece.fromK,
    ...(begins === undefined ? {} : { begins }),
    terms: roundedTerms(fitted.terms[index] ?? new Float64Array(), piece),
  };
}

/** No term's rounding may change cp/R by more than this anywhere in its piece. */
const roundingOfHeatCapacityOverR = 2e-7;

function roundedTerms(terms: Float64Array, { fromK, toK }: Piece): readonly number[] {
  const all = Array.from(terms, (term, index) => {
    const power = index - 2;
    const largest = Math.max((fromK / 1000) ** power, (toK / 1000) ** power);
    return rounded(term, Math.ceil(Math.log10((0.5 * largest) / roundingOfHeatCapacityOverR)));
  });
  while (all.at(-1) === 0) all.pop();
  return all;
}

function rounded(value: number, decimals: number): number {
  const result = Number(value.toFixed(decimals));
  return result === 0 ? 0 : result; // no minus zero
}

function changesOf(
  table: SourceTable,
  points: readonly MeetingPoint[],
  ids: ReadonlyMap<string, string>,
): NonNullable<PhaseFit['changes']> {
  const { record } = table;
  const nameOf = (id: string): string => ids.get(id) ?? id;
  const condensed = points.map(({ temperatureK, phases, kind, enthalpyKJ }) => ({
    atK: temperatureK,
    kind,
    ...(enthalpyKJ === undefined ? {} : { kJPerMol: enthalpyKJ }),
    with: nameOf(phases[0] === record.id ? phases[1] : phases[0]),
  }));
  const boiling = record.transitions
    .filter(({ kind }) => kind === 'boiling')
    .map((each) => ({
      atK: each.T_K,
      kind: each.kind,
      kJPerMol: each.dH_kJ_per_mol,
      with: each.with === undefined ? (boilsInto[record.id] ?? '') : nameOf(each.with),
    }))
    .filter((each) => each.with !== '');
  return [...condensed, ...boiling].sort((a, b) => a.atK - b.atK);
}

/** Gases that the tables name only in words. */
const boilsInto: Readonly<Record<string, string>> = { H2O_l: 'H2O(g)', S_l: 'S2(g)', S2_g: 'S(l)' };

function worstResiduals(fit: PhaseFit, { pieces }: FittedPieces, formationKJPerMol: number): FitResiduals {
  const nothing: WorstResidual = [0, pieces[0]?.fromK ?? 0];
  let worst = { phase: fit.id, heatCapacityPercent: nothing, enthalpyKJPerMol: nothing, gibbsOverRT: nothing };
  const curve: PhaseCurve = compileCurve(fit);
  const larger = (old: WorstResidual, deviation: number, temperatureK: number, digits: number): WorstResidual =>
    Math.abs(deviation) > old[0] ? [rounded(Math.abs(deviation), digits), temperatureK] : old;
  pieces.forEach((piece, index) => {
    for (const row of piece.rows) {
      const values = evaluateCurve(curve, row.temperatureK, index + 1);
      const enthalpyKJ = row.enthalpyKJ + formationKJPerMol;
      const gibbsKJ = enthalpyKJ - (row.temperatureK * row.entropy) / 1000;
      const temperatureK = row.temperatureK;
      const heatCapacity = (values.heatCapacityJPerMolK / row.heatCapacity - 1) * 100;
      const enthalpy = values.enthalpyJPerMol / 1000 - enthalpyKJ;
      const gibbs = (values.gibbsJPerMol - gibbsKJ * 1000) / (gasConstantJPerMolK * temperatureK);
      worst = {
        phase: fit.id,
        heatCapacityPercent: larger(worst.heatCapacityPercent, heatCapacity, temperatureK, 4),
        enthalpyKJPerMol: larger(worst.enthalpyKJPerMol, enthalpy, temperatureK, 4),
        gibbsOverRT: counts(fit, temperatureK) ? larger(worst.gibbsOverRT, gibbs, temperatureK, 6) : worst.gibbsOverRT,
      };
    }
  });
  return worst;
}

/** Gibbs energy is judged where the phase is stable, or everywhere if it never is. */
function counts({ stableK }: Pick<PhaseFit, 'stableK'>, temperatureK: number): boolean {
  if (stableK === undefined || stableK.length === 0) return true;
  return stableK.some(([startK, endK]) => startK <= temperatureK && temperatureK <= endK);
}
