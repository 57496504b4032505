// A section's text without what means nothing: comments, blank lines, and blank space at the ends of lines. Two sections
// with the same significant text have the same tree but for positions, so the text is what an answer is known by, and an
// offset in one is carried over to the other piece by piece. Blank space between words of one line is kept: it is part of
// what findings quote. Invariant: time is linear in the text. Spaces and comments as the grammar's lexer takes them.

import type { Section } from '../../grammar/tree.ts';

/** The pieces a text consists of, one a line as a rule, joined by newlines in `text`. */
export interface SignificantText {
  readonly text: string;
  /** Where each piece starts and ends in the text it was taken from. */
  readonly starts: readonly number[];
  readonly ends: readonly number[];
}

export function significantText(text: string): SignificantText {
  const pieces: string[] = [];
  const starts: number[] = [];
  const ends: number[] = [];
  let start = -1;
  let end = -1;
  const closePiece = (): void => {
    if (start < 0) return;
    // A `#` right behind a word may change how that is read (`Na+` is an ion before a space, but not before `#`).
    pieces.push(text.slice(start, end) + (text.charCodeAt(end) === HASH ? '#' : ''));
    starts.push(start);
    ends.push(end);
    start = -1;
  };
  for (let offset = 0; offset < text.length; offset++) {
    const character = text.charCodeAt(offset);
    if (character === LINE_FEED || character === CARRIAGE_RETURN) closePiece();
    else if (character === HASH) {
      closePiece();
      offset = lineEnd(text, offset) - 1;
    } else if (!isSpace(character)) {
      if (start < 0) start = offset;
      if (character === QUOTE || character === APOSTROPHE) offset = closingQuote(text, offset, character);
      end = offset + 1;
    }
  }
  closePiece();
  return { text: pieces.join('\n'), starts, ends };
}

/** The significant text of a section, found once. */
export function significantTextOf(section: Section): SignificantText {
  const known = ofSection.get(section);
  if (known) return known;
  const found = significantText(section.text);
  ofSection.set(section, found);
  return found;
}

const ofSection = new WeakMap<Section, SignificantText>();

/** An offset of one text in another with the same significant text. An offset outside of all pieces goes to the nearest. */
export function carryOver(offset: number, from: SignificantText, to: SignificantText): number {
  let low = 0;
  let high = from.starts.length - 1;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if ((from.starts[middle] ?? 0) <= offset) low = middle;
    else high = middle - 1;
  }
  const inPiece = Math.min(offset, from.ends[low] ?? 0) - (from.starts[low] ?? 0);
  return (to.starts[low] ?? 0) + Math.max(0, inPiece);
}

const LINE_FEED = 10;
const CARRIAGE_RETURN = 13;
const QUOTE = 34;
const HASH = 35;
const APOSTROPHE = 39;

function isSpace(character: number): boolean {
  return (
    character === 32 ||
    (character >= 9 && character <= 12) ||
    character === 0xa0 ||
    (character >= 0x2000 && character <= 0x200a) ||
    character === 0x202f ||
    character === 0x3000 ||
    character === 0xfeff
  );
}

function lineEnd(text: string, offset: number): number {
  let end = offset;
  while (end < text.length && text.charCodeAt(end) !== LINE_FEED && text.charCodeAt(end) !== CARRIAGE_RETURN) end++;
  return end;
}

/** The offset of the quote that closes a text or quoted name, or of its line's last character where none does. */
function closingQuote(text: string, opening: number, quote: number): number {
  for (let offset = opening + 1; offset < text.length; offset++) {
    const character = text.charCodeAt(offset);
    if (character === quote) return offset;
    if (character === LINE_FEED || character === CARRIAGE_RETURN) return offset - 1;
  }
  return text.length - 1;
}
