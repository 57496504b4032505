// The linear equations of one fit: heat capacity, enthalpy, entropy and Gibbs energy of every row, as functions of the terms
// of all pieces at once. Enthalpy and entropy are integrals from an anchor row through every piece between, with the jumps
// on the way, so they are continuous by construction. Each equation is divided by its limit: a residual of 1 is just allowed.
// Knows no search for joins. Invariant: the order of the equations is that of the rows, four a row.

import {
  fillEnthalpyTerms,
  fillEntropyTerms,
  fillHeatCapacityTerms,
  gasConstantJPerMolK,
  termCount,
} from '../heat-capacity-terms.ts';
import type { LinearRows } from './least-squares.ts';
import type { Jump, RowValue, SourceRow } from './source-table.ts';

/** Limits of the fit against every row. */
export const limits = { heatCapacityShare: 0.005, enthalpyKJ: 0.2, gibbsOverRT: 0.005 };

/** What an entropy may be off by, as a weight only: the Gibbs energy is what is judged. */
const entropyOverRScale = 0.02;

/** A piece to be fitted: its rows with both ends, and which of the seven terms it may use. */
export interface Piece {
  readonly rows: readonly SourceRow[];
  readonly fromK: number;
  readonly toK: number;
  readonly terms: readonly number[];
  /** A transition, or a join the search chose, where heat capacity is continuous too. Absent for the first piece. */
  readonly begins?: Jump | 'join';
}

/** The row that is met exactly, and the piece it lies in. */
export interface Anchor {
  readonly row: SourceRow;
  readonly piece: number;
}

/** A Gibbs energy, relative to the table's zero of enthalpy and in kJ/mol, that must come out exactly. */
export interface GibbsPoint {
  readonly temperatureK: number;
  readonly gibbsKJ: number;
}

/** How many equations each row gives: heat capacity, enthalpy, Gibbs energy, entropy. */
export const equationsPerRow = 4;

/** The equations of all rows; the unknowns are the used terms of the pieces in order. */
export function rowEquations(pieces: readonly Piece[], anchor: Anchor): LinearRows {
  const unknowns = countUnknowns(pieces);
  const rowCount = pieces.reduce((sum, piece) => sum + piece.rows.length, 0);
  const coefficients = new Float64Array(rowCount * equationsPerRow * unknowns);
  const targets = new Float64Array(rowCount * equationsPerRow);
  let equation = 0;
  const write = (line: Line, target: number, scale: number, values: readonly RowValue[], row: SourceRow): void => {
    equation += 1;
    if (values.some((value) => row.setAside?.includes(value))) return; // stays 0 = 0
    line.coefficients.forEach((value, index) => (coefficients[(equation - 1) * unknowns + index] = value / scale));
    targets[equation - 1] = (target - line.known) / scale;
  };
  pieces.forEach((piece, index) => {
    for (const row of piece.rows) {
      const t = row.temperatureK / 1000;
      const heatCapacity = heatCapacityLine(pieces, index, row.temperatureK);
      const { enthalpy, entropy, gibbs } = integralLines(pieces, anchor, index, row.temperatureK);
      const target = { enthalpy: row.enthalpyKJ / gasConstantJPerMolK, entropy: row.entropy / gasConstantJPerMolK };
      const heatCapacityOverR = row.heatCapacity / gasConstantJPerMolK;
      write(heatCapacity, heatCapacityOverR, limits.heatCapacityShare * heatCapacityOverR, ['heatCapacity'], row);
      write(enthalpy, target.enthalpy, limits.enthalpyKJ / gasConstantJPerMolK, ['enthalpy'], row);
      write(gibbs, target.enthalpy / t - target.entropy, limits.gibbsOverRT, ['enthalpy', 'entropy'], row);
      write(entropy, target.entropy, entropyOverRScale, ['entropy'], row);
    }
  });
  return { coefficients, targets };
}

