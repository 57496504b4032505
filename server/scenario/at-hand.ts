// What of a definition is worked out already, for views that look at all definitions at every key and must have nothing
// worked out for it: a burn solves its states, and their uncertainties, when its figures are read. Knows no view.
// Invariant: nothing here works anything out; what is given is what reading the definition gives.

import { isWorkedOut } from './lazily.ts';
import type { EvaluatedDefinition, Figure, Table } from './scenario.ts';

/** The figures, where they are there; null where nobody has read them yet. What each comes to may still be worked out. */
export function figuresAtHand(definition: EvaluatedDefinition): readonly Figure[] | null {
  return isWorkedOut(definition, 'figures') ? definition.figures : null;
}

/** Whether the figure's number, with its uncertainty, is there. */
export function isAtHand(figure: Figure): boolean {
  return isWorkedOut(figure, 'quantity') && isWorkedOut(figure.quantity, 'parts');
}

/** The tables whose rows are there. That there is a table at all needs nothing worked out; its rows may. */
export function tablesAtHand(definition: EvaluatedDefinition): readonly Table[] {
  return definition.tables.filter((table) => isWorkedOut(table, 'rows'));
}
