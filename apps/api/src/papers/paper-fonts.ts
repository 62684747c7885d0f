import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import type { PaperFonts } from '@libs/documents';

/** The font files papers are set in, from the package that ships with the application. Read once a thread. */
export async function readPaperFonts(): Promise<PaperFonts> {
  const folder = join(dirname(createRequire(import.meta.url).resolve('dejavu-fonts-ttf/package.json')), 'ttf');
  const read = async (name: string) => new Uint8Array(await readFile(join(folder, name)));
  const [regular, bold] = await Promise.all([read('DejaVuSansCondensed.ttf'), read('DejaVuSansCondensed-Bold.ttf')]);
  return { regular, bold };
}
