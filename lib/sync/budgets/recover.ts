import type { Journal } from '../../records/journal/types'
import type { Records } from '../../records/types'
import { readBudget } from '../../sheet/seed'
import type { Log } from '../clock'
import { loadDocument } from '../room/load'
import { recordOf } from './create'

/**
 * Finishes, at start, the budgets whose entry 1 is in the journal and whose record is missing; one that cannot be finished is
 * marked abandoned, so that it is not looked at again (write path, rule 7).
 */
export async function finishBudgets(journal: Journal, records: Records, log: Log): Promise<void> {
  const known = new Set((await records.budgets.all()).map(({ id }) => id))
  for (const budget of await journal.budgets()) {
    if (known.has(budget)) continue
    try {
      await finish(journal, records, budget, log)
    } catch (cause) {
      log(`Budget ${budget} stands in the journal without a record, and none could be made`, cause)
    }
  }
}

async function finish(journal: Journal, records: Records, budget: string, log: Log): Promise<void> {
  const [seed] = await journal.entries(budget, { after: 0, limit: 1 })
  if (!seed) return
  const loaded = await loadDocument(journal, budget)
  if (loaded !== null && !('damaged' in loaded)) {
    const { name } = readBudget(loaded.doc).head
    loaded.doc.destroy()
    await records.budgets.create(recordOf(seed, name), seed.person)
    log(`Budget ${budget} was made when the server stopped; its record has been finished`)
    return
  }
  await records.budgets.create({ ...recordOf(seed, null), state: 'abandoned' }, seed.person)
  log(`Budget ${budget} cannot be read and has no record; it is marked as abandoned`)
}
