'use client'
import { useMemo, useState } from 'react'
import type { TrailEntry } from '../../../../../lib/sheet/wire'
import { useView } from '../state/contexts'

/** How many older entries one 'show more' asks for. */
const MORE = 50

export type Trail = {
  /** Newest first. */
  readonly entries: readonly TrailEntry[]
  readonly complete: boolean
  readonly asking: boolean
  readonly problem: string | null
  readonly more: () => void
}

/** The trail as far as it has been asked for: what the session brings, then older entries from the server. */
export function useTrail(recent: readonly TrailEntry[]): Trail {
  const { budgetId } = useView()
  const [older, setOlder] = useState<readonly TrailEntry[]>([])
  const [asking, setAsking] = useState(false)
  const [problem, setProblem] = useState<string | null>(null)
  const entries = useMemo(() => joined(recent, older), [recent, older])
  const oldest = entries.at(-1)?.seq ?? null

  const more = async () => {
    if (asking) return
    setAsking(true)
    setProblem(null)
    try {
      const fetched = await olderEntries(budgetId, oldest)
      setOlder((known) => joined(known, fetched))
    } catch (error) {
      setProblem(
        `Older entries could not be read (${error instanceof Error ? error.message : 'no answer'}); try again.`,
      )
    } finally {
      setAsking(false)
    }
  }
  return { entries, complete: oldest === 1, asking, problem, more: () => void more() }
}

async function olderEntries(budget: string, before: number | null): Promise<readonly TrailEntry[]> {
  const query = new URLSearchParams({ limit: String(MORE), ...(before === null ? {} : { before: String(before) }) })
  const answer = await fetch(`/api/v1/budgets/${encodeURIComponent(budget)}/trail?${query}`)
  if (!answer.ok) throw new Error(`status ${answer.status}`)
  const body = (await answer.json()) as { entries: TrailEntry[] }
  return body.entries
}

/** Two stretches of the trail as one, newest first, each entry once. */
export function joined(a: readonly TrailEntry[], b: readonly TrailEntry[]): readonly TrailEntry[] {
  const bySeq = new Map([...a, ...b].map((entry) => [entry.seq, entry]))
  return [...bySeq.values()].sort((left, right) => right.seq - left.seq)
}
