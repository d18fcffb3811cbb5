import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));
// Vite 7 does not read tsconfig `paths`: keep this in step with tsconfig.json.
const alias = {
  '@stillpier/contract': at('./libs/contract/src/index.ts'),
  '@stillpier/analysis': at('./libs/analysis/src/index.ts'),
  '@stillpier/guide-log': at('./libs/guide-log/src/index.ts'),
};

export default defineConfig({
  resolve: { alias },
  test: {
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'libs',
          environment: 'node',
          include: ['libs/**/*.spec.ts', 'test/reference/**/*.spec.ts', 'test/rules/**/*.spec.ts'],
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'server',
          environment: 'node',
          include: ['server/**/*.spec.ts', 'test/api/**/*.spec.ts'],
          globalSetup: ['test/support/global-setup.ts'],
          pool: 'forks',
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
