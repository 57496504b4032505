// A phase's heat capacity, enthalpy, entropy and Gibbs energy as functions of temperature, ready to evaluate.
// Takes a fitted record, finds the constants of each piece from its anchor, and adds a piece of constant heat capacity beyond
// either end, so that every positive temperature has an answer. Knows no stability and no validity.
// Invariant: enthalpy and entropy are continuous but for the heat of a transition, and Gibbs energy is continuous everywhere.

import { gasConstantJPerMolK, pieceLength, termCount } from './heat-capacity-terms.ts';
import type { PhaseFit } from './phase-fit.ts';

/** A curve of n pieces, the two beyond the ends included. */
export interface PhaseCurve {
  /** n + 1 temperatures in K, from -Infinity to Infinity: piece k holds from the k-th up to, not including, the next. */
  readonly boundsK: Float64Array;
  /** n times nine numbers: seven terms of cp/R, then the constants of H/R (in kK, element scale) and S/R. */
  readonly pieces: Float64Array;
}

/** Molar properties, with enthalpy zero for the elements in their reference states at 298.15 K. */
export interface MolarProperties {
  readonly heatCapacityJPerMolK: number;
  readonly enthalpyJPerMol: number;
  readonly entropyJPerMolK: number;
  readonly gibbsJPerMol: number;
}

/** The curve of a fitted record. */
export function compileCurve(
  record: Pick<PhaseFit, 'pieces' | 'toK' | 'anchor' | 'formationKJPerMol' | 'entropyJPerMolK'>,
): PhaseCurve {
  const inner = record.pieces.length;
  const boundsK = new Float64Array(inner + 3);
  boundsK[0] = Number.NEGATIVE_INFINITY;
  boundsK[inner + 1] = record.toK;
  boundsK[inner + 2] = Number.POSITIVE_INFINITY;
  const pieces = new Float64Array((inner + 2) * pieceLength);
  for (let index = 0; index < inner; index += 1) {
    const piece = record.pieces[index];
    if (piece === undefined) continue;
    boundsK[index + 1] = piece.fromK;
    pieces.set(piece.terms, (index + 1) * pieceLength);
  }
  setConstantHeatCapacity(pieces, 0, 1, boundsK[1] ?? 0);
  setConstantHeatCapacity(pieces, inner + 1, inner, record.toK);

  const anchor = {
    atK: record.anchor?.atK ?? 298.15,
    enthalpy: (record.anchor?.kJPerMol ?? record.formationKJPerMol ?? 0) / gasConstantJPerMolK,
    entropy: (record.anchor?.jPerMolK ?? record.entropyJPerMolK ?? 0) / gasConstantJPerMolK,
  };
  const anchorPiece = Math.min(pieceAt(boundsK, anchor.atK), inner);
  setConstants(pieces, anchorPiece, anchor.atK, anchor.enthalpy, anchor.entropy);
  for (let k = anchorPiece + 1; k <= inner + 1; k += 1) {
    const jump = (record.pieces[k - 1]?.begins?.kJPerMol ?? 0) / gasConstantJPerMolK;
    continueFrom(pieces, k, k - 1, boundsK[k] ?? 0, jump);
  }
  for (let k = anchorPiece - 1; k >= 0; k -= 1) {
    const jump = (record.pieces[k]?.begins?.kJPerMol ?? 0) / gasConstantJPerMolK;
    continueFrom(pieces, k, k + 1, boundsK[k + 1] ?? 0, -jump);
  }
  return { boundsK, pieces };
}

/** Index of the piece that holds at a temperature; at a bound the upper one. */
export function pieceAt(boundsK: Float64Array, temperatureK: number): number {
  let piece = 0;
  while (temperatureK >= (boundsK[piece + 1] ?? Number.POSITIVE_INFINITY)) piece += 1;
  return piece;
}

