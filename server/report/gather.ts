// What every output format is made of: the files of one run, each once, with their findings. Named files come first in
// the order given, then those reached by `use`. A file reached from two sides keeps the findings of both.
// Knows no format. Invariant: no path occurs twice, and no finding of a file twice.

import type { Finding } from '../findings/finding.ts';
import type { EvaluatedFile, EvaluatedScenario } from '../scenario/scenario.ts';

/** One scenario as worked out from a named file, and the findings of all its files. */
export interface Answer {
  readonly scenario: EvaluatedScenario;
  readonly findings: readonly Finding[];
}

export interface ReportedFile {
  readonly file: EvaluatedFile;
  /** Reached by `use` only. */
  readonly used: boolean;
  readonly findings: readonly Finding[];
}

/** The files of all answers, each once. */
export function gatherFiles(answers: readonly Answer[]): readonly ReportedFile[] {
  const gathered = new Map<string, ReportedFile>();
  const add = (file: EvaluatedFile, { findings }: Answer): void => {
    const known = gathered.get(file.path);
    const own = findings.filter(({ place }) => place.path === file.path);
    gathered.set(
      file.path,
      known ? { ...known, findings: joined(known.findings, own) } : { file, used: file.used, findings: own },
    );
  };
  for (const used of [false, true]) {
    for (const answer of answers) for (const file of answer.scenario.files) if (file.used === used) add(file, answer);
  }
  return [...gathered.values()];
}

/** Whether a run with these files has failed: an error among the findings, or a claim that does not hold. */
export function hasFailed(files: readonly ReportedFile[], strict: boolean): boolean {
  return files.some(
    ({ file, findings }) =>
      file.expectations.some(({ holds }) => holds === false) ||
      findings.some(({ severity }) => severity === 'error' || (strict && severity === 'warning')),
  );
}

function joined(left: readonly Finding[], right: readonly Finding[]): readonly Finding[] {
  const key = ({ code, place, message }: Finding): string => `${place.start} ${place.end} ${code} ${message}`;
  const known = new Set(left.map(key));
  const added = right.filter((finding) => !known.has(key(finding)));
  return added.length === 0
    ? left
    : [...left, ...added].sort((a, b) => a.place.start - b.place.start || a.place.end - b.place.end);
}
