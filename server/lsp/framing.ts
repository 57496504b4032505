// Keeps the messages of a byte stream apart where the lengths written before them cannot be trusted. The protocol library
// takes a wrong length at its word: one that is too short makes it read every later message at the wrong place, one that
// is too long makes it wait for bytes that never come. This stands in front of it, passes whole messages on, and finds
// its way back at the next header. It knows bytes and headers only, no JSON and no message. Needs Node.
// Invariants: a stream whose lengths are right passes unchanged but for foreign headers; a wrong length costs its own
// message, and the next one where it ends inside that one's header; a byte is copied and searched a bounded number of times.
// Source: Language Server Protocol 3.18, "Base Protocol"; RFC 8259: no line break stands inside a JSON string, and outside
// of one no word but `true`, `false` and `null`, so a header never occurs in a message.
import { pipeline, Transform, type Readable, type TransformCallback } from 'node:stream';

/** No message is longer. A header that says so is not believed. */
const MOST_BYTES = 256 * 2 ** 20;
/** No header is longer; of what comes before one, no more is kept. */
const MOST_HEADER_BYTES = 1024;
const HEADER_END = '\r\n\r\n';
/** A length with whatever headers follow it, at the end of what stands before a blank line. */
const LENGTH = /Content-Length *: *(\d{1,15}) *(?:\r\n[\w-]+ *:[^\r\n]*)*$/i;

/** The bytes of `input` as whole messages. Ends when it ends. */
export function wholeMessages(input: Readable): Readable {
  // An error of the input closes the output too, which is what its reader waits for.
  return pipeline(input, new WholeMessages(), () => undefined);
}

class WholeMessages extends Transform {
  #chunks: Buffer[] = [];
  #length = 0;
  /** Of the message whose header has been read; null while a header is looked for. */
  #bodyLength: number | null = null;
  /** The part of the body that holds no header. */
  #searched = 0;

  override _transform(chunk: Buffer, _encoding: BufferEncoding, done: TransformCallback): void {
    this.#chunks.push(chunk);
    this.#length += chunk.length;
    while (this.#bodyLength === null ? this.#readHeader() : this.#readBody(this.#bodyLength));
    done();
  }

  /** Whether there is more to be done with what has been received. */
  #readHeader(): boolean {
    const bytes = this.#received();
    const end = bytes.indexOf(HEADER_END);
    if (end < 0) {
      this.#keep(bytes.subarray(-MOST_HEADER_BYTES));
      return false;
    }
    const length = lengthIn(bytes, end)?.length;
    this.#keep(bytes.subarray(end + HEADER_END.length));
    if (length !== undefined && length <= MOST_BYTES) this.#expect(length);
    return true;
  }

  #readBody(bodyLength: number): boolean {
    const misplaced = this.#headerInBody(bodyLength);
    if (misplaced !== null) {
      this.#keep(this.#received().subarray(misplaced));
      this.#expect(null);
      return true;
    }
    if (this.#length < bodyLength) return false;
    const bytes = this.#received();
    this.push(`Content-Length: ${bodyLength}${HEADER_END}`, 'latin1');
    this.push(bytes.subarray(0, bodyLength));
    this.#keep(bytes.subarray(bodyLength));
    this.#expect(null);
    return true;
  }

  /** Where a header starts in what there is of the body: then its length was wrong. */
  #headerInBody(bodyLength: number): number | null {
    const from = Math.max(0, this.#searched - MOST_HEADER_BYTES);
    const until = Math.min(this.#length, bodyLength);
    const part = this.#slice(from, until);
    this.#searched = until;
    for (let end = part.indexOf(HEADER_END); end >= 0; end = part.indexOf(HEADER_END, end + 1)) {
      const header = lengthIn(part, end);
      if (header) return from + header.start;
    }
    return null;
  }

  #expect(bodyLength: number | null): void {
    this.#bodyLength = bodyLength;
    this.#searched = 0;
  }

  #received(): Buffer {
    if (this.#chunks.length > 1) this.#chunks = [Buffer.concat(this.#chunks)];
    return this.#chunks[0] ?? Buffer.alloc(0);
  }

  #keep(rest: Buffer): void {
    this.#chunks = [rest];
    this.#length = rest.length;
  }

  /** A stretch near the end of what has been received, without joining all of it. */
  #slice(from: number, until: number): Buffer {
    const parts: Buffer[] = [];
    let end = this.#length;
    for (let index = this.#chunks.length - 1; index >= 0 && end > from; index--) {
      const chunk = this.#chunks[index];
      if (!chunk) break;
      const start = end - chunk.length;
      parts.unshift(chunk.subarray(Math.max(0, from - start), Math.max(0, until - start)));
      end = start;
    }
    return parts.length === 1 && parts[0] ? parts[0] : Buffer.concat(parts);
  }
}

/** The header that ends at `end`: where its length starts, and what that says. */
function lengthIn(bytes: Buffer, end: number): { readonly start: number; readonly length: number } | null {
  const from = Math.max(0, end - MOST_HEADER_BYTES);
  const found = LENGTH.exec(bytes.toString('latin1', from, end));
  return found?.[1] === undefined ? null : { start: from + found.index, length: Number(found[1]) };
}
