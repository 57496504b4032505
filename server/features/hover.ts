// What is shown where a person points: finds what stands at the offset and hands it to the file that tells about it. The
// innermost meaning wins; a portion's or an equation's line answers for whatever in it has no meaning of its own. What is
// wrong is never said here: the editor shows the findings above the hover. Works nothing out.
// Invariant: the answer is a pure function of the scenario and the offset.
import type { Line } from '../../grammar/tree.ts';
import { meaningsAt } from '../scenario/meanings.ts';
import { placeOf } from '../scenario/place.ts';
import type {
  EvaluatedDefinition,
  EvaluatedFile,
  EvaluatedScenario,
  LineResult,
  Place,
  PlacedMeaning,
} from '../scenario/scenario.ts';
import { hoverCard } from './hover-card.ts';
import { hoverDefinition } from './hover-definition.ts';
import { hoverEntry, hoverKind } from './hover-entry.ts';
import { hoverEquation } from './hover-equation.ts';
import { hoverExpectation } from './hover-expectation.ts';
import { hoverFigure } from './hover-figure.ts';
import { hoverPortion } from './hover-portion.ts';
import { hoverQuantity, hoverValue, quantityOfLiteral } from './hover-quantity.ts';
import type { HoverText } from './hover-text.ts';
import { hoverUnit } from './hover-unit.ts';
import { literalAt } from './literal-at.ts';
import { tellPlace } from './tell-place.ts';

/** What to show at an offset of one file of the scenario; null where there is nothing to tell. */
export function hover(scenario: EvaluatedScenario, path: string, offset: number): HoverText | null {
  const file = scenario.files.find((one) => one.path === path);
  if (!file) return null;
  const meaning = meaningAt(file, offset);
  const line = lineAt(file, offset);
  // In a portion the share is the answer, whether a person points at the amount or at the substance.
  if (line?.result?.kind === 'portion') return hoverPortion(line.place, line.definition, line.result);
  const literal = literalAt(file, offset);
  // The evaluation knows more of a number than stands there (`K` as a temperature), but only where it reads it.
  const written = literal?.quantity ? quantityOfLiteral(literal.quantity.node) : null;
  if (literal?.unit) {
    const known = meaning?.meaning.kind === 'quantity' ? meaning.meaning : written;
    return hoverUnit(literal.unit.place, literal.unit.word, known);
  }
  if (meaning) return hoverMeaning(meaning, scenario, file);
  if (literal?.quantity && written) return hoverQuantity(literal.quantity.place, written);
  if (line?.line.kind === 'equation') return hoverEquation(line.place, line.definition, line.result);
  const definition = file.definitions.find(({ header }) => holds(header, offset));
  if (definition) return hoverHeader(file, definition, offset);
  const expectation = file.expectations.find(({ place }) => holds(place, offset));
  return expectation ? hoverExpectation(expectation.place, expectation) : null;
}

function hoverMeaning(
  { place, meaning }: PlacedMeaning,
  scenario: EvaluatedScenario,
  file: EvaluatedFile,
): HoverText | null {
  switch (meaning.kind) {
    case 'definition':
      return hoverDefinition(place, meaning.definition);
    case 'value':
      return hoverValue(place, meaning.value, fileOf(scenario, meaning.value.place));
    case 'catalogue':
      return hoverCard(place, meaning.card);
    case 'figure':
      return hoverFigure(place, meaning.of, meaning.figure, tellPlace(scenario, file.path));
    case 'quantity':
      return hoverQuantity(place, meaning);
    case 'entry':
      return hoverEntry(place, meaning.definitionKind, meaning.entry);
  }
}

const fileOf = (scenario: EvaluatedScenario, { path }: Place): EvaluatedFile | undefined =>
  scenario.files.find((file) => file.path === path);

/** The kind's word tells about the kind, the rest of the header about the definition. */
function hoverHeader(file: EvaluatedFile, definition: EvaluatedDefinition, offset: number): HoverText | null {
  const { statement } = definition.section.section;
  const word = statement.kind === 'definition' ? placeOf(file.path, definition.section, statement.keyword.span) : null;
  return word && holds(word, offset)
    ? hoverKind(word, definition.kind)
    : hoverDefinition(definition.header, definition);
}

/** The shortest meaning that holds the offset; one that ends there counts only where none begins or goes on. */
function meaningAt(file: EvaluatedFile, offset: number): PlacedMeaning | null {
  const touching = meaningsAt(file, offset);
  const inside = touching.filter(({ place }) => holds(place, offset));
  return (inside.length > 0 ? inside : touching).reduce<PlacedMeaning | null>(
    (best, one) => (best === null || lengthOf(one.place) < lengthOf(best.place) ? one : best),
    null,
  );
}

interface LineAt {
  readonly definition: EvaluatedDefinition;
  readonly line: Line;
  readonly place: Place;
  readonly result: LineResult | undefined;
}

function lineAt(file: EvaluatedFile, offset: number): LineAt | null {
  const definition = file.definitions.find(({ place }) => place.start <= offset && offset <= place.end);
  const statement = definition?.section.section.statement;
  if (!definition || statement?.kind !== 'definition') return null;
  for (const [index, line] of statement.lines.entries()) {
    const place = placeOf(file.path, definition.section, line.span);
    if (place.start > offset || offset > place.end) continue;
    return { definition, line, place, result: definition.lines.find((one) => one.line === index) };
  }
  return null;
}

function holds(place: Place, offset: number): boolean {
  return place.start <= offset && offset < place.end;
}

function lengthOf(place: Place): number {
  return place.end - place.start;
}
