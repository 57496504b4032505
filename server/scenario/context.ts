// What the evaluation of one statement is given and where it leaves what it has to say. A context belongs to one section
// of one file; it turns spans into places, gathers facts and meanings, and names the section's own uncertain inputs.
// It knows no kinds and does no arithmetic.

import type { PlacedSection, Span } from '../../grammar/tree.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import { nearestWords } from '../core/spelling/nearest-words.ts';
import type { Fact } from './facts.ts';
import type { AskLongWork } from './long-work.ts';
import type { Machinery } from './machinery.ts';
import type { Material } from './material.ts';
import type { OxidantStream } from './oxidant-stream.ts';
import { placeOf } from './place.ts';
import { significantText } from './significant-text.ts';
import type { EvaluatedDefinition, EvaluatedValue, Meaning, Place, PlacedFact, PlacedMeaning } from './scenario.ts';

/** What a name stands for once it has been worked out. A null part could not be had, and that has been said. */
export type Named =
  | { readonly kind: 'value'; readonly value: EvaluatedValue }
  | {
      readonly kind: 'definition';
      readonly definition: EvaluatedDefinition;
      readonly material: Material | null;
      readonly stream: OxidantStream | null;
      readonly machinery: Machinery | null;
    }
  /** Of a kind that is not evaluated: it can be gone to, but whatever uses it stays silent. */
  | { readonly kind: 'unevaluated'; readonly definition: EvaluatedDefinition }
  /** Named twice, or on a cycle: whatever uses it stays silent. */
  | { readonly kind: 'unknown' };

export interface Scope {
  lookup(name: string): Named | undefined;
  names(): Iterable<string>;
  /**
   * What `work` gives for `input`, of which `key` says all; null where it is not there yet. The statement then says what
   * it can without it, and is asked again. To be asked for while the statement is worked out, and not later.
   */
  readonly longWork: AskLongWork;
  /** The text of a file that the statement names by this path; null where it is not there, which has been said. */
  fileText(path: string): string | null;
}

export class Context {
  readonly facts: PlacedFact[] = [];
  readonly meanings: PlacedMeaning[] = [];
  /** The places handed out to stand inside a fact or a figure. */
  readonly innerPlaces = new Set<Place>();
  #label = '';
  #ordinal = 0;

  constructor(
    readonly path: string,
    readonly placed: PlacedSection,
    readonly owner: string,
    readonly scope: Scope,
  ) {}

  report(span: Span, fact: Fact): void {
    this.facts.push({ fact, place: this.ownPlace(span) });
  }

  mean(span: Span, meaning: Meaning): void {
    this.meanings.push({ place: this.ownPlace(span), meaning });
  }

  /** A place to stand inside a fact or a figure. It is handed on as it is, never copied: see placing.ts. */
  place(span: Span): Place {
    const place = this.ownPlace(span);
    this.innerPlaces.add(place);
    return place;
  }

  /** Where the statement itself or something in it stands. */
  ownPlace(span: Span): Place {
    return placeOf(this.path, this.placed, span);
  }

  /** The text a span covers, as written, on one line and without comments. */
  written(span: Span): string {
    const text = this.placed.section.text.slice(span.start, span.end);
    return /[\r\n]/.test(text) ? significantText(text).text.replaceAll('\n', ' ') : text;
  }

  /** Says which line is being read, so that its uncertain inputs are named by definition, line and ordinal. */
  startLine(label: string): void {
    this.#label = label;
    this.#ordinal = 0;
  }

  /** The identity of the next `±` literal: stable under any edit that leaves its definition's lines in place. */
  nextInput(): string {
    return `${this.owner}/${this.#label}/${this.#ordinal++}`;
  }
}

/** A number that could not be had; whoever meets it says nothing more. */
export type Unknowable<T = Quantity> = T | null;

/** At most three of the known words that may be meant by one that is not known. */
export function near(word: string, known: Iterable<string>): readonly string[] {
  return nearestWords(word, [...known], 3);
}
