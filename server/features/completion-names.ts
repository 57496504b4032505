// Offers what the scenario has names for: definitions, values, figures of definitions, and shares of portions. A list is made
// at every key, and for it no figure is read: a burn solves its states when its figures are. What an offer comes to is seen
// beside it (completion-documentation.ts). Invariants: a number shown is one the evaluation found for this very text; a list
// is a function of the text, whatever was looked at before.
import { inUnit, knownUnit } from '../core/quantity/convert.ts';
import { sameDimension } from '../core/quantity/dimension.ts';
import { quantityOf } from '../core/quantity/quantity.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import { parseFormula } from '../core/substance/formula.ts';
import { givenFigureRows } from '../scenario/given-figures.ts';
import { kindOf, kinds } from '../scenario/kinds/registry.ts';
import { isPutOff } from '../scenario/lazily.ts';
import { materialFigures, type FigureRow } from '../scenario/material-figures.ts';
import type { EvaluatedDefinition, EvaluatedScenario } from '../scenario/scenario.ts';
import { formatNumber, formatPercent } from '../wording/numbers.ts';
import { quantityText } from '../wording/quantities.ts';
import { unitOfValue } from '../wording/written-unit.ts';
import { fits, type CompletionItem } from './completion-item.ts';
import type { Wanted } from './completion-units.ts';
import { inLeadingOrder, leadingRank } from './leading-figures.ts';
import { writtenName } from './written-name.ts';

/** Definitions that pass, by kind; the one at the cursor is left out, because it cannot speak of itself. */
export function definitionItems(
  scenario: EvaluatedScenario,
  passes: (definition: EvaluatedDefinition) => boolean,
  own: string,
  start: number,
  detailOf: (definition: EvaluatedDefinition) => string | null = () => null,
): CompletionItem[] {
  return definitionsOf(scenario)
    .filter((definition) => definition.name !== own && passes(definition))
    .map((definition, rank) => ({
      ...named(definition.name, start),
      role: 'definition',
      detail: detailOf(definition) ?? definition.kind,
      rank,
    }));
}

/** Values given by `let`, those of a wanted dimension first. */
export function valueItems(
  scenario: EvaluatedScenario,
  wanted: readonly Wanted[],
  own: string,
  start: number,
): CompletionItem[] {
  const seen = new Set([own, '']);
  return scenario.files
    .flatMap((file) => file.values.map((value) => ({ ...value, file })))
    .filter(({ name }) => !seen.has(name) && seen.add(name))
    .map(({ name, quantity, place, file }, index) => {
      const isFitting =
        quantity !== null && wanted.some(({ dimension }) => sameDimension(dimension, quantity.dimension));
      return {
        ...named(name, start),
        role: 'value',
        detail: quantity ? quantityText(quantity, unitOfValue(place, quantity, file)) : 'value',
        rank: (isFitting ? 0 : 20) + Math.min(index, 19),
      };
    });
}

/** Figures with whose they are: `lower heating value of slurry`. At most `most`, those that fit what is typed. */
export function figureItems(scenario: EvaluatedScenario, typed: string, start: number, most: number): CompletionItem[] {
  const items: CompletionItem[] = [];
  for (const definition of definitionsOf(scenario)) {
    for (const [rank, { id }] of leadingRows(definition.kind).entries()) {
      const label = `${wordsOf(id)} of ${writtenName(definition.name)}`;
      if (items.length === most) return items;
      if (!fits(label, typed)) continue;
      const subject = { kind: 'figure', of: definition.name, id } as const;
      items.push({
        label,
        role: 'figure',
        detail: definition.kind,
        insert: label,
        start,
        rank: 30.5 + leadingRank(id) + rank / 1000,
        subject,
      });
    }
  }
  return items;
}

/** The figures that definitions of a kind may have, leading first. */
function leadingRows(kind: string): readonly FigureRow[] {
  const known = rowsOfKind.get(kind);
  if (known) return known;
  const ordered = inLeadingOrder(kindOf(kind)?.evaluated?.figures ?? []);
  rowsOfKind.set(kind, ordered);
  return ordered;
}

const rowsOfKind = new Map<string, readonly FigureRow[]>();

/**
 * The words of every figure a definition or substance may have, to be followed by `of` and a name; those that something in
 * the scenario may have come first.
 */
export function figureWordItems(scenario: EvaluatedScenario, start: number): CompletionItem[] {
  const kindsHere = new Set(definitionsOf(scenario).map(({ kind }) => kind));
  const had = new Set([...kindsHere].flatMap((kind) => leadingRows(kind).map(({ id }) => id)));
  return figureRows().map(({ id, label }, index) => ({
    label: wordsOf(id),
    role: 'figure',
    detail: 'of …',
    insert: `${wordsOf(id)} of `,
    continues: true,
    start,
    rank: (had.has(id) ? 30 : 50) + leadingRank(id) + index / 1000,
    documentation: { title: label, origin: 'A figure of a definition or substance.', lines: [] },
  }));
}

