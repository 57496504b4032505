// The words of syntax problems that belong to a whole statement or definition: headers, braces, missing parts, lines
// that stand nowhere, files that are too large. Same manner as messages.ts: the thing, what is needed, one next step.
// Invariant: each function returns one problem; what is missing is placed on the header word or what stands before it.
import { shorten } from './messages.ts';
import type { Problem, Span } from './tree.ts';
import type { StatementWord } from './words.ts';

const EXAMPLES: Readonly<Record<StatementWord, string>> = {
  scenario: 'scenario "Trial of a new fuel"',
  use: 'use "house/suppliers.stoke"',
  let: 'let days_worked = 210 per year',
  expect: 'expect lower heating value of slurry > 33 MJ/kg',
};

export const sectionProblems = {
  kindMissing: (span: Span, name: string): Problem => ({
    code: 'syntax/missing',
    span,
    message: `The kind of \`${name}\` is missing. A definition starts with its kind and name: \`blend ${name} {\`.`,
  }),
  nameMissing: (keyword: Span, kind: string): Problem => ({
    code: 'syntax/missing',
    span: keyword,
    message: `This ${kind} has no name. Write for example \`${kind} trial {\`.`,
  }),
  headerWords: (span: Span): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: 'This does not fit before a `{`. A definition starts with its kind and one name: `blend slurry {`.',
  }),
  openBraceMissing: (span: Span, kind: string, name: string | undefined, at: number): Problem => ({
    code: 'syntax/missing',
    span,
    message: `A \`{\` is missing behind \`${name ?? kind}\`; the lines of a definition stand between \`{\` and \`}\`.`,
    fix: { title: 'Add the {', span: { start: at, end: at }, newText: ' {' },
  }),
  closeBraceMissing: (span: Span, name: string, at: number): Problem => ({
    code: 'syntax/unclosed',
    span,
    message: `The definition \`${name}\` has no closing \`}\`. Add one behind its last line.`,
    fix: { title: 'Add the closing }', span: { start: at, end: at }, newText: '\n}' },
  }),
  strayOpenBrace: (span: Span): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: 'This `{` opens nothing: the kind and name of a definition stand before it on the same line.',
  }),
  behindClosingBrace: (span: Span): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: 'This stands behind the closing `}` of the definition. Move it inside, or onto a line of its own.',
  }),
  strayCloseBrace: (span: Span): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: 'This `}` closes no definition.',
    fix: { title: 'Remove the }', span, newText: '' },
  }),
  outside: (span: Span): Problem => ({
    code: 'syntax/unexpected',
    span,
    message:
      'This stands outside of any definition. Put it between the `{` and `}` of one, or start with a word such as `let`, `expect` or `blend`.',
  }),
  nameForm: (span: Span, name: string): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: `A bare name is made of small letters, digits and \`_\`. Put this one in quotes: \`'${name}'\`.`,
    fix: { title: 'Put the name in quotes', span, newText: `'${name}'` },
  }),
  noValue: (span: Span, words: string): Problem => ({
    code: 'syntax/missing',
    span,
    message: `\`${words}\` has no value. Write it behind the colon.`,
  }),
  /** Only who knows the entries of a kind can tell: to the grammar `fuel methanol` is a spoilt portion. */
  colonMissing: (span: Span, words: string, value: string): Problem => ({
    code: 'syntax/missing',
    span,
    message: `Write a colon after \`${words}\`: \`${words}: ${shorten(value)}\`.`,
    fix: { title: 'Add the colon', span: { start: span.end, end: span.end }, newText: ':' },
  }),
  statementMissing: (span: Span, keyword: StatementWord, what: string): Problem => ({
    code: 'syntax/missing',
    span,
    message: `${what} is missing. Write for example \`${EXAMPLES[keyword]}\`.`,
  }),
  statementExtra: (span: Span, keyword: StatementWord): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: `This does not belong to the \`${keyword}\` before it. Remove it, or give it a place of its own.`,
  }),
  acknowledgeCode: (span: Span): Problem => ({
    code: 'syntax/missing',
    span,
    message:
      'The code that is acknowledged is missing. Write for example `acknowledge hazard/water-reactive: "closed tanks"`.',
  }),
  acknowledgeReason: (span: Span): Problem => ({
    code: 'syntax/missing',
    span,
    message: 'A reason is missing. Write a colon and a text behind the code: `: "closed tanks"`.',
  }),
  acknowledgeExtra: (span: Span): Problem => ({
    code: 'syntax/unexpected',
    span,
    message: 'Nothing but its reason, one text, stands behind the code of an `acknowledge`.',
  }),
  tooLarge: (span: Span, megabytes: string): Problem => ({
    code: 'syntax/too-large',
    span,
    message: `This file is larger than ${megabytes} MB, so only a part of it is read. Split it with \`use\`.`,
  }),
};
