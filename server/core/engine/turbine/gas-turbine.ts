// What a question about a gas turbine (Joule–Brayton cycle) and its answer look like: air compressed, once cooled between on
// request, warmed by the exhaust, fuel burnt at a pressure, the gas expanded, once heated again by more fuel.
// Types alone. Points: 1 inlet · 1a, 1b before and behind the intercooler · 2 behind the compressor · 2x behind the recuperator ·
// 3 turbine inlet · 3a, 3b before and behind the reheat combustor · 4 behind the turbine · 5 as it leaves.
// Invariant: everything here is for 1 kg of fuel, both combustors together.

import type { Equilibrium, NoEquilibrium } from '../../equilibrium/equilibrium.ts';
import type { ThermoPhase } from '../../substance/phases.ts';
import type { CompressionLaw } from '../charge.ts';
import type { Corner, ExpandingState } from '../expansion.ts';
import type { FrozenMixture, MixtureState } from '../frozen-mixture.ts';

export interface TurbineFuel {
  /** Of 1 kg. */
  readonly elementMol: ReadonlyMap<string, number>;
  readonly enthalpyJ: number;
  readonly referenceEnthalpyJ: number;
  readonly lowerHeatingValueJ: number;
}

/** Where a train of two stages is cut: ratio of pressures of the first stage; null: equal ratios. */
export interface Intercooling {
  readonly temperatureK: number;
  readonly firstRatio: number | null;
}

export interface CompressorInput {
  /** Behind the compressor over before it. */
  readonly pressureRatio: number;
  /** Of each stage. */
  readonly law: Exclude<CompressionLaw, { readonly law: 'exponent' }>;
  readonly intercooling: Intercooling | null;
  /** Share of the pressure lost before the compressor. */
  readonly intakeLossShare: number;
}

/** Air of all fuel together (no reheat), or a temperature the air follows from. */
export type TurbineAir =
  | { readonly by: 'mass'; readonly airKgPerKg: number }
  | { readonly by: 'turbine-inlet'; readonly temperatureK: number };

export interface GasTurbineInput {
  readonly fuel: TurbineFuel;
  /** 1 kg of what it draws in. */
  readonly air: FrozenMixture;
  readonly airTemperatureK: number;
  readonly ambientPressurePa: number;
  readonly compressor: CompressorInput;
  readonly amount: TurbineAir;
  /** kg of air per kg of fuel that just burns it: from there on air is added until the turbine inlet is as cool as asked. */
  readonly stoichiometricAirKgPerKg: number;
  /** Heat the air takes up over what it would take up to the exhaust's temperature; null: no recuperator. */
  readonly recuperatorEffectiveness: number | null;
  /** More fuel between two sections of the turbine; the first has that ratio of pressures, or both have the same. */
  readonly reheat: { readonly temperatureK: number; readonly firstRatio: number | null } | null;
  /** Of each combustor, and of the exhaust behind the turbine (recuperator, silencer, boiler). */
  readonly combustorLossShare: number;
  readonly exhaustLossShare: number;
  /** Isentropic, of each section. */
  readonly turbineEfficiency: number;
  /** Share of the fuel that burns; the rest leaves as it came. */
  readonly completeness: number;
  /** Heat through the combustors' walls as a share of the lower heating value. */
  readonly wallLossShare: number;
  /** As for a cycle with pistons: null, the composition follows; in the frozen corners it stays from the turbine inlet. */
  readonly frozenBelowK: number | null;
  readonly mechanicalEfficiency: number;
  readonly admits?: (phase: ThermoPhase) => boolean;
}

/** States of the air, for 1 kg of it. */
export interface CompressorTrain {
  readonly inlet: MixtureState;
  readonly beforeCooler: MixtureState | null;
  readonly behindCooler: MixtureState | null;
  readonly delivery: MixtureState;
  readonly workJ: number;
  readonly coolerHeatJ: number;
}

/** One cycle, in one corner. */
export interface GasTurbineCycle {
  readonly kind: 'gas-turbine';
  readonly corner: Corner;
  readonly airKgPerKg: number;
  /** Share of the fuel burnt in the first combustor. */
  readonly firstFuelShare: number;
  readonly compressor: CompressorTrain;
  /** Behind the recuperator; the compressor's delivery without one. */
  readonly combustorInlet: MixtureState;
  /** Gas states: amounts for the fuel that has burnt so far, of 1 kg in all. */
  readonly turbineInlet: Equilibrium;
  readonly beforeReheat: ExpandingState | null;
  readonly reheated: Equilibrium | null;
  readonly turbineOutlet: ExpandingState;
  /** Behind the recuperator. */
  readonly exhaust: ExpandingState;
  readonly compressorWorkJ: number;
  readonly turbineWorkJ: number;
  readonly netWorkJ: number;
  readonly brakeWorkJ: number;
  readonly losses: readonly TurbineLoss[];
  /** Brake work over the lower heating value. */
  readonly brakeEfficiency: number;
  readonly netEfficiency: number;
}

/** As the losses of a cycle with pistons (loss-tree.ts), and what an intercooler carries off. */
export interface TurbineLoss {
  readonly id:
    | 'brake-work'
    | 'friction'
    | 'wall-heat'
    | 'intercooler-heat'
    | 'exhaust-sensible'
    | 'exhaust-latent'
    | 'exhaust-chemical'
    | 'unburnt-fuel'
    | 'brought-in';
  readonly joulePerKg: number;
  readonly share: number;
}

export type TurbineStage =
  'compressor' | 'intercooler' | 'recuperator' | 'combustor' | 'turbine' | 'reheat' | 'exhaust';

/**
 * Why there is no cycle. `not-in-range`: a number of the input that no turbine has · `not-hot-enough`: no amount of air makes
 * the turbine inlet (or the reheat) so hot; at λ = 1 it is `reachesK` · `cold-inlet`: the air comes to the combustor hotter
 * than the gas is to leave it · `reheat-needs-inlet`: with reheat, the temperature of the turbine inlet has to be given ·
 * `cold-reheat`: the gas comes to the reheat hotter (`fromK`) than it is to leave it · `no-state`: beyond all data, or not found.
 */
export type TurbineFault =
  | { readonly kind: 'fault'; readonly reason: 'not-in-range'; readonly of: string }
  | {
      readonly kind: 'fault';
      readonly reason: 'not-hot-enough';
      readonly of: 'inlet' | 'reheat';
      readonly reachesK: number;
    }
  | { readonly kind: 'fault'; readonly reason: 'cold-inlet'; readonly airK: number }
  | { readonly kind: 'fault'; readonly reason: 'cold-reheat'; readonly fromK: number }
  | { readonly kind: 'fault'; readonly reason: 'reheat-needs-inlet' }
  | { readonly kind: 'fault'; readonly reason: 'no-state'; readonly stage: TurbineStage; readonly why: NoEquilibrium };
