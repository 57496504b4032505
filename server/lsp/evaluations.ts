// Gives each open document its evaluation, always of the text as it is now: at once where nothing changed, otherwise by
// evaluating again, fetching used files first. An evaluation is kept with every text it read, and counts as current while
// all of them still read the same: nothing is invalidated by hand. One that takes long lets other messages through, is
// given up when its text moves on, and tells early what it knows already. Knows no protocol messages.
// Invariant: an answer is never older than the request, and an exception of the evaluation is caught here, once.
import type { Finding } from '../findings/finding.ts';
import { findingsOf } from '../findings/registry.ts';
import { JobAnswers, type JobAnswersRun } from '../jobs/job-answers.ts';
import { jobs as jobTable } from '../jobs/jobs.ts';
import { MemoStore, type MemoRun } from '../jobs/memo.ts';
import { JobRunner } from '../jobs/runner.ts';
import type { Answer } from '../scenario/answer.ts';
import { evaluateInSteps } from '../scenario/evaluate.ts';
import type { ReadAnswer, Reading } from '../scenario/files.ts';
import { lazily } from '../scenario/lazily.ts';
import type { EvaluatedScenario } from '../scenario/scenario.ts';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { addressOf, folderOf, isInside, uriOf } from './addresses.ts';
import { closedText, type PlacedText, type TextOf } from './convert.ts';
import type { OpenDocuments } from './documents.ts';
import type { UsedFiles } from './files.ts';
import { Stepping, TEMPO, type Tempo } from './stepping.ts';

export interface Evaluated {
  readonly uri: string;
  readonly address: string;
  /** The text and version this belongs to. */
  readonly document: TextDocument;
  /** null when the evaluation failed by a fault of the program. */
  readonly scenario: EvaluatedScenario | null;
  readonly findings: readonly Finding[];
  readonly textOf: TextOf;
  /** Every file the evaluation asked for, with what it was told. */
  readonly read: ReadonlyMap<string, ReadAnswer>;
}

/** Takes what can be said of a document before all of it is worked out. */
export type Quick = (evaluated: Evaluated) => void;

/** A chain of files is followed one link a round; one this long has lost its reader. */
const MOST_ROUNDS = 100;

interface Running {
  /** Of the text. */
  readonly version: number;
  /** Those who would hear early. */
  readonly quick: Set<Quick>;
  readonly stepping: Stepping<Evaluated>;
  /** Never rejects. */
  readonly done: Promise<void>;
}

export class Evaluations {
  readonly #kept = new Map<string, Evaluated>();
  readonly #running = new Map<string, Running>();
  readonly #answers = new MemoStore<Answer>();

  constructor(
    private readonly documents: Pick<OpenDocuments, 'get' | 'at' | 'copy'>,
    private readonly files: UsedFiles,
    /** Addresses of the workspace's folders. */
    private readonly folders: () => readonly string[],
    private readonly log: (message: string) => void,
    private readonly tempo: Tempo = TEMPO,
    /** How a text is to be read, and that of an open document in particular. */
    private readonly readingOf: (text: string, document: TextDocument | null) => Reading = () => ({}),
    private readonly jobs: JobAnswers = new JobAnswers(new JobRunner(jobTable)),
  ) {}

