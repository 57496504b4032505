// The tokens of one definition into its node: header, lines, closing brace. A line that cannot be read costs that line;
// a header that cannot be read costs the definition, but not what follows. It does not know which kinds exist beyond
// the list of words, nor whether a name is taken. Invariant: a slip in the header gives one problem, and then neither
// the rest of its line nor a missing brace is reported as well, for they are the same slip.
import { entryColon, isLineBreak, splitLines } from './lines.ts';
import { checkToken } from './messages.ts';
import { spanOf, wordNode } from './nodes.ts';
import { readLine } from './read-line.ts';
import { sectionProblems } from './section-messages.ts';
import { CloseBrace, endOf, OpenBrace, QuotedName, WordToken } from './tokens.ts';
import type { Token } from './tokens.ts';
import type { BrokenStatement, Definition, Line, Problem, Span, Word } from './tree.ts';
import type { IsUnit } from './unit-run.ts';
import { isKindWord } from './words.ts';

export interface ReadStatement<Node> {
  readonly statement: Node;
  readonly problems: readonly Problem[];
}

/** The definition whose header starts at index `from`; the tokens behind belong to it. */
export function readDefinition(
  tokens: readonly Token[],
  from: number,
  isUnit: IsUnit,
): ReadStatement<Definition | BrokenStatement> {
  const headerEnd = endOfSegment(tokens, from);
  const headerTokens = tokens.slice(from, headerEnd);
  const braceIndex = findBrace(tokens, headerEnd);
  const header = readHeader(headerTokens, braceIndex >= 0);
  const last = tokens.at(-1);
  const span = { start: header.span.start, end: last === undefined ? header.span.end : endOf(last) };
  if (header.keyword === undefined) {
    const { name, problem } = header;
    const broken: BrokenStatement = name === undefined ? { kind: 'broken', span } : { kind: 'broken', span, name };
    return { statement: broken, problems: problem === undefined ? [] : [problem] };
  }

  const bodyStart = braceIndex >= 0 ? braceIndex + 1 : headerEnd;
  const closeIndex = tokens.findIndex((token, index) => index >= bodyStart && token.tokenType === CloseBrace);
  const bodyEnd = closeIndex < 0 ? tokens.length : closeIndex;
  const isSpoilt = header.problem !== undefined && header.isSpoilt;
  const firstLine = isSpoilt ? endOfSegment(tokens, bodyStart) : bodyStart;
  const body = readBody(tokens, Math.min(firstLine, bodyEnd), bodyEnd, isUnit);
  // What a spoilt header swallowed may have been a portion: without this the rest would pass for the whole.
  const swallowed = tokens.slice(bodyStart, Math.min(firstLine, bodyEnd)).filter((token) => !isLineBreak(token));
  const [firstLost, lastLost] = [swallowed[0], swallowed.at(-1)];
  const lost: Line[] =
    firstLost === undefined || lastLost === undefined
      ? []
      : [{ kind: 'broken-line', span: { start: firstLost.startOffset, end: endOf(lastLost) } }];
  const problems: Problem[] = header.problem === undefined ? [] : [header.problem];
  const closed = closeIndex >= 0;
  if (!closed && !isSpoilt) {
    const name = header.name?.text ?? header.keyword.text;
    problems.push(sectionProblems.closeBraceMissing(header.span, name, span.end));
  }
  for (const problem of closed ? body.problems : withoutCutOff(body.problems, span.end)) problems.push(problem);
  const behind = closed ? tokens.find((token, index) => index > closeIndex && !isLineBreak(token)) : undefined;
  if (behind !== undefined) problems.push(sectionProblems.behindClosingBrace(spanOf(behind)));
  const brace = tokens[braceIndex];
  const definition: Definition = {
    kind: 'definition',
    span,
    keyword: header.keyword,
    ...(header.name === undefined ? {} : { name: header.name }),
    header: { start: header.span.start, end: brace?.startOffset ?? header.span.end },
    lines: [...lost, ...body.lines],
    closed,
  };
  return { statement: definition, problems };
}

/** Whether a definition starts at an index: a brace ends its line, or it starts with a kind and is no entry. */
export function startsDefinition(tokens: readonly Token[], from: number): boolean {
  const first = tokens[from];
  const end = endOfSegment(tokens, from);
  if (end > from && tokens[end]?.tokenType === OpenBrace) return true;
  const startsWithKind = first?.tokenType === WordToken && isKindWord(first.image);
  return startsWithKind && entryColon(tokens, from, tokens.length) < 0;
}

