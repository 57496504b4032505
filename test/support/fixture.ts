// Marked fixtures: a scenario as text, with `$0` for the cursor (or `$0…$0` for a range) and a comment line `#- name` that
// starts another file. The markers are taken out; everything else, comments too, is the text under test.
// Invariant: offsets are those of the text without its markers.

export interface Fixture {
  /** By name; the first one is called `main.stoke` unless the fixture starts with a name. */
  readonly files: ReadonlyMap<string, string>;
  /** The file that holds the cursor, or the first one. */
  readonly file: string;
  readonly start: number;
  readonly end: number;
}

/** Reads a fixture. Lines are taken in from the left as far as all of them are. */
export function readFixture(marked: string): Fixture {
  const files = new Map<string, string>();
  let cursor: { file: string; start: number; end: number } | null = null;
  for (const [name, text] of cutFiles(outdented(marked))) {
    const [before = '', ...others] = text.split('$0');
    files.set(name, [before, ...others].join(''));
    if (others.length > 2 || (others.length > 0 && cursor)) throw new Error('A fixture has one cursor or one range.');
    if (others.length > 0) {
      cursor = {
        file: name,
        start: before.length,
        end: before.length + (others.length === 2 ? (others[0] ?? '').length : 0),
      };
    }
  }
  const [first = 'main.stoke'] = files.keys();
  return { files, ...(cursor ?? { file: first, start: 0, end: 0 }) };
}

function* cutFiles(text: string): Iterable<[name: string, text: string]> {
  const [head = '', ...named] = text.split(/^#- (.+)\n/m);
  if (head.trim() !== '' || named.length === 0) yield ['main.stoke', head];
  for (let index = 0; index < named.length; index += 2) yield [named[index] ?? '', named[index + 1] ?? ''];
}

function outdented(text: string): string {
  const lines = text
    .replace(/^\n/, '')
    .replace(/\n[ ]*$/, '\n')
    .split('\n');
  const depths = lines.filter((line) => line.trim() !== '').map((line) => line.length - line.trimStart().length);
  const depth = Math.min(...depths);
  return Number.isFinite(depth) ? lines.map((line) => line.slice(depth)).join('\n') : text;
}
