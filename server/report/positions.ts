// Offsets into lines and columns as the JSON contract counts them: both from 1, columns in UTF-16 units.
// Knows no encodings and no tabs. Invariant: any offset is answered, those beyond the text with its end.

export interface Position {
  readonly line: number;
  readonly column: number;
}

/** The lines of one text. */
export class Lines {
  readonly #starts: readonly number[];

  constructor(readonly text: string) {
    const starts = [0];
    for (const { index, 0: mark } of text.matchAll(/\r\n|\n|\r/g)) starts.push(index + mark.length);
    this.#starts = starts;
  }

  /** The position of an offset from the start of the text. */
  position(offset: number): Position {
    const within = Math.min(Math.max(0, offset), this.text.length);
    let low = 0;
    let high = this.#starts.length - 1;
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if ((this.#starts[middle] ?? 0) <= within) low = middle;
      else high = middle - 1;
    }
    return { line: low + 1, column: within - (this.#starts[low] ?? 0) + 1 };
  }

  /** The text of a line (from 1), without its end; empty when there is none. */
  lineText(line: number): string {
    const start = this.#starts[line - 1];
    if (start === undefined) return '';
    return this.text.slice(start, this.#starts[line] ?? this.text.length).replace(/[\r\n]+$/, '');
  }
}
