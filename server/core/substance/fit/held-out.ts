// The species, temperatures and reference states of the second fit, whose chosen rows take no part in it: a check of what the
// curves say between the rows. Knows no files. Invariant: a row held out is never at 298.15 K, at a transition or at an end,
// because there the fit is bound by more than its neighbours.

import { parseFormula } from '../formula.ts';
import { gasConstantJPerMolK } from '../heat-capacity-terms.ts';
import { gibbsInTable, referenceTemperatureK } from './source-table.ts';
import type { SourceRow, SourceTable } from './source-table.ts';

/** Ids of the tables whose rows are held out. */
export const heldOutTables: readonly string[] = [
  ...['H2_g', 'O2_g', 'N2_g', 'H2O_g', 'CO_g', 'CO2_g', 'CH4_g', 'C2H2_g', 'C2H4_g', 'NH3_g', 'NO_g', 'NO2_g', 'OH_g'],
  ...[
    'H_g',
    'O_g',
    'SO2_g',
    'SO3_g',
    'H2S_g',
    'HCl_g',
    'NaCl_g',
    'NaOH_g',
    'KOH_g',
    'LiOH_g',
    'Na_g',
    'AlO_g',
    'SiO_g',
  ],
  ...['C_graphite', 'Na2CO3_cr', 'Na2CO3_l', 'K2CO3_cr', 'NaCl_cr', 'NaOH_l', 'Na2SO4_l', 'MgO_cr', 'CaO_cr'],
  ...['Al2O3_cr_alpha', 'Al2O3_l', 'Fe3O4_cr', 'SiO2_cr_quartz', 'B2O3_l'],
];

/** Rows held out of each. */
export const rowsHeldOut = 6;

/** Temperatures to hold out of a table: six of its inner rows, spread over its range. */
export function temperaturesToHoldOut(table: SourceTable): readonly number[] {
  const inner = table.stretches.flatMap(({ rows }) => rows.slice(1, -1).map((row) => row.temperatureK));
  const free = inner.filter(
    (temperatureK) => Math.abs(temperatureK - referenceTemperatureK) > 5 && !isMarked(table, temperatureK),
  );
  // Evenly by place among the rows, which lie closer where the properties change faster.
  return Array.from(
    { length: rowsHeldOut },
    (_, k) => free[Math.round(((k + 0.5) * free.length) / rowsHeldOut - 0.5)] ?? 0,
  );
}

function isMarked({ record }: SourceTable, temperatureK: number): boolean {
  const ends = record.stableRanges_K.flat();
  return record.transitions.some(({ T_K }) => T_K === temperatureK) || ends.includes(temperatureK);
}

/** Decimal logarithm of the equilibrium constant of formation from the elements in their reference states, by the tables. */
export function formationLogKf(table: SourceTable, row: SourceRow, tables: ReadonlyMap<string, SourceTable>): number {
  const temperatureK = row.temperatureK;
  let gibbsKJ = table.record.dfH298_kJ_per_mol + row.enthalpyKJ - (temperatureK * row.entropy) / 1000;
  const formula = parseFormula(table.record.formula);
  if (formula.kind === 'fault') throw new Error(`${table.record.id}: no formula`);
  for (const [symbol, count] of formula.composition) {
    const reference = referenceStates[symbol]?.find(({ upToK }) => temperatureK <= upToK);
    const element = tables.get(reference?.table ?? '');
    const value = element === undefined ? undefined : gibbsInTable(element, temperatureK);
    if (reference === undefined || value === undefined)
      throw new Error(`${symbol} at ${temperatureK} K: no reference state`);
    gibbsKJ -= (count / reference.atoms) * value;
  }
  return (-gibbsKJ * 1000) / (gasConstantJPerMolK * temperatureK * Math.LN10);
}

interface ReferenceState {
  readonly table: string;
  /** Id of the phase in our data. */
  readonly phase: string;
  readonly atoms: number;
  readonly upToK: number;
}

const always = Number.POSITIVE_INFINITY;

