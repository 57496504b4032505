// The memo store: an answer is found by exactly what it was made from, and goes with the last user of it.
import { describe, expect, it } from 'vitest';
import { MemoStore, type Key } from '../../../server/jobs/memo.ts';

const nothingLookedUp = new Map<string, Key>();
const noKeys = (): null => null;

describe('recalling', () => {
  it('finds an answer by its question', () => {
    const run = new MemoStore<string>().run('a');
    const kept = run.keep('2 + 2', nothingLookedUp, '4');
    expect(run.recall('2 + 2', noKeys)).toBe(kept);
    expect(run.recall('2 + 3', noKeys)).toBeUndefined();
  });

  it('finds it only where all that was looked up has the key it had', () => {
    const run = new MemoStore<string>().run('a');
    const one = run.keep('x', nothingLookedUp, '1');
    const two = run.keep('x + 1', new Map<string, Key>([['x', one.key]]), '2');
    const changed = run.keep('x', new Map([['other', 'key']]), '5');
    expect(run.recall('x + 1', () => one.key)).toBe(two);
    expect(run.recall('x + 1', () => changed.key)).toBeUndefined();
    expect(run.recall('x + 1', noKeys)).toBeUndefined();
  });

  it('keeps several answers to one question apart', () => {
    const run = new MemoStore<string>().run('a');
    run.keep('x', new Map([['y', 'first']]), '1');
    run.keep('x', new Map([['y', 'second']]), '2');
    expect(run.recall('x', () => 'first')?.value).toBe('1');
    expect(run.recall('x', () => 'second')?.value).toBe('2');
  });
});

describe('keeping', () => {
  it('what the last finished run of a user used, and no more', () => {
    const store = new MemoStore<string>();
    const first = store.run('a');
    first.keep('x', nothingLookedUp, '1');
    first.keep('y', nothingLookedUp, '2');
    first.finish();
    const second = store.run('a');
    second.recall('x', noKeys);
    second.keep('z', nothingLookedUp, '3');
    second.finish();
    expect(store.size).toBe(2);
    expect(store.run('a').recall('y', noKeys)).toBeUndefined();
  });

  it('what another user uses, too', () => {
    const store = new MemoStore<string>();
    const first = store.run('a');
    first.keep('x', nothingLookedUp, '1');
    first.finish();
    const second = store.run('b');
    second.recall('x', noKeys);
    second.finish();
    store.drop('a');
    expect(store.size).toBe(1);
    store.drop('b');
    expect(store.size).toBe(0);
  });

  it('what a run found out before it was given up', () => {
    const store = new MemoStore<string>();
    const first = store.run('a');
    first.keep('x', nothingLookedUp, '1');
    first.finish();
    const second = store.run('a');
    second.keep('y', nothingLookedUp, '2');
    second.abandon();
    const third = store.run('a');
    expect([third.recall('x', noKeys)?.value, third.recall('y', noKeys)?.value]).toEqual(['1', '2']);
    third.finish();
    expect(store.size).toBe(2);
    store.run('a').finish();
    expect(store.size).toBe(0);
  });
});
