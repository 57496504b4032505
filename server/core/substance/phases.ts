// The phases the program has thermochemical data for, each with its curve, its valid range and its source; and which of the
// condensed phases of a composition is the stable one at a temperature. Joins the fitted records with the phases and the
// limits kept by hand.
// Knows no catalogue, no names of users and no equilibrium beyond one composition. Everything is read at the first question.
// Invariant: whatever is asked beyond the valid range is answered and said to be extrapolated, never refused or silent.
// Sources: M. W. Chase Jr., NIST-JANAF Thermochemical Tables, 4th ed., J. Phys. Chem. Ref. Data Monograph 9 (1998), by fit;
// for the phases kept by hand, those named in data/phases-by-hand/.

import { compositionKey, molarMassKgPerMol, parseFormula } from './formula.ts';
import type { Formula, FormulaFault } from './formula.ts';
import { handPhase } from './hand-phase.ts';
import type { HandPhase } from './hand-phase.ts';
import { compileCurve, evaluateCurve } from './phase-curve.ts';
import type { MolarProperties, PhaseCurve } from './phase-curve.ts';
import type { PhaseChangeFit, PhaseFit, PhaseLimit } from './phase-fit.ts';
import { handPhaseRecords, handPhaseSources, hypotheticalPhases, phaseFits, phaseLimits } from './phase-records.ts';
import { sourceRecords } from './records.ts';

/** A range of temperatures in K, both ends included. */
export type TemperatureRange = readonly [fromK: number, toK: number];

/** One phase of one composition with its data. */
export interface ThermoPhase {
  /** Unique: `Na2CO3(cr)`, `Al2O3(cr,alpha)`, `HNO2(g,cis)`. */
  readonly id: string;
  readonly label: string;
  /** With its phase, always one of gas, liquid and crystal. */
  readonly formula: Formula;
  readonly form: string | undefined;
  readonly molarMassKgPerMol: number;
  /** J/mol and J/(mol K) at 298.15 K, 1 bar; undefined where the phase has no values there. */
  readonly formationEnthalpyJPerMol: number | undefined;
  readonly entropyJPerMolK: number | undefined;
  /** Prepared when first asked for. */
  readonly curve: PhaseCurve;
  /**
   * Where the curve follows published values of a phase that exists: the table's range, cut at `limit`. What gives off gas
   * exists above it under pressure, and counts up to where its gas reaches some 100 bar.
   */
  readonly validK: TemperatureRange;
  /**
   * Above it an equilibrium must not hold the phase: the real end of a crystal that turns into nothing the data hold.
   * Infinite where there is none, or where the lowest Gibbs energy ends the phase by itself (`limit.byEquilibrium`).
   */
  readonly endK: number;
  /** Where the phase has the lowest Gibbs energy of the condensed phases of its composition, cut likewise; empty for gases. */
  readonly stableK: readonly TemperatureRange[];
  /** The real end of a crystal whose table runs on, at 1 bar. */
  readonly limit: PhaseLimit | undefined;
  /** Changes into other phases, by temperature. */
  readonly changes: readonly PhaseChangeFit[];
  /** Why a search for the stable state must not use this phase. */
  readonly leftOut: string | undefined;
  /** Why an equilibrium must not hold this phase, though an equation may be written with it: it does not exist as such. */
  readonly hypothetical: string | undefined;
  /** Forms or falls apart in hours and with moisture: what an equilibrium gives of it is a limit, not a forecast. */
  readonly isSlow: boolean;
  readonly note: string | undefined;
  /** Author and year, and of the fitted ones the number of the table. */
  readonly source: string;
}

/** Molar properties at a temperature, and whether it lies outside the valid range. */
export interface PhaseProperties extends MolarProperties {
  readonly temperatureK: number;
  readonly extrapolated: 'no' | 'below' | 'above';
  readonly validK: TemperatureRange;
}

/** The stable condensed phase, or why there is none: no such composition, no data there, or nothing known past a limit. */
export type StablePhase =
  | { readonly kind: 'phase'; readonly phase: ThermoPhase; readonly properties: PhaseProperties }
  | { readonly kind: 'unknown-composition' }
  | { readonly kind: 'outside-data'; readonly stableK: readonly TemperatureRange[] }
  | { readonly kind: 'past-limit'; readonly phase: ThermoPhase; readonly limit: PhaseLimit };

/** Every phase, in the order of the data. */
export function allPhases(): readonly ThermoPhase[] {
  return library().phases;
}

/**
 * The phases that an equilibrium may hold: all that exist, but for those that no search must use and for forms that are
 * nowhere the stable one of their composition (anatase, gamma alumina, sodium sulphate III): where two forms come within the
 * errors of their fits such a one would win by a hair.
 */
