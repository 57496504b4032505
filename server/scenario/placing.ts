// Puts an answer where its section stands in the file as it is now. The answer may have been made from an earlier text of
// the section with other comments, and what it says of other definitions by name becomes those definitions as they are
// placed now. Works nothing out. Invariant: a placed answer cannot be told from one that was worked out afresh.

import type { PlacedSection } from '../../grammar/tree.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import type { Answer } from './answer.ts';
import type { Fact } from './facts.ts';
import { lazily } from './lazily.ts';
import type { Place } from './place.ts';
import type {
  EvaluatedDefinition,
  EvaluatedValue,
  Expectation,
  Figure,
  Meaning,
  PlacedFact,
  PlacedMeaning,
} from './scenario.ts';
import { carryOver, significantTextOf } from './significant-text.ts';
import type { Working } from './working.ts';

/** Finds the placed answer that a name stands for. */
export type PlacedByName = (name: string) => PlacedAnswer | undefined;

/** The answer where its section stands; the one made before where nothing of that has changed. */
export function placeAnswer(answer: Answer, path: string, placed: PlacedSection): PlacedAnswer {
  const before = lastPlaced.get(answer);
  if (before?.standsAt(path, placed)) return before;
  const now = new PlacedAnswer(answer, path, placed);
  lastPlaced.set(answer, now);
  return now;
}

const lastPlaced = new WeakMap<Answer, PlacedAnswer>();

/** The fact as its statement told it: one and the same for as long as that is not answered anew, wherever it stands. */
export function sourceOf(fact: Fact): Fact {
  return sources.get(fact) ?? fact;
}

/** Of the facts that hold places, by the copies in which those are put where they are now. */
const sources = new WeakMap<Fact, Fact>();

export class PlacedAnswer {
  readonly definition: EvaluatedDefinition | null;
  readonly value: EvaluatedValue | null;
  readonly expectation: Expectation | null;
  readonly facts: readonly PlacedFact[];
  readonly #innerPlaces: ReadonlyMap<object, Place>;

  constructor(
    private readonly answer: Answer,
    private readonly path: string,
    private readonly placed: PlacedSection,
  ) {
    const { named, expectation, facts, innerPlaces } = answer;
    this.#innerPlaces = new Map([...innerPlaces].map((place) => [place, this.#placeOf(place)]));
    this.definition =
      named && named.kind !== 'value' && named.kind !== 'unknown' ? this.#place(named.definition) : null;
    this.value = named?.kind === 'value' ? this.#placeValue(named.value) : null;
    this.expectation = expectation && { ...expectation, place: this.#placeOf(expectation.place) };
    this.facts = facts.map(({ fact, place }) => ({ fact: this.#placeFact(fact), place: this.#placeOf(place) }));
  }

  standsAt(path: string, { start, section }: PlacedSection): boolean {
    return path === this.path && start === this.placed.start && section === this.placed.section;
  }

  /** What the words of the section mean, where `placedByName` gives the definitions and values of others. */
  meanings(placedByName: PlacedByName): readonly PlacedMeaning[] {
    return this.answer.meanings.map(({ place, meaning }) => ({
      place: this.#placeOf(place),
      meaning: this.#meaning(meaning, placedByName),
    }));
  }

  #meaning(meaning: Meaning, placedByName: PlacedByName): Meaning {
    const { named } = this.answer;
    switch (meaning.kind) {
      case 'definition': {
        const isOwn = named && 'definition' in named && named.definition === meaning.definition;
        const definition = isOwn ? this.definition : placedByName(meaning.name)?.definition;
        return definition ? { ...meaning, definition } : meaning;
      }
      case 'value': {
        const isOwn = named?.kind === 'value' && named.value === meaning.value;
        const value = isOwn ? this.value : placedByName(meaning.name)?.value;
        return value ? { ...meaning, value } : meaning;
      }
      case 'figure': {
        const figures = placedByName(meaning.of)?.definition?.figures;
        const figure = figures?.find(({ id }) => id === meaning.figure.id);
        return figure ? { ...meaning, figure } : meaning;
      }
      default:
        return meaning;
    }
  }

  #place(definition: EvaluatedDefinition): EvaluatedDefinition {
    const { kind, name } = definition;
    const placed: EvaluatedDefinition = {
      kind,
      name,
      doc: this.placed.section.doc,
      place: this.#placeOf(definition.place),
      header: this.#placeOf(definition.header),
      namePlace: this.#placeOf(definition.namePlace),
      section: this.placed,
      figures: [],
      tables: [],
      absent: new Map(),
      lines: [],
      screening: definition.screening,
    };
    // Read when somebody looks: at most keys nobody does, and a burn solves its states then only.
    return lazily(placed, {
      figures: () => this.#placeFigures(definition.figures),
      tables: () => definition.tables,
      absent: () => definition.absent,
      lines: () => this.#withPlaces(definition.lines),
    });
  }

  /** Only workings hold places, and each is put where it belongs when it is read. */
  #placeFigures(figures: readonly Figure[]): readonly Figure[] {
    if (this.#innerPlaces.size === 0) return figures;
    return figures.map((figure) => {
      const { id, label, unit, band } = figure;
      const ends = band && { band };
      const placed: Figure = { id, label, unit, quantity: quantityOf(0), ...ends, working: unreadWorking };
      return lazily(placed, {
        quantity: () => figure.quantity,
        working: () => this.#withPlaces(figure.working),
      });
    });
  }

  #placeFact(fact: Fact): Fact {
    const placed = this.#withPlaces(fact);
    if (placed !== fact) sources.set(placed, fact);
    return placed;
  }

  #placeValue(value: EvaluatedValue): EvaluatedValue {
    return { ...value, place: this.#placeOf(value.place), namePlace: this.#placeOf(value.namePlace) };
  }

  #placeOf({ start, end }: Place): Place {
    return { path: this.path, start: this.#offset(start), end: this.#offset(end) };
  }

  #offset(offset: number): number {
    const { section, start } = this.placed;
    const isSameText = section === this.answer.section || section.text === this.answer.section.text;
    if (isSameText) return start + offset;
    return start + carryOver(offset, significantTextOf(this.answer.section), significantTextOf(section));
  }

