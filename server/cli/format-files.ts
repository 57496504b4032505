// `format`: brings the named files into the one shape of the language, in place; standard input goes to standard output.
// With `--check` nothing is written and the files that would change are named. A byte order mark is kept.
// Invariant: a file already in shape is not written to.

import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { format } from '../../grammar/printer.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';
import { counted } from '../wording/words.ts';
import { ExitCode } from './exit-codes.ts';
import type { Io } from './io.ts';
import { eachOnce, readNamedFile, STANDARD_INPUT } from './scenario-files.ts';

/** Formats the named files and says how to exit. */
export function formatFiles(names: readonly string[], checkOnly: boolean, io: Io): ExitCode {
  let changed = 0;
  let inShape = 0;
  let failed = false;
  for (const name of eachOnce(names, io)) {
    const named = readNamedFile(name, io);
    if ('fault' in named) {
      failed = true;
      io.problem(`stokehold: cannot read ${name === STANDARD_INPUT ? 'standard input' : named.path}: ${named.fault}\n`);
      continue;
    }
    const formatted = format(named.text, isUnitWord);
    if (name === STANDARD_INPUT && !checkOnly) io.out(named.byteOrderMark + formatted);
    if (formatted === named.text) {
      inShape++;
      continue;
    }
    changed++;
    if (checkOnly) io.out(`${named.path} would change\n`);
    else if (name !== STANDARD_INPUT && !written(named.path, named.byteOrderMark + formatted, io)) failed = true;
  }
  if (!names.includes(STANDARD_INPUT) && (changed === 0 || changed + inShape > 1))
    io.out(summary(changed, inShape, checkOnly));
  if (failed) return ExitCode.Usage;
  return checkOnly && changed > 0 ? ExitCode.Findings : ExitCode.Good;
}

function summary(changed: number, inShape: number, checkOnly: boolean): string {
  const parts = [
    ...(changed > 0 ? [`${counted(changed, 'file')} ${checkOnly ? 'to format' : 'formatted'}`] : []),
    ...(inShape > 0 ? [`${counted(inShape, 'file')} already in shape`] : []),
  ];
  return parts.length === 0 ? '' : `${parts.join(', ')}\n`;
}

function written(name: string, text: string, io: Io): boolean {
  try {
    writeFileSync(path.resolve(io.folder, name), text);
    io.out(`formatted ${name}\n`);
    return true;
  } catch (error) {
    io.problem(`stokehold: cannot write ${name}: ${error instanceof Error ? error.message : 'unknown reason'}\n`);
    return false;
  }
}
