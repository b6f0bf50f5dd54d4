/** Which person a Yjs client id belongs to: from the journal, and those that wait for their commit (write path, rule 3). */
export class Bindings {
  private readonly reserved = new Map<number, string>()

  /** @param isUsed whether the document has content of a client id: an unbound one is the seed's, and stays nobody's */
  constructor(
    private readonly bound: Map<number, string>,
    private readonly isUsed: (clientId: number) => boolean,
  ) {}

  /** Whether nobody has the id yet. */
  isFree(clientId: number): boolean {
    return this.ownerOf(clientId) === null && !this.isUsed(clientId)
  }

  /** Whether the id is the person's, or may become it. */
  mayUse(clientId: number, person: string): boolean {
    return this.ownerOf(clientId) === person || this.isFree(clientId)
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

  private ownerOf(clientId: number): string | null {
    return this.bound.get(clientId) ?? this.reserved.get(clientId) ?? null
  }
}
