// What a question about a burn and its answer look like: a kilogram of fuel with some oxidant, what is held while it burns,
// how it cools; and the states that follow, each solved when somebody first looks at it.
// Knows no names, no units but SI and no minimiser. Invariant: every amount here is for one kilogram of fuel with its
// oxidant, so mol are mol per kg of fuel and J are J per kg of fuel; enthalpies lie on the scale where the elements in
// their reference states at 298.15 K have none. An answer is a pure function of its question.

import type { CandidateSet } from '../equilibrium/candidates.ts';
import type { Equilibrium, NoEquilibrium } from '../equilibrium/equilibrium.ts';
import type { AdmittedProducts } from './admitted-products.ts';

/** Fuel or oxidant as it comes in, per kg of itself. */
export interface BurnStream {
  readonly elementMolPerKg: ReadonlyMap<string, number>;
  /** At its own temperature, with its latent heats; null where its energy is unknown. */
  readonly enthalpyJPerKg: number | null;
  /** At 298.15 K; what lies between is preheat and counts neither as released by burning nor as heating value. */
  readonly referenceEnthalpyJPerKg: number | null;
  readonly temperatureK: number;
  /** mol of what is gas at that temperature and the charge's pressure: it makes the volume where that is held. */
  readonly gasMolPerKg: number;
}

/** λ counts oxygen demand by valence; its inverse is the equivalence ratio. */
export type OxidantAmount =
  | { readonly by: 'lambda'; readonly lambda: number }
  | { readonly by: 'equivalence-ratio'; readonly ratio: number }
  | { readonly by: 'mass'; readonly kgPerKg: number };

/**
 * `pressure` in Pa; `volume`: that of the charge's gases, each at its own temperature and `chargePressurePa`, before
 * anything burns.
 */
export type BurnHeld =
  | { readonly held: 'pressure'; readonly pressurePa: number }
  | { readonly held: 'volume'; readonly chargePressurePa: number };

/** Adiabatic but for a share of the fuel's lower heating value that is taken out (0: none), or at a temperature. */
export type BurnHeat =
  | { readonly heat: 'adiabatic'; readonly lossShare: number }
  | { readonly heat: 'temperature'; readonly temperatureK: number };

/** Plain data: it can be handed to another thread. */
export interface BurnInput extends AdmittedProducts {
  readonly fuel: BurnStream;
  readonly oxidant: BurnStream;
  readonly amount: OxidantAmount;
  readonly held: BurnHeld;
  readonly heat: BurnHeat;
  /** Of the fuel, J/kg; null where it is unknown. Needed for a loss, and for the shares of it that are released. */
  readonly lowerHeatingValueJPerKg: number | null;
  /**
   * A zone that burns first, with all the fuel and less oxidant than the whole. It is adiabatic and holds what the whole
   * holds (where that is the volume: the volume of its own charge); a heat loss is taken after it.
   */
  readonly zone?: OxidantAmount;
  /** Each its own equilibrium, in the order given. */
  readonly cooledToK: readonly number[];
  /** States at and below this temperature keep the composition reached there. */
  readonly frozenBelowK?: number;
  /** Pressure at which the gas cools; without it what was held while burning stays held. */
  readonly coolingPressurePa?: number;
  /**
   * Ions and the electron in the zone, the flame and the cooled states where these are hotter than `ionsAboveK`. A path and
   * the state that freezes have none: along a path the candidates stay the same, and ions move no condensed phase.
   */
  readonly ions?: boolean;
}

/** Ions are a matter of hot gas: below, they are a millionth of it at most even with potassium (Saha's equation). */
export const ionsAboveK = 2000;

/**
 * Why nothing can be burnt. `no-valence`: λ has no meaning for the `elements` · `no-oxygen-needed`: λ, but the fuel
 * needs none · `no-oxygen-offered`: λ, but the oxidant brings none it could spare · `not-positive`: the amount of oxidant
 * (or of the zone's) is not a finite number above 0, or negative as a mass · `zone-leaner`: the zone would have more
 * oxidant than the whole · `no-energy`: adiabatic, but the energy of `stream` is unknown · `no-heating-value`: a loss
 * without a heating value to take it of · `no-gas`: a volume is held, but the charge holds no gas · `nothing`: no elements.
 */
export type BurnFault =
  | {
      readonly kind: 'fault';
      readonly reason: 'no-valence';
      readonly of: 'fuel' | 'oxidant';
      readonly elements: readonly string[];
    }
  | { readonly kind: 'fault'; readonly reason: 'no-oxygen-needed' | 'no-oxygen-offered'; readonly molPerKg: number }
  | { readonly kind: 'fault'; readonly reason: 'not-positive'; readonly of: 'whole' | 'zone' }
  | {
      readonly kind: 'fault';
      readonly reason: 'zone-leaner';
      readonly zoneKgPerKg: number;
      readonly wholeKgPerKg: number;
    }
  | { readonly kind: 'fault'; readonly reason: 'no-energy'; readonly stream: 'fuel' | 'oxidant' }
  | { readonly kind: 'fault'; readonly reason: 'no-heating-value' | 'no-gas' | 'nothing' };

