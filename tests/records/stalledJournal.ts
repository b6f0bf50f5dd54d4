import type { Journal } from '../../lib/records/journal/types'

/** A journal whose commits wait until the test lets them go; everything else goes through as it is. */
export type StalledJournal = Journal & {
  /** How many calls of append wait. */
  waiting(): number
  /** Lets the oldest waiting call go on to the journal; resolves when that call has been answered. */
  release(): Promise<void>
  /** Answers the oldest waiting call with this error; nothing of it is stored. */
  fail(cause: Error): void
  /** Resolves when that many calls wait. */
  untilWaiting(count: number): Promise<void>
}

export function stalledJournal(journal: Journal): StalledJournal {
  type Waiting = { go(): Promise<void>; fail(cause: Error): void }
  const calls: Waiting[] = []
  const watchers: { count: number; resolve(): void }[] = []
  const oldest = (): Waiting => {
    const call = calls.shift()
    if (!call) throw new Error('No append is waiting.')
    return call
  }
  return {
    ...journal,
    append: (rows) =>
      new Promise((resolve, reject) => {
        calls.push({ go: () => journal.append(rows).then(resolve, reject), fail: reject })
        for (const watcher of watchers) if (calls.length >= watcher.count) watcher.resolve()
      }),
    waiting: () => calls.length,
    release: () => oldest().go(),
    fail: (cause) => oldest().fail(cause),
    untilWaiting: (count) =>
      new Promise((resolve) => {
        if (calls.length >= count) resolve()
        else watchers.push({ count, resolve })
      }),
  }
}
