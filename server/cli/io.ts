// The world as the command line sees it: its streams, its terminal, its folder. Handed in, so that tests run commands in
// the same process. Knows no commands. Invariant: a command writes nowhere but here, except the files that `format` names.

export interface Io {
  /** Absolute; named paths are relative to it. */
  readonly folder: string;
  readonly environment: Readonly<Record<string, string | undefined>>;
  /** Columns of the terminal on standard output; undefined where there is none. */
  readonly columns: number | undefined;
  /** Standard output is a terminal. */
  readonly isTerminal: boolean;
  readonly out: (text: string) => void;
  readonly problem: (text: string) => void;
  /** All of standard input, as bytes. */
  readonly input: () => Uint8Array;
  /** Serves the language server on the standard streams; resolves when the client has gone. */
  readonly serve: () => Promise<void>;
}
