// Works out expressions: literals, names, figures of definitions, shares of portions, calls and arithmetic, to a quantity.
// Where that fails, the cause is said once, at its place, and null is returned; whoever receives null stays silent.
// Depth is bounded by the grammar (brackets nest 64 deep at most), chains of operators by the loop in `chain`.

import type { Binary, Call, Expression, Membership, Reference, Word } from '../../grammar/tree.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import {
  add,
  divide,
  isFault,
  multiply,
  negate,
  quantityOf,
  raise,
  subtract,
  type Quantity,
} from '../core/quantity/quantity.ts';
import { knownUnit } from '../core/quantity/convert.ts';
import { toSi } from '../core/quantity/read-unit.ts';
import { explainUnitWord, listOtherSpellings } from '../core/quantity/suggest-units.ts';
import { givenFigures } from './given-figures.ts';
import { figuresOfMaterial } from './material-figures.ts';
import { materialNamed } from './materials.ts';
import { near, type Context, type Unknowable } from './context.ts';
import { functions, reportCount, type Argument } from './functions.ts';
import { aboveAbsoluteZero, readQuantity, reportFault } from './read-quantity.ts';
import type { Absent, EvaluatedDefinition, Figure, Table } from './scenario.ts';
import { nearByTrade } from './trade-names.ts';

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
      return evaluateReference(expression, context)?.quantity ?? null;
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

/** A name of a kind that is not evaluated yet: it can be gone to, and that is all; its own finding says so. */
function silent(word: Word, definition: EvaluatedDefinition, context: Context): null {
  context.mean(word.span, { kind: 'definition', name: word.text, definition });
  return null;
}

/** A figure met through a reference: its value and, where it is one of a definition's own, the figure. */
export interface ReferredFigure {
  readonly quantity: Quantity;
  readonly unit: string;
}

/** `words of NAME`, or a cell of one of its tables. */
export function evaluateReference(reference: Reference, context: Context): ReferredFigure | null {
  const { name } = reference;
  if (!name) return null; // the grammar has said that a name is missing
  const named = context.scope.lookup(name.text);
  if (named?.kind === 'unknown') return null;
  if (named?.kind === 'unevaluated') return silent(name, named.definition, context);
  if (named?.kind === 'value') {
    context.mean(name.span, { kind: 'value', name: name.text, value: named.value });
    context.report(name.span, { code: 'name/wrong-kind', name: name.text, is: 'a number', needed: 'a definition' });
    return null;
  }
  if (named) context.mean(name.span, { kind: 'definition', name: name.text, definition: named.definition });
  const owner = named?.definition ?? catalogueOwner(name, context);
  if (!owner) return null;
  if (reference.row) return evaluateCell(reference, reference.row, owner, context);
  const id = reference.words.replaceAll(' ', '-');
  const figure = owner.figures.find((candidate) => candidate.id === id);
  if (!figure) {
    const missing = owner.absent.get(id);
    if (missing)
      context.report(reference.span, { code: 'balance/no-data', what: context.written(reference.span), missing });
    if (missing !== undefined) return null;
    const ids = [...owner.figures.map((candidate) => candidate.id), ...owner.absent.keys()];
    const known = ids.map((candidate) => candidate.replaceAll('-', ' '));
    const suggestions = nearByTrade(reference.words, known);
    context.report(reference.wordsSpan, {
      code: 'name/unknown',
      what: 'figure',
      word: reference.words,
      near: suggestions,
      owner: name.text,
      allowed: known,
    });
    return null;
  }
  if (reference.at) {
    const text = context.written(reference.at.span);
    const takes = 'no `at`: this figure holds at its reference state';
    context.report(reference.at.span, {
      code: 'name/unknown-phrase',
      entry: reference.words,
      text: `at ${text}`,
      takes,
    });
    return null;
  }
  context.mean(reference.wordsSpan, { kind: 'figure', of: name.text, figure });
  return figure;
}

