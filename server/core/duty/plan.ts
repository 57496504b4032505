// What engines have to do, leg by leg: from times, distances, loads, powers and speeds to time and power on each engine,
// and from there to hours, energy, loads and their histogram. Knows no fuel and no names.
// Invariants: energy of the plan is the sum over its demands; what is not known is NaN and makes only what rests on it NaN.

import { loadAtSpeed, speedAtLoad, type ServicePoint } from './propeller-law.ts';

/** What is asked of one engine: a share of its rating, a power in W, or what the propeller takes at the leg's speed. */
export type Asked =
  | { readonly by: 'load'; readonly load: number }
  | { readonly by: 'power'; readonly powerW: number }
  | { readonly by: 'speed' };

export interface AskedOfEngine {
  /** Index of the engine. */
  readonly engine: number;
  readonly asked: Asked;
}

/** Of time, distance and speed two are given, or one and a load that sets the speed; what is not given is null. */
export interface LegInput {
  readonly timeS: number | null;
  readonly distanceM: number | null;
  readonly speedMPerS: number | null;
  readonly calm: boolean;
  /** The first is what drives the ship, where a speed is in play. */
  readonly engines: readonly AskedOfEngine[];
  /** The ship lies on the shore's power: hotel loads come from there, whether an engine runs or not. */
  readonly isOnShore: boolean;
  /** Power from the shore, W. */
  readonly shoreW: number;
  /** Steps of measured time and power in place of one steady power of the first engine. */
  readonly profile?: readonly Step[];
}

export interface Step {
  readonly timeS: number;
  readonly powerW: number;
}

export interface DutyInput {
  /** W at a load of 1, of each engine; NaN where it is not known. */
  readonly ratedPowerW: readonly number[];
  readonly legs: readonly LegInput[];
  readonly service: ServicePoint | null;
  /** Asked on every leg, from the shore where the leg lies there. */
  readonly hotel: readonly AskedOfEngine[];
  /** Asked on every leg on which an engine drives. */
  readonly auxiliaries: readonly AskedOfEngine[];
  /** Heat on every leg, W, of each boiler. */
  readonly boilerHeatW: readonly number[];
}

/** Steady power on one engine for some time. */
export interface Demand {
  readonly engine: number;
  readonly timeS: number;
  readonly powerW: number;
}

export interface PlannedLeg {
  readonly timeS: number;
  /** Null for a leg that goes nowhere, or of which that is not known. */
  readonly distanceM: number | null;
  readonly speedMPerS: number | null;
  /** One for each engine that runs; several of one engine only where a profile was given. */
  readonly demands: readonly Demand[];
  readonly shoreJ: number;
  /** Of each boiler. */
  readonly boilerJ: readonly number[];
}

/** The legs with time and power. Two demands on one engine in a leg are added: it runs once. */
export function planOf(input: DutyInput): readonly PlannedLeg[] {
  return input.legs.map((leg) => plannedLeg(leg, input));
}

