// One published table as the fit takes it: its record in the tables' index and its rows, checked and cut to what is fitted.
// Two rows with the same temperature are the two sides of a transition; they cut the rows into stretches that are fitted
// each for itself. Knows no polynomials. Invariant: temperatures rise strictly within a stretch, and stretches meet.
// Source of the tables: M. W. Chase Jr., NIST-JANAF Thermochemical Tables, 4th ed., J. Phys. Chem. Ref. Data Monograph 9 (1998).

/** A record of the tables' index, as far as the fit reads it. */
export interface SourceRecord {
  readonly id: string;
  readonly name: string;
  readonly formula: string;
  readonly structure: string;
  readonly form: string | null;
  readonly phase: 'gas' | 'liquid' | 'crystal';
  readonly charge: number;
  readonly dfH298_kJ_per_mol: number;
  readonly S298_J_per_mol_K: number | null;
  readonly stableRanges_K: readonly (readonly [number, number])[];
  readonly trustedFrom_K?: number;
  readonly transitions: readonly SourceTransition[];
  readonly janafTable: string;
}

export type TransitionKind = 'melting' | 'boiling' | 'crystal-crystal' | 'lambda' | 'glass';

export interface SourceTransition {
  readonly T_K: number;
  readonly kind: TransitionKind;
  readonly dH_kJ_per_mol: number;
  readonly with?: string;
  readonly pairInTable?: boolean;
}

/** One row: K, J/(mol K), J/(mol K), and kJ/mol from the table's zero of enthalpy. */
export interface SourceRow {
  readonly temperatureK: number;
  readonly heatCapacity: number;
  readonly entropy: number;
  readonly enthalpyKJ: number;
  /** Values the fit does not follow though it is judged against them. */
  readonly setAside?: readonly RowValue[];
}

export type RowValue = 'heatCapacity' | 'enthalpy' | 'entropy';

/** What happens where a stretch begins: the heat taken up there in kJ/mol, zero for a peak or a glass. */
export interface Jump {
  readonly kind: TransitionKind;
  readonly enthalpyKJ: number;
}

export interface Stretch {
  readonly rows: readonly SourceRow[];
  /** Absent for the first stretch. */
  readonly begins?: Jump;
}

export interface SourceTable {
  readonly record: SourceRecord;
  readonly stretches: readonly Stretch[];
}

/** Below this the project needs no data. */
export const lowestTemperatureK = 200;
export const referenceTemperatureK = 298.15;

/** Reads a table's CSV text. Throws when the text is not of the form the tables have, since that is no user's input. */
export function readSourceTable(record: SourceRecord, text: string): SourceTable {
  const [header, ...lines] = text.trim().split('\n');
  if (header !== 'T_K,cp_J_per_mol_K,s_J_per_mol_K,h_minus_h298_kJ_per_mol') throw new Error(`${record.id}: ${header}`);
  const rows = lines.map((line) => {
    const [temperatureK, heatCapacity, entropy, enthalpyKJ] = line.split(',').map(Number);
    if (temperatureK === undefined || heatCapacity === undefined || entropy === undefined || enthalpyKJ === undefined)
      throw new Error(`${record.id}: ${line}`);
    return { temperatureK, heatCapacity, entropy, enthalpyKJ };
  });
  const fromK = Math.max(lowestTemperatureK, record.trustedFrom_K ?? 0);
  return { record, stretches: cutIntoStretches(record, withoutRowsBelow(rows, fromK)) };
}

/** All rows of a table in order, both sides of each transition among them. */
export function rowsOf(table: SourceTable): readonly SourceRow[] {
  return table.stretches.flatMap((stretch) => stretch.rows);
}

/** Values of one row that contradict the rest, or that no short polynomial can follow. */
export interface SetAside {
  readonly atK: number;
  readonly values: readonly RowValue[];
  /** Heat in kJ/mol that is taken up at this temperature at once instead. */
  readonly heatKJ?: number;
}

