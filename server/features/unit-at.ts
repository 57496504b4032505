// Finds the unit word at an offset in the syntax tree. Walks only the nodes that hold the offset, so that the cost is the
// depth of the tree and not its size. Knows no meaning. Invariant: the place found holds the offset.
import type { Expression, Line, PhraseItem, Span, Statement, UnitToken, UnitWords } from '../../grammar/tree.ts';
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';
import { placeOf } from '../scenario/scenario.ts';

export interface UnitAt {
  readonly place: Place;
  /** As written, without its power. */
  readonly word: string;
}

export function unitAt(file: EvaluatedFile, offset: number): UnitAt | null {
  const placed = file.tree.sections.find(({ start, end }) => start <= offset && offset < end);
  if (!placed) return null;
  const token = inStatement(placed.section.statement, offset - placed.start);
  return token && { place: placeOf(file.path, placed, token.span), word: token.text };
}

function inStatement(statement: Statement, at: number): UnitToken | null {
  switch (statement.kind) {
    case 'let':
      return inExpression(statement.value, at);
    case 'expect':
      return inExpression(statement.claim, at);
    case 'definition':
      return first(statement.lines, at, inLine);
    case 'title':
    case 'use':
    case 'broken':
      return null;
  }
}

function inLine(line: Line, at: number): UnitToken | null {
  switch (line.kind) {
    case 'entry':
      return first(line.phrases, at, ({ items }) => first(items, at, inItem));
    case 'portion':
      return line.amount.kind === 'rest' ? null : inExpression(line.amount, at);
    case 'equation':
    case 'acknowledge':
    case 'broken-line':
      return null;
  }
}

function inItem(item: PhraseItem, at: number): UnitToken | null {
  return item.kind === 'connective' ? null : inExpression(item, at);
}

function inExpression(expression: Expression | undefined, at: number): UnitToken | null {
  if (!expression || !holds(expression.span, at)) return null;
  switch (expression.kind) {
    case 'quantity':
      return inUnit(expression.unit, at) ?? inUnit(expression.uncertainty?.unit, at);
    case 'lone-unit':
      return inUnit(expression.unit, at);
    case 'reference':
      return inExpression(expression.at, at);
    case 'call':
      return first(expression.arguments, at, inExpression);
    case 'bracket':
      return inExpression(expression.inner, at);
    case 'unary':
      return inExpression(expression.operand, at);
    case 'binary':
    case 'comparison':
      return inExpression(expression.left, at) ?? inExpression(expression.right, at);
    case 'within':
      return (
        inExpression(expression.left, at) ??
        inExpression(expression.target, at) ??
        inUnit(expression.tolerance?.unit, at)
      );
    case 'word':
    case 'text':
    case 'membership':
      return null;
  }
}

function inUnit(unit: UnitWords | undefined, at: number): UnitToken | null {
  return unit?.tokens.find(({ kind, span }) => kind === 'word' && holds(span, at)) ?? null;
}

function first<Node extends { readonly span: Span }>(
  nodes: readonly Node[],
  at: number,
  find: (node: Node, at: number) => UnitToken | null,
): UnitToken | null {
  const node = nodes.find(({ span }) => holds(span, at));
  return node ? find(node, at) : null;
}

function holds(span: Span, at: number): boolean {
  return span.start <= at && at < span.end;
}
