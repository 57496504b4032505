// What a state consists of, as tables read it: amounts, mass shares, shares of the wet and of the dry gas, and the nitric
// oxide and carbon monoxide that a flame would leave if they froze in it.
// Knows no solver and no rounding. Invariant: mass shares of all products add up to 1, shares of the wet gas likewise, and
// of the dry gas without water likewise, to rounding.

import type { MatterState } from './burn.ts';

/** One substance in one phase. Amounts are per kg of fuel. */
export interface ProductRow {
  /** Index into the candidates. */
  readonly phase: number;
  /** `Na2CO3(l)` */
  readonly id: string;
  readonly isGas: boolean;
  readonly mol: number;
  readonly massKg: number;
  /** Of everything, gas and condensed. */
  readonly massShare: number;
  /** Of the gas; null for what is condensed. */
  readonly wetMoleShare: number | null;
  /** Of the gas without its water vapour; null for what is condensed, for water, and where there is nothing else. */
  readonly dryMoleShare: number | null;
}

/**
 * Everything with at least `leastMassShare` of the whole, the most by mass first (equal ones in the candidates' order).
 * With 0, the default, every phase that is there at all.
 */
export function productRows(state: MatterState, leastMassShare = 0): readonly ProductRow[] {
  const { candidates, amountsMol, gasMol, massKg } = state;
  const dryMol = dryGasMol(state);
  const rows: ProductRow[] = [];
  candidates.phases.forEach(({ id, formula }, phase) => {
    const mol = amountsMol[phase] ?? 0;
    const mass = mol * (candidates.molarMassKgPerMol[phase] ?? 0);
    const massShare = mass / massKg;
    if (!(mol > 0) || massShare < leastMassShare) return;
    const isGas = phase < candidates.gasCount;
    const isDry = isGas && formula.text !== 'H2O' && dryMol > 0;
    rows.push({
      phase,
      id,
      isGas,
      mol,
      massKg: mass,
      massShare,
      wetMoleShare: isGas ? mol / gasMol : null,
      dryMoleShare: isDry ? mol / dryMol : null,
    });
  });
  return rows.sort((a, b) => b.massShare - a.massShare || a.phase - b.phase);
}

/** mol of gas without its water vapour. */
export function dryGasMol(state: MatterState): number {
  return Math.max(0, state.gasMol - amountOf(state, 'H2O(g)'));
}

/** mol of a phase by its id; 0 where it is no candidate. */
export function amountOf(state: MatterState, id: string): number {
  const phase = state.candidates.phases.findIndex((one) => one.id === id);
  return phase < 0 ? 0 : (state.amountsMol[phase] ?? 0);
}

/** Of one gas as it would freeze in a flame. Equilibrium gives its order of magnitude only: kinetics decide. */
export interface PeakGas {
  readonly id: string;
  readonly molPerKgFuel: number;
  readonly wetMoleShare: number;
  readonly dryMoleShare: number | null;
}

/** NO, NO2 and CO of a state, as far as they are candidates; none without gas. */
export function peakGases(state: MatterState): readonly PeakGas[] {
  if (!(state.gasMol > 0)) return [];
  const dryMol = dryGasMol(state);
  return ['NO(g)', 'NO2(g)', 'CO(g)']
    .filter((id) => state.candidates.phases.some((phase) => phase.id === id))
    .map((id) => {
      const mol = amountOf(state, id);
      return {
        id,
        molPerKgFuel: mol,
        wetMoleShare: mol / state.gasMol,
        dryMoleShare: dryMol > 0 ? mol / dryMol : null,
      };
    });
}
