import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));
const alias = [
  { find: /^@shared\/(.*)$/, replacement: here('./shared/src/$1.ts') },
  { find: /^@libs\/([^/]+)$/, replacement: here('./libs/$1/src/index.ts') },
];

export default defineConfig({
  test: {
    coverage: { provider: 'v8', include: ['apps/*/src/**', 'libs/*/src/**', 'shared/src/**', 'mocks/**'] },
    projects: [
      { resolve: { alias }, test: { name: 'libs', include: ['{libs,shared}/**/*.spec.ts'], environment: 'node' } },
      {
        resolve: { alias },
        test: {
          name: 'api',
          include: ['apps/api/**/*.spec.ts', 'apps/run/**/*.spec.ts', 'mocks/**/*.spec.ts'],
          environment: 'node',
          setupFiles: [here('./apps/api/test/setup.ts')],
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        plugins: [react()],
        resolve: { alias },
        define: { NODE_ENV: JSON.stringify('test') },
        test: { name: 'web', include: ['apps/web/src/**/*.spec.{ts,tsx}'], environment: 'jsdom', setupFiles: [here('./apps/web/test/setup.ts')], testTimeout: 30_000 },
      },
    ],
  },
});
