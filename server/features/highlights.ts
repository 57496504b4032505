// The other places in one file that speak of what stands at the cursor. The place that gives a name is told apart from
// those that use it. Shows what references.ts finds, of one file. Works nothing out.
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';
import { placesOfMeaning, placesOfName, subjectAt } from './named.ts';

export interface Highlight {
  readonly place: Place;
  readonly role: 'definition' | 'use';
}

export function highlights(files: readonly EvaluatedFile[], path: string, offset: number): readonly Highlight[] {
  const subject = subjectAt(files, path, offset);
  const here = files.filter((file) => file.path === path);
  if (!subject) return [];
  return subject.kind === 'name'
    ? placesOfName(here, subject.name).map(({ place, role }) => ({ place, role }))
    : placesOfMeaning(here, subject).map((place) => ({ place, role: 'use' }));
}
