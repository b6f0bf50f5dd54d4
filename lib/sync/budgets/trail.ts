import type { Entry, Journal } from '../../records/journal/types'
import type { Records } from '../../records/types'
import type { TrailEntry } from '../../sheet/wire'
import { trailEntry } from '../room/trail'

export type TrailRange = { after: number; limit: number } | { before?: number; limit: number }

const MOST = 500
/** Shown where somebody's name was erased: the chain holds ids only. */
const ERASED = 'Erased person'

/**
 * The trail with names and effects. `after`: the whole chain, oldest first, for programs; else newest first, for people, without
 * the bindings of client ids. @returns null where the journal does not hold the budget
 */
export async function readTrail(
  journal: Journal,
  records: Pick<Records, 'people'>,
  budget: string,
  range: TrailRange,
): Promise<TrailEntry[] | null> {
  if ((await journal.head(budget)) === null) return null
  const limit = Math.max(1, Math.min(range.limit, MOST))
  const entries =
    'after' in range
      ? await journal.entries(budget, { after: range.after, limit })
      : await newestEdits(journal, budget, range.before, limit)
  const names = await records.people.byIds([...new Set(entries.map(({ person }) => person))])
  const effects = await journal.effects(
    budget,
    entries.map(({ seq }) => seq),
  )
  return entries.map((entry) =>
    trailEntry(entry, names.get(entry.person)?.name ?? ERASED, effects.get(entry.seq) ?? []),
  )
}

async function newestEdits(journal: Journal, budget: string, before: number | undefined, limit: number) {
  const found: Entry[] = []
  let until = before
  for (;;) {
    const page = await journal.latest(budget, until === undefined ? { limit } : { before: until, limit })
    found.push(...page.filter(({ kind }) => kind !== 'bind'))
    until = page.at(-1)?.seq
    if (found.length >= limit || page.length < limit) return found.slice(0, limit)
  }
}
