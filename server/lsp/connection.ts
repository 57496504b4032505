// Joins a client's connection to the open documents, their evaluations and what is shown of them. Knows no transport, so
// that stdio, ipc, a worker and the tests use the same function, and reads no file: used files are asked of the client by
// `stokehold/readFile`, or of a reader that the host hands in. Invariant: nothing a client sends ends the server but its
// own `exit`. Source: Language Server Protocol 3.18.
import {
  DidChangeConfigurationNotification,
  DidChangeWatchedFilesNotification,
  FileChangeType,
  NotificationType,
  PositionEncodingKind,
  RequestType,
  TextDocumentSyncKind,
  type Connection,
  type Diagnostic,
  type InitializeResult,
  type Range,
  type WorkspaceFoldersChangeEvent,
} from 'vscode-languageserver';
import { diagnostics } from '../features/diagnostics.ts';
import type { StartWorker } from '../jobs/job.ts';
import { JobAnswers } from '../jobs/job-answers.ts';
import { jobs } from '../jobs/jobs.ts';
import { JobRunner } from '../jobs/runner.ts';
import { abilitiesOf, folderAddresses } from './abilities.ts';
import { addressOf } from './addresses.ts';
import { turn } from './answered.ts';
import { toDiagnostic } from './convert.ts';
import { OpenDocuments } from './documents.ts';
import { Evaluations, type Evaluated } from './evaluations.ts';
import { UsedFiles, type AskForFile, type FileAnswer } from './files.ts';
import { Publications, type Said } from './publications.ts';
import { answerRequests, requestCapabilities } from './requests.ts';
import { Schedule } from './schedule.ts';
import { asSettings, DEFAULT_SETTINGS } from './settings.ts';
import type { Tempo } from './stepping.ts';
import { ViewedWork } from './viewed-work.ts';
import { VisibleRanges } from './visible-ranges.ts';

/** The client's part: `{ uri }` to `{ text }`, or `{ fault: 'missing' | 'unreadable', detail? }`. */
export const readFileRequest = new RequestType<{ uri: string }, FileAnswer, void>('stokehold/readFile');

/** What the client shows of a document: `{ uri, ranges }`, sent again whenever it changes. */
export const visibleRangesNotification = new NotificationType<{ uri: string; ranges: readonly Range[] }>(
  'stokehold/visibleRanges',
);

export interface Host {
  /** Reads a file for clients that do not answer `stokehold/readFile`. Without it, their used files are unreadable. */
  readonly readFile?: AskForFile;
  /** Starts a worker for long computations. Without it, they are done on the server's thread. */
  readonly startWorker?: StartWorker;
  /** Instead of the tempo of a person who types; for tests. */
  readonly tempo?: Tempo;
}

