// Quantities out of SI again: into the unit a figure promises, and into the units the trade uses beside it.
// The list of trade units is the only knowledge here; factors come from the unit table by way of read-unit.ts.
// It rounds nothing and writes no text but unit spellings. Invariant: all units of one list measure one dimension.
// Source of the lists: common practice of engine makers, fuel suppliers and class societies.

import { describeDimension, dimensionKey, sameDimension } from './dimension.ts';
import type { Dimension } from './dimension.ts';
import { describeQuantity, standardUncertainty } from './quantity.ts';
import type { Quantity, QuantityKind } from './quantity.ts';
import { fromSi, readUnitText, stepFromSi } from './read-unit.ts';
import type { Unit } from './read-unit.ts';
import type { UnitScale } from './units.ts';

/**
 * A quantity's value in the unit of this text (`MJ/kg`, `t/year`, `1`). The text is our own promise: one that is no unit,
 * or measures something else, is a mistake in the program and throws. Temperatures go to K and degC, differences to K.
 */
export function inUnit(quantity: Quantity, unitText: string): number {
  return fromSi(quantity.value, unitFor(quantity, unitText));
}

/** The standard uncertainty of a quantity as steps of this unit; 0 when it has none. Throws as `inUnit` does. */
export function uncertaintyInUnit(quantity: Quantity, unitText: string): number {
  return stepFromSi(standardUncertainty(quantity), unitFor(quantity, unitText));
}

/** The unit of a text of ours, kept after the first reading. Throws when it is none. */
export function knownUnit(unitText: string): Unit {
  const known = knownUnits.get(unitText);
  if (known) return known;
  const reading = readUnitText(unitText);
  if (!reading.ok) throw new Error(`"${unitText}" is no unit: ${reading.fault.fault}.`);
  knownUnits.set(unitText, reading.unit);
  return reading.unit;
}

/** Whether a quantity of this dimension and kind can be given in this unit. */
export function canBeIn(quantity: Pick<Quantity, 'dimension' | 'kind'>, unit: Unit): boolean {
  return sameDimension(unit.dimension, quantity.dimension) && scalesOfKind[quantity.kind].includes(unit.scale);
}

/**
 * The units the trade uses for such a quantity, each with the value in it, at most six. `written` is the unit the reader
 * already sees: it is left out, and where two trades share a dimension (bar and MJ/L) it chooses the list.
 */
export function siblingUnits(quantity: Quantity, written?: string): readonly { unit: string; value: number }[] {
  const lists = (tradeUnits.get(dimensionKey(quantity.dimension)) ?? []).map((texts) => texts.map(knownUnit));
  const writtenReading = written === undefined ? undefined : readUnitText(written);
  const writtenText = writtenReading?.ok ? writtenReading.unit.text : undefined;
  const list = lists.find((units) => units.some(({ text }) => text === writtenText)) ?? lists[0] ?? [];
  return list
    .filter((unit) => unit.text !== writtenText && canBeIn(quantity, unit))
    .slice(0, 6)
    .map((unit) => ({ unit: unit.text, value: fromSi(quantity.value, unit) }));
}

/** The units the trade uses for a dimension, commonest first, for completion; its SI unit where no list names it. */
export function tradeUnitsOf(dimension: Dimension, kind: QuantityKind = 'plain'): readonly string[] {
  const texts = (tradeUnits.get(dimensionKey(dimension)) ?? []).flat();
  const fitting = texts.filter((text) => canBeIn({ dimension, kind }, knownUnit(text)));
  if (fitting.length > 0) return fitting;
  return [describeDimension(dimension).si].filter((text) => text !== '1');
}

const scalesOfKind: Readonly<Record<QuantityKind, readonly UnitScale[]>> = {
  plain: ['plain', 'kelvin'],
  temperature: ['kelvin', 'temperature'],
  'temperature-difference': ['plain', 'kelvin'],
  kelvin: ['plain', 'kelvin', 'temperature'],
  'gauge-pressure': ['gauge-pressure'],
};

const knownUnits = new Map<string, Unit>();

