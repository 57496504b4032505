// A whole file, or one section of it, into the syntax tree. The text is cut into sections and each is parsed alone, so
// that a section whose text is unchanged is taken over from the tree before; above a change it keeps its very place. It
// does not know what names mean.
// Invariants: any text gives a tree, nothing is thrown; a section is a pure function of its text and the unit words.
import { cut, cutAgain, type Cut } from './cut.ts';
import { entryColon, isLineBreak } from './lines.ts';
import { spanOf } from './nodes.ts';
import { readDefinition, startsDefinition } from './read-definition.ts';
import type { ReadStatement } from './read-definition.ts';
import { readStatement } from './read-statement.ts';
import { sectionProblems } from './section-messages.ts';
import { CloseBrace, endOf, lex, OpenBrace, WordToken } from './tokens.ts';
import type { Token } from './tokens.ts';
import type { PlacedSection, Problem, Section, Span, Statement, SyntaxTree } from './tree.ts';
import type { IsUnit } from './unit-run.ts';
import { asStatementWord } from './words.ts';

/** At most this many syntax problems are shown for one file. */
export const MOST_PROBLEMS = 128;
/** Texts longer than this many characters (one megabyte as a rule) are parsed in part only, unless told otherwise. */
export const LARGEST_TEXT = 1_000_000;

export interface ParseOptions {
  /** The tree of an earlier version, made with the same `isUnit`: sections with the same text are taken from it. */
  readonly previous?: SyntaxTree;
  /** Instead of `LARGEST_TEXT`. */
  readonly largestText?: number;
  /** The stretches that are seen; in a text that is too large only sections that touch them are parsed. */
  readonly visible?: readonly Span[];
}

/**
 * The syntax tree of a file. `isUnit` tells whether a word without its power is a unit, prefixes included. In a file
 * that is too large the sections outside of the visible stretches (else the first megabyte) are left out, and
 * `fileProblems` says so.
 */
export function parse(text: string, isUnit: IsUnit, options: ParseOptions = {}): SyntaxTree {
  const largestText = options.largestText ?? LARGEST_TEXT;
  const isTooLarge = text.length > largestText;
  const sections = isTooLarge
    ? parseCuts(text, seenCuts(text, largestText, options.visible), options.previous, isUnit)
    : parseWhole(text, options.previous, isUnit);
  const problemCount = sections.reduce((count, { section }) => count + section.problems.length, 0);
  const megabytes = String(largestText / 1_000_000);
  const fileProblems = isTooLarge ? [sectionProblems.tooLarge(firstLine(text), megabytes)] : [];
  return { text, sections, fileProblems, truncated: problemCount + fileProblems.length > MOST_PROBLEMS };
}

/** How the sections of whole texts were cut, to cut the next version from. */
const cutsOf = new WeakMap<readonly PlacedSection[], readonly Cut[]>();

function parseWhole(text: string, previous: SyntaxTree | undefined, isUnit: IsUnit): readonly PlacedSection[] {
  const before = previous && cutsOf.get(previous.sections);
  if (!previous || !before) {
    const cuts = cut(text);
    const sections = parseCuts(text, cuts, previous, isUnit);
    cutsOf.set(sections, cuts);
    return sections;
  }
  const { kept, cuts, moved, shift } = cutAgain(text, previous.text, before);
  const behind = before.length - moved;
  const changed = { sections: previous.sections.slice(kept, behind) };
  const sections = previous.sections.slice(0, kept);
  const allCuts = before.slice(0, kept);
  for (const placed of parseCuts(text, cuts, changed, isUnit)) sections.push(placed);
  for (const one of cuts) allCuts.push(one);
  for (let index = behind; index < before.length; index++) {
    const [placed, where] = [previous.sections[index], before[index]];
    if (!placed || !where) continue;
    sections.push(shift === 0 ? placed : { ...movedBy(where, shift), section: placed.section });
    allCuts.push(shift === 0 ? where : { ...movedBy(where, shift), isFresh: where.isFresh });
  }
  cutsOf.set(sections, allCuts);
  return sections;
}

/** The sections that are seen of a text that is too large. One that is too large by itself is not read at all. */
function seenCuts(text: string, largestText: number, visible: readonly Span[] | undefined): readonly Cut[] {
  const seen = visible ?? [{ start: 0, end: largestText }];
  return cut(text).filter(
    ({ start, end }) => end - start <= largestText && seen.some((window) => start < window.end && window.start < end),
  );
}

