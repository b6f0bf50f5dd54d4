import { AgingMap } from './agingMap'

const HOUR = 3_600_000
const REMEMBERED = { maxAge: HOUR, maxSize: 20_000 }
const PROVEN = { maxAge: 30 * 24 * HOUR, maxSize: 20_000 }

/** So many tries are free; then the wait doubles from one second to the longest. Times in milliseconds. */
const AT_ACCOUNT_AND_ADDRESS = { free: 5, longest: 300_000 }
const AT_ACCOUNT = { free: 20, longest: 60_000 }
const ACCOUNTS_AT_ADDRESS = { free: 20, longest: 30_000 }

type Track = { failures: number; last: number }
type Attempt = {
  /** The password was right: this try does not count, and the account is proven at this address. */
  succeeded(): void
  /** The password was never looked at: this try does not count. */
  cancelled(): void
}

export type Throttle = {
  /** Counts a try as failed until told otherwise, so that tries sent at once count too. */
  begin(account: string, address: string): Attempt | { readonly slow: number }
}

/**
 * Slows down guessing without ever locking anybody out for all: by account and address together, by account over all
 * addresses, and by address over the number of different accounts tried there. The last two spare an account at an address
 * where it has signed in before, so failures of others cannot keep a person out. All in memory, forgotten after an hour.
 */
export function createThrottle(clock: () => number): Throttle {
  const pairs = new AgingMap<Track>(REMEMBERED, clock)
  const accounts = new AgingMap<Track>(REMEMBERED, clock)
  const addresses = new AgingMap<Map<string, Track>>(REMEMBERED, clock)
  const proven = new AgingMap<true>(PROVEN, clock)

  function waitFor(account: string, address: string, pair: string): number {
    const own = end(pairs.get(pair), AT_ACCOUNT_AND_ADDRESS)
    if (proven.get(pair)) return own - clock()
    const everywhere = end(accounts.get(account), AT_ACCOUNT)
    return Math.max(own, everywhere, endAtAddress(addresses.get(address))) - clock()
  }

  return {
    begin(account, address) {
      const pair = JSON.stringify([account, address])
      const wait = waitFor(account, address, pair)
      if (wait > 0) return { slow: Math.ceil(wait / 1000) }
      const undo = [
        count(pairs, pair, clock()),
        count(accounts, account, clock()),
        countAtAddress(addresses, address, account, clock()),
      ]
      const cancelled = () => {
        for (const step of undo) step()
      }
      return {
        cancelled,
        succeeded() {
          cancelled()
          pairs.delete(pair)
          proven.set(pair, true)
        },
      }
    },
  }
}

function end(track: Track | undefined, rule: { free: number; longest: number }): number {
  if (!track || track.failures < rule.free) return 0
  return track.last + Math.min(rule.longest, 1000 * 2 ** (track.failures - rule.free))
}

function endAtAddress(tried: Map<string, Track> | undefined): number {
  if (!tried) return 0
  const last = Math.max(0, ...[...tried.values()].map((track) => track.last))
  return end({ failures: tried.size, last }, ACCOUNTS_AT_ADDRESS)
}

function count(tracks: Pick<AgingMap<Track>, 'get' | 'set' | 'delete'>, key: string, now: number): () => void {
  const before = tracks.get(key)
  tracks.set(key, { failures: (before?.failures ?? 0) + 1, last: now })
  return () => {
    const current = tracks.get(key)
    if (!current) return
    const failures = current.failures - 1
    if (failures === 0) tracks.delete(key)
    else tracks.set(key, { failures, last: current.last === now ? (before?.last ?? now) : current.last })
  }
}

function countAtAddress(
  addresses: AgingMap<Map<string, Track>>,
  address: string,
  account: string,
  now: number,
): () => void {
  const tried = addresses.get(address) ?? new Map<string, Track>()
  addresses.set(address, tried)
  return count(
    {
      get: (key) => tried.get(key),
      set: (key, track) => void tried.set(key, track),
      delete: (key) => void tried.delete(key),
    },
    account,
    now,
  )
}
