/**
 * A map whose entries are forgotten `maxAge` milliseconds after they were last set, and of which at most `maxSize` are kept
 * (the longest untouched go first), so that whoever makes up names and addresses cannot fill the memory.
 */
export class AgingMap<V> {
  private readonly entries = new Map<string, { value: V; at: number }>()

  constructor(
    private readonly limits: { readonly maxAge: number; readonly maxSize: number },
    private readonly clock: () => number,
  ) {}

  get(key: string): V | undefined {
    const entry = this.entries.get(key)
    if (!entry) return undefined
    if (entry.at + this.limits.maxAge > this.clock()) return entry.value
    this.entries.delete(key)
    return undefined
  }

  /** Sets the value and starts its age anew. */
  set(key: string, value: V): void {
    this.entries.delete(key)
    this.entries.set(key, { value, at: this.clock() })
    for (const oldest of this.entries.keys()) {
      if (this.entries.size <= this.limits.maxSize) break
      this.entries.delete(oldest)
    }
  }

  delete(key: string): void {
    this.entries.delete(key)
  }
}
