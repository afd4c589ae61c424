import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const at = (folder: string) => fileURLToPath(new URL(folder, import.meta.url));

/** The client's own specs run by `ng test`; these are the ones without Angular. */
export default defineConfig({
  resolve: { alias: { '@shared': at('./shared'), '@api': at('./api'), '@seeds': at('./seeds') } },
  test: {
    projects: [
      { extends: true, test: { name: 'shared', include: ['shared/**/*.spec.ts'] } },
      {
        extends: true,
        test: {
          name: 'reference',
          include: ['tests/reference/**/*.spec.ts', 'tests/hunts/**/*.spec.ts'],
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: { name: 'arrows', include: ['tests/arrows/**/*.spec.ts'], testTimeout: 60_000 },
      },
      {
        extends: true,
        test: {
          name: 'api',
          globalSetup: './tests/api/cluster.ts',
          include: [
            'api/**/*.spec.ts',
            'seeds/**/*.spec.ts',
            'tests/api/**/*.spec.ts',
            'tests/security/**/*.spec.ts',
          ],
          exclude: ['tests/security/enumeration.spec.ts'],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          // Watches the clock: runs while nothing else does.
          name: 'timing',
          globalSetup: './tests/api/cluster.ts',
          include: ['tests/security/enumeration.spec.ts'],
          testTimeout: 180_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          globalSetup: './tests/api/cluster.ts',
          include: ['tests/browser/**/*.spec.ts'],
          testTimeout: 180_000,
          hookTimeout: 180_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
