// The one wrapper around every request: a person never sees a request fail. Lets the messages behind it arrive, stops where
// the request was cancelled, and turns an exception into an empty answer and a line in the log. Knows no feature.
// Invariant: every request is answered, once. Source: Language Server Protocol 3.18, "Cancellation Support".
import { LSPErrorCodes, ResponseError, type CancellationToken } from 'vscode-languageserver';

type Answer<Result> = Result | ResponseError;

/**
 * The handler, made safe. It is called with the client's parameters, of which nothing is certain; an exception that comes
 * of their shape is answered like any other, by `empty`.
 */
export function answered<Params, Result>(
  name: string,
  empty: Result,
  log: (message: string) => void,
  handler: (params: Params) => Promise<Result>,
): (params: Params, token: CancellationToken) => Promise<Answer<Result>> {
  return async (params, token) => {
    try {
      // A cancellation behind this request in the queue is seen only after a turn of the event loop.
      await turn();
      if (token.isCancellationRequested) return cancelled();
      const result = await handler(params);
      return token.isCancellationRequested ? cancelled() : result;
    } catch (error) {
      log(`${name} failed: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`);
      return empty;
    }
  };
}

function cancelled(): ResponseError {
  return new ResponseError(LSPErrorCodes.RequestCancelled, 'The request was cancelled.');
}

/** Resolves once the messages that wait have been taken in. */
export function turn(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 0));
}
