// The finding codes as a page: each with what it means, an example that earns it and what is then said. Made of texts handed
// over: the comment at the head of a code's file, and its example. Knows no file system.

export interface CodeEntry {
  readonly code: string;
  /** The comment that opens the code's file, without its marks. */
  readonly meaning: string;
  /** A scenario that earns the code, and the first message about it; null for codes that no text earns. */
  readonly example: { readonly text: string; readonly severity: string; readonly message: string } | null;
}

/** The page as Markdown; `command` is what writes it anew. */
export function codesPage(entries: readonly CodeEntry[], command: string): string {
  return [
    '# Findings',
    '',
    `This page is written by \`${command}\`; edits are lost. An error means that the scenario cannot mean anything there, a`,
    'warning that it hardly means that, an information that something is worth knowing.',
    '',
    ...entries.flatMap(section),
  ].join('\n');
}

function section({ code, meaning, example }: CodeEntry): string[] {
  const shown = example && ['', '```', example.text.trimEnd(), '```', '', `> ${example.severity}: ${example.message}`];
  return [`## ${code}`, '', meaning, ...(shown ?? []), ''];
}

/** The text of the first block comment of a source file, without its marks. */
export function openingComment(source: string): string {
  const block = /^\/\*\*([\s\S]*?)\*\//.exec(source)?.[1] ?? '';
  return block
    .split('\n')
    .map((line) => line.replace(/^\s*\* ?/, ''))
    .join('\n')
    .trim();
}