  /** A copy in which the places that stand inside are put where they are now; the value itself where none do. */
  #withPlaces<Value>(value: Value): Value {
    if (this.#innerPlaces.size === 0) return value;
    const holders = holdersOf(this.answer);
    holders.look(value);
    // Copied field for field, the copy is of the value's own type; the compiler cannot follow that.
    return withPlaces(value, this.#innerPlaces, holders.found) as Value;
  }
}

/** Stands in a placed figure until its own working is read. */
const unreadWorking: Working = { method: 'as-given', inputs: [], sources: [], assumptions: [] };

/** The lists and records of an answer that hold a place, at whatever depth: looked for once, since most hold none. */
class Holders {
  readonly found = new Set<unknown>();
  readonly #seen = new Set<unknown>();

  constructor(private readonly places: ReadonlySet<object>) {}

  /** Looks through a value; only what is looked through is worked out, where that is done on reading. */
  look(value: unknown): boolean {
    if (typeof value !== 'object' || value === null) return false;
    if (this.places.has(value)) return true;
    if (this.#seen.has(value)) return this.found.has(value);
    this.#seen.add(value);
    // Every part is looked into, so that all holders are found.
    const parts: readonly unknown[] = Array.isArray(value) ? value : Object.values(value);
    const holding = parts.filter((part) => this.look(part)).length > 0;
    if (holding) this.found.add(value);
    return holding;
  }
}

function holdersOf(answer: Answer): Holders {
  const known = knownHolders.get(answer);
  if (known) return known;
  const holders = new Holders(answer.innerPlaces);
  knownHolders.set(answer, holders);
  return holders;
}

const knownHolders = new WeakMap<Answer, Holders>();

/** A copy as deep as places stand in it; lists and records that hold none are shared. Places do not stand in maps. */
function withPlaces(value: unknown, places: ReadonlyMap<object, Place>, holders: ReadonlySet<unknown>): unknown {
  if (typeof value !== 'object' || value === null) return value;
  const place = places.get(value);
  if (place) return place;
  if (!holders.has(value)) return value;
  if (Array.isArray(value)) return value.map((item) => withPlaces(item, places, holders));
  const copy: Record<string, unknown> = { ...value };
  for (const key of Object.keys(copy)) copy[key] = withPlaces(copy[key], places, holders);
  return copy;
}
