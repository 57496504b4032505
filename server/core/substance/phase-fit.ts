// The shape of the files under data/phases/ that the fit writes and of the limits kept by hand beside them, as JSON.
// Types only. Energies are in kJ/mol, heat capacities and entropies in J/(mol K), temperatures in K; a curve's terms are
// those of heat-capacity-terms.ts, the constants of its pieces are not stored because they follow from the anchor.

import type { Phase } from './formula.ts';

/** One piece of a curve; it ends where the next begins. */
export interface PieceFit {
  readonly fromK: number;
  /** What happens at `fromK`; absent at the start and at joins that are not physical. A peak or a glass takes up no heat. */
  readonly begins?: { readonly kind: PhaseChange; readonly kJPerMol?: number };
  /** Up to seven factors of t^-2, t^-1, 1, t, ... in cp/R, t = T/1000 K; those missing at the end are zero. */
  readonly terms: readonly number[];
}

export type PhaseChange = 'melting' | 'boiling' | 'crystal-crystal' | 'lambda' | 'glass';

/** A change into another phase, with the heat taken up going up in temperature where the source states it. */
export interface PhaseChangeFit {
  readonly atK: number;
  readonly kind: PhaseChange;
  readonly kJPerMol?: number;
  readonly with: string;
}

export interface PhaseFit {
  /** Formula, phase and form: `Na2CO3(cr)`, `Al2O3(cr,alpha)`. Unique. */
  readonly id: string;
  readonly label: string;
  readonly formula: string;
  readonly phase: Phase;
  readonly form?: string;
  /** Of formation from the elements at 298.15 K. Absent, with the next, where the phase has no values there. */
  readonly formationKJPerMol?: number;
  readonly entropyJPerMolK?: number;
  /** Where there are no values at 298.15 K: enthalpy on the element scale and entropy at this temperature instead. */
  readonly anchor?: { readonly atK: number; readonly kJPerMol: number; readonly jPerMolK: number };
  readonly pieces: readonly PieceFit[];
  readonly toK: number;
  /** Where this phase has the lowest Gibbs energy of the condensed phases of its composition; absent for gases. */
  readonly stableK?: readonly (readonly [number, number])[];
  readonly changes?: readonly PhaseChangeFit[];
  /** Why a search for the stable state must not use this phase. */
  readonly leftOut?: string;
  readonly note?: string;
  /** Number of the published table. */
  readonly table: string;
}

/**
 * The real end of a phase whose published table runs on past it. A melting point is final where there are no data for the
 * liquid; a decomposition is that at 1 bar and comes later under pressure.
 */
export interface PhaseLimit {
  /** Id of a phase. */
  readonly phase: string;
  readonly atK: number;
  readonly event: 'melts' | 'melts incongruently' | 'decomposes' | 'sublimes' | 'changes form' | 'critical point';
  /** For an end that the data themselves give: moles of each phase that one mole turns into, gases together at 1 bar. */
  readonly products?: Readonly<Record<string, number>>;
  /**
   * The data hold what it turns into (`products`, or `into` where they come to lie lower before `atK`), so a search for the
   * lowest Gibbs energy ends the phase by itself, at the right temperature for its pressure, and nothing has to be cut.
   */
  readonly byEquilibrium?: true;
  readonly into?: Readonly<Record<string, number>>;
  readonly source: string;
  readonly provenance: 'seen' | 'from memory';
}

/** A phase that is only tabulated: a written equation may use it, equilibria must not. Kept by hand. */
export interface HypotheticalPhase {
  readonly phase: string;
  readonly why: string;
  readonly source: string;
  readonly provenance: 'seen' | 'from memory';
}

/** The furthest a curve is from the published rows, and at which temperature. */
export type WorstResidual = readonly [deviation: number, temperatureK: number];

/**
 * The worst residuals of one phase, kept in a file of their own that the program does not load: percent of cp, kJ/mol of H,
 * and G/RT within the stable range (everywhere for a gas or a phase that is never stable).
 */
export interface FitResiduals {
  readonly phase: string;
  readonly heatCapacityPercent: WorstResidual;
  readonly enthalpyKJPerMol: WorstResidual;
  readonly gibbsOverRT: WorstResidual;
}
