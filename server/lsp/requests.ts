// The list of what a client may ask: for each request one feature, the evaluation it needs, and the conversion of its
// answer. A new feature is one entry here. Works nothing out itself. Invariant: positions are converted with the very
// text the answer was made from.
import {
  CodeActionKind,
  type CodeAction,
  type Diagnostic,
  type DocumentSymbol,
  type Hover,
  type ServerCapabilities,
  type SymbolInformation,
  type TextEdit,
} from 'vscode-languageserver';
import { codeActions } from '../features/code-actions.ts';
import { diagnostics } from '../features/diagnostics.ts';
import { formatting, rangeFormatting } from '../features/formatting.ts';
import { hover } from '../features/hover.ts';
import { symbols } from '../features/symbols.ts';
import type { Abilities } from './abilities.ts';
import { answered } from './answered.ts';
import {
  offsetAt,
  toCodeAction,
  toDiagnostic,
  toDocumentSymbol,
  toHover,
  toSymbolInformation,
  toTextEdit,
} from './convert.ts';
import { answerCompletion, COMPLETION_CAPABILITIES } from './completion-requests.ts';
import { answerNavigation, navigationCapabilities } from './navigation-requests.ts';
import { answerSemanticTokens, semanticTokensCapabilities } from './semantic-tokens-requests.ts';
import type { Serving } from './serving.ts';

/** What the client is told can be asked. */
export function requestCapabilities(abilities: Abilities): ServerCapabilities {
  return {
    hoverProvider: true,
    documentSymbolProvider: true,
    documentFormattingProvider: true,
    documentRangeFormattingProvider: true,
    codeActionProvider: { codeActionKinds: [CodeActionKind.QuickFix] },
    ...COMPLETION_CAPABILITIES,
    ...navigationCapabilities(abilities),
    ...semanticTokensCapabilities(abilities),
  };
}

/** Answers the requests from now on. */
export function answerRequests(serving: Serving): void {
  const { connection, documents, evaluations, viewedWork, abilities, settings, log } = serving;
  answerCompletion(serving);
  answerNavigation(serving);
  answerSemanticTokens(serving);

  connection.onHover(
    answered('Hover', null, log, async ({ textDocument, position }): Promise<Hover | null> => {
      // What rests on long work has nothing to show before that is done: a little patience gives more than an empty answer.
      const evaluated =
        (await inTime(evaluations.current(textDocument.uri, () => undefined))) ??
        (await evaluations.current(textDocument.uri));
      if (!evaluated?.scenario) return null;
      const offset = offsetAt(evaluated.document, position);
      let found = hover(evaluated.scenario, evaluated.address, offset);
      if (found?.awaits && found.awaits.length > 0) {
        await viewedWork.bring(textDocument.uri, found.awaits);
        found = hover(evaluated.scenario, evaluated.address, offset);
      }
      return found && toHover(found, evaluated.document, abilities().markdown);
    }),
  );

  connection.onDocumentSymbol(
    answered('Outline', [], log, async ({ textDocument }): Promise<DocumentSymbol[] | SymbolInformation[]> => {
      const evaluated = await evaluations.current(textDocument.uri);
      if (!evaluated?.scenario) return [];
      const outline = symbols(evaluated.scenario, evaluated.address);
      return abilities().outlineTree
        ? outline.map((symbol) => toDocumentSymbol(symbol, evaluated.document))
        : outline.map((symbol) => toSymbolInformation(symbol, evaluated.uri, evaluated.document));
    }),
  );

  connection.onDocumentFormatting(
    answered('Formatting', [], log, ({ textDocument }): Promise<TextEdit[]> => {
      const document = documents.copy(textDocument.uri);
      const changes = document ? formatting(document.getText(), settings().largestText) : [];
      return Promise.resolve(document ? changes.map((change) => toTextEdit(change, document)) : []);
    }),
  );

  connection.onDocumentRangeFormatting(
    answered('Formatting', [], log, ({ textDocument, range }): Promise<TextEdit[]> => {
      const document = documents.copy(textDocument.uri);
      if (!document) return Promise.resolve([]);
      const [start, end] = [offsetAt(document, range.start), offsetAt(document, range.end)];
      const changes = rangeFormatting(document.getText(), start, end, settings().largestText);
      return Promise.resolve(changes.map((change) => toTextEdit(change, document)));
    }),
  );

  connection.onCodeAction(
    answered('Quick fixes', [], log, async ({ textDocument, range, context }): Promise<CodeAction[]> => {
      if (!abilities().codeActions || !wantsQuickFixes(context.only)) return [];
      const evaluated = await evaluations.current(textDocument.uri);
      if (!evaluated) return [];
      const { document, address, findings, textOf } = evaluated;
      const [start, end] = [offsetAt(document, range.start), offsetAt(document, range.end)];
      return codeActions(findings, { path: address, start, end }).flatMap((fix) => {
        const [plain] = diagnostics([fix.finding], settings().severities);
        const diagnostic: Diagnostic | null = plain ? toDiagnostic(plain, textOf, abilities().related) : null;
        return toCodeAction(fix, diagnostic, textOf, abilities().versionedEdits) ?? [];
      });
    }),
  );
}

/** As long as a hover waits for long work. */
const HOVER_MS = 400;

/** What is promised, or null where it takes too long for a person who points at something. */
async function inTime<T>(promised: Promise<T>): Promise<T | null> {
  let timer: ReturnType<typeof setTimeout> | undefined;
  const late = new Promise<null>((resolve) => {
    timer = setTimeout(() => resolve(null), HOVER_MS);
  });
  try {
    return await Promise.race([promised, late]);
  } finally {
    clearTimeout(timer);
  }
}

/** `only` names kinds; a kind stands for all kinds below it too. */
function wantsQuickFixes(only: readonly string[] | undefined): boolean {
  return !only || only.length === 0 || only.some((kind) => kind === '' || kind === CodeActionKind.QuickFix);
}
