// What definitions are to the work that is done, as far as other definitions ask: an engine gives its consumption on any
// fuel. Plain data and pure functions that look up no name; made by the kinds, read by duties and services.
// Invariant: what could not be had is null or `missing`, and has been said or says in words what it lacks.

import type { PlannedLeg } from '../core/duty/plan.ts';
import type { Band, Consumption } from '../core/engine/consumption.ts';
import type { Corner, ServiceSums } from '../core/service/service.ts';
import type { Quantity } from '../core/quantity/quantity.ts';
import type { Material } from './material.ts';
import type { ReceivingWater } from './receiving-water.ts';
import type { AssumptionId } from './working.ts';

export type Machinery = EngineMachine | DutyMachine | ServiceMachine | ReceivingWater;

export interface EngineMachine {
  readonly machinery: 'engine';
  readonly name: string;
  /** The fuel it is defined with. */
  readonly fuel: Material;
  /** Brake power at a load of 1; null where it is not given. */
  readonly ratedPower: Quantity | null;
  /** The engine burning a fuel: its own, or another by the rule of the way it was worked out. */
  burning(fuel: Material): BurningEngine | NotBurning;
}

/** An engine on one fuel. */
export interface BurningEngine {
  readonly kind: 'burning';
  /** Null without a rated power. Of all fuel, pilot included. */
  readonly consumption: Consumption | null;
  /** J of fuel per J of work at the rating, or as the cycle was worked out. */
  readonly ratedHeatRate: Band;
  /** What is uncertain about its consumption, and the consumption at other values of that, in the same order. */
  readonly uncertain: readonly Quantity[];
  readonly consumptionAt: (values: readonly number[]) => Consumption | null;
  readonly pilot: PilotEntry | null;
  readonly slips: EngineSlips;
  readonly assumptions: readonly AssumptionId[];
}

export interface EngineSlips {
  readonly methane: SlipEntry | null;
  readonly nitrousOxide: SlipEntry | null;
  readonly ammonia: SlipEntry | null;
  readonly urea: SlipEntry | null;
}

/** A second fuel that lights the first. */
export interface PilotEntry {
  /** Share of the energy (lower heating value) or of the mass of all fuel. */
  readonly share: Quantity;
  readonly by: 'energy' | 'mass';
  readonly fuel: Material;
}

/** What slips through, as a share of the fuel's mass, or as a mass for the work at the shaft (kg/J). */
export interface SlipEntry {
  readonly per: 'fuel' | 'work';
  readonly quantity: Quantity;
}

/** What engines have to do. */
export interface DutyMachine {
  readonly machinery: 'duty';
  readonly name: string;
  /** Plans name engines by their index here; a null machine could not be worked out. */
  readonly engines: readonly { readonly name: string; readonly machine: EngineMachine | null }[];
  readonly boilers: readonly { readonly fuel: Material; readonly efficiency: Quantity }[];
  /** In the order of the plan's legs. */
  readonly legNames: readonly string[];
  readonly isTestCycle: boolean;
  /** What is uncertain about it; the plan and the ratings (W) at other values of that, in the same order. */
  readonly uncertain: readonly Quantity[];
  readonly planAt: (values: readonly number[]) => readonly PlannedLeg[];
  readonly ratedPowerAt: (values: readonly number[]) => readonly number[];
}

/** A duty over and over, as a comparison asks of it. */
export interface ServiceMachine {
  readonly machinery: 'service';
  readonly name: string;
  /** The fuel that most of its energy comes from; null where that is not known. */
  readonly mainFuel: Material | null;
  /** The main fuel where a form or mass of tanks or a boil-off is given, which are for that fuel alone. */
  readonly ownTanksFor: string | null;
  /** The same work on the baseline; null without one. */
  readonly baseline: () => ServiceSums | null;
  /** 1/s; null where it is not said. */
  readonly repeated: Quantity | null;
  /** The service with a fuel in the place of the main one, and its sums at the values as they are. */
  burning(fuel: Material): {
    readonly fuels: readonly Material[];
    readonly missing: readonly string[];
    readonly values: readonly number[];
    readonly sumsAt: (values: readonly number[], corner: Corner) => ServiceSums;
  };
}

/** The names of data without which it cannot be told; empty where the cause has been said. */
export interface NotBurning {
  readonly kind: 'not-burning';
  readonly missing: readonly string[];
}
