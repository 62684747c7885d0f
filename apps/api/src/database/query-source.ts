/** Something that answers SQL: the reader outside a unit of work, its manager inside. */
export interface QuerySource {
  query<T>(sql: string, parameters?: unknown[]): Promise<T>;
}
