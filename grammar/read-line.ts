// One line of a definition into its node: entry, portion, equation or `acknowledge`. It retags the line's tokens, has
// the parser read them and turns a misfit into one problem. It does not know which entries exist or take what.
// Invariant: a line gives exactly one node and at most one problem, and never reaches beyond its own tokens.
import type { RawLine } from './lines.ts';
import { arrowMissing, checkToken, doesNotFit, endsEarly, problems } from './messages.ts';
import { spanOf, textNode } from './nodes.ts';
import { parseEquation, parseExpression, parsePhrases, parsePortion } from './parser.ts';
import type { Mismatch, Outcome } from './parser.ts';
import { retag } from './retag.ts';
import type { Place } from './retag.ts';
import { sectionProblems } from './section-messages.ts';
import { knownSlip } from './slips.ts';
import { Colon, endOf, OpenBracket, Plus, Slash, Text, WordToken } from './tokens.ts';
import type { Token } from './tokens.ts';
import type { Acknowledge, BrokenLine, Entry, Expression, Line, Problem, Span } from './tree.ts';
import type { IsUnit } from './unit-run.ts';

/** Tokens and the stretch of text they belong to. */
export type LinePart = Pick<RawLine, 'tokens' | 'start' | 'end'>;

export interface ReadLine {
  readonly line: Line;
  readonly problem?: Problem;
}

export function readLine(raw: RawLine, isUnit: IsUnit): ReadLine {
  switch (raw.shape) {
    case 'entry':
      return readEntry(raw, isUnit);
    case 'acknowledge':
      return readAcknowledge(raw);
    case 'equation': {
      const { node, problem } = read(raw, 'equation', isUnit, parseEquation);
      if (node === undefined) return broken(raw, problem);
      const { left, right } = node;
      return found({ kind: 'equation', span: spanOfLine(raw), left, right, arrow: spanOf(node.arrow) }, problem);
    }
    case 'portion': {
      const { node, problem } = read(raw, 'portion', isUnit, parsePortion);
      if (node === undefined) return broken(raw, problem);
      return found({ kind: 'portion', span: spanOfLine(raw), ...node }, problem);
    }
  }
}

/** The expression of a `let` or the claim of an `expect`, which stand between `start` and `end`. */
export function readExpression(
  part: LinePart,
  place: 'expression' | 'claim',
  isUnit: IsUnit,
): { readonly node?: Expression; readonly problem?: Problem } {
  const { node, problem } = read(part, place, isUnit, parseExpression);
  const lacking = problem ?? (node && withoutTolerance(node));
  return { ...(node === undefined ? {} : { node }), ...(lacking === undefined ? {} : { problem: lacking }) };
}

function readEntry(raw: RawLine, isUnit: IsUnit): ReadLine {
  const wordTokens = raw.head.slice(0, -1);
  const words = wordTokens.map((token) => token.image).join(' ');
  const lastWord = wordTokens.at(-1);
  const wordsSpan = { start: raw.start, end: lastWord === undefined ? raw.end : endOf(lastWord) };
  const entry = { kind: 'entry' as const, span: spanOfLine(raw), words, wordsSpan };
  if (raw.tokens.length === 0) return found({ ...entry, phrases: [] }, sectionProblems.noValue(wordsSpan, words));
  const place = words === 'until' ? 'claim' : 'value';
  const { node, problem } = read(raw, place, isUnit, parsePhrases);
  if (node === undefined) return broken(raw, problem, { words, wordsSpan });
  const first = node[0]?.items[0];
  const lacking = problem ?? (first && first.kind !== 'connective' ? withoutTolerance(first) : undefined);
  return found<Entry>({ ...entry, phrases: node }, lacking);
}

/** A `within` of which nothing says how far it reaches. */
function withoutTolerance(claim: Expression): Problem | undefined {
  if (claim.kind !== 'within' || claim.tolerance !== undefined) return undefined;
  return problems.toleranceMissing(claim.target.span);
}

/** `acknowledge code: "reason"`; whatever of it is there is kept. */
function readAcknowledge(raw: RawLine): ReadLine {
  const [keyword, ...rest] = raw.tokens;
  const keywordSpan = keyword === undefined ? spanOfLine(raw) : spanOf(keyword);
  const colon = rest.findIndex((token) => token.tokenType === Colon);
  const codeTokens = colon < 0 ? rest.filter((token) => token.tokenType !== Text) : rest.slice(0, colon);
  const behind = colon < 0 ? [] : rest.slice(colon + 1);
  const code = readCode(codeTokens);
  const reasonToken = behind[0]?.tokenType === Text ? behind[0] : undefined;
  const acknowledge: Acknowledge = {
    kind: 'acknowledge',
    span: spanOfLine(raw),
    keyword: keywordSpan,
    ...(code === undefined ? {} : { code }),
    ...(reasonToken === undefined ? {} : { reason: textNode(reasonToken) }),
  };
  const extra = behind[1];
  if (code === undefined) return found(acknowledge, sectionProblems.acknowledgeCode(keywordSpan));
  if (reasonToken === undefined) return found(acknowledge, sectionProblems.acknowledgeReason(code.span));
  if (extra !== undefined) return found(acknowledge, sectionProblems.acknowledgeExtra(spanOf(extra)));
  return found(acknowledge, checkToken(reasonToken));
}

/** `area/what`, written without spaces. */
function readCode(tokens: readonly Token[]): Acknowledge['code'] {
  const [area, slash, what] = tokens;
  if (area?.tokenType !== WordToken || slash?.tokenType !== Slash || what?.tokenType !== WordToken) return undefined;
  if (tokens.length > 3 || endOf(area) !== slash.startOffset || endOf(slash) !== what.startOffset) return undefined;
  return { text: `${area.image}/${what.image}`, span: { start: area.startOffset, end: endOf(what) } };
}

function read<Node>(
  part: LinePart,
  place: Place,
  isUnit: IsUnit,
  parse: (tokens: Token[]) => Outcome<Node>,
): { readonly node?: Node; readonly problem?: Problem } {
  const retagged = retag(part.tokens, place, isUnit);
  const { problem } = retagged;
  if (retagged.broken) return problem === undefined ? {} : { problem };
  const { node, mismatch } = parse(retagged.tokens);
  if (mismatch !== undefined) return { problem: problem ?? mismatchProblem(mismatch, place, part) };
  return problem === undefined ? { node } : { node, problem };
}

function mismatchProblem({ actual, previous }: Mismatch, place: Place, part: LinePart): Problem {
  const slip = knownSlip({ tokens: part.tokens, actual, previous, place });
  if (slip !== undefined) return slip;
  const plus = place === 'portion' ? part.tokens.find((token) => token.tokenType === Plus) : undefined;
  if (plus !== undefined && part.tokens[0]?.tokenType !== OpenBracket) return arrowMissing(plus);
  if (actual !== undefined) return doesNotFit(actual, previous, place);
  return endsEarly(previous, place, part);
}

function broken(raw: RawLine, problem: Problem | undefined, head?: Pick<BrokenLine, 'words' | 'wordsSpan'>): ReadLine {
  return found({ kind: 'broken-line', span: spanOfLine(raw), ...head }, problem);
}

function found<Kind extends Line>(line: Kind, problem: Problem | undefined): ReadLine {
  return problem === undefined ? { line } : { line, problem };
}

const spanOfLine = ({ start, end }: LinePart): Span => ({ start, end });
