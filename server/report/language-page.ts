// The reference of the language as a page: reserved words, kinds with their entries and figures, functions and units, from
// the very tables that check a scenario. Knows no scenario. Invariant: what a table lacks the page does not say.

import { BASIS_WORDS, CONNECTIVE_WORDS, PHASE_WORDS, STATEMENT_WORDS } from '../../grammar/words.ts';
import { prefixes, unitTable, type UnitRow } from '../core/quantity/units.ts';
import { functions } from '../scenario/functions.ts';
import type { Kind } from '../scenario/kinds/kind.ts';
import { kinds } from '../scenario/kinds/registry.ts';

/** The page as Markdown; `command` is what writes it anew. */
export function languagePage(command: string): string {
  return [
    '# The scenario language',
    '',
    `This page is written by \`${command}\` from the tables that check a scenario; edits are lost. How the language looks is`,
    'best seen in [dunlin.stoke](../dunlin.stoke), and every construct once in [constructs.stoke](../constructs.stoke).',
    '',
    'A file is a list of statements: `scenario "title"`, `use "path"`, `let name = expression`, `expect claim`, and definitions',
    '`kind name { … }`. Inside a definition each line is an entry `words: value`, a portion `amount [mass|mole|volume]',
    'substance`, an equation `terms -> terms`, or `acknowledge code: "reason"`. `#` starts a comment, `##` above a definition',
    "documents it. A name that is not lower-case letters, digits and `_` is quoted: `'sodium oleate'`.",
    '',
    '## Words of its own',
    '',
    `- start a statement: ${listed(STATEMENT_WORDS)}`,
    `- stand between operands: ${listed(CONNECTIVE_WORDS)}, and \`rest\` in place of an amount`,
    `- say what a share is counted by: ${listed(BASIS_WORDS)}`,
    `- phases of a formula, in brackets: ${listed(PHASE_WORDS)}`,
    '',
    '## Kinds',
    '',
    ...kinds.flatMap(kindSection),
    '## Functions',
    '',
    ...table(
      ['call', 'gives'],
      [...functions.values()].map(({ signature, help }) => [`\`${signature}\``, help]),
    ),
    '',
    '## Units',
    '',
    'A unit is words joined by a space, `·`, `*`, `/`, `^` and a whole number, with one bracket behind a `/`: `kJ/(kg K)`. `per`',
    'may open a unit (`210 per year`). `J/kg K` is asked to be written with brackets. Prefixes:',
    `${Object.entries(prefixes)
      .map(([symbol, { name }]) => `\`${symbol}\` ${name}`)
      .join(', ')}.`,
    '',
    ...table(['unit', 'also', 'name', 'is', 'prefixes', 'source'], unitTable.map(unitCells)),
    '',
  ].join('\n');
}

function kindSection({ kind, help, evaluated }: Kind): string[] {
  const heading = [`### ${kind}`, '', help, ''];
  if (!evaluated) return [...heading, 'Read, coloured and formatted; not worked out by this version.', ''];
  const entries = Object.values(evaluated.entries).map(
    ({ name, help: entryHelp, reader, needed, default: otherwise }) => [
      `\`${name}\``,
      entryHelp,
      reader.takes,
      needed ? 'needed' : otherwise ? `${otherwise.text} (${otherwise.source})` : '',
    ],
  );
  const figures = evaluated.figures.map(({ id, label, unit }) => [
    `\`${id}\``,
    label,
    unit === '1' ? '–' : `\`${unit}\``,
  ]);
  return [
    ...heading,
    ...(evaluated.lines.length > 0 ? [`Besides entries it takes ${evaluated.lines.join('s and ')}s.`, ''] : []),
    ...table(['entry', 'says', 'takes', 'otherwise'], entries),
    '',
    ...table(['figure', 'is', 'unit'], figures),
    '',
  ];
}

function unitCells({ symbol, spellings, name, definition, prefixes: taken, source }: UnitRow): string[] {
  const is = typeof definition === 'string' ? definition : `base unit of ${definition.base}`;
  return [`\`${symbol}\``, listed(spellings), name, is, listed(taken), source];
}

function listed(words: readonly string[]): string {
  return words.map((word) => `\`${word}\``).join(', ');
}

function table(heads: readonly string[], rows: readonly (readonly string[])[]): string[] {
  const line = (cells: readonly string[]): string =>
    `| ${cells.map((cell) => cell.replaceAll('|', '\\|')).join(' | ')} |`;
  return [line(heads), line(heads.map(() => '---')), ...rows.map(line)];
}