/** The contract unit of the figure of these words, or null when there is no such figure. */
export function unitOfFigure(words: string): string | null {
  return figureRows().find(({ id }) => wordsOf(id) === words)?.unit ?? null;
}

/** Whether every substance of the catalogue may have the figure of these words. */
export function isMaterialFigure(words: string): boolean {
  return materialFigures.some(({ id }) => wordsOf(id) === words);
}

/** Whether a substance's card may give the figure of these words. */
export function isGivenFigure(words: string): boolean {
  return givenFigureRows.some(({ id }) => wordsOf(id) === words);
}

/** Shares of portions: `sodium in slurry`. */
export function shareItems(scenario: EvaluatedScenario, typed: string, start: number, most: number): CompletionItem[] {
  return definitionsOf(scenario)
    .flatMap((definition) =>
      portionsOf(definition).map(({ name, mass }) => ({
        label: `${writtenName(name)} in ${writtenName(definition.name)}`,
        detail: mass === null ? 'share by mass' : `${formatPercent(mass)} by mass`,
      })),
    )
    .filter(({ label }) => fits(label, typed))
    .slice(0, most)
    .map(({ label, detail }) => ({ label, role: 'share', detail, insert: label, start, rank: 60 }));
}

/**
 * Rows of a definition's tables that have a column of these words: `sodium in slurry`, behind `mass share of`; where the
 * rows hold at several temperatures, with theirs: `Na2CO3(l) in furnace at 900 degC`.
 */
export function rowItems(scenario: EvaluatedScenario, words: string, start: number): CompletionItem[] {
  return definitionsOf(scenario).flatMap((definition) => {
    const labels = definition.tables
      // For rows that are put off a state may have to be solved.
      .filter((table) => !isPutOff(table, 'rows'))
      .filter(({ columns }) => columns.some(({ id, unit }) => unit !== null && wordsOf(id) === words))
      .flatMap(({ columns, rows }) => {
        const state = columns.findIndex(({ id }) => id === 'temperature');
        return rows.flatMap(({ 0: first, [state]: at }) => {
          if (typeof first !== 'string') return [];
          const row = `${isFormula(first) ? first : writtenName(first)} in ${writtenName(definition.name)}`;
          return [typeof at === 'number' ? `${row} at ${writtenTemperature(at)}` : row];
        });
      });
    return [...new Set(labels)].map((label, index): CompletionItem => ({
      label,
      role: 'share',
      detail: definition.kind,
      insert: label,
      start,
      rank: 10 + index / 1000,
    }));
  });
}

/** As a person writes it, exactly: a state is asked for by its temperature. */
function writtenTemperature(temperatureK: number): string {
  const temperature = quantityOf(temperatureK, knownUnit('K').dimension, undefined, 'temperature');
  return `${formatNumber(inUnit(temperature, 'degC'), 'plain', 8)} degC`;
}

/** Whether definitions of its kind may have the figure of these words. */
export function mayHaveFigure({ kind }: EvaluatedDefinition, words: string): boolean {
  return leadingRows(kind).some(({ id }) => wordsOf(id) === words);
}

/** The share by mass of a substance in a definition, in words; null when it is no portion of it. */
export function shareDetail(definition: EvaluatedDefinition, substance: string): string | null {
  const name = findSubstance(substance)?.name ?? substance;
  const portion = portionsOf(definition).find((one) => one.name === substance || one.name === name);
  return portion ? (portion.mass === null ? definition.kind : `${formatPercent(portion.mass)} by mass`) : null;
}

/** Whether a definition may be a portion of something. One that is not worked out yet may be anything. */
export function isMaterial({ kind }: EvaluatedDefinition): boolean {
  return kind === 'substance' || kind === 'blend';
}

function portionsOf({ kind, lines }: EvaluatedDefinition): { name: string; mass: number | null }[] {
  if (kind !== 'blend') return [];
  return lines.flatMap((line) =>
    line.kind === 'portion' ? [{ name: line.material.name, mass: line.shares.mass }] : [],
  );
}

/** Those that have a name, each name once. */
function definitionsOf({ files }: EvaluatedScenario): EvaluatedDefinition[] {
  const seen = new Set(['']);
  return files.flatMap(({ definitions }) => definitions).filter(({ name }) => !seen.has(name) && seen.add(name));
}

function named(name: string, start: number): Pick<CompletionItem, 'label' | 'insert' | 'start' | 'subject'> {
  return { label: name, insert: writtenName(name), start, subject: { kind: 'name', name } };
}

/** Tables name products by their formulas, and those are written without quotes. */
function isFormula(row: string): boolean {
  return parseFormula(row.replace(/\((?:g|l|cr|aq)\)$/, '')).kind === 'formula';
}

function wordsOf(id: string): string {
  return id.replaceAll('-', ' ');
}

function figureRows(): readonly FigureRow[] {
  rows ??= [
    ...new Map(kinds.flatMap(({ evaluated }) => evaluated?.figures ?? []).map((row) => [row.id, row])).values(),
  ];
  return rows;
}

let rows: readonly FigureRow[] | undefined;
