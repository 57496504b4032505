// The formatter: the same tokens and comments on the same lines, with white space as the tour has it. It works on
// tokens, so nothing typed is lost; the tree only tells it what stands where, and a line with a syntax problem stays
// exactly as typed. It breaks and joins no lines, and knows no units (the caller says what is one).
// Invariant: lexing the result gives the tokens and comments of the text line by line, and formatting the result
// again changes nothing.
import { parse, type ParseOptions } from './parse.ts';
import { printMarks } from './print-marks.ts';
import type { Item, PrintMarks } from './print-marks.ts';
import * as t from './tokens.ts';
import type { Token } from './tokens.ts';
import type { IsUnit } from './unit-run.ts';

/** Replaces the text from `start` to `end` (UTF-16 offsets, half-open). */
export interface TextEdit {
  readonly start: number;
  readonly end: number;
  readonly newText: string;
}

/** The whole text, formatted. Line ends, a byte order mark and the presence of a final newline are kept. */
export function format(text: string, isUnit: IsUnit): string {
  let result = '';
  let done = 0;
  for (const { start, end, newText } of formatRange(text, isUnit, 0, text.length)) {
    result += text.slice(done, start) + newText;
    done = end;
  }
  return result + text.slice(done);
}

/** One edit for each line that touches the range and is not yet as it should be, in order. */
export function formatRange(
  text: string,
  isUnit: IsUnit,
  start: number,
  end: number,
  size: Pick<ParseOptions, 'largestText'> = {},
): TextEdit[] {
  const lines = formatLines(text, isUnit, size);
  // A selection that ends in column 0 does not mean the line it ends in.
  const touches = (line: SourceLine): boolean => line.end >= start && (line.start < end || line.start === start);
  return lines
    .filter(({ line, formatted }) => touches(line) && formatted !== text.slice(line.start, line.end))
    .map(({ line, formatted }) => ({ start: line.start, end: line.end, newText: formatted }));
}

/** Trailing comments stand here (counted from 0) unless the code before them is too long. */
const COMMENT_COLUMN = 39;
const INDENT = '  ';

interface SourceLine {
  readonly start: number;
  /** Before the line's end characters. */
  readonly end: number;
  readonly tokens: Token[];
  comment: Token | undefined;
}

function formatLines(
  text: string,
  isUnit: IsUnit,
  { largestText }: Pick<ParseOptions, 'largestText'>,
): { readonly line: SourceLine; readonly formatted: string }[] {
  const lines = sourceLines(text);
  const tree = parse(text, isUnit, largestText === undefined ? {} : { largestText });
  // With more problems than are kept, or with parts left unread, nobody can say which lines are whole.
  const isUnreadable = tree.truncated || tree.fileProblems.length > 0;
  if (isUnreadable) return lines.map((line) => ({ line, formatted: text.slice(line.start, line.end) }));
  const printer = new Printer(text, lines, printMarks(tree));
  for (;;) {
    const formatted = printer.print();
    const changed = changedLines(lines, formatted).filter((index) => !printer.isKept(index));
    if (changed.length === 0) return lines.map((line, index) => ({ line, formatted: formatted[index] ?? '' }));
    // A line that would be read otherwise than before stays as typed: without its spaces `K( g )`, a call, would turn
    // into the gas K(g).
    for (const index of changed) printer.keep(index);
  }
}

/** The lines of a text with their tokens. A byte order mark belongs to no line. */
function sourceLines(text: string): SourceLine[] {
  const lines: SourceLine[] = [];
  let start = text.startsWith('\ufeff') ? 1 : 0;
  for (const newline of text.matchAll(/\r\n|\r|\n/g)) {
    lines.push({ start, end: newline.index, tokens: [], comment: undefined });
    start = newline.index + newline[0].length;
  }
  lines.push({ start, end: text.length, tokens: [], comment: undefined });
  const { tokens, comments } = t.lex(text);
  let index = 0;
  for (const token of tokens) {
    if (token.tokenType === t.Newline) index++;
    else lines[index]?.tokens.push(token);
  }
  index = 0;
  for (const comment of comments) {
    while ((lines[index]?.end ?? text.length) < comment.startOffset) index++;
    const line = lines[index];
    if (line !== undefined) line.comment = comment;
  }
  return lines;
}

