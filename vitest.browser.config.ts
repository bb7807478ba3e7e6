import { defineConfig } from 'vitest/config';

/** The built product in Debian's Chromium: one file at a time, for they share the screen. */
export default defineConfig({
  test: {
    include: ['tests/browser/**/*.spec.ts'],
    environment: 'node',
    fileParallelism: false,
    testTimeout: 60_000,
    hookTimeout: 60_000,
  },
});
