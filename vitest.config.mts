import { defineConfig } from 'vitest/config';

// The tests that need no editor. Those that do have a configuration of their own in test/editor.
export default defineConfig({
  test: {
    include: ['test/**/*.test.ts'],
    exclude: ['test/editor/**', 'node_modules/**'],
    testTimeout: 20_000,
  },
});
