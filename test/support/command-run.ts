// Runs the command line in this process, in a folder of its own with the files a test names. Knows the commands' streams
// and exit code and nothing of what they print. Invariant: nothing is left behind; the folder goes with the test.

import { mkdirSync, mkdtempSync, realpathSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { onTestFinished } from 'vitest';
import type { Io } from '../../server/cli/io.ts';
import { run } from '../../server/cli/run.ts';

export interface Ran {
  readonly code: number;
  readonly out: string;
  readonly problem: string;
}

export interface Surroundings {
  /** Standard input. */
  readonly input?: string | Uint8Array;
  readonly environment?: Readonly<Record<string, string>>;
  readonly isTerminal?: boolean;
  readonly columns?: number;
  /** Runs in this folder inside the one made. */
  readonly within?: string;
}

/** A folder with these files, by relative path; it is removed when the test ends. */
export function folderWith(files: Readonly<Record<string, string | Uint8Array>>): string {
  const folder = realpathSync(mkdtempSync(path.join(tmpdir(), 'stokehold-')));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  for (const [name, content] of Object.entries(files)) {
    const file = path.join(folder, name);
    mkdirSync(path.dirname(file), { recursive: true });
    writeFileSync(file, content);
  }
  return folder;
}

/** Runs `stokehold …words` in a folder. */
export async function runIn(folder: string, words: readonly string[], surroundings: Surroundings = {}): Promise<Ran> {
  let out = '';
  let problem = '';
  const { input = '', environment = {}, isTerminal = false, columns, within = '.' } = surroundings;
  const io: Io = {
    folder: path.join(folder, within),
    environment,
    columns,
    isTerminal,
    out: (text) => {
      out += text;
    },
    problem: (text) => {
      problem += text;
    },
    input: () => (typeof input === 'string' ? new TextEncoder().encode(input) : input),
    serve: () => Promise.resolve(),
  };
  const code = await run(words, io);
  return { code, out, problem };
}
