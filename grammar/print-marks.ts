// What the printer must know of a file that its tokens alone do not say: where each line of a definition starts and
// ends, which signs are operators, which words are a unit, where a portion's substance stands, and what is broken.
// It reads the tree and gives offsets in the file; it prints nothing and knows no white space.
// Invariant: items are in order and disjoint; whatever has a syntax problem is in `broken`.
import type { Definition, Expression, Line, Phrase, Section, Span, SyntaxTree, UnitWords } from './tree.ts';

export interface PrintMarks {
  readonly items: readonly Item[];
  /** The bodies of definitions, from the opening to the closing brace. */
  readonly bodies: readonly Span[];
  readonly broken: readonly Span[];
  /** Where operators start that stand between two spaces. */
  readonly operators: ReadonlySet<number>;
  /** Where units start, and where they end. */
  readonly units: ReadonlySet<number>;
  readonly unitEnds: ReadonlySet<number>;
}

/** A statement, a header, or one line of a definition: what may be spread over several lines of text. */
export interface Item extends Span {
  /** How many steps it is indented. */
  readonly level: 0 | 1;
  readonly isEquation: boolean;
  /** Where the substance of a portion starts. */
  readonly substanceStart?: number;
}

/** The marks of a whole file. */
export function printMarks(tree: SyntaxTree): PrintMarks {
  const collector = new Collector();
  for (const { start, section } of tree.sections) collector.takeSection(start, section);
  return collector;
}

class Collector implements PrintMarks {
  readonly items: Item[] = [];
  readonly bodies: Span[] = [];
  readonly broken: Span[] = [];
  readonly operators = new Set<number>();
  readonly units = new Set<number>();
  readonly unitEnds = new Set<number>();
  /** Where the section being read starts in the file. */
  private base = 0;

  takeSection(base: number, section: Section): void {
    this.base = base;
    for (const problem of section.problems) this.broken.push(this.placed(problem.span));
    const { statement } = section;
    switch (statement.kind) {
      case 'definition':
        return this.takeDefinition(statement);
      case 'broken':
        this.broken.push(this.placed(statement.span));
        break;
      case 'let':
        this.takeExpression(statement.value);
        break;
      case 'expect':
        this.takeExpression(statement.claim);
        break;
      case 'title':
      case 'use':
        break;
    }
    this.items.push({ ...this.placed(statement.span), level: 0, isEquation: false });
  }

  private takeDefinition({ header, span, lines }: Definition): void {
    this.items.push({ ...this.placed(header), level: 0, isEquation: false });
    this.bodies.push(this.placed({ start: header.end, end: span.end }));
    for (const line of lines) {
      const item: Item = { ...this.placed(line.span), level: 1, isEquation: line.kind === 'equation' };
      const substance = line.kind === 'portion' ? line.substance : undefined;
      this.items.push(substance === undefined ? item : { ...item, substanceStart: this.base + substance.span.start });
      this.takeLine(line);
    }
  }

  private takeLine(line: Line): void {
    switch (line.kind) {
      case 'entry':
        for (const phrase of line.phrases) this.takePhrase(phrase);
        break;
      case 'portion':
        if (line.amount.kind !== 'rest') this.takeExpression(line.amount);
        break;
      case 'broken-line':
        this.broken.push(this.placed(line.span));
        break;
      case 'equation':
      case 'acknowledge':
        break;
    }
  }

  private takePhrase(phrase: Phrase): void {
    for (const item of phrase.items) if (item.kind !== 'connective') this.takeExpression(item);
  }

  private takeExpression(expression: Expression | undefined): void {
    switch (expression?.kind) {
      case undefined:
      case 'word':
      case 'text':
      case 'membership':
        return;
      case 'quantity':
        this.takeUnit(expression.unit);
        return this.takeUnit(expression.uncertainty?.unit);
      case 'lone-unit':
        return this.takeUnit(expression.unit);
      case 'reference':
        return this.takeExpression(expression.at);
      case 'call':
        for (const given of expression.arguments) this.takeExpression(given);
        return;
      case 'bracket':
        return this.takeExpression(expression.inner);
      case 'unary':
        return this.takeExpression(expression.operand);
      case 'within':
        this.takeExpression(expression.left);
        this.takeExpression(expression.target);
        return this.takeUnit(expression.tolerance?.unit);
      case 'binary':
      case 'comparison':
        if (expression.operator !== '^') this.operators.add(this.base + expression.operatorSpan.start);
        this.takeExpression(expression.left);
        return this.takeExpression(expression.right);
    }
  }

  private takeUnit(unit: UnitWords | undefined): void {
    if (unit === undefined) return;
    this.units.add(this.base + unit.span.start);
    this.unitEnds.add(this.base + unit.span.end);
  }

  private placed = ({ start, end }: Span): Span => ({ start: this.base + start, end: this.base + end });
}
