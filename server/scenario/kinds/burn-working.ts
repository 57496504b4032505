// How a figure of a burn came about: what went in with the lines it comes from, what was assumed, and for the flame itself
// every product and the certificate. Put together when somebody asks. Knows no sentences.
// Invariant: the places are made with the definition, since an answer's places are gathered then.

import { carbonFormOf } from '../../core/burn/fates.ts';
import { productRows } from '../../core/burn/products.ts';
import { knownUnit } from '../../core/quantity/convert.ts';
import { quantityOf, type Quantity } from '../../core/quantity/quantity.ts';
import type { Context } from '../context.ts';
import type { EntriesRead } from '../entries.ts';
import type { FigureRow } from '../material-figures.ts';
import type { Place } from '../place.ts';
import type { AssumptionId, Working, WorkingInput } from '../working.ts';
import type { burnEntries } from './burn-entries.ts';
import type { BurnNames } from './burn-facts.ts';
import type { SolvedBurn } from './burn-solved.ts';
import type { WrittenBurn } from './burn-question.ts';
import { isSlow } from './burn-products.ts';
import { certificateRows } from './burn-tables.ts';

/** Where the entries stand, by their keys. */
export type EntryPlaces = Partial<Record<keyof typeof burnEntries, Place>>;

/** The places of all entries that were read. */
export function workingPlaces(read: EntriesRead<typeof burnEntries>, context: Context): EntryPlaces {
  const places: EntryPlaces = {};
  for (const [key, found] of Object.entries(read)) {
    // The keys of what was read are those of the table.
    if (found) places[key as keyof typeof burnEntries] = context.place(found.entry.span);
  }
  return places;
}

/** The working of one figure. */
export function burnWorking(
  row: FigureRow,
  written: WrittenBurn,
  solved: SolvedBurn,
  names: BurnNames,
  places: EntryPlaces,
): Working {
  const isOfFlame = row.id === 'flame-temperature';
  const method = isOfFlame && written.temperature ? 'flame-at-temperature' : row.method;
  return {
    method,
    inputs: [
      ...chargeInputs(written, solved, names, places),
      ...ownInputs(row, written, solved, places),
      ...(isOfFlame ? [...productInputs(solved), ...certificateInputs(solved)] : []),
    ],
    sources: [...new Set([...written.fuel.sources, ...written.oxidant.sources, tables, ...ownSources(row, solved)])],
    assumptions: assumptionsOf(row, written, solved),
  };
}

function ownSources({ id }: FigureRow, { burnOuts }: SolvedBurn): readonly string[] {
  return id === 'burn-out-time' ? burnOuts().flatMap(({ typical }) => typical ?? []) : [];
}

const tables =
  'NIST-JANAF Thermochemical Tables, 4th edition (Chase 1998), fitted: enthalpies and entropies of the products';

function chargeInputs(
  { fuel, oxidant, amount, held, chargePressure, temperature, heatLoss, lowerHeatingValue }: WrittenBurn,
  { burn }: SolvedBurn,
  names: BurnNames,
  places: EntryPlaces,
): WorkingInput[] {
  const input = (label: string, quantity: Quantity | null, unit: string, place: Place | undefined): WorkingInput[] =>
    quantity ? [{ label, quantity, unit, ...(place ? { place } : {}) }] : [];
  const amountPlace = places.lambda ?? places.equivalenceRatio ?? places.oxidantPerFuel;
  const ratio = quantityOf(burn.charge.oxidantKgPerKg, knownUnit('kg/kg').dimension);
  return [
    ...input(`Enthalpy of ${names.fuel}, per kg`, fuel.enthalpy, 'MJ/kg', places.fuel),
    ...input(`Temperature of ${names.fuel}`, fuel.temperature, 'degC', places.fuelTemperature),
    ...input(`Enthalpy of ${names.oxidant}, per kg`, oxidant.enthalpy, 'MJ/kg', places.oxidant),
    ...input(`Temperature of ${names.oxidant}`, oxidant.temperature, 'degC', places.oxidantState),
    ...(amount.by === 'lambda' ? input('λ', amount.quantity, '1', amountPlace) : []),
    ...(amount.by === 'equivalence-ratio' ? input('Equivalence ratio', amount.quantity, '1', amountPlace) : []),
    ...input('Oxidant per kg of fuel', ratio, 'kg/kg', amount.by === 'mass' ? amountPlace : undefined),
    ...(held.held === 'pressure'
      ? input('Pressure, held', held.pressure, 'bar', places.held)
      : input('Pressure before it burns, its volume held', chargePressure, 'bar', places.held)),
    ...input('Temperature, given', temperature, 'degC', places.temperature),
    ...input('Heat loss, of the lower heating value', heatLoss, '%', places.heatLoss),
    ...(heatLoss ? input('Lower heating value', lowerHeatingValue, 'MJ/kg', undefined) : []),
  ];
}