/** Reference states of the elements that the species above hold, as the source chooses them. */
export const referenceStates: Readonly<Record<string, readonly ReferenceState[]>> = {
  H: [{ table: 'H2_g', phase: 'H2(g)', atoms: 2, upToK: always }],
  O: [{ table: 'O2_g', phase: 'O2(g)', atoms: 2, upToK: always }],
  N: [{ table: 'N2_g', phase: 'N2(g)', atoms: 2, upToK: always }],
  Cl: [{ table: 'Cl2_g', phase: 'Cl2(g)', atoms: 2, upToK: always }],
  C: [{ table: 'C_graphite', phase: 'C(cr,graphite)', atoms: 1, upToK: always }],
  Li: [
    { table: 'Li_cr', phase: 'Li(cr)', atoms: 1, upToK: 453.69 },
    { table: 'Li_l', phase: 'Li(l)', atoms: 1, upToK: 1620.12 },
    { table: 'Li_g', phase: 'Li(g)', atoms: 1, upToK: always },
  ],
  Na: [
    { table: 'Na_cr', phase: 'Na(cr)', atoms: 1, upToK: 370.98 },
    { table: 'Na_l', phase: 'Na(l)', atoms: 1, upToK: 1170.525 },
    { table: 'Na_g', phase: 'Na(g)', atoms: 1, upToK: always },
  ],
  K: [
    { table: 'K_cr', phase: 'K(cr)', atoms: 1, upToK: 336.35 },
    { table: 'K_l', phase: 'K(l)', atoms: 1, upToK: 1039.54 },
    { table: 'K_g', phase: 'K(g)', atoms: 1, upToK: always },
  ],
  Mg: [
    { table: 'Mg_cr', phase: 'Mg(cr)', atoms: 1, upToK: 923 },
    { table: 'Mg_l', phase: 'Mg(l)', atoms: 1, upToK: 1366.104 },
    { table: 'Mg_g', phase: 'Mg(g)', atoms: 1, upToK: always },
  ],
  Ca: [
    { table: 'Ca_cr_alpha', phase: 'Ca(cr,alpha)', atoms: 1, upToK: 716 },
    { table: 'Ca_cr_beta', phase: 'Ca(cr,beta)', atoms: 1, upToK: 1115 },
    { table: 'Ca_l', phase: 'Ca(l)', atoms: 1, upToK: 1773.658 },
    { table: 'Ca_g', phase: 'Ca(g)', atoms: 1, upToK: always },
  ],
  B: [
    { table: 'B_cr', phase: 'B(cr,beta-rhombohedral)', atoms: 1, upToK: 2350 },
    { table: 'B_l', phase: 'B(l)', atoms: 1, upToK: 4139.449 },
    { table: 'B_g', phase: 'B(g)', atoms: 1, upToK: always },
  ],
  Al: [
    { table: 'Al_cr', phase: 'Al(cr)', atoms: 1, upToK: 933.45 },
    { table: 'Al_l', phase: 'Al(l)', atoms: 1, upToK: 2790.812 },
    { table: 'Al_g', phase: 'Al(g)', atoms: 1, upToK: always },
  ],
  Si: [
    { table: 'Si_cr', phase: 'Si(cr)', atoms: 1, upToK: 1685 },
    { table: 'Si_l', phase: 'Si(l)', atoms: 1, upToK: 3504.616 },
    { table: 'Si_g', phase: 'Si(g)', atoms: 1, upToK: always },
  ],
  S: [
    { table: 'S_cr_orthorhombic', phase: 'S(cr,orthorhombic)', atoms: 1, upToK: 368.3 },
    { table: 'S_cr_monoclinic', phase: 'S(cr,monoclinic)', atoms: 1, upToK: 388.36 },
    { table: 'S_l', phase: 'S(l)', atoms: 1, upToK: 882.117 },
    { table: 'S2_g', phase: 'S2(g)', atoms: 2, upToK: always },
  ],
  Fe: [
    { table: 'Fe_cr_alpha-delta', phase: 'Fe(cr,alpha-delta)', atoms: 1, upToK: 1184 },
    { table: 'Fe_cr_gamma', phase: 'Fe(cr,gamma)', atoms: 1, upToK: 1665 },
    { table: 'Fe_cr_alpha-delta', phase: 'Fe(cr,alpha-delta)', atoms: 1, upToK: 1809 },
    { table: 'Fe_l', phase: 'Fe(l)', atoms: 1, upToK: 3133.345 },
    { table: 'Fe_g', phase: 'Fe(g)', atoms: 1, upToK: always },
  ],
};
