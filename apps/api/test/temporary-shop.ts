import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { DataSource } from 'typeorm';
import { databaseFile, takeDataFolder } from '../src/database/data-folder.js';
import { openReader, openWriter } from '../src/database/data-source.js';
import { migrate } from '../src/database/migrate.js';
import { ReadDb } from '../src/database/read-db.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';

/** A data folder of its own with a migrated database file; removed when the test ends. */
export function temporaryDataDir(): { dataDir: string; remove(): void } {
  const dataDir = mkdtempSync(join(tmpdir(), 'loopbay-test-'));
  takeDataFolder(dataDir).release();
  return { dataDir, remove: () => rmSync(dataDir, { recursive: true, force: true }) };
}

export interface TemporaryDatabase {
  readonly writer: DataSource;
  readonly reader: DataSource;
  readonly unitOfWork: UnitOfWork;
  readonly db: ReadDb;
  close(): Promise<void>;
}

/** Writer and reader on a real file, as the application has them. */
export async function temporaryDatabase(options: { timeLimitMs?: number } = {}): Promise<TemporaryDatabase> {
  const { dataDir, remove } = temporaryDataDir();
  await migrate(dataDir, '2026-01-01T00:00:00.000Z');
  const writer = await openWriter(databaseFile(dataDir));
  const reader = await openReader(databaseFile(dataDir));
  return {
    writer,
    reader,
    unitOfWork: new UnitOfWork(writer, undefined, options.timeLimitMs),
    db: new ReadDb(reader),
    async close() {
      await reader.destroy();
      await writer.destroy();
      remove();
    },
  };
}
