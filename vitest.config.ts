import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const resolve = { alias: { '@db': at('./db/index.ts'), '@': at('./src') } };

export default defineConfig({
  test: {
    projects: [
      {
        resolve,
        test: {
          name: 'unit',
          include: ['tests/unit/**/*.test.{ts,tsx}', 'tests/checks/**/*.test.ts'],
          setupFiles: ['tests/support/seed.ts'],
          testTimeout: 20_000,
        },
      },
      {
        resolve,
        test: {
          name: 'db',
          include: ['tests/db/**/*.test.ts'],
          setupFiles: ['tests/support/database-settings.ts'],
          testTimeout: 20_000,
          hookTimeout: 30_000,
        },
      },
      {
        resolve,
        test: {
          name: 'api',
          include: ['tests/api/**/*.test.ts'],
          globalSetup: ['tests/support/server.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
      {
        resolve,
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: ['tests/support/server.ts'],
          testTimeout: 120_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
      { resolve, test: { name: 'long', include: ['tests/long/**/*.test.ts'], testTimeout: 1_800_000, fileParallelism: false } },
    ],
  },
});
