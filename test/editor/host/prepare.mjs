#!/usr/bin/env node
// Installs the editor host of the editor tests into node_modules/.cache/editor-host: VS Code's own server and web
// workbench as published in the npm package code-server, and the search program they call. Downloads from the npm
// registry alone and runs no install script. Knows nothing of our extension. Invariant: a step leaves its stamp last,
// so an interrupted installation is repeated and a complete one costs nothing.
import { spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const CODE_SERVER = 'code-server@4.100.3'; // holds VS Code 1.100.3, the newest made for Node 20
const RIPGREP = `@vscode/ripgrep-${process.platform}-${process.arch}@1.18.0`;

const root = path.resolve(import.meta.dirname, '../../..');
const host = path.join(root, 'node_modules/.cache/editor-host');
const vscode = path.join(host, 'vscode');

mkdirSync(host, { recursive: true });
step('workbench', CODE_SERVER, () => {
  rmSync(vscode, { recursive: true, force: true });
  unpack(CODE_SERVER, 'lib/vscode', vscode);
  // `npm ci` refuses: the lock file published inside lacks a dependency.
  run('npm', ['install', '--omit=dev', '--ignore-scripts', '--no-audit', '--no-fund', '--loglevel=error'], vscode);
});
// Quick open and search call this program, which the editor's own package would download in an install script.
step('ripgrep', RIPGREP, () => unpack(RIPGREP, 'bin', path.join(vscode, 'node_modules/@vscode/ripgrep/bin')));
console.log('editor host: ready');

function step(name, version, install) {
  const stamp = path.join(vscode, `.installed-${name}-${version.replaceAll('/', '+')}`);
  if (existsSync(stamp)) return;
  const started = Date.now();
  install();
  writeFileSync(stamp, '');
  console.log(`editor host: installed ${name} (${version}) in ${((Date.now() - started) / 1000).toFixed(1)} s`);
}

/** Unpacks one folder of a package's archive, without the package's dependencies and source maps. */
function unpack(spec, folder, destination) {
  const download = mkdtempSync(path.join(host, 'download-'));
  const [{ filename }] = JSON.parse(run('npm', ['pack', spec, '--json', '--loglevel=error'], download, 'pipe'));
  const member = path.posix.join('package', folder);
  const strip = `--strip-components=${member.split('/').length}`;
  mkdirSync(destination, { recursive: true });
  run('tar', ['-xzf', filename, '-C', destination, strip, '--exclude=*.map', member], download);
  rmSync(download, { recursive: true });
}

function run(command, args, cwd, stdout = 'inherit') {
  const result = spawnSync(command, args, { cwd, encoding: 'utf8', stdio: ['ignore', stdout, 'inherit'] });
  if (result.error) throw result.error;
  if (result.status !== 0) throw new Error(`${command} ${args.join(' ')} exited with ${result.status}`);
  return result.stdout;
}
