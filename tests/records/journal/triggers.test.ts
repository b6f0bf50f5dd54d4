import { join } from 'node:path'
import { beforeEach, describe, expect, onTestFinished, test } from 'vitest'
import { insertOf, valuesOf } from '../../../lib/records/journal/columns'
import { type Connection, connect } from '../../../lib/records/journal/connection'
import { GENESIS } from '../../../lib/records/journal/entry'
import { openJournal } from '../../../lib/records/journal/open'
import type { Entry, Journal, Row } from '../../../lib/records/journal/types'
import { temporaryDirectory } from '../temporary'
import { chain, lastOf } from './chain'

/** A journal of three rows, and a second connection that may try anything with the same file. */
let journal: Journal
let raw: Connection
let rows: Row[]

beforeEach(async () => {
  const file = join(await temporaryDirectory(), 'journal.sqlite')
  journal = await openJournal(file)
  raw = await connect(file, 'write')
  onTestFinished(async () => {
    await raw.close()
    await journal.close()
  })
  rows = chain(3)
  await journal.append(rows)
})

function next(changes: Partial<Entry>): Row {
  const [row] = chain(1, { previous: lastOf(rows) })
  if (!row) throw new Error('The chain is empty.')
  return { ...row, entry: { ...row.entry, ...changes } }
}

async function refuses(statement: string, values: Parameters<Connection['run']>[1], reason: string): Promise<void> {
  await expect(raw.run(statement, values)).rejects.toThrow(reason)
  expect(await journal.rows('b1', 0)).toEqual(rows)
}

describe('[W6.4] the triggers refuse, and nothing of the statement is stored', () => {
  test('UPDATE, of any column, by any connection', async () => {
    for (const column of ['seq', 'hash', 'person', '"update"', 'changes'])
      await refuses(`UPDATE entries SET ${column} = ${column} WHERE seq = 2`, [], 'entries are never changed')
    await refuses('UPDATE OR REPLACE entries SET seq = 1 WHERE seq = 2', [], 'entries are never changed')
  })

  test('DELETE, of one row and of all', async () => {
    await refuses('DELETE FROM entries WHERE seq = 3', [], 'entries are never deleted')
    await refuses('DELETE FROM entries', [], 'entries are never deleted')
  })

  test('a seq that leaves a gap, repeats, or is zero', async () => {
    for (const seq of [0, 1, 3, 5])
      await refuses(insertOf(1), valuesOf(next({ seq, editId: 'new' })), 'seq does not follow')
  })

  test('a prev that is not the last hash', async () => {
    for (const prev of [GENESIS, rows[1]?.entry.hash ?? ''])
      await refuses(insertOf(1), valuesOf(next({ prev })), 'prev does not follow')
  })

  test('a first row that does not start from the beginning', async () => {
    const stranger = { budget: 'b2', seq: 1, prev: 'a'.repeat(64) }
    await refuses(insertOf(1), valuesOf(next(stranger)), 'prev does not follow')
  })

  test('a gap or a wrong prev in the middle of one INSERT of many', async () => {
    const more = chain(5, { previous: lastOf(rows) })
    const gap = more.filter((_, index) => index !== 2)
    await refuses(insertOf(4), gap.flatMap(valuesOf), 'seq does not follow')
    const forged = more.map((row, index) =>
      index === 3 ? { ...row, entry: { ...row.entry, prev: 'b'.repeat(64) } } : row,
    )
    await refuses(insertOf(5), forged.flatMap(valuesOf), 'prev does not follow')
  })

  test('INSERT OR REPLACE of a row, by its seq, its edit id or its rowid', async () => {
    const replace = insertOf(1).replace('INSERT INTO', 'INSERT OR REPLACE INTO')
    await refuses(replace, valuesOf(next({ seq: 2, editId: 'new' })), 'seq does not follow')
    await refuses(replace, valuesOf(next({ editId: 'edit-2' })), 'the edit id is in the journal')
    const byRowid = replace.replace('entries (', 'entries (rowid, ').replace('(?', '(2, ?')
    await refuses(byRowid, valuesOf(next({})), 'the rowid is taken')
  })

  test('an upsert', async () => {
    const upsert = `${insertOf(1)} ON CONFLICT (budget, seq) DO UPDATE SET person = 'p2'`
    await refuses(upsert, valuesOf(next({ seq: 2, editId: 'new' })), 'seq does not follow')
  })

  test('a value of another type, or a hash that is none', async () => {
    await refuses(insertOf(1), valuesOf(next({ time: 1.5 })), 'cannot store REAL value in INTEGER column')
    await refuses(insertOf(1), valuesOf(next({ hash: 'short' })), 'CHECK constraint failed')
  })
})

describe('[W6.5] a budget that is let go', () => {
  const letGo = 'INSERT INTO deleted (budget, seq, hash, time, person) VALUES (?, ?, ?, ?, ?)'

  test('goes whole, in the one statement that says so, and leaves the others', async () => {
    const others = chain(2, { budget: 'b2' })
    await journal.append(others)
    await journal.saveSnapshot('b1', { seq: 3, hash: lastOf(rows).hash, state: new Uint8Array(1), sha256: GENESIS })
    await journal.saveEffects('b1', [{ seq: 3, effects: [] }])
    await raw.run(letGo, ['b1', 3, lastOf(rows).hash, 1, 'p1'])
    expect(await journal.rows('b1', 0)).toEqual([])
    expect(await journal.effects('b1', [3])).toEqual(new Map())
    expect(await raw.all("SELECT * FROM snapshots WHERE budget = 'b1'")).toEqual([])
    expect(await journal.rows('b2', 0)).toEqual(others)
    expect(await raw.all('SELECT budget, seq, person FROM deleted')).toEqual([{ budget: 'b1', seq: 3, person: 'p1' }])
  })

  test('is named with its head, or stays', async () => {
    for (const [budget, seq, hash] of [
      ['b1', 2, rows[1]?.entry.hash ?? ''],
      ['b1', 3, 'a'.repeat(64)],
      ['b9', 1, lastOf(rows).hash],
    ] as const)
      await refuses(letGo, [budget, seq, hash, 1, 'p1'], 'not the head of the budget')
  })

  test('never comes back, and the row that says so stays as it is', async () => {
    const head = [3, lastOf(rows).hash, 1, 'p1'] as const
    await raw.run(letGo, ['b1', ...head])
    await expect(journal.append(chain(1))).rejects.toThrow('the budget was deleted')
    const replace = letGo.replace('INSERT', 'INSERT OR REPLACE')
    await expect(raw.run(replace, ['b1', ...head])).rejects.toThrow('the budget was deleted')
    await expect(raw.run("UPDATE deleted SET person = 'p2'")).rejects.toThrow('stay as they are')
    await expect(raw.run('DELETE FROM deleted')).rejects.toThrow('rows of deleted stay')
    await journal.append(chain(1, { budget: 'b2' }))
    const byRowid = replace.replace('deleted (', 'deleted (rowid, ').replace('(?', '(1, ?')
    const other = lastOf(chain(1, { budget: 'b2' }))
    await expect(raw.run(byRowid, ['b2', 1, other.hash, 1, 'p1'])).rejects.toThrow('the rowid is taken')
  })
})