/** A kilogram of fuel with its oxidant, before it burns. */
export interface Charge {
  readonly kind: 'charge';
  readonly oxidantKgPerKg: number;
  /** Null where λ has no meaning for this fuel or oxidant. */
  readonly lambda: number | null;
  /** In the order of atomic numbers; what is not there is left out. */
  readonly elements: readonly string[];
  readonly elementMol: Float64Array;
  readonly massKg: number;
  /** Null where the energy of a stream is unknown. The heat loss is not yet taken out. */
  readonly enthalpyJ: number | null;
  /** Both streams at 298.15 K. */
  readonly referenceEnthalpyJ: number | null;
  readonly gasMol: number;
  /** m³ of the gases, each at its own temperature and the charge's pressure, and pressure times volume in J. */
  readonly volumeM3: number;
  readonly pressureVolumeJ: number;
}

/**
 * What can be read of any state, whether its composition follows the temperature or not. Every field is as in
 * `Equilibrium`, for 1 kg of fuel with its oxidant.
 */
export type MatterState = Pick<
  Equilibrium,
  | 'candidates'
  | 'temperatureK'
  | 'pressurePa'
  | 'amountsMol'
  | 'gasMol'
  | 'gasMolarMassKgPerMol'
  | 'volumeM3'
  | 'massKg'
  | 'condensedMassShare'
  | 'enthalpyJ'
  | 'frozenHeatCapacityJPerK'
  | 'frozenGamma'
  | 'extrapolated'
>;

/**
 * A composition kept from `from` at another temperature. Chemistry and condensation have stopped; a melt still solidifies
 * and crystals still change into each other, as these need no partner.
 */
export interface FrozenState extends MatterState {
  readonly kind: 'frozen';
  readonly from: Equilibrium;
}

/** The question was given up before its turn came. Only a burn that was prepared with a `shouldStop` ever says so. */
export interface Stopped {
  readonly kind: 'none';
  readonly reason: 'stopped';
}

/** Why there is no state. */
export type NoState = NoEquilibrium | Stopped;

export type BurnState = Equilibrium | FrozenState;
export type BurnStateOrNone = BurnState | NoState;

/** A burn whose states are solved when first asked for, and once. */
export interface Burn {
  readonly kind: 'burn';
  readonly input: BurnInput;
  readonly charge: Charge;
  /** Null without a zone. */
  readonly zoneCharge: Charge | null;
  /** The whole charge at its overall λ, loss taken out. */
  readonly flame: () => Equilibrium | NoState;
  /** Null without a zone, or where its enthalpy is unknown. */
  readonly zone: () => Equilibrium | NoState | null;
  /** In the order of `cooledToK`. */
  readonly cooled: readonly CooledState[];
  /** The composition at `frozenBelowK`; null where nothing freezes. */
  readonly frozenAt: () => Equilibrium | NoState | null;
  /** The state of the cooling gas at a temperature: equilibrium, or frozen where that has been passed. */
  readonly at: (temperatureK: number) => BurnStateOrNone;
  /**
   * The states at falling temperatures and what condenses between them; without a list `defaultPathK` from the flame.
   * One list's answer does not depend on what was asked before.
   */
  readonly path: (temperaturesK?: readonly number[]) => CoolingPath;
  /** What is released between the charge and 25 °C. */
  readonly heat: () => BurnHeatReleased | NoState | null;
  /**
   * J released above a temperature of the exhaust: the charge's enthalpy less that of the cooled gas, or energy where that
   * cools in a held volume; null as for `heat`.
   */
  readonly heatAbove: (temperatureK: number) => number | NoState | null;
}

export interface CooledState {
  readonly temperatureK: number;
  readonly state: () => BurnStateOrNone;
}

/** A condensed phase that comes or goes as the gas cools. */
export interface PathEvent {
  readonly kind: 'appears' | 'leaves';
  /** Index into the candidates. */
  readonly phase: number;
  /** Within `eventPrecisionK`. */
  readonly temperatureK: number;
  /** Appears out of gas alone (a dew or frost point), or while another condensed phase of its atoms or others goes. */
  readonly with: readonly number[];
}

export const eventPrecisionK = 0.01;

/** Between two temperatures; equal ones where a single state is missing at an end of the path. */
export interface PathGap {
  readonly fromK: number;
  readonly toK: number;
}

/** States at the temperatures that were asked for, and what happens between them. */
export interface CoolingPath {
  readonly candidates: CandidateSet;
  /** Falling, as the states are. */
  readonly temperaturesK: readonly number[];
  readonly states: readonly BurnStateOrNone[];
  /** Condensed phases of the first state. */
  readonly presentAtStart: readonly number[];
  /** In falling temperature. Phases that freeze within a frozen composition are not among them. */
  readonly events: readonly PathEvent[];
  /** Where a state could not be had, from the hottest down: events there may be missing. */
  readonly gaps: readonly PathGap[];
  /** True where there are such gaps, or the path was stopped. */
  readonly incomplete: boolean;
}

/** In J per kg of fuel; enthalpies, or energies where the gas cools in a held volume. */
export interface BurnHeatReleased {
  /** Charge as it came in, less the products at 25 °C on the slate reached. */
  readonly releasedJ: number;
  /** Part of it that came in as preheat of fuel and oxidant; null where an enthalpy at 298.15 K is unknown. */
  readonly preheatJ: number | null;
  /** (released - preheat) over the lower heating value; null where either is unknown. */
  readonly shareOfHeatingValue: number | null;
  /** The slate at 25 °C: the frozen composition, or the equilibrium of that temperature (water then mostly liquid). */
  readonly slate: BurnState;
}
