// Places, folds, renames and highlights into the protocol's records. Offsets are turned into positions by convert.ts.
// Knows no connection. Invariant: a place whose text is not at hand is left out of a list of places, and makes a rename
// impossible, because half of one is worse than none.
import {
  DocumentHighlightKind,
  FoldingRangeKind,
  type DocumentHighlight,
  type FoldingRange,
  type Location,
  type TextEdit,
  type WorkspaceEdit,
} from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import type { Fold } from '../features/folding.ts';
import type { Highlight } from '../features/highlights.ts';
import type { RenameEdit } from '../features/rename.ts';
import type { Place } from '../scenario/scenario.ts';
import { locationOf, rangeOf, toWorkspaceEdit, type PlacedText, type TextOf } from './convert.ts';

export function toLocations(places: readonly Place[], textOf: TextOf): Location[] {
  return places.flatMap((place) => locationOf(place, textOf) ?? []);
}

export function toHighlight({ place, role }: Highlight, document: TextDocument): DocumentHighlight {
  const kind = role === 'definition' ? DocumentHighlightKind.Write : DocumentHighlightKind.Read;
  return { range: rangeOf(document, place.start, place.end), kind };
}

export function toFoldingRange({ role, firstLine, lastLine }: Fold): FoldingRange {
  const kind = FOLD_KINDS[role];
  return { startLine: firstLine, endLine: lastLine, ...(kind === null ? {} : { kind }) };
}

/** null when one of the edits is in a text that is not at hand. */
export function toRename(edits: readonly RenameEdit[], textOf: TextOf, withVersions: boolean): WorkspaceEdit | null {
  const byText = new Map<PlacedText, TextEdit[]>();
  for (const { place, newText } of edits) {
    const text = textOf(place.path);
    if (!text) return null;
    const edit = { range: rangeOf(text.document, place.start, place.end), newText };
    const others = byText.get(text);
    if (others) others.push(edit);
    else byText.set(text, [edit]);
  }
  return toWorkspaceEdit(byText, withVersions);
}

const FOLD_KINDS: Readonly<Record<Fold['role'], FoldingRangeKind | null>> = {
  definition: null,
  comment: FoldingRangeKind.Comment,
  imports: FoldingRangeKind.Imports,
  region: FoldingRangeKind.Region,
};
