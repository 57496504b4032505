// What a duty comes to: hours, distance, work, loads, and the fuel energy its own engines take for it, with the tables of its
// legs, engines and loads. Reads plans that core worked out; reports nothing.
// Invariant: the mean consumption is the sum of fuel over the sum of work, never a mean of consumptions (ISO 8178-4).

import { loadHistogram, sumsOf, type PlannedLeg } from '../core/duty/plan.ts';
import type { TestCycle } from '../core/duty/test-cycles.ts';
import { loadsOfModes } from '../core/duty/test-cycles.ts';
import { fuelPowerAt, type Band, type Consumption } from '../core/engine/consumption.ts';
import { total } from '../core/quantity/total.ts';
import { finiteCell } from './finite-cell.ts';
import { lowerHeatingValueOf } from './heat-above-exhaust.ts';
import type { BurningEngine, DutyMachine, PilotEntry } from './machinery.ts';
import type { Material } from './material.ts';
import type { FigureRow } from './material-figures.ts';
import { pilotShareIn } from './pilot-share.ts';
import { propagatedFigures, type FigureValues } from './propagated-figures.ts';
import { QuantityList, type NumberIn } from './quantity-list.ts';
import type { Figure, Table } from './scenario.ts';
import type { Working } from './working.ts';

/** Ids and units are the contract: they never change. */
export const dutyFigures = [
  { id: 'hours', label: 'Time of the duty', unit: 'h', method: 'duty-sum' },
  { id: 'distance', label: 'Distance run', unit: 'nmi', method: 'duty-sum' },
  { id: 'energy', label: 'Brake energy of all engines', unit: 'kWh', method: 'duty-sum' },
  { id: 'mean-power', label: 'Mean brake power over the duty', unit: 'kW', method: 'duty-sum' },
  {
    id: 'weighted-load',
    label: 'Mean load of the running engines, by time',
    unit: '1',
    method: 'weighted-mode-load',
  },
  { id: 'shore-energy', label: 'Energy from the shore', unit: 'kWh', method: 'duty-sum' },
  { id: 'boiler-heat', label: 'Heat from the boiler', unit: 'kWh', method: 'duty-sum' },
  {
    id: 'specific-consumption',
    label: 'Specific energy consumption over the duty, on the lower heating value',
    unit: 'MJ/kWh',
    method: 'service-fuel',
  },
  {
    id: 'specific-fuel-consumption',
    label: 'Specific fuel consumption over the duty',
    unit: 'g/kWh',
    method: 'service-fuel',
  },
] as const satisfies readonly FigureRow[];

/** The figures of a duty; `workingOf` tells how one came about. */
export function figuresOfDuty(duty: DutyMachine, workingOf: (row: FigureRow) => Working): readonly Figure[] {
  const list = new QuantityList();
  const own = list.addAll(duty.uncertain);
  const engines = duty.engines.map(({ machine }) => {
    const burning = machine?.burning(machine.fuel);
    const on = burning?.kind === 'burning' ? burning : null;
    return {
      consumptionAt: on && consumptionIn(on, list),
      heatingValue: heatingValueIn(machine?.fuel ?? null, on?.pilot ?? null, list),
    };
  });
  return propagatedFigures(
    dutyFigures,
    list.quantities,
    (values) => {
      const plan = duty.planAt(own(values));
      const rated = duty.ratedPowerAt(own(values));
      return {
        ...planValues(plan, rated),
        ...fuelValues(
          plan,
          engines.map(({ consumptionAt, heatingValue }) => ({
            consumption: consumptionAt?.(values) ?? null,
            heatingValue: heatingValue(values),
          })),
        ),
      };
    },
    workingOf,
  );
}

function consumptionIn(on: BurningEngine, list: QuantityList): (values: readonly number[]) => Consumption | null {
  const own = list.addAll(on.uncertain);
  return (values) => on.consumptionAt(own(values));
}

