import type { Journal } from '../../../lib/records/journal/types'
import { type StalledJournal, stalledJournal } from '../../records/stalledJournal'

/** A disk that writes at once until it is held, and then when the test lets it. */
export function holdableDisk() {
  let isHeld = false
  let stalled: StalledJournal | null = null
  const held = (): StalledJournal => {
    if (!stalled) throw new Error('Open the world over this disk first.')
    return stalled
  }
  return {
    over(journal: Journal): Journal {
      const stalling = stalledJournal(journal)
      stalled = stalling
      return { ...journal, append: (rows) => (isHeld ? stalling.append(rows) : journal.append(rows)) }
    },
    hold() {
      isHeld = true
    },
    /** Writes what waits, and from now on everything at once. */
    async letGo() {
      isHeld = false
      while (held().waiting() > 0) await held().release()
    },
    /** Writes the oldest commit that waits. */
    release: () => held().release(),
    /** Fails the oldest commit that waits. */
    fail: (cause: Error) => held().fail(cause),
    untilWaiting: (count: number) => held().untilWaiting(count),
  }
}
