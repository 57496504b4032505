// A finding as every view takes it: plain text and places, nothing to work out. One is made of each fact by the file in
// this folder that bears the fact's code.

import type { Place } from '../scenario/scenario.ts';

export type Severity = 'error' | 'warning' | 'information' | 'hint';

export interface Finding {
  /** `area/what`; stable. */
  readonly code: string;
  readonly severity: Severity;
  /** What is wrong, by how much, how to mend it; plain text. */
  readonly message: string;
  readonly place: Place;
  readonly related: readonly { readonly place: Place; readonly message: string }[];
  readonly fixes: readonly Fix[];
  readonly acknowledged: boolean;
}

/** A mechanical mend. All its edits are made together. */
export interface Fix {
  readonly title: string;
  /** The mend an editor may apply without asking which. */
  readonly preferred: boolean;
  readonly edits: readonly { readonly place: Place; readonly newText: string }[];
}
