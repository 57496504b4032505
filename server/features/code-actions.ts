// The mends on offer at a place: the fixes of the findings there. Invents none; a fix belongs to its finding, which was
// made from this very text. Invariant: the preferred fixes stand first, and one finding has at most one of them, so that
// an editor's "fix this" never has to choose.
import type { Finding, Fix } from '../findings/finding.ts';
import type { Place } from '../scenario/scenario.ts';

export interface QuickFix extends Fix {
  readonly finding: Finding;
}

/** The fixes of all findings that touch the place; a cursor at either end of a finding touches it. */
export function codeActions(findings: readonly Finding[], place: Place): QuickFix[] {
  const offered = findings.filter((finding) => touches(finding.place, place)).flatMap(quickFixes);
  return [...offered.filter(({ preferred }) => preferred), ...offered.filter(({ preferred }) => !preferred)];
}

function quickFixes(finding: Finding): QuickFix[] {
  const first = finding.fixes.findIndex(({ preferred }) => preferred);
  return finding.fixes.map((fix, index) => ({ ...fix, preferred: index === first, finding }));
}

function touches(first: Place, second: Place): boolean {
  return first.path === second.path && first.start <= second.end && second.start <= first.end;
}
