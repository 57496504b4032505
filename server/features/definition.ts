// Where the name at a place is given: the definition or value of that name, the definition whose figure is spoken of, or
// the file a `use` reaches. A name given twice has two places. Catalogue substances are given nowhere in the text.
import { resolveUse } from '../scenario/files.ts';
import { placeOf, sectionAt } from '../scenario/place.ts';
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';
import { placesOfName, subjectAt } from './named.ts';

/** The names to go to, in the order of the files; empty where there is nothing to go to. */
export function definition(files: readonly EvaluatedFile[], path: string, offset: number): readonly Place[] {
  const subject = subjectAt(files, path, offset);
  const name = subject?.kind === 'name' ? subject.name : subject?.kind === 'figure' ? subject.of : null;
  if (name === null) return usedFile(files, path, offset);
  return placesOfName(files, name)
    .filter(({ role }) => role === 'definition')
    .map(({ place }) => place);
}

function usedFile(files: readonly EvaluatedFile[], path: string, offset: number): readonly Place[] {
  const tree = files.find((file) => file.path === path)?.tree;
  const placed = tree && (sectionAt(tree, offset) ?? sectionAt(tree, offset - 1));
  const statement = placed?.section.statement;
  if (!placed || statement?.kind !== 'use' || !statement.path) return [];
  const written = placeOf(path, placed, statement.path.span);
  const reached = resolveUse(path, statement.path.value);
  const isAt = written.start <= offset && offset <= written.end;
  return isAt && files.some((file) => file.path === reached) ? [{ path: reached ?? path, start: 0, end: 0 }] : [];
}
