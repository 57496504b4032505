// Lays out columns of text for a terminal: numbers aligned at the decimal point, texts to the left, headings above.
// Counts characters as one column each, which holds for everything the language and its units are written in.
// Invariant: no line ends in blanks.

import { celsiusZeroK } from '../core/quantity/constants.ts';
import type { Column, Table } from '../scenario/scenario.ts';
import { formatNumber } from '../wording/numbers.ts';
import { isShare } from '../wording/quantities.ts';
import { speciesText } from '../wording/species.ts';
import { unitForPeople } from '../wording/units.ts';

/** How many columns a text takes on the terminal. */
export function widthOf(text: string): number {
  return Array.from(text).length;
}

/** The width of the widest text; 0 of none. */
function widest(texts: readonly string[]): number {
  return texts.reduce((most, text) => Math.max(most, widthOf(text)), 0);
}

/** The text filled with blanks at its end. */
function padded(text: string, width: number): string {
  return text + ' '.repeat(Math.max(0, width - widthOf(text)));
}

/** The text cut to a width, with `…` where something is lost. */
export function cut(text: string, width: number): string {
  const characters = Array.from(text);
  return characters.length <= width ? text : `${characters.slice(0, Math.max(0, width - 1)).join('')}…`;
}

/** Numbers with their decimal points in one column, all of one width. */
export function alignedAtPoint(numbers: readonly string[]): string[] {
  const parts = numbers.map((number) => {
    // Only digits before the point count: in `(1.2 ± 0.1) × 10⁻⁷` it is the first one, in `–` there is none.
    const point = number.search(/(?<=\d)[.](?=\d)|(?<=\d)(?=[^\d.−])|$/);
    return { before: number.slice(0, point), after: number.slice(point) };
  });
  const before = widest(parts.map((part) => part.before));
  const after = widest(parts.map((part) => part.after));
  return parts.map(
    (part) =>
      ' '.repeat(before - widthOf(part.before)) +
      padded(part.after === '' ? part.before : part.before + part.after, widthOf(part.before) + after),
  );
}

/** Rows of texts, each column as wide as its widest cell, two blanks between columns. */
export function columns(rows: readonly (readonly string[])[]): string[] {
  const count = rows.reduce((most, row) => Math.max(most, row.length), 0);
  const widths = Array.from({ length: count }, (_, column) => widest(rows.map((row) => row[column] ?? '')));
  return rows.map((row) =>
    row
      .map((text, column) => padded(text, widths[column] ?? 0))
      .join('  ')
      .trimEnd(),
  );
}

export interface TableLook {
  /** Columns of the terminal. */
  readonly room: number;
  /** Temperatures in °C, as whoever wrote the scenario tells them. */
  readonly celsius: boolean;
}

/**
 * A table as lines, the headings first; columns without a single entry are left out. One that is wider than the room is
 * broken into several below each other, each with the first column again.
 */
export function tableLines(table: Table, { room, celsius }: TableLook): string[] {
  const shown = table.columns
    .map((column, index) => ({ column, cells: table.rows.map((row) => row[index] ?? null) }))
    .filter(({ cells }) => cells.some((cell) => cell !== null))
    .map(({ column, cells }) => (celsius ? inCelsius(column, cells) : { column, cells }));
  const laidOut = shown.map(({ column, cells }) => columnTexts(column, cells));
  return broken(laidOut, room)
    .map((part) =>
      columns([
        part.map(({ heading }) => heading),
        ...table.rows.map((_, row) => part.map(({ cells }) => cells[row] ?? '')),
      ]),
    )
    .flatMap((lines, index) => (index === 0 ? lines : ['', ...lines]));
}

interface ColumnTexts {
  readonly heading: string;
  readonly cells: readonly string[];
}

/** Columns in groups that each fit the room, the first column in all of them. */
function broken(all: readonly ColumnTexts[], room: number): readonly (readonly ColumnTexts[])[] {
  const widthOfColumn = ({ heading, cells }: ColumnTexts): number => widest([heading, ...cells]);
  const [first] = all;
  if (!first) return [[]];
  const groups: ColumnTexts[][] = [[first]];
  let width = widthOfColumn(first);
  for (const column of all.slice(1)) {
    const own = widthOfColumn(column) + BETWEEN;
    const group = groups.at(-1) ?? [];
    if (width + own > room && group.length > 1) {
      groups.push([first, column]);
      width = widthOfColumn(first) + own;
    } else {
      group.push(column);
      width += own;
    }
  }
  return groups;
}

/** Blanks between two columns. */
const BETWEEN = 2;

type Cells = readonly (string | number | null)[];

/** In tables whatever is in K is a temperature and no difference of two, but for what its id says. */
function inCelsius(column: Column, cells: Cells): { readonly column: Column; readonly cells: Cells } {
  if (column.unit !== 'K' || /difference|uncertainty|rise/.test(column.id)) return { column, cells };
  const told = cells.map((cell) => (typeof cell === 'number' ? rounded(cell - celsiusZeroK) : cell));
  return { column: { ...column, unit: 'degC' }, cells: told };
}

/** Without what subtracting leaves behind in binary: 623.15 less 273.15 is 350. */
function rounded(celsius: number): number {
  return Number(celsius.toFixed(9));
}

function columnTexts(column: Column, cells: Cells): ColumnTexts {
  if (column.unit === null) {
    const isSpecies = column.id === 'substance';
    return {
      heading: column.label,
      cells: cells.map((cell) => (isSpecies && typeof cell === 'string' ? speciesText(cell) : String(cell ?? '–'))),
    };
  }
  const share = isShare(column.id, column.unit);
  const texts = alignedAtPoint(
    cells.map((cell) => (typeof cell === 'number' ? formatNumber(share ? cell * 100 : cell) : (cell ?? '–'))),
  );
  const unit = share ? '%' : unitForPeople(column.unit);
  const heading = unit === '' ? column.label : `${column.label}, ${unit}`;
  const width = widest([heading, ...texts]);
  // Numbers stand to the right under their heading, as they do in print.
  const toRight = (text: string): string => ' '.repeat(width - widthOf(text)) + text;
  return { heading: toRight(heading), cells: texts.map(toRight) };
}

/** A label, what it is and in which unit. */
export type FigureCellRow = readonly [label: string, number: string, unit: string];

/** Rows of figures as lines: numbers and units in columns, labels that leave them no room broken between words. */
export function figureLines(rows: readonly FigureCellRow[], room: number): string[] {
  const rest = widest(rows.map(([, number]) => number)) + widest(rows.map(([, , unit]) => unit)) + 2 * BETWEEN;
  const labelRoom = Math.max(NARROWEST_LABEL, room - rest);
  const laidOut = rows.flatMap(([label, number, unit]) => {
    const [first = '', ...more] = wordWrapped(label, labelRoom, 2);
    return [[first, number, unit], ...more.map((line) => [line, '', ''])];
  });
  return columns(laidOut);
}

const NARROWEST_LABEL = 20;

/** The text in lines no wider than `width`, all but the first set in by `hang`; a word that is wider stands alone. */
export function wordWrapped(text: string, width: number, hang: number): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    if (line !== '' && widthOf(line) + 1 + widthOf(word) > width) {
      lines.push(line);
      line = ' '.repeat(hang) + word;
    } else line = line === '' ? word : `${line} ${word}`;
  }
  return [...lines, line];
}
