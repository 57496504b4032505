// Looks at documents: once after a pause, never two at a time, and never forgetting the last change.
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Schedule } from '../../../server/lsp/schedule.ts';

beforeEach(() => {
  vi.useFakeTimers();
});
afterEach(() => {
  vi.useRealTimers();
});

describe('the schedule', () => {
  it('waits for a pause in the typing', async () => {
    const looked: string[] = [];
    const schedule = new Schedule((uri) => Promise.resolve(void looked.push(uri)));
    for (let key = 0; key < 10; key++) {
      schedule.after(100, 'a');
      await vi.advanceTimersByTimeAsync(50);
    }
    expect(looked).toEqual([]);
    await vi.advanceTimersByTimeAsync(100);
    expect(looked).toEqual(['a']);
  });

  it('keeps documents apart', async () => {
    const looked: string[] = [];
    const schedule = new Schedule((uri) => Promise.resolve(void looked.push(uri)));
    schedule.after(100, 'a');
    schedule.after(50, 'b');
    await vi.advanceTimersByTimeAsync(100);
    expect(looked).toEqual(['b', 'a']);
  });

  it('looks again, once, when a document changed while it was looked at', async () => {
    const ends: (() => void)[] = [];
    const schedule = new Schedule(() => new Promise((resolve) => ends.push(resolve)));
    schedule.after(0, 'a');
    await vi.advanceTimersByTimeAsync(0);
    schedule.after(0, 'a');
    await vi.advanceTimersByTimeAsync(0);
    schedule.after(0, 'a');
    await vi.advanceTimersByTimeAsync(0);
    expect(ends).toHaveLength(1);
    ends[0]?.();
    await vi.advanceTimersByTimeAsync(0);
    expect(ends).toHaveLength(2);
    ends[1]?.();
    await vi.advanceTimersByTimeAsync(1000);
    expect(ends).toHaveLength(2);
  });

  it('does nothing more for a document that was dropped', async () => {
    const looked: string[] = [];
    const schedule = new Schedule((uri) => Promise.resolve(void looked.push(uri)));
    schedule.after(100, 'a');
    schedule.after(100, 'b');
    schedule.drop('a');
    schedule.dropAll();
    await vi.advanceTimersByTimeAsync(1000);
    expect(looked).toEqual([]);
  });
});
