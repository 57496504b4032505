// An answer to a question of many quantities at any values of them: at the values as written the one that is there already.
// Knows no question. Invariant: one input has one answer.

import type { Quantity } from '../../core/quantity/quantity.ts';

export function answerAt<Answer>(
  quantities: readonly Quantity[],
  written: Answer,
  solve: (values: readonly number[]) => Answer | null,
): (values: readonly number[]) => Answer | null {
  const isWritten = (values: readonly number[]): boolean =>
    values.every((value, index) => Object.is(value, quantities[index]?.value));
  return (values) => (isWritten(values) ? written : solve(values));
}