/** The table with some values marked as set aside. */
export function withSetAside(table: SourceTable, marks: readonly SetAside[]): SourceTable {
  const stretches = table.stretches.map((stretch): Stretch => {
    const rows = stretch.rows.map((row) => {
      const mark = marks.find(({ atK }) => atK === row.temperatureK);
      return mark === undefined ? row : { ...row, setAside: mark.values };
    });
    const mark = marks.find(({ atK }) => atK === rows[0]?.temperatureK);
    return mark?.heatKJ === undefined || stretch.begins === undefined
      ? { ...stretch, rows }
      : { rows, begins: { ...stretch.begins, enthalpyKJ: mark.heatKJ } };
  });
  return { ...table, stretches };
}

/** The table without the rows at these temperatures, which a second fit holds out. */
export function withoutRowsAt(table: SourceTable, temperaturesK: ReadonlySet<number>): SourceTable {
  const stretches = table.stretches.map((stretch) => ({
    ...stretch,
    rows: stretch.rows.filter((row) => !temperaturesK.has(row.temperatureK)),
  }));
  return { ...table, stretches };
}

/** Gibbs energy in kJ/mol on the element scale, from a row or between two rows by cubic Hermite of enthalpy and entropy. */
export function gibbsInTable(table: SourceTable, temperatureK: number): number | undefined {
  for (const { rows } of table.stretches) {
    const above = rows.findIndex((row) => row.temperatureK >= temperatureK);
    const upper = rows[above];
    if (upper === undefined) continue;
    const lower = upper.temperatureK === temperatureK ? upper : rows[above - 1];
    if (lower === undefined) continue;
    const enthalpyKJ = hermite(lower, upper, temperatureK, 'enthalpyKJ', (row) => row.heatCapacity / 1000);
    const entropy = hermite(lower, upper, temperatureK, 'entropy', (row) => row.heatCapacity / row.temperatureK);
    return table.record.dfH298_kJ_per_mol + enthalpyKJ - (temperatureK * entropy) / 1000;
  }
  return undefined;
}

/** Rows from the temperature on; of a transition right there only the upper side. */
function withoutRowsBelow(rows: readonly SourceRow[], fromK: number): readonly SourceRow[] {
  const kept = rows.filter((row) => row.temperatureK >= fromK);
  return kept[0]?.temperatureK === kept[1]?.temperatureK ? kept.slice(1) : kept;
}

function cutIntoStretches(record: SourceRecord, rows: readonly SourceRow[]): readonly Stretch[] {
  const stretches: { rows: SourceRow[]; begins?: Jump }[] = [{ rows: [] }];
  rows.forEach((row, index) => {
    const before = rows[index - 1];
    if (before !== undefined && row.temperatureK < before.temperatureK)
      throw new Error(`${record.id}: rows out of order`);
    if (before?.temperatureK === row.temperatureK) stretches.push({ rows: [], begins: jumpAt(record, row, before) });
    stretches.at(-1)?.rows.push(row);
  });
  return stretches;
}

function jumpAt(record: SourceRecord, row: SourceRow, before: SourceRow): Jump {
  const transition = record.transitions.find((each) => each.pairInTable === true && each.T_K === row.temperatureK);
  if (transition === undefined) throw new Error(`${record.id}: two rows at ${row.temperatureK} K without a transition`);
  const enthalpyKJ = transition.dH_kJ_per_mol;
  if (Math.abs(row.enthalpyKJ - before.enthalpyKJ - enthalpyKJ) > 0.005)
    throw new Error(`${record.id}: enthalpy of transition at ${row.temperatureK} K`);
  return { kind: transition.kind, enthalpyKJ };
}

function hermite(
  lower: SourceRow,
  upper: SourceRow,
  temperatureK: number,
  property: 'enthalpyKJ' | 'entropy',
  slopeOf: (row: SourceRow) => number,
): number {
  const width = upper.temperatureK - lower.temperatureK;
  if (width === 0) return lower[property];
  const x = (temperatureK - lower.temperatureK) / width;
  const value = lower[property] * (1 + 2 * x) * (1 - x) ** 2 + upper[property] * x * x * (3 - 2 * x);
  return value + width * (slopeOf(lower) * x * (1 - x) ** 2 + slopeOf(upper) * x * x * (x - 1));
}
