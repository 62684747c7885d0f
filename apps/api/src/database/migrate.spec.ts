import { existsSync, readdirSync } from 'node:fs';
import { afterEach, describe, expect, it } from 'vitest';
import { temporaryDataDir } from '../../test/temporary-shop.js';
import { APPEND_ONLY } from './append-only.js';
import { databaseFile, DataFolderBusy, takeDataFolder } from './data-folder.js';
import { openWriter } from './data-source.js';
import { migrate } from './migrate.js';

let remove = () => undefined as void;
afterEach(() => remove());
function folder(): string {
  const made = temporaryDataDir();
  remove = made.remove;
  return made.dataDir;
}
const NOW = '2026-03-02T09:00:00.000Z';

describe('bringing a database to this version', () => {
  it('makes everything the entities ask for: nothing is left to generate', async () => {
    const dataDir = folder();
    await migrate(dataDir, NOW);
    const writer = await openWriter(databaseFile(dataDir));
    const { upQueries } = await writer.driver.createSchemaBuilder().log();
    await writer.destroy();
    expect(upQueries.map((q) => q.query)).toEqual([]);
  });

  it('done twice changes nothing and takes no backup', async () => {
    const dataDir = folder();
    expect((await migrate(dataDir, NOW)).applied.length).toBeGreaterThan(0);
    expect(await migrate(dataDir, NOW)).toEqual({ applied: [], backup: null });
    expect(readdirSync(dataDir).filter((name) => name.includes('before'))).toEqual([]);
  });

  it('takes a whole copy first where there is something to lose', async () => {
    const dataDir = folder();
    await migrate(dataDir, NOW);
    const writer = await openWriter(databaseFile(dataDir));
    await writer.query("INSERT INTO number_series (id, last) VALUES ('job-2026', 41)");
    await writer.query('DELETE FROM migrations');
    await writer.destroy();
    await expect(migrate(dataDir, NOW)).rejects.toThrow();
    const copy = readdirSync(dataDir).find((name) => name.includes('before-2026'))!;
    const old = await openWriter(`${dataDir}/${copy}`);
    expect(await old.query('SELECT last FROM number_series')).toEqual([{ last: 41 }]);
    await old.destroy();
  });

  it('a migration that fails leaves the database as it was', async () => {
    const dataDir = folder();
    await migrate(dataDir, NOW);
    const before = await openWriter(databaseFile(dataDir));
    await before.query('DELETE FROM migrations');
    await before.destroy();
    await expect(migrate(dataDir, NOW)).rejects.toThrow();
    const after = await openWriter(databaseFile(dataDir));
    expect(await after.query("SELECT count(*) AS n FROM sqlite_master WHERE type = 'trigger'")).toEqual([{ n: APPEND_ONLY.length * 2 + 4 }]);
    expect(await after.query('PRAGMA integrity_check')).toEqual([{ integrity_check: 'ok' }]);
    await after.destroy();
  });

  it.each(APPEND_ONLY.map((table) => [table]))('the database itself refuses to change or delete a row of %s', async (table) => {
    const dataDir = folder();
    await migrate(dataDir, NOW);
    const writer = await openWriter(databaseFile(dataDir));
    await writer.query('PRAGMA foreign_keys = OFF');
    const columns = await writer.query<{ name: string }[]>(`SELECT name FROM pragma_table_info('${table}')`);
    await writer.query(`INSERT INTO ${table} (${columns.map((c) => `"${c.name}"`).join(', ')}) VALUES (${columns.map((_, i) => i + 1).join(', ')})`);
    await expect(writer.query(`UPDATE ${table} SET id = 'x'`)).rejects.toThrow('append only');
    await expect(writer.query(`DELETE FROM ${table}`)).rejects.toThrow('append only');
    await writer.destroy();
  });
});

describe('the data folder', () => {
  it('is held by one running shop at a time', () => {
    const dataDir = folder();
    const held = takeDataFolder(dataDir);
    expect(existsSync(`${dataDir}/loopbay.lock`)).toBe(true);
    held.release();
    expect(existsSync(`${dataDir}/loopbay.lock`)).toBe(false);
  });

  it('is refused while another process that still runs holds it', async () => {
    const dataDir = folder();
    const { writeFileSync } = await import('node:fs');
    writeFileSync(`${dataDir}/loopbay.lock`, String(process.ppid));
    expect(() => takeDataFolder(dataDir)).toThrow(DataFolderBusy);
  });

  it('a lock left behind by a shop that was cut off does not keep the next one out', async () => {
    const dataDir = folder();
    const { writeFileSync } = await import('node:fs');
    writeFileSync(`${dataDir}/loopbay.lock`, '999999999');
    expect(() => takeDataFolder(dataDir).release()).not.toThrow();
  });
});
