// Checks the promises of recovery for one edit of a text: at most two syntax problems, and every section that neither
// contains nor touches the edited stretch is unchanged. The only place of the tests that compares trees of two texts.
import { isDeepStrictEqual } from 'node:util';
import { parse, problemsOf } from '../../grammar/parse.ts';
import { endOf, lex } from '../../grammar/tokens.ts';
import type { SyntaxTree } from '../../grammar/tree.ts';
import type { IsUnit } from '../../grammar/unit-run.ts';

export interface Edit {
  /** The stretch that is replaced, as offsets in the original. */
  readonly start: number;
  readonly end: number;
  readonly newText: string;
}

/**
 * What one edit breaks, in words; empty when all promises are kept. With `reuse` the edited text is parsed as the editor
 * does it, from the tree before: much faster, and unchanged sections are then the very same objects.
 */
export function brokenPromises(original: SyntaxTree, edit: Edit, isUnit: IsUnit, reuse = false): string[] {
  const text = original.text.slice(0, edit.start) + edit.newText + original.text.slice(edit.end);
  const edited = parse(text, isUnit, reuse ? { previous: original } : {});
  const shift = edit.newText.length - (edit.end - edit.start);
  const broken: string[] = [];
  const problems = problemsOf(edited);
  const where = `${JSON.stringify(original.text.slice(edit.start, edit.end))} -> ${JSON.stringify(edit.newText)} at ${edit.start}`;
  if (problems.length > 2)
    broken.push(`${where}: ${problems.length} problems: ${problems.map((problem) => problem.message).join(' | ')}`);
  const sectionsByStart = new Map(edited.sections.map((placed) => [placed.start, placed]));
  for (const placed of original.sections) {
    if (placed.start <= edit.end && placed.end >= edit.start) continue;
    // A statement ends with its line, so an edit behind it on that line touches it all the same.
    const between = original.text.slice(placed.end, edit.start);
    if (placed.section.statement.kind !== 'definition' && !/[\r\n]/.test(between) && placed.end <= edit.start) continue;
    const moved = placed.start > edit.end ? placed.start + shift : placed.start;
    const found = sectionsByStart.get(moved);
    const isSame = found?.section === placed.section || isDeepStrictEqual(found?.section, placed.section);
    if (!isSame) {
      broken.push(`${where}: changed the section ${JSON.stringify(placed.section.text.slice(0, 30))}`);
    }
  }
  return broken;
}

/** The stretch of every token of a text, comments and newlines among them, in order. */
export function tokenStretches(
  text: string,
): { readonly start: number; readonly end: number; readonly image: string }[] {
  const { tokens, comments } = lex(text);
  return [...tokens, ...comments]
    .map((token) => ({ start: token.startOffset, end: endOf(token), image: token.image }))
    .sort((first, second) => first.start - second.start);
}