function unitFor(quantity: Quantity, unitText: string): Unit {
  const unit = knownUnit(unitText);
  if (canBeIn(quantity, unit)) return unit;
  throw new Error(`${describeQuantity(quantity).words} cannot be given in ${unitText}.`);
}

/** One list a quantity of the trade, commonest unit first. */
const tradeLists: readonly (readonly string[])[] = [
  ['%', 'ppm'],
  ['m', 'mm', 'km', 'nmi', 'ft', 'inch'],
  ['m2', 'cm2', 'ft2', 'ha'],
  ['m3', 'L', 'bbl', 'gal', 'ft3'],
  ['kg', 'g', 't', 'lb'],
  ['h', 's', 'min', 'd', 'year'],
  ['K', 'degC', 'degF', 'degR'],
  ['mol', 'mmol', 'kmol'],
  ['A', 'kA'],
  ['V', 'kV'],
  ['1/s', '1/h', '1/year', 'rpm', 'Hz'],
  ['kn', 'm/s', 'km/h', 'mile/h'],
  ['m/s2', 'ft/s2'],
  ['N', 'kN', 'lbf'],
  ['bar', 'kPa', 'MPa', 'psi', 'atm', 'mmHg'],
  ['barg', 'psig'],
  ['MJ/L', 'kWh/L', 'MJ/m3', 'GJ/m3', 'kWh/m3', 'Btu/gal'],
  ['MJ', 'kWh', 'GJ', 'MWh', 'Btu', 'kcal'],
  ['kW', 'MW', 'hp', 'PS'],
  ['MJ/kg', 'kWh/kg', 'kJ/kg', 'Btu/lb', 'kcal/kg'],
  ['kW/kg', 'W/kg'],
  ['kJ/mol', 'J/mol', 'kcal/mol'],
  ['kJ/(kg K)', 'J/(kg K)', 'Btu/(lb degR)'],
  ['J/(mol K)', 'cal/(mol K)'],
  ['kW/m2', 'W/m2'],
  ['W/(m K)'],
  ['W/(m2 K)'],
  ['kg/s', 'kg/h', 't/d', 't/year'],
  ['m3/h', 'm3/s', 'L/min', 'gal/min'],
  ['mol/s', 'mol/h', 'kmol/h'],
  ['kg/m3', 'g/cm3', 'kg/L', 'lb/ft3'],
  ['m3/kg', 'L/kg'],
  ['g/mol', 'kg/kmol', 'kg/mol'],
  ['L/mol', 'cm3/mol', 'm3/mol'],
  ['mol/kg', 'mmol/kg', 'umol/kg'],
  ['mol/L', 'mol/m3', 'mmol/L'],
  ['g/kWh', 'g/MJ', 'kg/GJ', 'lb/MMBtu'],
  ['L/kWh', 'm3/MWh'],
  ['mPa s', 'cP', 'Pa s'],
  ['mm2/s', 'cSt', 'm2/s'],
  ['g/(kN s)', 'kg/(N s)'],
  ['t nmi', 't km'],
  ['g/(t nmi)', 'g/(t km)', '1/m'],
  ...['EUR', 'USD', 'GBP'].flatMap((money) => [
    [money, `k${money}`, `M${money}`],
    [`${money}/kWh`, `${money}/MWh`, `${money}/GJ`, `${money}/MMBtu`],
    [`${money}/t`, `${money}/kg`],
    [`${money}/L`, `${money}/m3`, `${money}/bbl`],
    [`${money}/year`, `${money}/d`, `${money}/h`],
    [`${money}/kW`, `${money}/MW`],
  ]),
];

const tradeUnits: ReadonlyMap<string, readonly (readonly string[])[]> = groupByDimension();

function groupByDimension(): Map<string, (readonly string[])[]> {
  const grouped = new Map<string, (readonly string[])[]>();
  for (const list of tradeLists) {
    const key = dimensionKey(knownUnit(list[0] ?? '1').dimension);
    grouped.set(key, [...(grouped.get(key) ?? []), list]);
  }
  return grouped;
}
