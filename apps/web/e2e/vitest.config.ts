import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** The few journeys through the built application in a real browser; one after the other, never in a hurry. */
export default defineConfig({
  root: here('../../..'),
  resolve: {
    alias: [
      { find: /^@shared\/(.*)$/, replacement: here('../../../shared/src/$1.ts') },
      { find: /^@libs\/([^/]+)$/, replacement: here('../../../libs/$1/src/index.ts') },
    ],
  },
  test: { name: 'journeys', include: ['apps/web/e2e/**/*.journey.ts'], environment: 'node', fileParallelism: false, bail: 1, testTimeout: 240_000, hookTimeout: 180_000 },
});
