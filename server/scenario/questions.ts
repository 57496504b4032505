// Asks, once each and in an order in which each follows all it mentions, what the statements of a scenario come to. What a
// store already knows is taken from it: a statement is known by its significant text and by the answers to the names it
// looked up, so a comment asks nothing again, and a number only what rests on it. A statement whose long work is not there
// yet is answered for now, as is what rests on it, and again later. Places nothing and reads no file.
// Invariants: with or without a store, whoever does the long work, and whatever was asked before, the answers in the end
// are the same; an answer for now is never kept; the names of statements on a ring, or given twice, stand for nothing.

import type { PlacedSection } from '../../grammar/tree.ts';
import { answerStatement, type Answer, type Answerable } from './answer.ts';
import type { Bindings } from './bind.ts';
import type { Named, Scope } from './context.ts';
import { mentionsOf, orderByMentions, type Mention } from './dependencies.ts';
import type { LoadedFile } from './files.ts';
import { onTheSpot, type LongWork, type WorkElsewhere } from './long-work.ts';
import { placeOf } from './place.ts';
import { significantTextOf } from './significant-text.ts';

/** What the answers of earlier versions are kept in, by content. */
export interface AnswerStore {
  /** The answer kept for a question, if all it looked up has that key now. */
  recall(question: string, keyNow: (lookedUp: string) => Key | null): KeptAnswer | undefined;
  keep(question: string, lookedUp: ReadonlyMap<string, Key>, answer: Answer): KeptAnswer;
}

/** Equal for equal answers only. */
type Key = number | string;

interface KeptAnswer {
  readonly key: Key;
  readonly value: Answer;
}

/** A name that is not there, and one that stands for nothing. No number, so unlike the key of any answer. */
const ABSENT = 'absent';
const UNKNOWN = 'unknown';
/** Long work that has failed. Nothing has this key now, so what rests on it is worked out again. */
const FAILED = 'failed';
/** Looked up by a statement that went through all names for a suggestion. No name has a newline in it. */
const ALL_NAMES = '\n';
/** Before the path of a file that a statement names. The key is the text itself, so that a changed one asks again. */
const FILE = '\n\n';
/** The key of a file that is not there; a number, so unlike any text. */
const NO_FILE = -1;

export class Questions {
  /** All there is to ask: each statement behind all it mentions, but for rings. */
  readonly order: readonly Question[];
  readonly #unknowable: ReadonlySet<string>;
  readonly #answers = new Map<PlacedSection, KeptAnswer>();
  readonly #store: AnswerStore;
  /** What the statement in hand has looked up so far. */
  #lookedUp = new Map<string, Key>();
  /** What it still awaits. */
  #awaited: Awaited[] = [];
  /** The statements answered for now, with what they await. */
  readonly #waiting = new Map<PlacedSection, readonly Awaited[]>();
  #namesKey: string | null = null;

  /** Orders what is to be asked; what is wrong with the order (rings) is said in the files. */
  constructor(
    private readonly files: readonly LoadedFile[],
    private readonly bindings: Bindings,
    /** Whether a name that is not here may stand in a text that is not at hand. */
    private readonly mayBeElsewhere: (name: string) => boolean,
    store?: AnswerStore,
    private readonly elsewhere?: WorkElsewhere,
  ) {
    const mentions = new Map<string, readonly Mention[]>();
    for (const [name, { statement }] of bindings.unique) mentions.set(name, mentionsIn(statement));
    const { order, cycles } = orderByMentions(mentions);
    for (const { by, mention, path, leftOut } of cycles) {
      const binding = bindings.unique.get(by);
      const place = binding && placeOf(binding.file.path, binding.placed, mention.span);
      if (binding && place) binding.file.facts.push({ fact: { code: 'name/cycle', path, leftOut }, place });
    }
    const unknowable = new Set(bindings.ambiguous);
    if (order.length < bindings.unique.size) {
      const ordered = new Set(order);
      for (const name of bindings.unique.keys()) if (!ordered.has(name)) unknowable.add(name);
    }
    this.#unknowable = unknowable;
    const toAsk = new Set<PlacedSection>();
    for (const name of order) {
      const placed = bindings.unique.get(name)?.placed;
      if (placed) toAsk.add(placed);
    }
    // Whatever stands for nothing (given twice, on a ring, without a name, an `expect`) is worked out for its own findings.
    for (const { tree } of files) for (const placed of tree.sections) toAsk.add(placed);
    const questions: Question[] = [];
    for (const placed of toAsk) {
      const question = questionOf(placed);
      if (question) questions.push(question);
    }
    this.order = questions;
    this.#store = store ?? nothingKept;
  }

