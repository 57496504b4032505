// Builds evaluated scenarios by hand, so that views can be tested without the evaluation. Every part has a plain default;
// a test names what it is about and nothing else. Invariant: what is built has the shape that the evaluation promises.

import { parse } from '../../grammar/parse.ts';
import { isUnitWord, readUnitText, toSi } from '../../server/core/quantity/read-unit.ts';
import type { Quantity, QuantityKind } from '../../server/core/quantity/quantity.ts';
import type { Fact } from '../../server/scenario/facts.ts';
import type {
  EvaluatedDefinition,
  EvaluatedFile,
  EvaluatedScenario,
  Figure,
  Place,
  Table,
} from '../../server/scenario/scenario.ts';

/** A quantity of `value` in `unit`; `uncertainty` in the same unit, of one input. */
export function quantity(value: number, unit: string, uncertainty = 0, kind: QuantityKind = 'plain'): Quantity {
  const reading = readUnitText(unit);
  if (!reading.ok) throw new Error(`${unit} is no unit`);
  const step = toSi(uncertainty, reading.unit) - toSi(0, reading.unit);
  return {
    value: toSi(value, reading.unit),
    dimension: reading.unit.dimension,
    kind,
    parts: uncertainty === 0 ? new Map() : new Map([['test/input/0', step]]),
  };
}

/** A figure of `value` in its contract unit. */
export function figure(
  id: string,
  value: number,
  unit: string,
  more: Partial<Figure> & { uncertainty?: number } = {},
): Figure {
  const { uncertainty = 0, ...rest } = more;
  return {
    id,
    label: id.replaceAll('-', ' '),
    quantity: quantity(value, unit, uncertainty, unit === 'K' ? 'temperature' : 'plain'),
    unit,
    working: { method: 'as-given', inputs: [], sources: [], assumptions: [] },
    ...rest,
  };
}

/** The place of the first occurrence of `words` in a file's text. */
export function placeIn(path: string, text: string, words: string): Place {
  const start = text.indexOf(words);
  if (start < 0) throw new Error(`"${words}" is not in the text`);
  return { path, start, end: start + words.length };
}

/** A file; facts are placed at the first occurrence of their words. */
export function file(
  text: string,
  more: Partial<Omit<EvaluatedFile, 'facts' | 'tree'>> & { facts?: readonly (readonly [string, Fact])[] } = {},
): EvaluatedFile {
  const { facts = [], path = 'trial.stoke', ...rest } = more;
  return {
    path,
    used: false,
    tree: parse(text, isUnitWord),
    title: null,
    definitions: [],
    values: [],
    expectations: [],
    facts: facts.map(([words, fact]) => ({ fact, place: placeIn(path, text, words) })),
    meanings: [],
    ...rest,
  };
}

/** A definition whose header stands in the text as `kind name {`. */
export function definition(
  text: string,
  kind: string,
  name: string,
  figures: readonly Figure[],
  tables: readonly Table[] = [],
): EvaluatedDefinition {
  const path = 'trial.stoke';
  const header = placeIn(path, text, `${kind} ${name}`);
  const section = parse(text, isUnitWord).sections.find(
    ({ start, end }) => start <= header.start && header.start < end,
  );
  if (!section) throw new Error(`${kind} ${name} is no section of the text`);
  return {
    kind,
    name,
    doc: section.section.doc,
    place: { path, start: section.start, end: section.end },
    header,
    namePlace: { path, start: header.end - name.length, end: header.end },
    section,
    figures,
    tables,
    absent: new Map(),
    lines: [],
  };
}

/** A scenario of these files, the first of them named. */
export function scenario(...files: readonly EvaluatedFile[]): EvaluatedScenario {
  return { files, wanted: [] };
}
