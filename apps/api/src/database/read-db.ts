import { Injectable } from '@nestjs/common';
import type { DataSource } from 'typeorm';
import type { QuerySource } from './query-source.js';

/** Reads on a read-only connection of their own: they see what is committed, never half of a unit of work. */
@Injectable()
export class ReadDb implements QuerySource {
  constructor(private readonly dataSource: DataSource) {}

  query<T>(sql: string, parameters: unknown[] = []): Promise<T> {
    return this.dataSource.query<T>(sql, parameters);
  }

  all<Row>(sql: string, parameters: readonly unknown[] = []): Promise<Row[]> {
    return this.dataSource.query<Row[]>(sql, [...parameters]);
  }

  async one<Row>(sql: string, parameters: readonly unknown[] = []): Promise<Row | undefined> {
    const rows = await this.all<Row>(sql, parameters);
    return rows[0];
  }
}
