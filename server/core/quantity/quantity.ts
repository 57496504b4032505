// Quantities: a value in SI, its dimension, what kind of number it is, and how uncertain it is because of which inputs.
// The arithmetic keeps dimensions, tells a temperature from a temperature difference and gauge from absolute pressure,
// and carries uncertainty to first order with correlations. A slip is a plain fault record, never an exception.
// It knows no units but those handed in, no names and no wording. Invariants: the value is finite; `plain` never has the
// dimension of a temperature. Sources: language reference, "Quantities"; JCGM 100:2008 (GUM), sections 5.1 and 5.2.

import { standardAtmospherePa } from './constants.ts';
import {
  describeDimension,
  dimensionOf,
  dimensionless,
  divideDimensions,
  isDimensionless,
  multiplyDimensions,
  raiseDimension,
  sameDimension,
} from './dimension.ts';
import type { Dimension } from './dimension.ts';
import { combineParts, noParts, standardUncertaintyOf } from './parts.ts';
import type { Parts } from './parts.ts';
import { stepToSi, toSi, unitOne } from './read-unit.ts';
import type { Unit } from './read-unit.ts';
import type { Propagated } from './uncertainty.ts';

export type { Parts } from './parts.ts';

/**
 * What a number stands for beyond its dimension. `kelvin` is a number written in K that may still be a temperature or a
 * difference; `gauge-pressure` is counted from the standard atmosphere.
 */
export type QuantityKind = 'plain' | 'temperature' | 'temperature-difference' | 'kelvin' | 'gauge-pressure';

export interface Quantity {
  /** In SI base units; a temperature in K; a gauge pressure in Pa above the standard atmosphere. */
  readonly value: number;
  readonly dimension: Dimension;
  readonly kind: QuantityKind;
  /** By independent input: its contribution to the standard uncertainty, with sign, in SI base units. */
  readonly parts: Parts;
}

export type Operation =
  'add' | 'subtract' | 'multiply' | 'divide' | 'negate' | 'raise' | 'compare' | 'read' | 'as-kind';

/**
 * What is wrong with an operation:
 * `mismatch` different dimensions · `two-temperatures` added · `difference-needed` a temperature stands where only a
 * difference makes sense (second place of a sum, `-25 degC` from a difference, a comparison, a place that asks for one) ·
 * `temperature-needed` the other way round · `temperature-scaled` a temperature multiplied, divided into or negated ·
 * `gauge-and-absolute` mixed, or an absolute pressure needed: `absolutePa` is the gauge side made absolute ·
 * `gauge-scaled` a gauge pressure multiplied, negated, or added to another · `gauge-needed` · `exponent` no plain number,
 * or not whole where the base has a dimension · `uncertainty-negative` · `uncertainty-mismatch` in another dimension ·
 * `uncertainty-relative` a percentage of a temperature scale or gauge pressure · `range` not a finite number.
 */
export type QuantityFaultName =
  | 'mismatch'
  | 'two-temperatures'
  | 'difference-needed'
  | 'temperature-needed'
  | 'temperature-scaled'
  | 'gauge-and-absolute'
  | 'gauge-scaled'
  | 'gauge-needed'
  | 'exponent'
  | 'uncertainty-negative'
  | 'uncertainty-mismatch'
  | 'uncertainty-relative'
  | 'range';

/** A slip in an operation, with both sides as they were. */
export interface QuantityFault {
  readonly fault: QuantityFaultName;
  readonly operation: Operation;
  readonly left: Quantity;
  /** Absent for operations on one quantity. */
  readonly right?: Quantity;
  /** With `gauge-and-absolute`: the gauge pressure as an absolute one, Pa. */
  readonly absolutePa?: number;
}

/** A standard uncertainty as written behind a number. */
export interface WrittenUncertainty {
  readonly number: number;
  /** Its own unit, where it has one: `%` for a relative one; absent when it shares the number's unit. */
  readonly unit?: Unit;
  /** The independent input it belongs to. */
  readonly input: string;
}

/** Whether an answer is a fault and no quantity. */
export function isFault(answer: Quantity | QuantityFault): answer is QuantityFault {
  return 'fault' in answer;
}

/**
 * A written number with its unit (none: a plain number) and standard uncertainty. A percentage is relative, except on a
 * number in %, where it means percentage points; behind a temperature the uncertainty is a difference, in any temperature
 * unit. Faults: `range` and those named `uncertainty-…`.
 */
