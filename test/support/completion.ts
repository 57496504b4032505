// Check functions for completion: what is offered at the cursor of a marked fixture, in the order an editor shows it, and the
// text that taking an offer gives. Knows no protocol. Invariant: no offer reaches behind the cursor's line or past its word.
import { expect } from 'vitest';
import { completion } from '../../server/features/completion.ts';
import { fitRank, fits, type CompletionItem } from '../../server/features/completion-item.ts';
import { evaluateFixture } from './features.ts';

/** The offers that an editor keeps for what is typed, best first. */
export function offersAt(marked: string): readonly CompletionItem[] {
  const { scenario, file, files, start } = evaluateFixture(marked);
  const text = files.get(file) ?? '';
  const { items, end } = completion(scenario, file, start);
  const ranked = items.flatMap((item) => {
    expect(item.start).toBeLessThanOrEqual(start);
    expect(text.slice(item.start, end)).not.toContain('\n');
    const typed = text.slice(item.start, start);
    const filter = item.filter ?? item.label;
    return fits(filter, typed) ? [{ item, fit: fitRank(filter, typed) }] : [];
  });
  return ranked.sort((left, right) => left.fit - right.fit || left.item.rank - right.item.rank).map(({ item }) => item);
}

export interface ExpectedOffers {
  /** The list begins with these labels. */
  readonly first?: readonly string[];
  /** These are somewhere in it; `label: detail` checks the detail too. */
  readonly has?: readonly string[];
  readonly lacks?: readonly string[];
}

export function checkOffers(marked: string, { first = [], has = [], lacks = [] }: ExpectedOffers): void {
  const offers = offersAt(marked);
  const labels = offers.map(({ label }) => label);
  expect(labels.slice(0, first.length)).toEqual(first);
  const told = [...labels, ...offers.map(({ label, detail }) => `${label}: ${detail}`)];
  for (const label of has) expect(told, label).toContain(label);
  for (const label of lacks) expect(labels, label).not.toContain(label);
}

export function checkNoOffers(marked: string): void {
  expect(offersAt(marked).map(({ label }) => label)).toEqual([]);
}

/** Takes the offer of this label, as plain text or as a snippet with its places shown. */
export function taken(marked: string, label: string, form: 'plain' | 'snippet' = 'plain'): string {
  const { scenario, file, files, start } = evaluateFixture(marked);
  const text = files.get(file) ?? '';
  const { items, end } = completion(scenario, file, start);
  const item = items.find((one) => one.label === label);
  expect(item, `${label} among ${items.map((one) => one.label).join(', ')}`).toBeDefined();
  if (!item) return text;
  return (
    text.slice(0, item.start) + (form === 'snippet' ? (item.snippet ?? item.insert) : item.insert) + text.slice(end)
  );
}
