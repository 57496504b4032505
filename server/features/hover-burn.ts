// What a burn's hover tells beside its figures: the leading products of the flame, and where its carbon and its alkali are,
// in the flame and at the coldest state asked for, one line each. Reads tables of the evaluated burn and works nothing out.
// Invariant: shares told in a line are those of one state, largest first, and what is below a tenth of a percent is left out.
import { knownUnit } from '../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import type { EvaluatedDefinition, Table, TableWork } from '../scenario/scenario.ts';
import { assumptionText } from '../wording/assumptions.ts';
import { formatPercent } from '../wording/numbers.ts';
import { celsiusText } from '../wording/quantities.ts';
import { speciesText } from '../wording/species.ts';
import { listed } from '../wording/words.ts';
import type { HoverLine } from './hover-text.ts';

const MOST_PRODUCTS = 6;
const LEAST_SHARE = 1e-3;
const DENSE_BAR = 100;

export function burnLines({ figures, tables }: EvaluatedDefinition): HoverLine[] {
  const find = (id: string): Table | undefined => tables.find((table) => table.id === id);
  const pressure = figures.find(({ id }) => id === 'pressure');
  return [
    ...productLines(find('products')),
    ...fateLines('Carbon', find('carbon-fate')),
    ...fateLines('Alkali', find('alkali-fate')),
    ...condensationLines(find('condensation')),
    ...(pressure && pressure.quantity.value > DENSE_BAR * 1e5 ? [{ sentence: assumptionText('dense-gas') }] : []),
  ];
}

function productLines(table: Table | undefined): HoverLine[] {
  const share = columnOf(table, 'mass-share');
  const products =
    table?.rows.slice(0, MOST_PRODUCTS).map((row) => `${speciesText(text(row[0]))} ${percent(row[share])}`) ?? [];
  return products.length === 0 ? [] : [{ label: 'Leading products, by mass', text: products.join(', ') }];
}

/** What condenses first of each substance, at most so many. */
const MOST_CONDENSING = 4;

/** Which substances condense on the way down and from which temperature on; that it is being worked out, until it is. */
function condensationLines(table: Table | undefined): HoverLine[] {
  if (!table) return [];
  const label = 'Condenses as it cools';
  if (table.work && !table.work.isDone()) return [{ label, text: 'being worked out …' }];
  const point = columnOf(table, 'dew-point');
  const told = table.rows.flatMap((row) => {
    const from = row[point];
    return typeof from === 'number' ? [`${speciesText(text(row[0]))} from ${celsiusText(temperatureOf(from))}`] : [];
  });
  const shown = told.slice(0, MOST_CONDENSING);
  const more = told.length > shown.length ? [`${String(told.length - shown.length)} more`] : [];
  return told.length === 0 ? [] : [{ label, text: [...shown, ...more].join(', ') }];
}

/** The long work whose outcome these lines tell of. */
export function awaitedByBurn({ tables }: EvaluatedDefinition): readonly TableWork[] {
  return tables.flatMap(({ id, work }) => (id === 'condensation' && work && !work.isDone() ? [work] : []));
}

/** Each element's forms in the flame, and at the coldest of the states asked for where there are some. */
function fateLines(label: string, table: Table | undefined): HoverLine[] {
  if (!table || table.rows.length === 0) return [];
  const [temperature, element] = ['temperature', 'element'].map((id) => columnOf(table, id)) as [number, number];
  const [gas, condensed] = ['gas-share', 'condensed-share'].map((id) => columnOf(table, id)) as [number, number];
  const elements = [...new Set(table.rows.map((row) => text(row[element])))];
  // Rows of the flame come first, whatever its temperature.
  const statesK = [...new Set(table.rows.map((row) => Number(row[temperature])))];
  const [flameK] = statesK;
  const coldestK = Math.min(...statesK);
  return elements.map((symbol) => {
    const told = (stateK: number): string => {
      const forms = table.rows
        .filter((row) => row[temperature] === stateK && row[element] === symbol)
        .map((row) => ({ form: text(row[0]), share: Number(row[gas]) + Number(row[condensed]) }))
        .filter(({ share }) => share >= LEAST_SHARE)
        .sort((left, right) => right.share - left.share);
      return listed(forms.map(({ form, share }) => `${formatPercent(Number(share.toPrecision(3)))} ${form}`));
    };
    const parts = [
      ...(flameK === undefined ? [] : [`${told(flameK)} in the flame`]),
      ...(statesK.length > 1 ? [`${told(coldestK)} at ${celsiusText(temperatureOf(coldestK))}`] : []),
    ];
    return {
      label: elements.length > 1 || label === 'Alkali' ? `${label} (${symbol})` : label,
      text: parts.join('; '),
    };
  });
}

function temperatureOf(valueK: number): Quantity {
  return quantityOf(valueK, knownUnit('K').dimension, undefined, 'temperature');
}

function columnOf(table: Table | undefined, id: string): number {
  return table?.columns.findIndex((column) => column.id === id) ?? -1;
}

function text(cell: string | number | null | undefined): string {
  return String(cell ?? '');
}

function percent(cell: string | number | null | undefined): string {
  return typeof cell === 'number' ? formatPercent(cell) : '–';
}
