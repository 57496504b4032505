// What a broken client may send: bytes that are no messages, unknown methods, parameters that are missing or of the wrong
// form, places outside of the text, versions that repeat or go backwards, documents that are not open. Generators only;
// the server's behaviour is judged elsewhere. It leaves out what ends a server by the protocol's own rules: `exit`, and
// the number of a parent program that does not run.
import fc from 'fast-check';
import type { RawClient } from './raw-client.ts';

/** Sends one of them. */
export type Hostility = (client: RawClient) => void;

export const MAIN = 'file:///ships/main.stoke';
export const HOUSE = 'file:///ships/house.stoke';

/** Requests that stand at a place of a document. */
export const PLACED_REQUESTS = [
  'textDocument/hover',
  'textDocument/completion',
  'textDocument/definition',
  'textDocument/references',
  'textDocument/documentHighlight',
  'textDocument/prepareRename',
  'textDocument/rename',
  'textDocument/signatureHelp',
] as const;

/** Requests about a document or a part of it. */
export const WHOLE_REQUESTS = [
  'textDocument/documentSymbol',
  'textDocument/formatting',
  'textDocument/rangeFormatting',
  'textDocument/codeAction',
  'textDocument/foldingRange',
  'textDocument/semanticTokens/full',
  'textDocument/semanticTokens/range',
] as const;

const REQUESTS = [
  ...PLACED_REQUESTS,
  ...WHOLE_REQUESTS,
  'completionItem/resolve',
  'workspace/executeCommand',
  'workspace/symbol',
  'textDocument/inlayHint',
  'stokehold/unheardOf',
  '$/unheardOf',
  '',
];

const NOTIFICATIONS = [
  'textDocument/didOpen',
  'textDocument/didChange',
  'textDocument/didClose',
  'textDocument/didSave',
  'textDocument/willSave',
  'workspace/didChangeConfiguration',
  'workspace/didChangeWatchedFiles',
  'workspace/didChangeWorkspaceFolders',
  'stokehold/visibleRanges',
  'stokehold/unheardOf',
  '$/cancelRequest',
  '$/setTrace',
  '$/progress',
  'window/workDoneProgress/cancel',
  'initialized',
  '',
];

const junk = fc.oneof(fc.jsonValue({ maxDepth: 2 }), fc.constantFrom(null, -1, 1e20, 0.5, '', [], {}, true));
const uri = fc.oneof(
  { weight: 4, arbitrary: fc.constantFrom(MAIN, HOUSE) },
  fc.constantFrom('file:///ships/closed.stoke', 'untitled:Untitled-1', 'C:\\a.stoke', 'file://%zz', ''),
  junk,
);
const index = fc.oneof(fc.integer({ min: -3, max: 400 }), fc.constantFrom(1e20, -1e20, 2 ** 31, 0.5), junk);
const position = fc.oneof({ weight: 4, arbitrary: fc.record({ line: index, character: index }) }, junk);
const range = fc.oneof({ weight: 4, arbitrary: fc.record({ start: position, end: position }) }, junk);
const version = fc.oneof(fc.integer({ min: -2, max: 9 }), junk);
const changes = fc.oneof(
  fc.array(fc.oneof(fc.record({ range, text: fc.string() }), fc.record({ text: junk }), junk), { maxLength: 3 }),
  junk,
);
/** Any of the fields that parameters have, right or wrong, or none. */
const params = fc.oneof(
  {
    weight: 4,
    arbitrary: fc.record(
      {
        textDocument: fc.oneof(
          {
            weight: 4,
            arbitrary: fc.record({ uri, version, text: fc.oneof(fc.string(), junk) }, { requiredKeys: [] }),
          },
          junk,
        ),
        position,
        range,
        ranges: fc.oneof(fc.array(range, { maxLength: 3 }), junk),
        uri,
        contentChanges: changes,
        newName: junk,
        context: fc.oneof(fc.record({ diagnostics: junk, only: junk, triggerKind: junk }, { requiredKeys: [] }), junk),
        options: junk,
        data: fc.oneof(fc.record({ uri, subject: junk }, { requiredKeys: [] }), junk),
        label: junk,
        settings: junk,
        changes: fc.oneof(fc.array(fc.record({ uri, type: junk }), { maxLength: 3 }), junk),
        event: fc.oneof(fc.record({ added: junk, removed: junk }, { requiredKeys: [] }), junk),
        id: junk,
        value: junk,
        token: junk,
      },
      { requiredKeys: [] },
    ),
  },
  junk,
);

const request = fc.tuple(fc.constantFrom(...REQUESTS), params);
const notification = fc.tuple(fc.constantFrom(...NOTIFICATIONS), params);

const NOTICE = '{"jsonrpc":"2.0","method":"$/nothing"}';
const frame = (body: string, length = Buffer.byteLength(body)): string => `Content-Length: ${length}\r\n\r\n${body}`;

/** Bytes that are no message, or not where their header says. */
const bytes = fc.oneof(
  fc.string({ unit: 'binary', maxLength: 40 }).map((body) => frame(body)),
  fc.constantFrom('', '{', '[]', 'null', '7', '"text"', '[1,{}]', '{"jsonrpc":"2.0","id":').map((body) => frame(body)),
  fc.integer({ min: -30, max: 200 }).map((by) => frame(NOTICE, Math.max(0, NOTICE.length + by))),
  fc
    .constantFrom('9'.repeat(30), '1e9', '-4', 'many', '0x10')
    .map((length) => `Content-Length: ${length}\r\n\r\n${NOTICE}`),
  fc.constantFrom('Content-Nonsense: 12\r\n\r\n', 'Nonsense\r\n\r\n', '\r\n\r\n', 'x'.repeat(5000)),
);

export const hostility: fc.Arbitrary<Hostility> = fc.oneof(
  { weight: 3, arbitrary: request.map(([method, sent]) => labelled(`ask ${method} ${told(sent)}`, (client) => void client.ask(method, sent))) },
  { weight: 3, arbitrary: notification.map(([method, sent]) => labelled(`tell ${method} ${told(sent)}`, (client) => { client.notify(method, sent); })) },
  bytes.map((text) => labelled(`bytes ${JSON.stringify(text)}`, (client) => {
    // What a wrong length takes with it is no message that is waited for.
    client.bytes(text + frame(NOTICE) + frame(NOTICE));
  })),
  junk.map((value) => labelled(`message ${told(value)}`, (client) => { client.message(value ?? null); })),
  fc.record({ jsonrpc: junk, id: junk, method: junk, params: junk, result: junk, error: junk }, { requiredKeys: [] })
    .map((value) => labelled(`message ${told(value)}`, (client) => { client.message(value); })),
); // prettier-ignore

/** What a failing run prints. */
function labelled(label: string, send: Hostility): Hostility {
  return Object.assign(send, { [fc.toStringMethod]: () => label });
}

function told(value: unknown): string {
  return JSON.stringify(value) ?? 'nothing';
}
