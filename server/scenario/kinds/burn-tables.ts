// The tables of a burn: products of the flame, of its zone and of each cooled state, where the carbon and the alkali went,
// the state at each temperature, what the path tells (burn-path-tables.ts), and the certificate of the flame. Each is worked
// out when somebody reads its rows: no cooled state and no path is solved before. Knows no wording but labels.
// Invariant: column ids and units are the contract; a number that could not be had is null.

import type { Burn, BurnStateOrNone, MatterState } from '../../core/burn/burn.ts';
import { heatGivenOff } from '../../core/burn/burn-held.ts';
import { depositOf } from '../../core/burn/deposit.ts';
import { alkaliFates, carbonFate, carbonFormOf, shareOfForm, type Fate } from '../../core/burn/fates.ts';
import { gasOfState } from '../../core/burn/gas-of-state.ts';
import type { Equilibrium } from '../../core/equilibrium/equilibrium.ts';
import { finiteCell } from '../finite-cell.ts';
import { lazily } from '../lazily.ts';
import { burnPathTables } from './burn-path-tables.ts';
import { peakGasColumns, peakGasRows } from './burn-peak-gases.ts';
import {
  isShown,
  leastMassShare,
  productCells,
  productColumns,
  remarkColumn,
  substanceColumn,
  type ProductCell,
} from './burn-products.ts';
import type { Column, Table } from '../scenario.ts';

type Row = Table['rows'][number];
type Read<T> = () => T;

/** All tables a burn has; `flame` is its solved flame. */
export function burnTables(burn: Burn, flame: Equilibrium): readonly Table[] {
  const zone = burn.zoneCharge ? burn.zone() : null;
  return [
    productsTable(flame),
    ...(zone?.kind === 'equilibrium' ? [zoneTable(zone)] : []),
    peakGasTable('', 'in the flame', flame, burn),
    ...(zone?.kind === 'equilibrium' ? [peakGasTable('flame-zone-', 'in the flame zone', zone, burn)] : []),
    statesTable(burn),
    cooledProductsTable(burn),
    fateTable('carbon-fate', 'Where the carbon is', burn, flame, (state) => [carbonFate(state)]),
    fateTable('alkali-fate', 'Where the alkali is', burn, flame, alkaliFates),
    ...burnPathTables(burn),
    balanceTable(burn, flame),
    certificateTable(flame),
  ];
}

const temperature: Column = { id: 'temperature', label: 'Temperature', unit: 'K' };

function productsTable(flame: Equilibrium): Table {
  return flameTable(flame, {
    id: 'products',
    label: 'Products in the flame, per kg of fuel',
    columns: [substanceColumn, ...productColumns, remarkColumn],
  });
}

/** The state is there, so its rows are at hand for those who have nothing worked out. */
function flameTable(state: Equilibrium, table: Pick<Table, 'id' | 'label' | 'columns'>): Table {
  return lazily<Table & { readonly traces: readonly Row[] }>(
    { ...table, rows: productCells(state, isShown), traces: [] },
    { traces: () => productCells(state, (row) => !isShown(row)) },
  );
}

function zoneTable(zone: Equilibrium): Table {
  const columns = [
    substanceColumn,
    ...productColumns.map((column) => ({ ...column, id: `flame-zone-${column.id}` })),
    remarkColumn,
  ];
  return flameTable(zone, {
    id: 'flame-zone-products',
    label: 'Products in the flame zone, per kg of fuel',
    columns,
  });
}

function peakGasTable(prefix: string, where: string, state: Equilibrium, { input }: Burn): Table {
  const columns = [substanceColumn, ...peakGasColumns.map((column) => ({ ...column, id: `${prefix}${column.id}` }))];
  const label = `NO and CO if they froze ${where}: order of magnitude, kinetics decide; m³ at 0 °C and 101.325 kPa`;
  return lazyTable({ id: `${prefix}peak-gases`, label, columns }, () => peakGasRows(state, input));
}

function cooledProductsTable(burn: Burn): Table {
  const columns = [substanceColumn, temperature, ...productColumns, remarkColumn];
  const rows = (keeps: (row: ProductCell) => boolean): Row[] =>
    burn.cooled.flatMap((cooled) => {
      const solved = cooled.state();
      if (solved.kind === 'none') return [];
      return productCells(solved, keeps).map(([name = null, ...cells]) => [name, cooled.temperatureK, ...cells]);
    });
  return lazyTable(
    { id: 'cooled-products', label: 'Products as they cool, per kg of fuel', columns },
    () => rows(isShown),
    () => rows((row) => !isShown(row)),
  );
}

