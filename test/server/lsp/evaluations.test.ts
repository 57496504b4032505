// The timing of evaluations: pauses between statements, giving up when the text moves on, and telling early what is known.
// The clock is the test's own, so nothing here depends on how fast the machine is.
import { TextDocument } from 'vscode-languageserver-textdocument';
import { beforeEach, describe, expect, it } from 'vitest';
import { Evaluations, type Evaluated } from '../../../server/lsp/evaluations.ts';
import { UsedFiles } from '../../../server/lsp/files.ts';

const URI = 'file:///ships/main.stoke';
const TEXT = `let alpha = 1 kg
let beta = 1 kg + 2 m
let gamma = alpha * 2
expect gamma = 3 kg
`;

let documents: Map<string, TextDocument>;
let logged: string[];
/** What happens at each pause, in turn; afterwards nothing does. */
let atTurn: (() => void)[];
let turns: number;
let clockMs: number;

const put = (version: number, text: string): void => {
  documents.set(URI, TextDocument.create(URI, 'stokehold', version, text));
};
const make = (tempo: { sliceMs: number; quickAfterMs: number }): Evaluations => {
  const copy = (uri: string): TextDocument | undefined => documents.get(uri);
  return new Evaluations(
    { get: copy, copy, at: () => undefined },
    new UsedFiles(() => Promise.resolve({ text: '' })),
    () => ['file:///ships'],
    (message) => logged.push(message),
    {
      ...tempo,
      lookMs: 50,
      wait: (ms) => new Promise((resolve) => setTimeout(resolve, ms)),
      now: () => clockMs++,
      turn: () => {
        turns++;
        atTurn.shift()?.();
        return Promise.resolve();
      },
    },
  );
};
const codes = (evaluated: Evaluated | null | undefined): string[] => evaluated?.findings.map(({ code }) => code) ?? [];

beforeEach(() => {
  documents = new Map();
  logged = [];
  atTurn = [];
  turns = 0;
  clockMs = 0;
  put(1, TEXT);
});

describe('an evaluation', () => {
  it('that is quick makes no pause and tells nothing early', async () => {
    const early: Evaluated[] = [];
    const evaluated = await make({ sliceMs: 1000, quickAfterMs: 1000 }).current(URI, (one) => early.push(one));
    expect(codes(evaluated)).toEqual(['unit/mismatch', 'expect/failed']);
    expect(turns).toBe(0);
    expect(early).toEqual([]);
  });

  it('that is long lets messages through between statements', async () => {
    await make({ sliceMs: 0, quickAfterMs: 1e6 }).current(URI);
    expect(turns).toBe(4);
  });

  it('is given up when the text moves on, and the newest text is answered', async () => {
    atTurn = [() => undefined, () => { put(2, TEXT.replace('2 m', '2 kg')); }]; // prettier-ignore
    const evaluated = await make({ sliceMs: 0, quickAfterMs: 1e6 }).current(URI);
    expect(evaluated?.document.version).toBe(2);
    expect(codes(evaluated)).toEqual(['expect/failed']);
    // Two statements of the first text, then the four of the second.
    expect(turns).toBe(6);
  });

  it('ends with nothing when the document is closed', async () => {
    atTurn = [() => void documents.clear()];
    expect(await make({ sliceMs: 0, quickAfterMs: 1e6 }).current(URI)).toBeNull();
    expect(turns).toBe(1);
  });

  it('is shared by all who ask meanwhile', async () => {
    const evaluations = make({ sliceMs: 0, quickAfterMs: 1e6 });
    const [first, second] = await Promise.all([evaluations.current(URI), evaluations.current(URI)]);
    expect(first).toBe(second);
    expect(await evaluations.current(URI)).toBe(first);
    expect(turns).toBe(4);
  });

  it('of an older text is not waited for with its findings', async () => {
    const evaluations = make({ sliceMs: 0, quickAfterMs: 1e6 });
    const first = evaluations.current(URI);
    put(2, 'let alone = 3 kg\n');
    const second = await evaluations.current(URI);
    expect(second?.document.version).toBe(2);
    expect((await first)?.document.version).toBe(2);
  });
});

describe('telling early', () => {
  it('happens once, with what is known by heart at its new lines, and without what rests on the edit', async () => {
    const evaluations = make({ sliceMs: 0, quickAfterMs: 0 });
    await evaluations.current(URI);
    put(2, `# One line more.\nlet new = {\n${TEXT.replace('1 kg', '1.5 kg')}let last = nor_this\n`);
    const early: Evaluated[] = [];
    const evaluated = await evaluations.current(URI, (one) => early.push(one));
    expect(early).toHaveLength(1);
    expect(early[0]?.document.version).toBe(2);
    const told = early[0]?.findings.map(({ code, place }) => [code, early[0]?.document.positionAt(place.start).line]);
    // `expect gamma = 3 kg` holds now; its old failure is not told, and nor_this has not been looked at yet.
    expect(told).toEqual([['syntax/unexpected', 1], ['unit/mismatch', 3]]); // prettier-ignore
    expect(codes(evaluated)).toEqual(['syntax/unexpected', 'unit/mismatch', 'name/unknown']);
  });

  it('reaches all who wait for the same evaluation', async () => {
    const evaluations = make({ sliceMs: 0, quickAfterMs: 4 });
    const told: string[] = [];
    await Promise.all([
      evaluations.current(URI, () => told.push('first')),
      evaluations.current(URI),
      evaluations.current(URI, () => told.push('last')),
    ]);
    expect(told).toEqual(['first', 'last']);
    expect(logged).toEqual([]);
  });
});
