// `check` and `evaluate`: works out the named files and prints them in the format asked for. A file that cannot be read
// is said on standard error and the rest is still printed. An exception while one file is worked out is our bug: it is
// said once and the other files are still answered. Knows no command line syntax.
// Invariant: the exit code follows from what was printed, by the table in exit-codes.ts.

import { leadingFigures } from '../features/leading-figures.ts';
import { findingsOf } from '../findings/registry.ts';
import { csvReport } from '../report/csv.ts';
import { gatherFiles, hasFailed, type Answer, type ReportedFile } from '../report/gather.ts';
import { jsonReport, type Extent } from '../report/json.ts';
import { noPaint, terminalPaint } from '../report/paint.ts';
import { textReport } from '../report/text.ts';
import { evaluate } from '../scenario/evaluate.ts';
import { ExitCode } from './exit-codes.ts';
import type { Io } from './io.ts';
import { eachOnce, readerFor, readNamedFile, Spellings, STANDARD_INPUT } from './scenario-files.ts';
import { sayProgramFault } from './program-fault.ts';

export type Format = 'text' | 'json' | 'csv';

export interface AnswerOptions {
  readonly format: Format;
  readonly strict: boolean;
  readonly colour: boolean;
  /** In text, of each definition the figures a person looks for first. */
  readonly brief: boolean;
}

/** Figures of a definition in a brief answer. */
const MOST_BRIEF = 6;

/** Works out the named files, prints them, and says how to exit. */
export function answerFiles(names: readonly string[], extent: Extent, options: AnswerOptions, io: Io): ExitCode {
  const answers: Answer[] = [];
  let unreadable = false;
  let faulty = false;
  const asked = eachOnce(names, io);
  const spellings = new Spellings(asked, io);
  for (const name of asked) {
    const named = readNamedFile(name, io);
    if ('fault' in named) {
      unreadable = true;
      const what = name === STANDARD_INPUT ? 'standard input' : named.path;
      io.problem(`stokehold: cannot read ${what}: ${named.fault}\n`);
      continue;
    }
    try {
      const scenario = evaluate(named.path, readerFor(named, spellings, io));
      answers.push({ scenario, findings: findingsOf(scenario) });
    } catch (error) {
      faulty = true;
      sayProgramFault(error, io, `while working out ${named.path}`);
    }
  }
  const files = gatherFiles(answers);
  if (files.length > 0 || options.format !== 'text') io.out(printed(files, extent, options, io));
  if (faulty) return ExitCode.ProgramFault;
  if (unreadable) return ExitCode.Usage;
  return hasFailed(files, options.strict) ? ExitCode.Findings : ExitCode.Good;
}

function printed(
  files: readonly ReportedFile[],
  extent: Extent,
  { format, colour, brief }: AnswerOptions,
  io: Io,
): string {
  switch (format) {
    case 'json':
      return jsonReport(files, extent);
    case 'csv':
      return csvReport(files);
    case 'text':
      return textReport(files, {
        extent,
        paint: colour ? terminalPaint : noPaint,
        width: io.columns ?? 100,
        ...(brief ? { brief: (definition) => leadingFigures(definition).slice(0, MOST_BRIEF) } : {}),
      });
  }
}