function ownInputs(row: FigureRow, written: WrittenBurn, { flame }: SolvedBurn, places: EntryPlaces): WorkingInput[] {
  const at = (label: string, quantity: Quantity, unit: string, place?: Place): WorkingInput[] => [
    { label, quantity, unit, ...(place ? { place } : {}) },
  ];
  switch (row.id) {
    case 'heat-above-exhaust':
      return at('Exhaust temperature', written.exhaustTemperature, 'degC', places.exhaustTemperature);
    case 'flame-temperature':
    case 'flame-zone-temperature':
    case 'excess-air-ratio':
    case 'oxidant-fuel-ratio':
    case 'preheat':
      return [];
    default:
      return at(
        'Flame temperature',
        quantityOf(flame.temperatureK, knownUnit('K').dimension, undefined, 'temperature'),
        'K',
      );
  }
}

/** Below this share by mass a product is told in no sheet. */
const leastToldShare = 1e-12;

function productInputs({ flame }: SolvedBurn): WorkingInput[] {
  return productRows(flame, leastToldShare).map(({ id, massShare }) => ({
    label: `${id}, by mass of all products`,
    quantity: quantityOf(massShare),
    unit: '1',
  }));
}

function certificateInputs({ flame }: SolvedBurn): WorkingInput[] {
  return certificateRows.flatMap(([key, label]) => {
    const value = flame.certificate[key];
    return Number.isFinite(value) ? [{ label, quantity: quantityOf(value), unit: '1' }] : [];
  });
}

const densePa = 1e7;

function assumptionsOf({ id }: FigureRow, written: WrittenBurn, solved: SolvedBurn): readonly AssumptionId[] {
  const { flame } = solved;
  const isPeakGas = /nitric|monoxide/.test(id);
  const hasCarbonate = flame.candidates.phases.some(({ formula }) => carbonFormOf(formula) === 'carbonate');
  return [
    ...(isPeakGas ? (['kinetics-decide'] as const) : []),
    ...(hasSlowSolids(id, written, solved) ? (['slow-solids'] as const) : []),
    ...(flame.pressurePa > densePa ? (['dense-gas'] as const) : []),
    ...(hasCarbonate ? (['carbonate-on-cooling'] as const) : []),
    'complete-equilibrium',
    'pure-condensed',
    'ideal-gas',
    ...(written.temperature ? [] : (['no-other-loss'] as const)),
  ];
}

/** Whether the state that a figure rests on counts solids that take hours to form. */
function hasSlowSolids(id: string, { exhaustTemperature }: WrittenBurn, { burn, flame, slate }: SolvedBurn): boolean {
  const state =
    id === 'heat-released' || id === 'released-share'
      ? slate()?.slate
      : id === 'heat-above-exhaust'
        ? burn.at(exhaustTemperature.value)
        : flame;
  if (!state || state.kind === 'none') return false;
  return state.candidates.phases.some(({ formula }, phase) => (state.amountsMol[phase] ?? 0) > 0 && isSlow(formula));
}
