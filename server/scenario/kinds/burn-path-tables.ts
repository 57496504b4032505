// The tables of a burn that rest on its cooling path: what condenses when, and where the carbon would be if the gas froze.
// A path takes too long for the typing path: whoever looks from the editor asks for the work first, and the command line has
// it done on the spot. Knows no wording but labels.
// Invariant: nothing is worked out before somebody looks, and then once for both tables.

import type { Burn, PathGap } from '../../core/burn/burn.ts';
import {
  accountOfPath,
  burnKey,
  pathAccountOf,
  type PathAccount,
  type PhaseStay,
} from '../../core/burn/path-account.ts';
import { alkaliMetals } from '../../core/substance/elements.ts';
import { parseFormula } from '../../core/substance/formula.ts';
import { lazily } from '../lazily.ts';
import type { Column, Table, TableWork } from '../scenario.ts';
import { isSlow } from './burn-products.ts';

type Row = Table['rows'][number];

/** Both tables; neither has been worked out. */
export function burnPathTables(burn: Burn): readonly Table[] {
  let known: PathAccount | undefined;
  const account = (): PathAccount => (known ??= accountOfPath(burn.path()));
  const work: TableWork = {
    isDone: () => known !== undefined,
    ask: (longWork) => {
      known ??= longWork(pathAccountOf, burnKey(burn.input), burn.input) ?? undefined;
      return known !== undefined;
    },
  };
  return [condensationTable(account, work), freezingTable(burn, account, work)];
}

function pathTable(
  table: Pick<Table, 'id' | 'label' | 'columns'>,
  work: TableWork,
  rows: () => readonly Row[],
  gaps: () => readonly PathGap[],
): Table {
  // `gaps` may be absent of a table, so the compiler does not know that it is there to be worked out.
  const full: Table & { readonly gaps: readonly PathGap[] } = { ...table, rows: [], gaps: [] };
  // It is no datum: who lists or compares the table's fields does not meet it.
  Object.defineProperty(full, 'work', { value: work });
  return lazily(full, { rows, gaps });
}

/** What condenses, and what condensed goes again, between the flame and 25 °C: one row a stay. */
function condensationTable(account: () => PathAccount, work: TableWork): Table {
  const columns: readonly Column[] = [
    { id: 'substance', label: 'Product', unit: null },
    { id: 'dew-point', label: 'Appears at', unit: 'K' },
    { id: 'end-point', label: 'is gone at', unit: 'K' },
    { id: 'source', label: 'comes from', unit: null },
    { id: 'remark', label: 'Remark', unit: null },
  ];
  const row = (stay: PhaseStay): Row => {
    const formula = parseFormula(stay.id);
    const slow = formula.kind === 'formula' && isSlow(formula) ? 'limit, not forecast' : null;
    return [stay.id, stay.appearsK, stay.leavesK, originOf(stay), slow];
  };
  return pathTable(
    { id: 'condensation', label: 'What condenses as it cools', columns },
    work,
    () => account().stays.map(row),
    () => account().gaps,
  );
}

function originOf({ appearsK, changedFrom, madeFrom, asGo }: PhaseStay): string {
  if (appearsK === null) return 'there in the flame';
  const source = changedFrom.length > 0 ? changedFrom.join(' and ') : ['gas', ...madeFrom].join(' and ');
  const others = changedFrom.length > 0 ? [...madeFrom, ...asGo] : asGo;
  return others.length === 0 ? source : `${source}, as ${others.join(' and ')} goes`;
}

/** What would become of the carbon if the gas froze at each temperature: the answer to "where would it have to freeze". */
function freezingTable(burn: Burn, account: () => PathAccount, work: TableWork): Table {
  const columns: readonly Column[] = [
    { id: 'frozen-at', label: 'Frozen at', unit: 'K' },
    { id: 'frozen-carbonate-share', label: 'Carbon in carbonate', unit: '1' },
    { id: 'frozen-carbon-dioxide-share', label: 'Carbon in carbon dioxide', unit: '1' },
  ];
  const table = { id: 'carbon-against-freezing', label: 'Carbon, if the gas froze', columns };
  const hasCarbonate = burn.charge.elements.includes('C') && burn.charge.elements.some(bindsCarbonate);
  // Without carbonate there is nothing to look for, and no path is worked out.
  if (!hasCarbonate) return { ...table, rows: [] };
  return pathTable(
    table,
    work,
    () => account().carbon.map((row): Row => [row.temperatureK, row.carbonateShare, row.carbonDioxideShare]),
    () => account().gaps,
  );
}

/** Metals whose carbonates are among the products. */
function bindsCarbonate(symbol: string): boolean {
  return alkaliMetals.includes(symbol) || symbol === 'Mg' || symbol === 'Ca';
}
