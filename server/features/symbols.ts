// The outline of a file: its title, definitions, values and expectations in the order of the text, each with the one
// number a person looks for first. Shows what the evaluation found and works nothing out. Invariants: a symbol's name is
// never empty (an unnamed definition shows its kind), and its name's place lies inside its whole place.
import { placeOf } from '../scenario/place.ts';
import type { EvaluatedFile, EvaluatedScenario, Place } from '../scenario/scenario.ts';
import { figureText, quantityText } from '../wording/quantities.ts';
import { shortened } from './hover-text.ts';
import { leadingFigures } from './leading-figures.ts';

export interface OutlineSymbol {
  readonly role: 'title' | 'definition' | 'value' | 'expectation';
  readonly name: string;
  /** Kind and first figure of a definition, the number of a value, whether an expectation holds. */
  readonly detail: string;
  readonly place: Place;
  readonly namePlace: Place;
}

/** The outline of one file of the scenario; empty when the scenario has no such file. */
export function symbols(scenario: EvaluatedScenario, path: string): OutlineSymbol[] {
  const file = scenario.files.find((one) => one.path === path);
  if (!file) return [];
  return [...titles(file), ...definitions(file), ...values(file), ...expectations(file)].sort(
    (left, right) => left.place.start - right.place.start,
  );
}

function titles(file: EvaluatedFile): OutlineSymbol[] {
  return file.tree.sections.flatMap((placed) => {
    const { statement } = placed.section;
    if (statement.kind !== 'title' || !statement.title || statement.title.value.trim() === '') return [];
    const place = placeOf(file.path, placed, statement.span);
    const namePlace = placeOf(file.path, placed, statement.title.span);
    return [{ role: 'title', name: shortened(statement.title.value), detail: 'scenario', place, namePlace }] as const;
  });
}

function definitions(file: EvaluatedFile): OutlineSymbol[] {
  return file.definitions.map((definition) => {
    const [first] = leadingFigures(definition);
    return {
      role: 'definition',
      name: shortened(definition.name) || definition.kind || '(unnamed)',
      detail: first ? `${definition.kind}, ${figureText(first)}` : definition.kind,
      place: definition.place,
      namePlace: inside(definition.namePlace, definition.place),
    };
  });
}

function values(file: EvaluatedFile): OutlineSymbol[] {
  return file.values.map((value) => ({
    role: 'value',
    name: shortened(value.name) || '(unnamed)',
    detail: value.quantity ? quantityText(value.quantity) : '',
    place: value.place,
    namePlace: inside(value.namePlace, value.place),
  }));
}

function expectations(file: EvaluatedFile): OutlineSymbol[] {
  return file.expectations.map(({ place, holds }) => ({
    role: 'expectation',
    name: shortened(file.tree.text.slice(place.start, place.end)) || 'expect',
    detail: holds === null ? 'not known' : holds ? 'holds' : 'fails',
    place,
    namePlace: place,
  }));
}

function inside(inner: Place, outer: Place): Place {
  return outer.start <= inner.start && inner.end <= outer.end ? inner : { ...outer, end: outer.start };
}
