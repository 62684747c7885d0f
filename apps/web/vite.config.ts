import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import { defineConfig } from 'vite';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig(({ mode }) => ({
  root: here('.'),
  // Blueprint tests a bare NODE_ENV identifier; without this its development warnings run in production.
  define: { NODE_ENV: JSON.stringify(mode) },
  plugins: [react()],
  resolve: {
    alias: [
      { find: /^@shared\/(.*)$/, replacement: here('../../shared/src/$1.ts') },
      { find: /^@libs\/([^/]+)$/, replacement: here('../../libs/$1/src/index.ts') },
    ],
  },
  build: {
    outDir: here('../../dist/web'),
    emptyOutDir: true,
    target: 'es2022',
    sourcemap: false,
    rolldownOptions: {
      output: {
        codeSplitting: {
          groups: [
            { name: 'react', test: /node_modules[\\/](react|react-dom|scheduler|react-router|react-router-dom)[\\/]/, priority: 20 },
            // icons stay out: a group over them would pull every icon path into the first load
            { name: 'blueprint', test: /node_modules[\\/]@blueprintjs[\\/](?!icons)/, priority: 10 },
          ],
        },
      },
    },
  },
  server: {
    host: '127.0.0.1',
    port: Number(process.env['WEB_PORT'] ?? 5173),
    strictPort: true,
    proxy: { '/api': process.env['API_ORIGIN'] ?? 'http://127.0.0.1:3100' },
  },
}));
