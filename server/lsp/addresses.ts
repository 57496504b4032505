// Turns the URIs a client names documents by into the addresses the evaluation works with, and back. Clients escape the
// same path differently (`c%3A` or `c:`, `'` or `%27`); an address has one spelling a place, so that a file reached by
// `use` and the same file open in the editor are known to be one. Reads nothing and knows no file system.
// Invariant: `uriOf(addressOf(uri))` names the same place as `uri`. Source: RFC 3986, and `vscode-uri` for the parts.
import { URI } from 'vscode-uri';

/**
 * The one spelling of the place a URI names: `scheme://authority/path`, each segment escaped in the same way, without
 * query and fragment. A URI whose path does not start at a root (`untitled:Untitled-1`), or that cannot be read at all,
 * is its own address.
 */
export function addressOf(uri: string): string {
  let parsed: URI;
  try {
    parsed = URI.parse(uri, true);
  } catch {
    return uri;
  }
  if (!parsed.path.startsWith('/')) return uri;
  const path = withLowerCaseDrive(parsed.path).split('/').map(encodeURIComponent).join('/');
  return `${parsed.scheme}://${encodeURIComponent(parsed.authority)}${path}`;
}

/** The URI a client is asked by, spelt as editors spell it; null when the address is no URI with a rooted path. */
export function uriOf(address: string): string | null {
  if (!/^[A-Za-z][\w+.-]*:\/\/[^/]*\//.test(address)) return null;
  try {
    return URI.parse(address, true).toString();
  } catch {
    return null;
  }
}

/** The address of the folder a file stands in, with its closing `/`; null where there is none. */
export function folderOf(address: string): string | null {
  return uriOf(address) === null ? null : address.slice(0, address.lastIndexOf('/') + 1);
}

/** Whether a file's address lies in one of the folders. */
export function isInside(address: string, folders: readonly string[]): boolean {
  if (address.split('/').some((segment) => segment === '..' || segment === '.')) return false;
  return folders.some((folder) => address.startsWith(folder.endsWith('/') ? folder : `${folder}/`));
}

function withLowerCaseDrive(path: string): string {
  return path.replace(/^\/[A-Z]:/, (drive) => drive.toLowerCase());
}
