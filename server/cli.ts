// The command line as a program: gives the commands the real streams, files and terminal, and sets the exit code. Holds no
// behaviour of its own. Invariants: a closed pipe is not an error; the process ends by itself, so that a pipe takes all
// that was written.

import { readFileSync } from 'node:fs';
import path from 'node:path';
import { createConnection, ProposedFeatures } from 'vscode-languageserver/node';
import { ExitCode } from './cli/exit-codes.ts';
import type { Io } from './cli/io.ts';
import { sayProgramFault } from './cli/program-fault.ts';
import { run } from './cli/run.ts';
import { nodeWorkers } from './jobs/node-worker.ts';
import { startServer } from './lsp/connection.ts';
import { wholeMessages } from './lsp/framing.ts';
import { readLocalFile } from './lsp/local-files.ts';

const io: Io = {
  folder: process.cwd(),
  environment: process.env,
  columns: process.stdout.columns,
  isTerminal: process.stdout.isTTY,
  out: (text) => void process.stdout.write(text),
  problem: (text) => void process.stderr.write(text),
  input: () => readFileSync(process.stdin.fd),
  serve: () => {
    startServer(createConnection(ProposedFeatures.all, wholeMessages(process.stdin), process.stdout), {
      readFile: readLocalFile,
      startWorker: nodeWorkers(path.join(__dirname, 'worker.cjs')),
    });
    // The open connection keeps the process alive until the client asks it to exit or hangs up.
    return Promise.resolve();
  },
};

for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    // Whoever read our output has seen enough; the verdict stands.
    if (error.code === 'EPIPE') return;
    // A full disk or a stream that has gone is no fault of ours, but the answer has not arrived: say so, and end.
    if (stream === process.stdout) process.stderr.write(`stokehold: the output cannot be written: ${error.message}.\n`);
    process.exit(ExitCode.Usage);
  });
}

process.on('uncaughtException', (error) => {
  sayProgramFault(error, io);
  process.exitCode = ExitCode.ProgramFault;
});

void run(process.argv.slice(2), io).then((code) => {
  process.exitCode = code;
});
