// Reading from the disk: a text or a fault, whatever stands there, never a wait, and nothing outside the limit by a link.
import { execFileSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readLocalFile } from '../../../server/lsp/local-files.ts';

const folder = mkdtempSync(path.join(tmpdir(), 'stokehold-'));
const uri = (name: string): string => pathToFileURL(path.join(folder, name)).href;
const read = (address: string, ...limits: string[]) => readLocalFile(address, limits.length > 0 ? limits : [uri('')]);

beforeAll(() => {
  writeFileSync(path.join(folder, 'a b.stoke'), '\uFEFFlet a = 1\r\n');
  writeFileSync(path.join(folder, 'bytes.stoke'), new Uint8Array([0xff, 0xfe, 0x00]));
  mkdirSync(path.join(folder, 'folder.stoke'));
  if (process.platform !== 'win32') execFileSync('mkfifo', [path.join(folder, 'pipe.stoke')]);
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe.runIf(process.platform !== 'win32')('a link', () => {
  beforeAll(() => {
    for (const name of ['ship', 'ship/deep', 'secret']) mkdirSync(path.join(folder, name));
    writeFileSync(path.join(folder, 'secret/a.stoke'), 'let secret = 1\n');
    writeFileSync(path.join(folder, 'ship/deep/b.stoke'), 'let open = 1\n');
    const links = [
      ['secret/a.stoke', 'ship/out.stoke'],
      ['secret', 'ship/away'],
      ['ship/deep/b.stoke', 'ship/in.stoke'],
      ['ship', 'alias'],
      ['ship/ring.stoke', 'ship/ring.stoke'],
      ['nowhere', 'ship/dangling.stoke'],
    ];
    for (const [to, at] of links) symlinkSync(path.join(folder, to ?? ''), path.join(folder, at ?? ''));
  });

  const outside = {
    fault: 'outside',
    detail: 'It is a link to a file outside the folder whose files may be used.',
  };
  it.each([
    ['to a file outside the limit is not followed', 'ship/out.stoke', 'ship', outside],
    ['to a folder outside the limit is not followed', 'ship/away/a.stoke', 'ship/', outside],
    ['inside the limit is followed', 'ship/in.stoke', 'ship', { text: 'let open = 1\n' }],
    ['that the limit itself is reached by is followed', 'alias/in.stoke', 'alias/', { text: 'let open = 1\n' }],
    ['out of such a limit is not', 'alias/out.stoke', 'alias', outside],
    [
      'that links to itself in a loop is a fault',
      'ship/ring.stoke',
      'ship',
      { fault: 'unreadable', detail: 'Its links form a loop.' },
    ],
    ['to nothing is a missing file', 'ship/dangling.stoke', 'ship', { fault: 'missing' }],
    ['in a limit that is not there leads nowhere', 'ship/in.stoke', 'nowhere', outside],
  ])('%s', async (_, file, limit, answer) => {
    await expect(read(uri(file), uri(limit))).resolves.toEqual(answer);
  });

  it('may be followed where one of several limits holds its end', async () => {
    await expect(read(uri('ship/out.stoke'), uri('ship'), uri('secret'))).resolves.toEqual({
      text: 'let secret = 1\n',
    });
  });
});

describe('a file on the disk', () => {
  it('is read as it is, with its byte order mark and line ends', async () => {
    await expect(read(uri('a b.stoke'))).resolves.toEqual({ text: '\uFEFFlet a = 1\r\n' });
  });

  it.each([
    ['that is not there', uri('none.stoke'), { fault: 'missing' }],
    ['below a file', uri('a b.stoke/none.stoke'), { fault: 'missing' }],
    ['that is a folder', uri('folder.stoke'), { fault: 'unreadable', detail: 'It is not a file.' }],
    ['that is no UTF-8 text', uri('bytes.stoke'), { fault: 'unreadable', detail: 'It is not UTF-8 text.' }],
    ['of another scheme', 'vscode-vfs://hub/a.stoke', { fault: 'unreadable', detail: 'It is not on this machine.' }],
  ])('%s is a fault', async (_, address, fault) => {
    await expect(read(address)).resolves.toEqual(fault);
  });

  it.runIf(process.platform !== 'win32')('that is a pipe nobody writes to is not waited for', async () => {
    await expect(read(uri('pipe.stoke'))).resolves.toEqual({
      fault: 'unreadable',
      detail: 'It is not a file.',
    });
  });
});
