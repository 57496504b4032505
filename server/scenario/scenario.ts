// The evaluated scenario: everything that was worked out from one file and the files it uses, as plain data.
// Views (features, reports, findings) read it and work nothing out themselves. It is immutable and belongs to the
// texts it was made from. Offsets inside a section are relative to that section; `placeOf` (place.ts) turns them into file offsets.
// Invariant: a number that could not be had is absent (or null in a table), never NaN, and a fact says why unless the
// cause has already been said elsewhere.

import type { PlacedSection, SyntaxTree } from '../../grammar/tree.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Hazards } from '../core/substance/hazards.ts';
import type { Fact } from './facts.ts';
import type { AskLongWork } from './long-work.ts';
import type { Place } from './place.ts';
import type { PortionState } from './portion-state.ts';
import type { Screening } from './screening.ts';
import type { Working } from './working.ts';

export interface EvaluatedScenario {
  /** The file asked about first, then the files it uses, in the order they were reached. */
  readonly files: readonly EvaluatedFile[];
  /** Addresses of used files whose text was not at hand yet; once they are, evaluate again. */
  readonly wanted: readonly string[];
}

export interface EvaluatedFile {
  readonly path: string;
  /** Reached through `use` rather than named. */
  readonly used: boolean;
  readonly tree: SyntaxTree;
  readonly title: string | null;
  readonly definitions: readonly EvaluatedDefinition[];
  readonly values: readonly EvaluatedValue[];
  readonly expectations: readonly Expectation[];
  readonly facts: readonly PlacedFact[];
  /** What each name and reference in this file means, for hovers and for going to a definition. */
  readonly meanings: readonly PlacedMeaning[];
}

/** A fact and where it stands. */
export interface PlacedFact {
  readonly fact: Fact;
  readonly place: Place;
}

/** A definition with its figures; one whose kind is not evaluated yet has none. */
export interface EvaluatedDefinition {
  readonly kind: string;
  readonly name: string;
  readonly doc: string;
  /** The whole definition, its header (kind word to brace) and its name. */
  readonly place: Place;
  readonly header: Place;
  readonly namePlace: Place;
  readonly section: PlacedSection;
  readonly figures: readonly Figure[];
  readonly tables: readonly Table[];
  readonly absent: Absent;
  /** Per line of the definition (by its index in the tree): what was worked out for it. */
  readonly lines: readonly LineResult[];
  /** What the hazard rules came to; absent where there is nothing for them to look at. */
  readonly screening?: Screening | undefined;
}

/**
 * Figures this definition would have but for what is missing: by id, the names of the missing data in words, or null
 * when the cause has been said as a finding of its own.
 */
export type Absent = ReadonlyMap<string, readonly string[] | null>;

/** One computed number, its stable id, and how it came about. */
export interface Figure {
  readonly id: string;
  /** What it is called, with its basis (per kg of what, wet or dry, higher or lower). */
  readonly label: string;
  readonly quantity: Quantity;
  /** Where it is a band: its ends. `quantity` is then the end an engineer has to reckon with. */
  readonly band?: FigureBand;
  /** The unit the JSON contract gives it in; fixed for each id. */
  readonly unit: string;
  readonly working: Working;
}

export interface FigureBand {
  readonly low: Quantity;
  readonly high: Quantity;
}

export interface Table {
  readonly id: string;
  readonly label: string;
  readonly columns: readonly Column[];
  /** Cells in the column's unit; null where a number could not be had. */
  readonly rows: readonly (readonly (string | number | null)[])[];
  /** Rows too small to be worth showing, for those who ask for one by its name. */
  readonly traces?: readonly (readonly (string | number | null)[])[];
  /** Where the rows are not the whole truth: temperatures (K) between which nothing could be worked out. */
  readonly gaps?: readonly { readonly fromK: number; readonly toK: number }[];
  /** Of a table whose rows take long to work out. Rows that are read before it is done are worked out on the spot. */
  readonly work?: TableWork;
}

export interface TableWork {
  /** Whether reading the rows takes no time any more. */
  readonly isDone: () => boolean;
  /** Asks for what the rows rest on; false while it is not there yet. */
  readonly ask: (longWork: AskLongWork) => boolean;
}

export interface Column {
  readonly id: string;
  readonly label: string;
  /** null for text. */
  readonly unit: string | null;
}

/** What a portion, a term or an entry came to; shown when a person points at that line. */
export type LineResult =
  | {
      readonly kind: 'portion';
      readonly line: number;
      readonly material: MaterialCard;
      readonly shares: Shares;
      /** How it lies in the tank; null where that is not known, or nothing is stored. */
      readonly state: PortionState | null;
    }
  | { readonly kind: 'equation'; readonly line: number; readonly figures: readonly string[] };

export interface Shares {
  readonly mass: number | null;
  readonly mole: number | null;
  readonly volume: number | null;
  readonly energy: number | null;
}

/** What is known of a substance or blend, for a card in a hover. */
export interface MaterialCard {
  readonly name: string;
  readonly origin: 'catalogue' | 'scenario' | 'formula';
  readonly formula: string | null;
  readonly phase: string | null;
  readonly aliases: readonly string[];
  /** Each known property in its contract unit, with its source in words. */
  readonly properties: readonly CardProperty[];
  /** What is recorded of its hazards; null when nothing is, which does not make it harmless. A blend's are its portions'. */
  readonly hazards: Hazards | null;
}

export interface CardProperty {
  readonly id: string;
  readonly label: string;
  readonly quantity: Quantity;
  readonly unit: string;
  readonly source: string;
  /** A condition in words (`at 15 °C`), or empty. */
  readonly condition: string;
}

export interface EvaluatedValue {
  readonly name: string;
  readonly place: Place;
  readonly namePlace: Place;
  /** null when it could not be worked out. */
  readonly quantity: Quantity | null;
}

export interface Expectation {
  /** From `expect` to the end of the claim. */
  readonly place: Place;
  /** null: it could not be worked out. */
  readonly holds: boolean | null;
  /** The left side's value. */
  readonly found: Quantity | null;
  /** The left side's contract unit when it is a single reference, otherwise null (SI). */
  readonly unit: string | null;
}

/** What a word, reference or number in the text stands for. */
export interface PlacedMeaning {
  readonly place: Place;
  readonly meaning: Meaning;
}

export type Meaning =
  | { readonly kind: 'definition'; readonly name: string; readonly definition: EvaluatedDefinition }
  | { readonly kind: 'value'; readonly name: string; readonly value: EvaluatedValue }
  | { readonly kind: 'catalogue'; readonly card: MaterialCard }
  | { readonly kind: 'figure'; readonly of: string; readonly figure: Figure }
  | { readonly kind: 'quantity'; readonly quantity: Quantity; readonly unit: string }
  | { readonly kind: 'entry'; readonly definitionKind: string; readonly entry: string };

export type { Place } from './place.ts';
