// `catalogue`: the substances that are known, one a line; with a word, everything known of those it fits, each number with
// its source. Knows no scenario. Invariant: a word that fits nothing is answered with near ones and exit code 1.

import { allSubstances, findSubstance, phasesOfSubstance, suggestSubstances } from '../core/substance/catalogue.ts';
import { searchSubstances } from '../core/substance/search.ts';
import type { Substance } from '../core/substance/substance.ts';
import { catalogueCards, catalogueList } from '../report/catalogue.ts';
import { materialOfSubstance } from '../scenario/materials.ts';
import { didYouMean, quoted, sentences } from '../wording/words.ts';
import { ExitCode } from './exit-codes.ts';
import type { Io } from './io.ts';

/** Prints the catalogue, or the substances that `word` fits, and says how to exit. */
export function listCatalogue(word: string | undefined, io: Io): ExitCode {
  if (word === undefined) {
    io.out(catalogueList(allSubstances().map((substance) => materialOfSubstance(substance).card)));
    return ExitCode.Good;
  }
  const found = substancesFor(word);
  if (found.length === 0) {
    io.problem(
      `${sentences(`stokehold: the catalogue has nothing for ${quoted(word)}.`, didYouMean(suggestSubstances(word)))}\n`,
    );
    return ExitCode.Findings;
  }
  io.out(catalogueCards(found.map((substance) => materialOfSubstance(substance).card)));
  return ExitCode.Good;
}

/** The substance the word names, in the phase it is written with or else in all; else all that a search finds. */
function substancesFor(word: string): readonly Substance[] {
  const exact = findSubstance(word);
  if (exact) return word.trimEnd().endsWith(`(${exact.phase})`) ? [exact] : phasesOfSubstance(exact.name);
  return searchSubstances(word);
}
