// Check functions for syntax: marked fixtures for problems and outlines for readings. A line of carets below a line of
// the fixture marks a problem there, with its code and the start of its message; a problem without a mark fails, so
// every fixture also guards against false alarms.
import { expect } from 'vitest';
import { parse, problemsOf } from '../../grammar/parse.ts';
import type { Definition, Problem, SyntaxTree } from '../../grammar/tree.ts';
import { outlineExpression, outlineLine, outlineSection } from './outline.ts';
import { isTestUnit } from './units.ts';

/**
 * Parses a fixture and compares its problems with its marks, written as
 * ```
 * density: 44,0 kg/m3
 * //       ^^^^ syntax/unexpected: `44,0` has a decimal comma
 * ```
 * A mark for the first columns leaves the slashes out. Returns the tree for further checks.
 */
export function checkProblems(fixture: string): SyntaxTree {
  const { text, marks } = readMarks(fixture);
  const tree = parse(text, isTestUnit);
  const found = problemsOf(tree).map((problem) => renderProblem(text, problem));
  expect(found.map(({ place, code }) => `${place} ${code}`)).toEqual(
    marks.map(({ place, code }) => `${place} ${code}`),
  );
  found.forEach(({ message }, index) =>
    expect(message.startsWith(marks[index]?.message ?? '') ? '' : message).toBe(''),
  );
  return tree;
}

/** The outline of what `let it = …` reads, with no problem. */
export function readExpression(text: string): string {
  const tree = checkProblems(`let it = ${text}`);
  const statement = tree.sections[0]?.section.statement;
  return statement?.kind === 'let' && statement.value !== undefined ? outlineExpression(statement.value) : 'no value';
}

/** The outline of what `expect …` reads, with no problem. */
export function readClaim(text: string): string {
  const statement = checkProblems(`expect ${text}`).sections[0]?.section.statement;
  return statement?.kind === 'expect' && statement.claim !== undefined
    ? outlineExpression(statement.claim)
    : 'no claim';
}

/** The outlines of the lines of a definition with this body, with no problem. */
export function readLines(body: string): string[] {
  return linesOf(checkProblems(`blend it {\n${body}\n}\n`)).map(outlineLine);
}

/** The outlines of a text's sections; `checkProblems` looks at its problems. */
export const readSections = (text: string): string[] =>
  parse(text, isTestUnit).sections.map(({ section }) => outlineSection(section));

/** The lines of the first definition of a tree. */
export function linesOf(tree: SyntaxTree): Definition['lines'] {
  for (const { section } of tree.sections) {
    if (section.statement.kind === 'definition') return section.statement.lines;
  }
  return [];
}

interface Mark {
  /** `line:column-column`, both counted from 1, the end exclusive. */
  readonly place: string;
  readonly code: string;
  readonly message: string;
}

function readMarks(fixture: string): { readonly text: string; readonly marks: Mark[] } {
  const lines: string[] = [];
  const marks: Mark[] = [];
  for (const line of fixture.split('\n')) {
    const mark = /^(?:\/\/)? *(\^+) (syntax\/[a-z-]+)(?:: (.*))?$/.exec(line);
    const carets = mark?.[1];
    if (mark === null || carets === undefined) lines.push(line);
    else {
      const column = line.indexOf('^') + 1;
      const place = `${lines.length}:${column}-${column + carets.length}`;
      marks.push({ place, code: mark[2] ?? '', message: mark[3] ?? '' });
    }
  }
  return { text: lines.join('\n'), marks };
}

function renderProblem(text: string, { span, code, message }: Problem): Mark {
  const before = text.slice(0, span.start);
  const column = span.start - (before.lastIndexOf('\n') + 1) + 1;
  const place = `${before.split('\n').length}:${column}-${column + span.end - span.start}`;
  return { place, code, message };
}
