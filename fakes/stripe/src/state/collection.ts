/** Objects of one kind by id, in the order in which they came. */
export class Collection<T extends { id: string }> {
  private readonly byId = new Map<string, T>();

  constructor(entries: readonly T[] = []) {
    for (const entry of entries) this.byId.set(entry.id, entry);
  }

  add(entry: T): T {
    this.byId.set(entry.id, entry);
    return entry;
  }

  find(id: string): T | undefined {
    return this.byId.get(id);
  }

  remove(id: string): void {
    this.byId.delete(id);
  }

  oldestFirst(): T[] {
    return [...this.byId.values()];
  }

  newestFirst(): T[] {
    return this.oldestFirst().reverse();
  }

  get size(): number {
    return this.byId.size;
  }

  toJSON(): T[] {
    return this.oldestFirst();
  }
}
