// Where something stands in a scenario's files, as offsets from a file's start, and which section stands at an offset.
// Knows nothing of what stands there.

import type { PlacedSection, Span, SyntaxTree } from '../../grammar/tree.ts';

/** A range in one file, in UTF-16 offsets from the file's start. */
export interface Place {
  readonly path: string;
  readonly start: number;
  readonly end: number;
}

/** The range in the file of a span inside one of its sections. */
export function placeOf(path: string, placed: PlacedSection, span: Span): Place {
  return { path, start: placed.start + span.start, end: placed.start + span.end };
}

/** The section that holds an offset of its file; undefined between sections. Time grows with the logarithm of their number. */
export function sectionAt({ sections }: Pick<SyntaxTree, 'sections'>, offset: number): PlacedSection | undefined {
  let low = 0;
  let high = sections.length - 1;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if ((sections[middle]?.start ?? 0) <= offset) low = middle;
    else high = middle - 1;
  }
  const found = sections[low];
  return found && found.start <= offset && offset < found.end ? found : undefined;
}
