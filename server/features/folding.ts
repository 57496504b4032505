// What can be folded away in a file: definitions, runs of comments, runs of `use`, and stretches between `# region` and
// `# endregion`. Reads the syntax tree and the comment lines and evaluates nothing. Invariants: a fold spans at least two
// lines, and the folds come in the order of their first lines.
import type { SyntaxTree } from '../../grammar/tree.ts';

/** Lines are counted from 0; both ends belong to the fold. */
export interface Fold {
  readonly role: 'definition' | 'comment' | 'imports' | 'region';
  readonly firstLine: number;
  readonly lastLine: number;
}

export function folding(tree: SyntaxTree): readonly Fold[] {
  const lines = tree.text.split(/\r\n|\r|\n/);
  return [
    ...definitions(tree),
    ...runs(lines, isComment, 'comment'),
    ...runs(lines, isUse, 'imports'),
    ...regions(lines),
  ]
    .filter(({ firstLine, lastLine }) => lastLine > firstLine)
    .sort((left, right) => left.firstLine - right.firstLine || right.lastLine - left.lastLine);
}

function definitions({ text, sections }: SyntaxTree): Fold[] {
  const lineAt = lineCounter(text);
  return sections.flatMap(({ start, section: { statement } }) => {
    if (statement.kind !== 'definition') return [];
    const firstLine = lineAt(start + statement.header.start);
    const lastLine = lineAt(start + statement.span.end);
    return [{ role: 'definition', firstLine, lastLine }];
  });
}

/** Counts on from the last offset asked for, so that rising offsets cost one pass over the text. */
function lineCounter(text: string): (offset: number) => number {
  let [at, line] = [0, 0];
  return (offset) => {
    for (; at < offset; at++) {
      const character = text.charCodeAt(at);
      // CR LF is one line's end: it is counted at its LF.
      if (character === 10 || (character === 13 && text.charCodeAt(at + 1) !== 10)) line++;
    }
    return line;
  };
}

function runs(lines: readonly string[], belongs: (line: string) => boolean, role: Fold['role']): Fold[] {
  const folds: Fold[] = [];
  let firstLine = -1;
  for (let line = 0; line <= lines.length; line++) {
    const isIn = belongs(lines[line] ?? '');
    if (isIn && firstLine < 0) firstLine = line;
    if (isIn || firstLine < 0) continue;
    folds.push({ role, firstLine, lastLine: line - 1 });
    firstLine = -1;
  }
  return folds;
}

function regions(lines: readonly string[]): Fold[] {
  const folds: Fold[] = [];
  const open: number[] = [];
  for (const [line, text] of lines.entries()) {
    if (REGION.test(text)) open.push(line);
    if (!REGION_END.test(text)) continue;
    const firstLine = open.pop();
    if (firstLine !== undefined) folds.push({ role: 'region', firstLine, lastLine: line });
  }
  return folds;
}

const REGION = /^\s*#\s*region\b/;
const REGION_END = /^\s*#\s*endregion\b/;

function isComment(line: string): boolean {
  return /^\s*#/.test(line) && !REGION.test(line) && !REGION_END.test(line);
}

function isUse(line: string): boolean {
  return /^\s*use\b/.test(line);
}
