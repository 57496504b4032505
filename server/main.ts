// The language server as a program of its own: over node's ipc when the editor starts it, over stdio with `--stdio`.
// Holds no behaviour, only the choice of the transport, which the connection reads from the program's arguments, and the
// reader of used files for editors that do not hand them over. Invariant: whatever a client sends is answered by `lsp/`,
// so that the browser's entry can share all of it.
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { startServer } from './lsp/connection.ts';
import { readLocalFile } from './lsp/local-files.ts';

startServer(createConnection(ProposedFeatures.all), { readFile: readLocalFile });
