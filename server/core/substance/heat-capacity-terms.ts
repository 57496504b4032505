// The seven powers of temperature a heat capacity is written with, and what they integrate to.
// cp/R is a sum of c_k t^k over k = -2 to 4 with t = T/1000 K, so enthalpy and entropy follow in closed form and the same
// nine numbers (seven terms, two constants) times functions of t alone give g/RT of every phase. Knows no phase and no data.
// Invariant: the enthalpy terms are primitives of the heat capacity terms, the entropy terms of the same divided by t.

/** Molar gas constant in J/(mol K); exact, SI 2019. */
export const gasConstantJPerMolK = 8.31446261815324;

/** Number of powers, -2 to 4. */
export const termCount = 7;

/** A piece of a curve is its terms followed by the enthalpy constant (H/R in kK) and the entropy constant (S/R). */
export const pieceLength = termCount + 2;

/** Writes t^-2 to t^4 to `terms` (length 7): the factors of cp/R. `t` is T/1000 K and positive. */
export function fillHeatCapacityTerms(t: number, terms: Float64Array): void {
  terms[0] = 1 / (t * t);
  terms[1] = 1 / t;
  terms[2] = 1;
  terms[3] = t;
  terms[4] = t * t;
  terms[5] = t * t * t;
  terms[6] = t * t * t * t;
}

/** Writes the primitives of t^k over t to `terms` (length 7): the factors of H/R in kK, up to a constant. */
export function fillEnthalpyTerms(t: number, terms: Float64Array): void {
  terms[0] = -1 / t;
  terms[1] = Math.log(t);
  terms[2] = t;
  terms[3] = (t * t) / 2;
  terms[4] = (t * t * t) / 3;
  terms[5] = (t * t * t * t) / 4;
  terms[6] = (t * t * t * t * t) / 5;
}

/** Writes the primitives of t^(k-1) over t to `terms` (length 7): the factors of S/R, up to a constant. */
export function fillEntropyTerms(t: number, terms: Float64Array): void {
  terms[0] = -1 / (2 * t * t);
  terms[1] = -1 / t;
  terms[2] = Math.log(t);
  terms[3] = t;
  terms[4] = (t * t) / 2;
  terms[5] = (t * t * t) / 3;
  terms[6] = (t * t * t * t) / 4;
}
