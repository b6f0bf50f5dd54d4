import { join } from 'node:path'
import { expect, onTestFinished, test } from 'vitest'
import { connect } from '../../../lib/records/journal/connection'
import { JournalRefused, JournalWriteFailed } from '../../../lib/records/journal/errors'
import { journalOver, openJournal } from '../../../lib/records/journal/open'
import { verifyEntries } from '../../../lib/records/journal/verify'
import { temporaryDirectory } from '../temporary'
import { chain, lastOf } from './chain'

/** A journal over connections that the test can make fail. */
async function breakable() {
  const file = join(await temporaryDirectory(), 'journal.sqlite')
  await (await openJournal(file)).close()
  const writing = await connect(file, 'write')
  const journal = journalOver(writing, await connect(file, 'read'))
  onTestFinished(() => journal.close())
  return { journal, writing }
}

test('[W5.1] a full disk: the commit is refused whole, and the journal goes on once there is space', async () => {
  const { journal, writing } = await breakable()
  const rows = chain(3)
  await journal.append(rows)
  const [pages] = await writing.all<{ page_count: number }>('PRAGMA page_count')
  await writing.exec(`PRAGMA max_page_count = ${(pages?.page_count ?? 0) + 2}`)
  const large = chain(4, { previous: lastOf(rows), bytes: 50_000 })
  const failure = await journal.append(large).catch((error: unknown) => error)
  expect(failure).toBeInstanceOf(JournalWriteFailed)
  expect((failure as JournalWriteFailed).cause).toMatchObject({ code: 'SQLITE_FULL' })
  expect(await journal.rows('b1', 0)).toEqual(rows)

  await writing.exec('PRAGMA max_page_count = 1000000')
  await journal.append(large)
  expect(verifyEntries(await journal.rows('b1', 0))).toBeNull()
})

test('[W5.2] a disk that turned read-only is told apart from a row that does not follow', async () => {
  const { journal, writing } = await breakable()
  await writing.exec('PRAGMA query_only = 1')
  const failure = await journal.append(chain(1)).catch((error: unknown) => error)
  expect(failure).toBeInstanceOf(JournalWriteFailed)
  expect((failure as JournalWriteFailed).cause).toMatchObject({ code: 'SQLITE_READONLY' })
  await writing.exec('PRAGMA query_only = 0')
  await expect(journal.append(chain(2).slice(1))).rejects.toThrow(JournalRefused)
  expect(await journal.head('b1')).toBeNull()
})

test('[W5.3] calls that wait behind a failed one are judged for themselves', async () => {
  const { journal } = await breakable()
  const rows = chain(3)
  const results = await Promise.allSettled([
    journal.append(rows.slice(0, 1)),
    journal.append(rows.slice(2)),
    journal.append(rows.slice(1, 2)),
  ])
  expect(results.map((result) => result.status)).toEqual(['fulfilled', 'rejected', 'fulfilled'])
  expect((await journal.head('b1'))?.seq).toBe(2)
})

test('[W5.4] a journal that is closed refuses, it does not pretend', async () => {
  const journal = await openJournal(join(await temporaryDirectory(), 'journal.sqlite'))
  await journal.close()
  await expect(journal.append(chain(1))).rejects.toThrow(JournalWriteFailed)
})
