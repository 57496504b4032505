// One finding as a terminal shows it: place, severity, message and code on one line that tools can read, then the line of
// source with carets under what is meant. Errors and warnings show their source; notes are one line.
// Invariants: the first line has the form `file:line:column: severity: message [code]`; nothing from a file reaches the
// terminal as a control character.

import type { Finding, Severity } from '../findings/finding.ts';
import type { Place } from '../scenario/scenario.ts';
import { severityWord } from '../wording/words.ts';
import { cut, widthOf } from './columns.ts';
import type { Paint } from './paint.ts';
import type { Lines } from './positions.ts';

const TAB = '    ';

/** The lines of a finding. `linesOf` gives the lines of any file of the run, or undefined where it is not at hand. */
export function findingLines(
  finding: Finding,
  linesOf: (path: string) => Lines | undefined,
  paint: Paint,
  width: number,
): string[] {
  const { place, severity, message, code, acknowledged } = finding;
  const tone = toneOf(severity, paint);
  const noted = acknowledged ? ' (acknowledged)' : '';
  const head =
    `${paint.strong(`${where(place, linesOf)}:`)} ${tone(`${severityWord(severity)}:`)} ${printable(message)} ` +
    paint.faint(`[${code}]${noted}`);
  const related = finding.related.map(
    (other) => `  ${paint.faint(`${where(other.place, linesOf)}: ${printable(other.message)}`)}`,
  );
  const lines = linesOf(place.path);
  const isGrave = severity === 'error' || severity === 'warning';
  return [head, ...(lines && isGrave ? sourceLines(place, lines, tone, paint, width) : []), ...related];
}

/** Text of a file made safe for a terminal: controls and marks that turn the writing direction become visible. */
export function printable(text: string): string {
  return text.replace(/[\p{Cc}\u200e\u200f\u202a-\u202e\u2066-\u2069]/gu, (mark) => {
    const code = mark.codePointAt(0) ?? 0;
    return code < 0x20 ? String.fromCodePoint(0x2400 + code) : '\ufffd';
  });
}

function where(place: Place, linesOf: (path: string) => Lines | undefined): string {
  const position = linesOf(place.path)?.position(place.start);
  return printable(position ? `${place.path}:${position.line}:${position.column}` : place.path);
}

function sourceLines(
  place: Place,
  lines: Lines,
  tone: (text: string) => string,
  paint: Paint,
  width: number,
): string[] {
  const start = lines.position(place.start);
  const end = lines.position(place.end);
  const source = lines.lineText(start.line);
  if (source.trim() === '') return [];
  const endColumn = end.line === start.line ? end.column : source.length + 1;
  const shown = (text: string): string => printable(text.replaceAll('\t', TAB));
  const before = shown(source.slice(0, start.column - 1));
  const meant = shown(source.slice(start.column - 1, Math.max(start.column - 1, endColumn - 1)));
  const after = shown(source.slice(Math.max(start.column - 1, endColumn - 1)));
  const number = String(start.line).padStart(5);
  const room = Math.max(20, width - number.length - 3);
  // A line longer than the terminal is shown from a little before what is meant.
  const skipped = widthOf(before) + widthOf(meant) > room ? Math.max(0, widthOf(before) - 20) : 0;
  const visible =
    (skipped > 0 ? '…' : '') +
    Array.from(before + meant + after)
      .slice(skipped)
      .join('');
  const indent = widthOf(before) - skipped + (skipped > 0 ? 1 : 0);
  const carets = '^'.repeat(Math.max(1, Math.min(widthOf(meant), room - indent)));
  return [
    `${paint.faint(`${number} |`)} ${cut(visible, room)}`,
    `${paint.faint(`${' '.repeat(number.length)} |`)} ${' '.repeat(indent)}${tone(carets)}`,
  ];
}

function toneOf(severity: Severity, paint: Paint): (text: string) => string {
  switch (severity) {
    case 'error':
      return paint.bad;
    case 'warning':
      return paint.doubtful;
    case 'information':
      return paint.informing;
    case 'hint':
      return paint.faint;
  }
}
