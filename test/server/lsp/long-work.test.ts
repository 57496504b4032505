// Long work while a document is open: what is told and answered before it is done, what becomes of it when the text moves
// on or is closed, and that a fault of a worker costs one statement. The work ends when the test says so.
import { TextDocument } from 'vscode-languageserver-textdocument';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { JobAnswers } from '../../../server/jobs/job-answers.ts';
import { JobRunner, type AnyJobRunner } from '../../../server/jobs/runner.ts';
import { Evaluations, type Evaluated } from '../../../server/lsp/evaluations.ts';
import { UsedFiles } from '../../../server/lsp/files.ts';
import { TEMPO, type Tempo } from '../../../server/lsp/stepping.ts';
import type * as registry from '../../../server/scenario/kinds/registry.ts';
import { figureOf } from '../../support/facts.ts';
import { bundledWorker, countedWorkers } from '../../support/job-workers.ts';
import { jobTable, sumUpTo } from '../../support/job-table.ts';
import { compareOf } from '../../support/long-work-kind.ts';

vi.mock('../../../server/scenario/kinds/registry.ts', async (original) => {
  const real = await original<typeof registry>();
  return { ...real, kindOf: (word: string) => (word === 'compare' ? compareOf(sumUpTo) : real.kindOf(word)) };
});

const URI = 'file:///ships/main.stoke';
const TEXT = `compare a {
  of: 4
}
let wrong = 1 kg + 2 m
expect total of a = 11
`;
// Without slices, so that the only pauses are those for long work.
const SLOW: Tempo = { ...TEMPO, sliceMs: 1e6, quickAfterMs: 1e6, lookMs: 5 };
const EAGER: Tempo = { ...SLOW, quickAfterMs: 0 };
const worker = bundledWorker();

interface Begun {
  readonly key: string;
  readonly signal: AbortSignal;
  readonly end: (sum: number) => void;
  readonly fail: (message: string) => void;
}

let documents: Map<string, TextDocument>;
let logged: string[];
let begun: Begun[];

const byHand: AnyJobRunner = {
  nameOf: () => 'sumUpTo',
  runNamed: (_name, key, _input, signal) =>
    new Promise((resolve, reject) => {
      if (!signal) throw new Error('it must be possible to cancel it');
      signal.addEventListener('abort', () => reject(signal.reason as Error));
      begun.push({ key, signal, end: resolve, fail: (message) => reject(new Error(message)) });
    }),
};

const put = (version: number, text: string): void => {
  documents.set(URI, TextDocument.create(URI, 'stokehold', version, text));
};
const make = (tempo: Tempo, runner: AnyJobRunner = byHand, files = new Map<string, string>()): Evaluations => {
  const copy = (uri: string): TextDocument | undefined => documents.get(uri);
  const fetch = (uri: string): Promise<{ text: string }> => Promise.resolve({ text: files.get(uri) ?? '' });
  const all = { get: copy, copy, at: () => undefined };
  const log = (message: string): void => void logged.push(message);
  return new Evaluations(
    all,
    new UsedFiles(fetch),
    () => ['file:///ships'],
    log,
    tempo,
    undefined,
    new JobAnswers(runner),
  );
};
const nothing = (): void => undefined;
const codes = (evaluated: Evaluated | null | undefined): string[] => evaluated?.findings.map(({ code }) => code) ?? [];
const total = (evaluated: Evaluated | null): number | undefined =>
  evaluated?.scenario ? figureOf(evaluated.scenario, 'a', 'total') : undefined;
const until = async (holds: () => boolean): Promise<void> => {
  while (!holds()) await new Promise((resolve) => setTimeout(resolve, 1));
};
const keys = (): string[] => begun.map(({ key }) => key);

beforeEach(() => {
  documents = new Map();
  logged = [];
  begun = [];
  put(1, TEXT);
});

describe('while long work is under way', () => {
  it('those who want all wait for it, and hear early what is known without it', async () => {
    const early: Evaluated[] = [];
    const evaluations = make(EAGER);
    const all = evaluations.current(URI, (evaluated) => early.push(evaluated));
    await until(() => early.length > 0);
    expect(early.map(codes)).toEqual([['unit/mismatch']]);
    begun[0]?.end(10);
    const evaluated = await all;
    expect([codes(evaluated), total(evaluated)]).toEqual([['unit/mismatch', 'expect/failed'], 10]); // prettier-ignore
    expect([early.length, keys()]).toEqual([1, ['4']]); // prettier-ignore
    expect(await evaluations.current(URI)).toBe(evaluated);
  });

  it('nothing is told early of work that is done soon', async () => {
    const early: Evaluated[] = [];
    const all = make(SLOW).current(URI, (evaluated) => early.push(evaluated));
    await until(() => begun.length > 0);
    begun[0]?.end(10);
    expect(total(await all)).toBe(10);
    expect(early).toEqual([]);
  });

  it('what has come in is told as well, while other work goes on', async () => {
    put(1, `${TEXT}compare b {\n  of: 100\n}\n`);
    const early: Evaluated[] = [];
    const all = make(EAGER).current(URI, (evaluated) => early.push(evaluated));
    await until(() => early.length === 1 && begun.length === 2);
    begun[0]?.end(10);
    await until(() => early.length === 2);
    expect(early.map(total)).toEqual([undefined, 10]);
    expect(codes(early[1])).toEqual(['unit/mismatch', 'expect/failed']);
    begun[1]?.end(5050);
    expect(codes(await all)).toEqual(['unit/mismatch', 'expect/failed']);
  });

  it('a request is answered with what there is, and all share the one run', async () => {
    const evaluations = make(SLOW);
    const all = evaluations.current(URI, nothing);
    const asked = await evaluations.current(URI);
    expect([codes(asked), total(asked)]).toEqual([['unit/mismatch'], undefined]); // prettier-ignore
    expect(await evaluations.current(URI)).toBe(asked);
    begun[0]?.end(10);
    expect(total(await all)).toBe(10);
    expect(total(await evaluations.current(URI))).toBe(10);
    expect(keys()).toEqual(['4']);
  });
});

