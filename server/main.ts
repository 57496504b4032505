// The language server as a program of its own: over node's ipc when the editor starts it, over stdio with `--stdio`.
// Holds no behaviour, only the choice of the transport, which the connection reads from the program's arguments.
// Invariant: whatever a client sends is answered by `lsp/`, so the browser's entry can share all of it.
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { serve } from './lsp/connection.ts';

serve(createConnection(ProposedFeatures.all));
