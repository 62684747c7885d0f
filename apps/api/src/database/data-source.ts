import 'reflect-metadata';
import { DataSource, type DataSourceOptions } from 'typeorm';
import { ENTITIES } from './entities.js';
import { migrations } from './migrations/index.js';

interface Sqlite {
  pragma(sql: string): unknown;
}

/** The writing connection: durable (FULL), foreign keys on, one for the process. */
export const writeOptions = (database: string): DataSourceOptions => ({
  type: 'better-sqlite3',
  database,
  entities: ENTITIES,
  migrations,
  migrationsRun: false,
  migrationsTransactionMode: 'all',
  synchronize: false,
  enableWAL: true,
  timeout: 5000,
  prepareDatabase: (db: Sqlite) => {
    db.pragma('foreign_keys = ON');
    db.pragma('synchronous = FULL');
    db.pragma('trusted_schema = OFF');
    db.pragma('cell_size_check = ON');
    db.pragma('journal_size_limit = 67108864');
  },
});

/** The reading connection: a write on it fails loudly. */
export const readOptions = (database: string): DataSourceOptions => ({
  type: 'better-sqlite3',
  database,
  entities: [],
  synchronize: false,
  readonly: true,
  enableWAL: false,
  prepareDatabase: () => undefined,
});

export const openWriter = (database: string) => new DataSource(writeOptions(database)).initialize();
export const openReader = (database: string) => new DataSource(readOptions(database)).initialize();
