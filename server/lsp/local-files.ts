// Reads used files from the disk of the machine the server runs on, for editors that start it over stdio and do not answer
// `stokehold/readFile`. The only file of this room that needs Node; the browser's server never loads it. Whether an address
// lies inside the limit is asked before; this looks where links lead. Invariants: whatever stands at the address (a folder,
// a pipe, a gigabyte, bytes that are no text), the answer comes and is a text or a fault; what is read is the very file
// that was found to lie inside the limit.
import { readFile, realpath, stat } from 'node:fs/promises';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import type { FileAnswer } from './files.ts';

/** Larger files are no scenarios; reading one would only make the editor wait. */
const MOST_BYTES = 16 * 2 ** 20;

/**
 * The text of the file a `file:` URI names, if it lies in one of the folders once all links are followed, those on the way
 * to the folders too. Never rejects.
 */
export async function readLocalFile(uri: string, limits: readonly string[]): Promise<FileAnswer> {
  try {
    const file = await realpath(fileURLToPath(uri));
    const folders = (await Promise.all(limits.map(realFolder))).filter((folder) => folder !== null);
    if (!folders.some((folder) => isBelow(file, folder))) {
      return { fault: 'outside', detail: 'It is a link to a file outside the folder whose files may be used.' };
    }
    // Looked at before it is opened: opening a named pipe that nobody writes to would wait for ever.
    const status = await stat(file);
    if (!status.isFile()) return { fault: 'unreadable', detail: 'It is not a file.' };
    if (status.size > MOST_BYTES) return { fault: 'unreadable', detail: 'It is larger than 16 MB.' };
    return { text: new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(await readFile(file)) };
  } catch (error) {
    return asFault(error);
  }
}

/** The folder at an address, with its links followed; null where there is none on this machine. */
async function realFolder(address: string): Promise<string | null> {
  try {
    return await realpath(fileURLToPath(address));
  } catch {
    return null;
  }
}

function isBelow(file: string, folder: string): boolean {
  const relative = path.relative(folder, file);
  return relative !== '' && relative !== '..' && !relative.startsWith(`..${path.sep}`) && !path.isAbsolute(relative);
}

function asFault(error: unknown): FileAnswer {
  const code = typeof error === 'object' && error !== null && 'code' in error ? error.code : undefined;
  switch (code) {
    case 'ENOENT':
    case 'ENOTDIR':
      return { fault: 'missing' };
    case 'EACCES':
    case 'EPERM':
      return { fault: 'unreadable', detail: 'It may not be read by this user.' };
    case 'ELOOP':
      return { fault: 'unreadable', detail: 'Its links form a loop.' };
    case 'ERR_ENCODING_INVALID_ENCODED_DATA':
      return { fault: 'unreadable', detail: 'It is not UTF-8 text.' };
    case 'ERR_INVALID_URL_SCHEME':
    case 'ERR_INVALID_FILE_URL_HOST':
    case 'ERR_INVALID_FILE_URL_PATH':
      return { fault: 'unreadable', detail: 'It is not on this machine.' };
    default:
      return { fault: 'unreadable', ...(error instanceof Error ? { detail: error.message } : {}) };
  }
}
