import { decibels } from '../../../../words/decibels'
import type { Builds } from './buildsWords'

const SHARES = [
  ['p50', '50'],
  ['p90', '90'],
  ['p95', '95'],
  ['p99', '99'],
  ['p99_7', '99.7'],
] as const

/** The percentiles in words, each with one standard error of the sampling. */
export function percentileRows({ percentiles }: Builds): readonly { readonly share: string; readonly words: string }[] {
  return SHARES.map(([key, share]) => {
    const found = percentiles[key]
    return { share, words: found === null ? 'unknown' : `${decibels(found.db)} ± ${errorWords(found.error)}` }
  })
}

/** A sampling error is never said to be nothing. */
const errorWords = (db: number) => (db < 0.005 ? 'under 0.01' : decibels(db))
