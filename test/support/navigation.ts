// Check functions for going from place to place: definition, references, highlights, rename, folding. A place is written
// `main.stoke 2:7`, line and column counted from 1. Invariant: every place told is a whole word of its file.
import { expect } from 'vitest';
import { definition } from '../../server/features/definition.ts';
import { folding } from '../../server/features/folding.ts';
import { highlights } from '../../server/features/highlights.ts';
import { references } from '../../server/features/references.ts';
import { prepareRename, rename } from '../../server/features/rename.ts';
import { parse } from '../../grammar/parse.ts';
import { isUnitWord } from '../../server/core/quantity/read-unit.ts';
import { evaluateFixture } from './features.ts';

interface PlaceLike {
  readonly path: string;
  readonly start: number;
  readonly end: number;
}

function told(files: ReadonlyMap<string, string>, places: readonly PlaceLike[]): string[] {
  return places.map(({ path, start, end }) => {
    const text = files.get(path) ?? '';
    expect(end).toBeLessThanOrEqual(text.length);
    expect(text.slice(start, end)).not.toMatch(/^\s|\s$|\n/);
    const lines = text.slice(0, start).split('\n');
    return `${path} ${lines.length}:${(lines.at(-1) ?? '').length + 1}`;
  });
}

export function checkDefinition(marked: string, expected: readonly string[]): void {
  const { scenario, files, file, start } = evaluateFixture(marked);
  expect(told(files, definition(scenario.files, file, start))).toEqual(expected);
}

export function checkReferences(marked: string, expected: readonly string[], withDefinition = true): void {
  const { scenario, files, file, start } = evaluateFixture(marked);
  expect(told(files, references(scenario.files, file, start, withDefinition))).toEqual(expected);
}

/** `role line:column` each. */
export function checkHighlights(marked: string, expected: readonly string[]): void {
  const { scenario, files, file, start } = evaluateFixture(marked);
  const found = highlights(scenario.files, file, start);
  for (const { place } of found) expect(place.path).toBe(file);
  const places = told(
    files,
    found.map(({ place }) => place),
  );
  expect(found.map(({ role }, index) => `${role} ${(places[index] ?? '').replace(`${file} `, '')}`)).toEqual(expected);
}

/** Renames at the cursor: the text of each file afterwards, by name, or the refusal. */
export function renamedTexts(marked: string, newName: string): Record<string, string> | string {
  const { scenario, files, file, start } = evaluateFixture(marked);
  const offer = prepareRename(scenario.files, file, start);
  const edits = rename(scenario.files, file, start, newName);
  if ('refusal' in edits) return edits.refusal;
  expect('refusal' in offer ? offer.refusal : 'offered').toBe('offered');
  const texts = new Map(files);
  for (const { place, newText } of [...edits].sort((left, right) => right.place.start - left.place.start)) {
    const text = texts.get(place.path) ?? '';
    texts.set(place.path, text.slice(0, place.start) + newText + text.slice(place.end));
  }
  return Object.fromEntries(texts);
}

export function checkRename(marked: string, newName: string, expected: string): void {
  expect(renamedTexts(marked, newName)).toEqual(Object.fromEntries(evaluateFixture(expected).files));
}

export function checkRefusal(marked: string, newName: string, expected: RegExp): void {
  expect(renamedTexts(marked, newName)).toMatch(expected);
}

/** `role first-last` each, lines counted from 1. */
export function checkFolding(text: string, expected: readonly string[]): void {
  const folds = folding(parse(text, isUnitWord));
  expect(folds.map(({ role, firstLine, lastLine }) => `${role} ${firstLine + 1}-${lastLine + 1}`)).toEqual(expected);
}
