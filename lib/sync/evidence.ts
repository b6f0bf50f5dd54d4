import { LIMITS } from '../budget/schema'
import type { EvidenceRecord, Records, Store } from '../records/types'
import type { EvidenceService, StoredEvidence } from './services'

/** Attached files: stored once by their SHA-256, described per budget. */
export function createEvidenceService(
  files: Store['evidence'],
  records: Pick<Records, 'evidence'>,
  now: () => number,
): EvidenceService {
  return {
    async store(budget, identity, { name, mediaType, bytes }) {
      const { sha256, size } = await files.store(bytes, LIMITS.evidenceBytes)
      const record = { budget, sha256, name, mediaType, size, person: identity.person, time: now() }
      return shown(await records.evidence.describe(record))
    },

    async list(budget) {
      return (await records.evidence.list(budget)).map(shown)
    },

    async open(budget, sha256) {
      const record = await records.evidence.find(budget, sha256)
      const stream = record && (await files.open(sha256))
      return record && stream ? { evidence: shown(record), stream } : null
    },
  }
}

function shown({ sha256, name, mediaType, size, person, time }: EvidenceRecord): StoredEvidence {
  return { sha256, name, mediaType, size, person, time }
}
