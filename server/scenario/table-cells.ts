// Finds a cell of a definition's tables by the words of its column and the name of its row, and where the rows hold at
// several temperatures, by that too. Says nothing and works nothing out but what the table itself leaves until it is read.
// Convention: a row is named by its first cell; a column `temperature` says where each row holds; a table whose rows are
// temperatures has it first.

import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { toSi } from '../core/quantity/read-unit.ts';
import type { AskLongWork } from './long-work.ts';
import type { Table } from './scenario.ts';

/** A figure met through a reference: its value and, where it is one of a definition's own, the figure. */
export interface ReferredFigure {
  readonly quantity: Quantity;
  readonly unit: string;
}

/** The cell (null: the table itself shows that it could not be had), or what there is instead. */
export type FoundCell =
  | { readonly kind: 'cell'; readonly cell: ReferredFigure | null }
  | { readonly kind: 'no-row'; readonly names: readonly string[] }
  /** Its table takes long and is not there yet. */
  | { readonly kind: 'awaited' }
  /** It is told at these temperatures (K) only. */
  | { readonly kind: 'no-state'; readonly statesK: readonly number[] };

/** The cell of a named row, in the first table that has both; `temperature` looks in tables of several states only. */
export function findCell(
  tables: readonly Table[],
  isNamed: (name: string) => boolean,
  columnId: string,
  temperature: Quantity | undefined,
  longWork: AskLongWork,
): FoundCell {
  const wanted = tables.filter((table) => isStated(table) === (temperature !== undefined) && !isOverTemperature(table));
  const statesK = new Set<number>();
  for (const table of wanted) {
    const column = columnOf(table, columnId);
    const state = temperatureColumn(table);
    const unit = table.columns[column]?.unit;
    if (!unit) continue;
    if (table.work && !table.work.ask(longWork)) return { kind: 'awaited' };
    const isAsked = (cells: Row): boolean =>
      isNamed(String(cells[0])) && (!temperature || isAt(cells[state], temperature.value));
    const found = table.rows.find(isAsked) ?? table.traces?.find(isAsked);
    if (found) return { kind: 'cell', cell: cellOf(found[column], unit) };
    for (const { [state]: cell } of table.rows) if (typeof cell === 'number') statesK.add(cell);
  }
  if (temperature && ![...statesK].some((stateK) => isAt(stateK, temperature.value))) {
    return { kind: 'no-state', statesK: [...statesK] };
  }
  // A table that takes long is not worked out for the names in it.
  const rows = wanted.flatMap((table) =>
    !table.work || table.work.isDone() ? table.rows.map((cells) => String(cells[0])) : [],
  );
  return { kind: 'no-row', names: [...new Set(rows)] };
}

/** The cell at a temperature, of a table whose rows are temperatures. */
export function findFigureAt(
  tables: readonly Table[],
  columnId: string,
  temperature: Quantity,
): Exclude<FoundCell, { kind: 'no-row' | 'awaited' }> {
  const statesK: number[] = [];
  for (const table of tables) {
    const unit = isOverTemperature(table) ? table.columns[columnOf(table, columnId)]?.unit : undefined;
    if (!unit) continue;
    const found = table.rows.find(([cell]) => isAt(cell, temperature.value));
    if (found) return { kind: 'cell', cell: cellOf(found[columnOf(table, columnId)], unit) };
    for (const [cell] of table.rows) if (typeof cell === 'number') statesK.push(cell);
  }
  return { kind: 'no-state', statesK };
}

/** Whether a table whose rows are temperatures has a column of that id: then `at` picks the row. */
export function isToldOverTemperature(tables: readonly Table[], columnId: string): boolean {
  return tables.some((table) => isOverTemperature(table) && columnOf(table, columnId) > 0);
}

type Row = Table['rows'][number];

function cellOf(cell: Row[number] | undefined, unit: string): ReferredFigure | null {
  if (typeof cell !== 'number') return null;
  const known = knownUnit(unit);
  const kind = known.scale === 'kelvin' || known.scale === 'temperature' ? 'temperature' : 'plain';
  return { quantity: quantityOf(toSi(cell, known), known.dimension, undefined, kind), unit };
}

/** Columns of text have no unit, and no cell that could be referred to. */
function columnOf({ columns }: Table, id: string): number {
  return columns.findIndex((column) => column.id === id && column.unit !== null);
}

function temperatureColumn({ columns }: Table): number {
  return columns.findIndex(({ id }) => id === 'temperature');
}

function isStated(table: Table): boolean {
  return temperatureColumn(table) >= 0;
}

function isOverTemperature(table: Table): boolean {
  return temperatureColumn(table) === 0;
}

/** Temperatures of tables are in K; one that is asked for is the same within a hundredth. */
function isAt(cell: Row[number] | undefined, temperatureK: number): boolean {
  return typeof cell === 'number' && Math.abs(cell - temperatureK) < 0.01;
}
