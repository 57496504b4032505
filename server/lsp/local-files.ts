// Reads used files from the disk of the machine the server runs on, for editors that start it over stdio and do not answer
// `stokehold/readFile`. The only file of this room that needs Node; the browser's server never loads it. Decides nothing
// about limits. Invariant: whatever stands at the address (a folder, a pipe, a gigabyte, bytes that are no text), the
// answer comes and is a text or a fault.
import { readFile, stat } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import type { FileAnswer } from './files.ts';

/** Larger files are no scenarios; reading one would only make the editor wait. */
const MOST_BYTES = 16 * 2 ** 20;

/** The text of the file a `file:` URI names. Never rejects. */
export async function readLocalFile(uri: string): Promise<FileAnswer> {
  try {
    const path = fileURLToPath(uri);
    // Looked at before it is opened: opening a named pipe that nobody writes to would wait for ever.
    const status = await stat(path);
    if (!status.isFile()) return { fault: 'unreadable', detail: 'It is not a file.' };
    if (status.size > MOST_BYTES) return { fault: 'unreadable', detail: 'It is larger than 16 MB.' };
    return { text: new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(await readFile(path)) };
  } catch (error) {
    return asFault(error);
  }
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
