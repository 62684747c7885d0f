/** Writes what the entities ask for beyond the migrations: `npx tsx apps/run/make-migration.ts Name`. */
import { mkdtempSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { DataSource } from 'typeorm';
import { writeOptions } from '../api/src/database/data-source.js';
import { migrations } from '../api/src/database/migrations/index.js';

const name = process.argv[2] ?? 'Change';
const stamp = Number(process.argv[3] ?? new Date().getTime());
const file = join(mkdtempSync(join(tmpdir(), 'loopbay-migration-')), 'empty.sqlite');
const source = await new DataSource(writeOptions(file)).initialize();
await source.runMigrations({ transaction: 'all' });
const { upQueries } = await source.driver.createSchemaBuilder().log();
// The first migration is read back from a filled schema: the builder would create every table with a foreign key twice.
const statements = migrations.length > 0 ? upQueries.map((q) => q.query) : await schemaAfter(upQueries.map((q) => q.query));
await source.destroy();
if (upQueries.length === 0) {
  console.log('The migrations hold everything the entities ask for.');
} else {
  const body = statements.map((sql) => `    await runner.query(\`${sql}\`);`).join('\n');
  const text = `import type { MigrationInterface, QueryRunner } from 'typeorm';
import { createTriggers } from '../append-only.js';

export class ${name}${stamp} implements MigrationInterface {
  name = '${name}${stamp}';

  async up(runner: QueryRunner): Promise<void> {
${body}
    await createTriggers(runner);
  }

  down(): Promise<void> {
    return Promise.reject(new Error('Migrations go forward only; restore the backup instead.'));
  }
}
`;
  const target = `apps/api/src/database/migrations/${stamp}-${name.replaceAll(/(?<!^)([A-Z])/g, '-$1').toLowerCase()}.ts`;
  writeFileSync(target, text);
  console.log(`${target}: add ${name}${stamp} to migrations/index.ts`);
}

async function schemaAfter(queries: string[]): Promise<string[]> {
  await source.query('PRAGMA foreign_keys = OFF');
  for (const query of queries) await source.query(query);
  const rows = await source.query<{ sql: string }[]>(
    "SELECT sql FROM sqlite_master WHERE sql IS NOT NULL AND name NOT LIKE 'sqlite_%' AND tbl_name <> 'migrations' ORDER BY type DESC, name",
  );
  return rows.map((row) => row.sql);
}
