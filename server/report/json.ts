// The JSON document of `evaluate` and `check`: a stable contract, `schema: 1`. Numbers are not rounded; each figure is in
// the unit fixed for its id, values in coherent SI. Within one schema keys, ids and rows may be added, and none changes
// its meaning or unit. Invariant: no NaN, no infinity; a number that could not be had is absent, or null in a table.
// Source of the contract: language reference, "Command line".

import type { Severity } from '../findings/finding.ts';
import type { EvaluatedDefinition, Expectation, Figure, Place, Table } from '../scenario/scenario.ts';
import type { Screening } from '../scenario/screening.ts';
import { reportCaution } from '../wording/hazards.ts';
import { readingIn } from '../wording/quantities.ts';
import type { ReportedFile } from './gather.ts';
import { Lines } from './positions.ts';

export interface JsonDocument {
  readonly schema: 1;
  readonly files: readonly JsonFile[];
}

export interface JsonFile {
  readonly path: string;
  readonly used: boolean;
  /** Absent in the document of `check`, as is `values`. */
  readonly definitions?: readonly JsonDefinition[];
  readonly values?: readonly JsonValue[];
  readonly findings: readonly JsonFinding[];
  readonly expectations: readonly JsonExpectation[];
}

export interface JsonDefinition {
  readonly kind: string;
  readonly name: string;
  readonly line: number;
  readonly figures: readonly JsonFigure[];
  readonly tables: readonly JsonTable[];
  /** What the hazard rules came to; absent where there is nothing for them to look at. */
  readonly screening?: JsonScreening;
}

export interface JsonScreening {
  readonly rulesLookedAt: number;
  readonly found: readonly string[];
  readonly unrecorded: readonly string[];
  readonly caution: string | null;
}

export interface JsonFigure {
  readonly id: string;
  readonly label: string;
  readonly value: number;
  readonly unit: string;
  readonly uncertainty: number | null;
  /** The ends of a band, of which `value` is one; both or neither. */
  readonly low?: number;
  readonly high?: number;
}

export interface JsonTable {
  readonly id: string;
  readonly columns: readonly { readonly id: string; readonly unit: string | null }[];
  readonly rows: readonly (readonly (string | number | null)[])[];
  /** Between which temperatures (K) the rows may lack something; absent where they lack nothing. */
  readonly gaps?: readonly { readonly from: number; readonly to: number }[];
}

export interface JsonValue {
  readonly name: string;
  readonly line: number;
  readonly value: number;
  readonly unit: string;
  readonly uncertainty: number | null;
}

/** Lines and columns count from 1, columns in UTF-16 units; the end is the first position behind. */
export interface JsonRange {
  readonly line: number;
  readonly column: number;
  readonly endLine: number;
  readonly endColumn: number;
}

export interface JsonFinding extends JsonRange {
  readonly code: string;
  readonly severity: Severity;
  readonly message: string;
  readonly acknowledged: boolean;
}

export interface JsonExpectation extends JsonRange {
  /** null: it could not be worked out. */
  readonly holds: boolean | null;
  readonly found: number | null;
  readonly unit: string | null;
}

/** `evaluate` gives everything, `check` neither definitions nor values. */
export type Extent = 'evaluate' | 'check';

/** The document as plain data. */
export function jsonDocument(files: readonly ReportedFile[], extent: Extent): JsonDocument {
  return { schema: 1, files: files.map((file) => jsonFile(file, extent)) };
}

/** The document as text, ending with a newline. */
export function jsonReport(files: readonly ReportedFile[], extent: Extent): string {
  return `${JSON.stringify(jsonDocument(files, extent), null, 2)}\n`;
}

function jsonFile({ file, used, findings }: ReportedFile, extent: Extent): JsonFile {
  const lines = new Lines(file.tree.text);
  const values = file.values.flatMap(({ name, place, quantity }) => {
    const reading = quantity && finite(readingIn(quantity, null));
    return reading ? [{ name, line: lines.position(place.start).line, ...reading }] : [];
  });
  return {
    path: file.path,
    used,
    ...(extent === 'evaluate'
      ? { definitions: file.definitions.map((definition) => jsonDefinition(definition, lines)), values }
      : {}),
    findings: findings.map(({ code, severity, message, place, acknowledged }) => ({
      code,
      severity,
      message,
      ...range(place, lines),
      acknowledged,
    })),
    expectations: file.expectations.map((expectation) => jsonExpectation(expectation, lines)),
  };
}

function jsonDefinition(
  { kind, name, place, figures, tables, screening }: EvaluatedDefinition,
  lines: Lines,
): JsonDefinition {
  return {
    kind,
    name,
    line: lines.position(place.start).line,
    figures: figures.flatMap(jsonFigure),
    tables: tables.map(jsonTable),
    ...(screening ? { screening: jsonScreening(screening) } : {}),
  };
}

function jsonFigure({ id, label, quantity, band, unit }: Figure): JsonFigure[] {
  const reading = finite(readingIn(quantity, unit));
  if (!reading) return [];
  const ends = band && { low: readingIn(band.low, unit).value, high: readingIn(band.high, unit).value };
  const isBand = ends && Number.isFinite(ends.low) && Number.isFinite(ends.high);
  return [{ id, label, ...reading, ...(isBand ? ends : {}) }];
}

function jsonTable({ id, columns, rows, gaps = [] }: Table): JsonTable {
  return {
    id,
    columns: columns.map((column) => ({ id: column.id, unit: column.unit })),
    rows: rows.map((row) => row.map((cell) => (typeof cell === 'number' && !Number.isFinite(cell) ? null : cell))),
    ...(gaps.length > 0 ? { gaps: gaps.map(({ fromK, toK }) => ({ from: fromK, to: toK })) } : {}),
  };
}

function jsonScreening(screening: Screening): JsonScreening {
  const { rulesLookedAt, found, unrecorded } = screening;
  return { rulesLookedAt, found, unrecorded, caution: reportCaution([screening]) };
}

function jsonExpectation({ place, holds, found, unit }: Expectation, lines: Lines): JsonExpectation {
  const reading = found && finite(readingIn(found, unit));
  return { ...range(place, lines), holds, found: reading ? reading.value : null, unit: reading ? reading.unit : null };
}

function range(place: Place, lines: Lines): JsonRange {
  const start = lines.position(place.start);
  const end = lines.position(Math.max(place.start, place.end));
  return { line: start.line, column: start.column, endLine: end.line, endColumn: end.column };
}

/** The number as the contract takes it, or null when it is none. */
function finite({
  value,
  unit,
  uncertainty,
}: ReturnType<typeof readingIn>): Pick<JsonFigure, 'value' | 'unit' | 'uncertainty'> | null {
  if (!Number.isFinite(value)) return null;
  return { value, unit, uncertainty: uncertainty !== null && Number.isFinite(uncertainty) ? uncertainty : null };
}