/** Answers on the connection until it ends. Returns once listening has begun. */
export function startServer(connection: Connection, host: Host = {}): void {
  let abilities = abilitiesOf(null);
  let folders: readonly string[] = [];
  let settings = DEFAULT_SETTINGS;
  const log = (message: string): void => {
    connection.console.error(message);
  };

  const documents = new OpenDocuments();
  const files = new UsedFiles((uri, limits) => {
    if (abilities.readFile) return connection.sendRequest(readFileRequest, { uri });
    if (host.readFile) return host.readFile(uri, limits);
    return Promise.resolve({ fault: 'unreadable', detail: 'This editor does not hand files to the language server.' });
  });
  const visible = new VisibleRanges((uri) => documents.get(uri) !== undefined);
  const runner = new JobRunner(jobs, { startWorker: host.startWorker, log });
  const evaluations = new Evaluations(
    documents,
    files,
    () => folders,
    log,
    host.tempo,
    (text, document) => visible.readingOf(text, document, settings.largestText),
    new JobAnswers(runner),
  );
  const viewedWork = new ViewedWork(runner);
  const publications = new Publications(
    (address) => documents.at(address),
    (uri, version, list) => {
      void connection.sendDiagnostics({ uri, diagnostics: [...list], ...(version === null ? {} : { version }) });
    },
  );
  const schedule = new Schedule(async (uri) => {
    try {
      const publish = (evaluated: Evaluated): void => publications.replace(evaluated.address, said(evaluated));
      const evaluated = await evaluations.current(uri, publish);
      // A list can be long, and whoever asked for something while it was worked out waits for one short answer: what has
      // been asked is taken in at one turn and answered by the next. A text that moved on meanwhile is looked at again.
      await turn();
      await turn();
      if (evaluated && documents.get(uri)?.version === evaluated.document.version) publish(evaluated);
    } catch (error) {
      log(`Publishing the findings of ${uri} failed: ${String(error)}`);
    }
  });

  function said({ uri, address, document, findings, scenario, textOf }: Evaluated): ReadonlyMap<string, Said> {
    const lists = new Map<string, Diagnostic[]>([[address, []]]);
    for (const file of scenario?.files ?? []) lists.set(file.path, []);
    for (const plain of diagnostics(findings, settings.severities)) {
      const diagnostic = toDiagnostic(plain, textOf, abilities.related);
      if (diagnostic) lists.get(plain.place.path)?.push(diagnostic);
    }
    return new Map(
      [...lists].map(([path, list]) => {
        const text = textOf(path) ?? { uri, document };
        return [path, { uri: text.uri, text: text.document.getText(), diagnostics: list }];
      }),
    );
  }

  /** The texts an evaluation read have changed: all that read this one are looked at again. */
  function lookAgain(address: string, except?: string): void {
    for (const uri of evaluations.readersOf(address)) if (uri !== except) schedule.after(settings.pauseMs, uri);
  }

  function lookAtAll(): void {
    for (const uri of documents.uris()) schedule.after(settings.pauseMs, uri);
  }

  function fileMayHaveChanged(address: string): void {
    files.forget(address);
    lookAgain(address);
  }

  async function askForSettings(): Promise<void> {
    try {
      settings = asSettings(await connection.workspace.getConfiguration('stokehold'));
    } catch (error) {
      log(`The settings could not be read: ${String(error)}`);
    }
    lookAtAll();
  }

  connection.onInitialize((params): InitializeResult => {
    abilities = abilitiesOf(params);
    folders = abilities.folders;
    return {
      capabilities: {
        positionEncoding: PositionEncodingKind.UTF16,
        textDocumentSync: { openClose: true, change: TextDocumentSyncKind.Incremental, save: true },
        workspace: { workspaceFolders: { supported: true, changeNotifications: true } },
        ...requestCapabilities(abilities),
      },
      serverInfo: { name: 'stokehold' },
    };
  });

  connection.onInitialized(async () => {
    try {
      if (abilities.folderNews) {
        connection.workspace.onDidChangeWorkspaceFolders((event: Partial<WorkspaceFoldersChangeEvent> | null) => {
          const gone = new Set(folderAddresses(event?.removed));
          folders = [...folders.filter((folder) => !gone.has(folder)), ...folderAddresses(event?.added)];
          lookAtAll();
        });
      }
      if (abilities.configuration) await askForSettings();
      if (abilities.configurationNews) {
        await connection.client.register(DidChangeConfigurationNotification.type, { section: 'stokehold' });
      }
      if (abilities.watching) {
        await connection.client.register(DidChangeWatchedFilesNotification.type, {
          watchers: [{ globPattern: '**/*.stoke' }, { globPattern: '**/*.csv' }],
        });
      }
    } catch (error) {
      log(`Asking the client for news failed: ${String(error)}`);
    }
  });

  connection.onDidChangeConfiguration(async (params: { readonly settings?: unknown }) => {
    if (abilities.configuration) return askForSettings();
    const sent = params.settings;
    settings = asSettings(
      typeof sent === 'object' && sent !== null && 'stokehold' in sent ? sent.stokehold : undefined,
    );
    lookAtAll();
  });

  connection.onDidChangeWatchedFiles(({ changes }) => {
    for (const { uri, type } of changes) {
      const address = addressOf(uri);
      fileMayHaveChanged(address);
      // A deleted file that no open document uses any more must not keep its marks.
      if (type === FileChangeType.Deleted && !documents.at(address)) publications.close(address);
    }
  });

  connection.onNotification(visibleRangesNotification, (message) => {
    const uri = visible.take(message);
    const length = uri === null ? 0 : (documents.get(uri)?.getText().length ?? 0);
    if (uri === null || length <= settings.largestText) return;
    schedule.after(settings.pauseMs, uri);
    lookAgain(addressOf(uri), uri);
  });

  answerRequests({
    connection,
    documents,
    evaluations,
    viewedWork,
    abilities: () => abilities,
    settings: () => settings,
    readingOf: (document) => visible.readingOf(document.getText(), document, settings.largestText),
    log,
  });

  documents.listen(connection, {
    opened(uri) {
      schedule.after(0, uri);
      fileMayHaveChanged(addressOf(uri));
    },
    changed(uri) {
      viewedWork.cancel(uri);
      schedule.after(settings.pauseMs, uri);
      lookAgain(addressOf(uri), uri);
    },
    saved(uri) {
      // Without news of changed files, a save is the moment to look at the used ones again.
      if (abilities.watching) return;
      for (const address of files.addresses()) fileMayHaveChanged(address);
      schedule.after(0, uri);
    },
    closed(uri) {
      const address = addressOf(uri);
      schedule.drop(uri);
      evaluations.drop(uri);
      viewedWork.cancel(uri);
      visible.drop(uri);
      publications.close(address);
      fileMayHaveChanged(address);
    },
  });

  connection.onShutdown(() => {
    schedule.dropAll();
  });
  connection.listen();
}
