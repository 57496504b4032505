// What a hover says, before it is marked up: the answer first, then where it comes from, then a few lines. Two renderings:
// Markdown and plain text, with the same words in the same order. Names and texts from a scenario may hold anything; they
// are shown as characters and never become markup, links, pictures or new lines.
// Invariants: at most `MOST_LINES` lines; no control characters. Source: CommonMark 0.31.2, "Backslash escapes"; GFM,
// "Autolinks (extension)".
import type { Place, TableWork } from '../scenario/scenario.ts';

export interface HoverText {
  /** What the hover is about, for the editor to mark. */
  readonly place: Place;
  /** Line 1: the value with its unit, or what the thing is. */
  readonly title: string;
  /** Line 2: where it comes from; null where there is nothing to say. */
  readonly origin: string | null;
  /** Then one line each: a value with its label, or a sentence. */
  readonly lines: readonly HoverLine[];
  /** What it tells of as being worked out: once that is done, the same place has more to tell. */
  readonly awaits?: readonly TableWork[];
}

export type HoverLine = { readonly label: string; readonly text: string } | { readonly sentence: string };

export const MOST_LINES = 12;

export function asMarkdown(hover: Omit<HoverText, 'place'>): string {
  const blocks = [`**${escaped(hover.title)}**`, ...(hover.origin === null ? [] : [lineStart(escaped(hover.origin))])];
  const list = kept(hover).map((line) =>
    'label' in line
      ? `- ${lineStart(escaped(line.label))}: ${escaped(line.text)}`
      : `- ${lineStart(escaped(line.sentence))}`,
  );
  return [...blocks, ...(list.length > 0 ? [list.join('\n')] : [])].join('\n\n');
}

export function asPlainText(hover: Omit<HoverText, 'place'>): string {
  const lines = kept(hover).map((line) => ('label' in line ? `${line.label}: ${line.text}` : line.sentence));
  return [hover.title, ...(hover.origin === null ? [] : [hover.origin]), ...lines].map(oneLine).join('\n');
}

/** The text of a sentence, cut where a person stops reading. */
export function shortened(text: string, longest = 200): string {
  const characters = Array.from(oneLine(text));
  return characters.length > longest ? `${characters.slice(0, longest - 1).join('')}…` : characters.join('');
}

function kept({ origin, lines }: Omit<HoverText, 'place'>): readonly HoverLine[] {
  return lines.slice(0, MOST_LINES - (origin === null ? 1 : 2));
}

/**
 * The text with every character escaped that could begin markup. Dots, signs and brackets of numbers and units stay as
 * they are, because clients show some hovers unrendered: `35.5 MJ/kg`, not `35\.5`.
 */
function escaped(text: string): string {
  return oneLine(text)
    .replace(/[\\`*_[\]<>#|~&!$@]/g, '\\$&')
    .replace(/(https?|ftp|mailto|xmpp):/gi, '$1\\:')
    .replace(/(www)\./gi, '$1\\.');
}

/** At a line's start a few more characters mean something: the marks of lists and of rules. */
function lineStart(text: string): string {
  return text.replace(/^([-+])/, '\\$1').replace(/^(\d+)([.)])/, '$1\\$2');
}

function oneLine(text: string): string {
  // Also the marks that turn the direction of writing: a name must not reorder the words around it.
  return text
    .replace(/[\p{Cc}\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]+/gu, ' ')
    .replace(/ {2,}/g, ' ')
    .trim();
}
