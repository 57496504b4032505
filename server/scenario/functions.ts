// The functions an expression may call, in one table: name, what it takes, what it gives, its help. A function is checked
// for the number and the dimensions of its values here; uncertainty goes through by the law of propagation.
// Its arguments arrive worked out: this file knows no expressions.

import type { Call, Expression } from '../../grammar/tree.ts';
import {
  dimensionless,
  isDimensionless,
  raiseDimension,
  sameDimension,
  type Dimension,
} from '../core/quantity/dimension.ts';
import { compare, isFault, multiply, quantityOf, type Quantity } from '../core/quantity/quantity.ts';
import { propagate } from '../core/quantity/uncertainty.ts';
import type { Context, Unknowable } from './context.ts';
import type { Material } from './material.ts';
import { fit, reportFault, sided } from './read-quantity.ts';

export type FunctionRow = {
  /** As shown in help: `min(value, value, …)`. */
  readonly signature: string;
  readonly help: string;
} & (
  | {
      readonly takes: 'values';
      evaluate(call: Call, values: readonly Argument[], context: Context): Unknowable;
    }
  | {
      readonly takes: 'substance';
      evaluate(call: Call, material: Material, context: Context): Unknowable;
    }
);

/** An argument as written and its value. */
export interface Argument {
  readonly expression: Expression;
  readonly quantity: Quantity;
}

export const functions: ReadonlyMap<string, FunctionRow> = new Map<string, FunctionRow>([
  [
    'molar_mass',
    {
      signature: 'molar_mass(substance)',
      help: 'The molar mass of a substance or formula, from the standard atomic weights.',
      takes: 'substance',
      evaluate: evaluateMolarMass,
    },
  ],
  [
    'min',
    { signature: 'min(value, value, …)', help: 'The smallest of its values.', takes: 'values', evaluate: extreme(-1) },
  ],
  [
    'max',
    { signature: 'max(value, value, …)', help: 'The largest of its values.', takes: 'values', evaluate: extreme(1) },
  ],
  ['abs', ofOne('abs(value)', 'The value without its sign.', Math.abs, (dimension) => dimension)],
  ['sqrt', ofOne('sqrt(value)', 'The square root.', Math.sqrt, halved)],
  ['exp', ofOne('exp(number)', 'e to the power of a plain number.', Math.exp, plainOnly)],
  ['ln', ofOne('ln(number)', 'The natural logarithm of a plain number.', Math.log, plainOnly)],
  ['log10', ofOne('log10(number)', 'The decimal logarithm of a plain number.', Math.log10, plainOnly)],
]);

/** Says that a call has the wrong number of values. */
export function reportCount(call: Call, takes: string, context: Context): null {
  context.report(call.span, { code: 'name/arguments', name: call.name.text, takes, given: call.arguments.length });
  return null;
}

function evaluateMolarMass(call: Call, material: Material, context: Context): Unknowable {
  if (!material.molarMass) {
    context.report(call.span, { code: 'balance/no-density', substance: material.name, why: 'molar-mass' });
  }
  return material.molarMass;
}

/** `min` and `max`. Only the extreme value's own uncertainty counts, as first order has it. */
function extreme(sign: 1 | -1): (call: Call, values: readonly Argument[], context: Context) => Unknowable {
  return (call, values, context) => {
    let [best] = values;
    if (!best) return reportCount(call, 'at least one value', context);
    for (const argument of values.slice(1)) {
      const order = compare(best.quantity, argument.quantity);
      if (typeof order !== 'number') return reportFault(order, best.expression.span, argument.expression.span, context);
      if (order === -sign) best = argument;
    }
    return best.quantity;
  };
}

function ofOne(
  signature: string,
  help: string,
  f: (value: number) => number,
  dimensionOfResult: (dimension: Dimension) => Dimension | null,
): FunctionRow {
  return { signature, help, takes: 'values', evaluate };

  function evaluate(call: Call, values: readonly Argument[], context: Context): Unknowable {
    const [argument, ...others] = values;
    if (!argument || others.length > 0) return reportCount(call, 'one value', context);
    const { quantity, expression } = argument;
    const dimension = dimensionOfResult(quantity.dimension);
    if (!dimension && dimensionOfResult === plainOnly) {
      return fit(quantity, { dimension: dimensionless, kind: 'plain', example: '%' }, expression.span, context);
    }
    if (!dimension) {
      context.report(expression.span, {
        code: 'unit/exponent',
        text: '1/2',
        base: sided(quantity, expression.span, context),
      });
      return null;
    }
    // Times one is the quantity itself, but for what counts from a zero of its own: `abs(-20 degC)` has no meaning.
    const scaled = multiply(quantity, quantityOf(1));
    if (isFault(scaled)) return reportFault(scaled, expression.span, undefined, context);
    const [outcome] = propagate([quantity], ([value = NaN]) => [f(value)]);
    if (!outcome || !Number.isFinite(outcome.value)) {
      context.report(call.span, { code: 'range/number', text: context.written(call.span), why: 'outside-function' });
      return null;
    }
    const kind = sameDimension(dimension, quantity.dimension) ? scaled.kind : undefined;
    return quantityOf(outcome.value, dimension, outcome.parts, kind);
  }
}

function plainOnly(dimension: Dimension): Dimension | null {
  return isDimensionless(dimension) ? dimension : null;
}

function halved(dimension: Dimension): Dimension | null {
  return Object.values(dimension).every((exponent: number) => exponent % 2 === 0)
    ? raiseDimension(dimension, 0.5)
    : null;
}
