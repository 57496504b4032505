// Starts the language server when the editor first shows a scenario and hands everything else to the language client.
// Knows no syntax, does no arithmetic and reads no file: the server answers, the editor shows. Invariant: one server a
// window, ended with the window. Source: the language client's own documentation of `vscode-languageclient/node`.
import * as path from 'node:path';
import type { ExtensionContext } from 'vscode';
import { LanguageClient, TransportKind } from 'vscode-languageclient/node';
import type { LanguageClientOptions, ServerOptions } from 'vscode-languageclient/node';

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
  // No scheme is named: scenarios in unsaved buffers, remote folders and virtual workspaces are served alike.
  const clientOptions: LanguageClientOptions = { documentSelector: [{ language: 'stokehold' }] };
  const started = new LanguageClient('stokehold', 'Stokehold', serverOptions, clientOptions);
  client = started;
  return { ready: started.start() };
}

/** Called by the editor when the window closes or the extension is disabled. */
export async function deactivate(): Promise<void> {
  await client?.stop();
  client = undefined;
}
