// What the program knows of one substance in one phase, in SI units: the plain record every computation takes.
// Knows neither where the record came from (catalogue or a user's definition) nor how anything is computed from it.
// Invariant: `molPerKg` describes one kilogram whole, so its masses add up to 1 kg within the rounding of the composition.

import type { Formula, Phase } from './formula.ts';
import type { Hazards } from './hazards.ts';
import type { CarbonOrigin, SourceRecord } from './record.ts';

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

/** A density and the temperature it holds at; ask at-temperature.ts for another temperature. */
export interface Density extends Datum {
  readonly temperatureK: number;
  /** All points of the source in rising temperature, this one among them; straight lines between them. */
  readonly points: readonly { readonly temperatureK: number; readonly kgPerM3: number }[];
  /** Relative growth of the volume per kelvin, where there is but one point. */
  readonly expansionPerK?: Datum;
}

/** A heat capacity as a sum of powers of t = T/1000 K; ask at-temperature.ts for a value or an integral. */
export interface HeatCapacity {
  readonly terms: readonly { readonly power: number; readonly jPerKgK: number }[];
  /** Where the source vouches for it; a single number near 25 °C has both ends at 298.15 K. */
  readonly fromK: number;
  readonly toK: number;
  readonly source: SourceRecord;
}

/** Vapour in air between these shares by volume burns at 1 atm. */
export interface FlammableLimits {
  readonly lower: Datum;
  readonly upper?: Datum;
  /** Of the mixture; absent where the source does not say. */
  readonly temperatureK?: number;
}

/** A rule's own numbers for a fuel, in SI, with what they were read from. */
export interface RuleValues {
  readonly source: SourceRecord;
  readonly rule: string;
  readonly version: string;
  /** What the rule calls the fuel. */
  readonly fuel: string;
  /** ISO dates: from when the numbers apply, and when the text was read. */
  readonly inForceFrom: string;
  readonly seenOn: string;
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
  /** What a mixture is made of, in mole shares that add up to 1; absent for all else. */
  readonly members?: readonly { readonly formula: Formula; readonly moleShare: number }[];
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
  readonly heatCapacity?: HeatCapacity;
  /** J/(kg K) at 25 °C, or at the nearer end of the range where that does not reach it. */
  readonly heatCapacityJPerKgK?: Datum;
  /** The four at 1 atm; of the substance, so each of its phases carries them. */
  readonly meltingPointK?: Datum;
  readonly boilingPointK?: Datum;
  readonly sublimationPointK?: Datum;
  readonly decompositionPointK?: Datum;
  readonly flashPointK?: Datum;
  /** Which cup the flash point was read in, where known; a closed one reads lower. */
  readonly flashPointCup?: 'closed' | 'open';
  readonly autoignitionK?: Datum;
  readonly flammableLimits?: FlammableLimits;
  /** Of the substance in all its phases; absent: nothing is recorded, which does not make it harmless. */
  readonly hazards?: Hazards;
  /** The usual one; absent where there is no carbon or nobody burns or releases it. */
  readonly carbonOrigin?: CarbonOrigin;
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
