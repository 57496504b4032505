// What gas turbines and steam plants have in common of their question: a fuel and an oxidant as uncertain streams, heating
// values, and numbers of their own by key; all uncertain quantities in one list, and the numbers that any values of them make.
// Knows no machine. Invariant: keys and values stand in one order; a quantity that is not there is NaN among the values and
// null among the numbers.

import type { BurnStream } from '../../core/burn/burn.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { referenceTemperatureK } from '../../core/substance/substance.ts';
import { fuelStream, oxidantStream, quantitiesOf, streamNumbers, type UncertainStream } from '../burn-streams.ts';
import { dryAir } from '../dry-air.ts';
import { lowerHeatingValueOf } from '../heat-above-exhaust.ts';
import type { Material } from '../material.ts';
import { figuresOfMaterial } from '../material-figures.ts';
import type { OxidantStream } from '../oxidant-stream.ts';
import type { EngineRead } from './engine-entries.ts';

/** Fuel and oxidant of a plant as they are written. */
export interface PlantStreams {
  readonly material: Material;
  readonly fuel: UncertainStream;
  readonly lowerHeatingValue: Quantity;
  readonly higherHeatingValue: Quantity | null;
  readonly oxidant: OxidantStream;
  readonly oxidantStream: UncertainStream;
}

/** The streams of an engine on a fuel, or the names of data that they lack. */
export function plantStreams(
  read: EngineRead,
  material: Material,
): PlantStreams | { readonly missing: readonly string[] } {
  const oxidant = read.oxidant?.value ?? dryAir();
  const temperature = read.fuelTemperature?.value.quantity ?? kelvin(referenceTemperatureK);
  const fuel = fuelStream(material, temperature, oxidant.pressure.value);
  const air = oxidantStream(oxidant);
  const lowerHeatingValue = lowerHeatingValueOf(material);
  const missing = [
    ...fuel.missing,
    ...air.missing,
    ...(lowerHeatingValue ? [] : [`the lower heating value of ${material.name}`]),
  ];
  if (missing.length > 0 || !lowerHeatingValue) return { missing: [...new Set(missing)] };
  const higher = figuresOfMaterial(material).find(({ id }) => id === 'higher-heating-value')?.quantity ?? null;
  return { material, fuel, lowerHeatingValue, higherHeatingValue: higher, oxidant, oxidantStream: air };
}

export interface PlantNumbers<Key extends string> {
  /** In SI; null where not given. */
  readonly own: Readonly<Record<Key, number | null>>;
  readonly lowerJPerKg: number;
  readonly higherJPerKg: number | null;
  readonly fuel: BurnStream;
  readonly oxidant: BurnStream;
}

export interface PlantQuestion<Key extends string> {
  readonly quantities: readonly Quantity[];
  /** Out of values in the order of the quantities. */
  readonly numbers: (values: readonly number[]) => PlantNumbers<Key>;
}

export function plantQuestion<Key extends string>(
  { fuel, lowerHeatingValue, higherHeatingValue, oxidantStream: air }: PlantStreams,
  own: Readonly<Record<Key, Quantity | null>>,
): PlantQuestion<Key> {
  const unknown = quantityOf(NaN);
  const keys = Object.keys(own) as Key[];
  const groups: readonly (readonly Quantity[])[] = [
    keys.map((key) => own[key] ?? unknown),
    [lowerHeatingValue, higherHeatingValue ?? unknown],
    quantitiesOf(fuel),
    quantitiesOf(air),
  ];
  return {
    quantities: groups.flat(),
    numbers(values) {
      let from = 0;
      const [ofOwn = [], [lowerJPerKg = NaN, higherJPerKg = NaN] = [], ofFuel = [], ofAir = []] = groups.map(
        ({ length }) => values.slice(from, (from += length)),
      );
      const orNull = (value: number | undefined): number | null =>
        value === undefined || Number.isNaN(value) ? null : value;
      // Keys and values stand in one order.
      const byKey = Object.fromEntries(keys.map((key, index) => [key, orNull(ofOwn[index])]));
      return {
        own: byKey as Record<Key, number | null>,
        lowerJPerKg,
        higherJPerKg: orNull(higherJPerKg),
        fuel: streamNumbers(fuel, ofFuel),
        oxidant: streamNumbers(air, ofAir),
      };
    },
  };
}

/** W of fuel running without load, out of kg/s and J/kg; null where it is not given. */
export function idleFuelOf(idleKgPerS: number | null, lowerJPerKg: number): number | null {
  return idleKgPerS === null ? null : idleKgPerS * lowerJPerKg;
}

export function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
