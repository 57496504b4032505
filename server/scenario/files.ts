// Reaches the files of a scenario: parses the one asked about and follows each `use`, relative to the file it stands in, and
// has at hand the text of each file of numbers that an entry names, by the same rules. What is in such a text is the kind's.
// Reads nothing itself; a reader is handed in that answers with a text, a fault, or "wanted" when the text must first be
// fetched. Each file is reached once. A cycle of files is one fact, at the `use` that closes it.
// Invariant: the walk is iterative, so that a long chain of files cannot exhaust the stack.

import { isPartial, parse, type ParseOptions } from '../../grammar/parse.ts';
import type { Definition, PlacedSection, SyntaxTree, TextLiteral, UseStatement } from '../../grammar/tree.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';
import type { Fact } from './facts.ts';
import { entryNamesFile } from './kinds/registry.ts';
import { placeOf } from './place.ts';
import type { PlacedFact } from './scenario.ts';

/**
 * What a reader says of an address. `address` is the one the file goes by, where it was asked for by another spelling;
 * `detail` is a plain sentence for the person, without the address.
 */
export type ReadAnswer =
  | { readonly text: string; readonly address?: string; readonly reading?: Reading }
  | { readonly fault: 'missing' | 'unreadable' | 'outside'; readonly address?: string; readonly detail?: string }
  | 'wanted';

/** From which size on a text is read in part only, and which part is seen. */
export type Reading = Pick<ParseOptions, 'largestText' | 'visible'>;

export interface LoadedFile {
  readonly path: string;
  readonly used: boolean;
  readonly tree: SyntaxTree;
  readonly facts: PlacedFact[];
  /** The texts that entries of a section name, by the path as written there; null for one that is not there. */
  readonly named: Map<PlacedSection, Map<string, string | null>>;
}

export interface LoadedFiles {
  readonly files: readonly LoadedFile[];
  readonly wanted: readonly string[];
  /** A file that is used, and may hold any name, is not there. */
  readonly lacksUsed: boolean;
}

/**
 * The file at `root` and all it reaches, in the order reached. Empty when the root itself cannot be read. Sections that
 * stand in an `earlier` tree of the same file are not parsed again.
 */
export function loadFiles(
  root: string,
  read: (path: string) => ReadAnswer,
  earlier: ReadonlyMap<string, SyntaxTree> = new Map(),
): LoadedFiles {
  const answer = read(root);
  if (answer === 'wanted') return { files: [], wanted: [root], lacksUsed: false };
  if (!('text' in answer)) return { files: [], wanted: [], lacksUsed: false };

  const files = new Map<string, LoadedFile>();
  const wanted = new Set<string>();
  const faulty = new Set<string>();
  let lacksUsed = false;
  const open: { file: LoadedFile; next: number }[] = [];
  const enter = (path: string, used: boolean, { text, reading }: ReadText): void => {
    const file = { path, used, tree: treeOf(text, earlier.get(path), reading), facts: [], named: new Map() };
    files.set(path, file);
    open.push({ file, next: 0 });
  };

  enter(root, false, answer);
  for (let top = open.at(-1); top; top = open.at(-1)) {
    const placed = top.file.tree.sections[top.next++];
    if (!placed) {
      open.pop();
      continue;
    }
    const { statement } = placed.section;
    if (statement.kind === 'use') followUse(top.file, placed, statement);
    else if (statement.kind === 'definition') readNamed(top.file, placed, statement);
  }
  return { files: [...files.values()], wanted: [...wanted], lacksUsed };

  function followUse(file: LoadedFile, placed: PlacedSection, statement: UseStatement): void {
    const written = statement.path;
    if (!written) return; // the grammar has said that the path is missing
    const say = (fact: Fact): void => {
      if (fact.code === 'name/missing-file') lacksUsed = true;
      file.facts.push({ fact, place: placeOf(file.path, placed, written.span) });
    };
    const resolved = resolveUse(file.path, written.value);
    // The root keeps the spelling it was named with (`./trial.stoke`), or it would be reached a second time.
    const asked = resolved === withoutDot(root) ? root : resolved;
    if (asked === null) return say({ code: 'name/missing-file', path: written.value, why: 'not-relative' });
    if (isReached(asked, say)) return;
    const found = read(asked);
    if (found === 'wanted') {
      wanted.add(asked);
      return;
    }
    const path = found.address ?? asked;
    if (path !== asked && isReached(path, say)) return;
    if ('text' in found) return enter(path, true, found);
    // One missing file is one finding, however often and in whatever spelling it is used.
    if (faulty.has(path)) return;
    faulty.add(path);
    const fact = { code: 'name/missing-file', path: written.value, why: found.fault } as const;
    say(found.detail === undefined ? fact : { ...fact, detail: found.detail });
  }

  /** The texts that a definition's entries name. Each that is not there is said at the entry, since that is what lacks it. */
  function readNamed(file: LoadedFile, placed: PlacedSection, definition: Definition): void {
    for (const { value: path, span } of fileNamesIn(definition)) {
      const texts = file.named.get(placed) ?? new Map<string, string | null>();
      if (texts.has(path)) continue;
      file.named.set(placed, texts.set(path, null));
      const asked = resolveUse(file.path, path);
      const found = asked === null ? ({ fault: 'not-relative' } as const) : read(asked);
      if (found === 'wanted') {
        if (asked !== null) wanted.add(asked);
      } else if ('text' in found) texts.set(path, found.text);
      else {
        const fact = { code: 'name/missing-file', path, why: found.fault } as const;
        const detail = 'detail' in found ? found.detail : undefined;
        const told = detail === undefined ? fact : { ...fact, detail };
        file.facts.push({ fact: told, place: placeOf(file.path, placed, span) });
      }
    }
  }

  /** Whether the file has been reached already; says so where that closes a cycle. */
  function isReached(path: string, say: (fact: Fact) => void): boolean {
    const onPath = open.findIndex((entry) => entry.file.path === path);
    if (onPath >= 0) {
      say({ code: 'name/use-cycle', path: [...open.slice(onPath).map((entry) => entry.file.path), path] });
    }
    return files.has(path);
  }
}

