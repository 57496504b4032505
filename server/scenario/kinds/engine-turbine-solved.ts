// A gas turbine as it is written, its question to core, and its answer at the values as written and at others; and the engine
// as duties and services use it, on its own fuel and on another, which it then burns at the same turbine inlet temperature (or
// λ), pressures and efficiencies. Reports nothing. Invariant: one input has one answer, and the written one is solved once.

import type { BurnFault } from '../../core/burn/burn.ts';
import { oxidantForLambda } from '../../core/burn/charge.ts';
import { consumptionAtRating, type Band, type Consumption } from '../../core/engine/consumption.ts';
import type { GasTurbineCycle, GasTurbineInput, TurbineFault } from '../../core/engine/turbine/gas-turbine.ts';
import { solveTurbine, type SolvedTurbine } from '../../core/engine/turbine/solved-turbine.ts';
import type { Quantity } from '../../core/quantity/quantity.ts';
import type { BurningEngine, EngineMachine, NotBurning } from '../machinery.ts';
import type { Material } from '../material.ts';
import { foreignSpecies, gasOfOxidant } from '../oxidant-gas.ts';
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

export const turbineKeys = [
  'lambda',
  'turbineInletTemperature',
  'pressureRatio',
  'compressorEfficiency',
  'turbineEfficiency',
  'recuperatorEffectiveness',
  'intercooledTo',
  'reheatedTo',
  'combustorPressureLoss',
  'combustionCompleteness',
  'frozenBelow',
  'mechanicalEfficiency',
  'maximumContinuousRating',
  'idleConsumption',
] as const;
type TurbineKey = (typeof turbineKeys)[number] | 'heatLoss' | 'pressure';

export interface WrittenTurbine {
  readonly streams: PlantStreams;
  readonly own: Readonly<Record<TurbineKey, Quantity | null>>;
}

export interface TurbineAt {
  readonly solved: SolvedTurbine;
  readonly stoichiometricKgPerKg: number;
  readonly lowerJPerKg: number;
  readonly ratedPowerW: number | null;
  /** Fuel energy running without load, W; null where it is not given. */
  readonly idleFuelW: number | null;
}

export interface SolvedTurbineQuestion extends TurbineAt {
  readonly kind: 'solved';
  readonly written: WrittenTurbine;
  readonly question: PlantQuestion<TurbineKey>;
  /** At other values of the question's quantities; null where there is no cycle. */
  readonly at: (values: readonly number[]) => TurbineAt | null;
}

/** A gas turbine on a fuel, or the names of data that it lacks. */
export function writtenTurbine(
  read: EngineRead,
  fuel: Material,
): WrittenTurbine | { readonly missing: readonly string[] } {
  const streams = plantStreams(read, fuel);
  if ('missing' in streams) return streams;
  const foreign = foreignSpecies(streams.oxidant);
  if (foreign.length > 0) return { missing: foreign.map((id) => `${id} as a gas of the charge`) };
  const own: Partial<Record<TurbineKey, Quantity | null>> = {};
  for (const key of turbineKeys) own[key] = read[key]?.value.quantity ?? null;
  // Every key of the table is set above.
  const all = { ...own, heatLoss: read.heatLoss?.value ?? null, pressure: streams.oxidant.pressure };
  return { streams, own: all as WrittenTurbine['own'] };
}

/**
 * The turbine at the values as written, or why there is none. `idleJPerKg` is the heating value of the fuel that its idle
 * consumption is told of, where that is another one.
 */
export function solvedTurbineOf(
  written: WrittenTurbine,
  idleJPerKg: number | null = null,
): SolvedTurbineQuestion | TurbineFault | BurnFault {
  const question = plantQuestion(written.streams, written.own);
  const solveAt = (values: readonly number[]): TurbineAt | TurbineFault | BurnFault => {
    const numbers = question.numbers(values);
    const stoichiometric = oxidantForLambda(numbers.fuel, numbers.oxidant);
    if (typeof stoichiometric !== 'number') return stoichiometric;
    const solved = solveTurbine(inputOf(written, numbers, stoichiometric));
    if (solved.kind === 'fault') return solved;
    return {
      solved,
      stoichiometricKgPerKg: stoichiometric,
      lowerJPerKg: numbers.lowerJPerKg,
      ratedPowerW: numbers.own.maximumContinuousRating,
      idleFuelW: idleFuelOf(numbers.own.idleConsumption, idleJPerKg ?? numbers.lowerJPerKg),
    };
  };
  const own = solveAt(question.quantities.map(({ value }) => value));
  if ('kind' in own) return own;
  return {
    kind: 'solved',
    written,
    question,
    ...own,
    at: answerAt<TurbineAt>(question.quantities, own, (values) => {
      const moved = solveAt(values);
      return 'kind' in moved ? null : moved;
    }),
  };
}