export function candidatePhases(): readonly ThermoPhase[] {
  const { phases, byComposition } = library();
  return phases.filter((phase) => {
    if (phase.leftOut !== undefined || phase.hypothetical !== undefined) return false;
    if (phase.formula.phase === 'g' || phase.stableK.length > 0) return true;
    const same = byComposition.get(compositionKey(phase.formula)) ?? [];
    return !same.some(({ stableK }) => stableK.length > 0);
  });
}

/** The phase of that exact id, or undefined. */
export function phaseOfId(id: string): ThermoPhase | undefined {
  return library().byId.get(id);
}

/**
 * All phases with the formula's atoms and charge, in its phase where it carries one. Isomers and forms stand side by side:
 * the one that is stable at 298.15 K first, then by id.
 */
export function phasesOfFormula(formula: Formula): readonly ThermoPhase[] {
  const same = library().byComposition.get(compositionKey(formula)) ?? [];
  return formula.phase === undefined ? same : same.filter((phase) => phase.formula.phase === formula.phase);
}

/**
 * Heat capacity, enthalpy, entropy and Gibbs energy of a phase at a temperature in K and 1 bar, per mole; enthalpy is zero
 * for the elements in their reference states at 298.15 K. Undefined for a temperature that is not positive and finite.
 */
export function propertiesOfPhase(phase: ThermoPhase, temperatureK: number): PhaseProperties | undefined {
  if (!(temperatureK > 0) || !Number.isFinite(temperatureK)) return undefined;
  const [fromK, toK] = phase.validK;
  const extrapolated = temperatureK < fromK ? 'below' : temperatureK > toK ? 'above' : 'no';
  return { ...evaluateCurve(phase.curve, temperatureK), temperatureK, extrapolated, validK: phase.validK };
}

/**
 * The condensed phase with the lowest Gibbs energy among those of a composition, at a temperature in K; where two meet, the
 * upper one. Only phases inside their valid ranges count, and none that is left out of searches. Whether a gas would be
 * more stable still depends on pressure, and is not asked here.
 */
export function stableCondensedPhase(
  formula: Pick<Formula, 'composition' | 'charge'>,
  temperatureK: number,
): StablePhase {
  const condensed = (library().byComposition.get(compositionKey(formula)) ?? []).filter(
    (phase) => phase.formula.phase !== 'g',
  );
  if (condensed.length === 0) return { kind: 'unknown-composition' };
  let found: { phase: ThermoPhase; startK: number } | undefined;
  for (const phase of condensed) {
    for (const [startK, endK] of phase.stableK) {
      const isIn = startK <= temperatureK && temperatureK <= endK;
      if (isIn && (found === undefined || startK > found.startK)) found = { phase, startK };
    }
  }
  const properties = found === undefined ? undefined : propertiesOfPhase(found.phase, temperatureK);
  if (found !== undefined && properties !== undefined) return { kind: 'phase', phase: found.phase, properties };
  const ended = condensed.find(
    ({ limit, stableK }) => limit !== undefined && limit.atK < temperatureK && stableK.length > 0,
  );
  if (ended?.limit !== undefined) return { kind: 'past-limit', phase: ended, limit: ended.limit };
  return { kind: 'outside-data', stableK: condensed.flatMap((phase) => phase.stableK).sort((a, b) => a[0] - b[0]) };
}

interface Library {
  readonly phases: readonly ThermoPhase[];
  readonly byId: ReadonlyMap<string, ThermoPhase>;
  readonly byComposition: ReadonlyMap<string, readonly ThermoPhase[]>;
}

let built: Library | undefined;

function library(): Library {
  built ??= buildLibrary();
  return built;
}

