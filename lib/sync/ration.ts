/** Counts what somebody does within a stretch of time, to stop what costs too much. */
export class Ration {
  private readonly times = new Map<string, number[]>()

  /**
   * @param limit how often it may happen within the window
   * @param window in milliseconds
   */
  constructor(
    private readonly limit: number,
    private readonly window: number,
    private readonly now: () => number,
  ) {}

  /** Counts one more. @returns whether it is still within the limit */
  spend(who: string): boolean {
    const recent = this.recent(who)
    recent.push(this.now())
    // More than the limit and one need not be remembered.
    this.times.set(who, recent.slice(-this.limit - 1))
    return recent.length <= this.limit
  }

  isSpent(who: string): boolean {
    return this.recent(who).length > this.limit
  }

  private recent(who: string): number[] {
    const since = this.now() - this.window
    const recent = (this.times.get(who) ?? []).filter((time) => time > since)
    if (recent.length === 0) this.times.delete(who)
    return recent
  }
}
