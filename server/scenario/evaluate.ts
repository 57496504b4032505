// Evaluates a scenario: loads its files, binds names, has every statement answered, and gathers figures, values, claims,
// facts and meanings by file. The entry point of this room; see scenario.ts for what it returns. Reads nothing itself and
// never throws for a text. Invariant: what an earlier evaluation left (trees, kept answers) makes it faster, never
// different.

import { isPartial, problemsOf } from '../../grammar/parse.ts';
import type { PlacedSection, SyntaxTree } from '../../grammar/tree.ts';
import { findSubstance } from '../core/substance/catalogue.ts';
import { parseFormula } from '../core/substance/formula.ts';
import type { Answer } from './answer.ts';
import { bindNames } from './bind.ts';
import type { Fact } from './facts.ts';
import { loadFiles, type LoadedFile, type ReadAnswer } from './files.ts';
import { lazily } from './lazily.ts';
import type { WorkElsewhere } from './long-work.ts';
import { withMeanings, type MeaningsOf } from './meanings.ts';
import { placeAnswer, type PlacedAnswer, type PlacedByName } from './placing.ts';
import { Questions, type AnswerStore } from './questions.ts';
import type { EvaluatedFile, EvaluatedScenario, PlacedFact } from './scenario.ts';

export type { ReadAnswer } from './files.ts';

/** What earlier evaluations left, for one that has much in common with them. */
export interface Earlier {
  /** The tree of an earlier text of each file, by address. */
  readonly trees?: ReadonlyMap<string, SyntaxTree>;
  readonly answers?: AnswerStore;
}

/** An evaluation that is under way. */
export interface Underway {
  /** What can be said already: all about form and names, and what is answered or known by heart. */
  soFar(): EvaluatedScenario;
  /** Nothing more can be done until some of the work done elsewhere has ended. */
  readonly waits: boolean;
}

/**
 * The scenario at `path` with all it uses. `read` answers for the root and for every used file, by its resolved address;
 * it must answer at once (a file still to be fetched is `wanted`, and listed so). No files when the root has no text.
 */
export function evaluate(path: string, read: (path: string) => ReadAnswer, earlier: Earlier = {}): EvaluatedScenario {
  const steps = evaluateInSteps(path, read, earlier);
  for (;;) {
    const step = steps.next();
    if (step.done) return step.value;
  }
}

/**
 * The same, with a pause after each statement, at which the caller may stop or do something else. Long work is done by
 * `elsewhere`, if given; where the evaluation waits for it, the caller is to go on once some of it has ended.
 */
export function* evaluateInSteps(
  path: string,
  read: (path: string) => ReadAnswer,
  earlier: Earlier = {},
  elsewhere?: WorkElsewhere,
): Generator<Underway, EvaluatedScenario> {
  const { files, wanted, lacksUsed } = loadFiles(path, read, earlier.trees);
  const bindings = bindNames(files);
  const isReadInPart = files.some(({ tree }) => isPartial(tree));
  // What is not there may stand in a file still to be fetched, or in the unread part of one that is too large.
  const mayStandElsewhere = (name: string): boolean => wanted.length > 0 || (isReadInPart && !isWellKnown(name));
  const questions = new Questions(files, bindings, mayStandElsewhere, earlier.answers, elsewhere);
  const gathered = (): EvaluatedScenario => ({ files: gatherFiles(files, questions, lacksUsed), wanted });
  const underway: Underway = {
    soFar() {
      questions.recallRest();
      return gathered();
    },
    waits: false,
  };
  for (const question of questions.order) {
    questions.answer(question);
    yield underway;
  }
  // While a file is still to be fetched nothing is waited for: once it is there, all is asked anew.
  while (questions.isWaiting && wanted.length === 0) {
    let isStuck = true;
    for (const question of questions.ready()) {
      questions.answer(question);
      isStuck = false;
      yield underway;
    }
    if (isStuck) yield { ...underway, waits: true };
  }
  return gathered();
}

/** A substance of the catalogue, or a formula: it is what it is, whatever the unread part of a large file says. */
function isWellKnown(name: string): boolean {
  return findSubstance(name) !== undefined || parseFormula(name).kind === 'formula';
}

