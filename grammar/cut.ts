// Cuts a file into sections: one top-level statement or one definition each, with the `##` lines right above it.
// It reads characters, not tokens, and parses nothing, so that a keystroke costs one cheap pass over the text and one
// parse of the section it falls in. A header at any depth ends whatever is open, and so does a line that starts with
// `scenario`, `use`, `let` or `expect` and is no entry: this is what keeps one broken definition from its neighbours.
// Invariant: sections are in order and disjoint, start and end with something other than space, newline or a trailing
// comment, and hold every such character of the file except stand-alone comments. Time is linear in the text. Cutting
// again from an earlier version gives what cutting afresh would.
import { startsEntry, wordAt } from './tokens.ts';
import type { Span } from './tree.ts';
import { asStatementWord, isKindWord } from './words.ts';

/** Where a section stands. */
export interface Cut extends Span {
  /** A header at the start of its line: it would begin a section there whatever stood above. */
  readonly isFresh: boolean;
}

/** Where each section of a file stands, in order. */
export function cut(text: string): Cut[] {
  const cutter = new Cutter(text);
  const reader = new SegmentReader(text, 0);
  for (let segment = reader.next(); segment !== undefined; segment = reader.next()) cutter.take(segment);
  return cutter.finish();
}

/** The sections of a text that differ from those of an earlier version. */
export interface Recut {
  /** So many at the start are where they were. */
  readonly kept: number;
  readonly cuts: readonly Cut[];
  /** So many at the end are what they were, `shift` characters on. */
  readonly moved: number;
  readonly shift: number;
}

/** The same as `cut`, reading no more than the surroundings of what has changed since an earlier version. */
export function cutAgain(text: string, before: string, cutsBefore: readonly Cut[]): Recut {
  const sameStart = commonStart(text, before);
  const sameEnd = commonEnd(text, before, sameStart);
  const shift = text.length - before.length;
  // The last header that stands, as a whole, above the change: the section behind it starts there too.
  let kept = Math.max(0, cutsBefore.length - 2);
  while (kept > 0 && !(cutsBefore[kept]?.isFresh === true && (cutsBefore[kept + 1]?.start ?? Infinity) <= sameStart)) {
    kept--;
  }
  // The first header below the change, once it is met again.
  let next = kept;
  const isMetAgain = (start: number): boolean => {
    while ((cutsBefore[next]?.start ?? Infinity) < start - shift) next++;
    return cutsBefore[next]?.start === start - shift && cutsBefore[next]?.isFresh === true;
  };
  const cutter = new Cutter(text);
  const reader = new SegmentReader(text, kept === 0 ? 0 : lineStartOf(text, cutsBefore[kept]?.start ?? 0));
  for (let segment = reader.next(); segment !== undefined; segment = reader.next()) {
    cutter.take(segment);
    const start = cutter.freshStart;
    if (start !== undefined && start >= text.length - sameEnd && isMetAgain(start)) {
      return { kept, cuts: cutter.closed, moved: cutsBefore.length - next, shift };
    }
  }
  return { kept, cuts: cutter.finish(), moved: 0, shift };
}

function commonStart(first: string, second: string): number {
  const most = Math.min(first.length, second.length);
  let length = 0;
  while (length < most && first.charCodeAt(length) === second.charCodeAt(length)) length++;
  return length;
}

/** How many characters at the end are the same, none of them in the common start. */
function commonEnd(first: string, second: string, start: number): number {
  const most = Math.min(first.length, second.length) - start;
  let length = 0;
  while (
    length < most &&
    first.charCodeAt(first.length - 1 - length) === second.charCodeAt(second.length - 1 - length)
  ) {
    length++;
  }
  return length;
}

function lineStartOf(text: string, offset: number): number {
  let start = offset;
  while (start > 0 && text.charCodeAt(start - 1) !== 10 && text.charCodeAt(start - 1) !== 13) start--;
  return start;
}

