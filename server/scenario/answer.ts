// Works out one statement (a definition, a `let`, an `expect`) and keeps what it came to. Knows nothing of files and of
// where its section stands: all places in an answer are offsets in the section's own text, and what it says of other
// definitions is said by their names, so that placing.ts can put it wherever the same text stands. Never throws for a
// text: an exception in one statement is our bug, reported at that statement. Invariant: an answer is a pure function of
// the section's significant text (significant-text.ts) and of what the scope answered.

import type { Definition, ExpectStatement, LetStatement, PlacedSection, Section, Span } from '../../grammar/tree.ts';
import { evaluateClaim } from './claims.ts';
import { Context, near, type Named, type Scope } from './context.ts';
import { evaluateExpression } from './expressions.ts';
import { isHazardCode } from './hazard-fact.ts';
import type { KindAnswer } from './kinds/kind.ts';
import { kindOf, kinds } from './kinds/registry.ts';
import { lazily } from './lazily.ts';
import type { Place } from './place.ts';
import type { EvaluatedDefinition, EvaluatedValue, Expectation, PlacedFact, PlacedMeaning } from './scenario.ts';

/** What one statement came to; its places have an empty path and are offsets in its section. */
export interface Answer {
  /** The section it was made from. */
  readonly section: Section;
  /** What its name stands for; null for an `expect`. */
  readonly named: Named | null;
  readonly expectation: Expectation | null;
  readonly facts: readonly PlacedFact[];
  readonly meanings: readonly PlacedMeaning[];
  /** The places that stand somewhere inside its facts, figures or tables. */
  readonly innerPlaces: ReadonlySet<Place>;
}

export type Answerable = Definition | LetStatement | ExpectStatement;

/** Works out a section's statement, with `scope` for all the names it mentions. */
export function answerStatement(section: Section, statement: Answerable, scope: Scope): Answer {
  const placed: PlacedSection = { start: 0, end: section.text.length, section };
  const owner = statement.kind === 'expect' ? '' : (statement.name?.text ?? '');
  const { lent, takeBack } = lend(scope);
  const context = new Context('', placed, owner, lent);
  let named: Named | null = null;
  let expectation: Expectation | null = null;
  if (statement.kind === 'expect') {
    const unknown = unknownExpectation(statement, context);
    expectation = guarded(context, statement.span, unknown, () => answerExpect(statement, context));
  } else {
    named = guarded(context, statement.span, { kind: 'unknown' }, () =>
      statement.kind === 'let' ? answerLet(statement, owner, context) : answerDefinition(statement, placed, context),
    );
  }
  takeBack();
  const { facts, meanings, innerPlaces } = context;
  return { section, named, expectation, facts, meanings, innerPlaces };
}

/**
 * A scope for as long as a statement is worked out. What is put off until somebody reads it must look up no name, since the
 * answer would not be known by that; and it must not keep alive all that was worked out beside it.
 */
function lend(scope: Scope): { readonly lent: Scope; readonly takeBack: () => void } {
  let whole: Scope | null = scope;
  const open = (): Scope => {
    if (!whole) throw new Error('a name was looked up after its statement was answered');
    return whole;
  };
  const lent: Scope = {
    lookup: (name) => open().lookup(name),
    names: () => open().names(),
    longWork: (work, key, input) => open().longWork(work, key, input),
    fileText: (path) => open().fileText(path),
  };
  return {
    lent,
    takeBack: () => {
      whole = null;
    },
  };
}

function answerLet(statement: LetStatement, name: string, context: Context): Named {
  context.startLine('let');
  const quantity = statement.value ? evaluateExpression(statement.value, context) : null;
  const nameSpan = statement.name?.span ?? statement.keyword;
  const [place, namePlace] = [context.ownPlace(statement.span), context.ownPlace(nameSpan)];
  const value: EvaluatedValue = { name, place, namePlace, quantity };
  context.mean(nameSpan, { kind: 'value', name, value });
  return { kind: 'value', value };
}

function answerDefinition(statement: Definition, placed: PlacedSection, context: Context): Named {
  const word = statement.keyword.text;
  const kind = kindOf(word);
  const name = statement.name?.text ?? '';
  checkAcknowledgements(statement, context);
  let answer: KindAnswer | null = null;
  if (!kind) {
    const suggestions = near(
      word,
      kinds.map((known) => known.kind),
    );
    context.report(statement.keyword.span, { code: 'name/unknown-kind', word, near: suggestions });
  } else if (!kind.evaluated) {
    context.report(statement.keyword.span, { code: 'kind/not-evaluated', kind: word, name });
  } else {
    const { evaluated } = kind;
    answer = evaluated.evaluate(statement, context);
  }
  const definition: EvaluatedDefinition = {
    kind: word,
    name,
    doc: placed.section.doc,
    place: context.ownPlace(statement.span),
    header: context.ownPlace(statement.header),
    namePlace: context.ownPlace(statement.name?.span ?? statement.keyword.span),
    section: placed,
    figures: [],
    tables: [],
    absent: new Map(),
    lines: answer?.lines ?? [],
    screening: answer?.screening,
  };
  if (statement.name) context.mean(statement.name.span, { kind: 'definition', name, definition });
  if (!answer) return { kind: 'unevaluated', definition };
  const { material, stream = null, machinery = null } = answer;
  // A kind may leave its figures and tables until somebody reads them.
  lazily(definition, {
    figures: () => answer.figures,
    tables: () => answer.tables,
    absent: () => answer.absent,
  });
  return { kind: 'definition', definition, material, stream, machinery };
}

/** `acknowledge` lines: only hazards can be acknowledged, and only with a reason. */
function checkAcknowledgements(statement: Definition, context: Context): void {
  for (const line of statement.lines) {
    if (line.kind !== 'acknowledge' || !line.code) continue;
    const acknowledged = line.code.text;
    if (!acknowledged.startsWith('hazard/')) {
      context.report(line.code.span, { code: 'name/acknowledged', why: 'not-a-hazard', acknowledged });
    } else if (!isHazardCode(acknowledged)) {
      context.report(line.code.span, { code: 'name/acknowledged', why: 'unknown-code', acknowledged });
    } else if (line.reason && line.reason.value.trim() === '') {
      context.report(line.reason.span, { code: 'name/acknowledged', why: 'no-reason', acknowledged });
    }
  }
}

function answerExpect(statement: ExpectStatement, context: Context): Expectation {
  context.startLine('expect');
  const { claim } = statement;
  // The grammar has said so where the claim is missing, or is no claim.
  if (claim?.kind !== 'comparison' && claim?.kind !== 'within') return unknownExpectation(statement, context);
  const answer = evaluateClaim(claim, context);
  if (!answer) return unknownExpectation(statement, context);
  const { holds, found, unit, limit, tolerance } = answer;
  if (!holds) {
    const text = context.written(claim.span);
    context.report(claim.span, { code: 'expect/failed', claim: text, found, unit, limit, tolerance });
  }
  return { place: context.ownPlace(statement.span), holds, found, unit };
}

function unknownExpectation(statement: ExpectStatement, context: Context): Expectation {
  return { place: context.ownPlace(statement.span), holds: null, found: null, unit: null };
}

/** Runs one statement's evaluation; an exception is a bug of this program, said once, and costs that statement alone. */
function guarded<T>(context: Context, span: Span, otherwise: T, work: () => T): T {
  try {
    return work();
  } catch (error) {
    const message = error instanceof Error ? error.message : String(error);
    context.report(span, { code: 'program/failed', message });
    return otherwise;
  }
}
