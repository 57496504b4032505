// Makes the reference rows of the second fit and its records: forty species, six rows each that the fit did not see.
// Knows no files. Invariant: a row's numbers are the table's own; only log Kf is rebuilt, from its G and the elements' tables.

import type { PhaseFit } from '../phase-fit.ts';
import { fitTable } from './fit-tables.ts';
import type { FitContext } from './fit-tables.ts';
import { formationLogKf, heldOutTables, temperaturesToHoldOut } from './held-out.ts';
import { rowsOf, withoutRowsAt } from './source-table.ts';
import type { SourceTable } from './source-table.ts';

export interface HeldOutRow {
  readonly phase: string;
  readonly table: string;
  readonly temperatureK: number;
  readonly heatCapacityJPerMolK: number;
  readonly entropyJPerMolK: number;
  /** H(T) - H(298.15 K). */
  readonly enthalpyKJPerMol: number;
  readonly logKf: number;
  readonly provenance: 'seen';
}

/** The rows held out and the records fitted without them. */
export function fitHeldOut(
  tables: readonly SourceTable[],
  context: FitContext,
): { readonly rows: readonly HeldOutRow[]; readonly records: readonly PhaseFit[] } {
  const byId = new Map(tables.map((table) => [table.record.id, table]));
  const rows: HeldOutRow[] = [];
  const records: PhaseFit[] = [];
  for (const id of heldOutTables) {
    const table = byId.get(id);
    if (table === undefined) throw new Error(`no table ${id}`);
    const temperaturesK = new Set(temperaturesToHoldOut(table));
    const { fit: record } = fitTable(withoutRowsAt(table, temperaturesK), context);
    records.push(record);
    for (const row of rowsOf(table)) {
      if (!temperaturesK.has(row.temperatureK)) continue;
      rows.push({
        phase: record.id,
        table: record.table,
        temperatureK: row.temperatureK,
        heatCapacityJPerMolK: row.heatCapacity,
        entropyJPerMolK: row.entropy,
        enthalpyKJPerMol: row.enthalpyKJ,
        logKf: Number(formationLogKf(table, row, byId).toFixed(4)),
        provenance: 'seen',
      });
    }
  }
  return { rows, records };
}
