// The requests of help while typing: completion, what is shown beside an offer, and the signature of the function that is
// being called. Each asks one feature and converts its answer. Invariant: a list that opens by itself, after a blank or a
// sign, opens only where something definite belongs.
import {
  CompletionTriggerKind,
  type CompletionItem,
  type CompletionList,
  type ServerCapabilities,
  type SignatureHelp,
} from 'vscode-languageserver';
import { completion } from '../features/completion.ts';
import { completionDocumentation } from '../features/completion-documentation.ts';
import { signatureAt } from '../features/completion-functions.ts';
import { answered } from './answered.ts';
import { addressOf } from './addresses.ts';
import { offsetAt } from './convert.ts';
import { subjectOf, toCompletionList, toDocumentation, toSignatureHelp } from './convert-completion.ts';
import type { Serving } from './serving.ts';

export const COMPLETION_CAPABILITIES: ServerCapabilities = {
  completionProvider: {
    triggerCharacters: [' ', ':', '/', "'"],
    resolveProvider: true,
    completionItem: { labelDetailsSupport: true },
  },
  signatureHelpProvider: { triggerCharacters: ['('], retriggerCharacters: [','] },
};

/** Answers the requests from now on. */
export function answerCompletion({ connection, documents, evaluations, abilities, log }: Serving): void {
  connection.onCompletion(
    answered('Completion', null, log, async ({ textDocument, position, context }): Promise<CompletionList | null> => {
      const evaluated = await evaluations.current(textDocument.uri);
      if (!evaluated?.scenario) return null;
      const { scenario, address, document, uri } = evaluated;
      const found = completion(scenario, address, offsetAt(document, position));
      const opensItself =
        context?.triggerKind === CompletionTriggerKind.TriggerCharacter && context.triggerCharacter !== "'";
      if (opensItself && !found.isExpected) return null;
      return toCompletionList(found, document, uri, abilities().completion);
    }),
  );

  connection.onCompletionResolve(async (item, token) => {
    const resolve = answered('Documentation', item, log, async (asked: CompletionItem): Promise<CompletionItem> => {
      const behind = subjectOf(asked.data);
      const evaluated = behind && (await evaluations.current(behind.uri));
      if (!behind || !evaluated?.scenario) return asked;
      const documentation = completionDocumentation(evaluated.scenario, addressOf(behind.uri), behind.subject);
      if (!documentation) return asked;
      return { ...asked, documentation: toDocumentation(documentation, abilities().completion.markdown) };
    });
    return resolve(item, token);
  });

  connection.onSignatureHelp(
    answered('Signature', null, log, ({ textDocument, position }): Promise<SignatureHelp | null> => {
      const document = documents.get(textDocument.uri);
      const found = document && signatureAt({ text: document.getText() }, offsetAt(document, position));
      return Promise.resolve(found ? toSignatureHelp(found, abilities().completion.markdown) : null);
    }),
  );
}
