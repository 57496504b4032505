// From the entries of an engine with pistons to what core is asked: its uncertain quantities in one list, and the cycle that
// any values of them make. Knows no states and reports nothing.
// Invariant: everything uncertain that a figure rests on is in the list; a fuel's energy, elements and heating value stand
// beside each other there, so that what they have in common is kept.

import { oxidantForLambda } from '../../core/burn/charge.ts';
import type { BurnFault, BurnStream } from '../../core/burn/burn.ts';
import { frozenMixture, type MixturePart } from '../../core/engine/frozen-mixture.ts';
import type { EngineFuel, HeatRelease, ReciprocatingInput } from '../../core/engine/reciprocating.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import { quantitiesOf, streamNumbers, type UncertainStream } from '../burn-streams.ts';
import type { PilotEntry } from '../machinery.ts';
import type { Material } from '../material.ts';
import { gasOfOxidant } from '../oxidant-gas.ts';
import type { OxidantStream } from '../oxidant-stream.ts';

/** A fuel as it comes in. */
export interface WrittenFuel {
  readonly material: Material;
  readonly stream: UncertainStream;
  readonly lowerHeatingValue: Quantity;
  /** Of 1 kg, where it is in the fresh gas; null where it is injected. */
  readonly vapour: readonly MixturePart[] | null;
}

/** An engine with pistons as it is written, each quantity with its default taken. */
export interface WrittenCycle {
  readonly cycle: 'otto' | 'diesel' | 'dual';
  readonly fuel: WrittenFuel;
  readonly pilot: (WrittenFuel & Pick<PilotEntry, 'share' | 'by'>) | null;
  readonly oxidant: OxidantStream;
  readonly oxidantStream: UncertainStream;
  readonly strokes: 2 | 4;
  readonly lambda: Quantity;
  readonly compressionRatio: Quantity;
  readonly intakeTemperature: Quantity;
  readonly intakePressure: Quantity;
  readonly exhaustPressure: Quantity;
  /** null: none. */
  readonly maximumFiringPressure: Quantity | null;
  /** null: what fills the smallest volume. */
  readonly residualShare: Quantity | null;
  readonly heatLoss: Quantity;
  readonly heatLossInCombustion: Quantity;
  readonly completeness: Quantity;
  readonly frozenBelow: Quantity | null;
  readonly mechanicalEfficiency: Quantity;
  readonly ratedPower: Quantity | null;
}

export interface CycleQuestion {
  readonly quantities: readonly Quantity[];
  /** The cycle of such values, in the order of the quantities. */
  readonly input: (values: readonly number[]) => CycleInput | BurnFault;
}

export interface CycleInput {
  readonly kind: 'input';
  readonly reciprocating: ReciprocatingInput;
  /** kg of fresh gas per kg of fuel. */
  readonly oxidantKgPerKg: number;
  /** Of 1 kg of all fuel. */
  readonly lowerHeatingValueJPerKg: number;
  readonly pilotMassShare: number;
  readonly ratedPowerW: number | null;
}

const scalarKeys = [
  'lambda',
  'compressionRatio',
  'intakeTemperature',
  'intakePressure',
  'exhaustPressure',
  'maximumFiringPressure',
  'residualShare',
  'heatLoss',
  'heatLossInCombustion',
  'completeness',
  'frozenBelow',
  'mechanicalEfficiency',
  'ratedPower',
] as const satisfies readonly (keyof WrittenCycle)[];

type Scalars = Readonly<Record<(typeof scalarKeys)[number], number>>;

/** The question a written cycle asks. */
export function questionOfCycle(written: WrittenCycle): CycleQuestion {
  const { fuel, pilot, oxidantStream } = written;
  const unknown = quantityOf(NaN);
  const groups: readonly (readonly Quantity[])[] = [
    scalarKeys.map((key) => written[key] ?? unknown),
    [fuel.lowerHeatingValue, ...quantitiesOf(fuel.stream)],
    pilot ? [pilot.share, pilot.lowerHeatingValue, ...quantitiesOf(pilot.stream)] : [],
    quantitiesOf(oxidantStream),
  ];
  return {
    quantities: groups.flat(),
    input(values) {
      let from = 0;
      const [ofScalars = [], ofFuel = [], ofPilot = [], ofOxidant = []] = groups.map(({ length }) =>
        values.slice(from, (from += length)),
      );
      // Keys and values stand in one order.
      const scalars = Object.fromEntries(scalarKeys.map((key, index) => [key, ofScalars[index] ?? NaN])) as Scalars;
      return inputOf(written, scalars, ofFuel, ofPilot, streamNumbers(oxidantStream, ofOxidant));
    },
  };
}

