// What a person reads on a terminal: for each named file its definitions with their figures in line, portions and
// products as tables, equations with their energies, then what was expected, then what was found wrong, then one line
// that sums up. Files reached by `use` show their findings only; name them to see their figures.
// Invariant: no line of figures or tables is painted inside a column, so that they align with and without colour.

import type { Finding, Severity } from '../findings/finding.ts';
import type { EvaluatedDefinition, EvaluatedFile, Figure, Table } from '../scenario/scenario.ts';
import { reportCaution, routeText, screeningText } from '../wording/hazards.ts';
import { formatNumber } from '../wording/numbers.ts';
import { figureCells, toldText } from '../wording/quantities.ts';
import { counted, countedFindings, listed, sharingHeads } from '../wording/words.ts';
import { unitOfClaim, unitOfValue } from '../wording/written-unit.ts';
import { alignedAtPoint, columns, cut, figureLines, tableLines, wordWrapped, type FigureCellRow } from './columns.ts';
import { findingLines, printable } from './finding-text.ts';
import { hasFailed, type ReportedFile } from './gather.ts';
import type { Extent } from './json.ts';
import type { Paint } from './paint.ts';
import { Lines } from './positions.ts';

export interface TextOptions {
  readonly extent: Extent;
  readonly paint: Paint;
  /** Columns of the terminal. */
  readonly width: number;
  /** Of each definition these figures alone, and no tables; absent: all there is. */
  readonly brief?: (definition: EvaluatedDefinition) => readonly Figure[];
}

const WIDEST = 100;
const NARROWEST = 40;

/** The whole text, ending with a newline. */
export function textReport(files: readonly ReportedFile[], { extent, paint, width, brief }: TextOptions): string {
  const room = Math.max(NARROWEST, Math.min(WIDEST, width));
  const kept = new Map(files.map(({ file }) => [file.path, new Lines(file.tree.text)]));
  const linesOf = (path: string): Lines | undefined => kept.get(path);
  const blocks = files.flatMap(({ file, used, findings }) => [
    ...(extent === 'evaluate' && !used ? fileBlocks(file, paint, room, brief) : []),
    ...findingBlocks(findings, linesOf, paint, room),
  ]);
  return `${[...blocks, ...notEvaluated(files, room), ...caution(files, room), summary(files, paint)].join('\n\n')}\n`;
}

const NOT_EVALUATED = 'kind/not-evaluated';

/** A finding with its source is a block of its own; those of one line each stand together. */
function findingBlocks(
  findings: readonly Finding[],
  linesOf: (path: string) => Lines | undefined,
  paint: Paint,
  width: number,
): string[] {
  const blocks: string[][] = [];
  let open = false;
  for (const finding of findings) {
    if (finding.code === NOT_EVALUATED) continue;
    const lines = findingLines(finding, linesOf, paint, width);
    if (lines.length === 1 && open) blocks.at(-1)?.push(...lines);
    else blocks.push(lines);
    open = lines.length === 1;
  }
  return blocks.map((lines) => lines.join('\n'));
}

function fileBlocks(file: EvaluatedFile, paint: Paint, width: number, brief: TextOptions['brief']): string[] {
  const look: Look = { width, brief, celsius: /\bdegC\b|°C/.test(file.tree.text) };
  const title = file.title === null ? '' : `  ${printable(file.title)}`;
  const heading = paint.strong(printable(file.path)) + cut(title, Math.max(0, width - file.path.length));
  const shown = file.definitions.filter(({ figures, tables }) => figures.length > 0 || tables.length > 0);
  return [
    heading,
    ...valuesBlock(file),
    ...shown.map((definition) => definitionBlock(definition, paint, look)),
    ...expectationsBlock(file, paint, width),
  ];
}

function valuesBlock(file: EvaluatedFile): string[] {
  const rows = file.values.flatMap((value) =>
    value.quantity
      ? [[printable(value.name), '=', toldText(value.quantity, unitOfValue(value.place, value.quantity, file))]]
      : [],
  );
  return rows.length === 0 ? [] : [indented(columns(rows), 2)];
}