/** J per kg of all that is burnt: with a pilot of another fuel, each by its part of the mass. */
function heatingValueIn(fuel: Material | null, pilot: PilotEntry | null, list: QuantityList): NumberIn {
  const main = list.add(fuel && lowerHeatingValueOf(fuel));
  if (!pilot || pilot.fuel.name === fuel?.name) return main;
  const [share, own] = [pilotShareIn(pilot, list), list.add(lowerHeatingValueOf(pilot.fuel))];
  return (values) => {
    const energyShare = share(values, main(values), own(values));
    return 1 / ((1 - energyShare) / main(values) + energyShare / own(values));
  };
}

function planValues(plan: readonly PlannedLeg[], rated: readonly number[]): FigureValues {
  const timeS = total(plan.map((leg) => leg.timeS));
  const { energyJ, weightedLoad } = sumsOf(plan, rated);
  const distances = plan.flatMap(({ distanceM }) => (distanceM === null ? [] : [distanceM]));
  const [shoreJ, boilerJ] = [total(plan.map((leg) => leg.shoreJ)), total(plan.flatMap((leg) => leg.boilerJ))];
  return {
    hours: timeS,
    distance: distances.length > 0 ? total(distances) : undefined,
    energy: energyJ,
    'mean-power': energyJ / timeS,
    'weighted-load': weightedLoad,
    'shore-energy': shoreJ > 0 ? shoreJ : undefined,
    'boiler-heat': boilerJ > 0 ? boilerJ : undefined,
  };
}

function fuelValues(
  plan: readonly PlannedLeg[],
  engines: readonly { readonly consumption: Consumption | null; readonly heatingValue: number }[],
): FigureValues {
  let [fuelJ, fuelKg, workJ] = [nothing, nothing, 0];
  for (const { demands } of plan) {
    for (const { engine, timeS, powerW } of demands) {
      const { consumption, heatingValue } = engines[engine] ?? { consumption: null, heatingValue: NaN };
      const fuelW = consumption && fuelPowerAt(consumption, powerW).fuelW;
      if (!fuelW) return {};
      fuelJ = plus(fuelJ, fuelW, timeS);
      fuelKg = plus(fuelKg, fuelW, timeS / heatingValue);
      workJ += powerW * timeS;
    }
  }
  // Work without end would take nothing per work.
  if (!(workJ > 0) || !Number.isFinite(workJ) || !Number.isFinite(fuelJ.value)) return {};
  return {
    'specific-consumption': plus(nothing, fuelJ, 1 / workJ),
    'specific-fuel-consumption': plus(nothing, fuelKg, 1 / workJ),
  };
}

/** The loads of a test cycle's modes, weighted: known without an engine. */
export function weightedLoadOf(cycle: TestCycle, intermediate: number): number {
  const loads = loadsOfModes(cycle, intermediate);
  return total(cycle.modes.map(({ weight }, index) => weight * (loads[index] ?? NaN)));
}

export function dutyTables(duty: DutyMachine): readonly Table[] {
  const values = duty.uncertain.map(({ value }) => value);
  const plan = duty.planAt(values);
  const rated = duty.ratedPowerAt(values);
  const nameOf = (engine: number): string => duty.engines[engine]?.name ?? '';
  return [legTable(duty, plan, rated, nameOf), engineTable(duty, plan, rated), histogramTable(plan, rated, nameOf)];
}