function buildLibrary(): Library {
  const limits = new Map(phaseLimits.map((limit) => [limit.phase, limit]));
  const hypothetical = new Map(hypotheticalPhases.map(({ phase, why }) => [phase, why]));
  // Phases of one composition are written alike, so each formula is read once.
  const formulas = new Map<string, Formula | FormulaFault>();
  const phases: ThermoPhase[] = [];
  const add = (record: Omit<PhaseFit, 'table'>, kept: KeptByHand): void => {
    const formula = formulas.get(record.formula) ?? parseFormula(record.formula);
    formulas.set(record.formula, formula);
    const phase = thermoPhase(record, formula, kept);
    if (phase !== undefined) phases.push(phase);
  };
  const byHand = phasesByHand();
  // A fitted crystal changes into a liquid kept by hand as that liquid does into it.
  const changesInto = new Map<string, readonly PhaseChangeFit[]>();
  for (const { fit } of byHand) {
    for (const change of fit.changes ?? []) changesInto.set(change.with, [{ ...change, with: fit.id }]);
  }
  for (const record of phaseFits) {
    const more = changesInto.get(record.id);
    add(more === undefined ? record : { ...record, changes: [...(record.changes ?? []), ...more] }, {
      limit: limits.get(record.id),
      hypothetical: hypothetical.get(record.id),
      isSlow: false,
      source: `Chase 1998, table ${record.table}`,
    });
  }
  for (const { fit, limit, isSlow, source } of byHand) add(fit, { limit, hypothetical: undefined, isSlow, source });
  const byComposition = new Map<string, ThermoPhase[]>();
  for (const phase of phases) {
    const key = compositionKey(phase.formula);
    const same = byComposition.get(key);
    if (same === undefined) byComposition.set(key, [phase]);
    else same.push(phase);
  }
  for (const same of byComposition.values()) same.sort(byStability);
  return { phases, byId: new Map(phases.map((phase) => [phase.id, phase])), byComposition };
}

/** What is kept by hand about a phase. */
interface KeptByHand {
  readonly limit: PhaseLimit | undefined;
  readonly hypothetical: string | undefined;
  readonly isSlow: boolean;
  readonly source: string;
}

function phasesByHand(): readonly HandPhase[] {
  const sources = new Map([...sourceRecords, ...handPhaseSources].map((source) => [source.id, source]));
  const fitted = new Map(phaseFits.map((fit) => [fit.id, fit]));
  return handPhaseRecords.map((record) => handPhase(record, sources, fitted));
}

/** A record whose formula cannot be read has no phase; the tests see to it that there is none. */
function thermoPhase(
  record: Omit<PhaseFit, 'table'>,
  formula: Formula | FormulaFault,
  { limit, hypothetical, isSlow, source }: KeptByHand,
): ThermoPhase | undefined {
  if (formula.kind === 'fault') return undefined;
  const molarMass = molarMassKgPerMol(formula);
  if (molarMass === undefined) return undefined;
  const endK = limit === undefined || limit.byEquilibrium ? Infinity : limit.atK;
  let curve: PhaseCurve | undefined;
  return {
    id: record.id,
    label: record.label,
    formula: {
      kind: 'formula',
      text: formula.text,
      composition: formula.composition,
      charge: formula.charge,
      phase: record.phase,
    },
    form: record.form,
    molarMassKgPerMol: molarMass,
    formationEnthalpyJPerMol: record.formationKJPerMol === undefined ? undefined : record.formationKJPerMol * 1000,
    entropyJPerMolK: record.entropyJPerMolK,
    get curve() {
      return (curve ??= compileCurve(record));
    },
    validK: [record.pieces[0]?.fromK ?? endK, Math.min(record.toK, limit === undefined ? Infinity : existsToK(limit))],
    endK,
    // At 1 bar the composition has no condensed phase above the limit, whichever way it ends.
    stableK: record.leftOut === undefined ? rangesBelow(record.stableK ?? [], limit?.atK ?? Infinity) : [],
    limit,
    changes: record.changes ?? [],
    leftOut: record.leftOut,
    hypothetical,
    isSlow,
    note: record.note,
    source,
  };
}

/**
 * Gases that reach 1 bar at a temperature reach 100 bar at 1.34 times it: with ΔG = 0 at 1 bar and the usual entropy of
 * 150 J/K a mole of gas given off, the ratio is 1 / (1 - R ln 100 / 150).
 */
function existsToK({ atK, byEquilibrium, into, products }: PhaseLimit): number {
  const givesOffGas = Object.keys(into ?? products ?? {}).some((id) => id.includes('(g'));
  return byEquilibrium && givesOffGas ? atK * 1.34 : atK;
}

function rangesBelow(ranges: readonly TemperatureRange[], endK: number): readonly TemperatureRange[] {
  if (ranges.every((range) => range[1] <= endK)) return ranges;
  return ranges
    .map((range): TemperatureRange => [range[0], Math.min(range[1], endK)])
    .filter((range) => range[0] < range[1]);
}

/** Stable at 298.15 K first, then condensed before gas, then by id. */
function byStability(a: ThermoPhase, b: ThermoPhase): number {
  const rank = ({ stableK, formula }: ThermoPhase): number =>
    stableK.some(([startK, endK]) => startK <= 298.15 && 298.15 <= endK) ? 0 : formula.phase === 'g' ? 2 : 1;
  return rank(a) - rank(b) || (a.id < b.id ? -1 : 1);
}