function inputOf(
  { streams }: WrittenTurbine,
  { own, fuel, oxidant, lowerJPerKg }: PlantNumbers<TurbineKey>,
  stoichiometricAirKgPerKg: number,
): GasTurbineInput {
  const { lambda, turbineInletTemperature, intercooledTo, reheatedTo } = own;
  return {
    fuel: {
      elementMol: fuel.elementMolPerKg,
      enthalpyJ: fuel.enthalpyJPerKg ?? NaN,
      referenceEnthalpyJ: fuel.referenceEnthalpyJPerKg ?? NaN,
      lowerHeatingValueJ: lowerJPerKg,
    },
    air: gasOfOxidant(streams.oxidant, 1),
    airTemperatureK: oxidant.temperatureK,
    ambientPressurePa: own.pressure ?? NaN,
    compressor: {
      pressureRatio: own.pressureRatio ?? NaN,
      law: { law: 'isentropic-efficiency', efficiency: own.compressorEfficiency ?? 1 },
      intercooling: intercooledTo === null ? null : { temperatureK: intercooledTo, firstRatio: null },
      intakeLossShare: 0,
    },
    amount:
      lambda !== null
        ? { by: 'mass', airKgPerKg: lambda * stoichiometricAirKgPerKg }
        : { by: 'turbine-inlet', temperatureK: turbineInletTemperature ?? NaN },
    stoichiometricAirKgPerKg,
    recuperatorEffectiveness: own.recuperatorEffectiveness,
    reheat: reheatedTo === null ? null : { temperatureK: reheatedTo, firstRatio: null },
    combustorLossShare: own.combustorPressureLoss ?? 0,
    exhaustLossShare: 0,
    turbineEfficiency: own.turbineEfficiency ?? 1,
    completeness: own.combustionCompleteness ?? 1,
    wallLossShare: own.heatLoss ?? 0,
    frozenBelowK: own.frozenBelow,
    mechanicalEfficiency: own.mechanicalEfficiency ?? 1,
  };
}

/** A reading of every corner: one number where they agree or there is one. */
export function bandOverTurbine({ cautious, cycles }: SolvedTurbine, read: (cycle: GasTurbineCycle) => number): Band {
  const values = cycles.map(read);
  return { value: read(cautious), low: Math.min(...values), high: Math.max(...values) };
}

/** What a duty asks, of a rated power in W; null where the turbine gives no work. */
export function consumptionOfTurbine({ solved, idleFuelW }: TurbineAt, ratedPowerW: number): Consumption | null {
  const brake = bandOverTurbine(solved, ({ brakeEfficiency }) => brakeEfficiency);
  if (!(brake.low > 0)) return null;
  const heatRate = { value: 1 / brake.low, low: 1 / brake.high, high: 1 / brake.low };
  return consumptionAtRating(heatRate, ratedPowerW, idleFuelW);
}

/** What the figures of a gas turbine rest on. */
export function turbineAssumptions({ solved }: TurbineAt): readonly AssumptionId[] {
  const { delivery } = solved.turbine.train;
  return [
    'lower-heating-value-basis',
    'adiabatic-machines',
    'no-cooling-air',
    ...(solved.cycles.length > 1 ? (['turbine-corners'] as const) : []),
    'complete-equilibrium',
    'ideal-gas',
    ...(delivery.pressurePa > densePa ? (['dense-gas'] as const) : []),
  ];
}

const densePa = 1e7;

/** The engine as others use it. */
export function turbineMachine(
  name: string,
  read: EngineRead,
  fuel: Material,
  own: SolvedTurbineQuestion,
): EngineMachine {
  return engineMachine(name, read, fuel, (other) => burningOn(other === fuel ? own : onFuel(read, other, own), read));
}

function onFuel(read: EngineRead, fuel: Material, own: SolvedTurbineQuestion): SolvedTurbineQuestion | NotBurning {
  const written = writtenTurbine(read, fuel);
  if ('missing' in written) return { kind: 'not-burning', missing: written.missing };
  const solved = solvedTurbineOf(written, own.lowerJPerKg);
  return solved.kind === 'solved' ? solved : { kind: 'not-burning', missing: [`a cycle on ${fuel.name}`] };
}

function burningOn(own: SolvedTurbineQuestion | NotBurning, read: EngineRead): BurningEngine | NotBurning {
  if (own.kind === 'not-burning') return own;
  const consumptionOf = (at: TurbineAt | null): Consumption | null =>
    at && at.ratedPowerW !== null ? consumptionOfTurbine(at, at.ratedPowerW) : null;
  const brake = bandOverTurbine(own.solved, ({ brakeEfficiency }) => brakeEfficiency);
  if (!(brake.low > 0)) return { kind: 'not-burning', missing: ['work of the cycle: it takes more than it gives'] };
  return {
    kind: 'burning',
    consumption: consumptionOf(own),
    ratedHeatRate: { value: 1 / brake.low, low: 1 / brake.high, high: 1 / brake.low },
    uncertain: own.question.quantities,
    consumptionAt: (values) => consumptionOf(own.at(values)),
    pilot: null,
    slips: slipsOf(read),
    assumptions: turbineAssumptions(own),
  };
}
