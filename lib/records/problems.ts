import type { Journal } from './journal/types'
import type { BudgetRecord, Records, StoreProblem } from './types'

/**
 * The journal leads and the records follow (write path, rule 7): a record may name only a head that the journal holds.
 * @returns the records that name another, with what to do
 */
export async function findProblems(records: Records, journal: Journal): Promise<StoreProblem[]> {
  const problems: StoreProblem[] = []
  for (const record of await records.budgets.all()) {
    const what = await problemOf(record, journal)
    if (what) problems.push({ budget: record.id, what })
  }
  return problems
}

async function problemOf({ id, state, headSeq, headHash }: BudgetRecord, journal: Journal): Promise<string | null> {
  if (state === 'abandoned') return null
  const [entry] = await journal.entries(id, { after: headSeq - 1, limit: 1 })
  if (!entry || entry.seq !== headSeq)
    return `The journal ends before entry ${headSeq}, which the record names; restore a backup of the journal that is not older than the records.`
  if (entry.hash !== headHash)
    return `Entry ${headSeq} of the journal is not the one that the record names; restore records and journal from one backup.`
  return null
}
