// The number of single-character slips between two words: insert, delete, replace, swap two neighbours (optimal string
// alignment), stopping as soon as a bound is passed. What a replacement costs is the caller's to say.
// Source: optimal string alignment distance (Damerau 1964, restricted to adjacent swaps).

/** What it costs to read `a` as `b`: 0 when they are the same, at most 1. */
export type Replacement = (a: string, b: string) => number;

export const plainReplacement: Replacement = (a, b) => (a === b ? 0 : 1);

/** The distance, or Infinity as soon as it is known to be more than `bound`. */
export function editDistance(from: string, to: string, bound: number, replacement = plainReplacement): number {
  if (Math.abs(from.length - to.length) > bound) return Infinity;
  let beforePrevious: number[] = [];
  let previous = Array.from({ length: to.length + 1 }, (_, column) => column);
  let leastBefore = 0;
  for (let row = 1; row <= from.length; row += 1) {
    const current = [row];
    let least = row;
    for (let column = 1; column <= to.length; column += 1) {
      const a = from[row - 1] ?? '';
      const b = to[column - 1] ?? '';
      let best = Math.min(
        (previous[column] ?? Infinity) + 1,
        (current[column - 1] ?? Infinity) + 1,
        (previous[column - 1] ?? Infinity) + replacement(a, b),
      );
      if (row > 1 && column > 1 && a === to[column - 2] && b === from[row - 2]) {
        best = Math.min(best, (beforePrevious[column - 2] ?? Infinity) + 1);
      }
      current.push(best);
      if (best < least) least = best;
    }
    // A swap reaches back two rows, so one hopeless row is not yet the end.
    if (least > bound && leastBefore > bound) return Infinity;
    leastBefore = least;
    beforePrevious = previous;
    previous = current;
  }
  const distance = previous[to.length] ?? Infinity;
  return distance <= bound ? distance : Infinity;
}
