// A client for the tests of the language server: the same calls whether the server runs in this process or is a program
// spoken to over stdio. Keeps what the server sends, and waits for what a test names. Invariant: a test that waits for
// what never comes fails by its own time limit and says for what it waited.
import { spawn, type ChildProcess } from 'node:child_process';
import { Duplex } from 'node:stream';
import {
  createConnection,
  createProtocolConnection,
  DidChangeTextDocumentNotification,
  DidCloseTextDocumentNotification,
  DidOpenTextDocumentNotification,
  InitializedNotification,
  InitializeRequest,
  LogMessageNotification,
  PublishDiagnosticsNotification,
  RegistrationRequest,
  ShutdownRequest,
  ExitNotification,
  ConfigurationRequest,
  StreamMessageReader,
  StreamMessageWriter,
  type ClientCapabilities,
  type InitializeResult,
  type ProtocolConnection,
  type PublishDiagnosticsParams,
} from 'vscode-languageserver/node';
import { readFileRequest, startServer, type Host } from '../../server/lsp/connection.ts';
import { messageWriter } from '../../server/lsp/message-writer.ts';
import { editBetween } from './edit-between.ts';

export const FULL_CAPABILITIES: ClientCapabilities = {
  general: { positionEncodings: ['utf-16'] },
  textDocument: {
    hover: { contentFormat: ['markdown', 'plaintext'] },
    documentSymbol: { hierarchicalDocumentSymbolSupport: true },
    publishDiagnostics: { relatedInformation: true, versionSupport: true },
    codeAction: { codeActionLiteralSupport: { codeActionKind: { valueSet: ['quickfix'] } }, isPreferredSupport: true },
    rename: { prepareSupport: true },
    semanticTokens: {
      requests: { full: true, range: true },
      tokenTypes: [],
      tokenModifiers: [],
      formats: ['relative'],
    },
    completion: {
      completionItem: {
        snippetSupport: true,
        insertReplaceSupport: true,
        labelDetailsSupport: true,
        documentationFormat: ['markdown', 'plaintext'],
      },
    },
  },
  workspace: {
    configuration: true,
    didChangeConfiguration: { dynamicRegistration: true },
    didChangeWatchedFiles: { dynamicRegistration: true },
    workspaceFolders: true,
    workspaceEdit: { documentChanges: true },
  },
};

export interface ClientOptions {
  readonly capabilities?: ClientCapabilities;
  /** Files the client hands over on `stokehold/readFile`, by URI; without it, it does not offer to. */
  readonly files?: Map<string, string>;
  readonly folders?: readonly string[];
  readonly settings?: unknown;
  readonly host?: Host;
}

/** The two ends of a pipe in this process. */
function pipes(): [Duplex, Duplex] {
  const make = (other: () => Duplex): Duplex =>
    new Duplex({
      read: () => undefined,
      write(chunk, _encoding, done) {
        setImmediate(() => other().push(chunk));
        done();
      },
    });
  const first: Duplex = make(() => second);
  const second: Duplex = make(() => first);
  return [first, second];
}

export class ProtocolClient {
  readonly published: PublishDiagnosticsParams[] = [];
  readonly logged: string[] = [];
  readonly asked: string[] = [];
  readonly registered: string[] = [];
  settings: unknown;
  #versions = new Map<string, number>();
  #waiting: (() => void)[] = [];

