// What the text of a method consists of; the texts themselves are in methods.ts and work-methods.ts. A form, nothing else.

export interface MethodText {
  /** What was done, one sentence. */
  readonly words: string;
  /** The equation in symbols, or null where there is nothing to write down. */
  readonly equation: string | null;
  /** What the symbols mean; empty without an equation. */
  readonly symbols: string;
  /** Where the result is valid; one sentence. */
  readonly validity: string;
}