/** The answers at their places, file by file. What stands in no finding is placed when somebody reads it. */
function gatherFiles(files: readonly LoadedFile[], questions: Questions, lacksFile: boolean): readonly EvaluatedFile[] {
  const answers = questions.answersNow();
  const pathOf = new Map<PlacedSection, string>();
  for (const { path, tree } of files) for (const section of tree.sections) pathOf.set(section, path);
  const placed = new Map<PlacedSection, PlacedAnswer>();
  const placedOf: PlacedOf = (section) => {
    const known = placed.get(section);
    const answer = answers.get(section);
    if (known || !answer) return known;
    const made = placeAnswer(answer, pathOf.get(section) ?? '', section);
    placed.set(section, made);
    return made;
  };
  const placedByName: PlacedByName = (name) => {
    const section = questions.sectionNamed(name);
    return section && placedOf(section);
  };
  return files.map((file) => gather(file, answers, placedOf, placedByName, lacksFile));
}

type PlacedOf = (section: PlacedSection) => PlacedAnswer | undefined;

/** While a used file is missing, a name that is not there may be in it; the missing file is the one cause. */
function mayBeElsewhere(fact: Fact): boolean {
  return fact.code === 'name/unknown' && ['substance', 'definition', 'value'].includes(fact.what);
}

/** Everything about one file, in the order of its text. */
function gather(
  { path, used, tree, facts: ofNames }: LoadedFile,
  answers: ReadonlyMap<PlacedSection, Answer>,
  placedOf: PlacedOf,
  placedByName: PlacedByName,
  lacksFile: boolean,
): EvaluatedFile {
  const computed: PlacedFact[] = [...ofNames];
  // A slip of form of which the evaluation knows more than the grammar is told once, in its words.
  const retold = new Map<number, PlacedFact>();
  let title: string | null = null;
  for (const placed of tree.sections) {
    const { statement } = placed.section;
    if (statement.kind === 'title') title ??= statement.title?.value ?? null;
    if (!answers.get(placed)?.facts.length) continue;
    for (const told of placedOf(placed)?.facts ?? []) {
      if ('problem' in told.fact) retold.set(told.place.start, told);
      else computed.push(told);
    }
  }
  const problems = problemsOf(tree).map((problem): PlacedFact => {
    const { start, end } = problem.span;
    return retold.get(start) ?? { fact: { code: problem.code, problem }, place: { path, start, end } };
  });
  // A file with so many slips is being pasted, merged or is no scenario: what it computes would only be noise.
  const facts =
    problems.length >= suspendingProblems ? suspended(problems, computed.length) : [...problems, ...computed];
  const told = lacksFile ? facts.filter(({ fact }) => !mayBeElsewhere(fact)) : facts;
  const meaningsOf: MeaningsOf = (section) => placedOf(section)?.meanings(placedByName) ?? [];
  const unread = { definitions: [], values: [], expectations: [], meanings: [] };
  const file = lazily<EvaluatedFile>(
    { path, used, tree, title, facts: told, ...unread },
    {
      definitions: () => tree.sections.flatMap((section) => placedOf(section)?.definition ?? []),
      values: () => tree.sections.flatMap((section) => (hasName(section) ? (placedOf(section)?.value ?? []) : [])),
      expectations: () => tree.sections.flatMap((section) => placedOf(section)?.expectation ?? []),
      meanings: () => tree.sections.flatMap(meaningsOf),
    },
  );
  return withMeanings(file, meaningsOf);
}

/** A `let` without a name can be asked for by nobody. */
function hasName({ section: { statement } }: PlacedSection): boolean {
  return statement.kind === 'let' && statement.name !== undefined;
}

/** The syntax problems, and that more is kept back, where more is: nothing stays silent without a word. */
function suspended(problems: readonly PlacedFact[], hidden: number): readonly PlacedFact[] {
  const [first] = problems;
  if (!first || hidden === 0) return problems;
  return [{ fact: { code: 'kind/suspended', problems: problems.length, hidden }, place: first.place }, ...problems];
}

/** From this many syntax problems on, a file's computed findings are not told. */
const suspendingProblems = 16;