export function quantityFrom(
  number: number,
  unit: Unit = unitOne,
  uncertainty?: WrittenUncertainty,
): Quantity | QuantityFault {
  const value = toSi(number, unit);
  const bare: Quantity = { value, dimension: unit.dimension, kind: kindOf(unit), parts: noParts };
  if (!Number.isFinite(value)) return { fault: 'range', operation: 'read', left: bare };
  if (!uncertainty) return bare;
  const fault = (name: QuantityFaultName): QuantityFault => ({ fault: name, operation: 'read', left: bare });
  if (uncertainty.number < 0) return fault('uncertainty-negative');
  const own = uncertainty.unit ?? unit;
  const isPercentage = own.text === '%' && unit.text !== '%';
  let standardSi: number;
  if (isPercentage) {
    if (unit.scale === 'temperature' || unit.scale === 'gauge-pressure') return fault('uncertainty-relative');
    standardSi = Math.abs(value) * stepToSi(uncertainty.number, own);
  } else {
    if (!sameDimension(own.dimension, unit.dimension)) return fault('uncertainty-mismatch');
    standardSi = stepToSi(uncertainty.number, own);
  }
  if (!Number.isFinite(standardSi)) return fault('range');
  return standardSi === 0 ? bare : { ...bare, parts: new Map([[uncertainty.input, standardSi]]) };
}

/** A quantity from a value already in SI, as core computes it. `kind` is needed for temperatures only. */
export function quantityOf(
  value: number,
  dimension: Dimension = dimensionless,
  parts: Parts = noParts,
  kind: QuantityKind = sameDimension(dimension, temperatureDimension) ? 'temperature-difference' : 'plain',
): Quantity {
  return { value, dimension, kind, parts };
}

/** An outcome of `propagate` as a quantity; no parts where they could not be had. They are worked out when first read. */
export function quantityOfOutcome(outcome: Propagated, dimension: Dimension = dimensionless): Quantity {
  return Object.defineProperties(quantityOf(outcome.value, dimension), {
    [unread]: { value: outcome },
    parts: readOutcome,
  });
}

/** Where a quantity has its outcome until its parts are read. */
const unread = Symbol('unread');

/** One for all of them: with a function of its own each quantity would be of another shape, and slow to make and read. */
const readOutcome = {
  enumerable: true,
  get(this: { readonly [unread]: Propagated }): Parts {
    return this[unread].parts ?? noParts;
  },
};

/** The standard uncertainty of a quantity in SI base units; 0 when no input has one. */
export function standardUncertainty(quantity: Quantity): number {
  return standardUncertaintyOf(quantity.parts);
}

/** A quantity's dimension and kind in words (`a temperature difference`) and SI units. */
export function describeQuantity(quantity: Pick<Quantity, 'dimension' | 'kind'>): { words: string; si: string } {
  const { words, si } = describeDimension(quantity.dimension);
  if (quantity.kind === 'temperature-difference') return { words: 'a temperature difference', si };
  if (quantity.kind === 'gauge-pressure') return { words: 'a gauge pressure', si };
  return { words, si };
}

/** left + right. */
export function add(left: Quantity, right: Quantity): Quantity | QuantityFault {
  return addUp('add', left, right, 1);
}

/** left - right. A temperature minus a temperature, or a gauge pressure minus a gauge pressure, is a difference. */
export function subtract(left: Quantity, right: Quantity): Quantity | QuantityFault {
  return addUp('subtract', left, right, -1);
}

/** left × right. A bare number of kelvins may be multiplied, a temperature may not. */
export function multiply(left: Quantity, right: Quantity): Quantity | QuantityFault {
  const scaled = findScaled('multiply', left, right);
  if (scaled) return scaled;
  const dimension = multiplyDimensions(left.dimension, right.dimension);
  const parts = combineParts(left.parts, right.value, right.parts, left.value);
  return finish('multiply', left, right, { value: left.value * right.value, dimension, parts });
}

