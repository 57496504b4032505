// Stands in for the VS Code executable that @vscode/test-electron starts: takes the arguments its `runTests` passes,
// runs the tests in VS Code's web workbench (server and extension host on this Node, the page in headless Chromium)
// and exits with the tests' exit code. Knows nothing of our extension. Invariant: whatever goes wrong (a lost
// extension host, a closed page, no answer in time, a signal) the exit code is 1 and no process stays behind.
import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { format, parseArgs } from 'node:util';
import type { Page } from 'playwright-core';
import { openBrowser } from './browser.ts';
import { remoteUri, runServerCommand, startServer, workbenchUrl } from './server.ts';
import type { EditorServer } from './server.ts';

const LIMIT_MS = 240_000;

/** What the workbench itself logs, or fails to find, in this set-up. */
const WORKBENCH_NOISE =
  /^(Resolv(ing|ed) connection token|Creating a socket|(Ignoring fetching|Updating) additional builtin|ChatSessionStore:|Creation of workbench contribution|\[Service Worker\] registration|Error: Could not locate the bindings file|Cannot find module '\.\/build\/Release\/watchdog')/;

/** A crash or `process.exit()` in the extension host: the workbench then reports exit code 0, which is not so. */
const LOST_EXTENSION_HOST = /^\[remote-connection\]\[ExtensionHost\].*received socket (close|error|timeout) event/;

process.exitCode = 1;
main().then(
  (exitCode) => process.exit(exitCode),
  (error: unknown) => {
    console.error(`launch-editor: ${error instanceof Error ? error.message : String(error)}`);
    process.exit(1);
  },
);

async function main(): Promise<number> {
  const args = process.argv.slice(2);
  const { values, positionals } = parseArgs({
    args,
    strict: false, // switches of the desktop application (--no-sandbox and others) mean nothing here
    allowPositionals: true,
    options: {
      extensionDevelopmentPath: { type: 'string' },
      extensionTestsPath: { type: 'string' },
      'user-data-dir': { type: 'string' },
      'extensions-dir': { type: 'string' },
      'install-extension': { type: 'string' },
    },
  });
  if (values['install-extension'] !== undefined || values['list-extensions'] !== undefined) {
    const { exitCode, output } = runServerCommand(args);
    process.stdout.write(output);
    return exitCode;
  }
  const text = (name: string): string => {
    const value = values[name];
    if (typeof value !== 'string') throw new Error(`--${name} is missing`);
    return value;
  };

  const stopped = new Promise<never>((_resolve, reject) => {
    setTimeout(() => {
      reject(new Error(`no result after ${LIMIT_MS / 1000} s`));
    }, LIMIT_MS);
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
      process.once(signal, () => {
        reject(new Error(`stopped by ${signal}`));
      });
    }
  });
  let server: EditorServer | undefined;
  let page: Page | undefined;
  const run = async (): Promise<number> => {
    const profile = { userDataDir: text('user-data-dir'), extensionsDir: text('extensions-dir') };
    // Newer workbenches ignore the extension under test without the driver's switch.
    server = await startServer(profile, ['--enable-smoke-test-driver', '--disable-workspace-trust']);
    ({ page } = await openBrowser());
    return runTests(server, page, positionals[0], text('extensionTestsPath'), text('extensionDevelopmentPath'));
  };
  let exitCode = 1;
  try {
    exitCode = await Promise.race([run(), stopped]);
  } catch (error) {
    console.error(`launch-editor: ${error instanceof Error ? error.message : String(error)}`);
  }
  if (exitCode !== 0) await saveEvidence(server, page);
  return exitCode;
}

/** Opens the workbench with the tests' address in its payload and resolves to the exit code it reports. */
async function runTests(
  server: EditorServer,
  page: Page,
  folder: string | undefined,
  testsPath: string,
  developmentPath: string,
): Promise<number> {
  const finished = new Promise<number>((resolve, reject) => {
    page.on('crash', () => {
      reject(new Error('the workbench page crashed'));
    });
    page.on('close', () => {
      reject(new Error('the workbench page was closed'));
    });
    void server.ended.then((how) => {
      reject(new Error(`the server ended with ${how}`));
    });
    page.exposeFunction('codeAutomationExit', resolve).catch(reject);
  });
  let lost = false;
  await page.exposeFunction('codeAutomationLog', (_level: string, parts: unknown[]) => {
    const line = format(...parts);
    lost ||= LOST_EXTENSION_HOST.test(line);
    if (!WORKBENCH_NOISE.test(line)) console.log(line);
  });
  const payload = [
    ['extensionTestsPath', remoteUri(server.authority, testsPath)],
    ['extensionDevelopmentPath', remoteUri(server.authority, developmentPath)],
  ];
  await page.goto(workbenchUrl(server.authority, folder, payload), { waitUntil: 'commit' });
  const exitCode = await finished;
  if (lost) throw new Error('the extension host ended before the tests did');
  return exitCode;
}

async function saveEvidence(server: EditorServer | undefined, page: Page | undefined): Promise<void> {
  const folder = path.join(process.env['STOKEHOLD_PROJECT'] ?? process.cwd(), 'test-results');
  mkdirSync(folder, { recursive: true });
  if (server !== undefined) writeFileSync(path.join(folder, 'editor-server.log'), server.readLog());
  await page?.screenshot({ path: path.join(folder, 'editor-failed.png'), timeout: 5000 }).catch(() => undefined);
}
