import type { Identity } from '../../access/identity'
import { evaluate } from '../../budget/evaluate'
import { budgetSchema, SCHEMA_VERSION } from '../../budget/schema'
import type { BudgetRecord, Records } from '../../records/types'
import type { Role } from '../../sheet/wire'
import type { Attachments } from '../evidence'
import type { Rooms } from '../rooms'
import type { BudgetService, BudgetSummary } from '../services'
import { createBudget, type Making } from './create'
import type { Reader } from './reader'
import { readTrail } from './trail'

/** Budgets as route handlers and pages see them: made, listed and read as committed. */
export function createBudgetService(
  making: Making,
  records: Pick<Records, 'budgets' | 'people'>,
  reader: Reader,
  rooms: Pick<Rooms, 'peek'>,
  attachments: Attachments,
): BudgetService {
  return {
    async list(identity: Identity) {
      const mine = await records.budgets.forPerson(identity.person)
      const summaries: BudgetSummary[] = []
      for (const { record, role } of mine) summaries.push(await summary(record, role, records, reader))
      return summaries
    },

    async create(identity, door, budget, files = []) {
      const kept = await Promise.all(files.map((file) => attachments.keep(file)))
      const id = await createBudget(making, identity, door, budget)
      for (const file of kept) await attachments.describe(id, identity, file)
      return { id }
    },

    async read(budget) {
      const found = await reader.read(budget)
      if (found === null || 'locked' in found) return null
      const { epoch, seq, hash } = found.head
      return { budget: found.budget, epoch, seq, head: hash }
    },

    async evaluation(budget) {
      const found = await reader.evaluation(budget, 'whole')
      if (found === null || 'locked' in found) return null
      return { evaluation: found.evaluation, seq: found.head.seq }
    },

    async trail(budget, range) {
      // Found a moment after the commit: who has seen an edit also sees what it did.
      await rooms.peek(budget)?.effectsKept()
      return readTrail(making.journal, records, budget, range)
    },
  }
}

async function summary(
  record: BudgetRecord,
  role: Role,
  records: Pick<Records, 'people'>,
  reader: Reader,
): Promise<BudgetSummary> {
  const found = await reader.evaluation(record.id, 'verdicts')
  if (found === null || 'locked' in found) return lockedSummary(record, role, found?.locked ?? MISSING)
  const { budget, evaluation, head, lastEdit } = found
  const person = await records.people.byId(lastEdit.person)
  return {
    id: record.id,
    name: budget.head.name ?? '',
    description: budget.head.description ?? '',
    role,
    verdict: evaluation.verdict,
    evaluation,
    seq: head.seq,
    lastChange: { personName: person?.name ?? 'Erased person', time: lastEdit.time },
    locked: null,
  }
}

const MISSING =
  'The journal does not hold this budget; restore a backup of the journal that is not older than the records.'

/** What can be said of a budget that cannot be read: its name, and that nothing is decided. */
function lockedSummary(record: BudgetRecord, role: Role, locked: string): BudgetSummary {
  const nothing = evaluate(budgetSchema.parse({ head: { schemaVersion: SCHEMA_VERSION } }), new Map())
  return {
    id: record.id,
    name: record.name,
    description: '',
    role,
    verdict: nothing.verdict,
    evaluation: nothing,
    seq: record.headSeq,
    lastChange: null,
    locked,
  }
}
