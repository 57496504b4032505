// Evaluates a scenario: loads its files, binds names, orders them by what they mention, works each out once, and gathers
// figures, values, claims, facts and meanings by file. The entry point of this room; see scenario.ts for what it returns.
// Reads nothing itself and never throws for a text: an exception in one statement is our bug, reported at that statement,
// and the rest is still answered.

import type { Definition, ExpectStatement, LetStatement, PlacedSection, Span } from '../../grammar/tree.ts';
import { problemsOf } from '../../grammar/parse.ts';
import { bindNames, type Binding, type Bindings } from './bind.ts';
import { Context, near, type Named, type Scope } from './context.ts';
import { evaluateClaim } from './claims.ts';
import { mentionsOf, orderByMentions } from './dependencies.ts';
import { evaluateExpression } from './expressions.ts';
import { loadFiles, type LoadedFile, type ReadAnswer } from './files.ts';
import { kindOf, kinds } from './kinds/registry.ts';
import type { KindAnswer } from './kinds/kind.ts';
import { placeOf } from './place.ts';
import type {
  EvaluatedDefinition,
  EvaluatedFile,
  EvaluatedScenario,
  EvaluatedValue,
  Expectation,
  PlacedFact,
  PlacedMeaning,
} from './scenario.ts';

export type { ReadAnswer } from './files.ts';

/**
 * The scenario at `path` with all it uses. `read` answers for the root and for every used file, by its resolved address;
 * it must answer at once (a file still to be fetched is `wanted`, and listed so). No files when the root has no text.
 */
export function evaluate(path: string, read: (path: string) => ReadAnswer): EvaluatedScenario {
  const { files, wanted } = loadFiles(path, read);
  const bindings = bindNames(files);
  const answers = new Map<Binding, Answer>();
  const unknowable = new Set(bindings.ambiguous);
  const scope = new ScenarioScope(bindings, unknowable, answers, wanted.length > 0);
  answerBindings(bindings, unknowable, scope, answers);
  return { files: files.map((file) => gather(file, bindings, scope, answers)), wanted };
}

/** What one statement came to. */
interface Answer {
  readonly named: Named;
  readonly facts: readonly PlacedFact[];
  readonly meanings: readonly PlacedMeaning[];
}

class ScenarioScope implements Scope {
  readonly #bindings: Bindings;
  /** Names that stand for nothing: given twice, or on a ring. */
  readonly #unknowable: ReadonlySet<string>;
  readonly #answers: ReadonlyMap<Binding, Answer>;
  readonly #isIncomplete: boolean;

  constructor(
    bindings: Bindings,
    unknowable: ReadonlySet<string>,
    answers: ReadonlyMap<Binding, Answer>,
    isIncomplete: boolean,
  ) {
    this.#bindings = bindings;
    this.#unknowable = unknowable;
    this.#answers = answers;
    this.#isIncomplete = isIncomplete;
  }

