/** Who is told that a state has changed, as useSyncExternalStore asks for it. */
export class Listeners {
  private readonly all = new Set<() => void>()

  readonly add = (listener: () => void): (() => void) => {
    this.all.add(listener)
    return () => this.all.delete(listener)
  }

  tell(): void {
    for (const listener of this.all) listener()
  }
}
