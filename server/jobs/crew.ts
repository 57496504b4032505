// The workers of a runner: as many as may work at once, started when there is work for them, and a spare that stands by to
// take the place of one that has to be ended. Hands each one job at a time. Knows no queue and no keys. Invariants: a
// worker that ends by itself costs the job it was doing and no other, and its place is filled when there is work again;
// once a worker could not be started at all, no more are.
import type { JobMessage, JobWorker, StartWorker, WorkerMessage } from './job.ts';

/** How a job came out of a worker. */
export type Outcome =
  | Exclude<WorkerMessage, { kind: 'ready' }>
  /** The worker ended under it; it was still to be told that it has started, so no worker can be had, if not `isReady`. */
  | { readonly kind: 'lost'; readonly reason: string; readonly isReady: boolean };

/** A job that a worker is doing. */
export interface Handed {
  /** Ends the worker, and the job with it; its outcome is not told any more. */
  end(): void;
}

interface Member {
  readonly worker: JobWorker;
  isReady: boolean;
  /** Hears of the job in hand. */
  tell: ((outcome: Outcome) => void) | null;
}

export class Crew {
  readonly #members = new Set<Member>();
  #spare: Member | null = null;
  #spareTimer: ReturnType<typeof setTimeout> | undefined;
  #isClosed = false;

  constructor(
    private readonly startWorker: StartWorker,
    /** How many may work at once, without the spare. */
    private readonly size: number,
    /** How long after a job has begun the spare is started: what waits for the first job is not to wait for it, too. */
    private readonly spareAfterMs: number,
  ) {}

  /** Whether one more job could be handed over now. */
  get hasRoom(): boolean {
    return this.#members.size < this.size || this.#idle() !== undefined;
  }

  /** Hands a job to a worker, if one has room and can be had. Throws for a message that is no plain data. */
  hand(message: JobMessage, tell: (outcome: Outcome) => void): Handed {
    const member = this.#idle() ?? this.#join();
    member.worker.post(message);
    member.tell = tell;
    this.#spareLater();
    return {
      end: () => {
        member.tell = null;
        this.#members.delete(member);
        member.worker.end();
      },
    };
  }

  /** Ends all workers. */
  close(): void {
    this.#isClosed = true;
    clearTimeout(this.#spareTimer);
    for (const { worker } of [...this.#members, ...(this.#spare ? [this.#spare] : [])]) worker.end();
    this.#members.clear();
    this.#spare = null;
  }

  #idle(): Member | undefined {
    return [...this.#members].find(({ tell }) => tell === null);
  }

  /** The spare, or a new worker, as one of those that work. */
  #join(): Member {
    const member = this.#spare ?? this.#start();
    this.#spare = null;
    this.#members.add(member);
    return member;
  }

  #spareLater(): void {
    if (this.#spare || this.#spareTimer !== undefined) return;
    this.#spareTimer = setTimeout(() => {
      this.#spareTimer = undefined;
      if (this.#isClosed || this.#spare) return;
      try {
        this.#spare = this.#start();
      } catch {
        // Nothing is lost with a spare: where it cannot be started, the next worker cannot either, and that is told.
      }
    }, this.spareAfterMs);
  }

  #start(): Member {
    const worker = this.startWorker({
      message: (message) => {
        if (message.kind === 'ready') member.isReady = true;
        else this.#told(member, message);
      },
      ended: (reason) => {
        this.#members.delete(member);
        if (this.#spare === member) this.#spare = null;
        this.#told(member, { kind: 'lost', reason, isReady: member.isReady });
      },
    });
    const member: Member = { worker, isReady: false, tell: null };
    return member;
  }

  #told(member: Member, outcome: Outcome): void {
    const { tell } = member;
    member.tell = null;
    tell?.(outcome);
  }
}
