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

export interface PhaseRecord {
  readonly phase: Phase;
  /** The stable phase at 25 °C and 1 bar; exactly one a record. */
  readonly stable?: boolean;
  readonly aliases?: readonly string[];
  /** From the elements at 298.15 K and 1 bar. */
  readonly formationEnthalpy?: Sourced & { readonly kJPerMol: number };
  /** At 298.15 K and 1 bar. */
  readonly entropy?: Sourced & { readonly jPerMolK: number };
  readonly heatingValue?: Sourced & { readonly basis: 'lower' | 'higher'; readonly mJPerKg: number };
  readonly density?: Sourced & { readonly kgPerM3: number; readonly temperatureK: number };
  readonly heatCapacity?: Sourced & { readonly kJPerKgK: number };
}

/** What a rule prescribes for a fuel; it stands beside the physical value and never replaces it. */
export interface RuleRecord {
  readonly source: string;
  readonly lowerHeatingValueMJPerKg?: number;
  /** kg carbon per kg fuel. */
  readonly carbonContent?: number;
  /** kg CO2 per kg fuel. */
  readonly carbonDioxideFactor?: number;
}

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
  readonly flashPoint?: Sourced & { readonly celsius: number };
  /** Share of the carbon that is of biogenic origin, 0 to 1; absent counts as 0. */
  readonly carbonBiogenicShare?: number;
  readonly rules?: readonly RuleRecord[];
  /** Assumptions a reader should know, in a sentence. */
  readonly note?: string;
}
