// What the client says is seen of each open document, and with it which part of a text that is too large is read: the
// definitions that touch the lines on the screen; the beginning, where nothing was said. The protocol has no such
// message, so a client that knows of it sends `stokehold/visibleRanges` with `{ uri, ranges }` whenever the lines on the
// screen change. Nothing in that message is trusted. Invariant: no more than the largest text is ever read.
import { Range } from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import type { Span } from '../../grammar/tree.ts';
import type { Reading } from '../scenario/files.ts';
import { offsetAt } from './convert.ts';

/** More than any editor shows of one document at once. */
const MOST_RANGES = 100;

export class VisibleRanges {
  readonly #ranges = new Map<string, readonly Range[]>();

  constructor(private readonly isOpen: (uri: string) => boolean) {}

  /** Takes a message in. Gives the URI of the document when something else is seen of it than before. */
  take(message: unknown): string | null {
    if (typeof message !== 'object' || message === null || !('uri' in message) || !('ranges' in message)) return null;
    const { uri, ranges } = message;
    if (typeof uri !== 'string' || !this.isOpen(uri) || !Array.isArray(ranges)) return null;
    const seen = ranges.filter((range) => Range.is(range)).slice(0, MOST_RANGES);
    if (isSame(seen, this.#ranges.get(uri) ?? [])) return null;
    this.#ranges.set(uri, seen);
    return uri;
  }

  /** The document is closed. */
  drop(uri: string): void {
    this.#ranges.delete(uri);
  }

  /** How a text is to be read. `document` is the open document it is the text of; null for a file that is not open. */
  readingOf(text: string, document: TextDocument | null, largestText: number): Reading {
    const ranges = document ? (this.#ranges.get(document.uri) ?? []) : [];
    if (!document || text.length <= largestText || ranges.length === 0) return { largestText };
    let left = largestText;
    const visible = ranges.map((range): Span => {
      const start = offsetAt(document, range.start);
      const end = Math.min(Math.max(start, offsetAt(document, range.end)), start + left);
      left -= end - start;
      return { start, end };
    });
    return { largestText, visible };
  }
}

function isSame(first: readonly Range[], second: readonly Range[]): boolean {
  return JSON.stringify(first) === JSON.stringify(second);
}
