import type { AllowanceEvaluation } from '../../../../../lib/budget/evaluation'

/** A way to look at the spread, as a column: a band of losses and bars across it. Positions in px from the top. */
export type SpreadColumn = {
  readonly key: 'nominal' | 'rss' | 'worst' | 'random'
  readonly x: number
  readonly band: { readonly top: number; readonly bottom: number } | null
  readonly bars: readonly { readonly y: number; readonly share: string | null }[]
}

export type Spread = {
  readonly columns: readonly SpreadColumn[]
  /** Where the ground begins; null without a limit. */
  readonly groundY: number | null
}

export const SPREAD = { width: 360, height: 176, top: 34, foot: 170, barWidth: 40 } as const
/** Room above the least and below the largest loss, as a share of what lies between. */
const ROOM = 0.18
/** What lies within less is drawn as if it were this far apart, dB. */
const LEAST_DB = 0.4

const SHARES = { p50: '50', p90: '90', p95: '95', p99: '99', p99_7: '99.7' } as const

type Facts = Pick<AllowanceEvaluation, 'nominalDb' | 'rssDb' | 'worstDb' | 'limitDb' | 'builds'>

/**
 * Nominal, RSS, worst case and random builds beside each other on one scale of falling level, over the ground of the limit.
 * @returns null where there is no nominal loss
 */
export function layoutSpread({ nominalDb, rssDb, worstDb, limitDb, builds }: Facts): Spread | null {
  if (nominalDb === null) return null
  const percentiles = Object.entries(SHARES).flatMap(([key, share]) => {
    const found = builds?.percentiles[key as keyof typeof SHARES]
    return found ? [{ db: found.db, share }] : []
  })
  const losses = [nominalDb, nominalDb + (rssDb ?? 0), worstDb ?? nominalDb, ...percentiles.map(({ db }) => db)]
  const ends = limitDb === null ? losses : [...losses, limitDb]
  const low = Math.min(...ends)
  const span = Math.max(LEAST_DB, Math.max(...ends) - low)
  const scale = (SPREAD.foot - SPREAD.top) / (span * (1 + 2 * ROOM))
  const y = (db: number) => SPREAD.top + (db - low + ROOM * span) * scale
  const to = (db: number) => ({ top: Math.min(y(nominalDb), y(db)), bottom: Math.max(y(nominalDb), y(db)) })
  const bar = (db: number) => ({ y: y(db), share: null })
  const all: readonly (Omit<SpreadColumn, 'x'> | null)[] = [
    { key: 'nominal', band: null, bars: [bar(nominalDb)] },
    rssDb === null ? null : { key: 'rss', band: to(nominalDb + rssDb), bars: [bar(nominalDb + rssDb)] },
    worstDb === null ? null : { key: 'worst', band: to(worstDb), bars: [bar(worstDb)] },
    percentiles.length === 0
      ? null
      : {
          key: 'random',
          band: { top: y(percentiles[0]?.db ?? 0), bottom: y(percentiles.at(-1)?.db ?? 0) },
          bars: percentiles.map(({ db, share }) => ({ y: y(db), share })),
        },
  ]
  const columns = all.filter((column) => column !== null)
  const step = SPREAD.width / 4
  return {
    columns: columns.map((column, at) => ({ ...column, x: step * (at + 0.5) })),
    groundY: limitDb === null ? null : y(limitDb),
  }
}