/** A stretch of one line: up to a newline, a semicolon, or a brace. */
interface Segment {
  /** The first character that is no space, and the offset behind the last one; equal when there is none. */
  readonly start: number;
  readonly end: number;
  /** Where the `##` lines right above start, or `start`. */
  readonly docStart: number;
  /** No other segment stands before it in its line. */
  readonly startsLine: boolean;
  readonly startsInColumn0: boolean;
  readonly ending: 'brace-open' | 'brace-close' | 'line';
  /** The offset of the brace that ends it. */
  readonly endingOffset: number;
  /** Opening minus closing round brackets. */
  readonly bracketBalance: number;
}

class SegmentReader {
  private readonly text: string;
  private offset: number;
  private lineStart: number;
  private docStart: number | undefined;

  /** Reads from the start of a line on. */
  constructor(text: string, lineStart: number) {
    this.text = text;
    this.offset = lineStart;
    this.lineStart = lineStart;
  }

  next(): Segment | undefined {
    const { text } = this;
    if (this.offset >= text.length) return undefined;
    const startsLine = this.offset === this.lineStart;
    let start = -1;
    let end = -1;
    let bracketBalance = 0;
    let commentStart = -1;
    let ending: Segment['ending'] = 'line';
    let endingOffset = text.length;
    let position = this.offset;
    let next = text.length;
    let endsLine = false;
    scan: for (; position < text.length; position++) {
      const character = text.charCodeAt(position);
      switch (character) {
        case 13:
        case 10:
          endingOffset = position;
          next = character === 13 && text.charCodeAt(position + 1) === 10 ? position + 2 : position + 1;
          endsLine = true;
          break scan;
        case 59: // ;
          endingOffset = position;
          next = position + 1;
          break scan;
        case 123: // {
        case 125: // }
          ending = character === 123 ? 'brace-open' : 'brace-close';
          endingOffset = position;
          next = position + 1;
          break scan;
        case 35: // #
          commentStart = position;
          position = endOfLine(text, position) - 1;
          break;
        case 34: // "
        case 39: // '
          if (start < 0) start = position;
          position = endOfQuoted(text, position, character) - 1;
          end = position + 1;
          break;
        default:
          if (isSpace(character)) break;
          if (start < 0) start = position;
          if (character === 40) bracketBalance++;
          else if (character === 41) bracketBalance--;
          end = position + 1;
      }
    }
    const isEmpty = start < 0;
    const segmentStart = isEmpty ? endingOffset : start;
    const docStart = startsLine && this.docStart !== undefined ? this.docStart : segmentStart;
    const startsInColumn0 = !isEmpty && start === columnZero(text, this.lineStart);
    // Only an unbroken block of `##` lines that ends right above a line documents it.
    if (!isEmpty || ending !== 'line') this.docStart = undefined;
    else if (startsLine) {
      if (commentStart < 0 || !isDocComment(text, commentStart)) this.docStart = undefined;
      else this.docStart ??= commentStart;
    }
    this.offset = next;
    if (endsLine) this.lineStart = next;
    return {
      start: segmentStart,
      end: isEmpty ? segmentStart : end,
      docStart,
      startsLine,
      startsInColumn0,
      ending,
      endingOffset,
      bracketBalance,
    };
  }
}

type OpenSection =
  | { readonly kind: 'definition'; readonly start: number; end: number; readonly isFresh: boolean }
  /** `takesAll`: it broke into an open definition, whose stray rest it takes along so that one slip stays one finding. */
  | { readonly kind: 'statement'; readonly start: number; end: number; readonly takesAll: boolean; depth: number }
  | { readonly kind: 'stray'; readonly start: number; end: number };

class Cutter {
  private readonly text: string;
  private readonly places: Cut[] = [];
  private open: OpenSection | undefined;

  constructor(text: string) {
    this.text = text;
  }

  /** Where the definition that is open now starts, if that does not depend on what stands above. */
  get freshStart(): number | undefined {
    return this.open?.kind === 'definition' && this.open.isFresh ? this.open.start : undefined;
  }

  /** The sections so far, without the one that is open. */
  get closed(): readonly Cut[] {
    return this.places;
  }

