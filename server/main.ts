// The language server as a program of its own: over node's ipc when the editor starts it, over stdio with `--stdio`.
// Holds no behaviour, only the choice of the transport, the reader of used files for editors that do not hand them over,
// and where its worker's bundle is. Invariant: whatever a client sends is answered by `lsp/`, so that the browser's entry
// can share all of it.
import path from 'node:path';
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { nodeWorkers } from './jobs/node-worker.ts';
import { startServer } from './lsp/connection.ts';
import { wholeMessages } from './lsp/framing.ts';
import { readLocalFile } from './lsp/local-files.ts';
import { messageWriter } from './lsp/message-writer.ts';

/** The library takes a writer beside a stream to read from, whose end it then watches for; its types ask for two streams. */
const output = (): NodeJS.WritableStream => messageWriter(process.stdout) as unknown as NodeJS.WritableStream;

// Any other transport is chosen by the library, from the program's arguments.
const connection = process.argv.includes('--stdio')
  ? createConnection(ProposedFeatures.all, wholeMessages(process.stdin), output())
  : createConnection(ProposedFeatures.all);
startServer(connection, {
  readFile: readLocalFile,
  // Beside this program, wherever that is installed.
  startWorker: nodeWorkers(path.join(__dirname, 'worker.cjs')),
});
