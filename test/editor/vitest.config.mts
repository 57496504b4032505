import { defineConfig } from 'vitest/config';

// The tests that look at the editor's window. Each file opens an editor of its own, so they run one after the other.
export default defineConfig({
  test: {
    include: ['test/editor/window/**/*.test.ts'],
    fileParallelism: false,
    testTimeout: 90_000,
    hookTimeout: 90_000,
    expect: { poll: { timeout: 20_000, interval: 200 } },
  },
});