function legTable(
  duty: DutyMachine,
  plan: readonly PlannedLeg[],
  rated: readonly number[],
  nameOf: (engine: number) => string,
): Table {
  return {
    id: 'legs',
    label: 'Legs, by engine',
    columns: [
      { id: 'leg', label: 'Leg', unit: null },
      { id: 'engine', label: 'Engine', unit: null },
      { id: 'hours', label: 'Time', unit: 'h' },
      { id: 'speed', label: 'Speed', unit: 'kn' },
      { id: 'power', label: 'Power', unit: 'kW' },
      { id: 'load', label: 'Load', unit: '1' },
      { id: 'energy', label: 'Work', unit: 'kWh' },
    ],
    rows: plan.flatMap((leg, index) => {
      const speed = leg.speedMPerS === null ? null : finiteCell(leg.speedMPerS / knotMPerS);
      const ofEngines = [...new Set(leg.demands.map(({ engine }) => engine))].map((engine) => {
        const { runningS, energyJ, weightedLoad } = sumsOf([leg], rated, engine);
        return [
          duty.legNames[index] ?? '',
          nameOf(engine),
          finiteCell(runningS / 3600),
          speed,
          finiteCell(energyJ / runningS / 1e3),
          finiteCell(weightedLoad),
          finiteCell(energyJ / kwhJ),
        ];
      });
      const shore = [duty.legNames[index] ?? '', 'shore', finiteCell(leg.timeS / 3600), null];
      const fromShore = [finiteCell(leg.shoreJ / leg.timeS / 1e3), null, finiteCell(leg.shoreJ / kwhJ)];
      return [...ofEngines, ...(leg.shoreJ > 0 ? [[...shore, ...fromShore]] : [])];
    }),
  };
}

function engineTable(duty: DutyMachine, plan: readonly PlannedLeg[], rated: readonly number[]): Table {
  return {
    id: 'engines',
    label: 'Engines over the duty',
    columns: [
      { id: 'engine', label: 'Engine', unit: null },
      { id: 'hours', label: 'Running', unit: 'h' },
      { id: 'energy', label: 'Work', unit: 'kWh' },
      { id: 'weighted-load', label: 'Mean load', unit: '1' },
    ],
    rows: duty.engines.map(({ name }, engine) => {
      const { runningS, energyJ, weightedLoad } = sumsOf(plan, rated, engine);
      return [name, finiteCell(runningS / 3600), finiteCell(energyJ / kwhJ), finiteCell(weightedLoad)];
    }),
  };
}

function histogramTable(
  plan: readonly PlannedLeg[],
  rated: readonly number[],
  nameOf: (engine: number) => string,
): Table {
  return {
    id: 'load-histogram',
    label: 'Time and work of each engine by load',
    columns: [
      { id: 'engine', label: 'Engine', unit: null },
      { id: 'load-above', label: 'Load above', unit: '1' },
      { id: 'load-up-to', label: 'up to', unit: '1' },
      { id: 'hours', label: 'Time', unit: 'h' },
      { id: 'energy', label: 'Work', unit: 'kWh' },
    ],
    rows: loadHistogram(plan, rated).map(({ engine, fromLoad, toLoad, timeS, energyJ }) => [
      nameOf(engine),
      fromLoad,
      toLoad,
      timeS / 3600,
      energyJ / kwhJ,
    ]),
  };
}

/** The modes of a test cycle with their loads and weighting factors. */
export function modeTable(cycle: TestCycle, intermediate: number): Table {
  const loads = loadsOfModes(cycle, intermediate);
  return {
    id: 'modes',
    label: `Modes of the test cycle ${cycle.name}: ${cycle.use}`,
    columns: [
      { id: 'mode', label: 'Mode', unit: null },
      { id: 'speed', label: 'Speed', unit: null },
      { id: 'given-share', label: cycle.of === 'power' ? 'Power' : 'Torque', unit: '1' },
      { id: 'load', label: 'Load', unit: '1' },
      { id: 'weighting-factor', label: 'Weighting factor', unit: '1' },
    ],
    rows: cycle.modes.map(({ speed, share, weight }, index) => [
      `mode ${index + 1}`,
      typeof speed === 'number' ? `${Math.round(speed * 100)} %` : speed,
      share,
      loads[index] ?? null,
      weight,
    ]),
  };
}

const nothing: Band = { value: 0, low: 0, high: 0 };
const kwhJ = 3.6e6;
const knotMPerS = 1852 / 3600;

function plus(before: Band, { value, low, high }: Band, times: number): Band {
  return { value: before.value + value * times, low: before.low + low * times, high: before.high + high * times };
}
