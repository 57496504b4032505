// A whole session with a broken client over a stream: documents opened and changed to spoilt scenarios, everything asked at
// random places, some of it cancelled, and nonsense of all kinds in between. Each well-formed request gets its answer, no
// fault of the program is logged for it, nothing takes a second, and afterwards a good request is answered as ever. Runs as
// long as mutations.test.ts, with a fresh seed that is printed and can be given back as FUZZ_SEED.
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { editBetween } from '../support/edit-between.ts';
import { fuzzRun, workedMs } from '../support/fuzz-run.ts';
import {
  HOUSE,
  MAIN,
  PLACED_REQUESTS,
  WHOLE_REQUESTS,
  hostility,
  type Hostility,
} from '../support/hostile-messages.ts';
import { RawClient, type Answer } from '../support/raw-client.ts';
import { mutation, spoilt } from '../support/spoilt.ts';

const SLOWEST_MS = 1000;
/** After this long a request counts as never answered. */
const LONGEST_WAIT_MS = 10_000;
/** Refusals of the protocol that are answers: cancelled, changed meanwhile, and what cannot be renamed. */
const REFUSALS = new Set([-32800, -32801, -32803]);
const GOOD = 'file:///ships/good.stoke';
const run = fuzzRun();

type Step =
  | { readonly do: 'ask'; readonly method: string; readonly at: number; readonly to: number; readonly cancel: boolean }
  | { readonly do: 'change'; readonly slip: (text: string) => string; readonly whole: boolean }
  | { readonly do: 'hostile'; readonly send: Hostility }
  | { readonly do: 'wait' };

const share = fc.double({ min: -0.1, max: 1.1, noNaN: true });
const step: fc.Arbitrary<Step> = fc.oneof(
  {
    weight: 4,
    arbitrary: fc.record({
      do: fc.constant('ask' as const),
      method: fc.constantFrom(...PLACED_REQUESTS, ...WHOLE_REQUESTS),
      at: share,
      to: share,
      cancel: fc.boolean(),
    }),
  },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('change' as const), slip: mutation, whole: fc.boolean() }) },
  { weight: 3, arbitrary: fc.record({ do: fc.constant('hostile' as const), send: hostility }) },
  { weight: 1, arbitrary: fc.constant({ do: 'wait' as const }) },
);
const session = fc.record({
  text: spoilt,
  house: spoilt,
  able: fc.boolean(),
  steps: fc.array(step, { minLength: 3, maxLength: 14 }),
});
type Session = typeof session extends fc.Arbitrary<infer Value> ? Value : never;

test(`sessions with a broken client, ${run.title}`, { timeout: run.timeoutMs }, async () => {
  let count = 0;
  const holds = fc.asyncProperty(session, async (one) => {
    count++;
    // Collecting garbage may hold one run up; the same session twice over the limit is a hang.
    if ((await play(one)) > SLOWEST_MS) expect(await play(one)).toBeLessThan(SLOWEST_MS);
  });
  await fc.assert(holds, run.parameters);
  console.log(`fuzz: ${count} sessions over the protocol, seed ${run.seed}`);
  expect(count).toBeGreaterThan(run.leastCount);
});

/** Plays a session on a server of its own. Returns how much work the longest wait was, in milliseconds. */
async function play({ text: first, house, able, steps }: Session): Promise<number> {
  const client = new RawClient({
    settings: { pause: 0 },
    fileAt: (uri) => (uri === HOUSE ? { text: house } : { fault: 'missing' }),
  });
  await answered(client.ask('initialize', initialization(able)).answer, 'initialize');
  client.notify('initialized', {});
  let text = `use "house.stoke"\n${first}`;
  let version = 1;
  open(client, MAIN, text);
  let slowestMs = 0;
  /** What a well-formed request was answered with is judged; what was sent in between may have changed the texts. */
  const answers: Promise<unknown>[] = [];
  let isWellFormed = true;
  for (const one of steps) {
    if (one.do === 'hostile') {
      one.send(client);
      isWellFormed = false;
    } else if (one.do === 'change') {
      const next = one.slip(text);
      version++;
      client.notify('textDocument/didChange', {
        textDocument: { uri: MAIN, version },
        contentChanges: [one.whole ? { text: next } : editBetween(text, next)],
      });
      text = next;
    } else if (one.do === 'ask') {
      const asked = client.ask(one.method, paramsOf(one, text));
      if (one.cancel) client.notify('$/cancelRequest', { id: asked.id });
      answers.push(judged(one.method, asked.answer));
    } else {
      const before = process.cpuUsage();
      await Promise.all(answers.splice(0));
      slowestMs = Math.max(slowestMs, workedMs(before));
    }
  }
  const before = process.cpuUsage();
  await Promise.all(answers);
  slowestMs = Math.max(slowestMs, workedMs(before));
  if (isWellFormed) expect(client.logged).toEqual([]);
  await answersWell(client);
  return slowestMs;
}

