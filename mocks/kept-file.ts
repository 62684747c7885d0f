import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const WRITE_AFTER_MS = 100;

/**
 * One JSON file that follows a value in memory. Writing waits a moment so that a burst makes one write, and goes through
 * a second name so that a crash leaves the old file or the new one, never half of one.
 */
export class KeptFile<T> {
  private timer: NodeJS.Timeout | undefined;

  constructor(
    private readonly folder: string | undefined,
    private readonly name: string,
  ) {}

  read(): T | undefined {
    if (!this.folder) return undefined;
    let text: string;
    try {
      text = readFileSync(join(this.folder, this.name), 'utf8');
    } catch (error) {
      if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return undefined;
      throw error;
    }
    const value: T = JSON.parse(text);
    return value;
  }

  writeSoon(value: () => T): void {
    if (!this.folder || this.timer) return;
    this.timer = setTimeout(() => this.writeNow(value()), WRITE_AFTER_MS);
    this.timer.unref();
  }

  writeNow(value: T): void {
    clearTimeout(this.timer);
    this.timer = undefined;
    if (!this.folder) return;
    mkdirSync(this.folder, { recursive: true });
    const path = join(this.folder, this.name);
    writeFileSync(`${path}.new`, JSON.stringify(value), { mode: 0o600 });
    renameSync(`${path}.new`, path);
  }
}
