// Long work that a view asks for when somebody looks, beside the evaluation: done by the job runner, waited for a little,
// cancelled when the text it belongs to moves on or is closed. Knows no view and no kind of work.
// Invariant: a view is never held up for longer than `mostMs`; what comes later is there for the next one to look.
import type { AnyJobRunner } from '../jobs/runner.ts';
import type { AskLongWork } from '../scenario/long-work.ts';
import type { TableWork } from '../scenario/scenario.ts';

interface Asked {
  outcome: { readonly value: unknown } | { readonly error: unknown } | null;
  /** Resolves when there is an outcome; never rejects. */
  readonly ended: Promise<void>;
}

interface Viewed {
  readonly cancel: AbortController;
  readonly asked: Map<string, Asked>;
}

/** Long enough for a path and the start of a worker; a hover that takes longer is a nuisance. */
const MOST_MS = 500;

export class ViewedWork {
  readonly #viewed = new Map<string, Viewed>();

  constructor(
    private readonly runner: AnyJobRunner,
    private readonly mostMs = MOST_MS,
  ) {}

  /** Resolves when all of it is done, when its text has moved on, or after `mostMs`. Rejects where the work failed. */
  async bring(uri: string, works: readonly TableWork[]): Promise<void> {
    const viewed = this.#viewed.get(uri) ?? { cancel: new AbortController(), asked: new Map<string, Asked>() };
    this.#viewed.set(uri, viewed);
    let timer: ReturnType<typeof setTimeout> | undefined;
    const late = new Promise<'late'>((resolve) => {
      timer = setTimeout(() => resolve('late'), this.mostMs);
    });
    try {
      for (;;) {
        const awaited: Promise<void>[] = [];
        const ask = this.#askOf(viewed, awaited);
        if (works.map((work) => work.ask(ask)).every((isDone) => isDone)) return;
        const first = await Promise.race([...awaited, late]);
        if (first === 'late' || viewed.cancel.signal.aborted) return;
      }
    } finally {
      clearTimeout(timer);
    }
  }

  /** The text has moved on, or is closed: what is under way for its views is cancelled. */
  cancel(uri: string): void {
    this.#viewed.get(uri)?.cancel.abort();
    this.#viewed.delete(uri);
  }

  #askOf({ cancel, asked }: Viewed, awaited: Promise<void>[]): AskLongWork {
    return <Input, Output>(work: unknown, key: string, input: Input): Output | null => {
      const name = this.runner.nameOf(work);
      const id = `${name}\n${key}`;
      const known = asked.get(id) ?? this.#begin(name, key, input, cancel.signal);
      asked.set(id, known);
      const { outcome } = known;
      if (outcome && 'error' in outcome) {
        // Told once; who looks again has it tried again.
        asked.delete(id);
        throw outcome.error;
      }
      // The runner's table names the work, and the work says what it gives.
      if (outcome) return outcome.value as Output;
      awaited.push(known.ended);
      return null;
    };
  }

  #begin(name: string, key: string, input: unknown, signal: AbortSignal): Asked {
    const run = this.runner.runNamed(name, key, input, signal);
    const asked: Asked = {
      outcome: null,
      ended: run.then(
        (value) => {
          asked.outcome = { value };
        },
        (error: unknown) => {
          asked.outcome = { error };
        },
      ),
    };
    return asked;
  }
}
