import { defineConfig } from 'vitest/config';

const root = new URL('..', import.meta.url).pathname;

// Four kinds of test. `unit` and `dom` need nothing; `integration` uses a migrated database file of its own;
// `browser` drives Chromium against the built product.
export default defineConfig({
  root,
  test: {
    passWithNoTests: false,
    // Vitest would leave one core free; most of our tests wait for a database, a child process or a browser.
    maxWorkers: 2,
    // A machine that does other work besides must not fail a test for being slow; speed has benchmarks of its own.
    testTimeout: 30_000,
    hookTimeout: 30_000,
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          include: ['src/**/*.test.ts', 'tests/static/**/*.test.ts'],
          environment: 'node',
          setupFiles: ['tests/setup/quiet-console.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'dom',
          include: ['src/**/*.test.tsx'],
          environment: 'happy-dom',
          setupFiles: ['tests/setup/quiet-console.ts', 'tests/setup/dom.ts'],
        },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          include: ['tests/integration/**/*.test.ts'],
          environment: 'node',
          globalSetup: ['tests/setup/migrated-template.ts'],
          setupFiles: ['tests/setup/own-database.ts', 'tests/setup/quiet-console.ts'],
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: ['tests/browser/**/*.test.ts'],
          environment: 'node',
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
