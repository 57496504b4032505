// Finds the number or unit word at an offset in the syntax tree. Walks only the nodes that hold the offset, so that the
// cost is the depth of the tree and not its size. Knows no meaning. Invariant: what is found holds the offset.
import type {
  Expression,
  Line,
  LoneUnit,
  PhraseItem,
  Quantity,
  Span,
  Statement,
  UnitToken,
  UnitWords,
} from '../../grammar/tree.ts';
import { placeOf, sectionAt } from '../scenario/place.ts';
import type { EvaluatedFile, Place } from '../scenario/scenario.ts';

export interface LiteralAt {
  /** The number with its unit and uncertainty, where there is a number. */
  readonly quantity: { readonly place: Place; readonly node: Quantity } | null;
  /** The unit word under the offset, as written without its power. */
  readonly unit: { readonly place: Place; readonly word: string } | null;
}

export function literalAt(file: EvaluatedFile, offset: number): LiteralAt | null {
  const placed = sectionAt(file.tree, offset);
  if (!placed) return null;
  const at = offset - placed.start;
  const found = inStatement(placed.section.statement, at);
  if (!found) return null;
  const units = found.kind === 'quantity' ? [found.unit, found.uncertainty?.unit] : [found.unit];
  const token = units.flatMap((unit) => inUnit(unit, at) ?? [])[0];
  return {
    quantity: found.kind === 'quantity' ? { place: placeOf(file.path, placed, found.span), node: found } : null,
    unit: token ? { place: placeOf(file.path, placed, token.span), word: token.text } : null,
  };
}

type Literal = Quantity | LoneUnit;

function inStatement(statement: Statement, at: number): Literal | null {
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

function inLine(line: Line, at: number): Literal | null {
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

function inItem(item: PhraseItem, at: number): Literal | null {
  return item.kind === 'connective' ? null : inExpression(item, at);
}

function inExpression(expression: Expression | undefined, at: number): Literal | null {
  if (!expression || !holds(expression.span, at)) return null;
  switch (expression.kind) {
    case 'quantity':
    case 'lone-unit':
      return expression;
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
      return inExpression(expression.left, at) ?? inExpression(expression.target, at);
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
  find: (node: Node, at: number) => Literal | null,
): Literal | null {
  const node = nodes.find(({ span }) => holds(span, at));
  return node ? find(node, at) : null;
}

function holds(span: Span, at: number): boolean {
  return span.start <= at && at < span.end;
}
