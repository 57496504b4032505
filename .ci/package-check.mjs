// Checks the package that was built: it holds what a user needs and nothing else, stays small, and comes out the same,
// byte for byte, when it is built again with the same SOURCE_DATE_EPOCH; and its worker, which nothing starts before there
// is long work, starts and answers. Knows nothing else of what the programs do.
// Source of the archive's layout: the .ZIP file format specification, sections 4.3.7 (local header) and
// 4.3.12 (central directory).
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { inflateRawSync } from 'node:zlib';

const root = path.resolve(import.meta.dirname, '..');
const LARGEST_BYTES = 2_000_000;
const CONTENTS = [
  '[Content_Types].xml',
  'extension.vsixmanifest',
  'extension/LICENSE.txt',
  'extension/changelog.md',
  'extension/client/media/icon.png',
  'extension/client/media/language-dark.svg',
  'extension/client/media/language-light.svg',
  'extension/dist/ThirdPartyNotices.txt',
  ...(existsSync(path.join(root, 'server/cli.ts')) ? ['extension/dist/cli.cjs'] : []),
  'extension/dist/extension.cjs',
  'extension/dist/server.cjs',
  'extension/dist/worker.cjs',
  'extension/examples/reference/codes.md',
  'extension/examples/reference/hazards.md',
  'extension/grammar/language-configuration.json',
  'extension/grammar/stokehold.tmLanguage.json',
  'extension/package.json',
  'extension/package.nls.json',
  'extension/readme.md',
];

/** The checks by name; each throws saying what is wrong. */
export const packageChecks = {
  'the package holds what it should and nothing else'() {
    const found = entriesOf(readFileSync(packagePath(path.join(root, 'dist'))));
    const surplus = found.filter((entry) => !CONTENTS.includes(entry));
    const missing = CONTENTS.filter((entry) => !found.includes(entry));
    if (surplus.length + missing.length > 0) {
      throw new Error(`in the package but not expected: [${surplus.join(', ')}]; missing: [${missing.join(', ')}]`);
    }
  },
  'the package is smaller than 2 MB'() {
    const { length } = readFileSync(packagePath(path.join(root, 'dist')));
    if (length >= LARGEST_BYTES) throw new Error(`it has ${length} bytes`);
  },
  'the packaged worker starts by itself and answers'() {
    const folder = mkdtempSync(path.join(os.tmpdir(), 'stokehold-package-'));
    try {
      const worker = path.join(folder, 'worker.cjs');
      writeFileSync(worker, entryOf(readFileSync(packagePath(path.join(root, 'dist'))), 'extension/dist/worker.cjs'));
      const args = ['--eval', ASK_WORKER, worker];
      const { stdout, stderr } = spawnSync(process.execPath, args, { cwd: folder, encoding: 'utf8', timeout: 20_000 });
      const expected = "ready\nfailed: there is no job 'nothing of that name'\n";
      if (stdout !== expected) throw new Error(`it said ${JSON.stringify(stdout)}\n${stderr}`);
    } finally {
      rmSync(folder, { recursive: true });
    }
  },
  'the package is the same when built again'() {
    const first = buildAside();
    const second = buildAside();
    if (!first.equals(second)) throw new Error('two builds with one SOURCE_DATE_EPOCH differ');
  },
};

/** Starts a worker, hands it a job that no table has, and prints what it says until it has answered. */
const ASK_WORKER = `
const { Worker } = require('node:worker_threads');
const worker = new Worker(process.argv[1]);
worker.on('message', ({ kind, message }) => {
  console.log(message === undefined ? kind : kind + ': ' + message);
  if (kind === 'ready') worker.postMessage({ name: 'nothing of that name', input: null, flag: null });
  else void worker.terminate();
});
`;

function buildAside() {
  const folder = mkdtempSync(path.join(os.tmpdir(), 'stokehold-package-'));
  try {
    const args = ['run', '--silent', 'package', '--', '--out', `${folder}${path.sep}`];
    const env = { ...process.env, SOURCE_DATE_EPOCH: '1700000000' };
    const result = spawnSync('npm', args, { cwd: root, env, encoding: 'utf8' });
    if (result.status !== 0)
      throw new Error(`packaging ended with ${result.status}:\n${result.stdout}${result.stderr}`);
    return readFileSync(packagePath(folder));
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function packagePath(folder) {
  const { version } = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8'));
  return path.join(folder, `stokehold-${version}.vsix`);
}

/** The names in an archive. */
function entriesOf(archive) {
  return [...directoryOf(archive)].map(({ name }) => name);
}

/** The content of one of them. */
function entryOf(archive, wanted) {
  for (const { name, method, size, header } of directoryOf(archive)) {
    if (name !== wanted) continue;
    const start = header + 30 + archive.readUInt16LE(header + 26) + archive.readUInt16LE(header + 28);
    const content = archive.subarray(start, start + size);
    return method === 8 ? inflateRawSync(content) : content;
  }
  throw new Error(`the package has no ${wanted}`);
}

/** An archive's central directory. */
function* directoryOf(archive) {
  const end = archive.lastIndexOf(Buffer.from('PK\x05\x06', 'latin1'));
  let offset = archive.readUInt32LE(end + 16);
  for (let left = archive.readUInt16LE(end + 10); left > 0; left -= 1) {
    const nameLength = archive.readUInt16LE(offset + 28);
    yield {
      name: archive.toString('utf8', offset + 46, offset + 46 + nameLength),
      method: archive.readUInt16LE(offset + 10),
      size: archive.readUInt32LE(offset + 20),
      header: archive.readUInt32LE(offset + 42),
    };
    offset += 46 + nameLength + archive.readUInt16LE(offset + 30) + archive.readUInt16LE(offset + 32);
  }
}
