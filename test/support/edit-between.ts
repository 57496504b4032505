// The edit that leads from one text to another, as a client would send it: one range and what comes in its place. Knows no
// connection. Invariant: applied to the first text it gives the second, and it stands between whole line ends.
// Source: Language Server Protocol 3.18, "Position" (lines end with CR LF, LF or CR).
import type { Position, Range } from 'vscode-languageserver/node';

/** The one stretch that differs, as a change by range. */
export function editBetween(before: string, after: string): { range: Range; text: string } {
  const shorter = Math.min(before.length, after.length);
  let head = 0;
  while (head < shorter && before[head] === after[head]) head++;
  let tail = 0;
  while (tail < shorter - head && before.at(-1 - tail) === after.at(-1 - tail)) tail++;
  // Between a carriage return and its newline there is no position.
  while (head > 0 && /[\r\n]/.test(before[head - 1] ?? '')) head--;
  while (tail > 0 && /[\r\n]/.test(before.at(-tail) ?? '')) tail--;
  const range = { start: linePosition(before, head), end: linePosition(before, before.length - tail) };
  return { range, text: after.slice(head, after.length - tail) };
}

function linePosition(text: string, offset: number): Position {
  const before = text.slice(0, offset).split(/\r\n|\n|\r/);
  return { line: before.length - 1, character: before.at(-1)?.length ?? 0 };
}