/** Where a definition's entries name files. */
function fileNamesIn({ keyword, lines }: Definition): readonly TextLiteral[] {
  return lines.flatMap((line) => {
    if (line.kind !== 'entry' || !entryNamesFile(keyword.text, line.words)) return [];
    return line.phrases.flatMap(({ items }) => items.filter((item): item is TextLiteral => item.kind === 'text'));
  });
}

type ReadText = Extract<ReadAnswer, { text: string }>;

function treeOf(text: string, previous: SyntaxTree | undefined, reading: Reading = {}): SyntaxTree {
  // Of a text that is too large, other parts may be seen than before.
  const isWhole = previous && !isPartial(previous) && text.length <= (reading.largestText ?? text.length);
  if (isWhole && previous.text === text) return previous;
  return parse(text, isUnitWord, previous ? { ...reading, previous } : reading);
}

/**
 * The address a `use` means: relative to the file it stands in, with `/` and `..`; null when it is absolute, has a
 * scheme or drive, or is no path at all. Where the using file is named by a URI, the path's characters are escaped.
 */
export function resolveUse(from: string, path: string): string | null {
  if (
    path === '' ||
    path.startsWith('/') ||
    path.includes('\\') ||
    path.includes('\0') ||
    /^[A-Za-z][\w+.-]*:/.test(path)
  ) {
    return null;
  }
  const uri = /^([A-Za-z][\w+.-]*:\/\/[^/]*)(\/.*)$/s.exec(from);
  const [origin, base] = uri ? [uri[1] ?? '', uri[2] ?? ''] : ['', from];
  const segments = withoutDot(base).split('/').slice(0, -1);
  for (const part of path.split('/')) {
    if (part === '' || part === '.') continue;
    const last = segments.at(-1);
    if (part === '..' && last !== undefined && !['', '.', '..'].includes(last)) segments.pop();
    else if (part === '..' && last === '')
      return null; // above the root of a file system
    else segments.push(uri && part !== '..' ? encodeURIComponent(part) : part);
  }
  return origin + segments.join('/');
}

/** A path from here without its `./`. */
function withoutDot(path: string): string {
  return path.replace(/^(\.\/+)+/, '');
}
