// What a definition kind is to the rest of the scenario: its help, its entry table, the figures it may have, and the
// function that works a definition out. A kind without one is known to the language but not evaluated yet.

import type { Definition } from '../../../grammar/tree.ts';
import type { Context } from '../context.ts';
import type { EntryTable, Reader } from '../entries.ts';
import { lazily } from '../lazily.ts';
import type { Material } from '../material.ts';
import type { Machinery } from '../machinery.ts';
import type { FigureRow } from '../material-figures.ts';
import type { OxidantStream } from '../oxidant-stream.ts';
import type { Absent, Figure, LineResult, Table } from '../scenario.ts';
import type { Screening } from '../screening.ts';

export interface Kind {
  readonly kind: string;
  /** One sentence for a hover and the reference. */
  readonly help: string;
  readonly evaluated: EvaluatedKind | null;
}

export interface EvaluatedKind {
  readonly entries: EntryTable;
  /** How an entry is read that the table does not know and that is a leg: a line of its own, named by the user. */
  readonly legs?: Reader<unknown>;
  /** The lines it takes besides entries. */
  readonly lines: readonly ('portion' | 'equation')[];
  readonly figures: readonly FigureRow[];
  evaluate(definition: Definition, context: Context): KindAnswer;
}

export interface KindAnswer {
  readonly figures: readonly Figure[];
  readonly tables: readonly Table[];
  readonly absent: Absent;
  readonly lines: readonly LineResult[];
  /** What the definition is as a portion of something else; null when it is no material or could not be worked out. */
  readonly material: Material | null;
  readonly screening?: Screening | undefined;
  /** What it is as something to burn in; only an oxidant has one. */
  readonly stream?: OxidantStream | null;
  /** What it is to the work that is done: an engine, what engines have to do, or that over a year. */
  readonly machinery?: Machinery | null;
}

/** An answer that says nothing: the cause has been reported. Its figures are all absent for that reason. */
export function unknownAnswer(kind: Pick<EvaluatedKind, 'figures'>): KindAnswer {
  return {
    figures: [],
    tables: [],
    absent: new Map(kind.figures.map((figure) => [figure.id, null])),
    lines: [],
    material: null,
  };
}

/** An answer whose parts are worked out when somebody reads them; what is not given is empty. `parts` is taken over. */
export function lazyAnswer(
  given: Partial<KindAnswer>,
  parts: { readonly [Key in keyof KindAnswer]?: () => KindAnswer[Key] },
): KindAnswer {
  return lazily<KindAnswer>({ figures: [], tables: [], absent: new Map(), lines: [], material: null, ...given }, parts);
}
