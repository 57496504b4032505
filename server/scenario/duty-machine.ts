// From the legs and entries of a duty, as they were read, to the plan that core works out: which engines and boilers take
// part, what is uncertain, and the plan for any values of that. Reports nothing.
// Invariant: the plan is a pure function of the values; an engine that could not be worked out has a rating of NaN.

import { loadsOfModes } from '../core/duty/test-cycles.ts';
import { planOf, type AskedOfEngine, type DutyInput, type LegInput, type PlannedLeg } from '../core/duty/plan.ts';
import type { ServicePoint } from '../core/duty/propeller-law.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type {
  BoilerEntry,
  DemandEntry,
  LegEntry,
  NamedEngine,
  ServiceSpeedEntry,
  TestCycleEntry,
} from './duty-readers.ts';
import type { DutyMachine } from './machinery.ts';
import { QuantityList, type NumberIn } from './quantity-list.ts';

export interface NamedLeg {
  readonly name: string;
  readonly leg: LegEntry;
}

export interface WrittenDuty {
  readonly name: string;
  readonly legs: readonly NamedLeg[];
  readonly cycle: TestCycleEntry | null;
  readonly runningTimeS: Quantity;
  readonly intermediate: Quantity;
  readonly service: ServiceSpeedEntry | null;
  readonly defaultExponent: number;
  readonly hotel: readonly DemandEntry[];
  readonly auxiliaries: readonly DemandEntry[];
  readonly boiler: BoilerEntry | null;
}

export function dutyMachineOf(written: WrittenDuty): DutyMachine {
  const list = new QuantityList();
  const engines = enginesOf(written);
  const indexOf = (engine: NamedEngine): number => engines.findIndex(({ name }) => name === engine.name);
  const rated = engines.map(({ machine }) => list.add(machine?.ratedPower ?? null));
  const demand = ({ engine, by, quantity }: DemandEntry): ((values: readonly number[]) => AskedOfEngine) => {
    const number = list.add(quantity);
    const index = indexOf(engine);
    return (values) => {
      if (by === 'speed') return { engine: index, asked: { by } };
      const value = number(values);
      return { engine: index, asked: by === 'load' ? { by, load: value } : { by, powerW: value } };
    };
  };
  const legs = written.cycle
    ? cycleLegs(written, written.cycle, list)
    : written.legs.map(({ leg }) => legInput(leg, leg.engines.map(demand), list));
  const service = servicePoint(written, list);
  const [hotel, auxiliaries] = [written.hotel.map(demand), written.auxiliaries.map(demand)];
  const boilerHeat = list.add(written.boiler?.heat ?? null);
  const inputAt = (values: readonly number[]): DutyInput => ({
    ratedPowerW: rated.map((one) => one(values)),
    legs: legs.map((leg) => leg(values)),
    service: service?.(values) ?? null,
    hotel: hotel.map((one) => one(values)),
    auxiliaries: auxiliaries.map((one) => one(values)),
    boilerHeatW: written.boiler ? [boilerHeat(values)] : [],
  });
  return {
    machinery: 'duty',
    name: written.name,
    engines,
    boilers: written.boiler ? [written.boiler] : [],
    legNames: written.cycle ? modeNames(written.cycle) : written.legs.map(({ name }) => name),
    isTestCycle: written.cycle !== null,
    uncertain: list.quantities,
    planAt: (values): readonly PlannedLeg[] => planOf(inputAt(values)),
    ratedPowerAt: (values) => rated.map((one) => one(values)),
  };
}

/** Each engine once, in the order in which it is met. */
function enginesOf({ cycle, legs, hotel, auxiliaries }: WrittenDuty): readonly NamedEngine[] {
  const met = new Map<string, NamedEngine>();
  const named = [
    ...(cycle?.engine ? [cycle.engine] : []),
    ...legs.flatMap(({ leg }) => leg.engines.map(({ engine }) => engine)),
    ...[...hotel, ...auxiliaries].map(({ engine }) => engine),
  ];
  for (const engine of named) if (!met.has(engine.name)) met.set(engine.name, engine);
  // A test cycle without an engine still has loads.
  if (cycle && !cycle.engine) met.set('', { name: '', machine: null });
  return [...met.values()];
}

function legInput(
  leg: LegEntry,
  demands: readonly ((values: readonly number[]) => AskedOfEngine)[],
  list: QuantityList,
): (values: readonly number[]) => LegInput {
  const optional = (quantity: Quantity | null): ((values: readonly number[]) => number | null) => {
    const number: NumberIn = list.add(quantity);
    return (values) => (quantity ? number(values) : null);
  };
  const [time, distance, speed] = [optional(leg.time), optional(leg.distance), optional(leg.speed)];
  const shore = list.add(leg.shore, 0);
  return (values) => ({
    timeS: time(values),
    distanceM: distance(values),
    speedMPerS: speed(values),
    calm: leg.calm,
    engines: demands.map((one) => one(values)),
    isOnShore: leg.shore !== null,
    shoreW: shore(values),
    ...(leg.profile ? { profile: leg.profile } : {}),
  });
}

/** The modes of a test cycle as legs: each takes its weighting factor of the running time. */
function cycleLegs(
  { runningTimeS, intermediate }: WrittenDuty,
  { cycle }: TestCycleEntry,
  list: QuantityList,
): readonly ((values: readonly number[]) => LegInput)[] {
  const [time, share] = [list.add(runningTimeS), list.add(intermediate)];
  return cycle.modes.map(({ weight }, mode) => (values) => ({
    timeS: weight * time(values),
    distanceM: null,
    speedMPerS: null,
    calm: false,
    engines: [{ engine: 0, asked: { by: 'load', load: loadsOfModes(cycle, share(values))[mode] ?? NaN } }],
    isOnShore: false,
    shoreW: 0,
  }));
}

function modeNames({ cycle }: TestCycleEntry): readonly string[] {
  return cycle.modes.map((_, index) => `mode ${index + 1}`);
}

function servicePoint(
  { service, defaultExponent }: WrittenDuty,
  list: QuantityList,
): ((values: readonly number[]) => ServicePoint) | null {
  if (!service) return null;
  const [speed, load] = [list.add(service.speed), list.add(service.load)];
  const [margin, fouling] = [list.add(service.seaMargin, 0), list.add(service.fouling, 0)];
  const exponent = list.add(service.exponent, defaultExponent);
  return (values) => ({
    speedMPerS: speed(values),
    load: load(values),
    seaMargin: margin(values),
    fouling: fouling(values),
    exponent: exponent(values),
  });
}