function inputOf(
  written: WrittenCycle,
  scalars: Scalars,
  [lowerJPerKg = NaN, ...fuelValues]: readonly number[],
  [pilotShare = 0, pilotLowerJPerKg = NaN, ...pilotValues]: readonly number[],
  oxidant: BurnStream,
): CycleInput | BurnFault {
  const { fuel, pilot } = written;
  const main = streamNumbers(fuel.stream, fuelValues);
  const pilotMassShare = pilot === null ? 0 : massShareOf(pilot.by, pilotShare, lowerJPerKg, pilotLowerJPerKg);
  const fuels = [
    engineFuel(fuel, main, lowerJPerKg, 1 - pilotMassShare),
    ...(pilot && pilotMassShare > 0
      ? [engineFuel(pilot, streamNumbers(pilot.stream, pilotValues), pilotLowerJPerKg, pilotMassShare)]
      : []),
  ];
  const needed: BurnStream = { ...main, elementMolPerKg: summed(fuels) };
  const ratio = oxidantForLambda(needed, oxidant);
  if (typeof ratio !== 'number') return ratio;
  const oxidantKgPerKg = scalars.lambda * ratio;
  if (!(oxidantKgPerKg > 0) || !Number.isFinite(oxidantKgPerKg)) {
    return { kind: 'fault', reason: 'not-positive', of: 'whole' };
  }
  return {
    kind: 'input',
    oxidantKgPerKg,
    lowerHeatingValueJPerKg: fuels.reduce((sum, { lowerHeatingValueJ }) => sum + lowerHeatingValueJ, 0),
    pilotMassShare,
    ratedPowerW: Number.isNaN(scalars.ratedPower) ? null : scalars.ratedPower,
    reciprocating: {
      compressionRatio: scalars.compressionRatio,
      compression: { law: 'isentropic' },
      heatRelease: heatReleaseOf(written.cycle, scalars.maximumFiringPressure),
      fuels,
      freshGas: gasOfOxidant(written.oxidant, oxidantKgPerKg),
      intakeTemperatureK: scalars.intakeTemperature,
      intakePressurePa: scalars.intakePressure,
      exhaustPressurePa: scalars.exhaustPressure,
      strokes: written.strokes,
      residual: Number.isNaN(scalars.residualShare)
        ? { by: 'clearance' }
        : { by: 'share', share: scalars.residualShare },
      completeness: scalars.completeness,
      wallLossShare: scalars.heatLoss,
      wallLossInCombustion: scalars.heatLossInCombustion,
      frozenBelowK: Number.isNaN(scalars.frozenBelow) ? null : scalars.frozenBelow,
      mechanicalEfficiency: scalars.mechanicalEfficiency,
    },
  };
}

/** Mass share of the pilot where its share is one of energy, on lower heating values. */
function massShareOf(by: PilotEntry['by'], share: number, mainJPerKg: number, pilotJPerKg: number): number {
  return by === 'mass' ? share : (share * mainJPerKg) / (pilotJPerKg * (1 - share) + share * mainJPerKg);
}

function engineFuel({ vapour }: WrittenFuel, stream: BurnStream, lowerJPerKg: number, massKg: number): EngineFuel {
  return {
    massKg,
    elementMol: new Map([...stream.elementMolPerKg].map(([symbol, mol]) => [symbol, massKg * mol])),
    enthalpyJ: massKg * (stream.enthalpyJPerKg ?? NaN),
    referenceEnthalpyJ: massKg * (stream.referenceEnthalpyJPerKg ?? NaN),
    lowerHeatingValueJ: massKg * lowerJPerKg,
    vapour: vapour && frozenMixture(vapour.map(({ species, mol }) => ({ species, mol: massKg * mol }))),
  };
}

function summed(fuels: readonly EngineFuel[]): ReadonlyMap<string, number> {
  const sums = new Map<string, number>();
  for (const { elementMol } of fuels) {
    for (const [symbol, mol] of elementMol) sums.set(symbol, (sums.get(symbol) ?? 0) + mol);
  }
  return sums;
}

function heatReleaseOf(cycle: WrittenCycle['cycle'], maximumPressurePa: number): HeatRelease {
  if (cycle === 'otto') return { at: 'volume' };
  return cycle === 'diesel' ? { at: 'pressure' } : { at: 'limited', maximumPressurePa };
}