function plannedLeg(leg: LegInput, input: DutyInput): PlannedLeg {
  const { service, ratedPowerW } = input;
  const [first] = leg.engines;
  const speed = leg.speedMPerS ?? speedOf(leg, input);
  const timeS = leg.timeS ?? (leg.distanceM !== null && speed !== null ? leg.distanceM / speed : NaN);
  const power = ({ engine, asked }: AskedOfEngine): number => {
    const rated = ratedPowerW[engine] ?? NaN;
    if (asked.by === 'power') return asked.powerW;
    if (asked.by === 'load') return asked.load * rated;
    return service && speed !== null ? loadAtSpeed(service, speed, leg.calm) * rated : NaN;
  };
  const { isOnShore } = leg;
  const isDriven = first !== undefined || leg.profile !== undefined;
  const others = [...leg.engines.slice(1), ...(isOnShore ? [] : input.hotel), ...(isDriven ? input.auxiliaries : [])];
  const demands = new Map<number, Demand[]>();
  if (first) {
    const steps = leg.profile ?? [{ timeS, powerW: power(first) }];
    demands.set(
      first.engine,
      steps.map((step) => ({ engine: first.engine, ...step })),
    );
  }
  for (const one of others) {
    const powerW = power(one);
    const known = demands.get(one.engine) ?? [{ engine: one.engine, timeS, powerW: 0 }];
    demands.set(
      one.engine,
      known.map((demand) => ({ ...demand, powerW: demand.powerW + powerW })),
    );
  }
  const hotelFromShoreW = isOnShore ? input.hotel.reduce((sum, one) => sum + power(one), 0) : 0;
  return {
    timeS,
    distanceM: leg.distanceM ?? (speed === null ? null : speed * timeS),
    speedMPerS: speed,
    demands: [...demands.values()].flat(),
    shoreJ: leg.shoreW + hotelFromShoreW === 0 ? 0 : (leg.shoreW + hotelFromShoreW) * timeS,
    boilerJ: input.boilerHeatW.map((heatW) => (heatW === 0 ? 0 : heatW * timeS)),
  };
}

/** The speed of a leg that has a distance and a load but no speed. */
function speedOf({ distanceM, engines, calm }: LegInput, { service, ratedPowerW }: DutyInput): number | null {
  const [first] = engines;
  if (distanceM === null || !first || !service) return null;
  const { asked, engine } = first;
  if (asked.by === 'load') return speedAtLoad(service, asked.load, calm);
  return asked.by === 'power' ? speedAtLoad(service, asked.powerW / (ratedPowerW[engine] ?? NaN), calm) : null;
}

/** What a plan comes to for one engine, or for all where none is named. */
export interface PlanSums {
  readonly runningS: number;
  readonly energyJ: number;
  /** Energy over what the running engines would give at their ratings meanwhile. */
  readonly weightedLoad: number;
}

export function sumsOf(plan: readonly PlannedLeg[], ratedPowerW: readonly number[], engine?: number): PlanSums {
  let [runningS, energyJ, atRatingJ] = [0, 0, 0];
  for (const { demands } of plan) {
    for (const demand of demands) {
      if (engine !== undefined && demand.engine !== engine) continue;
      runningS += demand.timeS;
      energyJ += demand.timeS * demand.powerW;
      atRatingJ += demand.timeS * (ratedPowerW[demand.engine] ?? NaN);
    }
  }
  return { runningS, energyJ, weightedLoad: energyJ / atRatingJ };
}

export interface HistogramBin {
  readonly engine: number;
  readonly fromLoad: number;
  readonly toLoad: number;
  readonly timeS: number;
  readonly energyJ: number;
}

/** Time and energy of each engine by load, in tenths of the rating; bins in which it never runs are left out. */
export function loadHistogram(plan: readonly PlannedLeg[], ratedPowerW: readonly number[]): readonly HistogramBin[] {
  const bins = new Map<string, { engine: number; tenth: number; timeS: number; energyJ: number }>();
  for (const { demands } of plan) {
    for (const { engine, timeS, powerW } of demands) {
      const load = powerW / (ratedPowerW[engine] ?? NaN);
      if (!Number.isFinite(load) || !(timeS > 0)) continue;
      // A load of 100 % belongs to the bin that ends there.
      const tenth = Math.max(0, Math.ceil(load * 10 - 1e-9) - 1);
      const key = `${engine} ${tenth}`;
      const bin = bins.get(key) ?? { engine, tenth, timeS: 0, energyJ: 0 };
      bin.timeS += timeS;
      bin.energyJ += timeS * powerW;
      bins.set(key, bin);
    }
  }
  return [...bins.values()]
    .sort((left, right) => left.engine - right.engine || left.tenth - right.tenth)
    .map(({ engine, tenth, timeS, energyJ }) => ({
      engine,
      fromLoad: tenth / 10,
      toLoad: (tenth + 1) / 10,
      timeS,
      energyJ,
    }));
}
