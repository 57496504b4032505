// Every request is answered: by its result, by "cancelled", or by the empty answer and a line in the log.
import { CancellationTokenSource, LSPErrorCodes, ResponseError } from 'vscode-languageserver';
import { describe, expect, it } from 'vitest';
import { answered } from '../../../server/lsp/answered.ts';

const logged: string[] = [];
const log = (message: string): void => void logged.push(message);
const { token } = new CancellationTokenSource();

describe('a request', () => {
  it('is answered by its handler', async () => {
    await expect(answered('Hover', null, log, (n: number) => Promise.resolve(n + 1))(1, token)).resolves.toBe(2);
  });

  it('whose handler throws is answered empty and logged by name', async () => {
    const fails = answered('Outline', [], log, () => {
      throw new Error('a slip of ours');
    });
    await expect(fails(1, token)).resolves.toEqual([]);
    expect(logged.at(-1)).toMatch(/^Outline failed: Error: a slip of ours/);
  });

  it('whose parameters are misshapen is answered empty', async () => {
    const handler = answered('Hover', null, log, ({ position }: { position: { line: number } }) =>
      Promise.resolve(position.line),
    );
    // The shape is what this is about: a client may send anything.
    await expect(handler({} as { position: { line: number } }, token)).resolves.toBeNull();
  });

  it.each([
    ['before it starts', 0],
    ['while it runs', 20],
  ])('that is cancelled %s says so', async (_, afterMs) => {
    const source = new CancellationTokenSource();
    let started = 0;
    const handler = answered('Hover', null, log, async () => {
      started++;
      await new Promise((resolve) => setTimeout(resolve, 60));
      return 1;
    });
    const answer = handler(undefined, source.token);
    if (afterMs === 0) source.cancel();
    else setTimeout(() => source.cancel(), afterMs);
    const error = await answer;
    expect(error).toBeInstanceOf(ResponseError);
    expect(error).toMatchObject({ code: LSPErrorCodes.RequestCancelled });
    expect(started).toBe(afterMs === 0 ? 0 : 1);
  });
});