  lookup(name: string): Named | undefined {
    if (this.#unknowable.has(name)) return { kind: 'unknown' };
    const binding = this.#bindings.unique.get(name);
    // While a used file is still to be fetched, a name that is not there yet may be in it.
    if (!binding) return this.#isIncomplete ? { kind: 'unknown' } : undefined;
    return this.#answers.get(binding)?.named ?? { kind: 'unknown' };
  }

  names(): Iterable<string> {
    return [...this.#bindings.unique.keys(), ...this.#bindings.ambiguous];
  }
}

/** Answers all named statements; the names on a ring join the unknowable ones. */
function answerBindings(
  bindings: Bindings,
  unknowable: Set<string>,
  scope: Scope,
  answers: Map<Binding, Answer>,
): void {
  const mentions = new Map([...bindings.unique].map(([name, binding]) => [name, mentionsOf(binding.statement)]));
  const { order, cycles } = orderByMentions(mentions);
  const ordered = new Set(order);
  for (const name of bindings.unique.keys()) if (!ordered.has(name)) unknowable.add(name);
  for (const name of order) {
    const binding = bindings.unique.get(name);
    if (binding) answers.set(binding, answerBinding(binding, scope));
  }
  for (const { by, mention, path, leftOut } of cycles) {
    const binding = bindings.unique.get(by);
    const place = binding && placeOf(binding.file.path, binding.placed, mention.span);
    if (binding && place) binding.file.facts.push({ fact: { code: 'name/cycle', path, leftOut }, place });
  }
  // Two definitions of one name, and those on a ring, are each worked out for their own findings, though the name stands
  // for nothing.
  for (const binding of bindings.all) {
    if (unknowable.has(binding.name)) answers.set(binding, answerBinding(binding, scope));
  }
}

function answerBinding(binding: Binding, scope: Scope): Answer {
  const { statement, file, placed, name } = binding;
  const context = new Context(file.path, placed, name, scope);
  const named = guarded(context, statement.span, { kind: 'unknown' }, () =>
    statement.kind === 'let' ? answerLet(statement, name, context) : answerDefinition(statement, placed, context),
  );
  return { named, facts: context.facts, meanings: context.meanings };
}

function answerLet(statement: LetStatement, name: string, context: Context): Named {
  context.startLine('let');
  const quantity = statement.value ? evaluateExpression(statement.value, context) : null;
  const namePlace = context.place(statement.name?.span ?? statement.keyword);
  const value: EvaluatedValue = { name, place: context.place(statement.span), namePlace, quantity };
  context.mean(statement.name?.span ?? statement.keyword, { kind: 'value', name, value });
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
    place: context.place(statement.span),
    header: context.place(statement.header),
    namePlace: context.place(statement.name?.span ?? statement.keyword.span),
    section: placed,
    figures: answer?.figures ?? [],
    tables: answer?.tables ?? [],
    absent: answer?.absent ?? new Map(),
    lines: answer?.lines ?? [],
  };
  if (statement.name) context.mean(statement.name.span, { kind: 'definition', name, definition });
  return answer ? { kind: 'definition', definition, material: answer.material } : { kind: 'unevaluated', definition };
}

/** `acknowledge` lines: only hazards can be acknowledged, and only with a reason. */
function checkAcknowledgements(statement: Definition, context: Context): void {
  for (const line of statement.lines) {
    if (line.kind !== 'acknowledge' || !line.code) continue;
    const acknowledged = line.code.text;
    if (!acknowledged.startsWith('hazard/')) {
      context.report(line.code.span, { code: 'name/acknowledged', why: 'not-a-hazard', acknowledged });
    } else if (line.reason && line.reason.value.trim() === '') {
      context.report(line.reason.span, { code: 'name/acknowledged', why: 'no-reason', acknowledged });
    }
  }
}

/** Everything about one file, in the order of its text. */
function gather(
  file: LoadedFile,
  bindings: Bindings,
  scope: Scope,
  answers: ReadonlyMap<Binding, Answer>,
): EvaluatedFile {
  const computed: PlacedFact[] = [...file.facts];
  const meanings: PlacedMeaning[] = [];
  const definitions: EvaluatedDefinition[] = [];
  const values: EvaluatedValue[] = [];
  const expectations: Expectation[] = [];
  let title: string | null = null;
  const ofSection = new Map(
    bindings.all.filter((binding) => binding.file === file).map((binding) => [binding.placed, binding]),
  );
  for (const placed of file.tree.sections) {
    const { statement } = placed.section;
    if (statement.kind === 'title') title ??= statement.title?.value ?? null;
    if (statement.kind === 'expect') {
      const context = new Context(file.path, placed, '', scope);
      expectations.push(
        guarded(context, statement.span, unknownExpectation(statement, context), () =>
          answerExpect(statement, context),
        ),
      );
      append(computed, context.facts);
      append(meanings, context.meanings);
    }
    const answer = answerOf(placed, ofSection, answers, scope, file);
    if (!answer) continue;
    append(computed, answer.facts);
    append(meanings, answer.meanings);
    if (answer.named.kind === 'value') values.push(answer.named.value);
    else if (answer.named.kind !== 'unknown') definitions.push(answer.named.definition);
  }
  const { path, used, tree } = file;
  const problems = problemsOf(tree).map((problem): PlacedFact => ({
    fact: { code: problem.code, problem },
    place: { path, start: problem.span.start, end: problem.span.end },
  }));
  // A file with so many slips is being pasted, merged or is no scenario: what it computes would only be noise.
  const facts = problems.length >= suspendingProblems ? problems : [...problems, ...computed];
  return { path, used, tree, title, definitions, values, expectations, facts, meanings };
}

/** One by one: a definition of 100,000 lines has more facts than a call can have arguments. */
function append<T>(list: T[], more: readonly T[]): void {
  for (const one of more) list.push(one);
}

/** From this many syntax problems on, a file's computed findings are not told. */
const suspendingProblems = 16;

/** The answer of a named section; one without a name is worked out here, since nothing can refer to it. */
function answerOf(
  placed: PlacedSection,
  ofSection: ReadonlyMap<PlacedSection, Binding>,
  answers: ReadonlyMap<Binding, Answer>,
  scope: Scope,
  file: LoadedFile,
): Answer | undefined {
  const binding = ofSection.get(placed);
  if (binding) return answers.get(binding);
  const { statement } = placed.section;
  if (statement.kind !== 'definition' && statement.kind !== 'let') return undefined;
  const context = new Context(file.path, placed, '', scope);
  const named = guarded(context, statement.span, { kind: 'unknown' }, () =>
    statement.kind === 'definition' ? answerDefinition(statement, placed, context) : answerLet(statement, '', context),
  );
  return {
    named: named.kind === 'value' ? { kind: 'unknown' } : named,
    facts: context.facts,
    meanings: context.meanings,
  };
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
  return { place: context.place(statement.span), holds, found, unit };
}

function unknownExpectation(statement: ExpectStatement, context: Context): Expectation {
  return { place: context.place(statement.span), holds: null, found: null, unit: null };
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
