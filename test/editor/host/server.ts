// Starts VS Code's own server, without the desktop application, on a free loopback port, and names its addresses.
// Knows no extension and no browser. Invariant: the server and everything it started end with this process, however
// this process ends, and a run shares no folder, port or socket with another.
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, rmSync, statSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

/** A running server. */
export interface EditorServer {
  /** Host and port, as in `127.0.0.1:40123`. */
  readonly authority: string;
  /** Resolves to a description of how the server ended, once it has. */
  readonly ended: Promise<string>;
  /** All the server has printed so far. */
  readonly readLog: () => string;
  /** Ends the server and removes its folders; may be called twice. */
  readonly stop: () => void;
}

/** Where a server keeps its settings and extensions; both folders are made when missing. */
export interface EditorProfile {
  readonly userDataDir: string;
  readonly extensionsDir: string;
}

/** Loaded into the server: ends its process group once the pipe from this process closes. */
const END_WITH_PARENT =
  'data:text/javascript,process.stdin.on("end", () => process.kill(-process.pid, "SIGKILL")).resume()';

/** Runs the server's command line (`--install-extension FILE` and the like). Returns its exit code and output. */
export function runServerCommand(args: readonly string[]): { exitCode: number; output: string } {
  const result = spawnSync(process.execPath, [serverProgram(), ...args], {
    encoding: 'utf8',
    env: serverEnvironment({}),
  });
  return { exitCode: result.status ?? 1, output: result.stdout + result.stderr };
}

/** Starts a server and returns once it listens. Rejects with the server's own words when it does not. */
export async function startServer(profile: EditorProfile, args: readonly string[] = []): Promise<EditorServer> {
  // The server makes no parent folders, and without these two it silently loads no extension.
  for (const folder of [profile.userDataDir, profile.extensionsDir]) mkdirSync(folder, { recursive: true });
  const scratch = mkdtempSync(path.join(os.tmpdir(), 'stokehold-editor-'));
  const serverArgs = [
    ['--import', END_WITH_PARENT, serverProgram()],
    ['--host=127.0.0.1', '--port=0', '--without-connection-token', '--accept-server-license-terms'],
    ['--disable-telemetry', '--disable-update-check', '--disable-getting-started-override', '--force-disable-user-env'],
    [`--server-data-dir=${path.join(scratch, 'server')}`, `--user-data-dir=${path.resolve(profile.userDataDir)}`],
    [`--extensions-dir=${path.resolve(profile.extensionsDir)}`, ...args],
  ].flat();
  const child = spawn(process.execPath, serverArgs, {
    detached: true, // a process group of its own, extension host included
    env: serverEnvironment({ XDG_RUNTIME_DIR: scratch }), // its sockets go there
    stdio: ['pipe', 'pipe', 'pipe'],
  });

  const stop = (): void => {
    process.removeListener('exit', stop);
    try {
      if (child.pid !== undefined) process.kill(-child.pid, 'SIGKILL');
    } catch {
      // It has ended already.
    }
    rmSync(scratch, { recursive: true, force: true, maxRetries: 10 });
  };
  process.once('exit', stop);

  let log = '';
  const ended = new Promise<string>((resolve) => {
    child.once('error', (error) => {
      resolve(error.message);
    });
    child.once('exit', (code, signal) => {
      resolve(signal ?? `exit code ${String(code)}`);
    });
  });
  const port = await new Promise<string>((resolve, reject) => {
    void ended.then((how) => {
      reject(new Error(`The editor's server ended with ${how}:\n${log}`));
    });
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text: string) => {
        log += text;
        const listening = /Extension host agent listening on (\d+)/.exec(log);
        if (listening?.[1] !== undefined) resolve(listening[1]);
      });
    }
  });
  return { authority: `127.0.0.1:${port}`, ended, readLog: () => log, stop };
}

/** A file of this machine as the workbench of the server names it. */
export function remoteUri(authority: string, file: string): string {
  return `vscode-remote://${authority}${path.resolve(file).split(path.sep).map(encodeURIComponent).join('/')}`;
}

/** The workbench's address with a folder (or, for undefined, nothing) open. The payload holds start-up options. */
export function workbenchUrl(authority: string, folder: string | undefined, payload: readonly string[][] = []): string {
  const url = new URL(`http://${authority}/`);
  if (folder === undefined) {
    url.searchParams.set('ew', 'true'); // an empty window, not the last one used
  } else {
    if (!existsSync(folder) || !statSync(folder).isDirectory()) throw new Error(`Not a folder: ${folder}`);
    url.searchParams.set('folder', path.resolve(folder));
  }
  const entries = [['skipWelcome', 'true'], ['skipReleaseNotes', 'true'], ...payload];
  url.searchParams.set('payload', JSON.stringify(entries));
  return url.href;
}

function serverProgram(): string {
  const root = process.env['STOKEHOLD_PROJECT'] ?? process.cwd();
  const program = path.join(root, 'node_modules/.cache/editor-host/vscode/out/server-main.js');
  if (!existsSync(program)) throw new Error('The editor host is not installed: run node test/editor/host/prepare.mjs');
  return program;
}

function serverEnvironment(extra: Record<string, string>): NodeJS.ProcessEnv {
  // An empty gallery address: neither page nor server asks for extensions elsewhere.
  const environment: NodeJS.ProcessEnv = { ...process.env, EXTENSIONS_GALLERY: '{"serviceUrl":""}', ...extra };
  for (const name of ['VSCODE_IPC_HOOK_CLI', 'ELECTRON_RUN_AS_NODE', 'NODE_OPTIONS']) delete environment[name];
  return environment;
}
