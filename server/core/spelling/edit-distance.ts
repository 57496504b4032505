// The number of single-character slips between two words: insert, delete, replace, swap two neighbours (optimal string
// alignment), stopping as soon as a bound is passed. What a replacement costs is the caller's to say.
// Source: optimal string alignment distance (Damerau 1964, restricted to adjacent swaps).

/** What it costs to read `a` as `b`, another character: at most 1. */
export type Replacement = (a: string, b: string) => number;

const plainReplacement: Replacement = () => 1;

/** The distance, or Infinity as soon as it is known to be more than `bound`. */
export function editDistance(
  from: string,
  to: string,
  bound: number,
  replacement: Replacement = plainReplacement,
): number {
  if (Math.abs(from.length - to.length) > bound) return Infinity;
  // An insertion or deletion costs one, so cells further than this from the diagonal are above the bound.
  const reach = Math.floor(bound);
  let beforePrevious: number[] = [];
  let previous = Array.from({ length: to.length + 1 }, (_, column) => (column <= reach ? column : Infinity));
  let current = new Array<number>(to.length + 1).fill(Infinity);
  let leastBefore = 0;
  for (let row = 1; row <= from.length; row += 1) {
    const a = from[row - 1] ?? '';
    const first = Math.max(1, row - reach);
    const last = Math.min(to.length, row + reach);
    current[first - 1] = first === 1 ? row : Infinity;
    let least = current[first - 1] ?? Infinity;
    for (let column = first; column <= last; column += 1) {
      const b = to[column - 1] ?? '';
      let best = (previous[column - 1] ?? Infinity) + (a === b ? 0 : replacement(a, b));
      best = Math.min(best, (previous[column] ?? Infinity) + 1, (current[column - 1] ?? Infinity) + 1);
      if (row > 1 && column > 1 && a === to[column - 2] && b === from[row - 2]) {
        best = Math.min(best, (beforePrevious[column - 2] ?? Infinity) + 1);
      }
      current[column] = best;
      if (best < least) least = best;
    }
    if (last < to.length) current[last + 1] = Infinity;
    // A swap reaches back two rows, so one hopeless row is not yet the end.
    if (least > bound && leastBefore > bound) return Infinity;
    leastBefore = least;
    [beforePrevious, previous, current] = [previous, current, beforePrevious];
  }
  const distance = previous[to.length] ?? Infinity;
  return distance <= bound ? distance : Infinity;
}