  /**
   * The evaluation of the document as it is when this resolves; null when it is not open. Never rejects. Where nothing is
   * left but long work, it is what there is without that; with `quick` it is all, and `quick` hears before, whenever there
   * is more to say, of an evaluation that takes long.
   */
  async current(uri: string, quick?: Quick): Promise<Evaluated | null> {
    for (let round = 1; ;) {
      const copy = this.documents.copy(uri);
      if (!copy) return null;
      const evaluated = this.#keptFor(copy);
      if (!evaluated) {
        const soFar = await this.#run(copy, quick);
        const now = this.documents.copy(uri);
        if (soFar && now && this.#isCurrent(soFar, now)) return soFar;
        continue;
      }
      const wanted = evaluated.scenario?.wanted ?? [];
      if (wanted.length === 0 || round++ === MOST_ROUNDS) return evaluated;
      const limits = this.#limits(evaluated.address);
      await Promise.all(wanted.map((address) => this.files.fetch(address, uriOf(address) ?? address, limits)));
    }
  }

  /** The document is closed: its evaluation goes, and with it the used files that no other evaluation read. */
  drop(uri: string): void {
    this.#kept.delete(uri);
    this.#running.get(uri)?.stepping.giveUp();
    this.#answers.drop(uri);
    this.jobs.drop(uri);
    const needed = new Set<string>();
    for (const { read } of this.#kept.values()) for (const address of read.keys()) needed.add(address);
    this.files.keepOnly(needed);
  }

  /** The open documents whose evaluation asked for this file. */
  readersOf(address: string): readonly string[] {
    return [...this.#kept.values()].filter(({ read }) => read.has(address)).map(({ uri }) => uri);
  }

  #keptFor(copy: TextDocument): Evaluated | undefined {
    const kept = this.#kept.get(copy.uri);
    return kept && this.#isCurrent(kept, copy) ? kept : undefined;
  }

  /** Whether an evaluation read what it would read now, `copy` being its document as it is now. */
  #isCurrent({ document, read }: Pick<Evaluated, 'document' | 'read'>, copy: TextDocument): boolean {
    if (document.version !== copy.version) return false;
    const reader = this.#reader(copy);
    for (const [address, answer] of read) if (!isSame(reader(address), answer)) return false;
    return true;
  }

  /**
   * Evaluates the document; one evaluation of a document at a time. Kept in the end, unless its text moved on. Gives what
   * there is while it waits for long work, to those who do not want to wait for that; otherwise null, once it has ended.
   */
  async #run(copy: TextDocument, quick: Quick | undefined): Promise<Evaluated | null> {
    const running = this.#running.get(copy.uri) ?? this.#start(copy, quick);
    if (quick) running.quick.add(quick);
    const { soFar } = running.stepping;
    const isOld = running.version !== copy.version || (soFar && !this.#isCurrent(soFar, copy));
    if (isOld) running.stepping.giveUp();
    if (isOld || quick) {
      await running.done;
      return null;
    }
    await Promise.race([running.done, running.stepping.paused]);
    return this.#running.get(copy.uri) === running ? running.stepping.soFar : null;
  }

  #start(copy: TextDocument, firstQuick: Quick | undefined): Running {
    const { uri } = copy;
    const address = addressOf(uri);
    const read = new Map<string, ReadAnswer>();
    const reader = this.#reader(copy);
    const readOnce = (path: string): ReadAnswer => {
      const answer = reader(path);
      read.set(path, answer);
      return answer;
    };
    const texts = new Map<string, PlacedText>();
    texts.set(address, { uri, version: copy.version, document: copy });
    const own = { uri, address, document: copy, textOf: (path: string) => texts.get(path), read };
    const failed = (error: unknown): Evaluated => {
      // A fault of ours. It is said in the document too, because otherwise old answers would pass for current ones.
      const detail = error instanceof Error ? (error.stack ?? error.message) : String(error);
      this.log(`The evaluation of ${uri} failed: ${detail}`);
      return { ...own, scenario: null, findings: [failure(address, error)] };
    };
    const findingsIn = (scenario: EvaluatedScenario): readonly Finding[] => {
      try {
        return findingsOf(scenario);
      } catch (error) {
        return failed(error).findings;
      }
    };
    const evaluatedOf = (scenario: EvaluatedScenario): Evaluated => {
      try {
        for (const { path, tree } of scenario.files) {
          if (!texts.has(path)) texts.set(path, this.#placed(path, tree.text));
        }
        // Put into words when somebody reads them: a hover does not.
        return lazily<Evaluated>({ ...own, scenario, findings: [] }, { findings: () => findingsIn(scenario) });
      } catch (error) {
        return failed(error);
      }
    };
    const trees = new Map(this.#kept.get(uri)?.scenario?.files.map(({ path, tree }) => [path, tree]));
    const answers = this.#answers.run(uri);
    const work = this.jobs.run(uri);
    const quick = new Set(firstQuick ? [firstQuick] : []);
    const stepping = new Stepping<Evaluated>({
      steps: evaluateInSteps(address, readOnce, { trees, answers }, work),
      tempo: this.tempo,
      isSameText: () => this.documents.get(uri)?.version === copy.version,
      isCurrent: () => {
        const now = this.documents.copy(uri);
        return now !== undefined && this.#isCurrent(own, now);
      },
      news: () => work.news(),
      evaluatedOf,
      tell: (soFar) => {
        for (const listener of quick) listener(soFar);
      },
    });
    const take = async (): Promise<void> => {
      const evaluated = await stepping.take().catch(failed);
      this.#running.delete(uri);
      if (evaluated?.scenario) {
        answers.finish();
        work.finish();
      } else this.#abandon(uri, answers, work);
      if (evaluated) this.#kept.set(uri, evaluated);
    };
    const running = { version: copy.version, quick, stepping, done: take() };
    this.#running.set(uri, running);
    return running;
  }

  /** What was found out so far may serve the next evaluation, unless the document is closed. */
  #abandon(uri: string, answers: MemoRun<Answer>, work: JobAnswersRun): void {
    answers.abandon();
    work.abandon();
    if (this.documents.get(uri)) return;
    this.#answers.drop(uri);
    this.jobs.drop(uri);
  }

  /** Reads for one document: itself, then open documents, then fetched files, inside its limit. */
  #reader(copy: TextDocument): (path: string) => ReadAnswer {
    const own = addressOf(copy.uri);
    const limits = this.#limits(own);
    return (path) => {
      if (path === own) return this.#asRead(copy.getText(), copy);
      if (uriOf(path) === null) {
        return { fault: 'unreadable', detail: 'This document has no folder yet. Save it first.' };
      }
      if (!isInside(path, limits)) return { fault: 'outside' };
      const open = this.documents.at(path);
      if (open) return this.#asRead(open.getText(), open);
      const answer = this.files.get(path, limits);
      return answer !== 'wanted' && 'text' in answer ? this.#asRead(answer.text, null) : answer;
    };
  }

