import { Global, Inject, Injectable, Logger, Module, type OnApplicationShutdown } from '@nestjs/common';
import { DataSource } from 'typeorm';
import { getDataSourceToken, TypeOrmModule } from '@nestjs/typeorm';
import { CONFIG, type Config } from '../config/config.js';
import { databaseFile } from './data-folder.js';
import { readOptions, writeOptions } from './data-source.js';
import { ReadDb } from './read-db.js';
import { UnitOfWork } from './unit-of-work.js';

/** On a clean stop the write-ahead log is folded into the file, so that a copy of the folder is whole. */
@Injectable()
class CleanStop implements OnApplicationShutdown {
  constructor(@Inject(getDataSourceToken()) private readonly writer: DataSource) {}

  async onApplicationShutdown(): Promise<void> {
    if (!this.writer.isInitialized) return;
    await this.writer.query('PRAGMA optimize');
    await this.writer.query('PRAGMA wal_checkpoint(TRUNCATE)');
  }
}

@Global()
@Module({
  imports: [
    TypeOrmModule.forRootAsync({ inject: [CONFIG], useFactory: (config: Config) => ({ ...writeOptions(databaseFile(config.dataDir)), retryAttempts: 0 }) }),
    TypeOrmModule.forRootAsync({ name: 'read', inject: [CONFIG], useFactory: (config: Config) => ({ ...readOptions(databaseFile(config.dataDir)), retryAttempts: 0 }) }),
  ],
  providers: [
    CleanStop,
    {
      provide: UnitOfWork,
      inject: [getDataSourceToken()],
      useFactory: (writer: DataSource) =>
        new UnitOfWork(writer, (reason) => {
          new Logger('UnitOfWork').fatal(reason);
          process.exit(70);
        }),
    },
    { provide: ReadDb, inject: [getDataSourceToken('read')], useFactory: (reader: DataSource) => new ReadDb(reader) },
  ],
  exports: [UnitOfWork, ReadDb],
})
export class DatabaseModule {}
