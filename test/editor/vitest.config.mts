import { defineConfig } from 'vitest/config';

// The tests that look at the editor's window. Each file opens an editor of its own, so they run one after the other.
export default defineConfig({
  test: {
    include: ['test/editor/window/**/*.test.ts'],
    setupFiles: ['test/editor/window/failures.ts'],
    fileParallelism: false,
    testTimeout: 60_000,
    hookTimeout: 60_000,
    expect: { poll: { timeout: 20_000, interval: 200 } },
  },
});
