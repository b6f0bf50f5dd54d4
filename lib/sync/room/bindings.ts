/** Which person a Yjs client id belongs to: from the journal, and those that wait for their commit (write path, rule 3). */
export class Bindings {
  private readonly reserved = new Map<number, string>()

  constructor(private readonly bound: Map<number, string>) {}

  ownerOf(clientId: number): string | null {
    return this.bound.get(clientId) ?? this.reserved.get(clientId) ?? null
  }

  reserve(clientId: number, person: string): void {
    this.reserved.set(clientId, person)
  }

  /** The binding's row is in the journal. */
  commit(clientId: number): void {
    const person = this.reserved.get(clientId)
    if (person !== undefined && !this.bound.has(clientId)) this.bound.set(clientId, person)
    this.reserved.delete(clientId)
  }

  /** The binding's row was not written: the id is free again. */
  release(clientId: number): void {
    this.reserved.delete(clientId)
  }
}
