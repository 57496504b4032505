// Works out expressions: literals, names, figures of definitions, shares of portions, calls and arithmetic, to a quantity.
// Where that fails, the cause is said once, at its place, and null is returned; whoever receives null stays silent.
// Depth is bounded by the grammar (brackets nest 64 deep at most), chains of operators by the loop in `chain`.

import type { Binary, Call, Expression, Reference, Word } from '../../grammar/tree.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import { add, divide, isFault, multiply, negate, raise, subtract } from '../core/quantity/quantity.ts';
import { explainUnitWord, listOtherSpellings } from '../core/quantity/suggest-units.ts';
import { materialNamed } from './materials.ts';
import { near, type Context, type Unknowable } from './context.ts';
import { functions, reportCount, type Argument } from './functions.ts';
import { aboveAbsoluteZero, readQuantity, reportFault } from './read-quantity.ts';
import { evaluateMembership, evaluateReference, silent } from './references.ts';
import type { ReferredFigure } from './table-cells.ts';

/** The value of an expression; null when it could not be had (said, or silent because its cause was said elsewhere). */
export function evaluateExpression(expression: Expression, context: Context): Unknowable {
  switch (expression.kind) {
    case 'quantity':
      return readQuantity(expression, context);
    case 'bracket':
      return expression.inner ? evaluateExpression(expression.inner, context) : null;
    case 'unary': {
      const operand = evaluateExpression(expression.operand, context);
      if (!operand) return null;
      const answer = negate(operand);
      return isFault(answer) ? reportFault(answer, expression.span, undefined, context) : answer;
    }
    case 'binary':
      return chain(expression, context);
    case 'word':
      return evaluateName(expression, context);
    case 'reference':
      return referredFigure(expression, context)?.quantity ?? null;
    case 'membership':
      return evaluateMembership(expression, context);
    case 'call':
      return evaluateCall(expression, context);
    case 'lone-unit':
      // A name spelt like a unit has been refused where it is given; its uses are not told off again.
      if (context.scope.lookup(context.written(expression.span))) return null;
      context.report(expression.span, {
        code: 'name/wrong-kind',
        name: context.written(expression.span),
        is: 'a unit without a number',
        needed: 'a number',
      });
      return null;
    case 'text':
    case 'comparison':
    case 'within': {
      const is = { text: 'a text', comparison: 'a claim', within: 'a claim' };
      const name = context.written(expression.span);
      context.report(expression.span, { code: 'name/wrong-kind', name, is: is[expression.kind], needed: 'a number' });
      return null;
    }
  }
}

/** A figure or a cell of a table, with the unit it is told in. */
export function referredFigure(reference: Reference, context: Context): ReferredFigure | null {
  return evaluateReference(reference, context, (at) => evaluateExpression(at, context));
}

/** Left-leaning chains of operators are walked in a loop: a sum of ten thousand terms must not exhaust the stack. */
function chain(expression: Binary, context: Context): Unknowable {
  const operations: Binary[] = [];
  let first: Expression = expression;
  while (first.kind === 'binary') {
    operations.push(first);
    first = first.left;
  }
  let left = evaluateExpression(first, context);
  for (let operation = operations.pop(); operation; operation = operations.pop()) {
    const right = evaluateExpression(operation.right, context);
    if (!left || !right) {
      left = null;
      continue;
    }
    const answer = operators[operation.operator](left, right);
    left = isFault(answer)
      ? reportFault(answer, operation.left.span, operation.right.span, context)
      : aboveAbsoluteZero(answer, operation.span, context);
  }
  return left;
}

const operators = { '+': add, '-': subtract, '*': multiply, '/': divide, '^': raise } as const;

/** A word that stands for nothing: a misspelt name, or a misspelt unit (`3 kJ/kgg` divides by a word of that name). */
function reportUnknownName(word: Word, context: Context): void {
  const suggestions = near(word.text, context.scope.names());
  const isUnitElsewhere = listOtherSpellings().has(word.text);
  const units = suggestions.length > 0 && !isUnitElsewhere ? null : explainUnitWord(word.text);
  if (units && units.offers.length > 0) {
    const { offers, why } = units;
    context.report(word.span, { code: 'unit/unknown', word: word.text, near: offers, hint: why ?? null });
  } else {
    context.report(word.span, { code: 'name/unknown', what: 'value', word: word.text, near: suggestions });
  }
}

function evaluateCall(call: Call, context: Context): Unknowable {
  const known = functions.get(call.name.text);
  if (!known) {
    const suggestions = near(call.name.text, functions.keys());
    const word = call.name.text;
    context.report(call.name.span, { code: 'name/unknown', what: 'function', word, near: suggestions });
    return null;
  }
  if (known.takes === 'substance') {
    const [argument, ...others] = call.arguments;
    if (!argument || others.length > 0) return reportCount(call, 'one substance', context);
    if (argument.kind !== 'word') {
      const name = context.written(argument.span);
      context.report(argument.span, { code: 'name/wrong-kind', name, is: 'a value', needed: 'a substance or formula' });
      return null;
    }
    const material = materialNamed(argument, context, 'composition');
    return material && known.evaluate(call, material, context);
  }
  const values: Argument[] = [];
  for (const expression of call.arguments) {
    const quantity = evaluateExpression(expression, context);
    if (quantity) values.push({ expression, quantity });
  }
  return values.length === call.arguments.length ? known.evaluate(call, values, context) : null;
}

function evaluateName(word: Word, context: Context): Unknowable {
  const named = context.scope.lookup(word.text);
  if (named?.kind === 'value') {
    context.mean(word.span, { kind: 'value', name: word.text, value: named.value });
    return named.value.quantity;
  }
  if (named?.kind === 'unknown') return null;
  if (named?.kind === 'unevaluated') return silent(word, named.definition, context);
  if (named) {
    context.mean(word.span, { kind: 'definition', name: word.text, definition: named.definition });
    const is = `a ${named.definition.kind}`;
    context.report(word.span, { code: 'name/wrong-kind', name: word.text, is, needed: 'a number' });
  } else if (findSubstance(word.text)) {
    context.report(word.span, { code: 'name/wrong-kind', name: word.text, is: 'a substance', needed: 'a number' });
  } else {
    reportUnknownName(word, context);
  }
  return null;
}
