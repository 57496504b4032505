// The requests for colours by meaning, of a whole document or of the part that is seen, and their encoding: five numbers a
// token, each place told from the one before. Invariant: the legend told to the client is the order of the feature's lists.
// Source: Language Server Protocol 3.18, "Semantic Tokens".
import { SemanticTokensBuilder, type SemanticTokens, type ServerCapabilities } from 'vscode-languageserver';
import type { TextDocument } from 'vscode-languageserver-textdocument';
import { semanticTokens, TOKEN_MODIFIERS, TOKEN_TYPES, type SemanticToken } from '../features/semantic-tokens.ts';
import type { Abilities } from './abilities.ts';
import { answered } from './answered.ts';
import { offsetAt } from './convert.ts';
import type { Serving } from './serving.ts';

export function semanticTokensCapabilities({ semanticTokens: isAble }: Abilities): ServerCapabilities {
  if (!isAble) return {};
  const legend = { tokenTypes: [...TOKEN_TYPES], tokenModifiers: [...TOKEN_MODIFIERS] };
  return { semanticTokensProvider: { legend, full: true, range: true } };
}

/** Answers the requests from now on. */
export function answerSemanticTokens({ connection, evaluations, log }: Serving): void {
  const nothing: SemanticTokens = { data: [] };

  connection.languages.semanticTokens.on(
    answered('Colours', nothing, log, async ({ textDocument }) => {
      const evaluated = await evaluations.current(textDocument.uri);
      if (!evaluated?.scenario) return nothing;
      return encoded(semanticTokens(evaluated.scenario, evaluated.address), evaluated.document);
    }),
  );

  connection.languages.semanticTokens.onRange(
    answered('Colours', nothing, log, async ({ textDocument, range }) => {
      const evaluated = await evaluations.current(textDocument.uri);
      if (!evaluated?.scenario) return nothing;
      const { scenario, address, document } = evaluated;
      const [from, to] = [offsetAt(document, range.start), offsetAt(document, range.end)];
      return encoded(semanticTokens(scenario, address, from, to), document);
    }),
  );
}

function encoded(tokens: readonly SemanticToken[], document: TextDocument): SemanticTokens {
  const builder = new SemanticTokensBuilder();
  for (const { start, end, type, modifiers } of tokens) {
    const { line, character } = document.positionAt(start);
    const bits = modifiers.reduce((set, modifier) => set | (1 << TOKEN_MODIFIERS.indexOf(modifier)), 0);
    builder.push(line, character, end - start, TOKEN_TYPES.indexOf(type), bits);
  }
  return builder.build();
}
