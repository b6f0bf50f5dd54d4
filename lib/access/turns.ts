/**
 * Lets at most `limit` pieces of work run at once; the rest wait in order. One turn makes a mutex. Password checks take
 * turns because scrypt runs in the thread pool that the journal's syncs need too.
 */
export function createTurns(limit: number): <T>(work: () => Promise<T>) => Promise<T> {
  let free = limit
  const waiting: (() => void)[] = []
  return async (work) => {
    if (free > 0) free--
    else await new Promise<void>((resolve) => waiting.push(resolve))
    try {
      return await work()
    } finally {
      const next = waiting.shift()
      if (next) next()
      else free++
    }
  }
}
