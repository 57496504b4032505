// Tells what an entry is for, what it takes and what holds without it, and the same for the word of a definition's kind.
// All of it stands in the kinds' tables. Shows nothing of the values.
import { entryHelp, kindOf } from '../scenario/kinds/registry.ts';
import type { Place } from '../scenario/scenario.ts';
import { withArticle } from '../wording/words.ts';
import type { HoverText } from './hover-text.ts';

/** null for an entry that its kind does not know. */
export function hoverEntry(place: Place, kind: string, entry: string): HoverText | null {
  const help = entryHelp(kind, entry);
  if (!help) return null;
  return {
    place,
    title: `${entry}, of ${withArticle(kind)}`,
    origin: help.help,
    lines: [
      { label: 'Takes', text: help.takes },
      ...(help.default ? [{ label: 'Otherwise', text: `${help.default.text} (${help.default.source})` }] : []),
    ],
  };
}

/** null for a word that is no kind. */
export function hoverKind(place: Place, word: string): HoverText | null {
  const kind = kindOf(word);
  return kind ? { place, title: kind.kind, origin: kind.help, lines: [] } : null;
}