/** What must hold exactly: heat capacity at the anchor, the given Gibbs energies, heat capacity through joins. */
export function constraintEquations(
  pieces: readonly Piece[],
  anchor: Anchor,
  gibbsPoints: readonly GibbsPoint[],
): LinearRows {
  const lines: { line: Line; target: number }[] = [];
  lines.push({
    line: heatCapacityLine(pieces, anchor.piece, anchor.row.temperatureK),
    target: anchor.row.heatCapacity / gasConstantJPerMolK,
  });
  for (const { temperatureK, gibbsKJ } of gibbsPoints) {
    const index = pieces.findIndex((piece) => piece.fromK <= temperatureK && temperatureK <= piece.toK);
    if (index < 0) continue;
    const { gibbs } = integralLines(pieces, anchor, index, temperatureK);
    lines.push({ line: gibbs, target: (gibbsKJ * 1000) / (gasConstantJPerMolK * temperatureK) });
  }
  pieces.forEach((piece, index) => {
    if (piece.begins !== 'join') return;
    const line = emptyLine(pieces);
    addTerms(line, pieces, index - 1, termsAt(fillHeatCapacityTerms, piece.fromK), 1);
    addTerms(line, pieces, index, termsAt(fillHeatCapacityTerms, piece.fromK), -1);
    lines.push({ line, target: 0 });
  });
  return {
    coefficients: Float64Array.from(lines.flatMap(({ line }) => [...line.coefficients])),
    targets: Float64Array.from(lines, ({ line, target }) => target - line.known),
  };
}

/** Terms that all pieces use, together. */
export function countUnknowns(pieces: readonly Piece[]): number {
  return pieces.reduce((sum, piece) => sum + piece.terms.length, 0);
}

/** `coefficients · unknowns + known` is the property. */
interface Line {
  readonly coefficients: Float64Array;
  known: number;
}

type FillTerms = (t: number, terms: Float64Array) => void;

function emptyLine(pieces: readonly Piece[]): Line {
  return { coefficients: new Float64Array(countUnknowns(pieces)), known: 0 };
}

function heatCapacityLine(pieces: readonly Piece[], index: number, temperatureK: number): Line {
  const line = emptyLine(pieces);
  addTerms(line, pieces, index, termsAt(fillHeatCapacityTerms, temperatureK), 1);
  return line;
}

/** H/R in kK from the table's zero, S/R, and G/RT from the same zero. */
function integralLines(
  pieces: readonly Piece[],
  anchor: Anchor,
  index: number,
  temperatureK: number,
): { enthalpy: Line; entropy: Line; gibbs: Line } {
  const enthalpy = integralLine(pieces, anchor, index, temperatureK, fillEnthalpyTerms);
  const entropy = integralLine(pieces, anchor, index, temperatureK, fillEntropyTerms);
  enthalpy.known += anchor.row.enthalpyKJ / gasConstantJPerMolK;
  entropy.known += anchor.row.entropy / gasConstantJPerMolK;
  const low = Math.min(anchor.piece, index);
  const high = Math.max(anchor.piece, index);
  for (const piece of pieces.slice(low + 1, high + 1)) {
    if (piece.begins === undefined || piece.begins === 'join') continue;
    const jump = (index > anchor.piece ? 1 : -1) * (piece.begins.enthalpyKJ / gasConstantJPerMolK);
    enthalpy.known += jump;
    entropy.known += (jump * 1000) / piece.fromK;
  }
  const t = temperatureK / 1000;
  const gibbs = emptyLine(pieces);
  enthalpy.coefficients.forEach((value, unknown) => {
    gibbs.coefficients[unknown] = value / t - (entropy.coefficients[unknown] ?? 0);
  });
  gibbs.known = enthalpy.known / t - entropy.known;
  return { enthalpy, entropy, gibbs };
}

function integralLine(
  pieces: readonly Piece[],
  anchor: Anchor,
  index: number,
  temperatureK: number,
  fill: FillTerms,
): Line {
  const line = emptyLine(pieces);
  const anchorK = anchor.row.temperatureK;
  const low = Math.min(anchor.piece, index);
  const high = Math.max(anchor.piece, index);
  for (let k = low; k <= high; k += 1) {
    const piece = pieces[k];
    if (piece === undefined) continue;
    // The part of this piece between the anchor and the temperature, with its sign.
    const [startK, endK] =
      index >= anchor.piece
        ? [k === anchor.piece ? anchorK : piece.fromK, k === index ? temperatureK : piece.toK]
        : [k === anchor.piece ? anchorK : piece.toK, k === index ? temperatureK : piece.fromK];
    addTerms(line, pieces, k, termsAt(fill, endK), 1);
    addTerms(line, pieces, k, termsAt(fill, startK), -1);
  }
  return line;
}

function termsAt(fill: FillTerms, temperatureK: number): Float64Array {
  const terms = new Float64Array(termCount);
  fill(temperatureK / 1000, terms);
  return terms;
}

function addTerms(line: Line, pieces: readonly Piece[], index: number, values: Float64Array, sign: number): void {
  const offset = countUnknowns(pieces.slice(0, index));
  pieces[index]?.terms.forEach((term, place) => {
    line.coefficients[offset + place] = (line.coefficients[offset + place] ?? 0) + sign * (values[term] ?? 0);
  });
}
