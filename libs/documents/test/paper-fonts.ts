import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import type { PaperFonts } from '../src/index.js';

const folder = join(dirname(createRequire(import.meta.url).resolve('dejavu-fonts-ttf/package.json')), 'ttf');

/** Fresh bytes, so that nothing parsed earlier is met again. */
export function freshFonts(): PaperFonts {
  const read = (name: string) => new Uint8Array(readFileSync(join(folder, name)));
  return { regular: read('DejaVuSansCondensed.ttf'), bold: read('DejaVuSansCondensed-Bold.ttf') };
}

export const FONTS = freshFonts();