  private constructor(
    readonly connection: ProtocolConnection,
    readonly program: ChildProcess | null,
    private readonly options: ClientOptions,
  ) {
    this.settings = options.settings ?? { pause: 0 };
    connection.onNotification(PublishDiagnosticsNotification.type, (params) => {
      this.published.push(params);
      for (const wake of this.#waiting.splice(0)) wake();
    });
    connection.onNotification(LogMessageNotification.type, ({ message }) => void this.logged.push(message));
    connection.onRequest(ConfigurationRequest.type, ({ items }) => items.map(() => this.settings));
    connection.onRequest(RegistrationRequest.type, ({ registrations }) => {
      this.registered.push(...registrations.map(({ method }) => method));
    });
    connection.onRequest(readFileRequest, ({ uri }) => {
      this.asked.push(uri);
      const text = options.files?.get(uri);
      return text === undefined ? { fault: 'missing' as const } : { text };
    });
  }

  /** A client and a server in this process, not yet introduced to each other. */
  static inProcess(options: ClientOptions = {}): ProtocolClient {
    const [near, far] = pipes();
    const server = createConnection(new StreamMessageReader(far), messageWriter(far));
    startServer(server, options.host);
    const connection = createProtocolConnection(new StreamMessageReader(near), new StreamMessageWriter(near));
    const client = new ProtocolClient(connection, null, options);
    connection.listen();
    return client;
  }

  /** A client of a program that speaks over stdio. */
  static ofProgram(command: string, args: readonly string[], options: ClientOptions = {}): ProtocolClient {
    const program = spawn(command, args, { stdio: ['pipe', 'pipe', 'inherit'] });
    const connection = createProtocolConnection(
      new StreamMessageReader(program.stdout),
      new StreamMessageWriter(program.stdin),
    );
    const client = new ProtocolClient(connection, program, options);
    connection.listen();
    return client;
  }

  async initialize(): Promise<InitializeResult> {
    const folders = this.options.folders?.map((uri) => ({ uri, name: uri })) ?? null;
    const result = await this.connection.sendRequest(InitializeRequest.type, {
      processId: process.pid,
      rootUri: null,
      capabilities: this.options.capabilities ?? FULL_CAPABILITIES,
      workspaceFolders: folders,
      ...(this.options.files ? { initializationOptions: { readFile: true } } : {}),
    });
    await this.connection.sendNotification(InitializedNotification.type, {});
    return result;
  }

  async open(uri: string, text: string, version = 1): Promise<void> {
    this.#versions.set(uri, version);
    await this.connection.sendNotification(DidOpenTextDocumentNotification.type, {
      textDocument: { uri, languageId: 'stokehold', version, text },
    });
  }

  /** Puts a whole new text in place of the old one. Returns its version. */
  async change(uri: string, text: string): Promise<number> {
    const version = (this.#versions.get(uri) ?? 0) + 1;
    this.#versions.set(uri, version);
    await this.connection.sendNotification(DidChangeTextDocumentNotification.type, {
      textDocument: { uri, version },
      contentChanges: [{ text }],
    });
    return version;
  }

  /** Types what differs between the two texts, as one edit of a range. */
  async edit(uri: string, before: string, after: string): Promise<void> {
    const version = (this.#versions.get(uri) ?? 0) + 1;
    this.#versions.set(uri, version);
    await this.connection.sendNotification(DidChangeTextDocumentNotification.type, {
      textDocument: { uri, version },
      contentChanges: [editBetween(before, after)],
    });
  }

  async close(uri: string): Promise<void> {
    await this.connection.sendNotification(DidCloseTextDocumentNotification.type, { textDocument: { uri } });
  }

  /** The findings last published for a document, waited for until they fit. */
  async diagnostics(
    uri: string,
    fits: (params: PublishDiagnosticsParams) => boolean = () => true,
  ): Promise<PublishDiagnosticsParams> {
    for (;;) {
      const last = this.published.filter((params) => params.uri === uri).at(-1);
      if (last && fits(last)) return last;
      await this.#news(`findings of ${uri}`);
    }
  }

  /** The findings of one version. */
  diagnosticsOf(uri: string, version: number): Promise<PublishDiagnosticsParams> {
    return this.diagnostics(uri, (params) => params.version === version);
  }

  async stop(): Promise<void> {
    await this.connection.sendRequest(ShutdownRequest.type);
    // The exit of a server in this process would end the tests.
    if (this.program) await this.connection.sendNotification(ExitNotification.type);
    this.connection.end();
    this.connection.dispose();
  }

  #news(what: string): Promise<void> {
    return new Promise((resolve, reject) => {
      const limit = setTimeout(() => {
        reject(new Error(`Waited in vain for ${what}; last sent: ${JSON.stringify(this.published.at(-1))}`));
      }, 4000);
      this.#waiting.push(() => {
        clearTimeout(limit);
        resolve();
      });
    });
  }
}
