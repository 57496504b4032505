// Quantities into text: with their unit and uncertainty, temperatures also in °C, shares in percent, dimensions in
// words. Chooses a unit a person likes where none is given. Converts with core/quantity and rounds with numbers.ts; works
// nothing out. Invariant: the unit shown is always the unit of the number before it.

import { canBeIn, inUnit, knownUnit, uncertaintyInUnit } from '../core/quantity/convert.ts';
import { noParts } from '../core/quantity/parts.ts';
import { describeQuantity, standardUncertainty, type Quantity } from '../core/quantity/quantity.ts';
import { stepFromSi } from '../core/quantity/read-unit.ts';
import type { Figure } from '../scenario/scenario.ts';
import { formatNumber, formatPercent, formatWithUncertainty, tellingUncertainty, type NumberStyle } from './numbers.ts';
import { bracketed, unitForPeople, withUnit } from './units.ts';

/** A number and its standard uncertainty (null: none) in a unit of the contract. Unrounded. */
export interface Reading {
  readonly value: number;
  readonly uncertainty: number | null;
  readonly unit: string;
}

/** The quantity in `unit` (null: coherent SI), unrounded. The unit must fit the quantity, as for `inUnit`. */
export function readingIn(quantity: Quantity, unit: string | null): Reading {
  if (unit === null) {
    const uncertainty = standardUncertainty(quantity);
    return { value: quantity.value, uncertainty: uncertainty === 0 ? null : uncertainty, unit: siUnit(quantity) };
  }
  const uncertainty = uncertaintyInUnit(quantity, unit);
  return { value: inUnit(quantity, unit), uncertainty: uncertainty === 0 ? null : uncertainty, unit };
}

/** The coherent SI unit of a quantity as the contract writes it: `J/kg`, `1/s`, `1`. */
export function siUnit(quantity: Pick<Quantity, 'dimension' | 'kind'>): string {
  return describeQuantity(quantity).si;
}

/** `35.46 MJ/kg`, `(44.00 ± 0.20) MJ/kg`; without a unit given, in one that gives a handy number. */
export function quantityText(quantity: Quantity, unit: string | null = null, style: NumberStyle = 'people'): string {
  return readingText(readingIn(quantity, unit ?? handyUnit(quantity)), style);
}

/** The same for a number already in its unit. */
export function readingText({ value, uncertainty, unit }: Reading, style: NumberStyle = 'people'): string {
  const number = formatWithUncertainty(value, uncertainty, style);
  const shownUnit = style === 'people' ? unitForPeople(unit) : unit === '1' ? '' : unit;
  return shownUnit === '' ? number : withUnit(bracketed(number), shownUnit);
}

/** A figure's value for a person: a share in percent, a temperature also in °C, the rest in the figure's unit. */
export function figureText({ id, quantity, unit, band }: ToldFigure): string {
  const key = `${id} ${unit}`;
  const known = figureTexts.get(quantity);
  if (known?.key === key && !band) return known.text;
  const { value, uncertainty } = readingIn(quantity, unit);
  const telling =
    uncertainty !== null && tellingUncertainty(value, uncertainty) === null ? certain(quantity) : quantity;
  const told = isShare(id, unit) ? shareText(telling) : toldText(telling, unit);
  if (band) return `${told} (${bandText(id, unit, band)})`;
  figureTexts.set(quantity, { key, text: told });
  return told;
}

function certain(quantity: Quantity): Quantity {
  return { ...quantity, parts: noParts };
}

type ToldFigure = Pick<Figure, 'id' | 'quantity' | 'unit' | 'band'>;

/** The ends of a band as plain numbers in the figure's unit: `195 to 205`, `41 % to 43 %`. */
function bandText(id: string, unit: string, { low, high }: NonNullable<Figure['band']>): string {
  const end = (quantity: Quantity): string =>
    isShare(id, unit) ? formatPercent(quantity.value) : formatNumber(inUnit(quantity, unit));
  return `${end(low)} to ${end(high)}`;
}

/** Quantities never change, and a list of completions shows those of hundreds of figures at every key. */
const figureTexts = new WeakMap<Quantity, { readonly key: string; readonly text: string }>();

/** The parts of `figureText` for a table: the number (with ±), its unit, and what stands behind in brackets. */
export function figureCells({ id, quantity, unit, band }: ToldFigure): FigureCells {
  const { value, uncertainty: own } = readingIn(quantity, unit);
  const uncertainty = tellingUncertainty(value, own);
  const ends = band ? bandText(id, unit, band) : '';
  if (isShare(id, unit)) {
    return {
      number: formatWithUncertainty(value * 100, uncertainty === null ? null : uncertainty * 100),
      unit: '%',
      note: ends,
    };
  }
  const celsius = quantity.kind === 'temperature' && unit === 'K' ? celsiusText(quantity) : '';
  const note = [celsius, ends].filter((part) => part !== '').join(', ');
  return { number: formatWithUncertainty(value, uncertainty), unit: unitForPeople(unit), note };
}

