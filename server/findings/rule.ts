// What a file of this folder gives: how grave its fact is, what to say of it, and mends where they are mechanical.
// A rule sees the fact and the site it stands at, works nothing out, and rounds nothing itself (wording/ does).
// Invariant: a message is whole sentences of plain text: what the thing is, what is needed, by how much, one next step.

import { nameAsWritten } from '../wording/words.ts';
import type { Fact, SyntaxFact } from '../scenario/facts.ts';
import type { HazardCode, HazardFact } from '../scenario/hazard-fact.ts';
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';
import type { Finding, Fix, Severity } from './finding.ts';

/** The fact with this code. All five problems of form share one shape. */
export type FactOf<Code extends Fact['code']> = Code extends SyntaxFact['code']
  ? SyntaxFact
  : Code extends HazardCode
    ? HazardFact
    : Extract<Fact, { readonly code: Code }>;

export type Rule<F extends Fact> = Message<F> & {
  /** One for all, or by what the fact says. */
  readonly severity: Severity | ((fact: F) => Severity);
  readonly related?: (fact: F, site: Site) => Finding['related'];
  readonly fixes?: (fact: F, site: Site) => readonly Fix[];
};

type Message<F extends Fact> =
  /** Says nothing that depends on where the fact stands, so that it is made once for a fact that moves. */
  | { readonly message: (fact: F) => string }
  /** Quotes the text, or what else there is at the place. */
  | { readonly messageAt: (fact: F, site: Site) => string };

/** Where a fact stands. */
export interface Site {
  readonly place: Place;
  readonly file: EvaluatedFile;
}

/** The text at the site. */
export function textAt(site: Site): string {
  return site.file.tree.text.slice(site.place.start, site.place.end);
}

/** Fixes that put another word in the place of what is written, at most three; one alone is the preferred one. */
export function replacements(site: Site, texts: readonly string[]): readonly Fix[] {
  return texts.slice(0, 3).map((newText) => ({
    title: `Write \`${newText}\``,
    preferred: texts.length === 1,
    edits: [{ place: site.place, newText }],
  }));
}

/** The same for names, which may need quotes. */
export function nameReplacements(site: Site, names: readonly string[]): readonly Fix[] {
  return replacements(site, names.map(nameAsWritten));
}
