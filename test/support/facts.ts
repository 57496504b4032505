// Checks what the evaluation says of a scenario, on fixtures in which a comment line with carets marks the text above it:
//
//   let power = 3 kg
//   #           ^^^^ unit/mismatch
//
// Every fact must be marked and every mark must be met, so each fixture also guards against false alarms. Hazards are looked
// at in fixtures that speak of one (`hazard/`): whether the rules tell too much or too little is core/hazard's own table.
import { expect } from 'vitest';
import { inUnit, uncertaintyInUnit } from '../../server/core/quantity/convert.ts';
import { evaluate } from '../../server/scenario/evaluate.ts';
import type { EvaluatedDefinition, EvaluatedScenario, Figure, Table } from '../../server/scenario/scenario.ts';
import { readFixture } from './fixture.ts';

export function evaluateText(marked: string): EvaluatedScenario {
  const { file, files } = readFixture(marked);
  return evaluate(file, (path) => {
    const text = files.get(path);
    return text === undefined ? { fault: 'missing' } : { text };
  });
}

/** Checks that the facts of all files are those marked, code and place. Returns the scenario. */
export function checkFacts(marked: string): EvaluatedScenario {
  const { files } = readFixture(marked);
  const scenario = evaluateText(marked);
  for (const file of scenario.files) {
    const text = files.get(file.path) ?? '';
    const told = text.includes('hazard/')
      ? file.facts
      : file.facts.filter(({ fact }) => !fact.code.startsWith('hazard/'));
    const found = told.map(({ fact, place }) => described(text, place.start, place.end, fact.code));
    expect(found.sort()).toEqual(marksIn(text).sort());
  }
  return scenario;
}

/** A definition's figure in its contract unit; undefined when it is absent. */
export function figureOf(scenario: EvaluatedScenario, name: string, id: string): number | undefined {
  const figure = findFigure(scenario, name, id);
  return figure && inUnit(figure.quantity, figure.unit);
}

export function uncertaintyOf(scenario: EvaluatedScenario, name: string, id: string): number | undefined {
  const figure = findFigure(scenario, name, id);
  return figure && uncertaintyInUnit(figure.quantity, figure.unit);
}

/** A `let`'s value in SI; null when it could not be had. */
export function valueOf(scenario: EvaluatedScenario, name: string): number | null {
  const values = scenario.files.flatMap((file) => file.values);
  return values.find((value) => value.name === name)?.quantity?.value ?? null;
}

/** The definition of that name in any file; throws where there is none. */
export function definitionOf(scenario: EvaluatedScenario, name: string): EvaluatedDefinition {
  const found = scenario.files.flatMap(({ definitions }) => definitions).find((one) => one.name === name);
  if (!found) throw new Error(`no definition ${name}`);
  return found;
}

/** A table of it; throws where there is none. */
export function tableOf(scenario: EvaluatedScenario, name: string, id: string): Table {
  const found = definitionOf(scenario, name).tables.find((table) => table.id === id);
  if (!found) throw new Error(`no table ${id} of ${name}`);
  return found;
}

function findFigure(scenario: EvaluatedScenario, name: string, id: string): Figure | undefined {
  const definitions = scenario.files.flatMap((file) => file.definitions);
  return definitions.find((definition) => definition.name === name)?.figures.find((figure) => figure.id === id);
}

function marksIn(text: string): string[] {
  const marks: string[] = [];
  let line = 0; // start of the last line that is not a mark
  let start = 0;
  for (const current of text.split('\n')) {
    const mark = /^\s*#\s*(\^+) (\S+)$/.exec(current);
    if (mark) {
      const column = current.indexOf('^');
      marks.push(described(text, line + column, line + column + (mark[1] ?? '').length, mark[2] ?? ''));
    } else line = start;
    start += current.length + 1;
  }
  return marks;
}

function described(text: string, start: number, end: number, code: string): string {
  const line = text.slice(0, start).split('\n').length;
  return `${String(line).padStart(3)}: ${text.slice(start, end).replaceAll('\n', '⏎')}  ${code}`;
}
