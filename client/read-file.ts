// Reads a used file for the language server, through the editor's own file system, so that scenarios in remote folders
// and virtual workspaces reach their suppliers too. Decides nothing about limits: which files may be read is the
// server's question. Invariant: whatever stands at the address, the answer comes and is a text or a fault.
import { FileSystemError, FileType, l10n, Uri, workspace } from 'vscode';

/** The answer to `stokehold/readFile`. */
export type FileAnswer =
  { readonly text: string } | { readonly fault: 'missing' | 'unreadable'; readonly detail?: string };

/** Larger files are no scenarios; reading one would only make the editor wait. */
const MOST_BYTES = 16 * 2 ** 20;

/** The text of the file at the address, UTF-8, with its byte order mark if it has one. Never rejects. */
export async function readFile(address: string): Promise<FileAnswer> {
  try {
    const uri = Uri.parse(address, true);
    const status = await workspace.fs.stat(uri);
    if ((status.type & FileType.File) === 0) return unreadable(l10n.t('It is not a file.'));
    if (status.size > MOST_BYTES) return unreadable(l10n.t('It is larger than 16 MB.'));
    return { text: decodeUtf8(await workspace.fs.readFile(uri)) };
  } catch (error) {
    if (error instanceof FileSystemError && error.code === 'FileNotFound') return { fault: 'missing' };
    if (error instanceof TypeError) return unreadable(l10n.t('It is not UTF-8 text.'));
    return unreadable(error instanceof Error ? error.message : String(error));
  }
}

/** Throws a TypeError when the bytes are not UTF-8. */
function decodeUtf8(bytes: Uint8Array): string {
  return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(bytes);
}

function unreadable(detail: string): FileAnswer {
  return { fault: 'unreadable', detail };
}