  #asRead(text: string, document: TextDocument | null): ReadAnswer {
    return { text, reading: this.readingOf(text, document) };
  }

  /** The workspace's folders; for a document in none of them, its own folder. */
  #limits(address: string): readonly string[] {
    const folders = this.folders();
    if (isInside(address, folders)) return folders;
    const folder = folderOf(address);
    return folder === null ? folders : [folder];
  }

  #placed(path: string, text: string): PlacedText {
    const open = this.documents.at(path);
    const closed = closedText(open?.uri ?? uriOf(path) ?? path, text);
    return open?.getText() === text ? { ...closed, version: open.version } : closed;
  }
}

function isSame(first: ReadAnswer, second: ReadAnswer): boolean {
  if (first === 'wanted' || second === 'wanted') return first === second;
  if ('text' in first) {
    if (!('text' in second) || first.text !== second.text) return false;
    return JSON.stringify(first.reading) === JSON.stringify(second.reading);
  }
  return !('text' in second) && first.fault === second.fault && first.detail === second.detail;
}

function failure(path: string, error: unknown): Finding {
  const message = error instanceof Error ? error.message : String(error);
  return {
    code: 'program/failed',
    severity: 'error',
    message: `This file could not be worked out, by a fault of the program itself (${message}). Please report it.`,
    place: { path, start: 0, end: 0 },
    related: [],
    fixes: [],
    acknowledged: false,
  };
}