/** The lines whose tokens or comment are no longer those of the source. */
function changedLines(lines: readonly SourceLine[], formatted: readonly string[]): number[] {
  const describe = ({ tokens, comment }: Pick<SourceLine, 'tokens' | 'comment'>): string =>
    JSON.stringify([tokens.map(({ tokenType, image }) => [tokenType.name, image]), comment?.image.trimEnd()]);
  const after = sourceLines(formatted.join('\n'));
  return lines.flatMap((line, index) => {
    const other = after[index];
    return other !== undefined && describe(line) === describe(other) ? [] : [index];
  });
}

class Printer {
  private readonly text: string;
  private readonly lines: readonly SourceLine[];
  private readonly marks: PrintMarks;
  /** The item each token and comment stands in, where it does. */
  private readonly itemOf: ReadonlyMap<Token, Item>;
  /** Lines that stay as typed. */
  private readonly kept = new Set<number>();

  constructor(text: string, lines: readonly SourceLine[], marks: PrintMarks) {
    this.text = text;
    this.lines = lines;
    this.marks = marks;
    this.itemOf = itemsOfTokens(lines, marks.items);
    this.keepBroken();
    // Without its white space this blank line would vanish, because `\r` and `\n` would become one line end.
    this.lines.forEach(({ start, end, tokens, comment }, index) => {
      const isBlank = tokens.length === 0 && comment === undefined;
      if (isBlank && text[start - 1] === '\r' && text[end] === '\n') this.kept.add(index);
    });
  }

  isKept(index: number): boolean {
    return this.kept.has(index);
  }

  keep(index: number): void {
    this.kept.add(index);
  }

  print(): string[] {
    const indents = this.indents();
    const widths = this.amountWidths(indents);
    return this.lines.map((line, index) => {
      const indent = indents[index] ?? '';
      if (this.kept.has(index)) return this.text.slice(line.start, line.end);
      return withComment(this.code(line.tokens, indent, widths.get(index)), indent, line.comment);
    });
  }

  /** The indentation of each line. What goes on from the line above is one step further in, or one for each bracket. */
  private indents(): string[] {
    const { bodies } = this.marks;
    let bodyIndex = 0;
    let current: Item | undefined;
    let depth = 0;
    const enter = (item: Item | undefined): void => {
      if (item !== current) depth = 0;
      current = item;
    };
    return this.lines.map((line) => {
      const first = line.tokens[0] ?? line.comment;
      if (first === undefined) return '';
      const item = this.itemOf.get(first);
      while ((bodies[bodyIndex]?.end ?? Infinity) <= first.startOffset) bodyIndex++;
      enter(item);
      let level = 0;
      if (item === undefined) {
        const isInBody = (bodies[bodyIndex]?.start ?? Infinity) <= first.startOffset;
        level = isInBody && first.tokenType !== t.CloseBrace ? 1 : 0;
      } else if (item.start === first.startOffset || first.tokenType === t.OpenBrace) level = item.level;
      else level = item.level + (first.tokenType === t.CloseBracket ? Math.max(depth - 1, 0) : Math.max(depth, 1));
      for (const token of line.tokens) {
        enter(this.itemOf.get(token));
        if (token.tokenType === t.OpenBracket) depth++;
        else if (token.tokenType === t.CloseBracket) depth--;
      }
      return INDENT.repeat(level);
    });
  }

  /**
   * The width to which the amount of a portion is filled, by line. Portions on lines of their own that follow each
   * other are one run; comments, and lines that are being typed, do not part it; blank lines do.
   */
  private amountWidths(indents: readonly string[]): ReadonlyMap<number, number> {
    const widths = new Map<number, number>();
    let run: { readonly index: number; readonly width: number }[] = [];
    const endRun = (): void => {
      const widest = run.reduce((most, { width }) => Math.max(most, width), 0);
      if (run.length > 1) for (const { index } of run) widths.set(index, widest + 2);
      run = [];
    };
    this.lines.forEach(({ tokens, comment }, index) => {
      if (this.kept.has(index) || (tokens.length === 0 && comment !== undefined)) return;
      const first = tokens[0];
      const item = first && this.itemOf.get(first);
      const isAlone = item?.start === first?.startOffset && item?.substanceStart === tokens.at(-1)?.startOffset;
      if (item?.substanceStart === undefined || !isAlone) return endRun();
      run.push({ index, width: this.code(tokens.slice(0, -1), indents[index] ?? '', undefined).length });
    });
    endRun();
    return widths;
  }

