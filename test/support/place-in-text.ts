// Finds where words stand in a text, as an editor counts: lines and columns from 1, columns in UTF-16 units.
// Invariant: words that are not there, or twice, are a mistake of the test and throw.

/** The line and column at which the words start. */
export function placeInText(text: string, words: string): { line: number; column: number } {
  const offset = text.indexOf(words);
  if (offset < 0) throw new Error(`"${words}" is not in the text`);
  if (text.includes(words, offset + 1)) throw new Error(`"${words}" is in the text more than once`);
  const before = text.slice(0, offset).split('\n');
  return { line: before.length, column: (before.at(-1) ?? '').length + 1 };
}