/** The sections at some cuts, each taken from the previous ones where that has its text. */
function parseCuts(
  text: string,
  cuts: readonly Cut[],
  previous: Pick<SyntaxTree, 'sections'> | undefined,
  isUnit: IsUnit,
): readonly PlacedSection[] {
  const known = new Map(previous?.sections.map(({ section }) => [section.text, section]));
  return cuts.map(({ start, end }) => {
    const sectionText = text.slice(start, end);
    const section = known.get(sectionText) ?? parseSection(previous ? detached(sectionText) : sectionText, isUnit);
    known.set(sectionText, section);
    return { start, end, section };
  });
}

/**
 * The text in memory of its own. A slice keeps the whole text alive that it was taken from: in a file that is typed at,
 * one text for each section ever changed.
 */
function detached(text: string): string {
  const copy: unknown = JSON.parse(JSON.stringify(text));
  return typeof copy === 'string' ? copy : text;
}

/**
 * One section: a statement or definition with the `##` lines above it. Positions are relative to its text. A text that
 * is no statement gives a broken one with a problem.
 */
export function parseSection(text: string, isUnit: IsUnit): Section {
  const { tokens, comments } = lex(text);
  const from = tokens.findIndex((token) => !isLineBreak(token));
  const first = tokens[from];
  if (first === undefined)
    return { text, doc: '', statement: { kind: 'broken', span: { start: 0, end: 0 } }, problems: [] };
  const { statement, problems } = readTokens(tokens, from, first, isUnit);
  return { text, doc: docText(comments, first.startOffset), statement, problems: problems.slice(0, MOST_PROBLEMS) };
}

/** Whether some sections of the file were left unread, because it is too large. */
export function isPartial(tree: SyntaxTree): boolean {
  return tree.fileProblems.some(({ code }) => code === 'syntax/too-large');
}

/** The syntax problems of a file with offsets in the file, in order; no more than `MOST_PROBLEMS`. */
export function problemsOf(tree: SyntaxTree): Problem[] {
  const problems = [...tree.fileProblems];
  for (const { start, section } of tree.sections) {
    if (problems.length >= MOST_PROBLEMS) break;
    for (const problem of section.problems) problems.push(moveProblem(problem, start));
  }
  return problems.slice(0, MOST_PROBLEMS);
}

function readTokens(tokens: readonly Token[], from: number, first: Token, isUnit: IsUnit): ReadStatement<Statement> {
  if (startsDefinition(tokens, from)) return readDefinition(tokens, from, isUnit);
  const keyword = first.tokenType === WordToken ? asStatementWord(first.image) : undefined;
  const isStatement = keyword !== undefined && entryColon(tokens, from, tokens.length) < 0;
  if (isStatement) return readStatement(tokens, from, keyword, isUnit);
  return readStray(tokens, from, first);
}

function readStray(tokens: readonly Token[], from: number, first: Token): ReadStatement<Statement> {
  const last = tokens.at(-1) ?? first;
  const span = { start: first.startOffset, end: endOf(last) };
  let lineEnd = from;
  for (let index = from; index < tokens.length; index++) {
    const token = tokens[index];
    if (token === undefined || isLineBreak(token)) break;
    lineEnd = index;
  }
  const problem =
    first.tokenType === CloseBrace
      ? sectionProblems.strayCloseBrace(spanOf(first))
      : first.tokenType === OpenBrace
        ? sectionProblems.strayOpenBrace(spanOf(first))
        : sectionProblems.outside({ start: span.start, end: endOf(tokens[lineEnd] ?? first) });
  return { statement: { kind: 'broken', span }, problems: [problem] };
}

/** The `##` lines above a statement, without their marks. */
function docText(comments: readonly Token[], before: number): string {
  const lines: string[] = [];
  for (const { image, startOffset } of comments) {
    if (startOffset >= before) break;
    if (/^##(?!#)/.test(image)) lines.push(image.slice(2).trim());
  }
  return lines.join('\n');
}

const movedBy = ({ start, end }: Span, by: number): Span => ({ start: start + by, end: end + by });

function moveProblem(problem: Problem, by: number): Problem {
  const moved = { ...problem, span: movedBy(problem.span, by) };
  return problem.fix === undefined ? moved : { ...moved, fix: { ...problem.fix, span: movedBy(problem.fix.span, by) } };
}

const firstLine = (text: string): Span => ({ start: 0, end: /^[^\r\n]*/.exec(text)?.[0].length ?? 0 });
