import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { type PaperFonts, type PaperModel, drawPaper } from '@libs/documents';

let fonts: Promise<PaperFonts> | null = null;

/** Draws a paper on the thread that calls, with the fonts that ship with the application. */
export async function drawHere(model: PaperModel): Promise<Uint8Array> {
  fonts ??= readPaperFonts();
  return drawPaper(model, await fonts);
}

/** Two font files from the package they come in, read once a thread. */
async function readPaperFonts(): Promise<PaperFonts> {
  const folder = join(dirname(createRequire(import.meta.url).resolve('dejavu-fonts-ttf/package.json')), 'ttf');
  const read = async (name: string) => new Uint8Array(await readFile(join(folder, name)));
  const [regular, bold] = await Promise.all([read('DejaVuSansCondensed.ttf'), read('DejaVuSansCondensed-Bold.ttf')]);
  return { regular, bold };
}
