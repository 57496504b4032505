// A fired steam plant as it is written, its question to core, and its answer at the values as written and at others; and the
// engine as duties and services use it, on its own fuel and on another, which its boiler then burns at the same λ and exhaust
// temperature. Reports nothing. Invariant: one input has one answer, and the written one is solved once.

import type { Consumption } from '../../core/engine/consumption.ts';
import { consumptionAtRating } from '../../core/engine/consumption.ts';
import { steamPlant } from '../../core/engine/steam/steam-plant.ts';
import type { NoSteamPlant, SteamPlant, SteamPlantInput } from '../../core/engine/steam/steam-plant.ts';
import type { Quantity } from '../../core/quantity/quantity.ts';
import type { BurningEngine, EngineMachine, NotBurning } from '../machinery.ts';
import type { Material } from '../material.ts';
import type { AssumptionId } from '../working.ts';
import type { EngineRead } from './engine-entries.ts';
import { engineMachine, slipsOf } from './engine-machine.ts';
import { answerAt } from './kept-answer.ts';
import {
  idleFuelOf,
  plantQuestion,
  plantStreams,
  type PlantNumbers,
  type PlantQuestion,
  type PlantStreams,
} from './plant-question.ts';

export const steamKeys = [
  'lambda',
  'exhaustTemperature',
  'boilerPressure',
  'steamTemperature',
  'condenserPressure',
  'reheatPressure',
  'reheatedTo',
  'feedwaterTemperature',
  'turbineEfficiency',
  'pumpEfficiency',
  'combustionCompleteness',
  'frozenBelow',
  'mechanicalEfficiency',
  'maximumContinuousRating',
  'idleConsumption',
] as const;
type SteamKey = (typeof steamKeys)[number] | 'heatLoss' | 'pressure';

export interface WrittenSteam {
  readonly streams: PlantStreams;
  readonly own: Readonly<Record<SteamKey, Quantity | null>>;
}

export interface SteamAt {
  readonly plant: SteamPlant;
  readonly lowerJPerKg: number;
  readonly higherJPerKg: number | null;
  readonly ratedPowerW: number | null;
  /** Fuel energy running without load, W; null where it is not given. */
  readonly idleFuelW: number | null;
}

export interface SolvedSteamQuestion extends SteamAt {
  readonly kind: 'solved';
  readonly written: WrittenSteam;
  readonly question: PlantQuestion<SteamKey>;
  /** At other values of the question's quantities; null where there is no plant. */
  readonly at: (values: readonly number[]) => SteamAt | null;
}

/** A steam plant on a fuel, or the names of data that it lacks. */
export function writtenSteam(read: EngineRead, fuel: Material): WrittenSteam | { readonly missing: readonly string[] } {
  const streams = plantStreams(read, fuel);
  if ('missing' in streams) return streams;
  const own: Partial<Record<SteamKey, Quantity | null>> = {};
  for (const key of steamKeys) own[key] = read[key]?.value.quantity ?? null;
  // Every key of the table is set above.
  const all = { ...own, heatLoss: read.heatLoss?.value ?? null, pressure: streams.oxidant.pressure };
  return { streams, own: all as WrittenSteam['own'] };
}

/**
 * The plant at the values as written, or why there is none. `idleJPerKg` is the heating value of the fuel that its idle
 * consumption is told of, where that is another one.
 */
export function solvedSteamOf(
  written: WrittenSteam,
  idleJPerKg: number | null = null,
): SolvedSteamQuestion | NoSteamPlant {
  const question = plantQuestion(written.streams, written.own);
  const solveAt = (values: readonly number[]): SteamAt | NoSteamPlant => {
    const numbers = question.numbers(values);
    const plant = steamPlant(inputOf(numbers));
    if (plant.kind === 'no-plant') return plant;
    const { lowerJPerKg, higherJPerKg, own } = numbers;
    const idleFuelW = idleFuelOf(own.idleConsumption, idleJPerKg ?? lowerJPerKg);
    return { plant, lowerJPerKg, higherJPerKg, ratedPowerW: own.maximumContinuousRating, idleFuelW };
  };
  const own = solveAt(question.quantities.map(({ value }) => value));
  if ('kind' in own) return own;
  return {
    kind: 'solved',
    written,
    question,
    ...own,
    at: answerAt<SteamAt>(question.quantities, own, (values) => {
      const moved = solveAt(values);
      return 'kind' in moved ? null : moved;
    }),
  };
}

