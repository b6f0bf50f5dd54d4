import { randomBytes } from 'node:crypto'
import type { Identity } from '../../access/identity'
import { parseBudget } from '../../budget/parse'
import type { Budget } from '../../budget/schema'
import { GENESIS, sealEntry } from '../../records/journal/entry'
import type { Entry, Journal, Row } from '../../records/journal/types'
import type { BudgetRecord, Records } from '../../records/types'
import { seedUpdate } from '../../sheet/seed'
import type { Door } from '../../sheet/wire'
import type { Log } from '../clock'
import type { Committer } from '../committer'
import type { Evaluator } from '../evaluator'
import { effectsBetween } from '../room/effects'

export type Making = {
  readonly journal: Journal
  readonly records: Pick<Records, 'budgets'>
  readonly committer: Committer
  readonly now: () => number
  readonly engine: string
  readonly evaluator: Pick<Evaluator, 'margins'>
  readonly log: Log
}

/** The first life of every budget. */
const FIRST_EPOCH = 1
export const SEED_EDIT_ID = 'seed'

/**
 * Makes a budget: entry 1 first, synced, then the record that names it (write path, rule 7). A stop in between is finished at
 * the next start. @throws Error where the budget is no valid one, or where it cannot be written
 */
export async function createBudget(making: Making, identity: Identity, door: Door, budget: Budget): Promise<string> {
  const parsed = parseBudget(budget)
  if ('issues' in parsed) throw new Error(`Not a budget: ${parsed.issues[0]?.path} ${parsed.issues[0]?.message}`)
  const id = newId()
  const row = seedRow(making, id, identity.person, door, parsed.budget)
  await written(making.committer, row)
  await keepEffects(making, id, parsed.budget)
  await making.records.budgets.create(recordOf(row.entry, parsed.budget.head.name), identity.person)
  return id
}

/** The record of a budget whose entry 1 stands in the journal. */
export function recordOf(seed: Entry, name: string | null): BudgetRecord {
  return {
    id: seed.budget,
    name: name ?? '',
    createdAt: seed.time,
    createdBy: seed.person,
    state: 'made',
    headSeq: seed.seq,
    headHash: seed.hash,
  }
}

function seedRow({ now, engine }: Making, id: string, person: string, door: Door, budget: Budget): Row {
  const update = seedUpdate(budget)
  const parts = {
    budget: id,
    epoch: FIRST_EPOCH,
    seq: 1,
    kind: 'seed' as const,
    editId: SEED_EDIT_ID,
    person,
    door,
    time: now(),
    clientId: null,
    changes: [],
    engine,
  }
  return { entry: sealEntry(parts, update, GENESIS), update }
}

function written(committer: Committer, row: Row): Promise<void> {
  return new Promise((resolve, reject) => {
    let waiting: Row[] = [row]
    committer.request({
      hasMore: false,
      take: () => waiting.splice(0),
      stored: () => resolve(),
      failed: (cause) => {
        waiting = []
        reject(new Error('The budget could not be written; nothing was kept. Try again.', { cause }))
      },
    })
  })
}

async function keepEffects({ journal, evaluator, log }: Making, id: string, budget: Budget): Promise<void> {
  try {
    const margins = await evaluator.margins(budget)
    await journal.saveEffects(id, [{ seq: 1, effects: effectsBetween(budget, {}, budget, margins) }])
  } catch (cause) {
    log(`The first margins of budget ${id} were not kept`, cause)
  }
}

/** 80 random bits as 16 small letters and digits. */
function newId(): string {
  return [...randomBytes(16)].map((byte) => '0123456789abcdefghjkmnpqrstvwxyz'[byte & 31]).join('')
}
