import { makePrivateFile } from '../privateFile'
import { besideTheChain } from './beside'
import { ENTRY, insertOf, MAX_ROWS, ROW, type StoredEntry, type StoredRow, toEntry, toRow, valuesOf } from './columns'
import { type Connection, connect } from './connection'
import { TooManyRows } from './errors'
import { layOut, requireLayout } from './schema'
import type { Head, Journal } from './types'
import { Writer } from './writer'

/**
 * Opens the journal's file, laying it out if it is new (write path, rules 5 and 6). One connection writes, another reads.
 * @throws JournalUnusable where triggers, version or settings are not as they should be
 */
export async function openJournal(file: string): Promise<Journal> {
  await makePrivateFile(file)
  const writing = await connect(file, 'write')
  let reading: Connection | null = null
  try {
    await layOut(writing)
    reading = await connect(file, 'read')
    await requireLayout(reading)
    return journalOver(writing, reading)
  } catch (cause) {
    await reading?.close()
    await writing.close()
    throw cause
  }
}

/** The journal over two open connections of one file that is laid out. */
export function journalOver(writing: Connection, reading: Connection): Journal {
  const writer = new Writer(writing)
  return {
    ...besideTheChain(writer, reading),

    async append(rows) {
      if (rows.length === 0) return
      if (rows.length > MAX_ROWS) throw new TooManyRows(rows.length, MAX_ROWS)
      await writer.write(insertOf(rows.length), rows.flatMap(valuesOf))
    },

    async head(budget) {
      const [head] = await reading.all<Head>(
        'SELECT epoch, seq, hash FROM entries WHERE budget = ? ORDER BY seq DESC LIMIT 1',
        [budget],
      )
      return head ?? null
    },

    async entries(budget, { after, limit }) {
      const found = await reading.all<StoredEntry>(
        `SELECT ${ENTRY} FROM entries WHERE budget = ? AND seq > ? ORDER BY seq LIMIT ?`,
        [budget, after, limit],
      )
      return found.map(toEntry)
    },

    async latest(budget, { before, limit }) {
      const found = await reading.all<StoredEntry>(
        `SELECT ${ENTRY} FROM entries WHERE budget = ? AND seq < ? ORDER BY seq DESC LIMIT ?`,
        [budget, before ?? Number.MAX_SAFE_INTEGER, limit],
      )
      return found.map(toEntry)
    },

    async rows(budget, after) {
      const found = await reading.all<StoredRow>(
        `SELECT ${ROW} FROM entries WHERE budget = ? AND seq > ? ORDER BY seq`,
        [budget, after],
      )
      return found.map(toRow)
    },

    async findEdit(budget, editId) {
      const [found] = await reading.all<StoredEntry>(
        `SELECT ${ENTRY} FROM entries WHERE budget = ? AND editId = ? AND kind IN ('edit', 'seed')`,
        [budget, editId],
      )
      return found ? toEntry(found) : null
    },

    async findEditStarting(budget, prefix) {
      // U+10FFFF sorts after every character that an id may have.
      const [found] = await reading.all<StoredEntry>(
        `SELECT ${ENTRY} FROM entries WHERE budget = ? AND editId >= ? AND editId < ? AND kind IN ('edit', 'seed')
         ORDER BY editId LIMIT 1`,
        [budget, prefix, `${prefix}\u{10FFFF}`],
      )
      return found ? toEntry(found) : null
    },

    async bindings(budget) {
      const found = await reading.all<{ clientId: number; person: string }>(
        `SELECT clientId, person FROM entries WHERE budget = ? AND kind = 'bind' ORDER BY seq DESC`,
        [budget],
      )
      // Newest first, so that the first binding of a client id is the one that stays.
      return new Map(found.map(({ clientId, person }) => [clientId, person]))
    },

    async budgets() {
      const found = await reading.all<{ budget: string }>('SELECT budget FROM entries WHERE seq = 1 ORDER BY budget')
      return found.map(({ budget }) => budget)
    },

    async close() {
      await reading.close()
      await writer.close()
    },
  }
}
