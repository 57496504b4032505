// What the words of a file mean, section by section: a hover asks about one place, and most sections are never asked about.
// The evaluated file itself is plain data, with the meanings of all its sections in one list; this is the way to a few of
// them that leaves the others unmade. Knows no features. Invariant: those at an offset are those of the file's list there.

import type { PlacedSection } from '../../grammar/tree.ts';
import { sectionAt } from './place.ts';
import type { EvaluatedFile, PlacedMeaning } from './scenario.ts';

export type MeaningsOf = (section: PlacedSection) => readonly PlacedMeaning[];

const meaningsOfFile = new WeakMap<EvaluatedFile, MeaningsOf>();

/** Says where the meanings of a file's sections are had from. Returns the file. */
export function withMeanings(file: EvaluatedFile, meaningsOf: MeaningsOf): EvaluatedFile {
  meaningsOfFile.set(file, meaningsOf);
  return file;
}

/** The meanings whose place holds the offset or ends there, in the order of the text. */
export function meaningsAt(file: EvaluatedFile, offset: number): readonly PlacedMeaning[] {
  const meaningsOf = meaningsOfFile.get(file);
  // The offset behind a place at the end of its section may be where another section begins.
  const sections = new Set([sectionAt(file.tree, offset - 1), sectionAt(file.tree, offset)]);
  const meanings = meaningsOf
    ? [...sections].flatMap((section) => (section ? meaningsOf(section) : []))
    : file.meanings;
  return meanings.filter(({ place }) => place.start <= offset && offset <= place.end);
}
