import type { Entry, Journal } from '../../records/journal/types'
import { type EditKey, prefixOf } from './editKey'
import type { Answer } from './queued'

type Known = { readonly content: string; readonly answer: Promise<Answer> }

/** Committed edits that stay in memory, for those asked about while they were being written. */
const REMEMBERED = 1_000

/** Edits that are queued, were committed a moment ago, or stand in the journal: sent twice is stored once. */
export class KnownEdits {
  private readonly known = new Map<string, Known>()
  private readonly committed: string[] = []

  constructor(
    private readonly journal: Pick<Journal, 'findEdit' | 'findEditStarting'>,
    private readonly budget: string,
  ) {}

  /** From memory. @returns null where the edit is not known there */
  find(key: EditKey): Promise<Answer> | null {
    const known = this.known.get(memoryKey(key))
    if (!known) return null
    return known.content === key.content ? known.answer.then(withId(key)) : Promise.resolve(reused(key))
  }

  /** From the journal. @returns null where the edit is not there */
  async read(key: EditKey): Promise<Answer | null> {
    if (key.by === 'update') {
      const entry = await this.journal.findEdit(this.budget, key.stored)
      return entry && answerOf(key, entry, entry.updateSha256)
    }
    const prefix = prefixOf(key.editId)
    const entry = await this.journal.findEditStarting(this.budget, prefix)
    return entry && answerOf(key, entry, entry.editId.slice(prefix.length))
  }

  queued(key: EditKey, answer: Promise<Answer>): void {
    this.known.set(memoryKey(key), { content: key.content, answer })
  }

  /** It may be sent again, or other content under the same id. */
  refused(key: EditKey): void {
    this.known.delete(memoryKey(key))
  }

  /** A search of the journal that began before the commit may not have seen it: it stays in memory for a while. */
  landed(key: EditKey): void {
    this.committed.push(memoryKey(key))
    if (this.committed.length > REMEMBERED) this.known.delete(this.committed.shift() ?? '')
  }
}

const memoryKey = (key: EditKey) => (key.by === 'update' ? key.editId : prefixOf(key.editId))

const withId = (key: EditKey) => (answer: Answer) => ({ ...answer, editId: key.editId })

function answerOf(key: EditKey, entry: Entry, content: string): Answer {
  return content === key.content ? { editId: key.editId, seq: entry.seq, head: entry.hash } : reused(key)
}

function reused(key: EditKey): Answer {
  return {
    editId: key.editId,
    code: 'edit-id-reused',
    reason: 'This edit id was used for another edit; give each edit an id of its own.',
  }
}