/** left / right. The ratio of two temperatures is the ratio of their thermodynamic temperatures. */
export function divide(left: Quantity, right: Quantity): Quantity | QuantityFault {
  const isRatio = isAbsolute(left) && isAbsolute(right);
  const scaled = isRatio ? undefined : findScaled('divide', left, right);
  if (scaled) return scaled;
  const value = left.value / right.value;
  const dimension = divideDimensions(left.dimension, right.dimension);
  const parts = combineParts(left.parts, 1 / right.value, right.parts, -value / right.value);
  return finish('divide', left, right, { value, dimension, parts });
}

/** -quantity. A temperature cannot be negated (`-20 degC` is one literal), nor can a gauge pressure. */
export function negate(quantity: Quantity): Quantity | QuantityFault {
  if (quantity.kind === 'temperature') return { fault: 'temperature-scaled', operation: 'negate', left: quantity };
  if (quantity.kind === 'gauge-pressure') return { fault: 'gauge-scaled', operation: 'negate', left: quantity };
  // 0 - 0 keeps zero positive, so that `-0` never reaches a reader.
  return { ...quantity, value: 0 - quantity.value, parts: combineParts(quantity.parts, -1, noParts, 0) };
}

/** base ^ exponent: a whole exponent, or any plain number where the base is a plain number too. */
export function raise(base: Quantity, exponent: Quantity): Quantity | QuantityFault {
  const fault = (name: QuantityFaultName): QuantityFault => ({
    fault: name,
    operation: 'raise',
    left: base,
    right: exponent,
  });
  if (!isDimensionless(exponent.dimension)) return fault('exponent');
  const power = exponent.value;
  const isWhole = Number.isInteger(power) && exponent.parts.size === 0;
  if (!isDimensionless(base.dimension) && !(isWhole && Math.abs(power) <= largestPower)) return fault('exponent');
  if (power === 1 && exponent.parts.size === 0) return base;
  const scaled = findScaled('raise', base, exponent);
  if (scaled) return scaled;
  const value = base.value ** power;
  const slope = power === 0 ? 0 : power * base.value ** (power - 1);
  const slopeOfExponent = exponent.parts.size === 0 ? 0 : value * Math.log(base.value);
  const dimension = isDimensionless(base.dimension) ? dimensionless : raiseDimension(base.dimension, power);
  const parts = combineParts(base.parts, slope, exponent.parts, slopeOfExponent);
  return finish('raise', base, exponent, { value, dimension, parts });
}

/** The order of two quantities: negative, zero or positive as left is less than, equal to or greater than right. */
export function compare(left: Quantity, right: Quantity): number | QuantityFault {
  const fault = findIncomparable('compare', left, right);
  return fault ?? Math.sign(left.value - right.value);
}

/**
 * The quantity as the kind its place asks for. A number in K serves as temperature or difference; nothing else changes
 * kind by itself. Faults: `temperature-needed`, `difference-needed`, `gauge-and-absolute`, `gauge-needed`.
 */
export function asKind(quantity: Quantity, kind: QuantityKind): Quantity | QuantityFault {
  if (quantity.kind === kind) return quantity;
  const fault = (name: QuantityFaultName): QuantityFault => ({ fault: name, operation: 'as-kind', left: quantity });
  const isThermal = sameDimension(quantity.dimension, temperatureDimension);
  switch (kind) {
    case 'temperature':
      if (!isThermal) return fault('mismatch');
      return quantity.kind === 'kelvin' ? { ...quantity, kind } : fault('temperature-needed');
    case 'temperature-difference':
      if (!isThermal) return fault('mismatch');
      return quantity.kind === 'kelvin' ? { ...quantity, kind } : fault('difference-needed');
    case 'kelvin':
      return isThermal ? quantity : fault('mismatch');
    case 'gauge-pressure':
      return fault(sameDimension(quantity.dimension, pressureDimension) ? 'gauge-needed' : 'mismatch');
    case 'plain':
      if (quantity.kind === 'gauge-pressure') return gaugeFault('as-kind', quantity);
      return quantity;
  }
}

const temperatureDimension = dimensionOf({ temperature: 1 });
const pressureDimension = dimensionOf({ mass: 1, length: -1, time: -2 });
const largestPower = 20;

function kindOf(unit: Unit): QuantityKind {
  if (unit.scale !== 'plain') return unit.scale;
  return sameDimension(unit.dimension, temperatureDimension) ? 'temperature-difference' : 'plain';
}

/** Whether a number counts from absolute zero: a temperature, or a number of kelvins. */
function isAbsolute(quantity: Quantity): boolean {
  return quantity.kind === 'temperature' || quantity.kind === 'kelvin';
}

