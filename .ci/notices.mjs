// Writes dist/ThirdPartyNotices.txt: name, version and licence text of every package that went into a bundle.
// A bundle carries no licence comments, so this file carries them. Invariant: a bundled package without a licence text
// stops the packaging. Source of the list: dist/meta.json, which the build writes.
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

const root = path.resolve(import.meta.dirname, '..');
const { inputs } = JSON.parse(readFileSync(path.join(root, 'dist/meta.json'), 'utf8'));

const folders = new Set();
for (const input of inputs) {
  const match = /^(?:.*\/)?node_modules\/(?:@[^/]+\/)?[^/]+/.exec(input);
  if (match) folders.add(match[0]);
}

const notices = [...folders].map((folder) => {
  const { name, version, license } = JSON.parse(readFileSync(path.join(root, folder, 'package.json'), 'utf8'));
  const file = readdirSync(path.join(root, folder)).find((entry) => /^(licen[cs]e|copying)/i.test(entry));
  if (!file) throw new Error(`${name} ${version} has no licence text to ship`);
  const text = readFileSync(path.join(root, folder, file), 'utf8')
    .replaceAll('\r\n', '\n')
    .trim();
  return { name, version, notice: `${name} ${version} (${license})\n\n${text}\n` };
});
notices.sort((left, right) => (left.name + left.version < right.name + right.version ? -1 : 1));

const rule = `\n${'-'.repeat(80)}\n\n`;
const opening = 'Stokehold contains the following packages, each under its own licence.\n';
writeFileSync(
  path.join(root, 'dist/ThirdPartyNotices.txt'),
  opening + rule + notices.map(({ notice }) => notice).join(rule),
);
console.log(`dist/ThirdPartyNotices.txt: ${notices.length} packages`);
