// The findings as an editor lists them: in the order of the text, with the severities a person chose. Works nothing out.
// Hazards and failed expectations cannot be silenced, and no choice makes a finding graver than it is.
// Invariant: the order depends on the findings alone, so that the same findings always give the same list.
import type { Finding, Severity } from '../findings/finding.ts';

export type PlainDiagnostic = Pick<Finding, 'code' | 'severity' | 'message' | 'place' | 'related'>;

/** By finding code: the severity to show it with, or `off`. */
export type SeverityChoices = ReadonlyMap<string, Severity | 'off'>;

/** What to show of the findings, sorted by place and then by code. */
export function diagnostics(findings: readonly Finding[], choices: SeverityChoices = new Map()): PlainDiagnostic[] {
  return findings
    .flatMap((finding): PlainDiagnostic[] => {
      const severity = chosen(finding, choices);
      if (severity === 'off') return [];
      const { code, message, place, related } = finding;
      return [{ code, severity, message, place, related }];
    })
    .sort((left, right) => left.place.start - right.place.start || compareTexts(left.code, right.code));
}

function chosen({ code, severity }: Finding, choices: SeverityChoices): Severity | 'off' {
  const choice = choices.get(code);
  if (choice === undefined || code.startsWith('hazard/') || code.startsWith('expect/')) return severity;
  return choice === 'off' || RANKS[choice] < RANKS[severity] ? choice : severity;
}

function compareTexts(left: string, right: string): number {
  return left < right ? -1 : left > right ? 1 : 0;
}

const RANKS: Readonly<Record<Severity, number>> = { error: 3, warning: 2, information: 1, hint: 0 };
