// Used files are asked for once, are forgotten when they change, and never keep anybody waiting.
import { describe, expect, it } from 'vitest';
import { asFileAnswer, UsedFiles } from '../../../server/lsp/files.ts';

/** A client whose answers are given by hand. */
function handAnswered(): { asked: string[]; ask: (uri: string) => Promise<unknown>; answer: (value: unknown) => void } {
  const asked: string[] = [];
  const waiting: ((value: unknown) => void)[] = [];
  return {
    asked,
    ask: (uri) => {
      asked.push(uri);
      return new Promise((resolve) => waiting.push(resolve));
    },
    answer: (value) => waiting.shift()?.(value),
  };
}

describe('used files', () => {
  it('are wanted until they are fetched, and asked for once', async () => {
    const client = handAnswered();
    const files = new UsedFiles(client.ask);
    expect(files.get('a')).toBe('wanted');
    const both = Promise.all([files.fetch('a', 'file:///a'), files.fetch('a', 'file:///a')]);
    client.answer({ text: 'let a = 1' });
    await both;
    expect(files.get('a')).toEqual({ text: 'let a = 1' });
    await files.fetch('a', 'file:///a');
    expect(client.asked).toEqual(['file:///a']);
  });

  it('are wanted again once they may have changed', async () => {
    const client = handAnswered();
    const files = new UsedFiles(client.ask);
    const first = files.fetch('a', 'file:///a');
    client.answer({ text: 'old' });
    await first;
    files.forget('a');
    expect(files.get('a')).toBe('wanted');
  });

  it('do not keep an answer that was on its way when they changed', async () => {
    const client = handAnswered();
    const files = new UsedFiles(client.ask);
    const first = files.fetch('a', 'file:///a');
    files.forget('a');
    client.answer({ text: 'old' });
    await first;
    expect(files.get('a')).toBe('wanted');
    const second = files.fetch('a', 'file:///a');
    client.answer({ text: 'new' });
    await second;
    expect(files.get('a')).toEqual({ text: 'new' });
  });

  it('are unreadable when no answer comes', async () => {
    const files = new UsedFiles(() => new Promise(() => undefined), 5);
    await files.fetch('a', 'file:///a');
    expect(files.get('a')).toMatchObject({ fault: 'unreadable' });
  });

  it('are unreadable when the question fails', async () => {
    const files = new UsedFiles(() => Promise.reject(new Error('The client is gone.')));
    await files.fetch('a', 'file:///a');
    expect(files.get('a')).toEqual({ fault: 'unreadable', detail: 'The client is gone.' });
  });

  it('may be told otherwise to documents with other limits', async () => {
    const files = new UsedFiles((_, limits) =>
      Promise.resolve(limits.length > 1 ? { text: '' } : { fault: 'outside' }),
    );
    await files.fetch('a', 'file:///a', ['file:///narrow']);
    expect(files.get('a', ['file:///narrow'])).toEqual({ fault: 'outside' });
    expect(files.get('a', ['file:///narrow', 'file:///wide'])).toBe('wanted');
    await files.fetch('a', 'file:///a', ['file:///narrow', 'file:///wide']);
    expect(files.get('a', ['file:///narrow', 'file:///wide'])).toEqual({ text: '' });
    files.forget('a');
    expect(files.get('a', ['file:///narrow'])).toBe('wanted');
  });

  it('that nobody needs any more are let go', async () => {
    const files = new UsedFiles((uri) => Promise.resolve({ text: uri }));
    await files.fetch('a', 'file:///a');
    await files.fetch('b', 'file:///b');
    files.keepOnly(new Set(['b']));
    expect(files.addresses()).toEqual(['b']);
  });
});

describe('an answer from outside', () => {
  it.each([
    [{ text: '' }, { text: '' }],
    [{ text: 'let a = 1', more: true }, { text: 'let a = 1' }],
    [{ fault: 'missing' }, { fault: 'missing' }],
    [
      { fault: 'unreadable', detail: 'No.' },
      { fault: 'unreadable', detail: 'No.' },
    ],
    [{ fault: 'nonsense' }, { fault: 'unreadable' }],
    [{ text: 12 }, { fault: 'unreadable' }],
    [null, { fault: 'unreadable' }],
    [undefined, { fault: 'unreadable' }],
    ['text', { fault: 'unreadable' }],
  ])('%j is read as %j', (answer, read) => {
    expect(asFileAnswer(answer)).toEqual(read);
  });
});