interface Look {
  readonly width: number;
  readonly brief: TextOptions['brief'];
  /** Whoever wrote the file tells temperatures in °C. */
  readonly celsius: boolean;
}

function definitionBlock(definition: EvaluatedDefinition, paint: Paint, { width, brief, celsius }: Look): string {
  const { kind, name, doc, tables } = definition;
  const figures = brief ? brief(definition) : definition.figures;
  const told = figures.map(figureCells);
  const numbers = alignedAtPoint(told.map(({ number }) => number));
  const rows = figures.map(({ label }, index): FigureCellRow => {
    const { unit = '', note = '' } = told[index] ?? {};
    return [label, numbers[index] ?? '', note === '' ? unit : `${unit} (${note})`];
  });
  const room = width - 4;
  const [about = ''] = doc.split('\n');
  return [
    `${paint.informing(kind)} ${paint.strong(printable(name))}`,
    ...(about === '' ? [] : [`  ${paint.faint(cut(printable(about), width - 2))}`]),
    ...equations(definition).map((equation) => `  ${cut(printable(equation), width - 2)}`),
    ...(rows.length === 0 ? [] : [indented(figureLines(rows, width - 2), 2)]),
    ...missing(definition, width).map((line) => paint.faint(line)),
    ...outlook(definition, width),
    ...(brief ? [] : tables.filter((table) => saysSomething(table, kind))).map((table) => {
      const lines = [...tableLines(table, { room, celsius }), ...gapLines(table)];
      const heading = wordWrapped(table.label, width - 2, 0).map((line) => paint.faint(line));
      return `\n${indented(heading, 2)}\n${indented(lines, 4)}`;
    }),
  ].join('\n');
}

function equations({ section }: EvaluatedDefinition): string[] {
  const { statement, text } = section.section;
  if (statement.kind !== 'definition') return [];
  return statement.lines.flatMap((line) =>
    line.kind === 'equation'
      ? [text.slice(line.span.start, line.span.end).replace(/\s+/g, ' ').replace('->', '→')]
      : [],
  );
}

/** What is not there for lack of data, by what is missing: one reason is told once for all figures it costs. */
function missing({ absent }: EvaluatedDefinition, width: number): string[] {
  const figuresByReason = new Map<string, string[]>();
  for (const [id, reasons] of absent) {
    if (reasons === null || reasons.length === 0) continue;
    const reason = listed(sharingHeads(reasons));
    figuresByReason.set(reason, [...(figuresByReason.get(reason) ?? []), id.replaceAll('-', ' ')]);
  }
  return (
    [...figuresByReason]
      // That a mixture without a molar mass has no molar mass goes without saying.
      .filter(([reason, names]) => names.length > 1 || !reason.startsWith(`the ${names[0] ?? ''} of `))
      .flatMap(([reason, names]) =>
        wrapped(`Without ${reason} there is no ${listed(names, 'or')}.`, width - 2).split('\n'),
      )
      .map((line) => `  ${line}`)
  );
}

/** Where a table may lack something. */
function gapLines({ gaps = [] }: Table): string[] {
  const told = gaps.map(({ fromK, toK }) => `${formatNumber(fromK)} and ${formatNumber(toK)} K`);
  return told.length === 0
    ? []
    : [`Between ${listed(told)} nothing could be worked out: what happens there is not told.`];
}

/**
 * A table of differences that are all zero says no more than that the equation balances; the elements of a substance say
 * no more than its composition, which is written there. A burn's
 * proofs and its sixty points of freezing stand in its sheet and in the JSON.
 */
function saysSomething({ id, columns: heads, rows }: Table, kind: string): boolean {
  const difference = heads.findIndex((head) => head.id === 'difference');
  if (difference >= 0) return rows.some((row) => row[difference] !== 0);
  // The route is told in a sentence.
  if (id === 'approval-route') return false;
  const isProof =
    kind === 'burn' && (id === 'element-balance' || id === 'certificate' || id === 'carbon-against-freezing');
  return rows.length > 0 && !(kind === 'substance' && id === 'elements') && !isProof;
}

