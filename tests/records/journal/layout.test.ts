import { writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { connect } from '../../../lib/records/journal/connection'
import { JournalUnusable } from '../../../lib/records/journal/errors'
import { openJournal } from '../../../lib/records/journal/open'
import { temporaryDirectory } from '../temporary'
import { chain } from './chain'

/** A journal with two rows, closed, then changed by this script. */
async function changed(script: string): Promise<string> {
  const file = join(await temporaryDirectory(), 'journal.sqlite')
  const journal = await openJournal(file)
  await journal.append(chain(2))
  await journal.close()
  const raw = await connect(file, 'write')
  await raw.exec(script)
  await raw.close()
  return file
}

const TRIGGERS = [
  'entries_insert',
  'entries_update',
  'entries_delete',
  'deleted_insert',
  'deleted_lets_go',
  'deleted_update',
  'deleted_delete',
  'snapshots_keep_two',
]

describe('[W6.6] start-up refuses to serve', () => {
  test.each(TRIGGERS)('without the trigger %s', async (trigger) => {
    const file = await changed(`DROP TRIGGER ${trigger}`)
    await expect(openJournal(file)).rejects.toThrow(`${trigger} is missing or changed`)
  })

  test('with a trigger of the right name that does something else', async () => {
    const file = await changed(
      'DROP TRIGGER entries_update; CREATE TRIGGER entries_update BEFORE UPDATE ON entries BEGIN SELECT 1; END',
    )
    await expect(openJournal(file)).rejects.toThrow('entries_update is not as it should be')
  })

  test('with a trigger too many', async () => {
    const file = await changed('CREATE TRIGGER more AFTER INSERT ON entries BEGIN SELECT RAISE(IGNORE); END')
    await expect(openJournal(file)).rejects.toThrow('more is not as it should be')
  })

  test('without the unique index of edit ids', async () => {
    const file = await changed('DROP INDEX entries_edit')
    await expect(openJournal(file)).rejects.toThrow('entries_edit is missing or changed')
  })

  test('from a file that a newer version wrote, in a sentence that says what to do', async () => {
    const file = await changed('PRAGMA user_version = 2')
    await expect(openJournal(file)).rejects.toThrow(
      new JournalUnusable(
        'The journal was written by a newer version (layout 2, this one knows 1); start the newer version.',
      ),
    )
  })

  test('from a file that is no database', async () => {
    const file = join(await temporaryDirectory(), 'journal.sqlite')
    await writeFile(file, 'not a database, but long enough to be read as the header of one, which it is not at all')
    await expect(openJournal(file)).rejects.toThrow('SQLITE_NOTADB')
  })
})

test('[W6.7] both connections keep WAL and synchronous=FULL (2), read back', async () => {
  const file = await changed('SELECT 1')
  for (const mode of ['write', 'read'] as const) {
    const connection = await connect(file, mode)
    expect(await connection.all('PRAGMA journal_mode')).toEqual([{ journal_mode: 'wal' }])
    expect(await connection.all('PRAGMA synchronous')).toEqual([{ synchronous: 2 }])
    await connection.close()
  }
})

test('[W6.8] a file that cannot keep WAL is refused in a sentence', async () => {
  // A database in memory has no WAL; SQLite answers 'memory' to the pragma instead of failing.
  await expect(connect(':memory:', 'write')).rejects.toThrow('does not keep WAL with synchronous=FULL')
})
