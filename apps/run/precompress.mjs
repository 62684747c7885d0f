import { readdir, readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';
import { inRoot } from './paths.mjs';

const brotli = promisify(brotliCompress);
const zip = promisify(gzip);

for (const entry of await readdir(inRoot('dist/web'), { recursive: true, withFileTypes: true })) {
  if (!entry.isFile() || !/\.(js|css|html|svg|json|webmanifest)$/.test(entry.name)) continue;
  const path = join(entry.parentPath ?? entry.path, entry.name);
  const bytes = await readFile(path);
  if (bytes.length < 1024) continue;
  const [small, old] = await Promise.all([
    brotli(bytes, { params: { [constants.BROTLI_PARAM_QUALITY]: 9, [constants.BROTLI_PARAM_SIZE_HINT]: bytes.length } }),
    zip(bytes, { level: 9 }),
  ]);
  await Promise.all([writeFile(`${path}.br`, small), writeFile(`${path}.gz`, old)]);
}