  private code(tokens: readonly Token[], indent: string, amountWidth: number | undefined): string {
    if (tokens.length === 0) return '';
    let code = indent;
    tokens.forEach((token, index) => {
      const previous = tokens[index - 1];
      if (previous !== undefined) {
        const isSubstance = token.startOffset === this.itemOf.get(token)?.substanceStart;
        if (isSubstance) code = amountWidth === undefined ? `${code} ` : code.padEnd(amountWidth);
        else code += this.gap(previous, token);
      }
      code += token.image;
    });
    return code;
  }

  /** The white space between two neighbours on one line. */
  private gap(previous: Token, next: Token): string {
    const typed = this.text.slice(t.endOf(previous), next.startOffset);
    // A no-break space was put there on purpose.
    if (/[^ \t\v\f]/.test(typed)) return typed;
    const single = typed === '' ? '' : ' ';
    const before = previous.tokenType;
    const after = next.tokenType;
    if (before === t.OpenBrace && after === t.CloseBrace) return single;
    if (after === t.Comma || after === t.Semicolon || after === t.Colon) return '';
    if (before === t.OpenBracket || after === t.CloseBracket) return '';
    if (spacedTypes.has(before) || spacedTypes.has(after)) return ' ';
    if (this.isOperator(previous) || this.isOperator(next)) return ' ';
    const { units, unitEnds } = this.marks;
    if (before === t.NumberToken && (units.has(next.startOffset) || this.itemOf.get(next)?.isEquation)) return ' ';
    if (unitEnds.has(t.endOf(previous)) && after !== t.Caret) return ' ';
    return single;
  }

  private isOperator(token: Token): boolean {
    if (this.marks.operators.has(token.startOffset)) return true;
    return token.tokenType === t.Plus && this.itemOf.get(token)?.isEquation === true;
  }

  /** Keeps each line that a problem touches, and all lines of the item it stands in. */
  private keepBroken(): void {
    const { items, broken } = this.marks;
    for (const span of broken) {
      const touched = items.filter((item) => item.start <= span.end && span.start <= item.end);
      const start = Math.min(span.start, ...touched.map((item) => item.start));
      const end = Math.max(span.end, ...touched.map((item) => item.end));
      this.lines.forEach((line, index) => {
        if (line.start <= end && start <= line.end) this.kept.add(index);
      });
    }
  }
}

/** Types with a space on both sides, or behind them where nothing else says otherwise. */
const spacedTypes = new Set([
  t.Arrow,
  t.Compare,
  t.PlusMinus,
  t.OpenBrace,
  t.CloseBrace,
  t.Comma,
  t.Semicolon,
  t.Colon,
]);

/** Both lists are in order, so one walk through them is enough. */
function itemsOfTokens(lines: readonly SourceLine[], items: readonly Item[]): ReadonlyMap<Token, Item> {
  const itemOf = new Map<Token, Item>();
  let index = 0;
  for (const { tokens, comment } of lines) {
    for (const token of comment === undefined ? tokens : [...tokens, comment]) {
      while ((items[index]?.end ?? Infinity) <= token.startOffset) index++;
      const item = items[index];
      if (item !== undefined && item.start <= token.startOffset) itemOf.set(token, item);
    }
  }
  return itemOf;
}

function withComment(code: string, indent: string, comment: Token | undefined): string {
  if (comment === undefined) return code;
  const written = comment.image.trimEnd();
  if (code === '') return indent + written;
  return code.padEnd(Math.max(COMMENT_COLUMN, code.length + INDENT.length)) + written;
}
