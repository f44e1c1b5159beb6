import { defineConfig } from 'vitest/config';

const testFiles = 'test/**/*.test.{ts,tsx}';
const longFiles = 'test/**/*.long.test.{ts,tsx}';
const referenceFiles = 'test/reference/**/*.test.ts';
const browserFiles = 'test/e2e/**/*.test.ts';
const clientFiles = 'test/web/**/*.test.{ts,tsx}';
/** Those that may use the test database; the launcher's own tests don't. */
const databaseFiles = [
  'test/api/*.test.ts',
  'test/api/!(start)/**/*.test.ts',
  'test/security/**/*.test.ts',
];

/**
 * One project for each part of `npm test`; `npm run test:api` and the like set up what a part needs.
 * A test file in no other project belongs to `unit`, so none is left out.
 */
export default defineConfig({
  test: {
    // `.only` would leave the other tests out without a word.
    allowOnly: false,
    projects: [
      {
        test: {
          name: 'unit',
          include: [testFiles],
          exclude: [longFiles, referenceFiles, browserFiles, clientFiles, ...databaseFiles],
          setupFiles: 'test/support/repeatable-properties.ts',
          testTimeout: 30_000,
        },
      },
      {
        test: {
          name: 'web',
          include: [clientFiles],
          exclude: [longFiles],
          environment: 'jsdom',
        },
      },
      {
        test: {
          name: 'reference',
          include: [referenceFiles],
          exclude: [longFiles],
          testTimeout: 120_000,
        },
      },
      {
        test: {
          name: 'api',
          include: databaseFiles,
          exclude: [longFiles],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        test: {
          name: 'e2e',
          include: [browserFiles],
          exclude: [longFiles],
          globalSetup: 'test/e2e/global-setup.ts',
          // One browser at a time: the map is drawn in software.
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
      {
        test: {
          name: 'long',
          include: [longFiles],
          testTimeout: 3_600_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