/** One row a cooled state: what `condensed share of … at 350 degC` reads. */
function statesTable(burn: Burn): Table {
  const columns: readonly Column[] = [
    temperature,
    { id: 'condensed-share', label: 'Condensed, by mass', unit: '1' },
    { id: 'gas-molar-mass', label: 'Gas, molar mass', unit: 'g/mol' },
    { id: 'carbonate-carbon-share', label: 'Carbon in carbonate', unit: '1' },
    { id: 'heat-above', label: 'Heat released above', unit: 'MJ/kg' },
    { id: 'pressure', label: 'Pressure', unit: 'bar' },
    { id: 'first-melting', label: 'Deposit melts from', unit: 'K' },
    { id: 'sticky-point', label: 'sticks from', unit: 'K' },
    { id: 'flow-point', label: 'runs from', unit: 'K' },
    { id: 'composition', label: 'Composition', unit: null },
  ];
  const row = (state: BurnStateOrNone, temperatureK: number): Row => {
    if (state.kind === 'none') {
      const why = state.reason === 'outside-tables' ? 'beyond all data' : 'not found';
      return [temperatureK, null, null, null, null, null, null, null, null, why];
    }
    const heatJ = heatGivenOff(burn.input, burn.charge, state);
    const deposit = depositOf(state);
    return [
      temperatureK,
      state.condensedMassShare,
      inGrams(gasOfState(state)?.molarMassKgPerMol),
      carbonateShare(state),
      heatJ === null ? null : heatJ / 1e6,
      state.gasMol > 0 ? state.pressurePa / 1e5 : null,
      deposit?.firstMeltingK ?? null,
      deposit?.stickyK ?? null,
      deposit?.flowingK ?? null,
      state.kind === 'frozen' ? 'frozen' : 'equilibrium',
    ];
  };
  return lazyTable({ id: 'cooled-states', label: 'States as it cools, per kg of fuel', columns }, () =>
    burn.cooled.map((cooled) => row(cooled.state(), cooled.temperatureK)),
  );
}

/** Share of the carbon that is in carbonate, in any phase; null where there is no carbon or no carbonate could form. */
export function carbonateShare(state: MatterState): number | null {
  const fate = state.candidates.phases.some(({ formula }) => carbonFormOf(formula) === 'carbonate')
    ? carbonFate(state)
    : undefined;
  return fate ? shareOfForm(fate, 'carbonate') : null;
}

/** Where an element went: one row a form that holds any of it in some state, one column a state. */
function fateTable<Form extends string>(
  id: string,
  label: string,
  burn: Burn,
  flame: Equilibrium,
  fatesOf: (state: MatterState) => readonly (Fate<Form> | undefined)[],
): Table {
  const columns: readonly Column[] = [
    { id: 'form', label: 'Form', unit: null },
    temperature,
    { id: 'element', label: 'Element', unit: null },
    { id: 'gas-share', label: 'in gas', unit: '1' },
    { id: 'condensed-share', label: 'condensed', unit: '1' },
  ];
  const rowsOf = (state: BurnStateOrNone): Row[] => {
    if (state.kind === 'none') return [];
    return fatesOf(state).flatMap((fate) =>
      (fate?.rows ?? [])
        .filter(({ gasShare, condensedShare }) => gasShare + condensedShare >= leastMassShare)
        .map((row): Row => [
          row.form.replaceAll('-', ' '),
          state.temperatureK,
          fate?.element ?? '',
          row.gasShare,
          row.condensedShare,
        ]),
    );
  };
  return lazyTable({ id, label, columns }, () => [
    ...rowsOf(flame),
    ...burn.cooled.flatMap((cooled) => rowsOf(cooled.state())),
  ]);
}

function balanceTable({ charge }: Burn, flame: Equilibrium): Table {
  const columns: readonly Column[] = [
    { id: 'element', label: 'Element', unit: null },
    { id: 'given', label: 'in the charge', unit: 'mol/kg' },
    { id: 'found', label: 'in the products', unit: 'mol/kg' },
    { id: 'relative-difference', label: 'Difference', unit: '1' },
  ];
  return lazyTable({ id: 'element-balance', label: 'Elements, per kg of fuel', columns }, () => {
    const { candidates, amountsMol } = flame;
    return charge.elements.map((symbol, index) => {
      const given = charge.elementMol[index] ?? 0;
      const found = candidates.phases.reduce(
        (sum, { formula }, phase) => sum + (formula.composition.get(symbol) ?? 0) * (amountsMol[phase] ?? 0),
        0,
      );
      return [symbol, given, found, given > 0 ? (found - given) / given : null];
    });
  });
}

/** How far the answer is from the exact one. */
export const certificateRows = [
  ['elementBalance', 'Largest relative imbalance of an element'],
  ['largestAffinity', 'Largest affinity of an absent phase, over RT'],
  ['potentialResidual', 'Largest residual of a present phase, over RT'],
  ['heldResidual', 'Residual of the held energy, over RT per atom'],
] as const;

function certificateTable({ certificate }: Equilibrium): Table {
  const columns: readonly Column[] = [
    { id: 'check', label: 'Check', unit: null },
    { id: 'residual', label: 'Residual', unit: '1' },
  ];
  return lazyTable({ id: 'certificate', label: 'Certificate of the equilibrium', columns }, () =>
    certificateRows.map(([key, label]) => [label, finiteCell(certificate[key])]),
  );
}

function lazyTable(
  table: Pick<Table, 'id' | 'label' | 'columns'>,
  rows: Read<readonly Row[]>,
  traces?: Read<readonly Row[]>,
): Table {
  if (!traces) return lazily<Table>({ ...table, rows: [] }, { rows });
  // `traces` may be absent of a table, so the compiler does not know that it is there to be worked out.
  const full: Table & { readonly traces: readonly Row[] } = { ...table, rows: [], traces: [] };
  return lazily(full, { rows, traces });
}

function inGrams(kg: number | undefined): number | null {
  return kg === undefined ? null : kg * 1000;
}
