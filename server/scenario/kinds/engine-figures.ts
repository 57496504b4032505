// Every figure an engine may have, whichever way it is worked out: each id once. Works nothing out.
// Invariant: an id means one thing and has one unit for all ways; where ways word it differently, the first stands for all.

import { consumptionFigures } from '../engine-consumption.ts';
import type { FigureRow } from '../material-figures.ts';
import { pistonFigures } from './engine-cycle-figures.ts';
import { steamOwnFigures } from './engine-steam-figures.ts';
import { turbineOwnFigures } from './engine-turbine-figures.ts';

export const engineFigures: readonly FigureRow[] = [
  ...new Map(
    [...steamOwnFigures, ...turbineOwnFigures, ...pistonFigures, ...consumptionFigures].map(
      (row): readonly [string, FigureRow] => [row.id, row],
    ),
  ).values(),
].reverse();
