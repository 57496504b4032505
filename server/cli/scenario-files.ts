// Reads scenario files from the disk for the command line: those named on it, and those they use, which must lie inside
// the limit: the current folder if it holds the file, else the file's own folder. Links are followed before the limit is
// looked at. Knows no commands. Invariant: whatever stands at a path, the answer comes and is a text or a fault in words.

import { closeSync, openSync, readSync, realpathSync, statSync } from 'node:fs';
import path from 'node:path';
import type { ReadAnswer } from '../scenario/files.ts';
import type { Io } from './io.ts';

/** Larger files are no scenarios. */
const MOST_BYTES = 16 * 2 ** 20;
const BYTE_ORDER_MARK = '\ufeff';

/** The name that stands for standard input. */
export const STANDARD_INPUT = '-';

export type NamedFile =
  | {
      readonly path: string;
      /** Without its byte order mark, as editors count columns. */
      readonly text: string;
      readonly byteOrderMark: string;
    }
  | { readonly path: string; readonly fault: string };

/** The names without those that name a file again, in another spelling or the same. */
export function eachOnce(names: readonly string[], io: Io): string[] {
  const known = new Set<string>();
  return names.filter((name) => {
    const key = name === STANDARD_INPUT ? name : path.resolve(io.folder, name);
    return !known.has(key) && known.add(key);
  });
}

/** The text of a file named on the command line, or of standard input; a fault in words when it cannot be had. */
export function readNamedFile(name: string, io: Io): NamedFile {
  const given = asGiven(name);
  try {
    const bytes = name === STANDARD_INPUT ? io.input() : readBytes(path.resolve(io.folder, name));
    const text = decoded(bytes);
    const byteOrderMark = text.startsWith(BYTE_ORDER_MARK) ? BYTE_ORDER_MARK : '';
    return { path: given, text: text.slice(byteOrderMark.length), byteOrderMark };
  } catch (error) {
    return { path: given, fault: faultOf(error).words };
  }
}

/** The one spelling that each file of a run goes by: as named on the command line, else as first reached. */
export class Spellings {
  readonly #known = new Map<string, string>();

  constructor(
    named: readonly string[],
    private readonly io: Io,
  ) {
    for (const name of named) if (name !== STANDARD_INPUT) this.of(asGiven(name));
  }

  of(file: string): string {
    const absolute = path.resolve(this.io.folder, file);
    const known = this.#known.get(absolute) ?? file;
    this.#known.set(absolute, known);
    return known;
  }
}

/** A reader for one named file, already read, and all that it uses. */
export function readerFor(
  named: Extract<NamedFile, { text: string }>,
  spellings: Spellings,
  io: Io,
): (path: string) => ReadAnswer {
  const limit = limitOf(named.path, io);
  return (used) => {
    if (used === named.path) return { text: named.text };
    const address = spellings.of(used);
    const absolute = path.resolve(io.folder, used);
    if (!isInside(absolute, limit)) return { fault: 'outside', address, detail: `Only files in ${limit} may be used.` };
    try {
      // Looked at before it is opened: opening a named pipe that nobody writes to would wait for ever.
      if (!statSync(absolute).isFile()) return { fault: 'unreadable', address, detail: 'It is not a file.' };
      if (!isInside(realpathSync(absolute), limit)) {
        return { fault: 'outside', address, detail: `It is a link to a file outside ${limit}.` };
      }
      return { text: decoded(readBytes(absolute)).replace(/^\ufeff/, ''), address };
    } catch (error) {
      const { kind, words } = faultOf(error);
      return kind === 'missing' ? { fault: kind, address } : { fault: kind, address, detail: words };
    }
  };
}

/** With `/` on every machine. */
function asGiven(name: string): string {
  return name.replaceAll(path.win32.sep, path.sep === path.win32.sep ? '/' : path.win32.sep);
}

/** The folder whose files may be used, with its links followed. */
function limitOf(named: string, io: Io): string {
  const current = realpathSync(io.folder);
  if (named === STANDARD_INPUT) return current;
  const absolute = realpathSync(path.resolve(io.folder, named));
  return isInside(absolute, current) ? current : path.dirname(absolute);
}

function isInside(file: string, folder: string): boolean {
  const relative = path.relative(folder, file);
  return relative !== '' && relative !== '..' && !relative.startsWith(`..${path.sep}`) && !path.isAbsolute(relative);
}

/** All bytes of a file, by pieces, so that a device without an end is noticed. */
function readBytes(absolute: string): Uint8Array {
  const descriptor = openSync(absolute, 'r');
  try {
    const pieces: Uint8Array[] = [];
    let size = 0;
    for (;;) {
      const piece = new Uint8Array(64 * 1024);
      const count = readSync(descriptor, piece);
      if (count === 0) break;
      size += count;
      if (size > MOST_BYTES) throw new TooLarge();
      pieces.push(piece.subarray(0, count));
    }
    const whole = new Uint8Array(size);
    let offset = 0;
    for (const piece of pieces) {
      whole.set(piece, offset);
      offset += piece.length;
    }
    return whole;
  } finally {
    closeSync(descriptor);
  }
}

function decoded(bytes: Uint8Array): string {
  if (bytes.length > MOST_BYTES) throw new TooLarge();
  return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
}

class TooLarge extends Error {}

function faultOf(error: unknown): { readonly kind: 'missing' | 'unreadable'; readonly words: string } {
  if (error instanceof TooLarge) return { kind: 'unreadable', words: 'It is larger than 16 MB.' };
  const code = typeof error === 'object' && error !== null && 'code' in error ? error.code : undefined;
  switch (code) {
    case 'ENOENT':
    case 'ENOTDIR':
      return { kind: 'missing', words: 'There is no such file.' };
    case 'EISDIR':
      return { kind: 'unreadable', words: 'It is a folder.' };
    case 'EACCES':
    case 'EPERM':
      return { kind: 'unreadable', words: 'It may not be read by this user.' };
    case 'ELOOP':
      return { kind: 'unreadable', words: 'Its links form a loop.' };
    case 'ERR_ENCODING_INVALID_ENCODED_DATA':
      return { kind: 'unreadable', words: 'It is not UTF-8 text.' };
    default:
      return { kind: 'unreadable', words: error instanceof Error ? error.message : 'It cannot be read.' };
  }
}
