// Starts the language server when the editor first shows a scenario and hands everything else to the language client.
// Knows no syntax and does no arithmetic: the server answers, the editor shows. Invariant: one server a window, ended
// with the window. Source: the language client's own documentation of `vscode-languageclient/node`.
import * as path from 'node:path';
import { commands, type ExtensionContext } from 'vscode';
import {
  LanguageClient,
  TransportKind,
  type LanguageClientOptions,
  type ServerOptions,
} from 'vscode-languageclient/node';
import { linkingCodes, registerFindingPages } from './finding-pages.ts';
import { readFile, type FileAnswer } from './read-file.ts';
import { tellingWhenOpened, tellWhatIsVisible } from './visible-ranges.ts';

/** What other extensions and the editor tests may ask of the activated extension. */
export interface StokeholdApi {
  /** Resolves once the language server has answered its first request. */
  readonly ready: Promise<void>;
}

let client: LanguageClient | undefined;

/** Called by the editor when a `*.stoke` file is shown. Returns at once; `ready` tells when the server answers. */
export function activate(context: ExtensionContext): StokeholdApi {
  const serverModule = context.asAbsolutePath(path.join('dist', 'server.cjs'));
  const serverOptions: ServerOptions = { module: serverModule, transport: TransportKind.ipc };
  const clientOptions: LanguageClientOptions = {
    // No scheme is named: scenarios in unsaved buffers, remote folders and virtual workspaces are served alike.
    documentSelector: [{ language: 'stokehold' }],
    initializationOptions: { readFile: true, suggestCommand: 'editor.action.triggerSuggest' },
    middleware: { ...tellingWhenOpened(() => client), ...linkingCodes() },
  };
  const started = new LanguageClient('stokehold', 'Stokehold', serverOptions, clientOptions);
  client = started;
  context.subscriptions.push(
    ...tellWhatIsVisible(() => client),
    registerFindingPages(context.extensionUri),
    started.onRequest<FileAnswer, void>('stokehold/readFile', ({ uri }: { uri: string }) => readFile(uri)),
    // A server that failed too often is not started again by the client itself, so there is a way to ask for it.
    commands.registerCommand('stokehold.restartServer', () => started.restart()),
    commands.registerCommand('stokehold.showLog', () => {
      started.outputChannel.show();
    }),
  );
  return { ready: started.start() };
}

/** Called by the editor when the window closes or the extension is disabled. */
export async function deactivate(): Promise<void> {
  await client?.stop();
  client = undefined;
}
