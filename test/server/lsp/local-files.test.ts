// Reading from the disk: a text or a fault, whatever stands there, and never a wait.
import { execFileSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readLocalFile } from '../../../server/lsp/local-files.ts';

const folder = mkdtempSync(path.join(tmpdir(), 'stokehold-'));
const uri = (name: string): string => pathToFileURL(path.join(folder, name)).href;

beforeAll(() => {
  writeFileSync(path.join(folder, 'a b.stoke'), '\uFEFFlet a = 1\r\n');
  writeFileSync(path.join(folder, 'bytes.stoke'), new Uint8Array([0xff, 0xfe, 0x00]));
  mkdirSync(path.join(folder, 'folder.stoke'));
  if (process.platform !== 'win32') execFileSync('mkfifo', [path.join(folder, 'pipe.stoke')]);
});
afterAll(() => {
  rmSync(folder, { recursive: true });
});

describe('a file on the disk', () => {
  it('is read as it is, with its byte order mark and line ends', async () => {
    await expect(readLocalFile(uri('a b.stoke'))).resolves.toEqual({ text: '\uFEFFlet a = 1\r\n' });
  });

  it.each([
    ['that is not there', uri('none.stoke'), { fault: 'missing' }],
    ['below a file', uri('a b.stoke/none.stoke'), { fault: 'missing' }],
    ['that is a folder', uri('folder.stoke'), { fault: 'unreadable', detail: 'It is not a file.' }],
    ['that is no UTF-8 text', uri('bytes.stoke'), { fault: 'unreadable', detail: 'It is not UTF-8 text.' }],
    ['of another scheme', 'vscode-vfs://hub/a.stoke', { fault: 'unreadable', detail: 'It is not on this machine.' }],
  ])('%s is a fault', async (_, address, fault) => {
    await expect(readLocalFile(address)).resolves.toEqual(fault);
  });

  it.runIf(process.platform !== 'win32')('that is a pipe nobody writes to is not waited for', async () => {
    await expect(readLocalFile(uri('pipe.stoke'))).resolves.toEqual({
      fault: 'unreadable',
      detail: 'It is not a file.',
    });
  });
});
