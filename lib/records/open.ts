import { mkdir } from 'node:fs/promises'
import { join } from 'node:path'
import { openEvidence } from './evidence'
import { openJournal } from './journal/open'
import { lockDirectory } from './lock'
import { migrateRecords } from './migrate'
import { openRecords } from './prisma/open'
import { findProblems } from './problems'
import type { Store } from './types'

/**
 * Opens the data directory for this process alone, making it if it is new, and brings the records file to this version.
 * @throws DirectoryInUse, RecordsUnusable or JournalUnusable with a sentence that says what to do
 */
export async function openStore(directory: string): Promise<Store> {
  await mkdir(directory, { recursive: true, mode: 0o700 })
  // What was opened last is closed first, also when opening fails half-way.
  const opened: (() => Promise<void>)[] = []
  const close = async () => {
    for (let next = opened.pop(); next; next = opened.pop()) await next()
  }
  try {
    const lock = await lockDirectory(directory)
    opened.push(lock.release)
    const recordsFile = join(directory, 'records.sqlite')
    await migrateRecords(recordsFile)
    const journal = await openJournal(join(directory, 'journal.sqlite'))
    opened.push(journal.close)
    const { records, close: closeRecords } = await openRecords(recordsFile)
    opened.push(closeRecords)
    const evidence = await openEvidence(join(directory, 'evidence'))
    return { records, journal, evidence, problems: await findProblems(records, journal), close }
  } catch (cause) {
    await close()
    throw cause
  }
}
