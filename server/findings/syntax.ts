/**
 * The text does not have the form of the language here: something is missing, something stands where it cannot, a
 * bracket, quote or brace is not closed, brackets nest too deeply, or the file is too large to be read as a whole.
 * The broken line costs that line only; everything else is still read and worked out.
 */
import type { SyntaxFact } from '../scenario/facts.ts';
import type { Rule } from './rule.ts';

export const syntax: Rule<SyntaxFact> = {
  severity: 'error',
  message: (fact) => fact.problem.message,
  fixes: (fact, { place }) => {
    const { fix, span } = fact.problem;
    if (!fix) return [];
    // The problem's spans count from its section's start; the fact's place tells where that section stands in the file.
    const sectionStart = place.start - span.start;
    const at = { path: place.path, start: sectionStart + fix.span.start, end: sectionStart + fix.span.end };
    return [{ title: fix.title, preferred: true, edits: [{ place: at, newText: fix.newText }] }];
  },
};