function addUp(operation: 'add' | 'subtract', left: Quantity, right: Quantity, sign: 1 | -1): Quantity | QuantityFault {
  const kind = kindOfSum(operation, left, right);
  if (typeof kind !== 'string') return kind;
  const value = left.value + sign * right.value;
  const parts = combineParts(left.parts, 1, right.parts, sign);
  const sum = finish(operation, left, right, { value, dimension: left.dimension, parts });
  return isFault(sum) ? sum : { ...sum, kind };
}

/** The kind of a sum or difference, or what is wrong with it. */
function kindOfSum(operation: 'add' | 'subtract', left: Quantity, right: Quantity): QuantityKind | QuantityFault {
  const fault = (name: QuantityFaultName): QuantityFault => ({ fault: name, operation, left, right });
  if (!sameDimension(left.dimension, right.dimension)) return fault('mismatch');
  if (left.kind === 'gauge-pressure' || right.kind === 'gauge-pressure') {
    if (left.kind !== right.kind) return gaugeFault(operation, left, right);
    // The atmosphere cancels in a difference of two gauge pressures and would count twice in their sum.
    return operation === 'subtract' ? 'plain' : fault('gauge-scaled');
  }
  if (!sameDimension(left.dimension, temperatureDimension)) return 'plain';
  // A number in K on the left is a temperature; on the right it is a difference.
  const leftIsTemperature = isAbsolute(left);
  const rightIsTemperature = right.kind === 'temperature';
  if (leftIsTemperature && rightIsTemperature) {
    return operation === 'add' ? fault('two-temperatures') : 'temperature-difference';
  }
  if (leftIsTemperature) return 'temperature';
  if (rightIsTemperature) return operation === 'add' ? 'temperature' : fault('difference-needed');
  return 'temperature-difference';
}

/** A temperature or gauge pressure where only numbers that count from nothing may stand. */
function findScaled(operation: Operation, left: Quantity, right: Quantity): QuantityFault | undefined {
  for (const side of [left, right]) {
    if (side.kind === 'temperature') return { fault: 'temperature-scaled', operation, left, right };
    if (side.kind === 'gauge-pressure') {
      return { fault: 'gauge-scaled', operation, left, right, absolutePa: side.value + standardAtmospherePa };
    }
  }
  return undefined;
}

function findIncomparable(operation: Operation, left: Quantity, right: Quantity): QuantityFault | undefined {
  if (!sameDimension(left.dimension, right.dimension)) return { fault: 'mismatch', operation, left, right };
  if (left.kind === right.kind) return undefined;
  if (left.kind === 'gauge-pressure' || right.kind === 'gauge-pressure') return gaugeFault(operation, left, right);
  const kinds = [left.kind, right.kind];
  const differ = kinds.includes('temperature') && kinds.includes('temperature-difference');
  return differ ? { fault: 'difference-needed', operation, left, right } : undefined;
}

function gaugeFault(operation: Operation, left: Quantity, right?: Quantity): QuantityFault {
  const gauge = left.kind === 'gauge-pressure' ? left : (right ?? left);
  const absolutePa = gauge.value + standardAtmospherePa;
  return { fault: 'gauge-and-absolute', operation, left, ...(right && { right }), absolutePa };
}

interface Result {
  readonly value: number;
  readonly dimension: Dimension;
  readonly parts: Parts;
}

/** Settles a result's kind and refuses what is not finite. */
function finish(operation: Operation, left: Quantity, right: Quantity, result: Result): Quantity | QuantityFault {
  if (!Number.isFinite(result.value) || ![...result.parts.values()].every(Number.isFinite)) {
    return { fault: 'range', operation, left, right };
  }
  return { ...result, kind: kindOfResult(left, right, result.dimension) };
}

/** Twice a number of kelvins may still be either; any other result in kelvins is a difference. */
function kindOfResult(left: Quantity, right: Quantity, dimension: Dimension): QuantityKind {
  if (!sameDimension(dimension, temperatureDimension)) return 'plain';
  const scaledKelvins =
    (left.kind === 'kelvin' && isDimensionless(right.dimension)) ||
    (right.kind === 'kelvin' && isDimensionless(left.dimension));
  return scaledKelvins ? 'kelvin' : 'temperature-difference';
}