  /** Answers one question, from the store where that knows. Those before it in the order must have been answered. */
  answer({ placed, statement }: Question): void {
    const question = significantTextOf(placed.section).text;
    this.#waiting.delete(placed);
    const known = this.#store.recall(question, (name) => this.#keyNow(name, placed));
    if (known) {
      this.#answers.set(placed, known);
      return;
    }
    this.#lookedUp = new Map();
    const awaited: Awaited[] = (this.#awaited = []);
    const answer = answerStatement(placed.section, statement, this.#scopeOf(awaited, placed));
    if (awaited.length > 0) {
      this.#waiting.set(placed, awaited);
      this.#answers.set(placed, { key: UNKNOWN, value: answer });
    } else this.#answers.set(placed, this.#store.keep(question, this.#lookedUp, answer));
  }

  /** Whether some answers are for now only. */
  get isWaiting(): boolean {
    return this.#waiting.size > 0;
  }

  /** Those answered for now whose time has come, each as soon as those before it have been answered again. */
  *ready(): Iterable<Question> {
    for (const question of this.order) {
      if (this.#waiting.get(question.placed)?.every((isThere) => isThere())) yield question;
    }
  }

  /** Adds what is known by heart of what is not answered yet, but for what rests on something unanswered. */
  recallRest(): void {
    const unanswered = new Set(this.order.filter(({ placed }) => !this.#answers.has(placed)));
    const pending = new Set([...unanswered].flatMap(({ name }) => name ?? []));
    for (const question of unanswered) {
      const known = this.#store.recall(significantTextOf(question.placed.section).text, (name) =>
        pending.has(name) ? null : this.#keyNow(name, question.placed),
      );
      if (!known) continue;
      this.#answers.set(question.placed, known);
      if (question.name !== undefined) pending.delete(question.name);
    }
  }

  /** What each section came to that is answered by now. */
  answersNow(): ReadonlyMap<PlacedSection, Answer> {
    const answers = new Map<PlacedSection, Answer>();
    for (const [placed, { value }] of this.#answers) answers.set(placed, value);
    return answers;
  }

  /** The section that a name stands for; undefined where it stands for nothing. */
  sectionNamed(name: string): PlacedSection | undefined {
    return this.#unknowable.has(name) ? undefined : this.bindings.unique.get(name)?.placed;
  }

  /** The names and the long work of one statement. */
  #scopeOf(awaited: Awaited[], placed: PlacedSection): Scope {
    return {
      lookup: (name) => this.#lookup(name),
      names: () => {
        this.#lookedUp.set(ALL_NAMES, this.#allNamesKey());
        return this.#allNames();
      },
      longWork: (work, key, input) => {
        // Where its figures are read later, by another statement or a view, nobody would ask again.
        if (awaited !== this.#awaited) throw new Error('long work was asked for after its statement was answered');
        return this.#longWork(work, key, input);
      },
      fileText: (path) => {
        const text = this.#fileText(placed, path);
        this.#lookedUp.set(FILE + path, text ?? NO_FILE);
        return text;
      },
    };
  }

  #lookup(name: string): Named | undefined {
    this.#lookedUp.set(name, this.#nameKeyNow(name) ?? UNKNOWN);
    if (this.#unknowable.has(name)) return { kind: 'unknown' };
    const binding = this.bindings.unique.get(name);
    if (!binding) return this.mayBeElsewhere(name) ? { kind: 'unknown' } : undefined;
    if (this.#waiting.has(binding.placed)) {
      this.#awaited.push(() => !this.#waiting.has(binding.placed));
      return { kind: 'unknown' };
    }
    return this.#answers.get(binding.placed)?.value.named ?? { kind: 'unknown' };
  }

  #longWork<Input, Output>(work: LongWork<Input, Output>, key: string, input: Input): Output | null {
    const { elsewhere } = this;
    if (!elsewhere) return onTheSpot(work, input);
    let asked;
    try {
      asked = elsewhere.ask(work, key, input);
    } catch (error) {
      this.#lookedUp.set(`\n${FAILED}`, FAILED);
      throw error;
    }
    const { id, kept } = asked;
    if (!kept) {
      this.#awaited.push(() => elsewhere.isDone(id));
      return null;
    }
    this.#lookedUp.set(id, kept.key);
    return kept.value;
  }

  #fileText(placed: PlacedSection, path: string): string | null {
    for (const { named } of this.files) {
      const texts = named.get(placed);
      if (texts) return texts.get(path) ?? null;
    }
    return null;
  }

  #allNames(): readonly string[] {
    return [...this.bindings.unique.keys(), ...this.bindings.ambiguous];
  }

  #allNamesKey(): Key {
    return (this.#namesKey ??= this.#allNames().join('\n'));
  }

  /** The key of what a statement looked up, as that is now; null for what is awaited or not kept. */
  #keyNow(name: string, placed: PlacedSection): Key | null {
    if (name === ALL_NAMES) return this.#allNamesKey();
    if (name.startsWith(FILE)) return this.#fileText(placed, name.slice(FILE.length)) ?? NO_FILE;
    if (name.startsWith('\n')) return this.elsewhere?.keyNow(name) ?? null;
    return this.#nameKeyNow(name);
  }

  #nameKeyNow(name: string): Key | null {
    if (this.#unknowable.has(name)) return UNKNOWN;
    const binding = this.bindings.unique.get(name);
    if (!binding) return this.mayBeElsewhere(name) ? UNKNOWN : ABSENT;
    if (this.#waiting.has(binding.placed)) return null;
    return this.#answers.get(binding.placed)?.key ?? UNKNOWN;
  }
}

/** Something not there yet; tells whether it is by now. */
type Awaited = () => boolean;

/** A statement to be answered. */
export interface Question {
  readonly placed: PlacedSection;
  readonly statement: Answerable;
  readonly name: string | undefined;
}

function questionOf(placed: PlacedSection): Question | undefined {
  const { statement } = placed.section;
  if (statement.kind === 'expect') return { placed, statement, name: undefined };
  if (statement.kind !== 'definition' && statement.kind !== 'let') return undefined;
  return { placed, statement, name: statement.name?.text };
}

/** The store of an evaluation that stands alone. */
const nothingKept: AnswerStore = {
  recall: () => undefined,
  keep: (_question, _lookedUp, value) => ({ key: 0, value }),
};

/** The names a statement mentions, found once for each section of a file that is edited. */
function mentionsIn(statement: Answerable): readonly Mention[] {
  const known = mentionsOfStatement.get(statement);
  if (known) return known;
  const mentions = mentionsOf(statement);
  mentionsOfStatement.set(statement, mentions);
  return mentions;
}

const mentionsOfStatement = new WeakMap<Answerable, readonly Mention[]>();
