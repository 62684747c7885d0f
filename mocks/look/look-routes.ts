import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import type { FastifyInstance } from 'fastify';
import { STYLE } from './style.js';

const require = createRequire(import.meta.url);

/** Style and type for the pages, from this very server. */
export function lookRoutes(app: FastifyInstance): void {
  app.get('/_look/style.css', async (_request, reply) => reply.type('text/css; charset=utf-8').header('cache-control', 'max-age=3600').send(STYLE));
  for (const weight of ['400', '600']) {
    app.get(`/_look/${weight}.woff2`, async (_request, reply) =>
      reply
        .type('font/woff2')
        .header('cache-control', 'max-age=86400')
        .send(await readFile(require.resolve(`@fontsource/noto-sans/files/noto-sans-latin-${weight}-normal.woff2`))),
    );
  }
}