describe('when the text moves on meanwhile', () => {
  it('an edit elsewhere leaves the work alone, and has its answer', async () => {
    const evaluations = make(SLOW);
    const all = evaluations.current(URI, nothing);
    await until(() => begun.length > 0);
    put(2, TEXT.replace('2 m', '2 kg'));
    expect(codes(await evaluations.current(URI))).toEqual([]);
    begun[0]?.end(10);
    const evaluated = await all;
    expect([evaluated?.document.version, codes(evaluated), keys()]).toEqual([2, ['expect/failed'], ['4']]); // prettier-ignore
    expect(begun[0]?.signal.aborted).toBe(false);
  });

  it('an edit of its input cancels it, without anybody asking', async () => {
    const evaluations = make(SLOW);
    const all = evaluations.current(URI, nothing);
    await until(() => begun.length > 0);
    put(2, TEXT.replace('of: 4', 'of: 5'));
    await until(() => begun.length > 1);
    expect([keys(), begun[0]?.signal.aborted]).toEqual([['4', '5'], true]); // prettier-ignore
    begun[1]?.end(15);
    expect(total(await all)).toBe(15);
  });

  it('closing the document cancels it', async () => {
    const evaluations = make(SLOW);
    const all = evaluations.current(URI, nothing);
    await until(() => begun.length > 0);
    documents.clear();
    evaluations.drop(URI);
    expect(await all).toBeNull();
    expect(begun[0]?.signal.aborted).toBe(true);
    put(1, TEXT);
    const again = evaluations.current(URI, nothing);
    await until(() => begun.length > 1);
    begun[1]?.end(10);
    expect(total(await again)).toBe(10);
    expect(logged).toEqual([]);
  });

  it('work that waits for a used file is begun once the file is there', async () => {
    put(1, `use "other.stoke"\n${TEXT}`);
    const evaluations = make(SLOW, byHand, new Map([['file:///ships/other.stoke', 'let more = 1\n']]));
    const all = evaluations.current(URI, nothing);
    await until(() => begun.length > 0);
    begun[0]?.end(10);
    expect(total(await all)).toBe(10);
    expect(keys()).toEqual(['4']);
  });
});

describe('a fault', () => {
  it('is told at its statement, beside all other findings, and the next edit tries again', async () => {
    const evaluations = make(SLOW);
    const all = evaluations.current(URI, nothing);
    await until(() => begun.length > 0);
    begun[0]?.fail('the worker ended');
    const evaluated = await all;
    expect(codes(evaluated)).toEqual(['program/failed', 'unit/mismatch']);
    expect(evaluated?.findings[0]?.place.start).toBe(0);
    put(2, TEXT.replace('2 m', '2 kg'));
    const again = evaluations.current(URI, nothing);
    await until(() => begun.length > 1);
    begun[1]?.end(11);
    expect(codes(await again)).toEqual([]);
  });
});

describe('with real workers', () => {
  const workers = [1, 2].map((count) => `${count} of them`);
  it.each(['thread', ...workers])('the answers are the same (%s)', async (where) => {
    const text = Array.from({ length: 6 }, (_, index) => `compare c${index} {\n  of: ${index + 1}00000\n}\n`).join('');
    put(1, `${TEXT}${text}expect total of c5 = total of a\n`);
    const counted = countedWorkers(worker);
    const options = where === 'thread' ? {} : { startWorker: counted.startWorker, workers: Number(where[0]) };
    const runner = new JobRunner(jobTable, { ...options, log: (message) => logged.push(message) });
    const evaluated = await make(SLOW, runner).current(URI, nothing);
    runner.close();
    const found = evaluated?.scenario?.files[0]?.definitions.map(({ figures }) => figures[0]?.quantity.value);
    expect(found).toEqual([4, 1e5, 2e5, 3e5, 4e5, 5e5, 6e5].map((last) => (last * (last + 1)) / 2));
    expect(codes(evaluated)).toEqual(['unit/mismatch', 'expect/failed', 'expect/failed']);
    expect([counted.posted.length, logged]).toEqual([where === 'thread' ? 0 : 7, []]); // prettier-ignore
  });

  it('one that ends under a statement costs that statement', async () => {
    put(1, `${TEXT}compare b {\n  of: 666\n}\n`);
    const counted = countedWorkers(worker);
    const runner = new JobRunner(jobTable, { startWorker: counted.startWorker });
    const evaluated = await make(SLOW, runner).current(URI, nothing);
    runner.close();
    expect(codes(evaluated).sort()).toEqual(['expect/failed', 'program/failed', 'unit/mismatch']);
    expect([total(evaluated), counted.lost]).toEqual([10, 1]);
  });
});
