import { systemTimers, type Timers } from '../../../lib/sync/clock'

/**
 * Timers that go when the test says so.
 * @param realUpTo delays up to this many milliseconds pass by themselves: a commit gathers for up to 5 ms; -1: none do
 */
export function heldTimers(realUpTo = 0): Timers & { now(): number; advance(milliseconds: number): void } {
  let now = 1_800_000_000_000
  const due = new Set<{ at: number; every: number | null; run: () => void }>()
  const add = (delay: number, every: number | null, run: () => void) => {
    const timer = { at: now + delay, every, run }
    due.add(timer)
    return () => {
      due.delete(timer)
    }
  }
  return {
    now: () => now,
    after: (delay, run) => (delay <= realUpTo ? systemTimers.after(delay, run) : add(delay, null, run)),
    every: (interval, run) => add(interval, interval, run),
    advance(milliseconds) {
      const until = now + milliseconds
      for (;;) {
        const [next] = [...due].filter(({ at }) => at <= until).sort((a, b) => a.at - b.at)
        if (!next) break
        now = next.at
        if (next.every === null) due.delete(next)
        else next.at += next.every
        next.run()
      }
      now = until
    },
  }
}