export interface FigureCells {
  readonly number: string;
  readonly unit: string;
  readonly note: string;
}

/** A quantity as engineers tell it: a temperature as `1985 K (1712 °C)`, others in their unit. */
export function toldText(quantity: Quantity, unit: string | null): string {
  const told = quantityText(quantity, unit);
  const inKelvins = (unit ?? handyUnit(quantity)) === 'K';
  return quantity.kind === 'temperature' && inKelvins ? `${told} (${celsiusText(quantity)})` : told;
}

/** A temperature in °C, without its uncertainty. */
export function celsiusText(temperature: Quantity): string {
  return `${formatNumber(inUnit(temperature, 'degC'))} °C`;
}

/** Whether a figure or column is a share of a whole, which people read in percent. */
export function isShare(id: string, unit: string | null): boolean {
  return (
    unit === '1' &&
    /(^|-)(share|flammable-limit|efficiency|wetness)$|^((best|weighted)-)?load(-above|-up-to)?$/.test(id)
  );
}

/** A share told in percent: `30 %`, `(30.0 ± 1.5) %`. */
export function shareText(share: Quantity): string {
  const uncertainty = standardUncertainty(share);
  if (uncertainty === 0) return formatPercent(share.value);
  return `${bracketed(formatWithUncertainty(share.value * 100, uncertainty * 100))} %`;
}

/** How far two quantities of one kind are apart, as a positive step of `unit`: `0.9 MJ/kg`, `200 K`. */
export function distanceText(from: Quantity, to: Quantity, unit: string | null): string {
  const shown = knownUnit(unit ?? handyUnit(to.value === 0 ? from : to));
  const step = Math.abs(from.value - to.value);
  // A difference of two temperatures is in kelvins, whatever scale they are told in.
  if (shown.scale === 'temperature') return `${formatNumber(step)} K`;
  const number = formatNumber(stepFromSi(step, shown));
  // "10 % below 40 %" could be 36 %.
  return shown.text === '%' ? `${number} percentage points` : withUnit(number, unitForPeople(shown.text));
}

/** A dimension for a sentence, with its SI unit: `a mass flow (kg/s)`, `a plain number`. */
export function dimensionPhrase(quantity: Pick<Quantity, 'dimension' | 'kind'>): string {
  const { words, si } = describeQuantity(quantity);
  const shown = unitForPeople(si);
  if (shown === '') return words;
  return words.endsWith(si) ? words.slice(0, -si.length) + shown : `${words} (${shown})`;
}

/** A unit that shows the quantity between 1 and 1000 where one of the trade does, otherwise its SI unit. */
export function handyUnit(quantity: Quantity): string {
  const si = siUnit(quantity);
  if (quantity.kind === 'gauge-pressure') return 'barg';
  const candidates = handyUnits[si] ?? [si];
  const fitting = candidates.filter((unit) => canBeIn(quantity, knownUnit(unit)));
  // From the largest unit down, the first that leaves at least 1.
  return fitting.find((unit) => Math.abs(inUnit(quantity, unit)) >= 1) ?? fitting.at(-1) ?? si;
}

/** By SI unit, from large to small; the last is the one for everything smaller and for zero. */
const handyUnits: Readonly<Record<string, readonly string[]>> = {
  kg: ['t', 'kg', 'g', 'mg'],
  m: ['km', 'm', 'mm'],
  m3: ['m3', 'L', 'mL'],
  s: ['d', 'h', 'min', 's', 'ms'],
  '1/s': ['1/s', '1/h', '1/d', '1/year'],
  J: ['GJ', 'MJ', 'kJ', 'J'],
  W: ['MW', 'kW', 'W'],
  Pa: ['bar', 'mbar', 'Pa'],
  'J/kg': ['MJ/kg', 'kJ/kg', 'J/kg'],
  'J/mol': ['kJ/mol', 'J/mol'],
  'J/(kg K)': ['kJ/(kg K)', 'J/(kg K)'],
  'kg/mol': ['g/mol'],
  'kg/s': ['kg/s', 'kg/h', 'g/h'],
  'kg/J': ['kg/MJ', 'g/kWh'],
  'EUR/J': ['EUR/kWh', 'EUR/MWh'],
  'EUR/kg': ['EUR/kg', 'EUR/t'],
};
