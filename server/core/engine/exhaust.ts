// What leaves an engine: each product of the exhaust as it is frozen at the end of expansion, per kg of fuel, its share of the
// wet and of the dry gas, and that referred to 15 % of oxygen as limits of emissions are.
// Knows no limits. Invariant: amounts are those of the cycle; what has as much oxygen as air has no share at 15 %.
// Nitric oxide and carbon monoxide are those of equilibrium until the gas froze: kinetics decide them, not this.
// Source of the reference: (20.946 - 15) over (20.946 - O2), dry, per cent by volume, as in emission rules for engines and
// turbines (there with 20.9 or 21).

import { productRows } from '../burn/products.ts';
import type { ProductRow } from '../burn/products.ts';
import type { MatterState } from '../burn/burn.ts';
import type { SolvedCycle } from './work-cycle.ts';

export interface ExhaustRow extends ProductRow {
  /** Of the dry gas diluted, or thickened, to 15 % of oxygen; null for what is condensed or water, or what air is made of. */
  readonly shareAt15: number | null;
}

/** The composition of the exhaust at its temperature, of all that was in the cylinder. */
export function exhaustMatter({ cycle }: SolvedCycle, exhaustPressurePa: number): MatterState {
  return cycle.expanded.matter({ temperatureK: cycle.exhaustTemperatureK, pressurePa: exhaustPressurePa });
}

/** The rows of a state, `contentTimes` the products of 1 kg of fuel. */
export function exhaustRows(state: MatterState, contentTimes: number, leastMassShare = 0): readonly ExhaustRow[] {
  const rows = productRows(state, leastMassShare);
  const oxygen = rows.find(({ id }) => id === 'O2(g)')?.dryMoleShare ?? 0;
  const factor = oxygen < oxygenOfAir ? (oxygenOfAir - oxygenReference) / (oxygenOfAir - oxygen) : null;
  return rows.map((row) => ({
    ...row,
    mol: row.mol / contentTimes,
    massKg: row.massKg / contentTimes,
    // Diluting with air brings more of what air is made of, so those have no such share.
    shareAt15: row.dryMoleShare === null || factor === null || ofAir.has(row.id) ? null : row.dryMoleShare * factor,
  }));
}

const ofAir = new Set(['N2(g)', 'O2(g)', 'Ar(g)']);
const oxygenOfAir = 0.20946;
const oxygenReference = 0.15;
