// Finds the words nearest to a mistyped one, by a bounded edit distance in which look-alike characters cost little.
// Knows nothing of what the words mean. Invariant: a suggestion costs at most `largestDistance` edits, never the word itself.
// Source of the distance: optimal string alignment (Damerau 1964), with weights of our own for look-alikes and case.

/** Up to `most` of `words`, nearest to `word` first; words of equal distance keep the shorter first, then the alphabet. */
export function nearestWords(word: string, words: readonly string[], most: number): readonly string[] {
  const typed = word.trim().replace(/\s+/g, '_');
  const bound = largestDistance(typed.length);
  return words
    .filter((candidate) => candidate !== typed && Math.abs(candidate.length - typed.length) <= bound)
    .map((candidate) => ({ candidate, distance: distanceBetween(typed, candidate) }))
    .filter(({ distance }) => distance <= bound)
    .sort(
      (a, b) =>
        a.distance - b.distance || a.candidate.length - b.candidate.length || (a.candidate < b.candidate ? -1 : 1),
    )
    .slice(0, most)
    .map(({ candidate }) => candidate);
}

/** One slip in a short word, two in a longer one, three in a long one. */
function largestDistance(length: number): number {
  return length <= 3 ? 1 : length <= 7 ? 2 : 3;
}

const lookAlikes: readonly string[] = ['0Oo', '1lIi', '5Ss', '8B', '2Zz'];

function substitutionCost(a: string, b: string): number {
  if (a === b) return 0;
  if (lookAlikes.some((group) => group.includes(a) && group.includes(b))) return 0.2;
  return a.toLowerCase() === b.toLowerCase() ? 0.4 : 1;
}

/** Optimal string alignment distance: insertions, deletions, substitutions and swaps of neighbours. */
function distanceBetween(from: string, to: string): number {
  let beforePrevious: number[] = [];
  let previous = Array.from({ length: to.length + 1 }, (_, column) => column);
  for (let row = 1; row <= from.length; row += 1) {
    const current = [row];
    for (let column = 1; column <= to.length; column += 1) {
      const a = from[row - 1] ?? '';
      const b = to[column - 1] ?? '';
      let best = Math.min(
        (previous[column] ?? Infinity) + 1,
        (current[column - 1] ?? Infinity) + 1,
        (previous[column - 1] ?? Infinity) + substitutionCost(a, b),
      );
      if (row > 1 && column > 1 && a === to[column - 2] && b === from[row - 2]) {
        best = Math.min(best, (beforePrevious[column - 2] ?? Infinity) + 1);
      }
      current.push(best);
    }
    beforePrevious = previous;
    previous = current;
  }
  return previous[to.length] ?? Infinity;
}