/** The server is as good as new for a document of its own. */
async function answersWell(client: RawClient): Promise<void> {
  open(client, GOOD, 'let alpha = 2 kg\nlet beta = 3 * alpha\n');
  const asked = client.ask('textDocument/hover', { textDocument: { uri: GOOD }, position: { line: 1, character: 5 } });
  const { result } = await answered(asked.answer, 'the good request');
  expect(JSON.stringify(result)).toContain('6 kg');
  await answered(client.ask('shutdown', null).answer, 'shutdown');
}

async function judged(method: string, answer: Promise<Answer>): Promise<void> {
  const { result, error } = await answered(answer, method);
  if (error && !REFUSALS.has(error.code)) throw new Error(`${method}: ${error.code} ${error.message}`);
  if (method !== 'textDocument/completion' || typeof result !== 'object' || result === null) return;
  expect(result).toHaveProperty('items');
}

async function answered(answer: Promise<Answer>, what: string): Promise<Answer> {
  let limit: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<never>((_, reject) => {
    limit = setTimeout(() => {
      reject(new Error(`${what} was not answered within ${LONGEST_WAIT_MS} ms`));
    }, LONGEST_WAIT_MS);
  });
  try {
    return await Promise.race([answer, late]);
  } finally {
    clearTimeout(limit);
  }
}

function open(client: RawClient, uri: string, text: string): void {
  client.notify('textDocument/didOpen', { textDocument: { uri, languageId: 'stokehold', version: 1, text } });
}

function initialization(able: boolean): unknown {
  const capabilities = {
    textDocument: {
      completion: { completionItem: { snippetSupport: true, insertReplaceSupport: true, labelDetailsSupport: true } },
      codeAction: { codeActionLiteralSupport: {} },
      rename: { prepareSupport: true },
      semanticTokens: {},
      publishDiagnostics: { relatedInformation: true },
    },
    workspace: { configuration: true, workspaceEdit: { documentChanges: true }, workspaceFolders: true },
  };
  return {
    processId: null,
    rootUri: null,
    capabilities: able
      ? capabilities
      : { textDocument: { semanticTokens: {}, codeAction: capabilities.textDocument.codeAction } },
    workspaceFolders: [{ uri: 'file:///ships', name: 'ships' }],
    initializationOptions: { readFile: true },
  };
}

function paramsOf({ method, at, to }: Extract<Step, { do: 'ask' }>, text: string): unknown {
  const range = { start: positionAt(text, at * text.length), end: positionAt(text, to * text.length) };
  return {
    textDocument: { uri: MAIN },
    ...(method.startsWith('textDocument/semanticTokens/full') ? {} : { position: range.start, range }),
    context: { diagnostics: [], includeDeclaration: at < to },
    options: { tabSize: 2, insertSpaces: true },
    newName: `renamed ${Math.round(to * 100)}`,
  };
}

/** May lie outside of the text, as the offset may. */
function positionAt(text: string, offset: number): { line: number; character: number } {
  const before = text.slice(0, Math.max(0, offset)).split('\n');
  const beyond = Math.round(offset - text.length);
  if (beyond > 0) return { line: before.length - 1 + (beyond % 7), character: beyond };
  return { line: before.length - 1, character: offset < 0 ? Math.round(offset) : (before.at(-1)?.length ?? 0) };
}
