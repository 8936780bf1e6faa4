import nextEnv from '@next/env';
import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));

// Under `npm test` all of it is set already; beside `npm test -- --keep` this finds the services that stay up.
nextEnv.loadEnvConfig(root, false, { info: () => undefined, error: console.error });

export default defineConfig({
  resolve: { alias: [{ find: /^@\//, replacement: root }] },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          environment: 'node',
          // Pure code shares nothing that a test could spoil; loading it once halves the time.
          isolate: false,
          include: ['{app,lib,models,workers,tests}/**/*.test.{ts,mjs}', 'proxy.test.ts'],
          exclude: ['tests/integration/**', 'tests/browser/**'],
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        plugins: [react()],
        test: {
          name: 'components',
          environment: 'jsdom',
          // React and the design are loaded once; every file cleans up after itself.
          isolate: false,
          include: ['{app,components,lib}/**/*.test.tsx'],
          setupFiles: ['tests/components/setup.ts'],
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'integration',
          environment: 'node',
          include: ['tests/integration/**/*.test.ts'],
          globalSetup: ['tests/integration/services.ts'],
          // One database for all: files run one after another.
          fileParallelism: false,
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
