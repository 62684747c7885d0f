import { createHash } from 'node:crypto';
import { open, readFile, rename } from 'node:fs/promises';
import { join } from 'node:path';
import { papersDir } from '../database/data-folder.js';

/** Drawn papers on disk, under their identifier; written whole or not at all. */
export class PaperFiles {
  constructor(private readonly dataDir: string) {}

  private path(paperId: string): string {
    return join(papersDir(this.dataDir), `${paperId}.pdf`);
  }

  async read(paperId: string): Promise<Buffer | undefined> {
    return readFile(this.path(paperId)).catch((error: NodeJS.ErrnoException) => {
      if (error.code === 'ENOENT') return undefined;
      throw error;
    });
  }

  async write(paperId: string, bytes: Uint8Array): Promise<string> {
    const part = `${this.path(paperId)}.part`;
    const handle = await open(part, 'w');
    try {
      await handle.writeFile(bytes);
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(part, this.path(paperId));
    return sha256(bytes);
  }
}

export const sha256 = (bytes: Uint8Array | string) => createHash('sha256').update(bytes).digest('hex');
