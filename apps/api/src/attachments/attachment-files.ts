import { createHash, randomBytes } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readdir, rename, rm, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import { uploadsDir } from '../database/data-folder.js';
import { SNIFFED_BYTES } from './file-kinds.js';

const PART = '.part';

/** Uploaded files on disk, under names nobody can guess; a name without `.part` is a whole file. */
export class AttachmentFiles {
  private readonly uploads: string;
  private readonly thumbs: string;

  constructor(dataDir: string) {
    this.uploads = uploadsDir(dataDir);
    // beside what is backed up: a thumb can be drawn again
    this.thumbs = join(dataDir, 'thumbs');
  }

  /** What a stopped upload left behind. */
  async sweep(): Promise<void> {
    await mkdir(this.thumbs, { recursive: true });
    for (const dir of [this.uploads, this.thumbs]) {
      for (const name of await readdir(dir)) if (name.endsWith(PART)) await rm(join(dir, name), { force: true });
    }
  }

  path(storedName: string): string {
    return join(this.uploads, storedName);
  }

  thumbPath(storedName: string): string {
    return join(this.thumbs, `${storedName}.webp`);
  }

  newName(extension: string): string {
    return `${randomBytes(20).toString('hex')}.${extension}`;
  }

  newPart(): string {
    return join(this.uploads, `${randomBytes(20).toString('hex')}${PART}`);
  }

  async beginning(path: string): Promise<Uint8Array> {
    const handle = await open(path);
    try {
      const { buffer, bytesRead } = await handle.read(Buffer.alloc(SNIFFED_BYTES), 0, SNIFFED_BYTES, 0);
      return buffer.subarray(0, bytesRead);
    } finally {
      await handle.close();
    }
  }

  /** On the disk for good, bytes and name, before anything refers to it. */
  async keep(part: string, storedName: string): Promise<{ sizeBytes: number; sha256: string }> {
    await syncPath(part);
    const [{ size }, sha256] = [await stat(part), await hashOf(part)];
    await rename(part, this.path(storedName));
    await syncPath(this.uploads);
    return { sizeBytes: size, sha256 };
  }

  async remove(path: string): Promise<void> {
    await rm(path, { force: true });
  }

  /** Whether the file is there and still what was taken in; a damaged one is not served as if it were good. */
  async isWhole(storedName: string, sizeBytes: number, sha256: string): Promise<boolean> {
    const path = this.path(storedName);
    const found = await stat(path).catch(() => null);
    return found?.size === sizeBytes && (await hashOf(path)) === sha256;
  }
}

async function syncPath(path: string): Promise<void> {
  const handle = await open(path, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function hashOf(path: string): Promise<string> {
  const hash = createHash('sha256');
  await pipeline(createReadStream(path), hash);
  return hash.digest('hex');
}
