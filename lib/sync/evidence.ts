import type { Identity } from '../access/identity'
import { LIMITS } from '../budget/schema'
import type { EvidenceRecord, Records, Store } from '../records/types'
import type { AttachedFile, EvidenceService, StoredEvidence } from './services'

type Kept = Pick<EvidenceRecord, 'sha256' | 'size' | 'name' | 'mediaType'>

/** The two steps of attaching a file: its bytes by their SHA-256, and what it is to a budget, which must exist by then. */
export type Attachments = {
  keep(file: AttachedFile): Promise<Kept>
  describe(budget: string, identity: Identity, kept: Kept): Promise<StoredEvidence>
}

export function createAttachments(
  files: Store['evidence'],
  records: Pick<Records, 'evidence'>,
  now: () => number,
): Attachments {
  return {
    keep: async ({ name, mediaType, bytes }) => ({
      name,
      mediaType,
      ...(await files.store(bytes, LIMITS.evidenceBytes)),
    }),
    async describe(budget, { person }, kept) {
      return shown(await records.evidence.describe({ budget, ...kept, person, time: now() }))
    },
  }
}

/**
 * Attached files: stored once by their SHA-256, described per budget.
 * @param attached is told of every file that a budget got, which may already count by it
 */
export function createEvidenceService(
  files: Store['evidence'],
  records: Pick<Records, 'evidence'>,
  { keep, describe }: Attachments,
  attached: (budget: string) => void,
): EvidenceService {
  return {
    async store(budget, identity, file) {
      const stored = await describe(budget, identity, await keep(file))
      attached(budget)
      return stored
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
