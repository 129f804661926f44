import { defineConfig, mergeConfig } from 'vitest/config';
import viteConfig from './vite.config.ts';

export default mergeConfig(
  viteConfig,
  defineConfig({
    test: {
      projects: [
        { extends: true, test: { name: 'unit', environment: 'node', include: ['tests/unit/**/*.test.ts'] } },
        {
          extends: true,
          test: { name: 'component', environment: 'happy-dom', include: ['tests/component/**/*.test.ts'] },
        },
        {
          extends: true,
          test: {
            name: 'api',
            environment: 'node',
            include: ['tests/api/**/*.test.ts'],
            globalSetup: ['tests/support/database.global.ts'],
            fileParallelism: false,
            sequence: { groupOrder: 1 },
            testTimeout: 20_000,
            hookTimeout: 60_000,
          },
        },
        {
          extends: true,
          test: {
            name: 'operations',
            environment: 'node',
            include: ['tests/operations/**/*.test.ts'],
            fileParallelism: false,
            sequence: { groupOrder: 2 },
            testTimeout: 60_000,
            hookTimeout: 60_000,
          },
        },
      ],
    },
  }),
);
