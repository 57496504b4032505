// Tells what an equation comes to: whether it balances, element by element, and its enthalpy per equation and per kilogram
// of its left side. Reads the reaction's `elements` table and figures; counts nothing itself.
import type { EvaluatedDefinition, Figure, LineResult, Place, Table } from '../scenario/scenario.ts';
import { formatNumber } from '../wording/numbers.ts';
import { figureText } from '../wording/quantities.ts';
import type { HoverText } from './hover-text.ts';

export function hoverEquation(
  place: Place,
  definition: EvaluatedDefinition,
  result: LineResult | undefined,
): HoverText | null {
  const balance = balanceText(definition.tables.find(({ id }) => id === 'elements'));
  // An equation that does not balance has come to nothing but its count of elements.
  const ids = result?.kind === 'equation' ? result.figures : [];
  const [first, ...others] = ids.flatMap((id) => definition.figures.find((figure) => figure.id === id) ?? []);
  const title = first ? figureLine(first) : balance;
  if (title === null) return null;
  return {
    place,
    title,
    origin: first ? balance : null,
    lines: others.map((figure) => ({ label: figure.label, text: figureText(figure) })),
  };
}

/** `Balanced: C 1, Na 2, O 3 on each side`, or each element that differs with both its numbers. */
export function balanceText(elements: Table | undefined): string | null {
  const [element, left, right] = ['element', 'left', 'right'].map((id) =>
    elements?.columns.findIndex((column) => column.id === id),
  );
  const rows = elements?.rows.flatMap((row) => {
    const cells = { element: row[element ?? -1], left: row[left ?? -1], right: row[right ?? -1] };
    return isCounted(cells) ? [cells] : [];
  });
  if (!rows || rows.length === 0) return null;
  const differing = rows.filter(({ left, right }) => formatNumber(left) !== formatNumber(right));
  if (differing.length === 0) {
    return `Balanced: ${rows.map(({ element, left }) => `${element} ${formatNumber(left)}`).join(', ')} on each side`;
  }
  return `Not balanced: ${differing
    .map(
      ({ element, left, right }) =>
        `${element} ${formatNumber(left)} on the left and ${formatNumber(right)} on the right`,
    )
    .join(', ')}`;
}

interface Counted {
  readonly element: string;
  readonly left: number;
  readonly right: number;
}

/** The elements of a blend have no sides; those of an equation have both. */
function isCounted(cells: { readonly [Key in keyof Counted]?: string | number | null | undefined }): cells is Counted {
  return typeof cells.element === 'string' && typeof cells.left === 'number' && typeof cells.right === 'number';
}

function figureLine(figure: Figure): string {
  return `${figureText(figure)}: ${figure.label}`;
}