interface Owner {
  readonly figures: readonly Figure[];
  readonly tables: readonly Table[];
  readonly absent: Absent;
}

function catalogueOwner(name: Word, context: Context): Owner | null {
  const material = materialNamed(name, context);
  return (
    material && {
      figures: [...figuresOfMaterial(material), ...givenFigures(material.card)],
      tables: [],
      absent: new Map(),
    }
  );
}

function evaluateCell(reference: Reference, row: Word, owner: Owner, context: Context): ReferredFigure | null {
  const columnId = reference.words.replaceAll(' ', '-');
  const wanted = context.written(row.span).replaceAll("'", '');
  const material = materialNamed(row, context, 'quiet');
  for (const table of owner.tables) {
    const column = table.columns.findIndex((candidate) => candidate.id === columnId && candidate.unit !== null);
    if (column < 0) continue;
    const found = table.rows.find((cells) => cells[0] === wanted || (material && cells[0] === material.name));
    const cell = found?.[column];
    const unit = table.columns[column]?.unit;
    if (!found || !unit) continue;
    if (typeof cell !== 'number') return null; // the table itself shows that it could not be had
    const known = knownUnit(unit);
    return { quantity: quantityOf(toSi(cell, known), known.dimension), unit };
  }
  // A definition that could not be worked out has no tables, and why has been said there.
  if ([...owner.absent.values()].includes(null)) return null;
  const rows = owner.tables.flatMap((table) => table.rows.map((cells) => String(cells[0]))).slice(0, 12);
  context.report(row.span, {
    code: 'name/unknown',
    what: 'portion',
    word: wanted,
    near: near(wanted, rows),
    owner: reference.name?.text ?? '',
    allowed: rows,
  });
  return null;
}

/** `SUBSTANCE in BLEND`: that portion's share, by mass unless `by mole` or `by volume` is written. */
function evaluateMembership(membership: Membership, context: Context): Unknowable {
  const { name, substance } = membership;
  if (!name) return null;
  const named = context.scope.lookup(name.text);
  if (named?.kind === 'unknown') return null;
  if (named?.kind === 'unevaluated') return silent(name, named.definition, context);
  const material = named?.kind === 'definition' ? named.material : null;
  if (!named) {
    context.report(name.span, {
      code: 'name/unknown',
      what: 'definition',
      word: name.text,
      near: near(name.text, context.scope.names()),
    });
    return null;
  }
  if (named.kind === 'value' || named.definition.kind !== 'blend') {
    const is = named.kind === 'value' ? 'a number' : `a ${named.definition.kind}`;
    context.report(name.span, { code: 'name/wrong-kind', name: name.text, is, needed: 'a blend' });
    return null;
  }
  context.mean(name.span, { kind: 'definition', name: name.text, definition: named.definition });
  if (!material?.portions) return null;
  const part = materialNamed(substance, context);
  if (!part) return null;
  const basis = membership.basis?.basis ?? 'mass';
  const shares = material.portions.filter((portion) => portion.name === part.name);
  if (shares.length === 0) {
    const allowed = material.portions.map((portion) => portion.name);
    const word = context.written(substance.span);
    context.report(substance.span, {
      code: 'name/unknown',
      what: 'portion',
      word,
      near: near(word, allowed),
      owner: name.text,
      allowed,
    });
    return null;
  }
  let total: Unknowable = null;
  for (const share of shares) {
    const next = share[basis];
    if (!next) {
      // The share wants this property of every portion, and another portion than the one asked for may lack it.
      const lacking = material.missing.get(basis === 'mole' ? 'molarMass' : 'density')?.[0] ?? share.name;
      context.report(membership.span, {
        code: 'balance/no-density',
        substance: lacking,
        why: basis === 'mole' ? 'molar-mass' : 'density',
      });
      return null;
    }
    const sum: Quantity | ReturnType<typeof add> = total ? add(total, next) : next;
    if (isFault(sum)) return null;
    total = sum;
  }
  return total;
}
