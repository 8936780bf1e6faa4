import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));

export default defineConfig({
  resolve: { alias: [{ find: /^@\//, replacement: root }] },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'unit',
          environment: 'node',
          include: ['{app,lib,models,workers,tests}/**/*.test.ts', 'proxy.test.ts'],
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
