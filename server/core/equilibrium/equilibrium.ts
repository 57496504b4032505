// What a question to the minimiser and its answer look like: an amount of each element, two held properties, and the state
// of lowest energy that they allow, with a certificate that says how far from perfect the answer is.
// Knows no solver, no fuel and no oxidant. Invariant: an answer without a certificate inside its limits does not exist.

import type { CandidateSet } from './candidates.ts';

/**
 * The two properties that are held. Energies and entropies are those of the whole amount, in J and J/K, on the scale where
 * the elements in their reference states at 298.15 K have no enthalpy; entropies are absolute; volumes in m³ are the gas's
 * (condensed phases are taken to have none).
 */
export type Held =
  | { readonly held: 'temperature-pressure'; readonly temperatureK: number; readonly pressurePa: number }
  | { readonly held: 'enthalpy-pressure'; readonly enthalpyJ: number; readonly pressurePa: number }
  | { readonly held: 'entropy-pressure'; readonly entropyJPerK: number; readonly pressurePa: number }
  | { readonly held: 'temperature-volume'; readonly temperatureK: number; readonly volumeM3: number }
  | { readonly held: 'energy-volume'; readonly energyJ: number; readonly volumeM3: number }
  | { readonly held: 'entropy-volume'; readonly entropyJPerK: number; readonly volumeM3: number };

/** A state of lowest energy. Arrays over phases are in the order of `candidates.phases`. */
export interface Equilibrium {
  readonly kind: 'equilibrium';
  readonly candidates: CandidateSet;
  readonly temperatureK: number;
  readonly pressurePa: number;
  /** mol of each phase's formula; exactly 0 for an absent condensed phase. */
  readonly amountsMol: Float64Array;
  /** Natural logarithm of the mole fraction of each gas among the gas, also where the amount underflows; NaN for condensed. */
  readonly logFractions: Float64Array;
  /**
   * Element potentials over RT, in the order of `candidates.elements`: a phase present has the sum over its atoms as g/RT. NaN
   * for an absent element, and for the charge where it is too cold for ions.
   */
  readonly potentials: Float64Array;
  readonly gasMol: number;
  /** kg/mol of the gas; 0 when there is none. */
  readonly gasMolarMassKgPerMol: number;
  /** Gas only, by the ideal-gas law; 0 when there is none. */
  readonly volumeM3: number;
  readonly massKg: number;
  /** Mass of condensed phases over the whole mass. */
  readonly condensedMassShare: number;
  readonly enthalpyJ: number;
  readonly entropyJPerK: number;
  readonly gibbsEnergyJ: number;
  /** J/K of the whole amount at constant pressure, composition held and composition following. */
  readonly frozenHeatCapacityJPerK: number;
  /** Infinite (absent: null) where two phases of one substance hold the temperature. */
  readonly heatCapacityJPerK: number | null;
  /** Ratio of heat capacities with the composition held; null without gas. */
  readonly frozenGamma: number | null;
  /** Isentropic exponent -(d ln p / d ln V) at constant entropy with the composition following; null without gas. */
  readonly gamma: number | null;
  /** m/s from `gamma`, the condensed phases moving with the gas; null without gas. */
  readonly speedOfSoundMPerS: number | null;
  /** What keeps the temperature where it is while heat is added at this pressure, if anything does. */
  readonly pinned: Pinned | null;
  /** Phases present beyond the range of their data, by index. */
  readonly extrapolated: readonly number[];
  readonly certificate: Certificate;
  readonly iterations: number;
}

/**
 * Phases that hold the temperature between them: as heat is added some leave and others (or the gas) grow. `phase-change`:
 * they make each other up, as at melting or where an oxide vaporises as itself · `transition`: a change inside one phase's
 * table · `end-of-phase`: a crystal at the end of its data. Condensed phases by index into the candidates.
 */
export interface Pinned {
  readonly by: 'phase-change' | 'transition' | 'end-of-phase';
  readonly leaving: readonly number[];
  readonly appearing: readonly number[];
  readonly gasGrows: boolean;
}

/** How far an answer is from the exact one; each is checked against its limit before the answer is given. */
export interface Certificate {
  /** Largest |found - given| / given over the elements. */
  readonly elementBalance: number;
  /** Largest excess of an absent phase's atoms' potentials over its own g/RT (positive: it should have formed). */
  readonly largestAffinity: number;
  /** Largest |atoms' potentials - g/RT| of a present phase, the gas's logarithmic fractions included. */
  readonly potentialResidual: number;
  /** Largest |found - asked| of the held energy or entropy, over R times the amount of atoms (and T for energies). */
  readonly heldResidual: number;
}

/**
 * Why there is no answer. `cannot-form`: no combination of the candidates has these elements (`elements` are those to
 * blame) · `no-gas`: a volume is held and there is no gas among the candidates to fill it · `outside-tables`: the state that is asked for lies below or above every temperature the data reach ·
 * `nothing`: no amount of any element · `not-finite`: a given number is not a positive finite one ·
 * `not-converged`: a fault of this program; the numbers to reproduce it are in `detail`.
 */
export type NoEquilibrium =
  | { readonly kind: 'none'; readonly reason: 'cannot-form'; readonly elements: readonly string[] }
  | {
      readonly kind: 'none';
      readonly reason: 'outside-tables';
      readonly side: 'below' | 'above';
      readonly limitK: number;
    }
  | { readonly kind: 'none'; readonly reason: 'nothing' | 'no-gas' | 'not-finite' }
  | { readonly kind: 'none'; readonly reason: 'not-converged'; readonly detail: string };