function expectationsBlock(file: EvaluatedFile, paint: Paint, width: number): string[] {
  if (file.expectations.length === 0) return [];
  const lines = file.expectations.map(({ place, holds, found, unit }) => {
    const claim = file.tree.text
      .slice(place.start, place.end)
      .replace(/^expect\s+/, '')
      .replace(/\s+/g, ' ');
    const mark = holds === null ? paint.faint('–') : holds ? paint.good('✓') : paint.bad('✗');
    const value =
      found === null ? 'not worked out' : `found ${toldText(found, unitOfClaim(place, found, file) ?? unit)}`;
    return `  ${mark} ${cut(printable(claim), width - 4)}  ${paint.faint(value)}`;
  });
  return [['Expected', ...lines].join('\n')];
}

/** One for the whole report. */
function caution(files: readonly ReportedFile[], width: number): string[] {
  const screenings = files.flatMap(({ file }) => file.definitions.flatMap(({ screening }) => screening ?? []));
  const text = reportCaution(screenings);
  return text === null ? [] : [wrapped(printable(text), width)];
}

/** Which code governs it, and what the hazard rules came to. */
function outlook({ tables, screening }: EvaluatedDefinition, width: number): string[] {
  const [route] = tables.find(({ id }) => id === 'approval-route')?.rows ?? [];
  const texts = [
    ...(route ? [`As a ship’s fuel: ${routeText(route)}`] : []),
    ...(screening ? [screeningText(screening)] : []),
  ];
  return texts.flatMap((text) => wrapped(printable(text), width - 2).split('\n')).map((line) => `  ${line}`);
}

/** One sentence instead of one note a definition. */
function notEvaluated(files: readonly ReportedFile[], width: number): string[] {
  const names = files.flatMap(({ file, findings }) => {
    const starts = new Set(findings.filter(({ code }) => code === NOT_EVALUATED).map(({ place }) => place.start));
    // The finding stands at the kind's word, with which the definition starts.
    return file.definitions
      .filter(({ place }) => starts.has(place.start))
      .map(({ kind, name }) => `${kind} ${printable(name)}`);
  });
  if (names.length === 0) return [];
  return [wrapped(`Read but not worked out by this version: ${names.join(', ')}.`, width)];
}

function summary(files: readonly ReportedFile[], paint: Paint): string {
  const used = files.filter((file) => file.used).length;
  const counts: Partial<Record<Severity, number>> = {};
  for (const { severity } of files.flatMap(({ findings }) => findings)) counts[severity] = (counts[severity] ?? 0) + 1;
  const named = `${counted(files.length - used, 'file')}${used === 0 ? '' : ` (${used} more used)`}`;
  const claims = claimsInWords(files);
  const line = `${named}: ${countedFindings(counts)}${claims === '' ? '' : `; ${claims}`}`;
  return hasFailed(files, false) ? paint.bad(line) : paint.good(line);
}

/** `2 expectations met, 1 failed`; empty where nothing is expected. */
function claimsInWords(files: readonly ReportedFile[]): string {
  const claims = files.flatMap(({ file }) => file.expectations);
  const parts = (
    [
      [true, 'met'],
      [false, 'failed'],
      [null, 'not worked out'],
    ] as const
  ).flatMap(([holds, word]) => {
    const count = claims.filter((claim) => claim.holds === holds).length;
    return count === 0 ? [] : [{ count, word }];
  });
  return parts
    .map(({ count, word }, index) => `${index === 0 ? counted(count, 'expectation') : count} ${word}`)
    .join(', ');
}

function indented(lines: readonly string[], by: number): string {
  return lines.map((line) => (line === '' ? '' : ' '.repeat(by) + line)).join('\n');
}

function wrapped(text: string, width: number): string {
  return wordWrapped(text, width, 2).join('\n');
}
