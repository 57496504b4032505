// What a completion offers, as plain records, and the few rules all kinds of offers share: how they are ranked, and when one
// still fits what has been typed. Knows no text and no protocol. Invariant: an offer that is filtered out here would be
// filtered out by an editor too, so that a list is only ever shorter, never different.
import type { HoverText } from './hover-text.ts';

export type Documentation = Omit<HoverText, 'place'>;

export type CompletionRole =
  | 'kind'
  | 'keyword'
  | 'entry'
  | 'word'
  | 'unit'
  | 'substance'
  | 'element'
  | 'definition'
  | 'value'
  | 'figure'
  | 'share'
  | 'function';

/** What the documentation of an offer is about, where it is made only when a person looks at the offer. */
export type CompletionSubject =
  | { readonly kind: 'catalogue'; readonly name: string; readonly phase: string }
  | { readonly kind: 'name'; readonly name: string }
  | { readonly kind: 'figure'; readonly of: string; readonly id: string };

export interface CompletionItem {
  readonly label: string;
  readonly role: CompletionRole;
  /** One short line beside the label: a value, a kind, what it is short for. */
  readonly detail: string;
  readonly insert: string;
  /** The same with places to fill in, for editors that have them. */
  readonly snippet?: string;
  /** What is compared with the text typed, where that is not the label. */
  readonly filter?: string;
  /** Where the text begins that it takes the place of; the end is the cursor. */
  readonly start: number;
  /** Smaller stands higher in the list. */
  readonly rank: number;
  readonly documentation?: Documentation;
  readonly subject?: CompletionSubject;
  /** More is to be chosen behind it, so that a list may open again once it is taken. */
  readonly continues?: boolean;
}

export interface Completion {
  readonly items: readonly CompletionItem[];
  /** The cursor, and the end of the word it stands in. */
  readonly end: number;
  readonly wordEnd: number;
  /** With more letters typed there may be other offers. */
  readonly isIncomplete: boolean;
  /** Something definite belongs here, so that a list may open by itself. */
  readonly isExpected: boolean;
}

/** Whether all letters typed occur in the text in their order, whatever their case; the first one at a word's start. */
export function fits(text: string, typed: string): boolean {
  const [wanted, have] = [typed.toLowerCase(), text.toLowerCase()];
  if (wanted === '' || have.startsWith(wanted)) return true;
  const first = wanted[0] ?? '';
  for (let start = have.indexOf(first); start >= 0; start = have.indexOf(first, start + 1)) {
    if (start > 0 && /[\p{L}\p{N}]/u.test(have[start - 1] ?? '')) continue;
    let at = start;
    for (const letter of wanted.slice(1)) {
      at = have.indexOf(letter, at + 1);
      if (at < 0) return false;
    }
    return true;
  }
  return false;
}

/** How well a text fits what is typed, small is good: 0 from its start, 1 from a word in it, 2 scattered. */
export function fitRank(text: string, typed: string): number {
  const [wanted, have] = [typed.toLowerCase(), text.toLowerCase()];
  return have.startsWith(wanted) ? 0 : have.includes(wanted) ? 1 : 2;
}

/** A text as it stands in a snippet. */
export function escapedSnippet(text: string): string {
  return text.replace(/[\\$}]/g, '\\$&');
}
