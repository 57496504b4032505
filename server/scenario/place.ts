// Where something stands in a scenario's files, as offsets from a file's start. Knows nothing of what stands there.

import type { PlacedSection, Span } from '../../grammar/tree.ts';

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
