// Tells what an equation comes to: whether it balances, element by element, and its enthalpy per equation and per kilogram
// of its left side. Reads the reaction's `elements` table and figures; counts nothing itself.
import type { EvaluatedDefinition, Figure, LineResult, Place, Table } from '../scenario/scenario.ts';
import { formatNumber } from '../wording/numbers.ts';
import { figureText } from '../wording/quantities.ts';
import type { HoverText } from './hover-text.ts';

export function hoverEquation(
  place: Place,
  definition: EvaluatedDefinition,
  { figures: ids }: Extract<LineResult, { kind: 'equation' }>,
): HoverText {
  const balance = balanceText(definition.tables.find(({ id }) => id === 'elements'));
  const [first, ...others] = ids.flatMap((id) => definition.figures.find((figure) => figure.id === id) ?? []);
  return {
    place,
    title: first ? figureLine(first) : (balance ?? definition.name),
    origin: first ? balance : null,
    lines: others.map((figure) => ({ label: figure.label, text: figureText(figure) })),
  };
}

/** `Balanced: C 1, Na 2, O 3 on each side`, or each element that differs with both its numbers. */
export function balanceText(elements: Table | undefined): string | null {
  const rows = elements?.rows.flatMap(([element, left, right]) =>
    typeof element === 'string' && typeof left === 'number' && typeof right === 'number'
      ? [{ element, left, right }]
      : [],
  );
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

function figureLine(figure: Figure): string {
  return `${figureText(figure)}: ${figure.label}`;
}
