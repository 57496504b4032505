// A number as a cell of a table: one that could not be had is an empty cell. Knows no table.

export function finiteCell(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}
