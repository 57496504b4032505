// What the program knows of one substance in one phase, in SI units: the plain record every computation takes.
// Knows neither where the record came from (catalogue or a user's definition) nor how anything is computed from it.
// Invariant: `molPerKg` describes one kilogram whole, so its masses add up to 1 kg within the rounding of the composition.

import type { Formula, Phase } from './formula.ts';
import type { SourceRecord } from './record.ts';

/** A number with its origin; `uncertainty` is a standard uncertainty in the unit of `value`. */
export interface Datum {
  readonly value: number;
  readonly uncertainty?: number;
  readonly source: SourceRecord;
}

/**
 * How a substance's energy is known. A heating value is turned into a formation enthalpy by
 * balance/formation-enthalpy.ts, on the combustion slate of its composition; ask there rather than here.
 */
export type Energy =
  | { readonly kind: 'formation-enthalpy'; readonly jPerKg: Datum }
  | { readonly kind: 'heating-value'; readonly basis: 'lower' | 'higher'; readonly jPerKg: Datum }
  | { readonly kind: 'unknown' };

/** A density and the temperature it holds at. */
export interface Density extends Datum {
  readonly temperatureK: number;
}

/** A rule's own numbers for a fuel, in SI. */
export interface RuleValues {
  readonly source: SourceRecord;
  readonly lowerHeatingValueJPerKg?: number;
  readonly carbonContentKgPerKg?: number;
  readonly carbonDioxideFactorKgPerKg?: number;
}

export interface Substance {
  /** Unique, `lower_snake`: `gas_oil`. Two phases of one substance share it. */
  readonly name: string;
  /** The name in words: `gas oil`. */
  readonly label: string;
  readonly aliases: readonly string[];
  readonly phase: Phase;
  /** With its phase; absent for mixtures and technical fuels. */
  readonly formula?: Formula;
  /** mol of each element per kg. */
  readonly molPerKg: ReadonlyMap<string, number>;
  /** mol of elementary charge per kg; 0 for all but ions. */
  readonly chargeMolPerKg: number;
  /** Absent where no molecule is known (technical fuels) or an element has no standard atomic weight. */
  readonly molarMassKgPerMol?: number;
  readonly energy: Energy;
  /** J/(mol K) at 298.15 K, 1 bar. */
  readonly entropyJPerMolK?: Datum;
  /** kg/m³ */
  readonly density?: Density;
  /** J/(kg K) near 25 °C. */
  readonly heatCapacityJPerKgK?: Datum;
  readonly flashPointK?: Datum;
  /** Share of the carbon of biogenic origin, 0 to 1. */
  readonly carbonBiogenicShare: number;
  /** Source of a composition that is not simply a formula. */
  readonly compositionSource?: SourceRecord;
  readonly rules: readonly RuleValues[];
  /** This phase is the stable one at 25 °C and 1 bar. */
  readonly stableAtReference: boolean;
  readonly note?: string;
}

/** Reference temperature of all enthalpies and entropies here, in K. */
export const referenceTemperatureK = 298.15;
