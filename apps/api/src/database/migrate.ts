import { existsSync } from 'node:fs';
import { databaseFile } from './data-folder.js';
import { openWriter } from './data-source.js';

interface Backup {
  backup(file: string): Promise<unknown>;
}

export interface MigrationReport {
  readonly applied: readonly string[];
  readonly backup: string | null;
}

/** Brings the database to this version: backup first, all in one transaction, foreign keys checked after. */
export async function migrate(dataDir: string, stamp: string): Promise<MigrationReport> {
  const file = databaseFile(dataDir);
  const isNew = !existsSync(file);
  const writer = await openWriter(file);
  try {
    if (!(await writer.showMigrations())) return { applied: [], backup: null };
    const backup = isNew ? null : `${file}.before-${stamp.replaceAll(/[^0-9]/g, '').slice(0, 14)}`;
    if (backup) await (writer.driver as unknown as { databaseConnection: Backup }).databaseConnection.backup(backup);
    const applied = await writer.runMigrations({ transaction: 'all' });
    const broken = await writer.query<unknown[]>('PRAGMA foreign_key_check');
    if (broken.length > 0) throw new Error(`The migration left ${broken.length} rows without what they refer to. The backup is ${backup ?? 'not needed: the database was new'}.`);
    return { applied: applied.map((m) => m.name), backup };
  } finally {
    await writer.destroy();
  }
}