/**
 * Properties at a positive temperature in K. `piece` asks for one side of a bound; without it the upper side counts.
 * Beyond the fitted range the heat capacity keeps its last value; whoever asks must say that it is extrapolated.
 */
export function evaluateCurve(
  curve: PhaseCurve,
  temperatureK: number,
  piece = pieceAt(curve.boundsK, temperatureK),
): MolarProperties {
  const t = temperatureK / 1000;
  const enthalpyJPerMol = enthalpyOf(curve.pieces, piece, t) * gasConstantJPerMolK * 1000;
  const entropyJPerMolK = entropyOf(curve.pieces, piece, t) * gasConstantJPerMolK;
  return {
    heatCapacityJPerMolK: heatCapacityOf(curve.pieces, piece, t) * gasConstantJPerMolK,
    enthalpyJPerMol,
    entropyJPerMolK,
    gibbsJPerMol: enthalpyJPerMol - temperatureK * entropyJPerMolK,
  };
}

/** cp/R of one piece at t = T/1000 K. Written out, here and below: every phase passes here when the data are loaded. */
function heatCapacityOf(pieces: Float64Array, piece: number, t: number): number {
  const k = piece * pieceLength;
  return (
    (at(pieces, k) / t + at(pieces, k + 1)) / t +
    at(pieces, k + 2) +
    t * (at(pieces, k + 3) + t * (at(pieces, k + 4) + t * (at(pieces, k + 5) + t * at(pieces, k + 6))))
  );
}

/** H/R in kK of one piece. */
function enthalpyOf(pieces: Float64Array, piece: number, t: number): number {
  const k = piece * pieceLength;
  return (
    -at(pieces, k) / t +
    at(pieces, k + 1) * Math.log(t) +
    t *
      (at(pieces, k + 2) +
        t *
          (at(pieces, k + 3) / 2 +
            t * (at(pieces, k + 4) / 3 + t * (at(pieces, k + 5) / 4 + (t * at(pieces, k + 6)) / 5)))) +
    at(pieces, k + 7)
  );
}

/** S/R of one piece. */
function entropyOf(pieces: Float64Array, piece: number, t: number): number {
  const k = piece * pieceLength;
  return (
    (-at(pieces, k) / (2 * t) - at(pieces, k + 1)) / t +
    at(pieces, k + 2) * Math.log(t) +
    t * (at(pieces, k + 3) + t * (at(pieces, k + 4) / 2 + t * (at(pieces, k + 5) / 3 + (t * at(pieces, k + 6)) / 4))) +
    at(pieces, k + 8)
  );
}

function setConstantHeatCapacity(pieces: Float64Array, piece: number, like: number, temperatureK: number): void {
  pieces[piece * pieceLength + 2] = heatCapacityOf(pieces, like, temperatureK / 1000);
}

/** Sets a piece's constants so that it has this enthalpy (H/R in kK) and entropy (S/R) there. */
function setConstants(
  pieces: Float64Array,
  piece: number,
  temperatureK: number,
  enthalpy: number,
  entropy: number,
): void {
  const t = temperatureK / 1000;
  const offset = piece * pieceLength + termCount;
  pieces[offset] = at(pieces, offset) + enthalpy - enthalpyOf(pieces, piece, t);
  pieces[offset + 1] = at(pieces, offset + 1) + entropy - entropyOf(pieces, piece, t);
}

/** Sets a piece's constants from its neighbour's values at their common bound and the heat (over R, in kK) taken up there. */
function continueFrom(pieces: Float64Array, piece: number, neighbour: number, boundK: number, jump: number): void {
  const t = boundK / 1000;
  setConstants(
    pieces,
    piece,
    boundK,
    enthalpyOf(pieces, neighbour, t) + jump,
    entropyOf(pieces, neighbour, t) + jump / t,
  );
}

/** An element of an array whose index is inside by construction. */
function at(values: Float64Array, index: number): number {
  return values[index] as number;
}
