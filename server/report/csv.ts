// The figures and values as comma-separated rows, one number a row, for spreadsheets and scripts. Numbers are not rounded
// and stand in the units of the JSON contract. Knows no tables and no findings. Invariant: every row has the eight columns
// of the header. Source of the form: RFC 4180.

import { readingIn } from '../wording/quantities.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { ReportedFile } from './gather.ts';

const HEADER = ['file', 'definition', 'kind', 'id', 'label', 'value', 'unit', 'uncertainty'] as const;

/** The whole text, each line ended by CR LF, the first naming the columns. A `let` has no definition and kind `let`. */
export function csvReport(files: readonly ReportedFile[]): string {
  const rows = files.flatMap(({ file }) => [
    ...file.values.flatMap(({ name, quantity }) =>
      quantity ? [[file.path, '', 'let', name, '', ...numberCells(quantity, null)]] : [],
    ),
    ...file.definitions.flatMap(({ kind, name, figures }) =>
      figures.map(({ id, label, quantity, unit }) => [
        file.path,
        name,
        kind,
        id,
        label,
        ...numberCells(quantity, unit),
      ]),
    ),
  ]);
  return [HEADER, ...rows].map((row) => `${row.map(cell).join(',')}\r\n`).join('');
}

function numberCells(quantity: Quantity, unit: string | null): string[] {
  const reading = readingIn(quantity, unit);
  return [String(reading.value), reading.unit, reading.uncertainty === null ? '' : String(reading.uncertainty)];
}

function cell(text: string): string {
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
