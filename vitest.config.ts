import { defineConfig, mergeConfig } from 'vitest/config';
import viteConfig from './vite.config';

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
            testTimeout: 20_000,
            hookTimeout: 60_000,
          },
        },
      ],
    },
  }),
);
