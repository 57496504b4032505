// The requests that go from place to place: definition, references, highlights, rename, folding. Each asks one feature and
// converts its answer. Names are looked for in every open scenario that reaches the file, so that a rename in a used file
// reaches its users too. Invariant: places are converted with the very texts the answer was made from.
import { LSPErrorCodes, ResponseError, type ServerCapabilities } from 'vscode-languageserver';
import { parse } from '../../grammar/parse.ts';
import { isUnitWord } from '../core/quantity/read-unit.ts';
import { definition } from '../features/definition.ts';
import { folding } from '../features/folding.ts';
import { highlights } from '../features/highlights.ts';
import { filesOf } from '../features/named.ts';
import { references } from '../features/references.ts';
import { prepareRename, rename } from '../features/rename.ts';
import type { EvaluatedFile } from '../scenario/scenario.ts';
import type { Abilities } from './abilities.ts';
import { answered } from './answered.ts';
import { offsetAt, rangeOf, type TextOf } from './convert.ts';
import { toFoldingRange, toHighlight, toLocations, toRename } from './convert-navigation.ts';
import type { Evaluated } from './evaluations.ts';
import type { Serving } from './serving.ts';

export function navigationCapabilities({ prepareRename: canPrepare }: Abilities): ServerCapabilities {
  return {
    definitionProvider: true,
    referencesProvider: true,
    documentHighlightProvider: true,
    renameProvider: canPrepare ? { prepareProvider: true } : true,
    foldingRangeProvider: true,
  };
}

/** Answers the requests from now on. */
export function answerNavigation({ connection, documents, evaluations, abilities, readingOf, log }: Serving): void {
  connection.onDefinition(
    answered('Definition', [], log, async ({ textDocument, position }) => {
      const own = await evaluations.current(textDocument.uri);
      if (!own?.scenario) return [];
      const places = definition(own.scenario.files, own.address, offsetAt(own.document, position));
      return toLocations(places, own.textOf);
    }),
  );

  connection.onReferences(
    answered('References', [], log, async ({ textDocument, position, context }) => {
      const reach = await reachOf(textDocument.uri);
      if (!reach) return [];
      const { own, files, textOf } = reach;
      const offset = offsetAt(own.document, position);
      return toLocations(references(files, own.address, offset, context.includeDeclaration), textOf);
    }),
  );

  connection.onDocumentHighlight(
    answered('Highlights', [], log, async ({ textDocument, position }) => {
      const own = await evaluations.current(textDocument.uri);
      if (!own?.scenario) return [];
      const { document } = own;
      const found = highlights(own.scenario.files, own.address, offsetAt(document, position));
      return found.map((highlight) => toHighlight(highlight, document));
    }),
  );

  connection.onPrepareRename(
    answered('Rename', null, log, async ({ textDocument, position }) => {
      const reach = await reachOf(textDocument.uri);
      if (!reach) return null;
      const { own, files } = reach;
      const offer = prepareRename(files, own.address, offsetAt(own.document, position));
      if ('refusal' in offer) return refused(offer.refusal);
      return { range: rangeOf(own.document, offer.place.start, offer.place.end), placeholder: offer.name };
    }),
  );

  connection.onRenameRequest(
    answered('Rename', null, log, async ({ textDocument, position, newName }) => {
      const reach = await reachOf(textDocument.uri);
      if (!reach) return null;
      const { own, files, textOf } = reach;
      const edits = rename(files, own.address, offsetAt(own.document, position), newName);
      return 'refusal' in edits ? refused(edits.refusal) : toRename(edits, textOf, abilities().versionedEdits);
    }),
  );

  connection.onFoldingRanges(
    answered('Folding', [], log, ({ textDocument }) => {
      const document = documents.get(textDocument.uri);
      if (!document) return Promise.resolve([]);
      const tree = parse(document.getText(), isUnitWord, readingOf(document));
      return Promise.resolve(folding(tree).map(toFoldingRange));
    }),
  );

  interface Reach {
    readonly own: Evaluated;
    readonly files: readonly EvaluatedFile[];
    readonly textOf: TextOf;
  }

  /** The document's own scenario and those of open documents that use it; null when it is not open. */
  async function reachOf(uri: string): Promise<Reach | null> {
    const first = await evaluations.current(uri);
    if (!first?.scenario) return null;
    const users = evaluations.readersOf(first.address).filter((reader) => reader !== uri);
    const others = await Promise.all(users.map((reader) => evaluations.current(reader)));
    // Again, because the text may have changed while the others were worked out.
    const own = await evaluations.current(uri);
    if (!own?.scenario) return null;
    const all = [own, ...others.filter((other) => other !== null)];
    return {
      own,
      files: filesOf(all.flatMap(({ scenario }) => scenario ?? [])),
      textOf: (path) => all.map(({ textOf }) => textOf(path)).find((text) => text !== undefined),
    };
  }
}

function refused(message: string): ResponseError {
  return new ResponseError(LSPErrorCodes.RequestFailed, message);
}
