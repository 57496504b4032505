// How much of a fuel's heating value is set free above the temperature of the exhaust, burnt lean to equilibrium with air
// at 25 °C and frozen on the way: the part that an engine can turn into work. Joins materials to core/burn; knows no engine.
// Invariant: null where the fuel's energy, its λ or the state of its exhaust cannot be had.

import { prepareBurn } from '../core/burn/prepare-burn.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { referenceTemperatureK } from '../core/substance/substance.ts';
import { fuelStream, oxidantStream, quantitiesOf, streamNumbers, type UncertainStream } from './burn-streams.ts';
import type { Material } from './material.ts';
import { figuresOfMaterial } from './material-figures.ts';
import type { OxidantStream } from './oxidant-stream.ts';

/** How an engine burns what it is given, for the sake of comparing two fuels. */
export interface LeanBurning {
  readonly oxidant: OxidantStream;
  readonly lambda: number;
  readonly exhaustK: number;
  /** What would form in gas colder than this comes too late for work: hydroxides and carbonates of magnesium above all. */
  readonly frozenBelowK: number;
}

/** Above it the reactions of flames keep pace with an expansion of milliseconds; below, solids form slowly. */
export const workFrozenBelowC = 1000;

/** The share of the lower heating value; may be negative where the exhaust takes away more than is set free. */
export function shareAboveExhaust(
  fuel: Material,
  { oxidant, lambda, exhaustK, frozenBelowK }: LeanBurning,
): number | null {
  const heatingValue = lowerHeatingValueOf(fuel);
  if (!heatingValue) return null;
  const ambient = { ...oxidant, temperature: kelvin(referenceTemperatureK) };
  const burning = prepareBurn({
    fuel: numbers(fuelStream(fuel, kelvin(referenceTemperatureK), oxidant.pressure.value)),
    oxidant: numbers(oxidantStream(ambient)),
    amount: { by: 'lambda', lambda },
    held: { held: 'pressure', pressurePa: oxidant.pressure.value },
    heat: { heat: 'adiabatic', lossShare: 0 },
    lowerHeatingValueJPerKg: heatingValue.value,
    cooledToK: [],
    frozenBelowK,
  });
  const heatJ = burning.kind === 'fault' ? null : burning.heatAbove(exhaustK);
  return typeof heatJ === 'number' ? heatJ / heatingValue.value : null;
}

/** J/kg; null where it cannot be had. */
export function lowerHeatingValueOf(fuel: Material): Quantity | null {
  const found = figuresOfMaterial(fuel).find(({ id }) => id === 'lower-heating-value')?.quantity ?? null;
  return found && found.value > 0 ? found : null;
}

function numbers(stream: UncertainStream): ReturnType<typeof streamNumbers> {
  return streamNumbers(
    stream,
    quantitiesOf(stream).map(({ value }) => value),
  );
}

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
