// Everywhere the thing at a place is spoken of, in all files at hand: a name of the scenario, a catalogue substance under
// whatever word, or one figure of one definition. Works nothing out. Invariant: each place once.
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';
import { placesOfMeaning, placesOfName, subjectAt } from './named.ts';

/** The places; with `withDefinition` also those where the name is given. Empty where nothing has a name. */
export function references(
  files: readonly EvaluatedFile[],
  path: string,
  offset: number,
  withDefinition: boolean,
): readonly Place[] {
  const subject = subjectAt(files, path, offset);
  if (!subject) return [];
  if (subject.kind !== 'name') return placesOfMeaning(files, subject);
  return placesOfName(files, subject.name)
    .filter(({ role }) => withDefinition || role === 'use')
    .map(({ place }) => place);
}
