// Entries of typed arrays at indices that are known to be there: the compiler cannot know, and the inner loops must not ask.
// Knows nothing else. Invariant: reads what stands at the index and does nothing; two functions, because a call that always sees
// one kind of array is compiled into a plain load.

export function at(values: Float64Array, index: number): number {
  return values[index] as number;
}

export function at32(values: Int32Array, index: number): number {
  return values[index] as number;
}
