// What the name at a place stands for, and everywhere it is given or spoken of in the files at hand. A name of the scenario
// is found by the syntax tree, in definitions too that are not evaluated yet; catalogue substances and figures by what
// the evaluation found. Invariant: places are those of whole words, quotes included, each once, in the order of the files.
import { meaningsAt } from '../scenario/meanings.ts';
import { placeOf, sectionAt } from '../scenario/place.ts';
import type { EvaluatedFile, EvaluatedScenario, Meaning, Place } from '../scenario/scenario.ts';
import { namesInSection, type NameUse } from './names-in-section.ts';

/** A name somewhere in the files. */
export interface PlacedName {
  readonly place: Place;
  readonly name: string;
  readonly role: NameUse['role'];
}

export type Subject =
  | { readonly kind: 'name'; readonly place: Place; readonly name: string; readonly role: NameUse['role'] }
  | { readonly kind: 'catalogue'; readonly place: Place; readonly substance: string }
  | { readonly kind: 'figure'; readonly place: Place; readonly of: string; readonly id: string };

/**
 * The files of several scenarios, each once. A file that is used elsewhere does not reach its users: what speaks of its
 * names is found only where their scenarios are handed in too.
 */
export function filesOf(scenarios: readonly EvaluatedScenario[]): readonly EvaluatedFile[] {
  return [...new Map(scenarios.flatMap(({ files }) => files.map((file) => [file.path, file] as const))).values()];
}

/** What stands at an offset of one of the files, or ends there; null where nothing has a name. */
export function subjectAt(files: readonly EvaluatedFile[], path: string, offset: number): Subject | null {
  const file = files.find((one) => one.path === path);
  if (!file) return null;
  const name = nameAt(file, offset);
  if (name && placesOfName(files, name.name).some(({ role }) => role === 'definition'))
    return { kind: 'name', ...name };
  for (const { place, meaning } of meaningsAt(file, offset)) {
    if (meaning.kind === 'catalogue') return { kind: 'catalogue', place, substance: substanceOf(meaning) };
    if (meaning.kind === 'figure') return { kind: 'figure', place, of: meaning.of, id: meaning.figure.id };
  }
  return null;
}

/** Where a name is given and spoken of. */
export function placesOfName(files: readonly EvaluatedFile[], name: string): readonly PlacedName[] {
  return files.flatMap((file) =>
    file.tree.sections.flatMap((placed) =>
      namesInSection(placed.section)
        .filter((use) => use.name === name)
        .map(({ span, role }) => ({ place: placeOf(file.path, placed, span), name, role })),
    ),
  );
}

/** Where a catalogue substance or a figure is spoken of, as far as the evaluation has met it. */
export function placesOfMeaning(
  files: readonly EvaluatedFile[],
  subject: Exclude<Subject, { kind: 'name' }>,
): readonly Place[] {
  const found = files.flatMap(({ meanings }) =>
    meanings.filter(({ meaning }) => isOf(meaning, subject)).map(({ place }) => place),
  );
  return [...new Map(found.map((place) => [`${place.path} ${place.start}`, place])).values()];
}

function isOf(meaning: Meaning, subject: Exclude<Subject, { kind: 'name' }>): boolean {
  return subject.kind === 'catalogue'
    ? meaning.kind === 'catalogue' && substanceOf(meaning) === subject.substance
    : meaning.kind === 'figure' && meaning.of === subject.of && meaning.figure.id === subject.id;
}

/** Two phases of one substance are two things. */
function substanceOf({ card }: Extract<Meaning, { kind: 'catalogue' }>): string {
  return `${card.name} ${card.phase ?? ''}`;
}

function nameAt(file: EvaluatedFile, offset: number): PlacedName | null {
  // A name at the end of its section ends where the section does.
  for (const placed of [sectionAt(file.tree, offset), sectionAt(file.tree, offset - 1)]) {
    if (!placed) continue;
    const at = offset - placed.start;
    const uses = namesInSection(placed.section);
    const use = uses.find(({ span }) => span.start <= at && at < span.end) ?? uses.find(({ span }) => span.end === at);
    if (use) return { place: placeOf(file.path, placed, use.span), name: use.name, role: use.role };
  }
  return null;
}
