// Takes the steps of one evaluation: lets other messages through between slices, gives up when the text has moved on, waits
// where nothing is left but long work done elsewhere, and tells early what is known by then. Knows no documents; it is
// handed how to see whether its text is still the current one. Invariant: once given up, nothing more is told.
import type { Underway } from '../scenario/evaluate.ts';
import type { EvaluatedScenario } from '../scenario/scenario.ts';

/** When an evaluation pauses and when it tells early; tests have their own. */
export interface Tempo {
  /** After this long other messages are let through. */
  readonly sliceMs: number;
  /** An evaluation that is not done by then tells what it knows; one that waits for long work, again after as long. */
  readonly quickAfterMs: number;
  /** One that waits looks this often whether its text is still the current one. */
  readonly lookMs: number;
  readonly now: () => number;
  /** Resolves once the messages that wait have been taken in. */
  readonly turn: () => Promise<void>;
  readonly wait: (ms: number) => Promise<void>;
}

export const TEMPO: Tempo = {
  sliceMs: 10,
  quickAfterMs: 150,
  lookMs: 50,
  now: () => performance.now(),
  turn: () => new Promise((resolve) => setTimeout(resolve, 0)),
  wait: (ms) => new Promise((resolve) => setTimeout(resolve, ms)),
};

/** What an evaluation's steps are taken with. */
export interface SteppingNeeds<Evaluated> {
  readonly steps: Generator<Underway, EvaluatedScenario>;
  readonly tempo: Tempo;
  /** Between slices: whether the document is the one it was. */
  readonly isSameText: () => boolean;
  /** While it waits: the same, and the files it uses. */
  readonly isCurrent: () => boolean;
  /** Resolves when some of the long work has ended. */
  readonly news: () => Promise<void>;
  readonly evaluatedOf: (scenario: EvaluatedScenario) => Evaluated;
  readonly tell: (soFar: Evaluated) => void;
}

export class Stepping<Evaluated> {
  /** Resolves when it waits for long work for the first time; never, if it does not. */
  readonly paused: Promise<void>;
  #pause: () => void = () => undefined;
  #wake: () => void = () => undefined;
  #isGivenUp = false;
  #isTold = false;
  #lastToldMs: number;
  #underway: Underway | null = null;
  #soFar: Evaluated | null = null;

  constructor(private readonly needs: SteppingNeeds<Evaluated>) {
    this.#lastToldMs = needs.tempo.now();
    this.paused = new Promise((resolve) => {
      this.#pause = resolve;
    });
  }

  /** What there was when it last began to wait for long work; null before. */
  get soFar(): Evaluated | null {
    if (this.#underway) this.#soFar ??= this.needs.evaluatedOf(this.#underway.soFar());
    return this.#soFar;
  }

  /** Its text is not the current one any more. */
  giveUp(): void {
    this.#isGivenUp = true;
    this.#wake();
  }

  /** Goes through to the end; null where it was given up. */
  async take(): Promise<Evaluated | null> {
    const { steps, tempo, isSameText, evaluatedOf } = this.needs;
    let sliceStartMs = tempo.now();
    for (;;) {
      const step = steps.next();
      if (step.done) return evaluatedOf(step.value);
      if (step.value.waits) {
        if (!(await this.#wait(step.value))) return null;
      } else {
        if (tempo.now() - sliceStartMs < tempo.sliceMs) continue;
        if (!this.#isTold && this.#isDue()) this.#tell(evaluatedOf(step.value.soFar()));
        await tempo.turn();
        if (this.#isGivenUp || !isSameText()) return null;
      }
      sliceStartMs = tempo.now();
    }
  }

  /** Until some of the long work has ended; false where it was given up. */
  async #wait(underway: Underway): Promise<boolean> {
    const { tempo, isCurrent } = this.needs;
    this.#underway = underway;
    this.#soFar = null;
    this.#pause();
    const news = this.needs.news().then(() => true);
    for (let isTold = false; ;) {
      const dueMs = this.#lastToldMs + tempo.quickAfterMs - tempo.now();
      const waitMs = isTold ? tempo.lookMs : Math.min(tempo.lookMs, Math.max(0, dueMs));
      const woken = new Promise<false>((resolve) => {
        this.#wake = () => resolve(false);
      });
      const hasNews = await Promise.race([news, woken, tempo.wait(waitMs).then(() => false)]);
      if (this.#isGivenUp || !isCurrent()) return false;
      if (hasNews) return true;
      if (isTold || !this.#isDue() || !this.soFar) continue;
      isTold = true;
      this.#tell(this.soFar);
    }
  }

  #isDue(): boolean {
    return this.needs.tempo.now() - this.#lastToldMs >= this.needs.tempo.quickAfterMs;
  }

  #tell(soFar: Evaluated): void {
    this.#isTold = true;
    this.#lastToldMs = this.needs.tempo.now();
    this.needs.tell(soFar);
  }
}