  take(segment: Segment): void {
    const isEmpty = segment.start === segment.end;
    const firstWord = isEmpty ? '' : wordAt(this.text, segment.start);
    if (!isEmpty && this.isHeader(segment, firstWord)) this.startDefinition(segment);
    else if (!isEmpty && asStatementWord(firstWord) !== undefined && !startsEntry(this.text, segment.start)) {
      this.startStatement(segment);
    } else if (!isEmpty) this.takeContent(segment);
    // A brace with nothing before it is no header: it opens the body of the header on the line above, or is stray.
    if (segment.ending === 'brace-open') this.takeBrace(segment.endingOffset);
    else if (segment.ending === 'brace-close') this.takeCloseBrace(segment);
  }

  finish(): Cut[] {
    this.close();
    return this.places;
  }

  private isHeader(segment: Segment, firstWord: string): boolean {
    if (segment.ending === 'brace-open') return true;
    return segment.startsInColumn0 && isKindWord(firstWord) && !startsEntry(this.text, segment.start);
  }

  private startDefinition(segment: Segment): void {
    this.close();
    this.open = { kind: 'definition', start: segment.docStart, end: segment.end, isFresh: segment.startsLine };
  }

  private startStatement(segment: Segment): void {
    const takesAll = this.open?.kind === 'definition';
    this.close();
    const { docStart: start, end, bracketBalance: depth } = segment;
    this.open = { kind: 'statement', start, end, takesAll, depth };
  }

  private takeContent(segment: Segment): void {
    const { open } = this;
    if (open?.kind === 'statement' && !open.takesAll && !this.continues(open, segment)) {
      this.close();
      this.open = { kind: 'stray', start: segment.start, end: segment.end };
    } else if (open === undefined) this.open = { kind: 'stray', start: segment.start, end: segment.end };
    else {
      open.end = segment.end;
      if (open.kind === 'statement') open.depth += segment.bracketBalance;
    }
  }

  private takeCloseBrace(segment: Segment): void {
    this.takeBrace(segment.endingOffset);
    if (this.open?.kind === 'definition') this.close();
  }

  private takeBrace(offset: number): void {
    if (this.open?.kind === 'statement' && !this.open.takesAll) this.close();
    if (this.open === undefined) this.open = { kind: 'stray', start: offset, end: offset + 1 };
    else this.open.end = offset + 1;
  }

  /** Whether a statement goes on in the next line: inside brackets, or after a comma, an arrow or an operator. */
  private continues(open: Extract<OpenSection, { kind: 'statement' }>, segment: Segment): boolean {
    if (startsEntry(this.text, segment.start)) return false;
    if (open.depth > 0) return true;
    const last = this.text.charAt(open.end - 1);
    if (last === '+' || last === '-' || last === '−') return /\s/.test(this.text.charAt(open.end - 2));
    return ',→*·/^=<>≤≥±'.includes(last);
  }

  private close(): void {
    const { open } = this;
    if (open === undefined) return;
    this.places.push({ start: open.start, end: open.end, isFresh: open.kind === 'definition' && open.isFresh });
    this.open = undefined;
  }
}

const isSpace = (character: number): boolean =>
  character === 32 ||
  (character >= 9 && character <= 12) ||
  character === 0xa0 ||
  (character >= 0x2000 && character <= 0x200a) ||
  character === 0x202f ||
  character === 0x3000 ||
  character === 0xfeff;

/** Where column 0 of a line is: behind a byte order mark, should the file start with one. */
const columnZero = (text: string, lineStart: number): number =>
  lineStart === 0 && text.charCodeAt(0) === 0xfeff ? 1 : lineStart;

/** `##` and no third mark, which would be a ruled line. */
const isDocComment = (text: string, offset: number): boolean =>
  text.charCodeAt(offset + 1) === 35 && text.charCodeAt(offset + 2) !== 35;

function endOfLine(text: string, offset: number): number {
  let position = offset;
  while (position < text.length && text.charCodeAt(position) !== 10 && text.charCodeAt(position) !== 13) position++;
  return position;
}

/** Behind the closing quote, or at the line's end when there is none. */
function endOfQuoted(text: string, offset: number, quote: number): number {
  let position = offset + 1;
  for (; position < text.length; position++) {
    const character = text.charCodeAt(position);
    if (character === quote) return position + 1;
    if (character === 10 || character === 13) return position;
  }
  return position;
}
