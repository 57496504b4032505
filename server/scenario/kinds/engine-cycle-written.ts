// From the entries of an engine with pistons, with the defaults of those that are not written, to the engine as core's
// question takes it; and which entries it cannot do without. Reports nothing and solves nothing.
// Invariant: what is missing is named in words, and nothing is guessed.

import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { referenceTemperatureK } from '../../core/substance/substance.ts';
import { fuelStream, oxidantStream } from '../burn-streams.ts';
import { dryAir } from '../dry-air.ts';
import { vapourOf } from '../fuel-vapour.ts';
import { lowerHeatingValueOf } from '../heat-above-exhaust.ts';
import type { Material } from '../material.ts';
import { foreignSpecies } from '../oxidant-gas.ts';
import type { WrittenCycle, WrittenFuel } from './engine-cycle-question.ts';
import type { EngineAsked, EngineRead } from './engine-entries.ts';

/** Of a two-stroke engine with uniflow scavenging, where none is given (common practice). */
export const twoStrokeResidualShare = 0.05;

/** What a cycle cannot do without and is not written. */
export function missingEntries({ read, broken }: EngineAsked): readonly string[] {
  const needed = [
    { key: 'compressionRatio', name: 'compression ratio' },
    { key: 'lambda', name: 'lambda' },
    ...(read.cycle?.value === 'dual'
      ? [{ key: 'maximumFiringPressure', name: 'maximum firing pressure' } as const]
      : []),
  ] as const;
  return needed.filter(({ key }) => !read[key] && !broken.has(key)).map(({ name }) => name);
}

/** An engine as it is written on a fuel, or the names of data that it lacks. */
export function writtenCycle(read: EngineRead, fuel: Material): WrittenCycle | { readonly missing: readonly string[] } {
  const oxidant = read.oxidant?.value ?? dryAir();
  const quantity = (key: QuantityKey): Quantity | null => read[key]?.value.quantity ?? null;
  const intakePressure = quantity('boostPressure') ?? oxidant.pressure;
  const isPremixed = (read.mixture?.value ?? (read.cycle?.value === 'otto' ? 'premixed' : 'injected')) === 'premixed';
  const strokes = read.strokes?.value === 'two' ? 2 : 4;
  const temperature = quantity('fuelTemperature') ?? kelvin(referenceTemperatureK);
  const missing: string[] = [];
  const fuelOf = (material: Material, isVaporised: boolean): WrittenFuel | null => {
    const stream = fuelStream(material, temperature, intakePressure.value);
    const lowerHeatingValue = lowerHeatingValueOf(material);
    missing.push(...stream.missing);
    if (!lowerHeatingValue) missing.push(`the lower heating value of ${material.name}`);
    const vapour = isVaporised ? vapourOf(material) : null;
    if (vapour?.kind === 'missing') missing.push(...vapour.missing);
    if (!lowerHeatingValue || vapour?.kind === 'missing') return null;
    return { material, stream, lowerHeatingValue, vapour: vapour && vapour.parts };
  };
  const main = fuelOf(fuel, isPremixed);
  const pilot = read.pilot ? fuelOf(read.pilot.value.fuel, false) : null;
  const foreign = foreignSpecies(oxidant);
  missing.push(...foreign.map((id) => `${id} as a gas of the charge`));
  const lambda = quantity('lambda');
  const compressionRatio = quantity('compressionRatio');
  const cycle = read.cycle?.value;
  const isPiston = cycle === 'otto' || cycle === 'diesel' || cycle === 'dual';
  if (missing.length > 0 || !main || !lambda || !compressionRatio || !isPiston) {
    return { missing: [...new Set(missing)] };
  }
  return {
    cycle,
    fuel: main,
    pilot: pilot && read.pilot ? { ...pilot, share: read.pilot.value.share, by: read.pilot.value.by } : null,
    oxidant,
    oxidantStream: oxidantStream(oxidant),
    strokes,
    lambda,
    compressionRatio,
    intakeTemperature: quantity('boostTemperature') ?? oxidant.temperature,
    intakePressure,
    exhaustPressure: quantity('exhaustPressure') ?? oxidant.pressure,
    maximumFiringPressure: quantity('maximumFiringPressure'),
    residualShare: quantity('residualGasShare') ?? (strokes === 2 ? quantityOf(twoStrokeResidualShare) : null),
    heatLoss: read.heatLoss?.value ?? quantityOf(0),
    heatLossInCombustion: quantity('heatLossInCombustion') ?? quantityOf(1),
    completeness: quantity('combustionCompleteness') ?? quantityOf(1),
    frozenBelow: quantity('frozenBelow'),
    mechanicalEfficiency: quantity('mechanicalEfficiency') ?? quantityOf(1),
    ratedPower: quantity('maximumContinuousRating'),
  };
}

type QuantityKey =
  | 'lambda'
  | 'compressionRatio'
  | 'boostTemperature'
  | 'boostPressure'
  | 'exhaustPressure'
  | 'fuelTemperature'
  | 'maximumFiringPressure'
  | 'residualGasShare'
  | 'heatLossInCombustion'
  | 'combustionCompleteness'
  | 'frozenBelow'
  | 'mechanicalEfficiency'
  | 'maximumContinuousRating';

function kelvin(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}
