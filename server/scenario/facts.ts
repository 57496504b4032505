// What the evaluation has to say about a scenario: one variant a finding code, each with the numbers and names its
// message needs and nothing of its wording. The place is kept beside the fact (see PlacedFact). findings/ has one file
// for each variant; the registry there is a map over `Fact['code']`, so the compiler asks for the missing one.

import type { Problem } from '../../grammar/tree.ts';
import type { NoBalance } from '../core/balance/equation.ts';
import type { GivenProductsFault } from '../core/balance/given-products.ts';
import type { BurnFault } from '../core/burn/burn.ts';
import type { ProfileFault } from '../core/duty/profile.ts';
import type { NoEquilibrium } from '../core/equilibrium/equilibrium.ts';
import type { SaltMeltingValidity } from '../core/equilibrium/melts.ts';
import type { Dimension } from '../core/quantity/dimension.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { CycleFact } from './cycle-facts.ts';
import type { HazardFact } from './hazard-fact.ts';
import type { Place } from './place.ts';
import type { PlantFact } from './plant-facts.ts';
import type { PortionState } from './portion-state.ts';
import type { SeaFact } from './sea-fact.ts';
import type { WorkFact } from './work-facts.ts';

export type Fact =
  | SyntaxFact
  | HazardFact
  | SeaFact
  | WorkFact
  | CycleFact
  | PlantFact
  /** A word stands for nothing. `what` says what was looked for. */
  | {
      readonly code: 'name/unknown';
      readonly what:
        'substance' | 'definition' | 'figure' | 'value' | 'function' | 'element' | 'portion' | 'code' | 'word';
      readonly word: string;
      readonly near: readonly string[];
      /** For a figure or portion: the definition it was looked for in. For a listed word: the entry. */
      readonly owner?: string;
      /** For a listed word: what is allowed. */
      readonly allowed?: readonly string[];
    }
  | { readonly code: 'name/unknown-kind'; readonly word: string; readonly near: readonly string[] }
  | { readonly code: 'name/duplicate'; readonly name: string; readonly others: readonly Place[] }
  | { readonly code: 'name/reserved'; readonly name: string; readonly why: 'reserved-word' | 'unit' }
  | { readonly code: 'name/like-catalogue'; readonly name: string; readonly substance: string }
  /** `path` holds the names of the ring and its first again; `leftOut` that many are not told before the last two. */
  | { readonly code: 'name/cycle'; readonly path: readonly string[]; readonly leftOut?: number }
  | { readonly code: 'name/use-cycle'; readonly path: readonly string[] }
  | {
      readonly code: 'name/missing-file';
      readonly path: string;
      readonly why: 'missing' | 'unreadable' | 'outside' | 'not-relative';
      readonly detail?: string;
    }
  | {
      readonly code: 'duty/profile';
      readonly path: string;
      readonly why: ProfileFault['why'];
      readonly row: number;
      readonly text: string;
    }
  | {
      readonly code: 'name/unknown-entry';
      readonly entry: string;
      readonly kind: string;
      readonly near: readonly string[];
      readonly known: readonly string[];
      /** Where the line names a substance and an amount of it: where it stands, and the portion it would be. */
      readonly portion?: { readonly place: Place; readonly text: string };
    }
  | { readonly code: 'name/repeated-entry'; readonly entry: string; readonly first: Place }
  | {
      readonly code: 'name/missing-entry';
      readonly kind: string;
      readonly name: string;
      readonly entries: readonly string[];
      /** Every one of them is needed; otherwise any one will do. */
      readonly all?: true;
    }
  /** A phrase of an entry that its table does not take. */
  | { readonly code: 'name/unknown-phrase'; readonly entry: string; readonly text: string; readonly takes: string }
  /** Something told at some temperatures only is asked for at another. */
  | {
      readonly code: 'name/unknown-state';
      readonly text: string;
      readonly owner: string;
      readonly kind: string;
      readonly states: readonly Quantity[];
    }
  /** A function called with too many or too few values. */
  | { readonly code: 'name/arguments'; readonly name: string; readonly takes: string; readonly given: number }
  /** A line that this kind does not take: a portion in a reaction, an equation in a blend. */
  | { readonly code: 'name/unexpected-line'; readonly kind: string; readonly line: 'portion' | 'equation' }
  /** Something of another kind stands where, say, a number is needed. */
  | { readonly code: 'name/wrong-kind'; readonly name: string; readonly is: string; readonly needed: string }
  /** `hint` says in a sentence why a well-known word is no unit here (`Nm3` has no agreed state). */
  | {
      readonly code: 'unit/unknown';
      readonly word: string;
      readonly near: readonly string[];
      readonly hint: string | null;
    }
  /** A number stands without a unit where one is needed. */
  | { readonly code: 'unit/missing'; readonly needed: Dimension; readonly example: string }
  /** One value against what its place needs. */
  | {
      readonly code: 'unit/mismatch';
      readonly form: 'place';
      readonly found: Sided;
      readonly needed: Pick<Quantity, 'dimension' | 'kind'>;
      /** A unit that would fit, for "write for example". */
      readonly example: string;
    }
  /** A ratio written with `%` or a unit where its bare number is meant. */
  | {
      readonly code: 'unit/mismatch';
      readonly form: 'bare';
      readonly text: string;
      readonly entry: string;
      /** What a percentage is as a number; null for another unit. */
      readonly fraction: number | null;
      /** The entry that takes such a ratio, where there is one. */
      readonly instead: string | null;
      readonly mends: readonly Mend[];
    }
  /** Two values that cannot be added, compared, … */
  | {
      readonly code: 'unit/mismatch';
      readonly form: 'sides';
      readonly operation: 'add' | 'subtract' | 'compare';
      readonly left: Sided;
      readonly right: Sided;
    }
  /** Two temperatures are added; `asDifference` is the second as a difference in K (`100 K`), where it is a literal. */
  | {
      readonly code: 'unit/two-temperatures';
      readonly left: Sided;
      readonly right: Sided;
      readonly asDifference: string | null;
    }
  /** A temperature where only a difference makes sense, or the other way round, or one that is multiplied or negated. */
  | {
      readonly code: 'unit/temperature';
      readonly why: 'difference-needed' | 'temperature-needed' | 'scaled';
      readonly text: string;
    }
  /** `absolutePa` is the gauge pressure as an absolute one. */
  | {
      readonly code: 'unit/gauge';
      readonly why: 'absolute-needed' | 'gauge-needed' | 'scaled';
      readonly text: string;
      readonly absolutePa: number | null;
    }
  | { readonly code: 'unit/exponent'; readonly text: string; readonly base: Sided }
  | { readonly code: 'unit/uncertainty'; readonly text: string; readonly why: 'negative' | 'mismatch' | 'relative' }
  /** A unit that may mean two things, or may not stand so; `offers` are spellings that say one of them. */
  | {
      readonly code: 'unit/ambiguous';
      readonly text: string;
      readonly offers: readonly string[];
      readonly why: 'brackets' | 'scale' | 'share' | 'form';
    }
  | {
      readonly code: 'balance/elements';
      readonly differences: readonly { readonly element: string; readonly left: number; readonly right: number }[];
      readonly solution:
        | { readonly kind: 'unique'; readonly equation: string }
        | { readonly kind: 'several'; readonly equation: string; readonly freedom: number }
        | { readonly kind: 'none'; readonly why: NoBalance };
    }
  | {
      readonly code: 'balance/shares';
      readonly why: 'sum' | 'inconsistent' | 'no-room' | 'mixed-amounts' | 'rest-with-amounts';
      readonly name: string;
      /** The sum of the shares as a fraction, where there is one. */
      readonly sum: number | null;
      /** Edits that would mend it. */
      readonly mends: readonly Mend[];
    }
  | { readonly code: 'balance/two-rests'; readonly name: string }
  | { readonly code: 'balance/negative'; readonly text: string }
  | { readonly code: 'balance/no-density'; readonly substance: string; readonly why: 'density' | 'molar-mass' }
  | { readonly code: 'balance/no-portions'; readonly name: string }
  | { readonly code: 'balance/no-data'; readonly what: string; readonly missing: readonly string[] }
  /** The named products cannot be what the fuel burns to. */
  | { readonly code: 'balance/products'; readonly fault: GivenProductsFault }
  /** `of`: the blend by itself, or the whole charge of a burn, oxidant included. */
  | {
      readonly code: 'balance/water-missing';
      readonly of: 'blend' | 'burn';
      readonly name: string;
      readonly waterKgPerKg: number;
    }
  /** Nothing can be burnt with this much of these. */
  | { readonly code: 'balance/charge'; readonly fault: ChargeFault; readonly fuel: string; readonly oxidant: string }
  /** No state of lowest energy: the elements have no product, or it lies beyond the data. */
  | {
      readonly code: 'balance/no-equilibrium';
      readonly name: string;
      readonly of: 'flame' | 'zone';
      readonly fault:
        Extract<NoEquilibrium, { readonly reason: 'cannot-form' | 'outside-tables' }> | { readonly reason: 'no-gas' };
    }
  /** Less oxygen than the fuel needs: what is left unburnt at equilibrium, and whether soot is to be expected. */
  | {
      readonly code: 'range/rich';
      readonly of: 'flame' | 'zone';
      readonly lambda: number;
      /** Of the dry gas. */
      readonly carbonMonoxideShare: number;
      readonly hydrogenShare: number;
      /** Share of the carbon that is soot at equilibrium. */
      readonly sootShare: number;
      /** Atoms of carbon per atom of oxygen in the charge; null without oxygen. */
      readonly carbonPerOxygen: number | null;
      /** From as many on premixed flames soot. */
      readonly sootingFrom: number;
    }
  /** A gas at a pressure that it would not have so cold: its compression was forgotten. `compressed` is what it would be. */
  | {
      readonly code: 'range/cold-charge';
      readonly temperature: Quantity;
      readonly pressure: Quantity;
      readonly compressed: Quantity;
    }
  /** Walls of these temperatures, of those given, are met by a deposit that sticks, or of which that is not known. */
  | {
      readonly code: 'range/sticky';
      readonly from: Quantity;
      readonly to: Quantity;
      /** Null where nothing is known of its salts together; its uncertainty is null with it. */
      readonly firstMelting: Quantity | null;
      readonly uncertaintyK: number | null;
      /** From where on it sticks; null where that is not known. */
      readonly sticky: Quantity | null;
      readonly leading: readonly string[];
      /** Vapours of a frozen gas that condense on such walls. */
      readonly vapours: readonly string[];
      readonly validity: readonly SaltMeltingValidity[];
    }
  /** Droplets or particles have less time than they take to burn out; `timeS` null where no flame holds at all. */
  | {
      readonly code: 'range/burn-out';
      readonly residence: Quantity;
      readonly portions: readonly {
        readonly name: string;
        readonly verdict: 'open' | 'unburnt';
        readonly timeS: number | null;
        /** Up and down, within which such times are good; null without a time. */
        readonly factor: number | null;
      }[];
    }
  /** Water vapour near its saturation at a high pressure is no ideal gas. */
  | {
      readonly code: 'range/real-gas';
      readonly temperature: Quantity;
      readonly vapourPressure: Quantity;
      readonly saturation: Quantity;
    }
  /** `worked` is what `first` makes of the number that `second` gives, where the two can be held against each other. */
  | {
      readonly code: 'balance/contradiction';
      readonly what: string;
      readonly first: string;
      readonly second: string;
      readonly compared: { readonly written: Quantity; readonly worked: Quantity; readonly unit: string } | null;
    }
  | {
      readonly code: 'range/number';
      readonly text: string;
      readonly why: 'not-finite' | 'division-by-zero' | 'outside-function';
    }
  | { readonly code: 'range/temperature'; readonly why: 'below-absolute-zero'; readonly text: string }
  /** Data of these species are not good at the state asked for; `range` is where they are. */
  | {
      readonly code: 'range/temperature';
      readonly why: 'extrapolated';
      /** The state of a burn, which nobody chose; otherwise one that was asked for. */
      readonly of?: 'burn' | 'cooled-products';
      readonly temperature: Quantity;
      readonly species: readonly { readonly name: string; readonly range: readonly [from: Quantity, to: Quantity] }[];
    }
  /** A state of a burn that is asked for, where the tables of no product reach. */
  | {
      readonly code: 'range/temperature';
      readonly why: 'outside-tables';
      readonly what: 'cooled' | 'exhaust' | 'wall';
      readonly temperature: Quantity;
      readonly range: readonly [from: Quantity, to: Quantity];
    }
  /** An exhaust that is hotter than the flame it comes from. */
  | {
      readonly code: 'range/temperature';
      readonly why: 'hotter-than-flame';
      readonly temperature: Quantity;
      readonly flame: Quantity;
    }
  /** A portion that is in another phase where it is stored than at 25 °C, which its data are of. */
  | { readonly code: 'range/phase'; readonly substance: string; readonly state: PortionState }
  /** Vapour at that humidity would need more than the whole pressure, or the temperature has no saturation pressure. */
  /** A heating value beyond what anything that burns has. `most` is that of hydrogen, J/kg. */
  | {
      readonly code: 'range/heating-value';
      readonly text: string;
      readonly why: 'negative' | 'too-large';
      readonly basis: 'lower' | 'higher';
      readonly most: Quantity;
    }
  | { readonly code: 'range/humidity'; readonly temperature: Quantity; readonly pressure: Quantity }
  | { readonly code: 'range/share'; readonly text: string; readonly low: number; readonly high: number }
  | { readonly code: 'range/positive'; readonly text: string; readonly entry: string }
  | {
      readonly code: 'expect/failed';
      readonly claim: string;
      readonly found: Quantity;
      readonly unit: string | null;
      /** The limit it missed. */
      readonly limit: Quantity;
      readonly tolerance: Quantity | null;
    }
  /** So many syntax problems that what is computed of the file is not told; `hidden` findings are kept back. */
  | { readonly code: 'kind/suspended'; readonly problems: number; readonly hidden: number }
  | { readonly code: 'kind/not-evaluated'; readonly kind: string; readonly name: string }
  /** An `acknowledge` line that cannot count: only hazards can be acknowledged, by a known code, with a reason. */
  | {
      readonly code: 'name/acknowledged';
      readonly why: 'not-a-hazard' | 'no-reason' | 'unknown-code';
      readonly acknowledged: string;
    }
  /** Of a hazard that is not, or no longer, there; `line` is the whole line. */
  | {
      readonly code: 'name/acknowledged';
      readonly why: 'not-there';
      readonly acknowledged: string;
      readonly line: Place;
    }
  | { readonly code: 'program/failed'; readonly message: string };

/** Why a charge cannot be burnt as it is written. */
export type ChargeFault = BurnFault & {
  readonly reason: Exclude<BurnFault['reason'], 'no-energy' | 'no-heating-value' | 'nothing'>;
};

/** A problem of form, already in words by the grammar. */
export interface SyntaxFact {
  readonly code: Problem['code'];
  readonly problem: Problem;
}

export interface Sided {
  readonly text: string;
  readonly dimension: Dimension;
  readonly kind: Quantity['kind'];
}

/** One textual change, by place, that would mend what is said. */
export interface Mend {
  readonly title: string;
  readonly place: Place;
  readonly newText: string;
}
