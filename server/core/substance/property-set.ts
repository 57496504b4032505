// The properties of many phases at one temperature, for the inner loop of a solver: flat numbers in, flat numbers out.
// A set is prepared once from phases' curves; each evaluation computes nine functions of temperature and one product a phase,
// and allocates nothing. The set remembers in which piece each phase was, which saves the search and never changes an answer.
// Knows no stability and no validity: a temperature beyond a phase's data is extrapolated at constant heat capacity.

import { pieceLength } from './heat-capacity-terms.ts';
import type { PhaseCurve } from './phase-curve.ts';

/** Prepared curves of `size` phases, in the order given. Not to be shared between threads. */
export interface PropertySet {
  readonly size: number;
  /** Bounds of all phases' pieces, one phase after the other. */
  readonly boundsK: Float64Array;
  readonly pieces: Float64Array;
  /** For each phase the place in `boundsK` of the lower bound of its present piece; less the phase's index, the piece. */
  readonly place: Int32Array;
}

/** A set of the given curves. */
export function preparePropertySet(curves: readonly PhaseCurve[]): PropertySet {
  const pieceCount = curves.reduce((sum, curve) => sum + curve.boundsK.length - 1, 0);
  const boundsK = new Float64Array(pieceCount + curves.length);
  const pieces = new Float64Array(pieceCount * pieceLength);
  const place = new Int32Array(curves.length);
  let piece = 0;
  curves.forEach((curve, phase) => {
    boundsK.set(curve.boundsK, piece + phase);
    pieces.set(curve.pieces, piece * pieceLength);
    place[phase] = piece + phase;
    piece += curve.boundsK.length - 1;
  });
  return { size: curves.length, boundsK, pieces, place };
}

/** Writes g/RT of every phase at a temperature in K to `gibbsOverRT` (length `size`): the standard Gibbs energy at 1 bar. */
export function fillGibbs(set: PropertySet, temperatureK: number, gibbsOverRT: Float64Array): void {
  const { size, pieces } = set;
  const t = temperatureK / 1000;
  const inverse = 1 / t;
  const logarithm = Math.log(t);
  const square = t * t;
  // For each power the enthalpy term over t, less the entropy term.
  const f0 = -0.5 * inverse * inverse;
  const f1 = (logarithm + 1) * inverse;
  const f2 = 1 - logarithm;
  const f3 = -t / 2;
  const f4 = -square / 6;
  const f5 = (-square * t) / 12;
  const f6 = (-square * square) / 20;
  findPieces(set, temperatureK);
  for (let phase = 0; phase < size; phase += 1) {
    const k = (at(set.place, phase) - phase) * pieceLength;
    gibbsOverRT[phase] =
      at(pieces, k) * f0 +
      at(pieces, k + 1) * f1 +
      at(pieces, k + 2) * f2 +
      at(pieces, k + 3) * f3 +
      at(pieces, k + 4) * f4 +
      at(pieces, k + 5) * f5 +
      at(pieces, k + 6) * f6 +
      at(pieces, k + 7) * inverse -
      at(pieces, k + 8);
  }
}

/** Writes h/RT and cp/R of every phase at a temperature in K, each of length `size`. */
export function fillEnthalpies(
  set: PropertySet,
  temperatureK: number,
  enthalpyOverRT: Float64Array,
  heatCapacityOverR: Float64Array,
): void {
  const { size, pieces } = set;
  const t = temperatureK / 1000;
  const inverse = 1 / t;
  const inverseSquare = inverse * inverse;
  const logarithmOverT = Math.log(t) * inverse;
  const square = t * t;
  const cube = square * t;
  const fourth = square * square;
  findPieces(set, temperatureK);
  for (let phase = 0; phase < size; phase += 1) {
    const k = (at(set.place, phase) - phase) * pieceLength;
    const c0 = at(pieces, k);
    const c1 = at(pieces, k + 1);
    const c2 = at(pieces, k + 2);
    const c3 = at(pieces, k + 3) * t;
    const c4 = at(pieces, k + 4) * square;
    const c5 = at(pieces, k + 5) * cube;
    const c6 = at(pieces, k + 6) * fourth;
    heatCapacityOverR[phase] = c0 * inverseSquare + c1 * inverse + c2 + c3 + c4 + c5 + c6;
    enthalpyOverRT[phase] =
      -c0 * inverseSquare + c1 * logarithmOverT + c2 + c3 / 2 + c4 / 3 + c5 / 4 + c6 / 5 + at(pieces, k + 7) * inverse;
  }
}

/** Moves every phase to the piece that holds at the temperature; from one evaluation to the next hardly any has to move. */
function findPieces({ size, boundsK, place }: PropertySet, temperatureK: number): void {
  for (let phase = 0; phase < size; phase += 1) {
    let here = at(place, phase);
    while (temperatureK >= at(boundsK, here + 1)) here += 1;
    while (temperatureK < at(boundsK, here)) here -= 1;
    place[phase] = here;
  }
}

/** An element of an array whose index is inside by construction; a default instead of the cast would cost time in every term. */
function at(values: Float64Array | Int32Array, index: number): number {
  return values[index] as number;
}
