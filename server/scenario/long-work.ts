// Work that takes longer than a key may wait, as a statement asks for it. On the command line it is done on the spot; in
// the server by whoever the evaluation was handed, and the statement is answered for now without it, and again once it is
// there. Knows no thread. Invariant: what comes of it follows from its input alone, so that the answers are the same.

/** A function of core from plain data to plain data. Null only where it was told to stop; an exception is our bug. */
export type LongWork<Input, Output> = (input: Input, shouldStop: () => boolean) => Output | null;

/** Asks for what `work` gives for `input`, of which `key` says all; null where it is not there yet. */
export type AskLongWork = <Input, Output>(work: LongWork<Input, Output>, key: string, input: Input) => Output | null;

/** Whoever does long work while the evaluation goes on. */
export interface WorkElsewhere {
  /**
   * What is there of the work's outcome. `key` says all of `input`: equal keys, equal inputs. Throws where the work failed.
   */
  ask<Input, Output>(work: LongWork<Input, Output>, key: string, input: Input): AskedWork<Output>;
  /** The key of an outcome that is kept, which is used from now on; null for one that is not. */
  keyNow(id: string): number | string | null;
  /** Whether asking again would give an outcome, or throw. */
  isDone(id: string): boolean;
}

interface AskedWork<Output> {
  /** Names the question; begins with a newline, as no name does, and is longer than that. */
  readonly id: string;
  /** undefined while the work is to be done. */
  readonly kept: { readonly key: number | string; readonly value: Output } | undefined;
}

/** Does the work on the spot. */
export function onTheSpot<Input, Output>(work: LongWork<Input, Output>, input: Input): Output {
  const output = work(input, () => false);
  if (output === null) throw new Error('long work gave up although nobody told it to stop');
  return output;
}
