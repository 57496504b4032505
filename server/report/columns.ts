// Lays out columns of text for a terminal: numbers aligned at the decimal point, texts to the left, headings above.
// Counts characters as one column each, which holds for everything the language and its units are written in.
// Invariant: no line ends in blanks.

import type { Column, Table } from '../scenario/scenario.ts';
import { formatNumber } from '../wording/numbers.ts';
import { isShare } from '../wording/quantities.ts';
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

/** A table as lines, the headings first; columns without a single entry are left out. */
export function tableLines(table: Table): string[] {
  const shown = table.columns
    .map((column, index) => ({ column, cells: table.rows.map((row) => row[index] ?? null) }))
    .filter(({ cells }) => cells.some((cell) => cell !== null));
  const laidOut = shown.map(({ column, cells }) => columnTexts(column, cells));
  return columns([
    laidOut.map(({ heading }) => heading),
    ...table.rows.map((_, row) => laidOut.map(({ cells }) => cells[row] ?? '')),
  ]);
}

function columnTexts(column: Column, cells: readonly (string | number | null)[]): { heading: string; cells: string[] } {
  if (column.unit === null) return { heading: column.label, cells: cells.map((cell) => String(cell ?? '–')) };
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
