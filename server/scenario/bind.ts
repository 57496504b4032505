// The names of a scenario: which statement each stands for, over all files reached. Says what is wrong with a name itself:
// given twice, reserved, spelt like a unit, or like a catalogue substance. Works nothing out.
// Invariant: a name given twice stands for nothing, so that no answer depends on which of the two comes first.

import type { Definition, LetStatement, PlacedSection, Word } from '../../grammar/tree.ts';
import { isReservedWord } from '../../grammar/words.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import type { Fact } from './facts.ts';
import type { LoadedFile } from './files.ts';
import { placeOf } from './place.ts';

/** A named statement and where it stands. */
export interface Binding {
  readonly name: string;
  readonly word: Word;
  readonly file: LoadedFile;
  readonly placed: PlacedSection;
  readonly statement: Definition | LetStatement;
}

export interface Bindings {
  /** Every name that stands for exactly one statement. */
  readonly unique: ReadonlyMap<string, Binding>;
  /** Names given more than once: they stand for nothing. */
  readonly ambiguous: ReadonlySet<string>;
  /** All named statements in file order, those of ambiguous names too. */
  readonly all: readonly Binding[];
}

/** Binds the names of all files; facts about names go to the file they stand in. */
export function bindNames(files: readonly LoadedFile[]): Bindings {
  const all: Binding[] = [];
  for (const file of files) {
    for (const placed of file.tree.sections) {
      const binding = bindingOf(file, placed);
      if (binding) all.push(binding);
    }
  }
  const byName = new Map<string, Binding[]>();
  for (const binding of all) {
    const others = byName.get(binding.name);
    if (others) others.push(binding);
    else byName.set(binding.name, [binding]);
  }
  const unique = new Map<string, Binding>();
  const ambiguous = new Set<string>();
  for (const [name, bindings] of byName) {
    const [only, second] = bindings;
    if (only && !second) unique.set(name, only);
    else ambiguous.add(name);
    const told = toldOf(bindings);
    for (const binding of bindings) reportName(binding, told);
  }
  return { unique, ambiguous, all };
}

function bindingOf(file: LoadedFile, placed: PlacedSection): Binding | undefined {
  const { statement } = placed.section;
  if (statement.kind !== 'definition' && statement.kind !== 'let') return undefined;
  return statement.name && { name: statement.name.text, word: statement.name, file, placed, statement };
}

/** Others of its name that a binding's finding tells of: a few, or a line pasted 100,000 times would tell 10^10. */
const mostTold = 5;

/** The first bindings of one name, and the first in another file than theirs. */
function toldOf(sameName: readonly Binding[]): readonly Binding[] {
  const told = sameName.slice(0, mostTold);
  const elsewhere = sameName.find(({ file }) => file !== sameName[0]?.file);
  return elsewhere && !told.includes(elsewhere) ? [...told, elsewhere] : told;
}

function reportName(binding: Binding, sameName: readonly Binding[]): void {
  const { name, word, file, placed } = binding;
  const say = (fact: Fact): void => {
    file.facts.push({ fact, place: placeOf(file.path, placed, word.span) });
  };
  if (sameName.length > 1) {
    const others = sameName.filter((other) => other !== binding);
    say({
      code: 'name/duplicate',
      name,
      others: others.map((other) => placeOf(other.file.path, other.placed, other.word.span)),
    });
    return;
  }
  const fact = factOfName(binding.statement, word);
  if (fact) say(fact);
}

/** What is wrong with a name by itself; found once for each statement of a file that is edited. */
function factOfName(statement: Definition | LetStatement, word: Word): Fact | null {
  const known = factOfNames.get(statement);
  if (known !== undefined) return known;
  const fact = findFactOfName(statement, word);
  factOfNames.set(statement, fact);
  return fact;
}

const factOfNames = new WeakMap<Definition | LetStatement, Fact | null>();

function findFactOfName(statement: Definition | LetStatement, { text: name, form }: Word): Fact | null {
  if (form !== 'quoted' && isReservedWord(name)) return { code: 'name/reserved', name, why: 'reserved-word' };
  if (form !== 'quoted' && isUnitWord(name)) return { code: 'name/reserved', name, why: 'unit' };
  const substance = statement.kind === 'definition' ? findSubstance(name) : undefined;
  return substance ? { code: 'name/like-catalogue', name, substance: substance.name } : null;
}