/** A problem with a name that is neither quoted nor `lower_snake`. */
export function checkName(token: Token): Problem | undefined {
  const name = wordNode(token);
  if (token.tokenType === QuotedName) return checkToken(token);
  return name.form === 'name' ? undefined : sectionProblems.nameForm(name.span, name.text);
}

export const isNameToken = (token: Token | undefined): token is Token =>
  token?.tokenType === WordToken || token?.tokenType === QuotedName;

/** The index of the next newline, semicolon or brace. */
function endOfSegment(tokens: readonly Token[], from: number): number {
  let index = from;
  for (; index < tokens.length; index++) {
    const token = tokens[index];
    if (token === undefined || isLineBreak(token)) break;
    if (token.tokenType === OpenBrace || token.tokenType === CloseBrace) break;
  }
  return index;
}

/** The brace that opens the body: at the header's end, or alone on the next line. */
function findBrace(tokens: readonly Token[], headerEnd: number): number {
  let index = headerEnd;
  for (let token = tokens[index]; token !== undefined && isLineBreak(token); token = tokens[++index]);
  return tokens[index]?.tokenType === OpenBrace ? index : -1;
}

interface Header {
  readonly span: Span;
  /** Absent when the header does not tell what is defined. */
  readonly keyword?: Word;
  readonly name?: Word;
  readonly problem?: Problem;
  /** Whether the problem leaves open what the rest of the header's line is. */
  readonly isSpoilt: boolean;
}

function readHeader(tokens: readonly Token[], hasBrace: boolean): Header {
  const first = tokens[0];
  const last = tokens.at(-1);
  if (first === undefined || last === undefined) return { span: { start: 0, end: 0 }, isSpoilt: true };
  const span = { start: first.startOffset, end: endOf(last) };
  const kindIndex = tokens.findIndex((token) => token.tokenType === WordToken && isKindWord(token.image));
  const isTwoWords = tokens.length === 2 && first.tokenType === WordToken && isNameToken(last);
  const kindToken = isTwoWords ? first : tokens[kindIndex];
  const nameTokens = tokens.filter((token, index) => isNameToken(token) && index > (isTwoWords ? 0 : kindIndex));
  const nameToken = nameTokens[0];
  if (kindToken === undefined) {
    if (tokens.length > 1 || nameToken === undefined) {
      return { span, problem: sectionProblems.headerWords(span), isSpoilt: true };
    }
    const name = wordNode(nameToken);
    return { span, name, problem: sectionProblems.kindMissing(span, name.text), isSpoilt: true };
  }
  const keyword = wordNode(kindToken);
  if (nameToken === undefined) {
    const unread = tokens.find((token) => token !== kindToken);
    const problem =
      unread === undefined
        ? sectionProblems.nameMissing(keyword.span, keyword.text)
        : sectionProblems.headerWords(spanOf(unread));
    return { span, keyword, problem, isSpoilt: true };
  }
  const name = wordNode(nameToken);
  const header = { span, keyword, name };
  if (tokens.length > 2 || (!isTwoWords && kindToken !== first)) {
    const unread = tokens.find((token) => token !== kindToken && token !== nameToken) ?? first;
    return { ...header, problem: sectionProblems.headerWords(spanOf(unread)), isSpoilt: true };
  }
  const nameProblem = checkName(nameToken);
  if (!hasBrace) {
    const isUnclosed = nameProblem?.code === 'syntax/unclosed';
    const missing = sectionProblems.openBraceMissing(span, keyword.text, name.text, span.end);
    return { ...header, problem: isUnclosed ? nameProblem : missing, isSpoilt: true };
  }
  return nameProblem === undefined
    ? { ...header, isSpoilt: false }
    : { ...header, problem: nameProblem, isSpoilt: false };
}

/** A line that breaks off where an unclosed definition ends is the same slip as the missing brace. */
const withoutCutOff = (problems: readonly Problem[], end: number): readonly Problem[] =>
  problems.filter(({ code, span }) => code !== 'syntax/missing' || span.end !== end);

function readBody(
  tokens: readonly Token[],
  from: number,
  to: number,
  isUnit: IsUnit,
): { readonly lines: Line[]; readonly problems: Problem[] } {
  const lines: Line[] = [];
  const problems: Problem[] = [];
  for (const raw of splitLines(tokens, from, to)) {
    const { line, problem } = readLine(raw, isUnit);
    lines.push(line);
    if (problem !== undefined) problems.push(problem);
  }
  return { lines, problems };
}
