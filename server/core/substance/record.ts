// The shape of the hand-kept records under data/substances/, as the JSON files are written: trade units, one record a substance.
// Types only: the schema that checks the files (schema.ts) belongs to the tests and never reaches a bundle.
// Every number names its source by an id of data/substances/sources.json. Molar masses are derived, never written.

import type { Phase } from './formula.ts';

/**
 * A number's origin. `provenance` says how we know the value: seen in the source, from memory, by common practice, or by
 * an estimate of our own.
 */
export interface SourceRecord {
  readonly id: string;
  readonly author: string;
  readonly year: number;
  readonly title: string;
  /** Table, page, section or address; empty when the title says enough. */
  readonly where: string;
  readonly provenance: 'seen' | 'from memory' | 'common practice' | 'estimate';
}

/** A number in a record with its source, and its standard uncertainty in the same unit where the source has one. */
interface Sourced {
  readonly source: string;
  readonly uncertainty?: number;
}

/** A temperature in °C at 1 atm. */
export type TemperatureRecord = Sourced & { readonly celsius: number };

/**
 * Of a gas or liquid with temperature: further points of the same source, straight lines between them, or else the share
 * the volume grows by per kelvin, which may have a source of its own.
 */
export type DensityRecord = Sourced & {
  readonly kgPerM3: number;
  readonly temperatureK: number;
  /** Pairs of K and kg/m³. Above the boiling point they are those of the saturated liquid. */
  readonly points?: readonly (readonly [temperatureK: number, kgPerM3: number])[];
  readonly expansionPerK?: number;
  readonly expansionSource?: string;
};

/**
 * One number near 25 °C, per kilogram or per mole; or J/(mol K) as a sum of terms, `{ "0": a, "1": b, "-2": c }` for
 * a + b t + c/t² with t = T/1000 K, within the range the source gives.
 */
export type HeatCapacityRecord = Sourced &
  (
    | { readonly kJPerKgK: number }
    | { readonly jPerMolK: number }
    | { readonly jPerMolKTerms: Readonly<Record<string, number>>; readonly fromK: number; readonly toK: number }
  );

export interface PhaseRecord {
  readonly phase: Phase;
  /** The stable phase at 25 °C and 1 bar; exactly one a record. */
  readonly stable?: boolean;
  readonly aliases?: readonly string[];
  /** From the elements at 298.15 K and 1 bar. */
  readonly formationEnthalpy?: Sourced & { readonly kJPerMol: number };
  /** At 298.15 K and 1 bar; of an ion on the scale where H+ has none. */
  readonly entropy?: Sourced & { readonly jPerMolK: number };
  readonly heatingValue?: Sourced & { readonly basis: 'lower' | 'higher'; readonly mJPerKg: number };
  readonly density?: DensityRecord;
  readonly heatCapacity?: HeatCapacityRecord;
}

/** What a rule prescribes for a fuel; it stands beside the physical value and never replaces it. */
export interface RuleRecord {
  readonly source: string;
  /** Name of the rule: `MEPC.364(79)`. */
  readonly rule: string;
  /** Which text of it: a table or annex with its year. */
  readonly version: string;
  /** What the rule calls the fuel. */
  readonly fuel: string;
  /** `2025-01-01`: the day from which these numbers apply. */
  readonly inForceFrom: string;
  /** The day on which the text was read. */
  readonly seenOn: string;
  readonly lowerHeatingValueMJPerKg?: number;
  /** kg carbon per kg fuel. */
  readonly carbonContent?: number;
  /** kg CO2 per kg fuel. */
  readonly carbonDioxideFactor?: number;
}

/** Where carbon was before somebody made the substance; `mineral` is limestone, trona and the like. */
export type CarbonOrigin = 'fossil' | 'biogenic' | 'mineral' | 'air';

/** Vapour in air at 1 atm, per cent by volume. */
export type FlammableLimitsRecord = Sourced & {
  readonly lowerPercent: number;
  readonly upperPercent?: number;
  /** Of the mixture; absent where the source does not say. */
  readonly celsius?: number;
};

export interface SubstanceRecord {
  /** Lower-case words joined by `_`; unique over names and aliases. */
  readonly name: string;
  readonly aliases?: readonly string[];
  /** Exactly one of the three says what the substance is made of. */
  readonly formula?: string;
  /** Mass shares of elements, adding up to 1 (technical fuels). */
  readonly compositionByMass?: Readonly<Record<string, number>>;
  /** Mole shares of catalogue gases by formula, adding up to 1 (air). */
  readonly mixtureByMole?: Readonly<Record<string, number>>;
  readonly compositionSource?: string;
  readonly phases: readonly PhaseRecord[];
  readonly meltingPoint?: TemperatureRecord;
  readonly boilingPoint?: TemperatureRecord;
  /** Instead of melting and boiling. */
  readonly sublimationPoint?: TemperatureRecord;
  /** Where it falls apart before it melts or boils. */
  readonly decompositionPoint?: TemperatureRecord;
  /** `cup` where the source names it; a closed cup reads lower. */
  readonly flashPoint?: TemperatureRecord & { readonly cup?: 'closed' | 'open' };
  readonly autoignition?: TemperatureRecord;
  readonly flammableLimits?: FlammableLimitsRecord;
  /** The usual origin of its carbon, needed where it is burnt or released; a user's own substance can say another. */
  readonly carbonOrigin?: CarbonOrigin;
  /** Share of the carbon that is of biogenic origin, 0 to 1; absent counts as 0. */
  readonly carbonBiogenicShare?: number;
  readonly rules?: readonly RuleRecord[];
  /** Assumptions a reader should know, in a sentence. */
  readonly note?: string;
}
