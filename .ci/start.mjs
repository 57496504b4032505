// The first thing a person runs: sets up, builds the programs and the editor's package, evaluates an example on the
// command line and says how to see the same in an editor. Knows nothing of what the example answers.
// Invariant: ends with exit code 0 only when the example was evaluated without an error.
import { spawnSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { setUpPackages } from './set-up.mjs';

const root = path.resolve(import.meta.dirname, '..');
const example = 'examples/dunlin.stoke';

try {
  setUpPackages();
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
}
const packaged = spawnSync('npm', ['run', '--silent', 'package'], { cwd: root, encoding: 'utf8' });
if (packaged.status !== 0) {
  console.error(`${packaged.stdout}${packaged.stderr}`);
  process.exit(1);
}
const { name, version } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8'));

console.log(`\n$ node dist/cli.cjs evaluate ${example}\n`);
const evaluated = spawnSync(process.execPath, ['dist/cli.cjs', 'evaluate', example], { cwd: root, stdio: 'inherit' });
console.log(`
In an editor, the same answers while you type:
  code --install-extension dist/${name}-${version}.vsix
  code ${example}
(or "Extensions: Install from VSIX…" in the editor's command palette). Hover a name, a portion or a number.

On the command line:  node dist/cli.cjs --help
`);
process.exit(evaluated.status ?? 1);
