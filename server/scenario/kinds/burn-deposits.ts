// What the condensed products of a state would do on a wall: where their salts begin to melt, stick and run off, as one
// mixed deposit. Joins states to core/equilibrium/melts.ts. Knows no walls but their temperatures.
// Invariant: a wall is looked at in the products' equilibrium at its own temperature, as what meets it is cooled to that.

import type { Burn, MatterState } from '../../core/burn/burn.ts';
import { productRows } from '../../core/burn/products.ts';
import { saltMelting, type SaltMelting } from '../../core/equilibrium/melts.ts';
import type { TemperatureRange } from '../burn-readers.ts';

/** Melting of the condensed products of a state as one deposit; undefined without salts that are known. */
export function depositOf(state: MatterState): SaltMelting | undefined {
  const { candidates, amountsMol } = state;
  const condensed = candidates.phases
    .map(({ formula }, phase) => ({ formula, mol: amountsMol[phase] ?? 0 }))
    .filter(({ formula, mol }) => formula.phase !== 'g' && formula.text !== 'H2O' && mol > 0);
  return condensed.length === 0 ? undefined : saltMelting(condensed);
}

/** Where walls of a range are met by a sticky deposit. */
export interface StickyWalls {
  /** Of the walls looked at, the coldest and the hottest on which it sticks. */
  readonly fromK: number;
  readonly toK: number;
  /** On the coldest of them. */
  readonly melting: SaltMelting;
  /** The most of it by mass, at most three. */
  readonly leading: readonly string[];
}

/** Walls looked at: both ends and what lies evenly between them. */
const mostWalls = 7;

/** Null where nothing that is there sticks. */
export function stickyWalls(burn: Burn, { from, to }: TemperatureRange): StickyWalls | null {
  const count = from.value === to.value ? 1 : mostWalls;
  const walls = Array.from(
    { length: count },
    (_, index) => from.value + (index * (to.value - from.value)) / Math.max(1, count - 1),
  );
  const sticky = walls.flatMap((wallK) => {
    const state = burn.at(wallK);
    const melting = state.kind === 'none' ? undefined : depositOf(state);
    if (state.kind === 'none' || !melting || wallK < (melting.stickyK ?? melting.firstMeltingK)) return [];
    const leading = productRows(state)
      .filter(({ isGas }) => !isGas)
      .slice(0, 3)
      .map(({ id }) => id);
    return [{ wallK, melting, leading }];
  });
  const [coldest] = sticky;
  const hottest = sticky.at(-1);
  if (!coldest || !hottest) return null;
  const { melting, leading, wallK } = coldest;
  // Between the last wall that does not stick and the first that does, the deposit's own limit is known better.
  const below = walls[walls.indexOf(wallK) - 1] ?? wallK;
  const fromK = Math.min(wallK, Math.max(below, melting.stickyK ?? melting.firstMeltingK));
  return { fromK, toK: hottest.wallK, melting, leading };
}
