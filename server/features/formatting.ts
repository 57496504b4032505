// The edits that bring a text into the printer's form: the printer's own, line by line, each cut down to what really
// differs, so that cursors and marks elsewhere in a line stay where they are. Evaluates nothing.
// Invariant: applying the edits gives exactly the printer's text.
import { formatRange } from '../../grammar/printer.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';

/** Put `newText` in place of the text from `start` to `end` (UTF-16 offsets). */
export interface TextChange {
  readonly start: number;
  readonly end: number;
  readonly newText: string;
}

/** The edits for a whole text, in order and not touching each other; none for one that is longer than `largestText`. */
export function formatting(text: string, largestText?: number): TextChange[] {
  return rangeFormatting(text, 0, text.length, largestText);
}

/** The edits for the lines that the range touches. */
export function rangeFormatting(text: string, start: number, end: number, largestText?: number): TextChange[] {
  const size = largestText === undefined ? {} : { largestText };
  return formatRange(text, isUnitWord, start, end, size).map((change) => narrowed(text, change));
}

/** The same change without the equal ends of old and new text. */
function narrowed(text: string, { start, end, newText }: TextChange): TextChange {
  const before = text.slice(start, end);
  const shorter = Math.min(before.length, newText.length);
  let head = 0;
  while (head < shorter && before[head] === newText[head]) head++;
  if (isHighHalf(before[head - 1])) head--;
  let tail = 0;
  while (tail < shorter - head && before.at(-1 - tail) === newText.at(-1 - tail)) tail++;
  if (isLowHalf(before[before.length - tail])) tail--;
  return { start: start + head, end: end - tail, newText: newText.slice(head, newText.length - tail) };
}

/** Cutting behind the first half of a character outside the basic plane would leave two broken ones. */
function isHighHalf(unit: string | undefined): boolean {
  return unit !== undefined && /[\uD800-\uDBFF]/.test(unit);
}

function isLowHalf(unit: string | undefined): boolean {
  return unit !== undefined && /[\uDC00-\uDFFF]/.test(unit);
}
