// The condensed products of a state as one mixed deposit: where its salts begin to melt, stick and run off.
// Joins states to equilibrium/melts.ts. Knows no surface. Invariant: water is no part of a deposit.

import { saltMelting, type SaltMelting } from '../equilibrium/melts.ts';
import type { MatterState } from './burn.ts';

/** Melting of the condensed products; undefined without salts that are known. */
export function depositOf({ candidates, amountsMol }: MatterState): SaltMelting | undefined {
  const condensed = candidates.phases
    .map(({ formula }, phase) => ({ formula, mol: amountsMol[phase] ?? 0 }))
    .filter(({ formula, mol }) => formula.phase !== 'g' && formula.text !== 'H2O' && mol > 0);
  return condensed.length === 0 ? undefined : saltMelting(condensed);
}
