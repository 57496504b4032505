// Finds the words nearest to a mistyped one, by a bounded edit distance in which look-alike characters cost little.
// Knows nothing of what the words mean. Invariant: a suggestion costs at most `largestDistance` edits, never the word itself.

import { editDistance } from './edit-distance.ts';

/** Up to `most` of `words`, nearest to `word` first; words of equal distance keep the shorter first, then the alphabet. */
export function nearestWords(word: string, words: readonly string[], most: number): readonly string[] {
  const typed = word.trim().replace(/\s+/g, '_');
  const bound = largestDistance(typed.length);
  return words
    .filter((candidate) => candidate !== typed)
    .map((candidate) => ({ candidate, distance: editDistance(typed, candidate, bound, substitutionCost) }))
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

const groupOfLookAlike: ReadonlyMap<string, number> = new Map(
  ['0Oo', '1lIi', '5Ss', '8B', '2Zz'].flatMap((group, index) =>
    Array.from(group, (letter) => [letter, index] as const),
  ),
);

function substitutionCost(a: string, b: string): number {
  const group = groupOfLookAlike.get(a);
  if (group !== undefined && group === groupOfLookAlike.get(b)) return 0.2;
  return a.toLowerCase() === b.toLowerCase() ? 0.4 : 1;
}
