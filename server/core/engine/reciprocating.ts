// What a question about an engine with pistons and its answer look like: what it compresses and burns, how, and between which
// pressures it breathes; and the states, work and losses that follow, per kilogram of fuel.
// Types alone. The cycle: 1 the cylinder is filled and closed at the largest volume · 2 end of compression · 3 end of
// combustion (3a: where its pressure reaches the limit, cycle-path.ts) · 4 end of expansion · 5 what stays in the
// cylinder, after blow-down · 6 the exhaust as it leaves, mixed.
// Invariant: everything here is for 1 kg of fuel with its fresh gas, but states 1 to 4, which hold the residual gas as well.

import type { Equilibrium, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import type { ThermoPhase } from '../substance/phases.ts';
import type { CompressionLaw } from './charge.ts';
import type { Corner, ExpandingState } from './expansion.ts';
import type { FrozenMixture, MixtureState } from './frozen-mixture.ts';

/** A fuel, or its share where there is a pilot beside it. */
export interface EngineFuel {
  /** Of 1 kg of all fuel. */
  readonly massKg: number;
  /** The rest is of that mass. */
  readonly elementMol: ReadonlyMap<string, number>;
  /** As it comes in: a liquid has its latent heat still to take up. */
  readonly enthalpyJ: number;
  readonly referenceEnthalpyJ: number;
  readonly lowerHeatingValueJ: number;
  /** What becomes of it in the fresh gas; null where it is injected at the end of compression. */
  readonly vapour: FrozenMixture | null;
}

/**
 * Where heat is released. `volume`: all at the smallest volume (Otto) · `pressure`: all at the pressure that compression
 * reached (Diesel) · `limited`: at the smallest volume until the pressure reaches its limit, then at that (dual, also called
 * mixed, Seiliger or Sabathé).
 */
export type HeatRelease =
  | { readonly at: 'volume' }
  | { readonly at: 'pressure' }
  | { readonly at: 'limited'; readonly maximumPressurePa: number };

/**
 * What stays in the cylinder. `clearance`: what fills the smallest volume at the exhaust's pressure · `share`: a share of the
 * mass that is compressed and burnt, as scavenging leaves it.
 */
export type ResidualGas = { readonly by: 'clearance' } | { readonly by: 'share'; readonly share: number };

export interface ReciprocatingInput {
  readonly compressionRatio: number;
  readonly compression: Extract<CompressionLaw, { readonly law: 'isentropic' | 'exponent' }>;
  readonly heatRelease: HeatRelease;
  /** Adding up to 1 kg. */
  readonly fuels: readonly EngineFuel[];
  /** Of 1 kg of fuel, without the fuel. */
  readonly freshGas: FrozenMixture;
  /** Of the fresh gas as it enters the cylinder (after a charge-air cooler), and of the exhaust behind the cylinder. */
  readonly intakeTemperatureK: number;
  readonly intakePressurePa: number;
  readonly exhaustPressurePa: number;
  /** A four-stroke engine draws in and pushes out with the piston; a two-stroke engine is scavenged at its largest volume. */
  readonly strokes: 2 | 4;
  readonly residual: ResidualGas;
  /** Share of the fuel that burns; the rest leaves as it is, and neither its volume nor its warming in the fire counts. */
  readonly completeness: number;
  /**
   * Heat to the walls as a share of the lower heating value, and what part of it leaves during combustion; the rest is taken
   * at the end of expansion, where it costs no work. What compression by an exponent gives to the walls comes on top.
   */
  readonly wallLossShare: number;
  readonly wallLossInCombustion: number;
  /** Null: the composition follows to the end of expansion; in the frozen corners it then stays from the end of combustion. */
  readonly frozenBelowK: number | null;
  readonly mechanicalEfficiency: number;
  readonly admits?: (phase: ThermoPhase) => boolean;
}

/**
 * Why there is no cycle. `not-in-range`: a number of the input that no engine has · `no-fresh-gas`: residual gas would fill
 * the cylinder, as the exhaust's pressure is so far above the intake's · `no-state`: a state is beyond all data, or not found.
 */
export type CycleFault =
  | { readonly kind: 'fault'; readonly reason: 'not-in-range'; readonly of: keyof ReciprocatingInput }
  | { readonly kind: 'fault'; readonly reason: 'no-fresh-gas' }
  | {
      readonly kind: 'fault';
      readonly reason: 'no-state';
      readonly state: 'intake' | 'compression' | 'combustion' | 'expansion' | 'blow-down' | 'exhaust' | 'residual';
      readonly why: NoEquilibrium;
    };

/** One cycle, in one corner. */
export interface WorkCycle {
  readonly kind: 'cycle';
  readonly corner: Corner;
  /** 1 and 2. */
  readonly filled: MixtureState;
  readonly compressed: MixtureState;
  /** 3 */
  readonly burnt: Equilibrium;
  /** 4, before and after the heat that is taken there. */
  readonly expanded: ExpandingState;
  readonly cooled: MixtureState;
  /** 5, of the whole content; a share of it stays. */
  readonly blownDown: MixtureState;
  /** 6: the gas leaves at this temperature and the exhaust's pressure; particles set apart are hotter. */
  readonly exhaustTemperatureK: number;
  /** J of it with its particles, and frozen at 25 °C. */
  readonly exhaustEnthalpyJ: number;
  readonly exhaustColdEnthalpyJ: number;
  /** Mass that stays over mass that is compressed and burnt. */
  readonly residualShare: number;
  readonly balance: CycleBalance;
  /** The limit on pressure: none, kept, reached while burning, or passed by compression alone. */
  readonly limit: 'none' | 'kept' | 'reached' | 'passed-by-compression';
  /** Rounds until the residual gas agreed with the exhaust it stayed from. */
  readonly rounds: number;
}

/** J per kg of fuel, but for the volume. */
export interface CycleBalance {
  readonly sweptM3: number;
  readonly compressionWorkJ: number;
  readonly expansionWorkJ: number;
  /** Of the closed cylinder (gross). */
  readonly indicatedWorkJ: number;
  /** Done by the piston on the gas between exhaust and intake; negative where a boost helps. */
  readonly pumpingWorkJ: number;
  readonly frictionWorkJ: number;
  readonly brakeWorkJ: number;
  readonly compressionHeatJ: number;
  readonly combustionHeatJ: number;
  readonly expansionHeatJ: number;
  /** Energy with which unburnt fuel leaves, chemical energy not counted, above that at 25 °C. */
  readonly unburntSensibleJ: number;
  readonly freshSensibleJ: number;
  readonly fuelSensibleJ: number;
}
