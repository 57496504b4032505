// Gives a definition or value another name, everywhere it is given and spoken of in the files at hand. Quotes come and go
// as the new name needs them. Refuses, with a plain sentence, what would change the meaning of the text: names that are
// taken, words of the language, units, and substances of the catalogue. Invariant: what it edits are whole words.
import { isPartial } from '../../grammar/parse.ts';
import { isReservedWord } from '../../grammar/words.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';
import { quoted } from '../wording/words.ts';
import { placesOfName, subjectAt, type PlacedName } from './named.ts';
import { tellPlace } from './tell-place.ts';
import { writtenName } from './written-name.ts';

export interface Refusal {
  readonly refusal: string;
}

/** The word that would be renamed, and the text to start from. */
export interface RenameOffer {
  readonly place: Place;
  readonly name: string;
}

export interface RenameEdit {
  readonly place: Place;
  readonly newText: string;
}

/** Whether there is something to rename at the place. */
export function prepareRename(files: readonly EvaluatedFile[], path: string, offset: number): RenameOffer | Refusal {
  const found = renamed(files, path, offset);
  return 'refusal' in found ? found : { place: found.place, name: found.name };
}

/** The edits that give it the new name. Quotes around `newName` do not belong to it. */
export function rename(
  files: readonly EvaluatedFile[],
  path: string,
  offset: number,
  newName: string,
): readonly RenameEdit[] | Refusal {
  const found = renamed(files, path, offset);
  if ('refusal' in found) return found;
  const name = newName.trim().replace(/^'(.*)'$/, '$1');
  if (name === found.name) return [];
  const fault = faultOf(name, files, path);
  if (fault !== null) return { refusal: fault };
  const newText = writtenName(name);
  return found.places.map(({ place }) => ({ place, newText }));
}

type Renamed = RenameOffer & { readonly places: readonly PlacedName[] };

function renamed(files: readonly EvaluatedFile[], path: string, offset: number): Renamed | Refusal {
  const subject = subjectAt(files, path, offset);
  if (subject?.kind === 'catalogue') {
    return { refusal: 'This is a substance of the catalogue, and those keep their names.' };
  }
  if (subject?.kind !== 'name') return { refusal: 'There is no name of a definition or value here.' };
  const { place, name, role } = subject;
  // Places nobody has read would keep the old name.
  if (files.some(({ tree }) => isPartial(tree))) {
    return { refusal: 'A file is so large that only a part of it is read. Nothing can be renamed safely in it.' };
  }
  const places = placesOfName(files, name);
  if (places.filter((one) => one.role === 'definition').length === 1) return { place, name, places };
  // A name given twice stands for nothing; renaming one of the two is the way out, and touches no other place.
  if (role === 'definition') return { place, name, places: [{ place, name, role }] };
  return { refusal: `${quoted(name)} is given more than once. Rename one of its definitions first.` };
}

function faultOf(name: string, files: readonly EvaluatedFile[], path: string): string | null {
  if (name === '') return 'A name needs at least one character.';
  if (/[\p{Cc}\u2028\u2029']/u.test(name)) return "A name is one line and holds no `'`.";
  if (isReservedWord(name)) return `${quoted(name)} is a word of the language and cannot be a name.`;
  if (isUnitWord(name)) return `${quoted(name)} is a unit and cannot be a name.`;
  const [taken] = placesOfName(files, name).filter(({ role }) => role === 'definition');
  if (taken) {
    const where = tellPlace({ files, wanted: [] }, path)(taken.place);
    return `${quoted(name)} is taken already${where === null ? '' : ` (${where})`}.`;
  }
  const substance = findSubstance(name);
  return substance ? `${quoted(name)} is a substance of the catalogue. Choose another name.` : null;
}
