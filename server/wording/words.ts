// Small English: lists, plurals, quotation of what was written, severities. Every sentence of findings, hovers and
// reports uses these, so that the same thing is said the same way everywhere. Knows nothing of scenarios.
// Invariant: a quoted text is one line and short, whatever was written.

import type { Severity } from '../findings/finding.ts';

const LONGEST_QUOTE = 60;

/** `a`, `a and b`, `a, b and c`; an empty list is an empty text. */
export function listed(items: readonly string[], joint: 'and' | 'or' = 'and'): string {
  const last = items.at(-1);
  if (last === undefined) return '';
  return items.length === 1 ? last : `${items.slice(0, -1).join(', ')} ${joint} ${last}`;
}

/** `the density of a`, `the density of b` become `the density of a and b`: what they share is said once. */
export function sharingHeads(items: readonly string[]): string[] {
  const tailsByHead = new Map<string, string[]>();
  for (const item of items) {
    const at = item.lastIndexOf(' of ');
    const [head, tail] = at < 0 ? [item, ''] : [item.slice(0, at + 4), item.slice(at + 4)];
    tailsByHead.set(head, [...(tailsByHead.get(head) ?? []), tail]);
  }
  return [...tailsByHead].map(([head, tails]) => head + listed(tails));
}

/** The text as it was written, in the marks that say "this is from the file", shortened where long. */
export function quoted(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim();
  const characters = Array.from(line);
  const short = characters.length > LONGEST_QUOTE ? `${characters.slice(0, LONGEST_QUOTE - 1).join('')}…` : line;
  return `\`${short}\``;
}

/** `1 line`, `3 lines`. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** `Did you mean `a` or `b`?`, at most three; empty when nothing is near. */
export function didYouMean(near: readonly string[]): string {
  return near.length === 0 ? '' : `Did you mean ${listed(near.slice(0, 3).map(quoted), 'or')}?`;
}

/** Sentences into one paragraph, the empty ones left out. */
export function sentences(...parts: readonly (string | false | null | undefined)[]): string {
  return parts.filter((part): part is string => Boolean(part)).join(' ');
}

/** `a blend`, `an engine`. */
export function withArticle(noun: string): string {
  return `${/^[aeiou]/i.test(noun) ? 'an' : 'a'} ${noun}`;
}

/** `Blend slurry`: a first capital for the start of a sentence. */
export function capitalised(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** The word a person reads for a severity; the JSON contract uses the severity itself. */
export function severityWord(severity: Severity): string {
  return severity === 'information' ? 'note' : severity;
}

/** `2 errors, 1 warning`; `no findings` when there is none. `counts` needs no entry for what did not occur. */
export function countedFindings(counts: Partial<Readonly<Record<Severity, number>>>): string {
  const parts = (['error', 'warning', 'information', 'hint'] as const).flatMap((severity) => {
    const count = counts[severity] ?? 0;
    return count === 0 ? [] : [counted(count, severityWord(severity))];
  });
  return parts.length === 0 ? 'no findings' : parts.join(', ');
}

/** How a name is written in a scenario: bare, or in `'…'` where it must be quoted. */
export function nameAsWritten(name: string): string {
  const isLowerSnake = /^[a-z][a-z0-9_]*$/.test(name);
  const isFormula = /^(?:[A-Z][a-z]?|[0-9]|[().·]|[+-])+(?:\((?:g|l|cr|aq)\))?$/.test(name);
  return isLowerSnake || isFormula ? name : `'${name}'`;
}