function inputOf({ own, fuel, oxidant, lowerJPerKg }: PlantNumbers<SteamKey>): SteamPlantInput {
  const { reheatPressure, reheatedTo } = own;
  return {
    boiler: {
      burn: {
        fuel,
        oxidant,
        amount: { by: 'lambda', lambda: own.lambda ?? NaN },
        ...(own.frozenBelow === null ? {} : { frozenBelowK: own.frozenBelow }),
      },
      pressurePa: own.pressure ?? NaN,
      lowerHeatingValueJPerKg: lowerJPerKg,
      stackTemperatureK: own.exhaustTemperature ?? NaN,
      completeness: own.combustionCompleteness ?? 1,
      wallLossShare: own.heatLoss ?? 0,
    },
    cycle: {
      boilerPressurePa: own.boilerPressure ?? NaN,
      steamTemperatureK: own.steamTemperature,
      condenserPressurePa: own.condenserPressure ?? NaN,
      reheat:
        reheatPressure === null || reheatedTo === null
          ? null
          : { pressurePa: reheatPressure, temperatureK: reheatedTo },
      feedwaterTemperatureK: own.feedwaterTemperature,
      heaterCount: 1,
      turbineEfficiency: own.turbineEfficiency ?? 1,
      efficiencyOf: 'section',
      pumpEfficiency: own.pumpEfficiency ?? 1,
    },
    mechanicalEfficiency: own.mechanicalEfficiency ?? 1,
  };
}

/** What a duty asks, of a rated power in W; null where the plant gives no work. */
export function consumptionOfSteam({ plant, idleFuelW }: SteamAt, ratedPowerW: number): Consumption | null {
  if (!(plant.brakeEfficiency > 0)) return null;
  const heatRate = 1 / plant.brakeEfficiency;
  return consumptionAtRating({ value: heatRate, low: heatRate, high: heatRate }, ratedPowerW, idleFuelW);
}

/** What the figures of a steam plant rest on. */
export function steamAssumptions({ own }: WrittenSteam): readonly AssumptionId[] {
  return [
    'lower-heating-value-basis',
    'adiabatic-machines',
    'no-pressure-loss-in-pipes',
    ...(own.feedwaterTemperature ? (['mixing-heater'] as const) : []),
    'losses-before-steam',
    'complete-equilibrium',
    'ideal-gas',
  ];
}

/** The engine as others use it. */
export function steamMachine(name: string, read: EngineRead, fuel: Material, own: SolvedSteamQuestion): EngineMachine {
  return engineMachine(name, read, fuel, (other) => burningOn(other === fuel ? own : onFuel(read, other, own), read));
}

function onFuel(read: EngineRead, fuel: Material, own: SolvedSteamQuestion): SolvedSteamQuestion | NotBurning {
  const written = writtenSteam(read, fuel);
  if ('missing' in written) return { kind: 'not-burning', missing: written.missing };
  const solved = solvedSteamOf(written, own.lowerJPerKg);
  return solved.kind === 'solved' ? solved : { kind: 'not-burning', missing: [`a boiler on ${fuel.name}`] };
}

function burningOn(own: SolvedSteamQuestion | NotBurning, read: EngineRead): BurningEngine | NotBurning {
  if (own.kind === 'not-burning') return own;
  const consumptionOf = (at: SteamAt | null): Consumption | null =>
    at && at.ratedPowerW !== null ? consumptionOfSteam(at, at.ratedPowerW) : null;
  const { brakeEfficiency } = own.plant;
  if (!(brakeEfficiency > 0)) return { kind: 'not-burning', missing: ['work of the plant'] };
  const heatRate = 1 / brakeEfficiency;
  return {
    kind: 'burning',
    consumption: consumptionOf(own),
    ratedHeatRate: { value: heatRate, low: heatRate, high: heatRate },
    uncertain: own.question.quantities,
    consumptionAt: (values) => consumptionOf(own.at(values)),
    pilot: null,
    slips: slipsOf(read),
    assumptions: steamAssumptions(own.written),
  };
}
