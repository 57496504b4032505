// Sets up what a fresh machine with Node 20 lacks: the packages of the lock file, the editor host, and Chromium where
// it may be installed. Needs no package itself. Invariant: what is there and fits is left alone, and nothing but the
// npm registry and the system's own package sources is asked. Run by itself it sets up all of it; imported it does nothing.
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, realpathSync } from 'node:fs';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '..');

/** Installs the packages when they are missing or are not those of the lock file. Throws when it cannot. */
export function setUpPackages() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19))
    throw new Error(`Node 20.19 or newer is needed, not ${process.version}`);
  if (packagesFit()) return;
  console.log('set-up: installing the packages of package-lock.json');
  run('npm', ['ci', '--ignore-scripts', '--no-audit', '--no-fund']);
}

/** Installs the editor host and, as root on a system with apt, Chromium. Throws saying what to install when it cannot. */
export function setUpEditor() {
  run(process.execPath, ['test/editor/host/prepare.mjs']);
  if (existsSync(process.env.STOKEHOLD_CHROMIUM ?? '/usr/bin/chromium')) return;
  const mayInstall = process.getuid?.() === 0 && existsSync('/usr/bin/apt-get') && !process.env.STOKEHOLD_CHROMIUM;
  if (!mayInstall) {
    throw new Error(
      'The editor tests need Chromium. Install it (on Debian, as root: apt-get install chromium) or name one in STOKEHOLD_CHROMIUM.',
    );
  }
  console.log('set-up: installing Chromium');
  const environment = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  run('apt-get', ['update', '-qq'], environment);
  run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], environment);
}

function packagesFit() {
  const installedFile = path.join(root, 'node_modules/.package-lock.json');
  if (!existsSync(installedFile)) return false;
  const wanted = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')).packages;
  const installed = JSON.parse(readFileSync(installedFile, 'utf8')).packages;
  // Optional packages are for other systems more often than not, and npm leaves those out.
  return Object.entries(wanted).every(
    ([place, { version, optional }]) => place === '' || optional || installed[place]?.version === version,
  );
}

function run(command, args, env = process.env) {
  const result = spawnSync(command, args, { cwd: root, env, stdio: ['ignore', 'inherit', 'inherit'] });
  if (result.error) throw result.error;
  if (result.status !== 0) throw new Error(`${command} ${args.join(' ')} ended with ${result.status ?? result.signal}`);
}

if (process.argv[1] !== undefined && realpathSync(process.argv[1]) === import.meta.filename) {
  setUpPackages();
  setUpEditor();
  console.log('set-up: all is there');
}
