// The tokens of one `scenario`, `use`, `let` or `expect` into its node. Whatever parts are there are kept: a `let` whose
// value cannot be read still gives its name. It does not know whether a name is taken or a claim holds. Invariant: a
// statement gives at most one problem, the first; what follows it in its section is reported only if it had none.
import { splitLines } from './lines.ts';
import { checkToken } from './messages.ts';
import { spanOf, textNode, wordNode } from './nodes.ts';
import { checkName, isNameToken } from './read-definition.ts';
import type { ReadStatement } from './read-definition.ts';
import { readExpression } from './read-line.ts';
import { sectionProblems } from './section-messages.ts';
import { Compare, endOf, Text } from './tokens.ts';
import type { Token } from './tokens.ts';
import type { Problem, Span, Statement } from './tree.ts';
import type { IsUnit } from './unit-run.ts';
import type { StatementWord } from './words.ts';

/** The statement whose keyword stands at index `from`; the tokens behind belong to it or are its stray rest. */
export function readStatement(
  tokens: readonly Token[],
  from: number,
  keyword: StatementWord,
  isUnit: IsUnit,
): ReadStatement<Statement> {
  const [line, stray] = splitLines(tokens, from, tokens.length);
  const keywordToken = line?.tokens[0];
  if (line === undefined || keywordToken === undefined) {
    return { statement: { kind: 'broken', span: { start: 0, end: 0 } }, problems: [] };
  }
  const parts: Parts = {
    keyword: spanOf(keywordToken),
    span: { start: line.start, end: line.end },
    rest: line.tokens.slice(1),
  };
  const { statement, problem } = readParts(parts, keyword, isUnit);
  const extra =
    stray === undefined ? undefined : sectionProblems.statementExtra({ start: stray.start, end: stray.end }, keyword);
  const first = problem ?? extra;
  return { statement, problems: first === undefined ? [] : [first] };
}

interface Parts {
  readonly keyword: Span;
  readonly span: Span;
  readonly rest: Token[];
}

interface ReadParts {
  readonly statement: Statement;
  readonly problem?: Problem | undefined;
}

function readParts(parts: Parts, word: StatementWord, isUnit: IsUnit): ReadParts {
  switch (word) {
    case 'scenario': {
      const { text, problem } = readText(parts, word, 'The title in quotes');
      const { keyword, span } = parts;
      return { statement: { kind: 'title', span, keyword, ...(text === undefined ? {} : { title: text }) }, problem };
    }
    case 'use': {
      const { text, problem } = readText(parts, word, 'The path of a file, in quotes,');
      const { keyword, span } = parts;
      return { statement: { kind: 'use', span, keyword, ...(text === undefined ? {} : { path: text }) }, problem };
    }
    case 'let':
      return readLet(parts, isUnit);
    case 'expect':
      return readExpect(parts, isUnit);
  }
}

function readText({ keyword, rest }: Parts, word: StatementWord, what: string) {
  const [textToken, extra] = rest;
  if (textToken?.tokenType !== Text) return { problem: sectionProblems.statementMissing(keyword, word, what) };
  const text = textNode(textToken);
  const problem = extra === undefined ? checkToken(textToken) : sectionProblems.statementExtra(spanOf(extra), word);
  return { text, problem };
}

function readLet({ keyword, span, rest }: Parts, isUnit: IsUnit): ReadParts {
  const [nameToken, equals] = rest;
  const statement = { kind: 'let' as const, span, keyword };
  if (!isNameToken(nameToken)) {
    return { statement, problem: sectionProblems.statementMissing(keyword, 'let', 'A name') };
  }
  const named = { ...statement, name: wordNode(nameToken) };
  const nameProblem = checkName(nameToken);
  if (nameProblem?.code === 'syntax/unclosed') return { statement: named, problem: nameProblem };
  if (equals?.tokenType !== Compare || equals.image !== '=') {
    return {
      statement: named,
      problem: sectionProblems.statementMissing(named.name.span, 'let', 'The `=` behind the name'),
    };
  }
  const tokens = rest.slice(2);
  if (tokens.length === 0) {
    return { statement: named, problem: sectionProblems.statementMissing(spanOf(equals), 'let', 'The value') };
  }
  const { node, problem } = readExpression({ tokens, start: endOf(equals), end: span.end }, 'expression', isUnit);
  return { statement: node === undefined ? named : { ...named, value: node }, problem: nameProblem ?? problem };
}

function readExpect({ keyword, span, rest }: Parts, isUnit: IsUnit): ReadParts {
  const statement = { kind: 'expect' as const, span, keyword };
  if (rest.length === 0) {
    return { statement, problem: sectionProblems.statementMissing(keyword, 'expect', 'The claim') };
  }
  const { node, problem } = readExpression({ tokens: rest, start: keyword.end, end: span.end }, 'claim', isUnit);
  if (node === undefined) return { statement, problem };
  const isClaim = node.kind === 'comparison' || node.kind === 'within';
  const noClaim = isClaim ? undefined : sectionProblems.statementMissing(node.span, 'expect', 'A comparison');
  return { statement: { ...statement, claim: node }, problem: problem ?? noClaim };
}
