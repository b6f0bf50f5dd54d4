import type { Evidence, PrismaClient } from '../generated/client'
import type { EvidenceRecord, EvidenceRecords } from '../types'
import { refusedKey } from './errors'

export function evidenceRecords(client: PrismaClient): EvidenceRecords {
  return {
    async describe({ budget, time, ...description }) {
      const where = { budgetId_sha256: { budgetId: budget, sha256: description.sha256 } }
      const create = { budgetId: budget, time: new Date(time), ...description }
      const kept = await client.evidence.upsert({ where, create, update: {} }).catch(refusedKey('budget', budget))
      return toRecord(kept)
    },

    async list(budgetId) {
      const found = await client.evidence.findMany({
        where: { budgetId },
        orderBy: [{ time: 'asc' }, { sha256: 'asc' }],
      })
      return found.map(toRecord)
    },

    async find(budgetId, sha256) {
      const found = await client.evidence.findUnique({ where: { budgetId_sha256: { budgetId, sha256 } } })
      return found && toRecord(found)
    },
  }
}

function toRecord({ budgetId, time, ...description }: Evidence): EvidenceRecord {
  return { budget: budgetId, ...description, time: time.getTime() }
}
