// The figures of a substance that are simply given: what its card says beyond what is worked out for every material, such
// as its heat capacity or flash point. Works nothing out. Invariant: ids and units are the contract, as for all figures.

import type { FigureRow } from './material-figures.ts';
import type { CardProperty, Figure, MaterialCard } from './scenario.ts';

/** Every figure a card may give. */
export const givenFigureRows: readonly FigureRow[] = (
  [
    ['entropy', 'Entropy at 25 °C', 'J/(mol K)'],
    ['heat-capacity', 'Heat capacity', 'kJ/(kg K)'],
    ['melting-point', 'Melting point', 'K'],
    ['boiling-point', 'Boiling point at 1 atm', 'K'],
    ['sublimation-point', 'Sublimation point at 1 atm', 'K'],
    ['decomposition-point', 'Decomposition point', 'K'],
    ['flash-point', 'Flash point', 'K'],
    ['autoignition-temperature', 'Autoignition temperature', 'K'],
    ['lower-flammable-limit', 'Lower flammable limit, by volume in air', '1'],
    ['upper-flammable-limit', 'Upper flammable limit, by volume in air', '1'],
  ] as const
).map(([id, label, unit]) => ({ id, label, unit, method: 'as-given' }));

/** The given figures of a card, in the order of the rows. */
export function givenFigures({ properties }: MaterialCard): readonly Figure[] {
  return givenFigureRows.flatMap((row) => {
    const property = properties.find(({ id }) => id === row.id);
    return property ? [figureOf(row, property)] : [];
  });
}

function figureOf({ id, label, unit, method }: FigureRow, { quantity, source, condition }: CardProperty): Figure {
  const inputs = condition === '' ? [] : [{ label: condition, quantity, unit }];
  return { id, label, quantity, unit, working: { method, inputs, sources: [source], assumptions: [] } };
}
