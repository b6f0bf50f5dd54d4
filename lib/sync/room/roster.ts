import type { Role } from '../../sheet/wire'

export type RosterEvents = {
  /** A role that was known is another one now. */
  changed(person: string, role: Role | null): void
  /** No role is being read any more. */
  settled(): void
}

/**
 * The roles of those who are or were here, in memory, because the check just before a commit may not wait. While a role is
 * being read again nothing is committed: it may have been taken away.
 */
export class Roster {
  private readonly roles = new Map<string, Role | null>()
  private readonly reading = new Map<string, Promise<void>>()

  constructor(
    private readonly read: (person: string) => Promise<Role | null>,
    private readonly events: RosterEvents,
  ) {}

  get isSettled(): boolean {
    return this.reading.size === 0
  }

  roleOf(person: string): Role | null {
    return this.roles.get(person) ?? null
  }

  /** Reads the role of somebody who comes in. @throws what reading throws; the person then has no role */
  async enter(person: string): Promise<Role | null> {
    let latest: Promise<void> | undefined = this.refresh(person)
    while (latest) {
      await latest
      latest = this.reading.get(person)
    }
    return this.roleOf(person)
  }

  /** Somebody's role was changed: it is read again, if it was ever asked for here. */
  invalidate(person: string): void {
    if (!this.roles.has(person) && !this.reading.has(person)) return
    // A role that cannot be read is none: refusing is the safe side.
    this.refresh(person).catch(() => undefined)
  }

  private refresh(person: string): Promise<void> {
    const reading = this.readOnce(person, () => this.reading.get(person) === reading)
    this.reading.set(person, reading)
    return reading
  }

  /** @param isLatest false where a later reading has begun: that one decides */
  private async readOnce(person: string, isLatest: () => boolean): Promise<void> {
    let role: Role | null = null
    try {
      role = await this.read(person)
    } finally {
      if (isLatest()) this.set(person, role)
    }
  }

  private set(person: string, role: Role | null): void {
    const before = this.roles.get(person)
    this.roles.set(person, role)
    this.reading.delete(person)
    if (before !== undefined && before !== role) this.events.changed(person, role)
    if (this.isSettled) this.events.settled()
  }
}
