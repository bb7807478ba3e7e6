import { defineConfig } from 'vitest/config';

/** Every spec that runs in Node; those below tests/browser need Chromium and run on their own. */
export default defineConfig({
  test: {
    include: ['{api,worker,shared,fixtures,tests}/**/*.spec.ts'],
    exclude: ['tests/browser/**', 'node_modules/**'],
    environment: 'node',
    testTimeout: 20_000,
    hookTimeout: 30_000,
    maxWorkers: 2,
  },
});
