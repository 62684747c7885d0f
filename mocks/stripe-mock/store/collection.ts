/** Objects of one kind in the order they were made; lists of the API read it backwards. */
export class Collection<T extends { id: string }> {
  private readonly byId = new Map<string, T>();

  constructor(items: readonly T[] = []) {
    for (const item of items) this.add(item);
  }

  add(item: T): T {
    this.byId.set(item.id, item);
    return item;
  }

  find(id: string | null | undefined): T | undefined {
    return id ? this.byId.get(id) : undefined;
  }

  remove(id: string): void {
    this.byId.delete(id);
  }

  all(): T[] {
    return [...this.byId.values()];
  }

  newestFirst(): T[] {
    return this.all().reverse();
  }

  where(test: (item: T) => boolean): T[] {
    return this.all().filter(test);
  }

  toJSON(): T[] {
    return this.all();
  }
}
