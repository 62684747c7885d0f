import { stat } from 'node:fs/promises';
import sharp from 'sharp';
import { AppError } from '../http/app-error.js';
import type { FileKind } from './file-kinds.js';

/** A good phone's photo has some fifty million pixels; larger ones only fill the memory. */
const MOST_PIXELS = 64_000_000;
const LONGEST_SIDE_PX = 4000;
const THUMB_SIDE_PX = 320;
const NO_PICTURE = 'This is no picture we can read. Take it again, or send it as PNG, JPEG or WebP.';

// one picture at a time, and nothing kept: the memory of the shop's small machine is for its data
sharp.cache(false);
sharp.concurrency(1);
let last: Promise<unknown> = Promise.resolve();

function oneAtATime<T>(work: () => Promise<T>): Promise<T> {
  const result = last.then(work);
  last = result.catch(() => undefined);
  return result;
}

const open = (path: string) => sharp(path, { failOn: 'error', limitInputPixels: MOST_PIXELS, sequentialRead: true });

/**
 * Drawn anew from its pixels: upright, at most 4000 px, without the camera's data (place, time, owner), and without
 * whatever else hung on the file.
 */
export function redraw(kind: FileKind, from: string, to: string): Promise<void> {
  return oneAtATime(async () => {
    try {
      const { width, height } = await sharp(from, { limitInputPixels: false }).metadata();
      if (width * height > MOST_PIXELS) throw new AppError('FILE_NOT_ACCEPTED', 'This picture has more than 64 million pixels. Take it with a smaller resolution.');
      const picture = open(from).autoOrient().resize({ width: LONGEST_SIDE_PX, height: LONGEST_SIDE_PX, fit: 'inside', withoutEnlargement: true });
      await (kind === 'image/png' ? picture.png() : kind === 'image/webp' ? picture.webp({ quality: 88 }) : picture.jpeg({ quality: 88 })).toFile(to);
    } catch (error) {
      if (error instanceof AppError || isOfTheDisk(error)) throw error;
      throw new AppError('FILE_NOT_ACCEPTED', NO_PICTURE, { cause: error });
    }
  });
}

export const thumb = (from: string, to: string): Promise<void> =>
  oneAtATime(async () => {
    await stat(from);
    await open(from).resize({ width: THUMB_SIDE_PX, height: THUMB_SIDE_PX, fit: 'inside', withoutEnlargement: true }).webp({ quality: 78 }).toFile(to);
  });

function isOfTheDisk(error: unknown): boolean {
  return ['ENOSPC', 'EDQUOT', 'EROFS', 'EACCES', 'EMFILE'].includes(String((error as NodeJS.ErrnoException).code)) || /no space left/i.test(String((error as Error).message));
}
